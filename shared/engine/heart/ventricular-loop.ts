import type { Activation, ActivationPattern } from './activation';
import { activateToDuration, loopFromActivation, type VentricularLoop } from './compute-loop';
import { createLruCache } from './lru-cache';
import type { VentricularShape } from './ventricular-shape';

export type { VentricularLoop } from './compute-loop';
export type { VentricularMeasures, VentricularLeadMeasures } from './loop-measures';
export type { VentricularShape } from './ventricular-shape';
export { rateFactorForQt } from './rate-factor';

/** A loop takes about 20 kB. */
const keptLoops = 128;
const loops = createLruCache<VentricularLoop>(keptLoops);
/** Activation is kept apart: beats that differ in rate only share it. */
const keptActivations = 32;
const activations = createLruCache<Activation>(keptActivations);

/** Source times are taken to whole µs, shape numbers to 1e-6: beats that differ by less share a loop. */
const timeDecimals = 3;
const shapeDecimals = 6;

function rounded(value: number, decimals: number): number {
  // Adding zero turns −0 into 0, which would make a key of its own.
  return Number(value.toFixed(decimals)) + 0;
}

function roundPattern({ muscle, fascicles }: ActivationPattern): ActivationPattern {
  return {
    muscle: muscle
      .map(({ site, timeMs }) => ({ site, timeMs: rounded(timeMs, timeDecimals) }))
      .sort((a, b) => a.timeMs - b.timeMs || a.site.localeCompare(b.site)),
    fascicles: fascicles
      .map(({ fascicle, timeMs }) => ({ fascicle, timeMs: rounded(timeMs, timeDecimals) }))
      .sort((a, b) => a.timeMs - b.timeMs || a.fascicle.localeCompare(b.fascicle)),
  };
}

function roundShape(shape: VentricularShape): VentricularShape {
  return {
    rateFactor: rounded(shape.rateFactor, shapeDecimals),
    qrsDurationMs: shape.qrsDurationMs === null ? null : rounded(shape.qrsDurationMs, timeDecimals),
    qrsScale: rounded(shape.qrsScale, shapeDecimals),
    axisRotationDeg: rounded(shape.axisRotationDeg, shapeDecimals),
    tScale: rounded(shape.tScale, shapeDecimals),
    injury: shape.injury && {
      ...shape.injury,
      stElevationMv: rounded(shape.injury.stElevationMv, shapeDecimals),
    },
  };
}

/**
 * Heart vector of one ventricular depolarization and its repolarization, mV at 1 ms, exactly zero at both ends.
 * Sample i is at startMs + i on the pattern's clock. The last 128 loops are kept and shared: do not write to them.
 *
 * @param shape `qrsDurationMs` (70 … 240) is met within 1 ms for every single source, bundle branch block and pair of
 *   ventricular leads; in fused beats the end of the QRS can jump, and the nearest duration is given (at worst 5 ms
 *   off). Nothing is thrown for a duration out of reach
 * @throws when the pattern has no source
 */
export function ventricularLoop(pattern: ActivationPattern, shape: VentricularShape): VentricularLoop {
  const sources = roundPattern(pattern);
  const form = roundShape(shape);
  return loops.get(JSON.stringify([sources, form]), () => {
    const { qrsDurationMs, qrsScale } = form;
    // The scale matters to the measured duration only, hence only when a duration is wanted.
    const key = JSON.stringify([sources, qrsDurationMs, qrsDurationMs === null ? 1 : qrsScale]);
    const activation = activations.get(key, () => activateToDuration(sources, form));
    return loopFromActivation(activation, form);
  });
}
