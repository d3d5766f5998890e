import { measuredLeads, type MeasuredLead } from '../leads';

/** Electrodes that are measured against the right leg. */
export const electrodes = ['RA', 'LA', 'LL', 'V1', 'V2', 'V3', 'V4', 'V5', 'V6'] as const;
export type Electrode = (typeof electrodes)[number];

/** Potentials at the electrodes over one window, mV. */
export type ElectrodePotentials = Record<Electrode, Float64Array>;

export function electrodePotentials(length: number): ElectrodePotentials {
  return Object.fromEntries(
    electrodes.map((name) => [name, new Float64Array(length)]),
  ) as ElectrodePotentials;
}

/**
 * Adds electrode potentials to the leads formed from them: I = LA − RA, II = LL − RA, and each chest electrode
 * against Wilson's terminal (RA + LA + LL)/3 (LD-07), so that every lead identity still holds.
 */
export function addToLeads(
  leads: Record<MeasuredLead, Float64Array>,
  potentials: ElectrodePotentials,
  length: number,
): void {
  const { RA, LA, LL } = potentials;
  for (const lead of measuredLeads) {
    const out = leads[lead];
    if (lead === 'I') for (let i = 0; i < length; i++) out[i] += LA[i] - RA[i];
    else if (lead === 'II') for (let i = 0; i < length; i++) out[i] += LL[i] - RA[i];
    else {
      const chest = potentials[lead];
      for (let i = 0; i < length; i++) out[i] += chest[i] - (RA[i] + LA[i] + LL[i]) / 3;
    }
  }
}
