import type { StripParameters } from '../../../shared/parameters/strip-parameters';

/** Mode and rate of a strip in a few words, for its card. */
export function pacingWords({ pacing, patient }: StripParameters): string {
  if (pacing.source === 'none') return `No pacing, ${patient.atrialRateBpm} /min`;
  return `${pacing.mode}, ${pacing.lowerRateBpm} /min`;
}
