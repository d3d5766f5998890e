import { bandLimits } from '../../parameters/recorder';
import type { RecorderParameters } from '../../parameters/strip-parameters';
import { msPerS } from '../../units';
import { delayAtZeroHz, highPass, lowPass, magnitudeAt, notch, type Section } from './sections';

/**
 * Rate at which strips are synthesized and band-limited: a 0.4 ms stimulus is 3.2 samples wide, where 2 kHz
 * would leave it less than one.
 */
export const internalRateHz = 8000;

/** A recorder ready to run: filters at the internal rate and how its output is taken. */
export interface RecorderDesign {
  settings: RecorderParameters;
  /** Present unless unfiltered; always the first section that runs. */
  highPass: Section | null;
  /** Every section in the order in which they run. */
  sections: Section[];
  /** Internal samples to one output sample. */
  decimation: number;
  /** `mean`: the average of each output interval (unfiltered); `sample`: every `decimation`-th sample. */
  take: 'sample' | 'mean';
  /** Delay of the low-pass (or of the averaging) that is removed, ms. */
  delayRemovedMs: number;
  /**
   * The caller renders internal sample m at time m / internalRateHz + inputLeadS, ahead of what is put out, so
   * that output sample k lies at k / sampleRateHz. Synthesis can sample any time, so the delay is removed
   * exactly and not to the nearest sample.
   */
  inputLeadS: number;
  /** |H| of the filters at a frequency, before decimation. */
  magnitudeAt(frequencyHz: number): number;
}

/** Designs the recorder for settings that the schema has accepted. */
export function designRecorder(settings: RecorderParameters): RecorderDesign {
  const limits = bandLimits(settings.bandwidth);
  const decimation = internalRateHz / settings.sampleRateHz;
  const high = limits ? highPass(limits.lowHz, internalRateHz) : null;
  const low = limits ? lowPass(limits.highHz, internalRateHz) : [];
  const mains = settings.mainsNotchHz === 0 ? [] : notch(settings.mainsNotchHz, internalRateHz);
  const sections = [...(high ? [high] : []), ...low, ...mains];
  const delaySamples = limits ? delayAtZeroHz(low) : (decimation - 1) / 2;
  const delayS = delaySamples / internalRateHz;
  return {
    settings,
    highPass: high,
    sections,
    decimation,
    take: limits ? 'sample' : 'mean',
    delayRemovedMs: delayS * msPerS,
    // An average of samples m … m + D − 1 is centred behind its first one; a filter's output lags its input.
    inputLeadS: limits ? delayS : -delayS,
    magnitudeAt: (frequencyHz) => magnitudeAt(sections, frequencyHz, internalRateHz),
  };
}
