import { activationPattern } from './activation-pattern';
import { computeVentricularLoop } from './compute-loop';
import { createLruCache } from './lru-cache';
import { nativeShape } from './ventricular-shape';

/** First guess: QT of the native normal beat is about 62 + 348 f ms. */
const qtInterceptMs = 62;
const qtSlopeMs = 348;
/** Above, the falling plateau would reach zero before recovery; below, cells would recover while others still fire. */
const rateFactorLimits = { min: 0.2, max: 2.2 } as const;

const corrections = 2;
const factors = createLruCache<number>(256);

function clamp(factor: number): number {
  return Math.min(rateFactorLimits.max, Math.max(rateFactorLimits.min, factor));
}

function normalQtMs(rateFactor: number): number {
  const pattern = activationPattern([{ kind: 'conducted', timeMs: 0 }], 'none');
  return computeVentricularLoop(pattern, { ...nativeShape, rateFactor }).measures.qtMs;
}

/**
 * Factor on all action potential durations with which the native normal beat has this QT. Within 0.5 ms for
 * targets of 170 to 750 ms; outside, the factor is held at 0.2 or 2.2. Paced and blocked beats get a longer QT
 * with the same factor, by themselves.
 */
export function rateFactorForQt(targetQtMs: number): number {
  return factors.get(targetQtMs.toFixed(3), () => {
    let factor = clamp((targetQtMs - qtInterceptMs) / qtSlopeMs);
    for (let i = 0; i < corrections; i++) {
      factor = clamp(factor + (targetQtMs - normalQtMs(factor)) / qtSlopeMs);
    }
    return factor;
  });
}
