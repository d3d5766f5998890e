import { randomStream, type RandomStream } from '../random';
import { runSection, statesPerSection } from '../recorder/biquad-cascade';
import { highPass } from '../recorder/high-pass';
import { lowPass } from '../recorder/low-pass';
import { electrodes } from './electrodes';
import type { PotentialSource } from './periodic';

/**
 * Noise is drawn at this rate and straight lines are drawn between, Hz. At a quarter of it, the images that the
 * lines leave behind are 17 dB down, and the band ends well below.
 */
const knotRateHz = 2000;
/**
 * Band of muscle activity at the skin, −3 dB at its edges, Hz: first order below, second order above. NR-14 (Friesen
 * et al. 1990, from memory) gives 20 to 500 Hz; that most of it lies below 250 is common practice, no source.
 */
const bandHz = { low: 20, high: 250 };
/** Knots that run before the first one is used, so that the filters have settled. */
const warmUpKnots = 400;
/** Knots drawn at a time. */
const batchLength = 256;

/** Makes white noise into muscle noise, in place, batch after batch. */
function createBandFilter(): (samples: Float64Array) => void {
  const sections = [highPass(bandHz.low, knotRateHz), ...lowPass(bandHz.high, knotRateHz, 1)];
  const state = new Float64Array(statesPerSection * sections.length);
  return (samples) => {
    sections.forEach((section, i) =>
      runSection(section, state, statesPerSection * i, samples, samples.length),
    );
  };
}

/**
 * RMS of unit white noise after the filter and after drawing straight lines between knots, with `perKnot` samples
 * to a knot: exact, from the filter's own correlation.
 */
function unitRms(perKnot: number): number {
  const response = new Float64Array(warmUpKnots);
  response[0] = 1;
  createBandFilter()(response);
  const correlation = (lag: number): number =>
    response.slice(lag).reduce((sum, value, i) => sum + value * response[i], 0);
  let variance = 0;
  for (let i = 0; i < perKnot; i++) {
    const w = i / perKnot;
    variance += (w * w + (1 - w) * (1 - w)) * correlation(0) + 2 * w * (1 - w) * correlation(1);
  }
  return Math.sqrt(variance / perKnot);
}

/** Filtered knots one after another, scaled by `gain`. */
function createKnots(gain: number, random: RandomStream): () => number {
  const filter = createBandFilter();
  const batch = new Float64Array(batchLength);
  let used = batchLength;
  const next = (): number => {
    if (used === batchLength) {
      for (let i = 0; i < batchLength; i++) batch[i] = gain * random.normal();
      filter(batch);
      used = 0;
    }
    return batch[used++];
  };
  for (let i = 0; i < warmUpKnots; i++) next();
  return next;
}

type AddNoise = (out: Float64Array, length: number) => void;

/** Adds straight lines between knots, `perKnot` samples each. */
function createElectrodeNoise(nextKnot: () => number, perKnot: number): AddNoise {
  let before = nextKnot();
  let after = nextKnot();
  let position = 0;
  return (out, length) => {
    for (let i = 0; i < length;) {
      const end = Math.min(length, i + perKnot - position);
      const slope = (after - before) / perKnot;
      for (; i < end; i++, position++) out[i] += before + slope * position;
      if (position < perKnot) return;
      position = 0;
      before = after;
      after = nextKnot();
    }
  };
}

/**
 * Muscle activity: band-limited Gaussian noise of `rmsMv`, independent at each electrode, one sequence of draws
 * after another; how it is cut changes no bit.
 *
 * @param rateHz a multiple of 2000
 */
export function createMuscleNoise(rmsMv: number, seed: number, rateHz: number): PotentialSource {
  const perKnot = rateHz / knotRateHz;
  const gain = rmsMv / unitRms(perKnot);
  const noises = electrodes.map((electrode) => ({
    electrode,
    addNoise: createElectrodeNoise(createKnots(gain, randomStream(seed, `muscle:${electrode}`)), perKnot),
  }));
  return {
    add(potentials, length) {
      for (const { electrode, addNoise } of noises) addNoise(potentials[electrode], length);
    },
  };
}
