import { leadNames, type LeadName } from '../../parameters/sheet';
import type { ComplexMeasures } from './complex';

/**
 * Below these a deflection has no direction to compare (half and a quarter of a millimetre at 10 mm/mV;
 * common practice, no source).
 */
export const smallestNetQrsMv = 0.1;
export const smallestTMv = 0.05;

export type QrsTRelation = 'concordant' | 'discordant';
export type QrsTRelations = Record<LeadName, QrsTRelation | null>;

/** Whether T points the way of the net QRS, lead by lead; null where either is too small to say. */
export function qrsTRelations(complex: ComplexMeasures): QrsTRelations {
  const relation = (lead: LeadName): QrsTRelation | null => {
    const { netMv, tMv } = complex.leads[lead];
    if (Math.abs(netMv) < smallestNetQrsMv || Math.abs(tMv) < smallestTMv) return null;
    return netMv > 0 === tMv > 0 ? 'concordant' : 'discordant';
  };
  return Object.fromEntries(leadNames.map((lead) => [lead, relation(lead)])) as QrsTRelations;
}
