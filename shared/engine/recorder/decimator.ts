/** Keeps one output for every `decimation` inputs, over as many calls as one likes. */
export interface Decimator {
  /** Outputs that the next `length` inputs will give. */
  count(length: number): number;
  /** Takes `input[from … end)` and writes its outputs to `output` from `to` on; returns the index after the last. */
  take(input: Float64Array, from: number, end: number, output: Float64Array, to: number): number;
}

/** Output k is input k · decimation. */
function createSampler(decimation: number): Decimator {
  // Inputs still to pass before the next one that is kept.
  let wait = 0;
  return {
    count: (length) => Math.max(0, Math.ceil((length - wait) / decimation)),
    take(input, from, end, output, to) {
      let i = from + wait;
      let k = to;
      for (; i < end; i += decimation) output[k++] = input[i];
      wait = i - end;
      return k;
    },
  };
}

/** Output k is the mean of inputs k · decimation … (k + 1) · decimation − 1; it comes with the last of them. */
function createAverager(decimation: number): Decimator {
  let carried = 0;
  let taken = 0;
  return {
    count: (length) => Math.floor((taken + length) / decimation),
    take(input, from, end, output, to) {
      let k = to;
      let i = from;
      while (i < end) {
        const stop = Math.min(end, i + decimation - taken);
        let sum = carried;
        taken += stop - i;
        for (; i < stop; i++) sum += input[i];
        carried = sum;
        if (taken < decimation) break;
        output[k++] = sum / decimation;
        carried = 0;
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
