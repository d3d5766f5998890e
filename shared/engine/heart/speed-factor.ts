/** Limits of the speed factor: conduction at a quarter of, and four times, the fitted speeds. */
export const speedFactorLimits = { min: 0.25, max: 4 } as const;

const maxTrials = 14;
/** Durations are whole ms, so this is exact for whole targets. */
const toleranceMs = 0.5;

/**
 * Speed factor at which a QRS lasts `targetMs`.
 *
 * Duration is nearly linear in slowness (1/factor), so the search is a secant on slowness kept inside a bracket, with
 * bisection when the secant stalls. Where the target cannot be reached (source times set a floor, or the limits of
 * the factor are met) the factor that comes nearest is returned.
 *
 * @param durationMs QRS duration at a speed factor; falls (roughly) as the factor rises
 */
export function solveSpeedFactor(durationMs: (speedFactor: number) => number, targetMs: number): number {
  const slowest = 1 / speedFactorLimits.min;
  const fastest = 1 / speedFactorLimits.max;
  let slowness = 1;
  let best = { slowness, error: Infinity };
  let tooShort: { slowness: number; ms: number } | null = null;
  let tooLong: { slowness: number; ms: number } | null = null;
  for (let trial = 0; trial < maxTrials; trial++) {
    const ms = durationMs(1 / slowness);
    const error = Math.abs(ms - targetMs);
    if (error < best.error) best = { slowness, error };
    if (error <= toleranceMs) break;
    if (ms < targetMs) tooShort = { slowness, ms };
    else tooLong = { slowness, ms };
    let next: number;
    if (tooShort && tooLong) {
      const share = (targetMs - tooShort.ms) / (tooLong.ms - tooShort.ms);
      const secant = tooShort.slowness + share * (tooLong.slowness - tooShort.slowness);
      const middle = (tooShort.slowness + tooLong.slowness) / 2;
      next = trial % 3 === 2 ? middle : secant;
    } else {
      next = Math.min(slowest, Math.max(fastest, (slowness * targetMs) / ms));
    }
    if (next === slowness) break;
    slowness = next;
  }
  return 1 / best.slowness;
}
