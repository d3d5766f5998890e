import Fili, { type FiliBiquad } from 'fili';

/** A second-order section of a filter, or a first-order one with b2 = a2 = 0. */
export type Section = FiliBiquad;

/** Width of the mains notch in octaves: 3.5 Hz at 50 Hz (chosen: narrow enough to leave the QRS alone). */
export const notchWidthOctaves = 0.1;

/** Sections of the low-pass. fili counts sections, so two make the fourth order that keeps aliases out. */
const lowPassSections = 2;

/**
 * First-order high-pass with −3.01 dB at `lowHz`, by the bilinear transform prewarped at that frequency.
 * First order, because it leaves 0.093 mV of the 0.3 mV·s pulse (BW-26 allows 0.1) where a second-order one
 * leaves 0.132.
 */
export function highPass(lowHz: number, rateHz: number): Section {
  const k = Math.tan((Math.PI * lowHz) / rateHz);
  const n = 1 / (1 + k);
  return { k: 1, a: [(k - 1) * n, 0], b: [n, -n, 0], z: [0, 0] };
}

/** Fourth-order Butterworth low-pass with −3.01 dB at `highHz`, designed by fili. */
export function lowPass(highHz: number, rateHz: number): Section[] {
  return new Fili.CalcCascades().lowpass({
    order: lowPassSections,
    characteristic: 'butterworth',
    Fs: rateHz,
    Fc: highHz,
    gain: 0,
    preGain: false,
  });
}

/** Mains notch at `centreHz`, designed by fili. */
export function notch(centreHz: number, rateHz: number): Section[] {
  return new Fili.CalcCascades().bandstop({
    order: 1,
    characteristic: 'butterworth',
    Fs: rateHz,
    Fc: centreHz,
    BW: notchWidthOctaves,
    gain: 0,
    preGain: false,
  });
}

/** Group delay at 0 Hz of sections with gain at 0 Hz, in samples. */
export function delayAtZeroHz(sections: readonly Section[]): number {
  // For H = B/A the group delay at z = 1 is sum(k b_k)/sum(b_k) − sum(k a_k)/sum(a_k).
  return sections.reduce((delay, { a, b }) => {
    const numerator = (b[1] + 2 * b[2]) / (b[0] + b[1] + b[2]);
    const denominator = (a[0] + 2 * a[1]) / (1 + a[0] + a[1]);
    return delay + numerator - denominator;
  }, 0);
}

/** |H| of a cascade at a frequency. */
export function magnitudeAt(sections: readonly Section[], frequencyHz: number, rateHz: number): number {
  if (sections.length === 0) return 1;
  return new Fili.IirFilter([...sections]).responsePoint({ Fs: rateHz, Fr: frequencyHz }).magnitude;
}
