import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  allowedPairs,
  fittedAmplitude,
  lineSlope,
  record,
  recorderSettings,
  sampleRates,
} from '../support/recorder-bench';
import { designRatio, sineFit } from '../support/tolerances';

// Everything here is run through the running recorder and read before the quantiser. Limits come from
// tests/fixtures/bandwidth.json (BW codes), expected pulse responses from tests/fixtures/worked-examples.json (C codes).

type Settings = ReturnType<typeof allowedPairs>[number];

interface Entry {
  id: string;
  value: unknown;
}

function fixture(name: string): unknown {
  return JSON.parse(readFileSync(new URL(`../fixtures/${name}`, import.meta.url), 'utf8'));
}
const { entries } = fixture('bandwidth.json') as { entries: Entry[] };
const { cases } = fixture('worked-examples.json') as { cases: Entry[] };
const limit = <T>(id: string): T => entries.find((one) => one.id === id)!.value as T;
const example = <T>(id: string): T => cases.find((one) => one.id === id)!.value as T;

const label = (settings: Settings): string =>
  `${JSON.stringify(settings.bandwidth)} at ${settings.sampleRateHz}/s`;

function settingsOf(overrides: object): Settings {
  const settings = recorderSettings(overrides);
  if (!settings) throw new Error(`refused: ${JSON.stringify(overrides)}`);
  return settings;
}

/** Gain at a frequency, from a sine of 1 mV run through the recorder and fitted by least squares. */
function gainAt(settings: Settings, frequencyHz: number): number {
  const measureS = Math.max(1, 4 / frequencyHz);
  // Time constants of 0.05 Hz last 3.2 s; a slow sine starts it off further from rest.
  const settleS = frequencyHz < 1 ? 40 : 20;
  const sine = (t: number): number => Math.sin(2 * Math.PI * frequencyHz * t);
  const output = record(settings, sine, -settleS, measureS);
  return fittedAmplitude(output, frequencyHz, settings.sampleRateHz);
}

const decibel = (ratio: number): number => 20 * Math.log10(ratio);
const halfPower = Math.SQRT1_2;

describe('diagnostic response to sines (IEC 60601-2-25:2011, table 201.107, as read in a public transcript)', () => {
  interface SineTest {
    band_Hz: [number, number];
    deviation: [number, number];
  }
  const tests: [string, string, number[]][] = [
    ['A', 'BW-20', [0.67, 1, 2, 5, 20, 40]],
    ['B', 'BW-21', [40, 50, 60, 70, 80, 90, 100]],
    ['C', 'BW-22', [100, 110, 125, 140, 150]],
    // Beyond half of the sample rate the recorder answers at the alias; frequencies that fold to 0 are left out.
    ['D', 'BW-23', [150, 160, 180, 200, 240, 270, 310, 350, 390, 430, 470, 490]],
  ];

  for (const settings of allowedPairs(['diagnostic'])) {
    const reference = gainAt(settings, 10);
    for (const [name, id, frequencies] of tests) {
      const { band_Hz, deviation } = limit<SineTest>(id);
      it.each(frequencies)(`${label(settings)}: test ${name} (${id}) at %d Hz`, (frequency) => {
        expect(frequency).toBeGreaterThanOrEqual(band_Hz[0]);
        expect(frequency).toBeLessThanOrEqual(band_Hz[1]);
        const gain = gainAt(settings, frequency) / reference;
        expect(gain).toBeGreaterThanOrEqual(1 + deviation[0]);
        expect(gain).toBeLessThanOrEqual(1 + deviation[1]);
      });
    }

    it(`${label(settings)}: at 150 Hz the gain is 0.7071, so the margin to −30 % is 0.007`, () => {
      expect(Math.abs(gainAt(settings, 150) - halfPower)).toBeLessThan(sineFit);
    });

    it(`${label(settings)}: at 0.67 Hz at most 0.9 dB down (BW-41: diagnostic)`, () => {
      const { diagnostic_dB } = limit<{ diagnostic_dB: number }>('BW-41');
      expect(decibel(gainAt(settings, 0.67) / reference)).toBeGreaterThan(diagnostic_dB);
    });
  }

  it('is offered at 500, 1000 and 2000 samples/s only', () => {
    expect(allowedPairs(['diagnostic']).map((one) => one.sampleRateHz)).toEqual([500, 1000, 2000]);
  });
});

