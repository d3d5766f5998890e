/**
 * Keeps one output for every `decimation` inputs, over as many calls as one likes.
 */
export interface Decimator {
  /** Outputs that the next `length` inputs will give. */
  count(length: number): number;
  /** Takes `input[0 … length)` and writes its outputs to `output` from `to` on; returns the index after the last. */
  take(input: Float64Array, length: number, output: Float64Array, to: number): number;
}

/** Output k is input k · decimation. */
function createSampler(decimation: number): Decimator {
  // Inputs still to pass before the next one that is kept.
  let wait = 0;
  return {
    count: (length) => Math.max(0, Math.ceil((length - wait) / decimation)),
    take(input, length, output, to) {
      let i = wait;
      let k = to;
      for (; i < length; i += decimation) output[k++] = input[i];
      wait = i - length;
      return k;
    },
  };
}

/** Output k is the mean of inputs k · decimation … (k + 1) · decimation − 1; it comes with the last of them. */
function createAverager(decimation: number): Decimator {
  let sum = 0;
  let taken = 0;
  return {
    count: (length) => Math.floor((taken + length) / decimation),
    take(input, length, output, to) {
      let k = to;
      for (let i = 0; i < length; i++) {
        sum += input[i];
        if (++taken < decimation) continue;
        output[k++] = sum / decimation;
        sum = 0;
        taken = 0;
      }
      return k;
    },
  };
}

/** A decimator at its start. */
export function createDecimator(decimation: number, keep: 'sample' | 'mean'): Decimator {
  return keep === 'mean' ? createAverager(decimation) : createSampler(decimation);
}
