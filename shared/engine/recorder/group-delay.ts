import type { Section } from './section';

/**
 * Group delay at 0 Hz of a cascade, in samples. Only for sections that pass 0 Hz (a low-pass, not a high-pass).
 *
 * For H = B/A it is B'(1)/B(1) − A'(1)/A(1), where ' weighs each coefficient with its own delay.
 */
export function delayAtZeroHz(sections: readonly Section[]): number {
  return sections.reduce((delay, { a, b }) => {
    const numerator = (b[1] + 2 * b[2]) / (b[0] + b[1] + b[2]);
    const denominator = (a[0] + 2 * a[1]) / (1 + a[0] + a[1]);
    return delay + numerator - denominator;
  }, 0);
}
