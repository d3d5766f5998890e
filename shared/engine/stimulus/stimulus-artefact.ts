import { msPerS } from '../../units';
import type { StimulusChamber } from '../events';
import type { SampleClock, VectorWindow } from '../signal/wave-painter';

/** What of a stimulus reaches the body surface. */
export interface StimulusArtefact {
  timeS: number;
  chamber: StimulusChamber;
  amplitudeMv: number;
  widthMs: number;
}

const third = 1 / Math.sqrt(3);

/**
 * Mean direction of the spike by chamber, a unit vector in the body frame (x left, y inferior, z posterior).
 * PP-22 (Koenig et al. 2011, abstract) names the octants; equal components are chosen.
 */
const directions: Readonly<Record<StimulusChamber, readonly [number, number, number]>> = {
  atrium: [third, -third, -third],
  rightVentricle: [-third, -third, third],
  leftVentricle: [-third, third, third],
};

/**
 * Time constant of the recharge that follows a pulse, ms: the slowest of those used in tests (PP-06). With it the
 * recharge takes less than 2 % of a 0.4 ms spike's height at 150 Hz, so that the spike keeps its textbook size.
 */
export const rechargeTimeConstantMs = 100;
/** The recharge is over when it is this many time constants old: exp(−16) of its start is below 1e-7. */
const rechargeEndConstants = 16;

/** Time at which nothing of a stimulus is left, s. */
export function stimulusEndS({ timeS, widthMs }: Pick<StimulusArtefact, 'timeS' | 'widthMs'>): number {
  return timeS + (widthMs + rechargeEndConstants * rechargeTimeConstantMs) / msPerS;
}

/**
 * Area under the artefact of a unit pulse from its start to `t` (ms): a rectangle, then a recharge of equal and
 * opposite charge (PP-09), mirrored in space (PP-21: 174° on average).
 */
function unitArea(t: number, widthMs: number): number {
  if (t <= 0) return 0;
  if (t <= widthMs) return t;
  return widthMs * Math.exp((widthMs - t) / rechargeTimeConstantMs);
}

/**
 * Adds a stimulus to samples [first, first + length) of a clock, as a heart vector in mV.
 *
 * Each sample holds the artefact's mean over the interval of one sample around it, so that the area is exact at
 * any position between samples and at any rate.
 */
export function addStimulusArtefact(
  out: VectorWindow,
  clock: SampleClock,
  first: number,
  length: number,
  stimulus: StimulusArtefact,
): void {
  const { timeS, chamber, amplitudeMv, widthMs } = stimulus;
  const sampleMs = msPerS / clock.rateHz;
  // Interval of clock sample 0, in ms from the stimulus.
  const start = (clock.firstTimeS - timeS) * msPerS - sampleMs / 2;
  const from = Math.max(first, Math.ceil(-start / sampleMs) - 1);
  const end = Math.min(
    first + length,
    Math.ceil(((stimulusEndS(stimulus) - timeS) * msPerS - start) / sampleMs),
  );
  const [dx, dy, dz] = directions[chamber];
  let before = unitArea(start + from * sampleMs, widthMs);
  for (let m = from; m < end; m++) {
    const after = unitArea(start + (m + 1) * sampleMs, widthMs);
    const value = (amplitudeMv * (after - before)) / sampleMs;
    out.x[m - first] += dx * value;
    out.y[m - first] += dy * value;
    out.z[m - first] += dz * value;
    before = after;
  }
}
