import type { PacingLead } from '../../parameters/strip-parameters';
import { msToUs } from '../../units';
import type { CaptureFailure } from '../events';

/** Chronaxie of the strength–duration curve, ms (chosen within TM-53). */
export const chronaxieMs = 0.3;
/** Pulse width at which `captureThresholdV` is given, ms. */
export const thresholdWidthMs = 0.4;

/** A stimulus needs about this long to start its own wave, ms (chosen). */
export const startOfOwnWaveMs = 15;
/** Effective refractory periods after local activation, ms (ventricle: chosen; both from memory). */
export const refractoryMs = { atrium: 200, ventricle: 250 } as const;
/** After that the threshold is doubled for this long, ms (from memory). */
export const relativeRefractoryMs = 50;

const startOfOwnWaveUs = msToUs(startOfOwnWaveMs);
const relativeRefractoryUs = msToUs(relativeRefractoryMs);

/**
 * Capture threshold in V at a pulse width, by the strength–duration law b (1 + c/d) (TM-50), scaled to the
 * threshold at 0.4 ms.
 */
export function thresholdV(captureThresholdV: number, pulseWidthMs: number): number {
  return (captureThresholdV * (1 + chronaxieMs / pulseWidthMs)) / (1 + chronaxieMs / thresholdWidthMs);
}

/** What a stimulus meets. `fresh`: a wave is under way, but has not reached this lead. */
export type CaptureOutcome = 'captured' | 'capturedFresh' | CaptureFailure;

/**
 * Whether a stimulus captures. Thresholds are inclusive.
 *
 * @param stimulusUs time of the stimulus
 * @param localUs when the last depolarization reached, or will reach, this lead
 */
export function captureOutcome(
  stimulusUs: number,
  localUs: number,
  chamber: 'atrium' | 'ventricle',
  lead: Pick<PacingLead, 'amplitudeV' | 'pulseWidthMs' | 'captureThresholdV'>,
): CaptureOutcome {
  const fresh = stimulusUs < localUs - startOfOwnWaveUs;
  const restedUs = localUs + msToUs(refractoryMs[chamber]);
  if (!fresh && stimulusUs < restedUs) return 'refractoryTissue';
  const threshold = thresholdV(lead.captureThresholdV, lead.pulseWidthMs);
  if (lead.amplitudeV < threshold) return 'belowThreshold';
  if (fresh) return 'capturedFresh';
  if (stimulusUs < restedUs + relativeRefractoryUs && lead.amplitudeV < 2 * threshold) {
    return 'refractoryTissue';
  }
  return 'captured';
}
