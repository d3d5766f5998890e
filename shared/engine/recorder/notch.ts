import Fili from 'fili';
import type { Section } from './section';

/** Width of the mains notch in octaves: 3.5 Hz at 50 Hz (chosen: narrow enough to leave the QRS alone). */
export const notchWidthOctaves = 0.1;

/**
 * Mains notch: one second-order section with a zero at `centreHz` (BW-50), −3.01 dB at the two edges of its
 * width; designed by fili.
 */
export function notch(centreHz: number, rateHz: number): Section {
  return new Fili.CalcCascades().bandstop({
    order: 1,
    characteristic: 'butterworth',
    Fs: rateHz,
    Fc: centreHz,
    BW: notchWidthOctaves,
    gain: 0,
    preGain: false,
  })[0];
}
