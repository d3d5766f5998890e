import type { AtrialRhythm } from './patient';
import type { StripParameters } from './strip-parameters';

/** Usual atrial rates by rhythm, /min (sinus: NR-35, its lower end widened to trained
 * hearts; flutter: NR-20; fibrillation: the part of NR-23 that the schema allows; tachycardia: common practice, no source). */
const atrialRates: Readonly<Record<AtrialRhythm, readonly [number, number]>> = {
  sinus: [50, 100],
  arrest: [50, 100],
  tachycardia: [120, 240],
  flutter: [240, 340],
  fibrillation: [350, 400],
};

/** The usual range of a parameter where it depends on the others; otherwise the schema's own holds. */
export function usualRange(
  { patient }: StripParameters,
  path: string,
): readonly [number, number] | undefined {
  return path === 'patient.atrialRateBpm' ? atrialRates[patient.atrialRhythm] : undefined;
}
