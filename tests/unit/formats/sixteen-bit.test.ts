import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exactStepUv, leadCounts, sixteenBitWarnings } from '../../../shared/formats/sixteen-bit';

const inMv = (...values: number[]): Float32Array => Float32Array.from(values);

describe('leads in 16 bits', () => {
  it('takes the quantiser’s step, and half of it for aVR, aVL and aVF', () => {
    expect(exactStepUv('II', 5)).toBe(5);
    expect(exactStepUv('III', 5)).toBe(5);
    expect(exactStepUv('aVL', 5)).toBe(2.5);
    const { counts, stepUv } = leadCounts('aVF', inMv(0.0025, -1, 0), 5);
    expect([...counts]).toEqual([1, -400, 0]);
    expect(stepUv).toBe(2.5);
  });

  it('widens the step by whole multiples when the range asks for it, and says so', () => {
    const lead = leadCounts('V2', inMv(40, -1), 1);
    expect(lead).toMatchObject({ stepUv: 2, exactStepUv: 1, clipped: 0, gaps: 0 });
    expect([...lead.counts]).toEqual([20_000, -500]);
    expect(sixteenBitWarnings([lead])).toEqual([
      'V2: written in steps of 2 µV instead of 1, because 16 bits do not hold its range otherwise',
    ]);
  });

  it('holds 32767 steps exactly and widens for one more', () => {
    expect(leadCounts('I', inMv(32.767), 1).stepUv).toBe(1);
    expect(leadCounts('I', inMv(-32.767), 1).stepUv).toBe(1);
    expect(leadCounts('I', inMv(32.768), 1).stepUv).toBe(2);
  });

  it('clips at the widest step of 5 µV and counts the samples', () => {
    const lead = leadCounts('V1', inMv(200, -200, 1), 1);
    expect([...lead.counts]).toEqual([32_767, -32_767, 200]);
    expect(lead).toMatchObject({ stepUv: 5, clipped: 2 });
    expect(sixteenBitWarnings([lead])).toEqual([
      expect.stringContaining('steps of 5 µV instead of 1'),
      'V1: 2 samples beyond ±163.835 mV clipped',
    ]);
  });

  it('never takes a step narrower than the quantiser’s, however coarse that is', () => {
    expect(leadCounts('V1', inMv(400, 1), 10)).toMatchObject({ stepUv: 10, clipped: 1 });
  });

  it('writes gaps as 0 and counts them', () => {
    const lead = leadCounts('I', inMv(NaN, 0.01, NaN), 5);
    expect([...lead.counts]).toEqual([0, 2, 0]);
    expect(sixteenBitWarnings([lead])).toEqual(['I: 2 samples without a value written as 0']);
  });

  it('is silent when every sample is exact', () => {
    expect(sixteenBitWarnings([leadCounts('I', inMv(0.005, -0.01), 5)])).toEqual([]);
  });

  it('is never off by more than half of its step, but where it says that it clips', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -250, max: 250, noNaN: true }), { minLength: 1, maxLength: 50 }),
        fc.double({ min: 1, max: 10, noNaN: true }),
        (values, resolutionUv) => {
          const samples = Float32Array.from(values);
          const { counts, stepUv, clipped } = leadCounts('V3', samples, resolutionUv);
          const off = [...samples].filter(
            (mv, i) => Math.abs(mv * 1000 - counts[i] * stepUv) > stepUv / 2 + 1e-9,
          );
          expect(off.length).toBeLessThanOrEqual(clipped);
          expect([...samples].filter((mv) => Math.abs(mv * 1000) > 32_767.5 * stepUv).length).toBe(clipped);
        },
      ),
    );
  });
});
