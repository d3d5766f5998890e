import { upstrokeReachMs, upstrokeStepsPerMs, upstrokeTable } from './action-potential';
import type { Activation } from './activation';
import { millivoltsPerArea, type DipoleTrace } from './dipole-trace';
import type { Ventricles } from './ventricles';

/** Samples of rest before the first upstroke. */
const restSamples = 1;

/** First sample of a beat: at rest, before the first upstroke begins, whole ms. */
export function firstSampleMs({ earliestMs }: Activation): number {
  return Math.floor(earliestMs - upstrokeReachMs) - restSamples;
}

/** First sample at which every upstroke is complete, whole ms. */
export function settledSampleMs({ latestMs }: Activation): number {
  return Math.floor(latestMs + upstrokeReachMs) + 1;
}

/**
 * The heart vector that activation alone would give: upstrokes without plateau decline or recovery, from rest until
 * all is activated. The closed surface makes it zero from then on.
 */
export function sumDepolarization({ weights }: Ventricles, activation: Activation): DipoleTrace {
  const startMs = firstSampleMs(activation);
  const sampleCount = settledSampleMs(activation) - startMs + 1;
  const values = new Float64Array(3 * sampleCount);
  const { body } = weights;
  for (let node = 0; node < activation.timesMs.length; node++) {
    addUpstroke(values, startMs - activation.timesMs[node], body, node);
  }
  // Steps become their running sum; the closed end, zero but for rounding, is made exactly zero.
  for (let at = 3; at < values.length - 3; at++) values[at] += values[at - 3];
  values.fill(0, values.length - 3);
  return { startMs, sampleCount, values };
}

/** Adds the steps, from sample to sample, of one node's upstroke; `offset` is the first sample's time after activation. */
function addUpstroke(steps: Float64Array, offset: number, body: Float64Array, node: number): void {
  const wx = body[3 * node] * millivoltsPerArea;
  const wy = body[3 * node + 1] * millivoltsPerArea;
  const wz = body[3 * node + 2] * millivoltsPerArea;
  const stride = upstrokeStepsPerMs;
  const table = upstrokeTable;
  const first = Math.ceil(-upstrokeReachMs - offset);
  // Rounding may leave the first place a hair below the table.
  const place = Math.max(0, (first + offset + upstrokeReachMs) * stride);
  let k = Math.floor(place);
  const share = place - k;
  let previous = 0;
  let at = 3 * first;
  for (; k + 1 < table.length; k += stride, at += 3) {
    const rise = table[k] + share * (table[k + 1] - table[k]);
    const step = rise - previous;
    previous = rise;
    steps[at] += wx * step;
    steps[at + 1] += wy * step;
    steps[at + 2] += wz * step;
  }
  steps[at] += wx * (1 - previous);
  steps[at + 1] += wy * (1 - previous);
  steps[at + 2] += wz * (1 - previous);
}
