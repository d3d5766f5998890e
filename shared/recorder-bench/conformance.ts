import { settingWords, type BenchSetting } from './bench-setting';
import { accuracyRequirements } from './requirements/accuracy';
import { pulseRequirements } from './requirements/pulses';
import type { Requirement, RequirementSource } from './requirements/requirement';
import { sineRequirements } from './requirements/sine-series';

/** Every requirement, in the order of the table. */
export const requirements: readonly Requirement[] = [
  ...sineRequirements,
  ...pulseRequirements,
  ...accuracyRequirements,
];

/** `notClaimed`: the setting is not meant to meet it, whatever was measured; that is not the same as met. */
export type Verdict = 'met' | 'failed' | 'notClaimed';

/** One requirement for one setting. */
export interface Finding {
  verdict: Verdict;
  /** Why it is not claimed. */
  reason: string | null;
  /** What was measured, in words; null where the requirement cannot be applied. */
  measured: string | null;
  value: number | null;
  /** What of the limit is left, as a share of it. */
  margin: number | null;
}

export interface ConformanceRow {
  id: string;
  applied: string;
  source: RequirementSource;
  limit: string;
  unit: string;
  /** One for each setting, in their order. */
  findings: Finding[];
}

/** Every requirement, measured on every setting. */
export interface Conformance {
  settings: { name: string; band: string; sampleRateHz: number; resolutionUv: number }[];
  rows: ConformanceRow[];
}

/** Rounding that a figure exactly on its limit may have. */
const onTheLimit = -1e-9;

function findingOf(requirement: Requirement, setting: BenchSetting): Finding {
  const reason = requirement.notClaimed(setting);
  const measured = requirement.measure(setting);
  const figures = {
    measured: measured?.text ?? null,
    value: measured?.value ?? null,
    margin: measured?.margin ?? null,
  };
  if (reason !== null) return { verdict: 'notClaimed', reason, ...figures };
  const met = measured !== null && (measured.margin === null || measured.margin >= onTheLimit);
  return { verdict: met ? 'met' : 'failed', reason: null, ...figures };
}

/** Runs every test signal through every setting; about a third of a second each. */
export function measureConformance(settings: readonly BenchSetting[]): Conformance {
  return {
    settings: settings.map((setting) => ({
      ...settingWords(setting),
      sampleRateHz: setting.recorder.sampleRateHz,
      resolutionUv: setting.recorder.resolutionUv,
    })),
    rows: requirements.map((requirement) => ({
      id: requirement.id,
      applied: requirement.applied,
      source: requirement.source,
      limit: requirement.limit,
      unit: requirement.unit,
      findings: settings.map((setting) => findingOf(requirement, setting)),
    })),
  };
}

/** Whether a setting fails something that it claims. */
export function fails({ rows }: Conformance, setting: number): boolean {
  return rows.some(({ findings }) => findings[setting].verdict === 'failed');
}
