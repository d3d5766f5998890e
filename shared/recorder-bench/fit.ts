/** Solves a small system of linear equations (rows of coefficients with the right side last) by elimination. */
function solve(rows: number[][]): number[] {
  const n = rows.length;
  for (let pivot = 0; pivot < n; pivot++) {
    const best = rows.slice(pivot).reduce((at, row, i) => {
      return Math.abs(row[pivot]) > Math.abs(rows[at][pivot]) ? pivot + i : at;
    }, pivot);
    [rows[pivot], rows[best]] = [rows[best], rows[pivot]];
    for (let r = 0; r < n; r++) {
      if (r === pivot) continue;
      const factor = rows[r][pivot] / rows[pivot][pivot];
      for (let c = pivot; c <= n; c++) rows[r][c] -= factor * rows[pivot][c];
    }
  }
  return rows.map((row, i) => row[n] / row[i]);
}

export interface FittedSine {
  /** In the samples' unit. */
  amplitude: number;
  /** Phase against sin(2π f t) with t = 0 at the first sample, rad in (−π, π]. */
  phaseRad: number;
}

/**
 * The sine of a frequency in samples, by least squares together with a constant and, where a time constant is given,
 * with an exponential that dies away: the transient of a first-order low-cut, which would otherwise have to be
 * waited out.
 *
 * @param decayS time constant of the transient, s; null when there is none
 */
export function fitSine(
  samples: Float64Array,
  frequencyHz: number,
  rateHz: number,
  decayS: number | null = null,
): FittedSine {
  const size = decayS === null ? 3 : 4;
  const sums = Array.from({ length: size }, () => new Array<number>(size + 1).fill(0));
  const row = new Array<number>(size).fill(1);
  for (let i = 0; i < samples.length; i++) {
    const angle = (2 * Math.PI * frequencyHz * i) / rateHz;
    row[0] = Math.sin(angle);
    row[1] = Math.cos(angle);
    if (decayS !== null) row[3] = Math.exp(-i / (rateHz * decayS));
    for (let r = 0; r < size; r++) {
      for (let c = 0; c < size; c++) sums[r][c] += row[r] * row[c];
      sums[r][size] += row[r] * samples[i];
    }
  }
  const [sine, cosine] = solve(sums);
  return { amplitude: Math.hypot(sine, cosine), phaseRad: Math.atan2(cosine, sine) };
}

/** Slope of the least-squares line through samples, units/s. */
export function lineSlope(samples: Float64Array, rateHz: number): number {
  const middle = (samples.length - 1) / 2;
  let products = 0;
  let squares = 0;
  for (let i = 0; i < samples.length; i++) {
    products += (i - middle) * samples[i];
    squares += (i - middle) ** 2;
  }
  return (products / squares) * rateHz;
}

/** Largest absolute value; 0 of none. */
export function largest(samples: Float64Array): number {
  let most = 0;
  for (const value of samples) most = Math.max(most, Math.abs(value));
  return most;
}
