import { leadNames, type LeadName } from '../../parameters/sheet';
import type { ComplexMeasures, LeadMeasures } from './complex';
import { rounded } from './statistics';

/** One criterion of injury, applied to every beat that it is meant for. */
export interface Criterion {
  id: CriterionId;
  met: boolean;
  /** The figure that comes nearest to the limit or passes it furthest, over leads and beats; null where no lead is eligible. */
  value: number | null;
  limit: number;
  unit: 'mV' | 'ratio' | 'points';
  /** Leads in which it is met, on any beat. */
  leads: LeadName[];
  /** Beats on which it is met. */
  beats: number[];
  source: string;
}

export type CriterionId =
  | 'sgarbossa.concordantElevation'
  | 'sgarbossa.concordantDepression'
  | 'sgarbossa.discordantElevation'
  | 'sgarbossa.points'
  | 'modified.ratio'
  | 'modified.rule'
  | 'barcelona.concordant'
  | 'barcelona.discordantSmall'
  | 'barcelona.rule'
  | 'native.stElevation';

/** A beat as the criteria see it. */
export interface CriteriaBeat {
  number: number;
  /** Paced, ventricular or blocked in a bundle: at least 120 ms wide. */
  wide: boolean;
  complex: ComplexMeasures;
}

/** A QRS of at least this is wide, ms (MO-20, MO-21). */
export const wideQrsMs = 120;
/** 1 mm at 10 mm/mV, mV. */
const millimetre = 0.1;
/** Rounding in the arithmetic of limits that are met exactly. */
const epsilon = 1e-9;

const sources = {
  sgarbossa: 'Sgarbossa et al. 1996, N Engl J Med 334:481 (read in a public text)',
  modified: 'Smith et al. 2012, Ann Emerg Med 60:766; Meyers et al. 2015 (read in a public text)',
  barcelona: 'Di Marco et al. 2020, J Am Heart Assoc 9:e015573 (read in a public text)',
  native: 'Thygesen et al. 2018, Fourth Universal Definition of Myocardial Infarction (from memory)',
} as const;

/** Leads that lie beside each other, for the native criterion. */
const contiguous: readonly (readonly [LeadName, LeadName])[] = [
  ['aVL', 'I'],
  ['II', 'aVF'],
  ['aVF', 'III'],
  ['V1', 'V2'],
  ['V2', 'V3'],
  ['V3', 'V4'],
  ['V4', 'V5'],
  ['V5', 'V6'],
];
/** Native ST elevation that counts: 2 mm in V2 and V3, 1 mm elsewhere, mV. */
const nativeLimitMv = (lead: LeadName): number => (lead === 'V2' || lead === 'V3' ? 2 : 1) * millimetre;

const isPositive = ({ netMv }: LeadMeasures): boolean => netMv > 0;
const reaches = (value: number, limit: number): boolean => value >= limit - epsilon;

/** The figure of one lead, in the direction of the limit; null where the lead is not eligible. */
type LeadFigure = (measures: LeadMeasures, lead: LeadName) => number | null;

interface LeadRule {
  id: CriterionId;
  limit: number;
  unit: Criterion['unit'];
  source: string;
  figure: LeadFigure;
  /** Figure and limit are given with a minus sign. */
  shownNegative?: true;
}

const concordantElevation: LeadRule = {
  id: 'sgarbossa.concordantElevation',
  limit: millimetre,
  unit: 'mV',
  source: sources.sgarbossa,
  figure: (measures) => (isPositive(measures) ? measures.stMv : null),
};
const concordantDepression: LeadRule = {
  id: 'sgarbossa.concordantDepression',
  limit: millimetre,
  unit: 'mV',
  source: sources.sgarbossa,
  figure: (measures, lead) =>
    !isPositive(measures) && (lead === 'V1' || lead === 'V2' || lead === 'V3') ? -measures.stMv : null,
};
const discordantElevation: LeadRule = {
  id: 'sgarbossa.discordantElevation',
  limit: 5 * millimetre,
  unit: 'mV',
  source: sources.sgarbossa,
  figure: (measures) => (isPositive(measures) ? null : measures.stMv),
};
/** ST over S, S taken as a negative number, so that the published limit is −0.25 and less is more. */
const modifiedRatio: LeadRule = {
  id: 'modified.ratio',
  shownNegative: true,
  limit: 0.25,
  unit: 'ratio',
  source: sources.modified,
  figure: (measures) =>
    !isPositive(measures) && reaches(measures.stMv, millimetre) && measures.sMv < 0
      ? measures.stMv / -measures.sMv
      : null,
};
const barcelonaConcordant: LeadRule = {
  id: 'barcelona.concordant',
  limit: millimetre,
  unit: 'mV',
  source: sources.barcelona,
  figure: (measures) => (isPositive(measures) ? measures.stMv : -measures.stMv),
};
const barcelonaSmall: LeadRule = {
  id: 'barcelona.discordantSmall',
  limit: millimetre,
  unit: 'mV',
  source: sources.barcelona,
  figure: (measures) =>
    Math.max(measures.rMv, -measures.sMv) <= 6 * millimetre + epsilon
      ? isPositive(measures)
        ? -measures.stMv
        : measures.stMv
      : null,
};

