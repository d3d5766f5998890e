import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  columnMm,
  simplifyToleranceMm,
  tracePolylines,
  type TracePlacement,
} from '../../../shared/paper/trace';
import { coordinates, heightAt } from './items';

const place = (sampleRateHz: number, more: Partial<TracePlacement> = {}): TracePlacement => ({
  sampleRateHz,
  speedMmPerS: 25,
  gainMmPerMv: 10,
  xMm: 100,
  baselineMm: 50,
  topMm: 0,
  bottomMm: 100,
  ...more,
});

const wave = (sampleRateHz: number, durationS: number) =>
  Float32Array.from({ length: sampleRateHz * durationS }, (_, i) =>
    Math.sin((2 * Math.PI * 3 * i) / sampleRateHz),
  );

describe('placement', () => {
  it('1 s is 25 or 50 mm, 1 mV is 5, 10 or 20 mm, up the paper', () => {
    const step = Float32Array.from({ length: 501 }, (_, i) => (i < 250 ? 0 : 1));
    for (const speedMmPerS of [25, 50]) {
      for (const gainMmPerMv of [5, 10, 20]) {
        const [points] = tracePolylines(step, { fromS: 0, toS: 2 }, place(500, { speedMmPerS, gainMmPerMv }));
        const { x, y } = coordinates(points);
        expect(x[x.length - 1] - x[0]).toBeCloseTo(speedMmPerS, 9);
        expect(Math.max(...y) - Math.min(...y)).toBeCloseTo(gainMmPerMv, 9);
        expect(y[0]).toBe(50);
        expect(y[y.length - 1]).toBeCloseTo(50 - gainMmPerMv, 9);
      }
    }
  });

  it('takes the samples from its start on and leaves its end to the next segment', () => {
    const ramp = Float32Array.from({ length: 1000 }, (_, i) => i / 1000);
    const [points] = tracePolylines(ramp, { fromS: 0.5, toS: 1 }, place(500));
    const { x, y } = coordinates(points);
    expect(x[0]).toBeCloseTo(100, 9);
    expect(y[0]).toBeCloseTo(50 - 2.5, 5);
    expect(x[x.length - 1]).toBeCloseTo(100 + (0.5 - 1 / 500) * 25, 9);
  });

  it('runs along the pen stops beyond them', () => {
    const samples = Float32Array.of(0, 30, 30, -30, 0);
    const { y } = coordinates(tracePolylines(samples, { fromS: 0, toS: 1 }, place(250))[0]);
    expect([Math.min(...y), Math.max(...y)]).toEqual([0, 100]);
  });

  it('breaks at a gap and drops a lone sample', () => {
    const samples = Float32Array.of(0, 1, NaN, 1, NaN, 0, 1, 0);
    const runs = tracePolylines(samples, { fromS: 0, toS: 1 }, place(250));
    expect(runs.map((points) => points[0])).toEqual([100, 100 + (5 / 250) * 25]);
  });

  it('draws nothing of an empty span', () => {
    expect(tracePolylines(wave(250, 1), { fromS: 2, toS: 3 }, place(250))).toEqual([]);
  });
});

describe('fewer points', () => {
  // One sample of 2000/s: an eightieth of a millimetre at 25 mm/s.
  it.each([1000, 2000])('keeps both ends of every one-sample spike at %i samples/s', (sampleRateHz) => {
    const samples = wave(sampleRateHz, 4);
    const spikes = [101, 102, 103, 104, 777, 2345].map((index, i) => ({ index, mv: i % 2 ? 3 : -3 }));
    for (const { index, mv } of spikes) samples[index] = mv;
    const [points] = tracePolylines(samples, { fromS: 0, toS: 4 }, place(sampleRateHz));
    for (const { index, mv } of spikes) {
      const xMm = 100 + (index / sampleRateHz) * 25;
      const near = coordinates(points);
      const reached = near.y.filter((_, i) => Math.abs(near.x[i] - xMm) <= columnMm);
      const furthest = mv > 0 ? Math.min(...reached) : Math.max(...reached);
      expect(Math.abs(furthest - (50 - 10 * mv))).toBeLessThanOrEqual(simplifyToleranceMm);
    }
  });

  // Steps of a third of the tolerance or so, where many points can go, and of the quantiser, where few can.
  it.each([0.0002, 0.005])('stays within the tolerance of every sample, steps of %d mV', (stepMv) => {
    const walks = fc.array(fc.integer({ min: -2, max: 2 }), { minLength: 2, maxLength: 300 });
    fc.assert(
      fc.property(walks, (steps) => {
        let walked = 0;
        const samples = Float32Array.from(steps, (step) => (walked += step) * stepMv);
        const [points] = tracePolylines(samples, { fromS: 0, toS: 1 }, place(500));
        samples.forEach((value, i) => {
          const error = Math.abs(heightAt(points, 100 + (i / 500) * 25) - (50 - 10 * value));
          expect(error).toBeLessThanOrEqual(simplifyToleranceMm + 1e-9);
        });
      }),
    );
  });

  it('draws a flat line with two points', () => {
    expect(tracePolylines(new Float32Array(5000), { fromS: 0, toS: 10 }, place(500))[0]).toHaveLength(4);
  });
});
