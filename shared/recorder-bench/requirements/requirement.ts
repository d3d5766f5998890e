import type { BenchSetting } from '../bench-setting';

/** Where a limit comes from. */
export interface RequirementSource {
  /** Standard or text, with its clause or table. */
  text: string;
  /** How the figure is known. */
  provenance: 'read in a public text' | 'from memory' | 'common practice' | 'own contract';
}

/** What a measurement gave. */
export interface Measured {
  /** In words with its unit: `−0.3 %`, `0.094 mV`. */
  text: string;
  /** The figure alone, in the requirement's unit. */
  value: number;
  /** What of the limit is left, as a share of it: 0 on the limit, below 0 beyond it; null where there is no limit. */
  margin: number | null;
}

/** One requirement, measured by running what it applies through the recorder. */
export interface Requirement {
  id: string;
  /** What is applied. */
  applied: string;
  source: RequirementSource;
  /** The limit in words; `not judged` where no limit may be leaned on. */
  limit: string;
  unit: string;
  /** Why this setting is not meant to meet it; null when it claims to. */
  notClaimed(setting: BenchSetting): string | null;
  /** null when it cannot be applied to this setting. */
  measure(setting: BenchSetting): Measured | null;
}

export const iec25 = (clause: string): RequirementSource => ({
  text: `IEC 60601-2-25:2011, ${clause}`,
  provenance: 'read in a public text',
});

/** The classes of use that a setting declares by its name. Own limits declare nothing but their limits. */
export type DeclaredUse = 'diagnostic' | 'slowWave' | 'monitor' | 'none';

export function declaredUse(setting: BenchSetting): DeclaredUse {
  if (setting.kind !== 'recorder') return 'none';
  const { bandwidth } = setting.recorder;
  return bandwidth === 'diagnostic' || bandwidth === 'slowWave' || bandwidth === 'monitor'
    ? bandwidth
    : 'none';
}

const noUse = 'declares no use';

/** Claims of the named uses; others get `words` as the reason why not, or that they declare no use at all. */
export function claimedBy(uses: readonly DeclaredUse[], words: string) {
  return (setting: BenchSetting): string | null => {
    const use = declaredUse(setting);
    if (uses.includes(use)) return null;
    return use === 'none' ? noUse : words;
  };
}

/** Every setting that declares a use claims it. */
export const claimedByAnyUse = claimedBy(['diagnostic', 'slowWave', 'monitor'], noUse);

/** A figure with a sign that is not a hyphen. */
export function signed(value: number, decimals: number): string {
  const text = Math.abs(value).toFixed(decimals);
  if (Number(text) === 0) return text;
  return `${value < 0 ? '−' : '+'}${text}`;
}