describe('3 mV × 100 ms pulse (IEC 60601-2-25:2011, 201.12.4.107)', () => {
  const { amplitude_mV, width_ms } = limit<{ amplitude_mV: number; width_ms: number }>('BW-25');
  const widthS = width_ms / 1000;
  const pulse = (t: number): number => (t >= 0 && t < widthS ? amplitude_mV : 0);
  // Before this the low-pass itself rings after the falling edge.
  const quietS = widthS + 0.1;

  for (const settings of allowedPairs(['diagnostic', 'slowWave'])) {
    it(`${label(settings)}: leaves at most 0.1 mV (BW-26) and 0.3 mV/s (BW-27)`, () => {
      const rate = settings.sampleRateHz;
      const after = record(settings, pulse, -1, 21).subarray(Math.ceil(quietS * rate));
      const displacement = after.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
      expect(displacement).toBeLessThanOrEqual(limit<number>('BW-26'));
      for (let from = 0; from + rate <= after.length; from += rate) {
        const slope = Math.abs(lineSlope(after.subarray(from, from + rate), rate));
        expect(slope).toBeLessThanOrEqual(limit<number>('BW-27'));
      }
    });

    it(`${label(settings)}: leaves what a first-order 0.05 Hz high-pass leaves (C01; BW-28: 29 µV/s)`, () => {
      const rate = settings.sampleRateHz;
      const after = record(settings, pulse, -1, 3).subarray(Math.ceil(quietS * rate));
      const c01 = example<Record<string, number>>('C01');
      const faded = Math.exp(-2 * Math.PI * 0.05 * 0.1);
      expect(after[0]).toBeCloseTo(c01.displacement_just_after_mV * faded, 4);
      const slope = lineSlope(after.subarray(0, rate / 10), rate);
      const fadedMore = Math.exp(-2 * Math.PI * 0.05 * 0.15);
      // What is left of a 40 Hz low-pass's ringing tilts the line by 0.12 µV in a ms at most.
      expect(Math.abs(slope - c01.slope_just_after_mV_per_s * fadedMore)).toBeLessThan(2e-4);
    });

    it(`${label(settings)}: answers a steady train of pulses as the series says (C08)`, () => {
      const rate = settings.sampleRateHz;
      const train = (t: number): number => pulse(t - 2 * Math.floor(t / 2));
      const output = record(settings, train, -40, 1);
      const faded = Math.exp(-2 * Math.PI * 0.05 * 0.1);
      const c08 = example<Record<string, number>>('C08');
      expect(output[Math.ceil(quietS * rate)]).toBeCloseTo(c08.displacement_just_after_mV * faded, 4);
    });
  }

  it.each([
    ['monitor', 0.5, 'C03'],
    [{ lowHz: 0.67, highHz: 100 }, 0.67, 'C05'],
  ] as const)('%j does not meet it, which is why it is not diagnostic', (bandwidth, lowHz, id) => {
    const settings = settingsOf({ bandwidth });
    const after = record(settings, pulse, -1, 2).subarray(Math.ceil(quietS * settings.sampleRateHz));
    const faded = Math.exp(-2 * Math.PI * lowHz * 0.1);
    const expected = example<Record<string, number>>(id).displacement_just_after_mV * faded;
    expect(after[0]).toBeCloseTo(expected, 3);
    expect(Math.abs(after[0])).toBeGreaterThan(limit<number>('BW-26'));
  });
});

