import { describe, expect, it } from 'vitest';
import { randomStream } from '../../../shared/engine/random';
import { createBandLimiter } from '../../../shared/engine/recorder/band-limiter';
import { runSection } from '../../../shared/engine/recorder/biquad-cascade';
import { createDecimator } from '../../../shared/engine/recorder/decimator';
import { designRecorder, type RecorderDesign } from '../../../shared/engine/recorder/recorder-design';
import { allowedPairs, recorderSettings } from '../../support/recorder-bench';
import { doubleRoundingMv } from '../../support/tolerances';

function noise(length: number, use: string): Float64Array {
  const random = randomStream(3, use);
  return Float64Array.from({ length }, () => random.normal());
}

/** Runs channels through a fresh recorder in pieces of the given lengths, over and over until all is used. */
function runInPieces(design: RecorderDesign, inputs: Float64Array[], lengths: readonly number[]): number[][] {
  const limiter = createBandLimiter(design, inputs.length);
  const outputs: number[][] = inputs.map(() => []);
  for (let from = 0, i = 0; from < inputs[0].length; i++) {
    const to = Math.min(inputs[0].length, from + lengths[i % lengths.length]);
    const part = limiter.process(
      inputs.map((input) => input.subarray(from, to)),
      to - from,
    );
    part.forEach((values, channel) => outputs[channel].push(...values));
    from = to;
  }
  return outputs;
}

const settings = [
  ...allowedPairs(['diagnostic', 'monitor', 'slowWave', 'unfiltered']),
  ...(['diagnostic', 'unfiltered'] as const).flatMap(
    (bandwidth) => recorderSettings({ bandwidth, mainsNotchHz: 50 }) ?? [],
  ),
  recorderSettings({ bandwidth: { lowHz: 10, highHz: 500 }, sampleRateHz: 2000 }),
].filter((one) => one !== null);

describe('streaming', () => {
  it.each(
    settings.map((one) => [JSON.stringify(one.bandwidth), one.sampleRateHz, one.mainsNotchHz, one] as const),
  )('%s at %d/s, notch %d: pieces of any length change no bit', (_, __, ___, one) => {
    const design = designRecorder(one);
    const inputs = [noise(9001, 'a'), noise(9001, 'b'), noise(9001, 'c')];
    const whole = createBandLimiter(design, 3)
      .process(inputs, 9001)
      .map((channel) => [...channel]);
    expect(whole[0].length).toBe(
      design.keep === 'mean' ? Math.floor(9001 / design.decimation) : Math.ceil(9001 / design.decimation),
    );
    for (const lengths of [[1], [7, 1, 300], [16], [1023, 1025], [5000]]) {
      expect(runInPieces(design, inputs, lengths)).toEqual(whole);
    }
  });

  it('goes quiet to exactly nothing after a signal has died away, in any pieces', () => {
    // 10 Hz: a time constant of 16 ms, so that states fade within the 30 s of this test.
    const design = designRecorder(recorderSettings({ bandwidth: { lowHz: 10, highHz: 150 } })!);
    const input = new Float64Array(30 * 8000);
    input.set(noise(800, 'burst'));
    const [whole] = createBandLimiter(design, 1).process([input], input.length);
    expect(Math.max(...whole)).toBeGreaterThan(0.1);
    expect(whole.subarray(-500).every((value) => value === 0)).toBe(true);
    expect(runInPieces(design, [input], [4001])).toEqual([[...whole]]);
  });

  it('channels do not touch each other', () => {
    const design = designRecorder(recorderSettings({})!);
    const inputs = [noise(4000, 'x'), new Float64Array(4000), noise(4000, 'z')];
    const together = createBandLimiter(design, 3).process(inputs, 4000);
    inputs.forEach((input, i) => {
      expect(createBandLimiter(design, 1).process([input], 4000)[0]).toEqual(together[i]);
    });
    expect(together[1].every((value) => value === 0)).toBe(true);
  });

  it('is linear, so that heart vectors may be band-limited before they become leads', () => {
    const design = designRecorder(recorderSettings({ mainsNotchHz: 60 })!);
    const [x, y] = [noise(8000, 'x'), noise(8000, 'y')];
    const mixed = x.map((value, i) => 0.6 * value - 1.3 * y[i]);
    const [ofX, ofY, ofMixed] = createBandLimiter(design, 3).process([x, y, mixed], 8000);
    ofMixed.forEach((value, k) => {
      expect(Math.abs(value - (0.6 * ofX[k] - 1.3 * ofY[k]))).toBeLessThan(doubleRoundingMv);
    });
  });

  it('leaves its input alone', () => {
    const input = noise(2000, 'kept');
    const before = [...input];
    createBandLimiter(designRecorder(recorderSettings({ mainsNotchHz: 50 })!), 1).process([input], 2000);
    expect([...input]).toEqual(before);
  });
});

