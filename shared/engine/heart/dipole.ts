import {
  recoveryStepsPerMs,
  tabulateRecovery,
  upstrokeReachMs,
  upstrokeStepsPerMs,
  upstrokeTable,
  type RecoveryTable,
} from './action-potential';
import type { Activation } from './activation';
import { firstSampleMs, settledSampleMs } from './depolarization';
import { millivoltsPerArea, type DipoleTrace } from './dipole-trace';
import { actionPotential } from './heart-model-data';
import { addRecoverySum, recoveryMarginMs } from './recovery-sum';
import type { Ventricles } from './ventricles';

/**
 * The heart vector: sum over the closed surface of membrane voltage times area vector, from rest to rest. The first
 * and the last sample are exactly zero.
 *
 * @param durationsMs action potential duration of every node, made with the same rate factor
 */
export function sumDipole(
  ventricles: Ventricles,
  activation: Activation,
  durationsMs: Float64Array,
  rateFactor: number,
): DipoleTrace {
  let longestMs = 0;
  let latestEndMs = -Infinity;
  for (let i = 0; i < durationsMs.length; i++) {
    longestMs = Math.max(longestMs, durationsMs[i]);
    latestEndMs = Math.max(latestEndMs, activation.timesMs[i] + durationsMs[i]);
  }
  const recovery = tabulateRecovery(rateFactor, longestMs + upstrokeReachMs + recoveryMarginMs);
  const startMs = firstSampleMs(activation);
  const sampleCount = Math.ceil(latestEndMs + recovery.lastMs) + recoveryMarginMs - startMs + 1;
  const trace: DipoleTrace = { startMs, sampleCount, values: new Float64Array(3 * sampleCount) };
  const settled = Math.min(sampleCount, settledSampleMs(activation) - startMs);
  const { body } = ventricles.weights;
  for (let node = 0; node < durationsMs.length; node++) {
    if (body[3 * node] === 0 && body[3 * node + 1] === 0 && body[3 * node + 2] === 0) continue;
    addNode(trace, settled, body, node, activation.timesMs[node], durationsMs[node], recovery);
  }
  addRecoverySum(trace, settled, body, activation, durationsMs, recovery);
  return trace;
}

/** Adds one node's action potential up to the sample before `settled`. */
function addNode(
  { startMs, values: total }: DipoleTrace,
  settled: number,
  body: Float64Array,
  node: number,
  activatedMs: number,
  durationMs: number,
  recovery: RecoveryTable,
): void {
  const wx = body[3 * node] * millivoltsPerArea;
  const wy = body[3 * node + 1] * millivoltsPerArea;
  const wz = body[3 * node + 2] * millivoltsPerArea;
  const { values, firstMs, lastMs } = recovery;
  const offset = startMs - activatedMs;
  const first = Math.ceil(-upstrokeReachMs - offset);
  const flat = Math.min(settled, Math.floor(upstrokeReachMs - offset) + 1);
  const end = Math.min(settled, Math.floor(lastMs + durationMs - offset));
  // One sample is a whole number of table steps, so the interpolation share is the same for all samples of a node.
  const stride = recoveryStepsPerMs;
  const place = (first + offset - durationMs - firstMs) * stride;
  let k = Math.floor(place);
  const share = place - k;
  const slope = actionPotential.plateauSlopePerMs;
  const rises = upstrokeTable;
  const riseStride = upstrokeStepsPerMs;
  // Rounding may leave the first place a hair below the table.
  const risePlace = Math.max(0, (first + offset + upstrokeReachMs) * riseStride);
  let r = Math.floor(risePlace);
  const riseShare = risePlace - r;
  for (let j = first; j < flat; j++, k += stride, r += riseStride) {
    const s = j + offset;
    const plateau = s > 0 ? 1 - slope * s : 1;
    const rise = rises[r] + riseShare * (rises[r + 1] - rises[r]);
    const v = rise * plateau * (values[k] + share * (values[k + 1] - values[k]));
    total[3 * j] += wx * v;
    total[3 * j + 1] += wy * v;
    total[3 * j + 2] += wz * v;
  }
  let plateau = 1 - slope * (flat + offset);
  for (let at = 3 * flat; at < 3 * end; at += 3, k += stride) {
    const v = plateau * (values[k] + share * (values[k + 1] - values[k]));
    total[at] += wx * v;
    total[at + 1] += wy * v;
    total[at + 2] += wz * v;
    plateau -= slope;
  }
}
