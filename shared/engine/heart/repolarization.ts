import { apdModel } from './heart-model-data';
import type { Activation } from './activation';
import type { Ventricles } from './ventricles';

/** Length over which the apical gradient is spread and where it is zero, mm along u. */
const apicalSpanMm = 40;
const apicalZeroU = 10;
/** Length of the lateral and inferior gradients, mm: about the epicardial radius. */
const radialSpanMm = 35;

/** Intrinsic APD pattern of every node, ms, before fading and without the activation term. */
function intrinsicPattern({ nodes }: Ventricles): Float64Array {
  return Float64Array.from({ length: nodes.count }, (_, i) => {
    const wall = nodes.walls[i];
    const [u, l, p] = nodes.positions.subarray(3 * i, 3 * i + 3);
    return (
      apdModel.transmural * apdModel.depth[wall] +
      (apdModel.apical * (u - apicalZeroU)) / apicalSpanMm +
      (apdModel.lateral * l) / radialSpanMm +
      (apdModel.inferior * p) / radialSpanMm +
      (wall === 'rvEndo' || wall === 'rvEpi' ? apdModel.rvFreeWall : 0)
    );
  });
}

const patterns = new WeakMap<Ventricles, Float64Array>();

function patternOf(ventricles: Ventricles): Float64Array {
  let pattern = patterns.get(ventricles);
  if (!pattern) {
    pattern = intrinsicPattern(ventricles);
    patterns.set(ventricles, pattern);
  }
  return pattern;
}

/** Area-weighted mean and standard deviation of the activation times, ms. */
export function activationSpread(
  { weights }: Ventricles,
  { timesMs }: Activation,
): { meanMs: number; sdMs: number } {
  let sum = 0;
  for (let i = 0; i < timesMs.length; i++) sum += weights.area[i] * timesMs[i];
  const meanMs = sum / weights.areaSum;
  let squares = 0;
  for (let i = 0; i < timesMs.length; i++) squares += weights.area[i] * (timesMs[i] - meanMs) ** 2;
  return { meanMs, sdMs: Math.sqrt(squares / weights.areaSum) };
}

/**
 * Action potential duration of every node, ms: intrinsic gradients (fading when activation is dispersed), less
 * where activation is late, all times the rate factor.
 */
export function actionPotentialDurations(
  ventricles: Ventricles,
  activation: Activation,
  rateFactor: number,
): Float64Array {
  const { meanMs, sdMs } = activationSpread(ventricles, activation);
  const excess = Math.max(0, sdMs - apdModel.dispersionOnsetMs);
  const gradient =
    apdModel.gradientMin + (1 - apdModel.gradientMin) * Math.exp(-excess / apdModel.dispersionScaleMs);
  const pattern = patternOf(ventricles);
  return activation.timesMs.map(
    (time, i) =>
      rateFactor * (apdModel.baseMs + gradient * pattern[i] - apdModel.activationSlope * (time - meanMs)),
  );
}