describe('settling', () => {
  it('on a constant, however large, leaves nothing from the first sample', () => {
    for (const lowHz of [0.01, 0.05, 0.5, 10]) {
      const design = designRecorder(recorderSettings({ bandwidth: { lowHz, highHz: 150 } })!);
      const limiter = createBandLimiter(design, 1);
      limiter.settle([new Float64Array(29 * 250).fill(300)], 250);
      limiter.process([new Float64Array(8000).fill(300)], 8000);
      const [output] = limiter.process([new Float64Array(8000).fill(300)], 8000);
      output.forEach((value) => expect(Math.abs(value)).toBeLessThan(1e-6));
    }
  });

  it('gives the same at any low rate', () => {
    const design = designRecorder(recorderSettings({})!);
    const signal = (t: number): number =>
      Math.sin(2 * Math.PI * 0.3 * t) + 0.4 * Math.sin(2 * Math.PI * 0.11 * t);
    const outputs = [250, 500, 1000].map((rateHz) => {
      const limiter = createBandLimiter(design, 1);
      limiter.settle(
        [Float64Array.from({ length: 29 * rateHz }, (_, i) => signal(-30 + i / rateHz))],
        rateHz,
      );
      return limiter.process(
        [Float64Array.from({ length: 16000 }, (_, i) => signal(-1 + i / 8000))],
        16000,
      )[0];
    });
    for (const other of outputs.slice(1)) {
      other
        .subarray(500)
        .forEach((value, k) => expect(Math.abs(value - outputs[0][500 + k])).toBeLessThan(0.001));
    }
  });

  it('without it a constant shows for seconds, which is why it is there', () => {
    const limiter = createBandLimiter(designRecorder(recorderSettings({})!), 1);
    const [output] = limiter.process([new Float64Array(16000).fill(1)], 16000);
    expect(output[999]).toBeGreaterThan(0.5);
  });

  it('without a high-pass does nothing', () => {
    const design = designRecorder(recorderSettings({ bandwidth: 'unfiltered', mainsNotchHz: 50 })!);
    const [charged, fresh] = [createBandLimiter(design, 1), createBandLimiter(design, 1)];
    charged.settle([new Float64Array(100).fill(5)], 250);
    const input = noise(1600, 'u');
    expect(charged.process([input], 1600)).toEqual(fresh.process([input], 1600));
  });
});

describe('decimator', () => {
  const ramp = Float64Array.from({ length: 10 }, (_, i) => i);
  const all = (keep: 'sample' | 'mean', lengths: readonly number[]): number[] => {
    const decimator = createDecimator(4, keep);
    let from = 0;
    return lengths.flatMap((length) => {
      const output = new Float64Array(decimator.count(length));
      expect(decimator.take(ramp, from, from + length, output, 0)).toBe(output.length);
      from += length;
      return [...output];
    });
  };

  it.each([[[10]], [[1, 9]], [[3, 1, 4, 2]], [[0, 5, 0, 5]], [Array.from({ length: 10 }, () => 1)]])(
    'keeps every fourth sample, or the mean of four, in pieces of %j',
    (lengths) => {
      expect(all('sample', lengths)).toEqual([0, 4, 8]);
      expect(all('mean', lengths)).toEqual([1.5, 5.5]);
    },
  );
});

describe('design', () => {
  it.each(settings.map((one) => [JSON.stringify(one.bandwidth), one.sampleRateHz, one] as const))(
    '%s at %d/s: the delay that is removed is the delay that is there',
    (_, __, one) => {
      const design = designRecorder({ ...one, mainsNotchHz: 0 });
      const { internalRateHz, lowPass: low } = design;
      // Where the centre of an impulse's answer lies: its first moment over its area.
      const response = new Float64Array(internalRateHz);
      response[0] = 1;
      for (const section of low ?? []) runSection(section, new Float64Array(2), 0, response, response.length);
      const area = response.reduce((sum, value) => sum + value, 0);
      const centre = response.reduce((sum, value, i) => sum + i * value, 0) / area / internalRateHz;
      const expectedMs = low ? 1000 * centre : (1000 * (design.decimation - 1)) / 2 / internalRateHz;
      expect(design.delayRemovedMs).toBeCloseTo(expectedMs, 9);
      expect(design.inputLeadS).toBeCloseTo((low ? 1 : -1) * design.delayRemovedMs * 0.001, 12);
      // An analogue fourth-order Butterworth delays 0 Hz by 2.6131/ωc.
      if (design.limits) {
        const analogueMs = 2613.1 / (2 * Math.PI * design.limits.highHz);
        expect(Math.abs(design.delayRemovedMs / analogueMs - 1)).toBeLessThan(0.004);
      }
    },
  );

  it('an output sample is a whole number of internal samples at every rate and limit', () => {
    for (const one of settings) {
      const { decimation, internalRateHz } = designRecorder(one);
      expect(Number.isInteger(decimation)).toBe(true);
      expect(decimation * one.sampleRateHz).toBe(internalRateHz);
    }
  });

  it('knows its gain: magnitudeAt is what sines find', () => {
    const design = designRecorder(recorderSettings({ mainsNotchHz: 50 })!);
    expect(design.magnitudeAt(0.05)).toBeCloseTo(Math.SQRT1_2, 4);
    expect(design.magnitudeAt(150)).toBeCloseTo(Math.SQRT1_2, 2);
    expect(design.magnitudeAt(50)).toBeLessThan(1e-6);
    expect(design.magnitudeAt(10)).toBeGreaterThan(0.999);
    expect(designRecorder(recorderSettings({ bandwidth: 'unfiltered' })!).magnitudeAt(100)).toBe(1);
  });
});
