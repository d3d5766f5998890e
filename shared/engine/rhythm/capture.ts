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

/** Chronaxie of transcutaneous pacing, ms, and the width at which its threshold is given (chosen; PP-43, PP-44). */
const chestChronaxieMs = 5;
const chestThresholdWidthMs = 20;

/** Transcutaneous capture threshold in mA at a pulse width, by the same law. */
export function chestThresholdMa(captureThresholdMa: number, pulseWidthMs: number): number {
  return (
    (captureThresholdMa * (1 + chestChronaxieMs / pulseWidthMs)) /
    (1 + chestChronaxieMs / chestThresholdWidthMs)
  );
}

/** Output and threshold of one stimulus in the same unit. */
export interface StimulusStrength {
  output: number;
  threshold: number;
  /** A fault keeps it from capturing, whatever its strength. */
  fault: boolean;
}

/** What a stimulus meets. `capturedFresh`: a wave is under way, but has not reached this lead. */
export type CaptureOutcome = 'captured' | 'capturedFresh' | CaptureFailure;

/**
 * Whether a stimulus captures. Thresholds are inclusive; of several reasons the first in the order tissue, output,
 * fault is given.
 *
 * @param stimulusUs time of the stimulus
 * @param localUs when the last depolarization reached, or will reach, this lead
 */
export function captureOutcome(
  stimulusUs: number,
  localUs: number,
  chamber: 'atrium' | 'ventricle',
  { output, threshold, fault }: StimulusStrength,
): CaptureOutcome {
  const fresh = stimulusUs < localUs - startOfOwnWaveUs;
  const restedUs = localUs + msToUs(refractoryMs[chamber]);
  if (!fresh && stimulusUs < restedUs) return 'refractoryTissue';
  if (output < threshold) return 'belowThreshold';
  const relative = !fresh && stimulusUs < restedUs + relativeRefractoryUs;
  if (relative && output < 2 * threshold) return 'refractoryTissue';
  if (fault) return 'fault';
  return fresh ? 'capturedFresh' : 'captured';
}
