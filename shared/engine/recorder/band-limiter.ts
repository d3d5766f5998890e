import { clearFadedStates, runBandPass, runSection, statesPerSection, type BandPass } from './biquad-cascade';
import { createDecimator, type Decimator } from './decimator';
import { highPass } from './high-pass';
import type { RecorderDesign } from './recorder-design';

/** Band-limits and decimates any number of channels, keeping state between calls. */
export interface BandLimiter {
  /**
   * Charges the high-pass with what came before, so that the recording starts settled. Protocol:
   *
   * 1. `settle` once and first, with the same channels over t in [−30 s, −1 s) at a low rate (250/s will do);
   * 2. `process` over t in [−1 s, 0) at the internal rate, which settles low-pass and notch; its output is
   *    thrown away;
   * 3. `process` from t = 0 on.
   *
   * The pre-roll's mean stands for all that came before it, so that even a high-pass of 0.01 Hz, whose time
   * constant is 16 s, starts within 5 µV of a run that began long ago, if the input repeats itself within the
   * pre-roll. Without a high-pass there is nothing to charge.
   *
   * @param channels the input up to the first sample that `process` will get, mV
   */
  settle(channels: readonly Float64Array[], rateHz: number): void;
  /**
   * Takes the next `length` inputs of every channel, in mV at the internal rate. Any length will do; how the
   * input is cut changes no bit of the output.
   *
   * @returns a channel of outputs each, mV, before the quantiser: one for every `decimation` inputs
   */
  process(channels: readonly Float64Array[], length: number): Float64Array[];
}

/**
 * Inputs that run between two looks for faded states. Fixed in the stream's own count, so that the looks fall on
 * the same samples however the input is cut.
 */
const segmentLength = 1024;

interface Channel {
  state: Float64Array;
  decimator: Decimator;
}

/** Value on the high-pass's capacitor after a stretch of low-rate input that began at the input's mean. */
function settledLevel(samples: Float64Array, lowHz: number, rateHz: number): number {
  if (samples.length === 0) return 0;
  const { a, b } = highPass(lowHz, rateHz);
  const mean = samples.reduce((sum, value) => sum + value, 0) / samples.length;
  // At rest on a level v the state is −b0 v; so it is read back as a level, whatever the rate.
  let state = -b[0] * mean;
  for (const input of samples) {
    const output = b[0] * input + state;
    state = b[1] * input - a[0] * output;
  }
  return -state / b[0];
}

/** A band-limiter at rest on 0 mV, for `channelCount` channels that do not touch each other. */
export function createBandLimiter(design: RecorderDesign, channelCount: number): BandLimiter {
  const { highPass: high, lowPass: low, notch } = design;
  const bandPass: BandPass | null = high && low ? [high, ...low] : null;
  const notchOffset = bandPass ? statesPerSection * bandPass.length : 0;
  const scratch = new Float64Array(segmentLength);
  const channels = Array.from({ length: channelCount }, (): Channel => ({
    state: new Float64Array(statesPerSection * design.sections.length),
    decimator: createDecimator(design.decimation, design.keep),
  }));
  let inSegment = 0;

  const filter = (state: Float64Array, input: Float64Array, from: number, length: number): void => {
    if (bandPass) runBandPass(bandPass, state, input, from, scratch, length);
    else for (let i = 0; i < length; i++) scratch[i] = input[from + i];
    if (notch) runSection(notch, state, notchOffset, scratch, length);
  };
  const runChannel = ({ state, decimator }: Channel, input: Float64Array, length: number): Float64Array => {
    const output = new Float64Array(decimator.count(length));
    if (design.sections.length === 0) {
      decimator.take(input, 0, length, output, 0);
      return output;
    }
    let kept = 0;
    let room = segmentLength - inSegment;
    for (let from = 0; from < length;) {
      const part = Math.min(room, length - from);
      filter(state, input, from, part);
      kept = decimator.take(scratch, 0, part, output, kept);
      from += part;
      room -= part;
      if (room > 0) continue;
      clearFadedStates(state);
      room = segmentLength;
    }
    return output;
  };

  return {
    settle(samples, rateHz) {
      const { limits } = design;
      if (!high || !limits) return;
      channels.forEach(({ state }, i) => {
        state[0] = -high.b[0] * settledLevel(samples[i], limits.lowHz, rateHz);
      });
    },
    process(inputs, length) {
      const outputs = channels.map((channel, i) => runChannel(channel, inputs[i], length));
      inSegment = (inSegment + length) % segmentLength;
      return outputs;
    },
  };
}
