import { loopStepMs, type VectorLoop } from './vector-loop';

/** Zero samples on either side, so that interpolation starts and ends at rest. */
const paddingSamples = 2;
/** Amplitude of the sinus P wave that the sizes below belong to, mV (the schema's default). */
const referencePAmplitudeMv = 0.12;

type Vector = readonly [number, number, number];

function sampled(durationMs: number, direction: Vector, valueAt: (phase: number) => number): VectorLoop {
  const length = Math.ceil(durationMs) + 2 * paddingSamples + 1;
  const loop: VectorLoop = {
    startMs: -paddingSamples,
    stepMs: loopStepMs,
    x: new Float64Array(length),
    y: new Float64Array(length),
    z: new Float64Array(length),
  };
  for (let i = 0; i < length; i++) {
    const phase = (i - paddingSamples) / durationMs;
    const value = phase > 0 && phase < 1 ? valueAt(phase) : 0;
    loop.x[i] = direction[0] * value;
    loop.y[i] = direction[1] * value;
    loop.z[i] = direction[2] * value;
  }
  return loop;
}

/** Saw teeth that point down in II, III and aVF and up in V1 (typical flutter; common practice, no source). */
const flutterDirection: Vector = [-0.12, -0.95, -0.3];
/** Half of a saw tooth's height, mV (common practice, no source). */
const flutterMv = 0.12;
/** Harmonics of a saw tooth; few, since the heart rounds its corners. */
const sawHarmonics = [1, 0.45, 0.2, 0.08] as const;

/**
 * One wave of atrial flutter, as long as its cycle, so that wave follows wave without a flat line between.
 *
 * @param pAmplitudeMv size of a sinus P wave; flutter waves scale with it
 */
export function flutterLoop(cycleMs: number, pAmplitudeMv: number): VectorLoop {
  const gain = (flutterMv * pAmplitudeMv) / referencePAmplitudeMv;
  return sampled(cycleMs, flutterDirection, (phase) =>
    sawHarmonics.reduce((sum, share, i) => sum + gain * share * Math.sin(2 * Math.PI * (i + 1) * phase), 0),
  );
}

/** Mean direction of f waves: largest in V1 and II (common practice, no source). */
const fibrillationDirection: Vector = [0.25, 0.55, -0.8];
/** Size of an f wave, mV (common practice, no source: fine to coarse, 0.05 to 0.2 mV). */
const fibrillationMv = 0.11;
/** f waves overlap: each lasts this many cycles. */
const fibrillationOverlap = 1.6;
/** How far size and direction of single waves stray from the mean. */
const fibrillationSpread = 0.7;

/**
 * One f wave of atrial fibrillation: no two alike. Their dominant frequency is the atrial rate's (4 to 9 Hz at 240 to
 * 540 /min; NR-24, from memory).
 *
 * @param chance four numbers in [0, 1) that decide size and direction
 */
export function fibrillationLoop(
  cycleMs: number,
  pAmplitudeMv: number,
  chance: readonly [number, number, number, number],
): VectorLoop {
  const stray = (one: number): number => fibrillationSpread * (2 * one - 1);
  const gain = ((fibrillationMv * pAmplitudeMv) / referencePAmplitudeMv) * (1 + stray(chance[0]));
  const [dx, dy, dz] = fibrillationDirection;
  const direction: Vector = [dx + stray(chance[1]), dy + stray(chance[2]), dz + stray(chance[3])];
  const durationMs = fibrillationOverlap * cycleMs;
  return sampled(
    durationMs,
    direction,
    (phase) => gain * Math.sin(2 * Math.PI * fibrillationOverlap * phase) * Math.sin(Math.PI * phase) ** 2,
  );
}
