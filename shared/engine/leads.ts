import { leadNames, type LeadName } from '../parameters/sheet';

/** The leads that are measured; the other four limb leads are arithmetic on I and II (LD-26). */
export const measuredLeads = ['I', 'II', 'V1', 'V2', 'V3', 'V4', 'V5', 'V6'] as const;
export type MeasuredLead = (typeof measuredLeads)[number];

/**
 * Dower matrix: lead = row · (x, y, z) of the heart vector in the Frank frame (x left, y inferior, z posterior).
 * Source: LD-20, Dower et al. 1980, Clin Cardiol 3:87.
 */
export const dowerMatrix: Readonly<Record<MeasuredLead, readonly [number, number, number]>> = {
  I: [0.632, -0.235, 0.059],
  II: [0.235, 1.066, -0.132],
  V1: [-0.515, 0.157, -0.917],
  V2: [0.044, 0.164, -1.387],
  V3: [0.882, 0.098, -1.277],
  V4: [1.213, 0.127, -0.601],
  V5: [1.125, 0.127, -0.086],
  V6: [0.831, 0.076, 0.23],
};

/**
 * Coefficients of every lead over (I, II): Einthoven and Goldberger (LD-01 to LD-06). Chest leads are absent.
 */
export const limbLeadOfIAndII: Readonly<Partial<Record<LeadName, readonly [number, number]>>> = {
  I: [1, 0],
  II: [0, 1],
  III: [-1, 1],
  aVR: [-0.5, -0.5],
  aVL: [1, -0.5],
  aVF: [-0.5, 1],
};

/** Row of coefficients over (x, y, z) for each of the twelve leads. */
export const twelveLeadRows: Readonly<Record<LeadName, readonly [number, number, number]>> =
  Object.fromEntries(
    leadNames.map((lead) => {
      const limb = limbLeadOfIAndII[lead];
      if (!limb) return [lead, dowerMatrix[lead as MeasuredLead]];
      const [i, ii] = limb;
      return [lead, [0, 1, 2].map((axis) => i * dowerMatrix.I[axis] + ii * dowerMatrix.II[axis])];
    }),
  ) as unknown as Record<LeadName, readonly [number, number, number]>;

/** Value of one lead for a heart vector (mV). */
export function projectVector(lead: LeadName, x: number, y: number, z: number): number {
  const row = twelveLeadRows[lead];
  return row[0] * x + row[1] * y + row[2] * z;
}
