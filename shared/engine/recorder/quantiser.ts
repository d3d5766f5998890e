import { leadNames, type LeadName } from '../../parameters/sheet';
import { uvPerMv } from '../../units';
import { limbLeadOfIAndII, measuredLeads, type MeasuredLead } from '../leads';

/** A value in whole quantiser steps, half steps rounded up. */
function inSteps(valueMv: number, resolutionUv: number): number {
  // Adding 0 turns −0 into 0.
  return Math.floor((valueMv * uvPerMv) / resolutionUv + 0.5) + 0;
}

/** A value in mV rounded to the quantiser's step, half steps up. */
export function quantise(valueMv: number, resolutionUv: number): number {
  return (inSteps(valueMv, resolutionUv) * resolutionUv) / uvPerMv;
}

function combine(a: Float64Array, b: Float64Array, weights: readonly [number, number]): Float64Array {
  const [wa, wb] = weights;
  const combined = new Float64Array(a.length);
  for (let i = 0; i < a.length; i++) combined[i] = wa * a[i] + wb * b[i] + 0;
  return combined;
}

/** Every value of a lead, quantised. */
function quantiseAll(values: Float64Array, resolutionUv: number): Float64Array {
  const stepped = new Float64Array(values.length);
  for (let i = 0; i < values.length; i++) stepped[i] = quantise(values[i], resolutionUv);
  return stepped;
}

/**
 * All twelve leads of eight measured ones, mV: III, aVR, aVL and aVF by Einthoven's and Goldberger's relations
 * (LD-01 to LD-06), exact to rounding.
 */
export function twelveLeads(measured: Record<MeasuredLead, Float64Array>): Record<LeadName, Float64Array> {
  return Object.fromEntries(
    leadNames.map((lead) => {
      const weights = limbLeadOfIAndII[lead];
      const isMeasured = measuredLeads.some((one) => one === lead);
      if (isMeasured) return [lead, measured[lead as MeasuredLead]];
      return [lead, combine(measured.I, measured.II, weights ?? [0, 0])];
    }),
  ) as Record<LeadName, Float64Array>;
}

/**
 * Quantises the eight measured leads and derives the other four from the quantised ones, so that the lead
 * identities hold to a half step (aVR, aVL and aVF may stand on half steps).
 */
export function quantiseLeads(
  measured: Record<MeasuredLead, Float64Array>,
  resolutionUv: number,
): Record<LeadName, Float32Array> {
  const stepped = Object.fromEntries(
    measuredLeads.map((lead) => [lead, quantiseAll(measured[lead], resolutionUv)]),
  ) as Record<MeasuredLead, Float64Array>;
  const leads = twelveLeads(stepped);
  return Object.fromEntries(leadNames.map((lead) => [lead, new Float32Array(leads[lead])])) as Record<
    LeadName,
    Float32Array
  >;
}
