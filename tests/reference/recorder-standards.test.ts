import { describe, expect, it } from 'vitest';
import {
  allowedPairs,
  fittedAmplitude,
  lineSlope,
  record,
  recorderSettings,
  sampleRates,
} from '../support/recorder-bench';
import { sineFit } from '../support/tolerances';

// Limits and their provenance: tests/fixtures/bandwidth.json (BW codes).

type Settings = ReturnType<typeof allowedPairs>[number];

const label = (settings: Settings): string =>
  `${JSON.stringify(settings.bandwidth)} at ${settings.sampleRateHz}/s`;

/** Gain at a frequency against 10 Hz, from sines run through the recorder and fitted by least squares. */
function gainRelativeTo10Hz(settings: Settings, frequencyHz: number): number {
  return gainAt(settings, frequencyHz) / gainAt(settings, 10);
}

function gainAt(settings: Settings, frequencyHz: number): number {
  const measureS = Math.max(1, 4 / frequencyHz);
  const settleS = 20;
  const sine = (t: number) => Math.sin(2 * Math.PI * frequencyHz * t);
  const output = record(settings, sine, -settleS, measureS);
  return fittedAmplitude(output, frequencyHz, settings.sampleRateHz);
}

const pulse = (t: number): number => (t >= 0 && t < 0.1 ? 3 : 0);

describe('diagnostic response to sines (IEC 60601-2-25:2011, table 201.107, tests A to C: BW-20 to BW-22)', () => {
  for (const settings of allowedPairs(['diagnostic'])) {
    it.each([0.67, 1, 2, 5, 20, 40])(`${label(settings)}: %d Hz within ±10 % of 10 Hz`, (frequency) => {
      const gain = gainRelativeTo10Hz(settings, frequency);
      expect(gain).toBeGreaterThanOrEqual(0.9 - sineFit);
      expect(gain).toBeLessThanOrEqual(1.1 + sineFit);
    });

    it.each([60, 100, 125, 150])(`${label(settings)}: %d Hz within +10/−30 % of 10 Hz`, (frequency) => {
      const gain = gainRelativeTo10Hz(settings, frequency);
      expect(gain).toBeGreaterThanOrEqual(0.7);
      expect(gain).toBeLessThanOrEqual(1.1);
    });
  }

  it('never exceeds +10 % from 150 to 500 Hz (test D: BW-23)', () => {
    const [settings] = allowedPairs(['diagnostic']).filter((one) => one.sampleRateHz === 2000);
    for (const frequency of [200, 300, 400, 500]) {
      expect(gainRelativeTo10Hz(settings, frequency)).toBeLessThanOrEqual(1.1);
    }
  });
});

describe('3 mV × 100 ms pulse (IEC 60601-2-25:2011, 201.12.4.107: BW-25 to BW-28)', () => {
  for (const settings of allowedPairs(['diagnostic', 'slowWave'])) {
    it(`${label(settings)}: leaves at most 0.1 mV and 0.3 mV/s`, () => {
      const rate = settings.sampleRateHz;
      const output = record(settings, pulse, -1, 3);
      // The low-pass itself rings for up to 100 ms after the falling edge.
      const after = output.subarray(0.2 * rate);
      const displacement = after.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
      const slope = Math.abs(lineSlope(after.subarray(0, rate), rate));
      expect(displacement).toBeLessThanOrEqual(0.1);
      expect(slope).toBeLessThanOrEqual(0.3);
      // First order: 0.0928 mV just after the pulse and 0.029 mV/s (BW-28; worked example C01).
      expect(displacement).toBeGreaterThan(0.085);
      expect(slope).toBeCloseTo(0.029, 2);
    });
  }

  it('a monitor does not meet it, which is why it is not diagnostic (worked example C03)', () => {
    const [settings] = allowedPairs(['monitor']);
    const after = record(settings, pulse, -1, 2).subarray(0.2 * settings.sampleRateHz);
    expect(Math.min(...after)).toBeLessThan(-0.5);
  });
});

describe('monitor and slow-wave edges (BW-61, BW-62: common practice, no source)', () => {
  const halfPower = Math.SQRT1_2;
  for (const settings of allowedPairs(['monitor', 'slowWave'])) {
    it(`${label(settings)}: −3 dB at its limits`, () => {
      const low = settings.bandwidth === 'monitor' ? 0.5 : 0.05;
      expect(gainAt(settings, 40)).toBeCloseTo(halfPower, 3);
      if (low === 0.5) expect(gainAt(settings, low)).toBeCloseTo(halfPower, 3);
    });
  }

  it('passes 0.67 to 40 Hz within 3 dB, as a monitor must (BW-40, from memory; BW-41)', () => {
    for (const settings of allowedPairs(['monitor'])) {
      for (const frequency of [0.67, 1, 5, 10, 30, 40]) {
        expect(gainAt(settings, frequency)).toBeGreaterThanOrEqual(halfPower - sineFit);
      }
    }
  });
});

describe('mains notch (BW-50, common practice)', () => {
  for (const mainsNotchHz of [50, 60] as const) {
    for (const sampleRateHz of sampleRates.filter((rate) => rate >= 500)) {
      it(`${mainsNotchHz} Hz at ${sampleRateHz}/s: deep at its centre, gone a few Hz away`, () => {
        const settings = recorderSettings({ mainsNotchHz, sampleRateHz, bandwidth: 'diagnostic' });
        if (!settings) throw new Error('refused');
        expect(gainAt(settings, mainsNotchHz)).toBeLessThan(0.01);
        expect(gainAt(settings, mainsNotchHz - 10)).toBeGreaterThan(0.95);
        expect(gainAt(settings, 10)).toBeGreaterThan(0.99);
      });
    }
  }
});

describe('aliases', () => {
  it('a fourth-order low-pass at 150 Hz holds 350 Hz, which folds to 150 at 500/s, below −29 dB', () => {
    const settings = recorderSettings({ bandwidth: 'diagnostic', sampleRateHz: 500 });
    if (!settings) throw new Error('refused');
    const alias = gainAt(settings, 350);
    expect(20 * Math.log10(alias)).toBeLessThan(-29);
  });
});
