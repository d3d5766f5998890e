import { highPass } from './sections';
import { blockForm, type BlockForm } from './block-form';
import type { RecorderDesign } from './recorder-design';
import { bandLimits } from '../../parameters/recorder';

/** Band-limits and decimates any number of channels, keeping state between calls. */
export interface BandLimiter {
  /**
   * Charges the high-pass with what came before, so that the recording starts settled: `channels` hold the
   * input up to the first sample that `process` will get, at a low rate. The pre-roll's mean stands for all
   * that came before it. Call once, first; then let `process` run over the last second before the recording,
   * which settles the low-pass and the notch, and throw that output away.
   */
  settle(channels: readonly Float64Array[], rateHz: number): void;
  /**
   * @param channels inputs at the internal rate, mV
   * @param length inputs to use; a multiple of the decimation
   * @returns a channel of length / decimation outputs each, mV, before the quantiser
   */
  process(channels: readonly Float64Array[], length: number): Float64Array[];
}

/** Value on the high-pass's capacitor after a stretch of low-rate input that began at the input's mean. */
function settledLevel(samples: Float64Array, lowHz: number, rateHz: number): number {
  const { a, b } = highPass(lowHz, rateHz);
  const mean = samples.reduce((sum, value) => sum + value, 0) / Math.max(1, samples.length);
  // At rest on a level v the state is −b0 v; so it is read back as a level, whatever the rate.
  let state = -b[0] * mean;
  for (const input of samples) {
    const output = b[0] * input + state;
    state = b[1] * input - a[0] * output;
  }
  return -state / b[0];
}

/** Advances one channel over `length` inputs. */
function runChannel(form: BlockForm, state: Float64Array, input: Float64Array, length: number): Float64Array {
  const { states, inputs, stateFromState, stateFromInput, outputFromState, outputFromInput } = form;
  const intervals = length / inputs;
  const output = new Float64Array(intervals);
  const next = new Float64Array(states);
  for (let interval = 0; interval < intervals; interval++) {
    const from = interval * inputs;
    let out = 0;
    for (let i = 0; i < states; i++) out += outputFromState[i] * state[i];
    for (let j = 0; j < inputs; j++) out += outputFromInput[j] * input[from + j];
    output[interval] = out;
    for (let row = 0; row < states; row++) {
      let sum = 0;
      const stateRow = row * states;
      for (let i = 0; i < states; i++) sum += stateFromState[stateRow + i] * state[i];
      const inputRow = row * inputs;
      for (let j = 0; j < inputs; j++) sum += stateFromInput[inputRow + j] * input[from + j];
      next[row] = sum;
    }
    state.set(next);
  }
  return output;
}

/** A band-limiter at rest. */
export function createBandLimiter(design: RecorderDesign, channelCount: number): BandLimiter {
  const form = blockForm(design.sections, design.decimation, design.take);
  const states = Array.from({ length: channelCount }, () => new Float64Array(form.states));
  const limits = bandLimits(design.settings.bandwidth);
  return {
    settle(channels, rateHz) {
      const { highPass: high } = design;
      if (!high || !limits) return;
      channels.forEach((samples, i) => {
        states[i][0] = -high.b[0] * settledLevel(samples, limits.lowHz, rateHz);
      });
    },
    process(channels, length) {
      if (length % design.decimation !== 0) {
        throw new RangeError(`${length} inputs are not a multiple of the decimation, ${design.decimation}`);
      }
      return states.map((state, i) => runChannel(form, state, channels[i], length));
    },
  };
}
