import { describe, expect, it } from 'vitest';
import {
  areaExact,
  pacingPulseTest,
  rectangle,
  repeated,
  testSignals,
  trapezoid,
  triangle,
} from '../../../shared/recorder-bench/test-signals';
import type { Signal } from '../../../shared/recorder-bench/record-signal';

/** Area by the midpoint rule, mV·s. */
function area(signal: Signal, fromS: number, toS: number, steps: number): number {
  const step = (toS - fromS) / steps;
  let sum = 0;
  for (let i = 0; i < steps; i++) sum += signal(fromS + (i + 0.5) * step);
  return sum * step;
}

describe('test signals', () => {
  it('have the areas that their shapes say', () => {
    expect(area(rectangle(0.1), -0.1, 0.3, 40_000)).toBeCloseTo(0.1, 6);
    expect(area(triangle(0.02), -0.1, 0.3, 40_000)).toBeCloseTo(0.01, 6);
    expect(area(trapezoid(0.001, 0.0001), -0.01, 0.01, 200_000)).toBeCloseTo(0.001, 6);
  });

  it('keep the area of a pulse shorter than a sample wherever it falls on the grid', () => {
    // 0.1 ms is less than a sample at 8 kHz: plain sampling sees one sample of it or none.
    const rateHz = 8000;
    const pulse = areaExact(rectangle(0.0001), rateHz);
    for (const shift of [0, 0.13, 0.5, 0.77]) {
      let sum = 0;
      for (let i = -8; i < 8; i++) sum += pulse((i + shift) / rateHz) / rateHz;
      expect(sum).toBeGreaterThan(0.9 * 0.0001);
      expect(sum).toBeLessThan(1.1 * 0.0001);
    }
  });

  it('come again every period and not before their time', () => {
    const signal = repeated(rectangle(0.1), 0.6, 0.3);
    expect([0, 0.29, 0.35, 0.45, 0.95, 1.05].map(signal)).toEqual([0, 0, 1, 0, 1, 0]);
  });

  it('hold the pulses of the standards', () => {
    // IEC 60601-2-25:2011, 201.12.4.107: 0.3 mV·s.
    expect(area(testSignals.pulse.signal, 0, 6, 60_000)).toBeCloseTo(0.3, 4);
    // 200 mV, 1 ms, edges of 100 µs, above 1 mV peak to valley at 40 Hz, whose area over a period is nothing.
    expect(area(pacingPulseTest(), 0.3, 0.9, 600_000)).toBeCloseTo(0.2, 4);
    const top = Math.max(...Array.from({ length: 1000 }, (_, i) => pacingPulseTest(0)(i / 40_000)));
    expect(top).toBeCloseTo(0.5, 4);
  });
});
