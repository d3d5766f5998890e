import type { Section } from './section';

/**
 * First-order high-pass with −3.01 dB at `lowHz`, by the bilinear transform prewarped at that frequency
 * (textbook, from memory; fili has no odd Butterworth orders).
 *
 * First order, because it leaves 0.093 mV of the 0.3 mV·s pulse (BW-26 allows 0.1) where a second-order one
 * leaves 0.132.
 *
 * @param lowHz above 0 and below half of `rateHz`
 */
export function highPass(lowHz: number, rateHz: number): Section {
  const k = Math.tan((Math.PI * lowHz) / rateHz);
  const n = 1 / (1 + k);
  return { k: 1, a: [(k - 1) * n, 0], b: [n, -n, 0], z: [0, 0] };
}
