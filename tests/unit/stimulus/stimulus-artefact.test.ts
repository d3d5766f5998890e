import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { StimulusChamber } from '../../../shared/engine/events';
import {
  addStimulusArtefact,
  rechargeTimeConstantMs,
  stimulusEndS,
  type StimulusArtefact,
} from '../../../shared/engine/stimulus/stimulus-artefact';
import { runSection } from '../../../shared/engine/recorder/biquad-cascade';
import { lowPass } from '../../../shared/engine/recorder/low-pass';
import { forgottenMv } from '../../support/tolerances';

const stimulus: StimulusArtefact = {
  timeS: 0.0201237,
  chamber: 'leftVentricle',
  amplitudeMv: 3,
  widthMs: 0.5,
};
const rates = [250, 500, 8000, 16000, 64000];
const component = 1 / Math.sqrt(3);

function paint(rateHz: number, first: number, length: number, one: StimulusArtefact = stimulus) {
  const out = { x: new Float64Array(length), y: new Float64Array(length), z: new Float64Array(length) };
  addStimulusArtefact(out, { rateHz, firstTimeS: 0 }, first, length, one);
  return out;
}

const sum = (values: Float64Array): number => values.reduce((total, value) => total + value, 0);
const wholeLength = (rateHz: number, one: StimulusArtefact): number =>
  Math.ceil((stimulusEndS(one) + 0.01) * rateHz);

describe('area and centre', () => {
  it.each(rates)('the area up to any sample is the artefact’s own (%d/s)', (rateHz) => {
    const length = Math.ceil((stimulus.timeS + 0.03) * rateHz);
    const { y } = paint(rateHz, 0, length);
    const sampleMs = 1000 / rateHz;
    // The last sample's triangle reaches one sample further: the mean of the running area, by Simpson's rule.
    const lastMs = 1000 * ((length - 1) / rateHz - stimulus.timeS);
    const area = (t: number): number => 0.5 * Math.exp((0.5 - t) / rechargeTimeConstantMs);
    const expected = (area(lastMs) + 4 * area(lastMs + sampleMs / 2) + area(lastMs + sampleMs)) / 6;
    expect(sum(y) * sampleMs).toBeCloseTo(3 * component * expected, 8);
  });

  it.each(rates)('recharge carries the pulse’s charge back (PP-09; %d/s)', (rateHz) => {
    const { y } = paint(rateHz, 0, wholeLength(rateHz, stimulus));
    const pulse = (3 * component * 0.5 * rateHz) / 1000;
    expect(Math.abs(sum(y))).toBeLessThan(1e-6 * pulse);
  });

  it.each([0.05, 0.4, 2])(
    'the centre is exact wherever the pulse falls between samples (%d ms)',
    (widthMs) => {
      // First moment about the start: a rectangle of w, then −w spread with a mean of τ after its end.
      const expected = -(widthMs ** 2) / 2 - widthMs * rechargeTimeConstantMs;
      for (const shift of [0, 0.1, 0.25, 0.5, 0.77, 0.999]) {
        const one = { ...stimulus, widthMs, amplitudeMv: 1, timeS: 0.02 + shift / 8000 };
        const { y } = paint(8000, 0, wholeLength(8000, one), one);
        const moment = y.reduce((total, value, m) => total + value * (m / 8 - 1000 * one.timeS), 0) / 8;
        expect(Math.abs(moment / component / expected - 1)).toBeLessThan(1e-5);
      }
    },
  );
});

