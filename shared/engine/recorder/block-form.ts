import type { Section } from './sections';

/**
 * A cascade of sections, advanced a whole output interval at a time.
 *
 * With state s and the D inputs u of one interval, the output of the interval is c·s + d·u and the state after
 * it is F s + G u. Only one output in D is kept, so this is half the work of running every section sample by
 * sample, and its sums do not wait for each other. It is the same filter; a test holds it to fili's own.
 */
export interface BlockForm {
  states: number;
  inputs: number;
  /** F, row by row. */
  stateFromState: Float64Array;
  /** G, row by row. */
  stateFromInput: Float64Array;
  /** c. */
  outputFromState: Float64Array;
  /** d. */
  outputFromInput: Float64Array;
}

/** One step of a cascade in transposed direct form II; `state` (two numbers a section) is changed. */
function step(sections: readonly Section[], state: Float64Array, input: number): number {
  let value = input;
  sections.forEach(({ a, b, k }, i) => {
    const scaled = k * value;
    const output = b[0] * scaled + state[2 * i];
    state[2 * i] = b[1] * scaled - a[0] * output + state[2 * i + 1];
    state[2 * i + 1] = b[2] * scaled - a[1] * output;
    value = output;
  });
  return value;
}

/** Runs one output interval and returns its output: the first sample's, or the mean of all. */
function runInterval(
  sections: readonly Section[],
  state: Float64Array,
  inputs: Float64Array,
  take: 'sample' | 'mean',
): number {
  let first = 0;
  let sum = 0;
  inputs.forEach((input, i) => {
    const output = step(sections, state, input);
    if (i === 0) first = output;
    sum += output;
  });
  return take === 'mean' ? sum / inputs.length : first;
}

/** The block form of a cascade: columns of F, G, c and d are its responses to unit states and unit inputs. */
export function blockForm(
  sections: readonly Section[],
  decimation: number,
  take: 'sample' | 'mean',
): BlockForm {
  const states = 2 * sections.length;
  const form: BlockForm = {
    states,
    inputs: decimation,
    stateFromState: new Float64Array(states * states),
    stateFromInput: new Float64Array(states * decimation),
    outputFromState: new Float64Array(states),
    outputFromInput: new Float64Array(decimation),
  };
  for (let column = 0; column < states; column++) {
    const state = new Float64Array(states);
    state[column] = 1;
    form.outputFromState[column] = runInterval(sections, state, new Float64Array(decimation), take);
    state.forEach((value, row) => (form.stateFromState[row * states + column] = value));
  }
  for (let column = 0; column < decimation; column++) {
    const state = new Float64Array(states);
    const inputs = new Float64Array(decimation);
    inputs[column] = 1;
    form.outputFromInput[column] = runInterval(sections, state, inputs, take);
    state.forEach((value, row) => (form.stateFromInput[row * decimation + column] = value));
  }
  return form;
}
