import { readStripParameters } from '../../shared/parameters/parse';
import type { RecorderParameters } from '../../shared/parameters/strip-parameters';
import { createBandLimiter } from '../../shared/engine/recorder/band-limiter';
import { designRecorder } from '../../shared/engine/recorder/recorder-design';

export const sampleRates = [250, 500, 1000, 2000] as const;
export const bandwidths = ['diagnostic', 'slowWave', 'monitor', 'unfiltered'] as const;

/** Settings of the recorder, or null when the schema refuses the pair. */
export function recorderSettings(overrides: object): RecorderParameters | null {
  const result = readStripParameters({ recorder: overrides });
  return result.ok ? result.parameters.recorder : null;
}

/** Every named bandwidth at every sample rate that the schema allows with it. */
export function allowedPairs(names: readonly (typeof bandwidths)[number][]): RecorderParameters[] {
  return names.flatMap((bandwidth) =>
    sampleRates.flatMap((sampleRateHz) => recorderSettings({ bandwidth, sampleRateHz }) ?? []),
  );
}

/**
 * Runs a signal, given as a function of time in s, through the running recorder from `fromS` on (at rest before) and
 * returns the outputs of [0, toS), mV before the quantiser.
 */
export function record(
  settings: RecorderParameters,
  signal: (timeS: number) => number,
  fromS: number,
  toS: number,
): Float64Array {
  const design = designRecorder(settings);
  const limiter = createBandLimiter(design, 1);
  const first = Math.round(fromS * settings.sampleRateHz) * design.decimation;
  const inputs = Float64Array.from(
    { length: Math.round(toS * settings.sampleRateHz) * design.decimation - first },
    (_, i) => signal((first + i) / design.internalRateHz + design.inputLeadS),
  );
  const [output] = limiter.process([inputs], inputs.length);
  return output.subarray(-first / design.decimation);
}

/** Amplitude of the sine of a frequency in samples, by least squares with an offset. */
export function fittedAmplitude(samples: Float64Array, frequencyHz: number, rateHz: number): number {
  // Normal equations over cosine, sine and a constant.
  const sums = Array.from({ length: 3 }, () => [0, 0, 0, 0]);
  samples.forEach((value, i) => {
    const angle = (2 * Math.PI * frequencyHz * i) / rateHz;
    const row = [Math.cos(angle), Math.sin(angle), 1];
    for (let r = 0; r < 3; r++) {
      for (let c = 0; c < 3; c++) sums[r][c] += row[r] * row[c];
      sums[r][3] += row[r] * value;
    }
  });
  for (let pivot = 0; pivot < 3; pivot++) {
    for (let r = 0; r < 3; r++) {
      if (r === pivot) continue;
      const factor = sums[r][pivot] / sums[pivot][pivot];
      for (let c = pivot; c < 4; c++) sums[r][c] -= factor * sums[pivot][c];
    }
  }
  return Math.hypot(sums[0][3] / sums[0][0], sums[1][3] / sums[1][1]);
}

/** Slope of the least-squares line through samples, mV/s. */
export function lineSlope(samples: Float64Array, rateHz: number): number {
  const middle = (samples.length - 1) / 2;
  let products = 0;
  let squares = 0;
  samples.forEach((value, i) => {
    products += (i - middle) * value;
    squares += (i - middle) ** 2;
  });
  return (products / squares) * rateHz;
}
