import Fili from 'fili';
import type { Section } from './section';

/**
 * Butterworth low-pass with −3.01 dB at `highHz` (bilinear, prewarped), designed by fili.
 *
 * @param sectionCount second-order sections: fili's `order`, so half of the filter's order; a whole number
 * from 1 to 12
 */
export function lowPass(highHz: number, rateHz: number, sectionCount: number): Section[] {
  return new Fili.CalcCascades().lowpass({
    order: sectionCount,
    characteristic: 'butterworth',
    Fs: rateHz,
    Fc: highHz,
    gain: 0,
    preGain: false,
  });
}
