import { bandLimits, type BandLimits } from '../../parameters/recorder';
import type { RecorderParameters } from '../../parameters/strip-parameters';
import { msPerS } from '../../units';
import { delayAtZeroHz } from './group-delay';
import { highPass } from './high-pass';
import { lowPass } from './low-pass';
import { notch } from './notch';
import { magnitudeAt, type Section } from './section';

/**
 * Rate at which strips are synthesized and band-limited: a 0.4 ms stimulus is 3.2 samples wide, where 2 kHz
 * would leave it less than one.
 */
const usualRateHz = 8000;
/**
 * Above this limit the rate is doubled: at 8 kHz the bilinear transform and the width of a sample would put a spike
 * off by 0.5 % of its height at 200 Hz and by 1.1 % at 300 Hz, where 1 % is allowed.
 */
const usualRateUpToHz = 200;

/** Internal rate for band limits, Hz. */
function internalRateFor(limits: BandLimits | null): number {
  return limits && limits.highHz > usualRateUpToHz ? 2 * usualRateHz : usualRateHz;
}

/**
 * Sections of the low-pass: two make the fourth order, which leaves −29 dB of alias at 150 Hz and 500/s where a
 * second-order one leaves −15.
 */
const lowPassSections = 2;

/** A recorder ready to run: filters at the internal rate and how its output is taken. */
export interface RecorderDesign {
  settings: RecorderParameters;
  /** −3 dB limits; null when unfiltered, and then there is neither high-pass nor low-pass. */
  limits: BandLimits | null;
  /** Rate of the input, Hz. */
  internalRateHz: number;
  highPass: Section | null;
  lowPass: readonly [Section, Section] | null;
  /** The mains notch; also in an unfiltered recorder. */
  notch: Section | null;
  /** Every section in the order in which they run: high-pass, low-pass, notch. */
  sections: readonly Section[];
  /** Internal samples to one output sample. */
  decimation: number;
  /** `mean`: the average of each output interval (unfiltered); `sample`: every `decimation`-th sample. */
  keep: 'sample' | 'mean';
  /** Delay that is removed, ms: the low-pass's at 0 Hz, or half of the averaged interval. The notch's stays. */
  delayRemovedMs: number;
  /**
   * The caller renders internal sample m at time m / internalRateHz + inputLeadS, ahead of what is put out, so
   * that output sample k lies at k / sampleRateHz. Synthesis can sample any time, so the delay is removed
   * exactly and not to the nearest sample.
   */
  inputLeadS: number;
  /** |H| of the sections at a frequency in Hz, before decimation. */
  magnitudeAt(frequencyHz: number): number;
}

/** Designs the recorder for settings that the schema has accepted. It takes microseconds, so nothing is cached. */
export function designRecorder(settings: RecorderParameters): RecorderDesign {
  const limits = bandLimits(settings.bandwidth);
  const internalRateHz = internalRateFor(limits);
  const decimation = internalRateHz / settings.sampleRateHz;
  const high = limits ? highPass(limits.lowHz, internalRateHz) : null;
  const low = limits ? lowPass(limits.highHz, internalRateHz, lowPassSections) : [];
  const mains = settings.mainsNotchHz === 0 ? null : notch(settings.mainsNotchHz, internalRateHz);
  const sections = [...(high ? [high] : []), ...low, ...(mains ? [mains] : [])];
  const delayS = (limits ? delayAtZeroHz(low) : (decimation - 1) / 2) / internalRateHz;
  return {
    settings,
    limits,
    internalRateHz,
    highPass: high,
    lowPass: limits ? [low[0], low[1]] : null,
    notch: mains,
    sections,
    decimation,
    keep: limits ? 'sample' : 'mean',
    delayRemovedMs: delayS * msPerS,
    // The mean of samples m … m + D − 1 is centred behind its first one; a filter's output lags its input.
    inputLeadS: limits ? delayS : -delayS,
    magnitudeAt: (frequencyHz) => magnitudeAt(sections, frequencyHz, internalRateHz),
  };
}

/**
 * The same recorder without its high-pass, so that 0 Hz passes: for an offline low-cut that runs both ways over the
 * finished recording. Nothing to settle, so `limits` is null.
 */
export function withoutLowCut(design: RecorderDesign): RecorderDesign {
  if (!design.lowPass) return design;
  const pass: Section = { k: 1, a: [0, 0], b: [1, 0, 0], z: [0, 0] };
  const sections = [pass, ...design.sections.slice(1)];
  return {
    ...design,
    limits: null,
    highPass: pass,
    sections,
    magnitudeAt: (frequencyHz) => magnitudeAt(sections, frequencyHz, design.internalRateHz),
  };
}

/**
 * A recorder that has no band-limit at all and takes the value of an instant for each output sample, as a sampler
 * without an anti-alias filter would; for showing what that does. The mains notch stays.
 */
export function withoutBandLimit(design: RecorderDesign): RecorderDesign {
  const sections = design.notch ? [design.notch] : [];
  return {
    ...design,
    limits: null,
    highPass: null,
    lowPass: null,
    sections,
    keep: 'sample',
    delayRemovedMs: 0,
    inputLeadS: 0,
    magnitudeAt: (frequencyHz) => magnitudeAt(sections, frequencyHz, design.internalRateHz),
  };
}
