import { describe, expect, it } from 'vitest';
import { halveRate, halvingFilter } from '../../../shared/formats/halve-rate';
import { recordingOf } from '../../support/exports';

const rateHz = 2000;
const sine = (frequencyHz: number, length = 4000): number[] =>
  Array.from({ length }, (_, i) => Math.sin((2 * Math.PI * frequencyHz * i) / rateHz));

/** |H| of the filter at a frequency, by its definition as a sum. */
function gainAt(frequencyHz: number): number {
  const filter = halvingFilter();
  const angle = (i: number): number => (2 * Math.PI * frequencyHz * i) / rateHz;
  const real = filter.reduce((sum, value, i) => sum + value * Math.cos(angle(i)), 0);
  const imaginary = filter.reduce((sum, value, i) => sum + value * Math.sin(angle(i)), 0);
  return Math.hypot(real, imaginary);
}

describe('half the rate', () => {
  it('passes to 400 Hz, halves at 450 Hz, and keeps what would fold below −50 dB', () => {
    for (const frequency of [0, 40, 150, 300, 400]) {
      expect(Math.abs(20 * Math.log10(gainAt(frequency)))).toBeLessThan(0.03);
    }
    expect(20 * Math.log10(gainAt(450))).toBeCloseTo(-6, 0);
    for (const frequency of [500, 600, 800, 1000]) {
      expect(20 * Math.log10(gainAt(frequency))).toBeLessThan(-50);
    }
  });

  it('leaves time, level and a slow signal where they were', () => {
    const { leads, sampleRateHz } = halveRate(recordingOf(sine(10), { sampleRateHz: rateHz }));
    expect(sampleRateHz).toBe(1000);
    expect(leads.V1).toHaveLength(2000);
    const inner = leads.V1.subarray(50, -50);
    const worst = inner.reduce(
      (most, value, k) => Math.max(most, Math.abs(value - Math.sin((2 * Math.PI * 10 * (k + 50)) / 1000))),
      0,
    );
    // Half a quantiser step of 5 µV, and 0.02 dB.
    expect(worst).toBeLessThan(0.0025 + 0.0025);
  });

  it('removes what the new rate cannot hold', () => {
    const { leads } = halveRate(recordingOf(sine(700), { sampleRateHz: rateHz }));
    expect(Math.max(...leads.V1.subarray(50, -50))).toBeLessThanOrEqual(0.005);
  });

  it('takes the odd last sample along, and derives limb leads from I and II', () => {
    const { leads } = halveRate(recordingOf(sine(10, 401), { sampleRateHz: rateHz }));
    expect(leads.II).toHaveLength(201);
    leads.III.forEach((value, i) => expect(value).toBeCloseTo(leads.II[i] - leads.I[i], 6));
    leads.aVF.forEach((value, i) => expect(value).toBeCloseTo(leads.II[i] - leads.I[i] / 2, 6));
  });

  it('holds a constant to the very ends', () => {
    const { leads } = halveRate(recordingOf(new Array<number>(500).fill(0.5), { sampleRateHz: rateHz }));
    expect(new Set(leads.V4)).toEqual(new Set([0.5]));
  });
});