describe('shape', () => {
  const octants: Record<StimulusChamber, number[]> = {
    // Anterior, superior, left.
    atrium: [1, -1, -1],
    // Posterior, superior, right.
    rightVentricle: [-1, -1, 1],
    // Posterior, inferior, right.
    leftVentricle: [-1, 1, 1],
    // Anterior, inferior, left (common practice, no source).
    chest: [1, 1, -1],
  };

  it.each(Object.entries(octants) as [StimulusChamber, number[]][])(
    '%s points as PP-22 says, the chest along its pads',
    (chamber, octant) => {
      const one = { ...stimulus, chamber, widthMs: 2, timeS: 0.02 };
      const { x, y, z } = paint(8000, 0, 200, one);
      // 1 ms into the pulse: its plateau.
      const plateau = [x[168], y[168], z[168]];
      expect(plateau.map(Math.sign)).toEqual(octant);
      expect(Math.hypot(...plateau)).toBeCloseTo(one.amplitudeMv, 9);
      // The recharge mirrors it (PP-21: 174° on average).
      expect([x[190], y[190], z[190]].map(Math.sign)).toEqual(octant.map((sign) => -sign));
    },
  );

  it('starts its recharge at A·w/τ and lets it fall (worked example B22)', () => {
    const { cases } = JSON.parse(
      readFileSync(new URL('../../fixtures/worked-examples.json', import.meta.url), 'utf8'),
    ) as { cases: { id: string; inputs: { tail_tau_ms: number[] }; value: Record<string, number[]> }[] };
    const b22 = cases.find((one) => one.id === 'B22')!;
    const i = b22.inputs.tail_tau_ms.indexOf(rechargeTimeConstantMs);
    const { y } = paint(64000, 0, 6400, { ...stimulus, amplitudeMv: 500, widthMs: 0.5, timeS: 0.02 });
    // The recharge starts at 20.5 ms, sample 1312; sample 1313 is the first that holds nothing else.
    const backToStart = Math.exp(1 / 64 / rechargeTimeConstantMs);
    expect((y[1313] / component) * backToStart).toBeCloseTo(b22.value.tail_start_mV[i], 6);
    expect(y[1312 + 1280] / component).toBeCloseTo(b22.value.tail_after_20ms_mV[i], 6);
  });

  it('keeps the textbook height of a 0.4 ms spike at 150 Hz but for 2 %', () => {
    const one = { ...stimulus, amplitudeMv: 1, widthMs: 0.4 };
    const { y } = paint(64000, 0, 6400, one);
    for (const section of lowPass(150, 64000, 2)) runSection(section, new Float64Array(2), 0, y, y.length);
    // Worked example B08: 0.1434 of the height without a recharge.
    const share = Math.max(...y) / component / 0.143356792;
    expect(share).toBeLessThan(1);
    expect(share).toBeGreaterThan(0.98);
  });

  it('is added to what is there', () => {
    const out = { x: new Float64Array(8).fill(1), y: new Float64Array(8).fill(2), z: new Float64Array(8) };
    addStimulusArtefact(out, { rateHz: 8000, firstTimeS: 0 }, 158, 8, stimulus);
    const alone = paint(8000, 158, 8);
    out.x.forEach((value, i) => expect(value).toBeCloseTo(1 + alone.x[i], 12));
    out.y.forEach((value, i) => expect(value).toBeCloseTo(2 + alone.y[i], 12));
  });
});

describe('windows', () => {
  it.each(rates)('the value of a sample never depends on the window, to the bit (%d/s)', (rateHz) => {
    const length = wholeLength(rateHz, stimulus);
    const whole = paint(rateHz, 0, length);
    for (const step of [1, 7, 64, 163, 1000]) {
      if (length / step > 20000) continue;
      const parts: number[] = [];
      for (let from = 0; from < length; from += step) {
        parts.push(...paint(rateHz, from, Math.min(step, length - from)).z);
      }
      expect(parts).toEqual([...whole.z]);
    }
  });

  it('a clock with another origin sees the same artefact', () => {
    const here = paint(8000, 160, 400);
    const out = { x: new Float64Array(400), y: new Float64Array(400), z: new Float64Array(400) };
    addStimulusArtefact(out, { rateHz: 8000, firstTimeS: 160 / 8000 }, 0, 400, stimulus);
    out.x.forEach((value, i) => expect(value).toBeCloseTo(here.x[i], 9));
  });

  it('ends exactly at its end, and what is dropped there is nothing', () => {
    const largest = { ...stimulus, amplitudeMv: 50, widthMs: 2 };
    const end = Math.ceil(stimulusEndS(largest) * 8000);
    const { y } = paint(8000, 0, end + 100, largest);
    expect(y[end - 1]).not.toBe(0);
    expect(Math.abs(y[end - 1])).toBeLessThan(forgottenMv);
    expect(y.subarray(end).every((value) => value === 0)).toBe(true);
    const before = Math.floor(largest.timeS * 8000);
    expect(y.subarray(0, before).every((value) => value === 0)).toBe(true);
  });
});
