import { recoveryStepsPerMs, type RecoveryTable } from './action-potential';
import type { Activation } from './activation';
import { millivoltsPerArea, type DipoleTrace } from './dipole-trace';
import { actionPotential } from './heart-model-data';

/** Weights that place a value between the 2nd and 3rd of four equally spaced points (cubic Lagrange), 0 <= x < 1. */
function cubicWeights(x: number): readonly [number, number, number, number] {
  return [
    (-x * (x - 1) * (x - 2)) / 6,
    ((x + 1) * (x - 1) * (x - 2)) / 2,
    (-(x + 1) * x * (x - 2)) / 2,
    ((x + 1) * x * (x - 1)) / 6,
  ];
}

/** Margin that the cubic weights need on either side of the end times, ms. */
export const recoveryMarginMs = 2;

interface EndTimes {
  /** Action potential end of the first bin, whole ms. */
  firstMs: number;
  /** For each ms: area (x, y, z), then area times (1 + slope · activation time), mV. */
  bins: Float64Array;
}

/** Collects the nodes' weights by the end of their action potentials, in bins of 1 ms. */
function binByEnd(body: Float64Array, activation: Activation, durationsMs: Float64Array): EndTimes {
  let earliest = Infinity;
  let latest = -Infinity;
  durationsMs.forEach((duration, i) => {
    earliest = Math.min(earliest, activation.timesMs[i] + duration);
    latest = Math.max(latest, activation.timesMs[i] + duration);
  });
  const firstMs = Math.floor(earliest) - recoveryMarginMs;
  const bins = new Float64Array(6 * (Math.floor(latest) + recoveryMarginMs - firstMs + 1));
  durationsMs.forEach((duration, i) => {
    const end = activation.timesMs[i] + duration;
    const whole = Math.floor(end);
    const tilt = 1 + actionPotential.plateauSlopePerMs * activation.timesMs[i];
    cubicWeights(end - whole).forEach((weight, w) => {
      const at = 6 * (whole - 1 + w - firstMs);
      const scaled = weight * millivoltsPerArea;
      for (let axis = 0; axis < 3; axis++) {
        bins[at + axis] += scaled * body[3 * i + axis];
        bins[at + 3 + axis] += scaled * tilt * body[3 * i + axis];
      }
    });
  });
  return { firstMs, bins };
}

/**
 * Adds the action potentials of all nodes from sample `settled` on, when every upstroke is complete. The voltage is
 * then (1 − slope (t − activation)) times a function of (t − end of action potential) alone, so nodes that end
 * together can be summed first: a convolution over end times instead of a sum over nodes.
 */
export function addRecoverySum(
  { startMs, sampleCount, values: total }: DipoleTrace,
  settled: number,
  body: Float64Array,
  activation: Activation,
  durationsMs: Float64Array,
  recovery: RecoveryTable,
): void {
  if (settled >= sampleCount) return;
  const { firstMs, bins } = binByEnd(body, activation, durationsMs);
  const binCount = bins.length / 6;
  const slope = actionPotential.plateauSlopePerMs;
  const stride = recoveryStepsPerMs;
  const { values } = recovery;
  for (let j = settled; j < sampleCount; j++) {
    const t = startMs + j;
    const firstBin = Math.max(0, t - recovery.lastMs - firstMs);
    let x = 0;
    let y = 0;
    let z = 0;
    let k = (t - firstMs - firstBin - recovery.firstMs) * stride;
    for (let b = firstBin; b < binCount; b++, k -= stride) {
      const at = 6 * b;
      const value = values[k];
      const declined = slope * t * value;
      x += bins[at + 3] * value - bins[at] * declined;
      y += bins[at + 4] * value - bins[at + 1] * declined;
      z += bins[at + 5] * value - bins[at + 2] * declined;
    }
    total[3 * j] = x;
    total[3 * j + 1] = y;
    total[3 * j + 2] = z;
  }
}
