/** Sampled heart vector of one depolarization and its repolarization, mV, body (Frank) axes. */
export interface VectorLoop {
  /** Time of the first sample on the configuration's clock (0 = event onset or stimulus), whole ms. */
  startMs: number;
  stepMs: 1;
  x: Float64Array;
  y: Float64Array;
  z: Float64Array;
}

/** Spacing of all loops; the spectrum at 145 Hz and above is more than 50 dB below its peak. */
export const loopStepMs = 1;
