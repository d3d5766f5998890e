import { leadNames, type LeadName } from '../parameters/sheet';
import { uvPerMv } from '../units';
import type { SampledLeads } from './csv';

/** Greatest count used; −32768 stays free, because WFDB means "no sample" by it and zero shall lie in the middle. */
export const greatestCount = 32767;
/** A step is widened at most to this, µV: diagnostic recorders have at most 5 µV (BW-29). Beyond it, samples clip. */
const widestStepUv = 5;
/** Leads that are half sums of quantised ones and so lie on half steps. */
const halfStepLeads: readonly LeadName[] = ['aVR', 'aVL', 'aVF'];

/** One lead in 16 bits: value = count × stepUv. */
export interface LeadCounts {
  lead: LeadName;
  counts: Int16Array;
  stepUv: number;
  /** The step on which every sample would have been exact, µV. */
  exactStepUv: number;
  /** Samples that the widest step could not hold; they lie at ±32767. */
  clipped: number;
  /** Samples without a value (NaN), written as 0. */
  gaps: number;
}

/** The step on which every sample of a lead lies, µV: the quantiser's, or half of it for aVR, aVL and aVF. */
export function exactStepUv(lead: LeadName, resolutionUv: number): number {
  return halfStepLeads.includes(lead) ? resolutionUv / 2 : resolutionUv;
}

/** Greatest magnitude among samples, gaps left out. */
function peakOf(samplesMv: Float32Array): number {
  let peak = 0;
  for (let i = 0; i < samplesMv.length; i++) {
    const magnitude = Math.abs(samplesMv[i]);
    if (magnitude > peak) peak = magnitude;
  }
  return peak;
}

/** The smallest whole multiple of the exact step that holds a peak, but none wider than `widestStepUv`. */
function stepFor(peakUv: number, exactUv: number): number {
  const needed = Math.max(1, Math.ceil(Math.round(peakUv / exactUv) / greatestCount));
  const most = Math.max(1, Math.floor(widestStepUv / exactUv));
  return Math.min(needed, most) * exactUv;
}

/** One lead in 16-bit counts; `samplesMv` in mV. */
export function leadCounts(lead: LeadName, samplesMv: Float32Array, resolutionUv: number): LeadCounts {
  const exactUv = exactStepUv(lead, resolutionUv);
  const stepUv = stepFor(peakOf(samplesMv) * uvPerMv, exactUv);
  const counts = new Int16Array(samplesMv.length);
  let clipped = 0;
  let gaps = 0;
  for (let i = 0; i < samplesMv.length; i++) {
    const count = Math.round((samplesMv[i] * uvPerMv) / stepUv);
    if (Math.abs(count) > greatestCount) clipped++;
    else if (Number.isNaN(count)) gaps++;
    // NaN becomes 0 in an Int16Array.
    counts[i] = Math.max(-greatestCount, Math.min(greatestCount, count));
  }
  return { lead, counts, stepUv, exactStepUv: exactUv, clipped, gaps };
}

/** All twelve leads in 16-bit counts, each with its own step. */
export function sixteenBitLeads({ leads, resolutionUv }: SampledLeads): LeadCounts[] {
  return leadNames.map((lead) => leadCounts(lead, leads[lead], resolutionUv));
}

/** A number in at most six digits, for sentences. */
export function shortNumber(value: number): string {
  return String(Number(value.toPrecision(6)));
}

function samples(count: number): string {
  return count === 1 ? '1 sample' : `${count} samples`;
}

/** What 16 bits cost, in sentences; none when every sample is exact. */
export function sixteenBitWarnings(leads: readonly LeadCounts[]): string[] {
  return leads.flatMap(({ lead, stepUv, exactStepUv: exactUv, clipped, gaps }) => {
    const warnings: string[] = [];
    if (stepUv > exactUv) {
      warnings.push(
        `${lead}: written in steps of ${shortNumber(stepUv)} µV instead of ${shortNumber(exactUv)}, because 16 bits do not hold its range otherwise`,
      );
    }
    if (clipped > 0) {
      const limitMv = shortNumber((greatestCount * stepUv) / uvPerMv);
      warnings.push(`${lead}: ${samples(clipped)} beyond ±${limitMv} mV clipped`);
    }
    if (gaps > 0) warnings.push(`${lead}: ${samples(gaps)} without a value written as 0`);
    return warnings;
  });
}
