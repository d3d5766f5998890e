import Fili, { type FiliBiquad } from 'fili';

/** A second-order section of a filter, or a first-order one with b2 = a2 = 0; fili's own shape. */
export type Section = FiliBiquad;

/** |H| of a cascade at a frequency; 1 for an empty cascade. */
export function magnitudeAt(sections: readonly Section[], frequencyHz: number, rateHz: number): number {
  if (sections.length === 0) return 1;
  return new Fili.IirFilter([...sections]).responsePoint({ Fs: rateHz, Fr: frequencyHz }).magnitude;
}
