import { createDisturbance } from '../../../shared/engine/disturbance/disturbance';
import {
  electrodePotentials,
  electrodes,
  type ElectrodePotentials,
} from '../../../shared/engine/disturbance/electrodes';
import type { PotentialSource } from '../../../shared/engine/disturbance/periodic';
import { measuredLeads, type MeasuredLead } from '../../../shared/engine/leads';
import { parseStripParameters } from '../../../shared/parameters/parse';
import type { DisturbanceParameters } from '../../../shared/parameters/strip-parameters';

export const clock = { rateHz: 8000, firstTimeS: 0 };

export interface DisturbedStrip {
  seed?: number;
  respiratoryRateBpm?: number;
  disturbance: Partial<DisturbanceParameters>;
}

export function disturbed({ seed = 1, respiratoryRateBpm = 14, disturbance }: DisturbedStrip) {
  return parseStripParameters({ seed, patient: { respiratoryRateBpm }, disturbance });
}

export function emptyLeads(length: number): Record<MeasuredLead, Float64Array> {
  return Object.fromEntries(measuredLeads.map((lead) => [lead, new Float64Array(length)])) as Record<
    MeasuredLead,
    Float64Array
  >;
}

/** The disturbance alone, in the measured leads, mV; cut into windows of the given lengths. */
export function disturbanceLeads(strip: DisturbedStrip, windows: readonly number[]) {
  const total = windows.reduce((sum, one) => sum + one, 0);
  const whole = emptyLeads(total);
  const disturbance = createDisturbance(disturbed(strip), clock, 0);
  let from = 0;
  for (const length of windows) {
    const part = emptyLeads(length);
    disturbance.add(part, length);
    for (const lead of measuredLeads) whole[lead].set(part[lead], from);
    from += length;
  }
  return whole;
}

/** What a source puts on the electrodes, mV. */
export function potentialsOf(source: PotentialSource, length: number): ElectrodePotentials {
  const potentials = electrodePotentials(length);
  source.add(potentials, length);
  return potentials;
}

export { electrodes };

export function rms(samples: Float64Array): number {
  return Math.sqrt(samples.reduce((sum, value) => sum + value * value, 0) / samples.length);
}

export function peakToPeak(samples: Float64Array): number {
  let [low, high] = [Infinity, -Infinity];
  for (const value of samples) {
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  return high - low;
}

/** Correlation coefficient of two noises without a mean. */
export function correlation(a: Float64Array, b: Float64Array): number {
  return a.reduce((sum, value, i) => sum + value * b[i], 0) / (a.length * rms(a) * rms(b));
}

/** Amplitude of the line at a frequency that fits a whole number of times into the samples. */
export function lineAmplitude(samples: Float64Array, frequencyHz: number, rateHz: number): number {
  let [c, s] = [0, 0];
  samples.forEach((value, i) => {
    const angle = (2 * Math.PI * frequencyHz * i) / rateHz;
    c += value * Math.cos(angle);
    s += value * Math.sin(angle);
  });
  return (2 * Math.hypot(c, s)) / samples.length;
}

/** Power density over a few bands, mV²/Hz: the mean over stretches of `stretch` samples, by plain Fourier sums. */
export function powerDensity(
  samples: Float64Array,
  frequenciesHz: readonly number[],
  rateHz: number,
  stretch: number,
): number[] {
  return frequenciesHz.map((frequencyHz) => {
    let power = 0;
    let stretches = 0;
    for (let from = 0; from + stretch <= samples.length; from += stretch, stretches++) {
      power += lineAmplitude(samples.subarray(from, from + stretch), frequencyHz, rateHz) ** 2;
    }
    return ((power / stretches) * stretch) / (2 * rateHz);
  });
}
