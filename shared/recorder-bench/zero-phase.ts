import { highPass } from '../engine/recorder/high-pass';
import type { Section } from '../engine/recorder/section';

/**
 * The state at which a section rests on a constant input of 1: what SciPy's `lfilter_zi` gives.
 * First order only, as the high-pass is.
 */
function restingState({ a, b, k }: Section): number {
  const gain = (k * (b[0] + b[1])) / (1 + a[0]);
  return k * b[1] - a[0] * gain;
}

/** One pass over the samples, begun at rest on the first of them. */
function pass(section: Section, samples: Float64Array): Float64Array {
  const { a, b, k } = section;
  const output = new Float64Array(samples.length);
  let state = restingState(section) * samples[0];
  for (let i = 0; i < samples.length; i++) {
    output[i] = k * b[0] * samples[i] + state;
    state = k * b[1] * samples[i] - a[0] * output[i];
  }
  return output;
}

/**
 * First-order low-cut run forwards and then backwards, so that phases stay and the limit counts twice: −3 dB at
 * `lowHz` is −6 dB altogether, and so each pass is designed at the frequency where two passes leave −3 dB.
 *
 * Beyond both ends the recording is continued by its own image turned about the end point, as SciPy's `filtfilt`
 * does (padtype `odd`), for three time constants or as far as there are samples.
 *
 * @param lowHz where the result is 3.01 dB down
 */
export function filterBothWays(samples: Float64Array, lowHz: number, rateHz: number): Float64Array {
  if (samples.length < 2) return new Float64Array(samples.length);
  // |H|² of one pass is f² / (f² + c²); it is to be 1/√2 at lowHz.
  const section = highPass(onePassHz(lowHz), rateHz);
  const extent = Math.min(samples.length - 1, Math.ceil((3 * rateHz) / (2 * Math.PI * lowHz)));
  const extended = new Float64Array(samples.length + 2 * extent);
  const last = samples.length - 1;
  for (let i = 0; i < extent; i++) {
    extended[i] = 2 * samples[0] - samples[extent - i];
    extended[extent + samples.length + i] = 2 * samples[last] - samples[last - 1 - i];
  }
  extended.set(samples, extent);
  const forwards = pass(section, extended).reverse();
  return pass(section, forwards)
    .reverse()
    .slice(extent, extent + samples.length);
}

/** Limit of a single pass of which two leave −3.01 dB at `lowHz`, Hz. */
export function onePassHz(lowHz: number): number {
  return lowHz * Math.sqrt(Math.SQRT2 - 1);
}
