import type { PacingParameters } from '../../../parameters/strip-parameters';

/** After-potential of an atrial stimulus on the ventricular channel, mV per V at 0.4 ms (chosen). */
const afterPotentialMvPerV = { bipolar: 1, unipolar: 3 } as const;
const referenceWidthMs = 0.4;
/** Its decay, ms (chosen). */
const decayMs = 15;

/**
 * Whether the after-potential of an atrial stimulus is still large enough at the end of ventricular blanking to be
 * taken for a ventricular signal.
 */
export function hasCrosstalk(pacing: PacingParameters): boolean {
  const { atrialLead, rightVentricularLead, ventricularBlankingMs } = pacing;
  const start =
    (atrialLead.amplitudeV * afterPotentialMvPerV[atrialLead.polarity] * atrialLead.pulseWidthMs) /
    referenceWidthMs;
  return start * Math.exp(-ventricularBlankingMs / decayMs) >= rightVentricularLead.sensitivityMv;
}
