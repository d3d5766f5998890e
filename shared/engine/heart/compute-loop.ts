import { degToRad } from '../../units';
import { activate, type Activation, type ActivationPattern } from './activation';
import { sumDepolarization } from './depolarization';
import { sumDipole } from './dipole';
import { injuredVentricles } from './injury';
import type { DipoleTrace } from './dipole-trace';
import { measureLoop, measureQrs, measureTEnd, type VentricularMeasures } from './loop-measures';
import { actionPotentialDurations } from './repolarization';
import { solveSpeedFactor } from './speed-factor';
import { loopStepMs, type VectorLoop } from './vector-loop';
import type { VentricularShape } from './ventricular-shape';
import { fittedVentricles, type Ventricles } from './ventricles';

/** Heart vector of one ventricular complex with what is measured on it. */
export interface VentricularLoop extends VectorLoop {
  measures: VentricularMeasures;
}

function toLoop({ startMs, sampleCount }: DipoleTrace, valueAt: (at: number) => number): VectorLoop {
  const axis = (offset: number): Float64Array => {
    const values = new Float64Array(sampleCount);
    for (let j = 0; j < sampleCount; j++) values[j] = valueAt(3 * j + offset);
    return values;
  };
  return { startMs, stepMs: loopStepMs, x: axis(0), y: axis(1), z: axis(2) };
}

function rotateFrontal({ x, y }: VectorLoop, angleDeg: number): void {
  const cos = Math.cos(degToRad(angleDeg));
  const sin = Math.sin(degToRad(angleDeg));
  for (let j = 0; j < x.length; j++) {
    const left = x[j];
    x[j] = left * cos - y[j] * sin;
    y[j] = left * sin + y[j] * cos;
  }
}

/** QRS limits, measured on the depolarization part alone: a T that follows early at fast rates is not QRS. */
function measureDepolarization(
  depolarization: DipoleTrace,
  activation: Activation,
  qrsScale: number,
): { onsetMs: number; offsetMs: number } {
  return measureQrs(
    toLoop(depolarization, (at) => qrsScale * depolarization.values[at]),
    activation,
  );
}

/**
 * Activation at the speed that gives the wanted QRS duration, measured as the finished complex is; at the fitted
 * speed when none is wanted.
 *
 * @throws when the pattern has no source
 */
export function activateToDuration(
  pattern: ActivationPattern,
  { qrsDurationMs, qrsScale }: Pick<VentricularShape, 'qrsDurationMs' | 'qrsScale'>,
  ventricles: Ventricles = fittedVentricles(),
): Activation {
  if (qrsDurationMs === null) return activate(ventricles, pattern);
  const speedFactor = solveSpeedFactor((factor) => {
    const activation = activate(ventricles, pattern, factor);
    const depolarization = sumDepolarization(ventricles, activation);
    const { onsetMs, offsetMs } = measureDepolarization(depolarization, activation, qrsScale);
    return offsetMs - onsetMs;
  }, qrsDurationMs);
  return activate(ventricles, pattern, speedFactor);
}

/** Ventricular complex that follows an activation. */
export function loopFromActivation(
  activation: Activation,
  { rateFactor, qrsScale, tScale, axisRotationDeg, injury }: VentricularShape,
  ventricles: Ventricles = fittedVentricles(),
): VentricularLoop {
  const durations = actionPotentialDurations(ventricles, activation, rateFactor);
  const total = sumDipole(ventricles, activation, durations, rateFactor);
  const depolarization = sumDepolarization(ventricles, activation);
  // Both start at the same sample; depolarization is zero after its own end.
  const depolarizationAt = (at: number): number => depolarization.values[at] ?? 0;
  const repolarizationAt = (at: number): number => total.values[at] - depolarizationAt(at);
  // Muscle that lost part of its plateau: what is missing is the same for any scale of T.
  const hurt = injury && sumDipole(injuredVentricles(injury), activation, durations, rateFactor);
  const injuryAt = (at: number): number => (hurt ? hurt.values[at] - total.values[at] : 0);
  const loop = toLoop(
    total,
    (at) => qrsScale * (depolarizationAt(at) + tScale * repolarizationAt(at) + injuryAt(at)),
  );
  if (axisRotationDeg !== 0) rotateFrontal(loop, axisRotationDeg);
  const qrs = measureDepolarization(depolarization, activation, qrsScale);
  const tEndMs = measureTEnd(toLoop(total, repolarizationAt), qrs.offsetMs);
  return { ...loop, measures: measureLoop(loop, activation, qrs, tEndMs) };
}

/**
 * Computes a ventricular complex from its sources; nothing is kept between calls but the mesh.
 *
 * @param ventricles other than the fitted ones for tests only
 * @throws when the pattern has no source
 */
export function computeVentricularLoop(
  pattern: ActivationPattern,
  shape: VentricularShape,
  ventricles: Ventricles = fittedVentricles(),
): VentricularLoop {
  return loopFromActivation(activateToDuration(pattern, shape, ventricles), shape, ventricles);
}
