import { msPerS } from '../../units';

/** A sampled heart vector that starts `startMs` after its event, one sample per `stepMs`, zero outside. */
export interface SampledVector {
  startMs: number;
  stepMs: number;
  x: Float64Array;
  y: Float64Array;
  z: Float64Array;
}

/** A heart vector over one window of samples; mV in the Frank frame. */
export interface VectorWindow {
  x: Float64Array;
  y: Float64Array;
  z: Float64Array;
}

/** Sample m of a signal lies at `firstTimeS + m / rateHz`. */
export interface SampleClock {
  /** A divisor or a multiple of 1000, so that loops at 1 ms meet it in few phases. */
  rateHz: number;
  firstTimeS: number;
}

/** Cubic (four-point Lagrange) weights for a position `u` in [0, 1) between the two middle samples. */
function lagrangeWeights(u: number): [number, number, number, number] {
  return [
    (-u * (u - 1) * (u - 2)) / 6,
    ((u + 1) * (u - 1) * (u - 2)) / 2,
    (-(u + 1) * u * (u - 2)) / 2,
    ((u + 1) * u * (u - 1)) / 6,
  ];
}

function addPhase(
  out: Float64Array,
  values: Float64Array,
  weights: readonly [number, number, number, number],
  firstOut: number,
  endOut: number,
  outStep: number,
  firstIndex: number,
  indexStep: number,
): void {
  const [w0, w1, w2, w3] = weights;
  for (let m = firstOut, k = firstIndex; m < endOut; m += outStep, k += indexStep) {
    out[m] += w0 * values[k - 1] + w1 * values[k] + w2 * values[k + 1] + w3 * values[k + 2];
  }
}

/**
 * Adds a wave to samples [first, first + length) of a clock.
 *
 * The wave is interpolated with cubics between its 1 ms samples; the result at a sample depends on the
 * sample's absolute number only, never on where the window starts.
 *
 * @param out window of at least `length` samples; index 0 is sample `first`
 * @param eventTimeS time of the wave's event (its own zero)
 */
export function addWave(
  out: VectorWindow,
  clock: SampleClock,
  first: number,
  length: number,
  wave: SampledVector,
  eventTimeS: number,
): void {
  const phases = Math.max(1, Math.round((clock.rateHz * wave.stepMs) / msPerS));
  const indexStep = Math.max(1, Math.round(msPerS / (clock.rateHz * wave.stepMs)));
  const perSample = msPerS / (clock.rateHz * wave.stepMs);
  // Position, in wave samples, of clock sample 0.
  const origin = ((clock.firstTimeS - eventTimeS) * msPerS - wave.startMs) / wave.stepMs;
  for (let phase = 0; phase < phases; phase++) {
    const position = origin + phase * perSample;
    const whole = Math.floor(position);
    const weights = lagrangeWeights(position - whole);
    // Clock sample phase + n * phases sits at index whole + n * indexStep; keep 1 <= index <= size - 3.
    const nMin = Math.max(Math.ceil((1 - whole) / indexStep), Math.ceil((first - phase) / phases));
    const nMax = Math.min(
      Math.floor((wave.x.length - 3 - whole) / indexStep),
      Math.floor((first + length - 1 - phase) / phases),
    );
    if (nMax < nMin) continue;
    const firstOut = phase + nMin * phases - first;
    const endOut = phase + nMax * phases - first + 1;
    const firstIndex = whole + nMin * indexStep;
    addPhase(out.x, wave.x, weights, firstOut, endOut, phases, firstIndex, indexStep);
    addPhase(out.y, wave.y, weights, firstOut, endOut, phases, firstIndex, indexStep);
    addPhase(out.z, wave.z, weights, firstOut, endOut, phases, firstIndex, indexStep);
  }
}

/** Time, in s, at which a wave of an event is over. */
export function waveEndS(wave: SampledVector, eventTimeS: number): number {
  return eventTimeS + (wave.startMs + wave.x.length * wave.stepMs) / msPerS;
}