describe('band edges', () => {
  for (const settings of allowedPairs(['monitor', 'slowWave', 'diagnostic'])) {
    const ids = { monitor: 'BW-61', slowWave: 'BW-62', diagnostic: 'BW-60' };
    const id = ids[settings.bandwidth as keyof typeof ids];
    it(`${label(settings)}: −3 dB at its limits (${id}: common practice, no source)`, () => {
      const [low, high] = limit<[number, number]>(id);
      expect(Math.abs(gainAt(settings, low) - halfPower)).toBeLessThan(designRatio);
      expect(Math.abs(gainAt(settings, high) - halfPower)).toBeLessThan(designRatio);
    });
  }

  it.each([
    [{ lowHz: 0.67, highHz: 100 }, 250],
    [{ lowHz: 1, highHz: 20 }, 250],
    [{ lowHz: 10, highHz: 200 }, 500],
    [{ lowHz: 0.5, highHz: 400 }, 1000],
    [{ lowHz: 0.5, highHz: 500 }, 2000],
  ] as const)('%j at %d/s: −3 dB where it is told', (bandwidth, sampleRateHz) => {
    const settings = settingsOf({ bandwidth, sampleRateHz });
    const { lowHz, highHz } = bandwidth;
    for (const frequency of [lowHz, Math.sqrt(lowHz * highHz), highHz]) {
      const analogue = 1 / Math.sqrt((1 + (lowHz / frequency) ** 2) * (1 + (frequency / highHz) ** 8));
      expect(Math.abs(gainAt(settings, frequency) - analogue)).toBeLessThan(designRatio);
    }
  });

  it('a monitor passes 0.67 to 40 Hz within 3 dB (BW-40, from memory; BW-41)', () => {
    const [low, high] = limit<{ band_Hz: [number, number] }>('BW-40').band_Hz;
    for (const settings of allowedPairs(['monitor'])) {
      for (const frequency of [low, 1, 5, 10, 30, high]) {
        expect(gainAt(settings, frequency)).toBeGreaterThanOrEqual(halfPower - sineFit);
      }
    }
  });

  it('unfiltered keeps a constant and averages what is fast', () => {
    for (const sampleRateHz of sampleRates) {
      const settings = settingsOf({ bandwidth: 'unfiltered', sampleRateHz });
      expect(record(settings, () => 0.7, -0.1, 1).every((value) => Math.abs(value - 0.7) < 1e-12)).toBe(true);
      // The mean over one output interval: |sin(πf/r) / (πf/r)| within what 8 kHz can tell.
      const frequency = 0.4 * sampleRateHz;
      expect(Math.abs(gainAt(settings, frequency) - Math.sin(0.4 * Math.PI) / (0.4 * Math.PI))).toBeLessThan(
        0.02,
      );
    }
  });
});

describe('mains notch (BW-50: common practice; 0.1 octave chosen)', () => {
  const pairs = [...allowedPairs(['diagnostic']), ...allowedPairs(['unfiltered', 'monitor'])];
  for (const plain of pairs) {
    for (const mainsNotchHz of [50, 60] as const) {
      it(`${mainsNotchHz} Hz, ${label(plain)}`, () => {
        const notched = { ...plain, mainsNotchHz };
        const through = (frequency: number): number => gainAt(notched, frequency) / gainAt(plain, frequency);
        // Depth: more than 60 dB.
        expect(gainAt(notched, mainsNotchHz)).toBeLessThan(0.001);
        // Width: −3 dB a twentieth of an octave either side.
        for (const side of [-0.05, 0.05]) {
          expect(Math.abs(through(mainsNotchHz * 2 ** side) - halfPower)).toBeLessThan(2 * designRatio);
        }
        // Elsewhere it is not there.
        expect(through(10)).toBeGreaterThan(0.999);
        expect(through(mainsNotchHz / 1.4)).toBeGreaterThan(0.99);
        expect(through(mainsNotchHz * 1.4)).toBeGreaterThan(0.99);
      });
    }
  }
});

describe('aliases: a sine beyond half of the sample rate that folds onto the upper limit', () => {
  const analogue = (ratio: number): number => -10 * Math.log10(1 + ratio ** 8);

  for (const settings of allowedPairs(['diagnostic', 'monitor', 'slowWave'])) {
    const high = settings.bandwidth === 'diagnostic' ? 150 : 40;
    const alias = settings.sampleRateHz - high;
    const allowed = analogue(alias / high);
    it(`${label(settings)}: ${alias} Hz is at least ${(-allowed).toFixed(1)} dB down`, () => {
      expect(decibel(gainAt(settings, alias))).toBeLessThan(allowed + 0.05);
      // The worst named pair, diagnostic at 500/s, has the 29 dB that the order was chosen for.
      expect(allowed).toBeLessThan(-29);
    });
  }

  it.each([
    [100, 250],
    [200, 500],
    [400, 1000],
    [500, 2000],
  ])('%d Hz at %d/s, the highest limit allowed: at least 14 dB down', (highHz, sampleRateHz) => {
    const settings = settingsOf({ bandwidth: { lowHz: 0.05, highHz }, sampleRateHz });
    expect(decibel(gainAt(settings, sampleRateHz - highHz))).toBeLessThan(-14);
  });
});