const points = new Map<CriterionId, number>([
  ['sgarbossa.concordantElevation', 5],
  ['sgarbossa.concordantDepression', 3],
  ['sgarbossa.discordantElevation', 2],
]);
/** Points from which the original rule is positive. */
const positivePoints = 3;

function applyRule(rule: LeadRule, beats: readonly CriteriaBeat[]): Criterion {
  const sign = rule.shownNegative ? -1 : 1;
  let best: number | null = null;
  const leads = new Set<LeadName>();
  const met: number[] = [];
  for (const { number, complex } of beats) {
    let here = false;
    for (const lead of leadNames) {
      const value = rule.figure(complex.leads[lead], lead);
      if (value === null) continue;
      best = best === null ? value : Math.max(best, value);
      if (!reaches(value, rule.limit)) continue;
      leads.add(lead);
      here = true;
    }
    if (here) met.push(number);
  }
  return {
    id: rule.id,
    met: met.length > 0,
    value: rounded(best === null ? null : sign * best, 3),
    limit: sign * rule.limit,
    unit: rule.unit,
    leads: leadNames.filter((lead) => leads.has(lead)),
    beats: met,
    source: rule.source,
  };
}

/** A rule that is positive on a beat when one of its parts is. */
function anyOf(id: CriterionId, parts: readonly Criterion[], source: string): Criterion {
  const metParts = parts.filter((part) => part.met);
  return {
    id,
    met: metParts.length > 0,
    value: metParts.length,
    limit: 1,
    unit: 'points',
    leads: leadNames.filter((lead) => metParts.some((part) => part.leads.includes(lead))),
    beats: [...new Set(metParts.flatMap((part) => part.beats))].sort((a, b) => a - b),
    source,
  };
}

/** Weighted points of the original rule, beat by beat; the highest sum is the figure. */
function pointsOf(parts: readonly Criterion[], beats: readonly CriteriaBeat[]): Criterion {
  const sums = beats.map(({ number }) => ({
    number,
    sum: parts.reduce((sum, part) => sum + (part.beats.includes(number) ? (points.get(part.id) ?? 0) : 0), 0),
  }));
  const positive = sums.filter(({ sum }) => sum >= positivePoints).map(({ number }) => number);
  return {
    id: 'sgarbossa.points',
    met: positive.length > 0,
    value: Math.max(...sums.map(({ sum }) => sum)),
    limit: positivePoints,
    unit: 'points',
    leads: leadNames.filter((lead) => parts.some((part) => part.leads.includes(lead))),
    beats: positive,
    source: sources.sgarbossa,
  };
}

function wideCriteria(beats: readonly CriteriaBeat[]): Criterion[] {
  const apply = (rule: LeadRule): Criterion => applyRule(rule, beats);
  const original = [concordantElevation, concordantDepression, discordantElevation].map(apply);
  const ratio = apply(modifiedRatio);
  const barcelona = [barcelonaConcordant, barcelonaSmall].map(apply);
  return [
    ...original,
    pointsOf(original, beats),
    ratio,
    anyOf('modified.rule', [original[0], original[1], ratio], sources.modified),
    ...barcelona,
    anyOf('barcelona.rule', barcelona, sources.barcelona),
  ];
}

/** Native ST elevation in two leads beside each other, each past its own limit; the figure is the lesser excess + 1 mm. */
function nativeCriterion(beats: readonly CriteriaBeat[]): Criterion {
  let best: number | null = null;
  const leads = new Set<LeadName>();
  const met: number[] = [];
  for (const { number, complex } of beats) {
    const share = (lead: LeadName): number => (complex.leads[lead].stMv / nativeLimitMv(lead)) * millimetre;
    let here = false;
    for (const pair of contiguous) {
      const value = Math.min(...pair.map(share));
      best = best === null ? value : Math.max(best, value);
      if (!reaches(value, millimetre)) continue;
      for (const lead of pair) leads.add(lead);
      here = true;
    }
    if (here) met.push(number);
  }
  return {
    id: 'native.stElevation',
    met: met.length > 0,
    value: rounded(best, 3),
    limit: millimetre,
    unit: 'mV',
    leads: leadNames.filter((lead) => leads.has(lead)),
    beats: met,
    source: sources.native,
  };
}

/**
 * Criteria of acute injury, from ST 20 ms after the QRS of every complex: those for wide beats where there are any, the
 * native one where there are narrow ones. Empty without a complex.
 */
export function injuryCriteria(beats: readonly CriteriaBeat[]): Criterion[] {
  const wide = beats.filter((beat) => beat.wide);
  const narrow = beats.filter((beat) => !beat.wide);
  return [
    ...(wide.length > 0 ? wideCriteria(wide) : []),
    ...(narrow.length > 0 ? [nativeCriterion(narrow)] : []),
  ];
}
