import type { CaptureFailure } from '../../events';
import type { BeatReading } from '../beat-reading';

/** Why a stimulus captures nothing. */
export const reasonWords: Record<CaptureFailure, string> = {
  belowThreshold: 'the output is below the threshold',
  refractoryTissue: 'the muscle is still refractory',
  fault: 'a fault, with output enough',
};

export function numbersOf(beats: readonly BeatReading[]): number[] {
  return beats.map((beat) => beat.number);
}

export function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
