import { largeBoxMm } from '../paper-scale';
import { leastPitchMm } from '../row-spacing';

/** Rows may stand this much closer than their ink asks for, share, where that saves a page. */
const closest = 0.55;

/** How rows are spaced: each as far from the next as its ink asks for, between these. */
export interface Spacing {
  leastMm: number;
  pitchMm: number;
  /** Room at the edges of a grid as its ink asks for instead of a usual one. */
  trimmed: boolean;
  /** Most room above the first line and below the last, mm; where it bites, traces are cut at the edge. */
  edgeLimitMm?: number;
}

/** `fromMm`, and large box by large box down to `toMm`. */
function descending(fromMm: number, toMm: number): number[] {
  const count = Math.max(0, Math.floor((fromMm - toMm) / largeBoxMm) + 1);
  return Array.from({ length: count }, (_, i) => fromMm - i * largeBoxMm);
}

/**
 * Spacings to try for rows whose ink asks for `pitchMm` at most, roomiest first: even, then with trimmed edges, then less and less even where the ink allows it, then rows
 * that stand closer than their ink asks for.
 */
export function spacingsOf(pitchMm: number): Spacing[] {
  const closestMm = Math.max(leastPitchMm, closest * pitchMm);
  return [
    { leastMm: pitchMm, pitchMm, trimmed: false },
    ...descending(pitchMm, leastPitchMm).map((leastMm) => ({ leastMm, pitchMm, trimmed: true })),
    ...descending(pitchMm - largeBoxMm, closestMm).map((closerMm) => ({
      leastMm: leastPitchMm,
      pitchMm: closerMm,
      trimmed: true,
    })),
  ];
}
