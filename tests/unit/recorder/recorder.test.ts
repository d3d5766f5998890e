import Fili from 'fili';
import { describe, expect, it } from 'vitest';
import { createBandLimiter } from '../../../shared/engine/recorder/band-limiter';
import { quantise, quantiseLeads, twelveLeads } from '../../../shared/engine/recorder/quantiser';
import { designRecorder } from '../../../shared/engine/recorder/recorder-design';
import { measuredLeads, type MeasuredLead } from '../../../shared/engine/leads';
import { randomStream } from '../../../shared/engine/random';
import { allowedPairs, bandwidths, record, recorderSettings } from '../../support/recorder-bench';
import { doubleRoundingMv, filiRoundingMv, settledMv } from '../../support/tolerances';

function noise(length: number, use: string): Float64Array {
  const random = randomStream(7, use);
  return Float64Array.from({ length }, () => random.normal());
}

describe('band-limiter', () => {
  it.each(allowedPairs(['diagnostic', 'monitor', 'slowWave']))(
    'is fili’s own filter: $bandwidth at $sampleRateHz/s',
    (settings) => {
      const design = designRecorder({ ...settings, mainsNotchHz: 50 });
      const input = noise(8000, 'block');
      const [ours] = createBandLimiter(design, 1).process([input], input.length);
      const theirs = new Fili.IirFilter([...design.sections]).multiStep(Array.from(input));
      ours.forEach((value, k) => {
        expect(Math.abs(value - theirs[k * design.decimation])).toBeLessThan(filiRoundingMv);
      });
    },
  );

  it('averages each output interval when unfiltered', () => {
    const settings = recorderSettings({ bandwidth: 'unfiltered', sampleRateHz: 500 });
    if (!settings) throw new Error('refused');
    const input = noise(1600, 'mean');
    const [output] = createBandLimiter(designRecorder(settings), 1).process([input], input.length);
    output.forEach((value, k) => {
      const mean = input.subarray(16 * k, 16 * k + 16).reduce((sum, one) => sum + one, 0) / 16;
      expect(value).toBeCloseTo(mean, 12);
    });
  });

  it('gives the same samples whatever the chunks', () => {
    const settings = recorderSettings({ mainsNotchHz: 60 });
    if (!settings) throw new Error('refused');
    const design = designRecorder(settings);
    const input = noise(3200, 'chunks');
    const [whole] = createBandLimiter(design, 1).process([input], input.length);
    const limiter = createBandLimiter(design, 1);
    const parts = [16, 160, 1024, 2000].flatMap((length, i, all) => {
      const from = all.slice(0, i).reduce((sum, one) => sum + one, 0);
      return [...limiter.process([input.subarray(from, from + length)], length)[0]];
    });
    expect(parts).toEqual([...whole]);
  });
});

describe('delay', () => {
  const bump = (t: number): number => Math.exp(-0.5 * ((t - 0.5) / 0.02) ** 2);

  it.each(allowedPairs(bandwidths))('is removed: $bandwidth at $sampleRateHz/s', (settings) => {
    const output = record(settings, bump, -1, 1);
    let top = 0;
    output.forEach((value, i) => (top = value > output[top] + 1e-12 ? i : top));
    // A 20 ms bump's top is flat to a microvolt over about a millisecond once a 40 Hz limit has skewed it.
    expect(Math.abs(top / settings.sampleRateHz - 0.5)).toBeLessThanOrEqual(
      Math.max(0.0011, 1 / settings.sampleRateHz),
    );
  });

  it.each([
    ['diagnostic', 2.8],
    ['monitor', 10.4],
  ] as const)('%s: about %d ms', (bandwidth, expected) => {
    const settings = recorderSettings({ bandwidth });
    if (!settings) throw new Error('refused');
    expect(designRecorder(settings).delayRemovedMs).toBeCloseTo(expected, 1);
  });
});

describe('settling', () => {
  /** A periodic signal with an offset: a rhythm that has gone on for ever on a drifting electrode. */
  const signal = (t: number): number => 0.3 + Math.max(0, Math.sin(2 * Math.PI * 1.2 * t)) ** 9;

  it.each([0.01, 0.05, 0.5])('from the first sample within 5 µV of ten minutes’ run at %d Hz', (lowHz) => {
    const settings = recorderSettings({ bandwidth: { lowHz, highHz: 100 } });
    if (!settings) throw new Error('refused');
    const design = designRecorder(settings);
    const at = (rate: number, from: number, length: number): Float64Array =>
      Float64Array.from({ length }, (_, i) => signal((from + i) / rate + design.inputLeadS));
    const { internalRateHz } = design;
    const limiter = createBandLimiter(design, 1);
    limiter.settle([at(250, -30 * 250, 29 * 250)], 250);
    limiter.process([at(internalRateHz, -internalRateHz, internalRateHz)], internalRateHz);
    const [ours] = limiter.process([at(internalRateHz, 0, 2 * internalRateHz)], 2 * internalRateHz);
    const forEver = record(settings, signal, -600, 2);
    ours.forEach((value, k) => expect(Math.abs(value - forEver[k])).toBeLessThan(settledMv));
  });
});

describe('quantiser', () => {
  it('rounds to steps, half steps up, without a negative zero', () => {
    expect(quantise(0.0124, 5)).toBeCloseTo(0.01, 12);
    expect(quantise(0.0125, 5)).toBeCloseTo(0.015, 12);
    expect(Object.is(quantise(-0.0001, 5), 0)).toBe(true);
  });

  const measured = Object.fromEntries(measuredLeads.map((lead) => [lead, noise(500, lead)])) as Record<
    MeasuredLead,
    Float64Array
  >;

  it('keeps Einthoven and Goldberger in doubles (LD-01 to LD-06)', () => {
    const leads = twelveLeads(measured);
    for (let i = 0; i < 500; i++) {
      expect(Math.abs(leads.I[i] + leads.III[i] - leads.II[i])).toBeLessThan(doubleRoundingMv);
      expect(Math.abs(leads.aVR[i] + leads.aVL[i] + leads.aVF[i])).toBeLessThan(doubleRoundingMv);
      expect(Math.abs(leads.aVF[i] - (leads.II[i] + leads.III[i]) / 2)).toBeLessThan(doubleRoundingMv);
    }
  });

  it('keeps them to the half step after quantising, at every resolution', () => {
    for (const resolutionUv of [1, 2.5, 5, 10]) {
      const leads = quantiseLeads(measured, resolutionUv);
      const halfStepMv = resolutionUv / 2000;
      for (let i = 0; i < 500; i++) {
        expect(Math.abs(leads.I[i] + leads.III[i] - leads.II[i])).toBeLessThan(1e-6);
        expect(Math.abs(leads.aVR[i] + leads.aVL[i] + leads.aVF[i])).toBeLessThan(1e-6);
        for (const lead of ['aVR', 'aVL', 'aVF', 'V3'] as const) {
          const steps = leads[lead][i] / halfStepMv;
          expect(Math.abs(steps - Math.round(steps))).toBeLessThan(1e-2);
        }
        expect(Math.abs(leads.V3[i] - measured.V3[i])).toBeLessThanOrEqual(halfStepMv + 1e-6);
      }
    }
  });
});
