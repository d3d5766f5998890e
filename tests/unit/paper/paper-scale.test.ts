import { describe, expect, it } from 'vitest';
import {
  cssPxToMm,
  mmToLargeBoxes,
  mmToMs,
  mmToMv,
  mmToPx,
  mmToRatePerMinute,
  msToMm,
  mvToMm,
  pxToMm,
  sToMm,
} from '../../../shared/paper/paper-scale';
import { msPerMinute } from '../../../shared/units';

// Worked examples D01 to D04 ("rate and paper arithmetic", trade arithmetic, common practice).

describe('worked examples of rate and paper', () => {
  it('D01: rates from the paper agree with their intervals', () => {
    const ratesPerMinute = [30, 40, 50, 60, 70, 75, 80, 100, 120, 130, 150, 300];
    const intervalsMs = [2000, 1500, 1200, 1000, 857.142857, 800, 750, 600, 500, 461.538462, 400, 200];
    ratesPerMinute.forEach((rate, i) => {
      expect(msPerMinute / rate).toBeCloseTo(intervalsMs[i], 6);
      for (const speed of [25, 50] as const) {
        expect(mmToRatePerMinute(msToMm(msPerMinute / rate, speed), speed)).toBeCloseTo(rate, 9);
      }
    });
  });

  it('D02: intervals in millimetres, large boxes and rate at 25 mm/s', () => {
    const intervalsMs = [200, 400, 600, 800, 857.142857, 1000, 1200];
    const mm = [5, 10, 15, 20, 21.4285714, 25, 30];
    const largeBoxes = [1, 2, 3, 4, 4.28571429, 5, 6];
    const ratesPerMinute = [300, 150, 100, 75, 70, 60, 50];
    intervalsMs.forEach((interval, i) => {
      const length = msToMm(interval, 25);
      expect(length).toBeCloseTo(mm[i], 6);
      expect(mmToLargeBoxes(length)).toBeCloseTo(largeBoxes[i], 6);
      expect(mmToRatePerMinute(length, 25)).toBeCloseTo(ratesPerMinute[i], 6);
      expect(mmToMs(length, 25)).toBeCloseTo(interval, 9);
    });
  });

  it('D03: amplitudes on paper', () => {
    const voltagesMv = [0.1, 0.5, 1, 1.5, 2];
    const heightsMm = { 5: [0.5, 2.5, 5, 7.5, 10], 10: [1, 5, 10, 15, 20], 20: [2, 10, 20, 30, 40] };
    for (const gain of [5, 10, 20] as const) {
      voltagesMv.forEach((voltage, i) => {
        expect(mvToMm(voltage, gain)).toBeCloseTo(heightsMm[gain][i], 9);
        expect(mmToMv(heightsMm[gain][i], gain)).toBeCloseTo(voltage, 9);
      });
    }
  });

  it('D04: ten seconds at 25 mm/s are 250 mm, and a sample at 500/s is 0.05 mm', () => {
    expect(sToMm(10, 25)).toBe(250);
    expect(sToMm(1 / 500, 25)).toBe(0.05);
  });
});

describe('pixels', () => {
  it('are 10 to the millimetre at 254 dpi, and there and back again at any density', () => {
    expect(mmToPx(1, 254)).toBeCloseTo(10, 12);
    expect(pxToMm(mmToPx(7.3, 300), 300)).toBeCloseTo(7.3, 12);
  });

  it('of CSS are 1/96 inch', () => {
    expect(cssPxToMm(96)).toBeCloseTo(25.4, 12);
  });
});
