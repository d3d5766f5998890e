import Fili from 'fili';
import { randomStream, type RandomStream } from '../random';
import { electrodes, type Electrode } from './electrodes';
import type { PotentialSource } from './periodic';

/** Noise is drawn at this rate and drawn out linearly between, Hz; muscle has little above half of it. */
const knotRateHz = 1000;
/** Band of surface muscle activity, Hz (common practice, no source: about 20 to 250 Hz). */
const bandHz = { low: 20, high: 250 };
/** Knots that run before the first one is used, so that the filters have settled. */
const warmUpKnots = 400;

interface BandFilter {
  singleStep(input: number): number;
}

function bandFilter(): BandFilter {
  const cascades = new Fili.CalcCascades();
  const common = {
    order: 1,
    characteristic: 'butterworth',
    Fs: knotRateHz,
    gain: 0,
    preGain: false,
  } as const;
  const low = cascades.lowpass({ ...common, Fc: bandHz.high });
  const k = Math.tan((Math.PI * bandHz.low) / knotRateHz);
  const n = 1 / (1 + k);
  return new Fili.IirFilter([{ k: 1, a: [(k - 1) * n, 0], b: [n, -n, 0], z: [0, 0] }, ...low]);
}

/**
 * RMS of unit white noise after the filter and after drawing straight lines between knots, with `perKnot` samples
 * to a knot: exact, from the filter's own correlation.
 */
function unitRms(perKnot: number): number {
  const filter = bandFilter();
  const response = Array.from({ length: warmUpKnots }, (_, i) => filter.singleStep(i === 0 ? 1 : 0));
  const correlation = (lag: number): number =>
    response.slice(lag).reduce((sum, value, i) => sum + value * response[i], 0);
  let variance = 0;
  for (let i = 0; i < perKnot; i++) {
    const w = i / perKnot;
    variance += (w * w + (1 - w) * (1 - w)) * correlation(0) + 2 * w * (1 - w) * correlation(1);
  }
  return Math.sqrt(variance / perKnot);
}

function electrodeNoise(rmsMv: number, perKnot: number, random: RandomStream) {
  const filter = bandFilter();
  const gain = rmsMv / unitRms(perKnot);
  const knot = (): number => gain * filter.singleStep(random.normal());
  for (let i = 0; i < warmUpKnots; i++) knot();
  let before = knot();
  let after = knot();
  let position = 0;
  return (out: Float64Array, length: number): void => {
    for (let i = 0; i < length; i++) {
      out[i] += before + ((after - before) * position) / perKnot;
      if (++position < perKnot) continue;
      position = 0;
      before = after;
      after = knot();
    }
  };
}

/** Muscle activity: band-limited Gaussian noise of `rmsMv`, independent at each electrode. `rateHz` is a multiple of 1000. */
export function createMuscleNoise(rmsMv: number, seed: number, rateHz: number): PotentialSource {
  const perKnot = rateHz / knotRateHz;
  const noises: [Electrode, ReturnType<typeof electrodeNoise>][] = electrodes.map((electrode) => [
    electrode,
    electrodeNoise(rmsMv, perKnot, randomStream(seed, `muscle:${electrode}`)),
  ]);
  return {
    add(potentials, length) {
      for (const [electrode, addNoise] of noises) addNoise(potentials[electrode], length);
    },
  };
}
