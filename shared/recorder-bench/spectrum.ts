import Fili from 'fili';

/** A power spectrum in bands of a twelfth of an octave. */
export interface Spectrum {
  /** Middle of each band, Hz. */
  frequencyHz: Float64Array;
  /** Amplitude density, µV/√Hz. */
  density: Float64Array;
}

/** Segments are about this long, s, so that 0.5 Hz is told apart. */
const segmentS = 4;
const bandsPerOctave = 12;
const lowestHz = 0.5;

/**
 * Welch's estimate: overlapping segments under a Hann window, each freed of its mean, their periodograms averaged
 * (Welch 1967, IEEE Trans Audio Electroacoust 15:70; formula from memory, tested against SciPy).
 *
 * @param samples mV
 * @returns mV²/Hz for frequencies 0, rate/length, … up to half of the rate
 */
export function welch(samples: Float64Array, rateHz: number, length: number): Float64Array {
  const window = Float64Array.from({ length }, (_, i) => 0.5 - 0.5 * Math.cos((2 * Math.PI * i) / length));
  const power = window.reduce((sum, value) => sum + value * value, 0) * rateHz;
  const transform = new Fili.Fft(length);
  const sum = new Float64Array(length / 2 + 1);
  let segments = 0;
  for (let from = 0; from + length <= samples.length; from += length / 2) {
    const part = samples.subarray(from, from + length);
    const mean = part.reduce((total, value) => total + value, 0) / length;
    const { re, im } = transform.forward(
      part.map((value, i) => (value - mean) * window[i]),
      'none',
    );
    for (let k = 0; k < sum.length; k++) {
      // Both halves of the spectrum, but for its two ends.
      const sides = k === 0 || k === length / 2 ? 1 : 2;
      sum[k] += (sides * (re[k] ** 2 + im[k] ** 2)) / power;
    }
    segments++;
  }
  return sum.map((value) => value / Math.max(1, segments));
}

/** Longest power of two that fits a segment, and at least once into the samples. */
function segmentLength(count: number, rateHz: number): number {
  return 2 ** Math.floor(Math.log2(Math.min(count, segmentS * rateHz)));
}

/** Amplitude density of samples in mV, averaged over bands; empty for fewer than 16 samples. */
export function spectrumOf(samples: Float64Array, rateHz: number): Spectrum {
  if (samples.length < 16) return { frequencyHz: new Float64Array(), density: new Float64Array() };
  const length = segmentLength(samples.length, rateHz);
  const density = welch(samples, rateHz, length);
  const binHz = rateHz / length;
  const bands: { hz: number; value: number }[] = [];
  for (let band = 0; ; band++) {
    const fromHz = lowestHz * 2 ** ((band - 0.5) / bandsPerOctave);
    const toHz = lowestHz * 2 ** ((band + 0.5) / bandsPerOctave);
    if (toHz > rateHz / 2) break;
    const from = Math.ceil(fromHz / binHz);
    const end = Math.max(from + 1, Math.ceil(toHz / binHz));
    // Below, bands are narrower than what can be told apart; the nearest bin speaks for several of them once.
    if (end - from === 1 && from * binHz >= toHz) continue;
    const bins = density.subarray(from, end);
    const mean = bins.reduce((total, value) => total + value, 0) / bins.length;
    bands.push({ hz: Math.sqrt(fromHz * toHz), value: 1000 * Math.sqrt(mean) });
  }
  return {
    frequencyHz: Float64Array.from(bands, ({ hz }) => hz),
    density: Float64Array.from(bands, ({ value }) => value),
  };
}
