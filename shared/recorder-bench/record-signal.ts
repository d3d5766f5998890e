import { createBandLimiter } from '../engine/recorder/band-limiter';
import type { RecorderDesign } from '../engine/recorder/recorder-design';
import { benchDesign, finish, samplesAhead, type BenchSetting } from './bench-setting';

/** Voltage over time: mV at a time in s. */
export type Signal = (timeS: number) => number;

/**
 * Runs a signal through a running recorder from `fromS` on, at rest before.
 *
 * @param fromS at most 0
 * @returns the outputs of [0, toS), mV before the quantiser
 */
export function recordThrough(
  design: RecorderDesign,
  signal: Signal,
  fromS: number,
  toS: number,
): Float64Array {
  const rateHz = design.settings.sampleRateHz;
  const limiter = createBandLimiter(design, 1);
  const first = Math.round(fromS * rateHz) * design.decimation;
  const inputs = new Float64Array(Math.round(toS * rateHz) * design.decimation - first);
  for (let i = 0; i < inputs.length; i++) {
    inputs[i] = signal((first + i) / design.internalRateHz + design.inputLeadS);
  }
  const [output] = limiter.process([inputs], inputs.length);
  return output.subarray(-first / design.decimation);
}

/** The same for anything on the bench; what works backwards is given the signal beyond `toS` as well. */
export function recordSignal(
  setting: BenchSetting,
  signal: Signal,
  fromS: number,
  toS: number,
): Float64Array {
  const design = benchDesign(setting);
  const rateHz = setting.recorder.sampleRateHz;
  if (setting.kind !== 'zeroPhase') return recordThrough(design, signal, fromS, toS);
  // Recorded from `fromS` on, so that both passes have what they need on both sides.
  const shifted = (timeS: number): number => signal(timeS + fromS);
  const end = toS - fromS + samplesAhead(setting) / rateHz;
  const settleS = 0.2;
  const all = finish(setting, recordThrough(design, shifted, -settleS, end));
  const from = Math.round(-fromS * rateHz);
  return all.subarray(from, from + Math.round(toS * rateHz));
}
