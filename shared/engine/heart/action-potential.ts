import { actionPotential } from './heart-model-data';

const { upstrokeSigmaMs, recoveryTau1Ms, recoveryTau2Ms } = actionPotential;

/** Half-width of the upstroke, whole ms: six standard deviations, beyond which 1e-9 of it is left. */
export const upstrokeReachMs = Math.ceil(6 * upstrokeSigmaMs);
/** Table steps per ms: linear interpolation is then within 1e-5 of the curve. */
export const upstrokeStepsPerMs = 16;

/** Recovery is followed until it has decayed by this many times e after the action potential's end. */
const recoveryDecays = 16;
export const recoveryStepsPerMs = 4;

function gaussianDensity(x: number): number {
  return Math.exp(-0.5 * x * x) / Math.sqrt(2 * Math.PI);
}

/** Normal distribution function at s/sigma, tabulated over ±reach by Simpson's rule, made exactly symmetric. */
function tabulateUpstroke(): Float64Array {
  const half = upstrokeReachMs * upstrokeStepsPerMs;
  const table = new Float64Array(2 * half + 2);
  const step = 1 / (upstrokeStepsPerMs * upstrokeSigmaMs);
  table[half] = 0.5;
  for (let k = 0; k < half; k++) {
    const x = k * step;
    const area =
      (step / 6) * (gaussianDensity(x) + 4 * gaussianDensity(x + step / 2) + gaussianDensity(x + step));
    table[half + k + 1] = table[half + k] + area;
  }
  for (let k = 1; k <= half; k++) table[half - k] = 1 - table[half + k];
  table[2 * half + 1] = 1;
  return table;
}

/** Share of the upstroke done, `upstrokeStepsPerMs` entries a ms from −reach to reach, with one entry to spare. */
export const upstrokeTable = tabulateUpstroke();

/** Recovery as a function of the time q after the action potential's end, tabulated. */
export interface RecoveryTable {
  /** q of the first entry, ms. */
  firstMs: number;
  /** Last q to look up, ms; after it the cell counts as recovered. */
  lastMs: number;
  /** Product of two falling logistics, `recoveryStepsPerMs` entries a ms, with one entry to spare. */
  values: Float64Array;
}

/**
 * Tabulates 1 / ((1 + exp(q/tau1)) (1 + exp(q/tau2))); two time constants give the asymmetric T. Both stretch
 * with the square root of the rate factor.
 *
 * @param longestMs earliest q needed is −longestMs
 */
export function tabulateRecovery(rateFactor: number, longestMs: number): RecoveryTable {
  const stretch = Math.sqrt(rateFactor);
  const tau1 = recoveryTau1Ms * stretch;
  const tau2 = recoveryTau2Ms * stretch;
  const lastMs = Math.ceil((recoveryDecays * tau1 * tau2) / (tau1 + tau2));
  const firstMs = -Math.ceil(longestMs);
  const values = new Float64Array((lastMs - firstMs) * recoveryStepsPerMs + 2);
  const growth1 = Math.exp(1 / (recoveryStepsPerMs * tau1));
  const growth2 = Math.exp(1 / (recoveryStepsPerMs * tau2));
  let e1 = Math.exp(firstMs / tau1);
  let e2 = Math.exp(firstMs / tau2);
  for (let k = 0; k < values.length; k++) {
    values[k] = 1 / ((1 + e1) * (1 + e2));
    e1 *= growth1;
    e2 *= growth2;
  }
  return { firstMs, lastMs, values };
}
