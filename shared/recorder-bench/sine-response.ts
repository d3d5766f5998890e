import { bandLimits } from '../parameters/recorder';
import type { BenchSetting } from './bench-setting';
import { fitSine } from './fit';
import { recordSignal } from './record-signal';

/** How the recorder answers a sine of 1 mV. */
export interface SineAnswer {
  frequencyHz: number;
  /** Output over input amplitude. */
  gain: number;
  /** Phase of the output against the input, rad; null beyond half of the sample rate, where the output is an alias. */
  phaseRad: number | null;
}

/** Low-pass and notch have settled after this long, s: the notch's time constant is 92 ms at 50 Hz. */
const settleS = 1;
/** Periods and seconds that are fitted, at least. */
const leastPeriods = 1.5;
const leastS = 1;

/** Time constant of a running low-cut's transient, s. */
function transientS(setting: BenchSetting): number | null {
  const limits = setting.kind === 'recorder' ? bandLimits(setting.recorder.bandwidth) : null;
  return limits ? 1 / (2 * Math.PI * limits.lowHz) : null;
}

/**
 * A frequency that the output can tell from a constant: at a multiple of half of the sample rate the samples of a
 * sine fold to a constant or alternate, and no fit can tell amplitude from phase there. Those within 2 % of it move
 * on by 2 %.
 */
export function measurableHz(frequencyHz: number, rateHz: number): number {
  const half = rateHz / 2;
  const nearest = Math.round(frequencyHz / half) * half;
  const far = Math.max(2, 0.02 * half);
  return nearest > 0 && Math.abs(frequencyHz - nearest) < far ? nearest + far : frequencyHz;
}

/**
 * Applies a sine of 1 mV to the running recorder and fits what comes out, before the quantiser. Beyond half of the
 * sample rate this is the alias that a reader would see.
 *
 * @param frequencyHz above 0 and not a multiple of half of the sample rate
 */
export function answerToSine(setting: BenchSetting, frequencyHz: number): SineAnswer {
  const rateHz = setting.recorder.sampleRateHz;
  const measureS = Math.max(leastS, leastPeriods / frequencyHz);
  const signal = (timeS: number): number => Math.sin(2 * Math.PI * frequencyHz * timeS);
  // Both passes of an offline low-cut end somewhere; what they do there lies outside of what is fitted.
  const beforeS = setting.kind === 'zeroPhase' ? 3 / setting.lowHz : settleS;
  const output = recordSignal(setting, signal, -beforeS, measureS);
  const { amplitude, phaseRad } = fitSine(output, frequencyHz, rateHz, transientS(setting));
  return { frequencyHz, gain: amplitude, phaseRad: frequencyHz < rateHz / 2 ? phaseRad : null };
}

/** Gain at a frequency; see `answerToSine`. */
export function gainAt(setting: BenchSetting, frequencyHz: number): number {
  return answerToSine(setting, frequencyHz).gain;
}
