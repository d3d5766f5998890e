import type { TimeSpan } from './layout';

/** Samples closer than this are drawn as one column with its least and greatest value, mm. */
export const columnMm = 0.05;

/** A point is left out only where the line stays within this of it, mm: a seventieth of the trace's weight. */
export const simplifyToleranceMm = 0.005;

/** Where and how a stretch of samples lies on paper. */
export interface TracePlacement {
  sampleRateHz: number;
  speedMmPerS: number;
  gainMmPerMv: number;
  /** x of `fromS`. */
  xMm: number;
  /** y of 0 mV. */
  baselineMm: number;
  /** The pen's stops: no point lies above the first or below the second. */
  topMm: number;
  bottomMm: number;
}

/** Index of the first sample at or after a time; the slack takes up rounding in `timeS`. */
function firstSampleFrom(timeS: number, sampleRateHz: number): number {
  return Math.ceil(timeS * sampleRateHz - 1e-6);
}

/** Indices [from, to) of the samples within a span. */
export function sampleRange(span: TimeSpan, sampleRateHz: number, length: number): [number, number] {
  return [
    Math.min(firstSampleFrom(span.fromS, sampleRateHz), length),
    Math.min(firstSampleFrom(span.toS, sampleRateHz), length),
  ];
}

/** Indices of the samples kept when `perColumn` of them share a column: first, last, each least and greatest. */
function keptSamples(samples: Float32Array, from: number, to: number, perColumn: number): number[] {
  const kept = [from];
  const keep = (index: number) => {
    if (index > kept[kept.length - 1]) kept.push(index);
  };
  for (let start = from; start < to; start += perColumn) {
    let least = start;
    let greatest = start;
    for (let i = start; i < Math.min(start + perColumn, to); i++) {
      if (samples[i] < samples[least]) least = i;
      if (samples[i] > samples[greatest]) greatest = i;
    }
    keep(Math.min(least, greatest));
    keep(Math.max(least, greatest));
  }
  keep(to - 1);
  return kept;
}

/**
 * Leaves out points that a straight line already passes within the tolerance of (a swinging door: the slopes
 * that still satisfy every point passed over). Ends and all turning points beyond the tolerance stay.
 * Points are x0, y0, x1, y1, … with x rising.
 */
function simplified(points: Float64Array): Float64Array {
  const out = [points[0], points[1]];
  let anchor = 0;
  let steepestDown = -Infinity;
  let steepestUp = Infinity;
  for (let i = 2; i < points.length; i += 2) {
    const dx = points[i] - points[anchor];
    const dy = points[i + 1] - points[anchor + 1];
    if (dy / dx < steepestDown || dy / dx > steepestUp) {
      anchor = i - 2;
      out.push(points[anchor], points[anchor + 1]);
      steepestDown = -Infinity;
      steepestUp = Infinity;
      i -= 2;
      continue;
    }
    steepestDown = Math.max(steepestDown, (dy - simplifyToleranceMm) / dx);
    steepestUp = Math.min(steepestUp, (dy + simplifyToleranceMm) / dx);
  }
  out.push(points[points.length - 2], points[points.length - 1]);
  return Float64Array.from(out);
}

/** Stretches of [from, to) without a gap (NaN), of at least two samples. */
function unbrokenRuns(samples: Float32Array, from: number, to: number): [number, number][] {
  const runs: [number, number][] = [];
  let start = from;
  for (let i = from; i <= to; i++) {
    if (i < to && !Number.isNaN(samples[i])) continue;
    if (i - start >= 2) runs.push([start, i]);
    start = i + 1;
  }
  return runs;
}

/**
 * The samples (mV) of a span as polylines in mm, one for each run without a gap: x0, y0, x1, y1, … Samples
 * denser than `columnMm` are reduced to the least and greatest of each column in time order, so that no spike
 * is lost however narrow. Beyond the pen's stops the line runs along them.
 */
export function tracePolylines(samples: Float32Array, span: TimeSpan, place: TracePlacement): Float64Array[] {
  const [from, to] = sampleRange(span, place.sampleRateHz, samples.length);
  const pitchMm = place.speedMmPerS / place.sampleRateHz;
  const perColumn = Math.max(1, Math.floor(columnMm / pitchMm + 1e-9));
  return unbrokenRuns(samples, from, to).map(([start, end]) => {
    const kept = keptSamples(samples, start, end, perColumn);
    const points = new Float64Array(kept.length * 2);
    kept.forEach((index, i) => {
      const yMm = place.baselineMm - samples[index] * place.gainMmPerMv;
      points[2 * i] = place.xMm + (index / place.sampleRateHz - span.fromS) * place.speedMmPerS;
      points[2 * i + 1] = Math.min(place.bottomMm, Math.max(place.topMm, yMm));
    });
    return simplified(points);
  });
}
