/** A running sine and cosine; its next values follow from its last, so the window size changes nothing. */
export interface Oscillator {
  /** Fills both arrays with the next `length` samples. */
  next(cosine: Float64Array, sine: Float64Array, length: number): void;
}

/** The rotation is set back to the exact angle after this many samples, before rounding can add up. */
const renewEvery = 4096;

/** Fills [from, end) with a rotation that begins at (c, s); returns where it goes on. */
function rotate(
  cosine: Float64Array,
  sine: Float64Array,
  from: number,
  end: number,
  firstC: number,
  firstS: number,
  turnCos: number,
  turnSin: number,
): [number, number] {
  let c = firstC;
  let s = firstS;
  for (let i = from; i < end; i++) {
    cosine[i] = c;
    sine[i] = s;
    const nextC = c * turnCos - s * turnSin;
    s = s * turnCos + c * turnSin;
    c = nextC;
  }
  return [c, s];
}

/**
 * cos and sin of 2π f t + phase at t = firstTimeS + m / rateHz for m = 0, 1, 2, …
 */
export function createOscillator(
  frequencyHz: number,
  phaseRad: number,
  rateHz: number,
  firstTimeS: number,
): Oscillator {
  const turn = (2 * Math.PI * frequencyHz) / rateHz;
  const turnCos = Math.cos(turn);
  const turnSin = Math.sin(turn);
  const start = 2 * Math.PI * frequencyHz * firstTimeS + phaseRad;
  let m = 0;
  let c = 0;
  let s = 0;
  return {
    next(cosine, sine, length) {
      for (let i = 0; i < length;) {
        const sinceRenewal = m % renewEvery;
        if (sinceRenewal === 0) {
          c = Math.cos(start + turn * m);
          s = Math.sin(start + turn * m);
        }
        const run = Math.min(length - i, renewEvery - sinceRenewal);
        [c, s] = rotate(cosine, sine, i, i + run, c, s, turnCos, turnSin);
        i += run;
        m += run;
      }
    },
  };
}
