import type { RandomStream } from '../random';
import type { SampleClock } from '../signal/wave-painter';
import { electrodes, type Electrode } from './electrodes';
import type { PotentialSource } from './periodic';

/** One movement of an electrode: a bump that rises for `riseS` and falls back over several times that. */
interface Movement {
  startS: number;
  electrode: Electrode;
  amplitudeMv: number;
  riseS: number;
}

/** The process runs from this time on, so that the pre-roll has its movements too (s). */
const processStartS = -31;
/** Size and rise of a movement, uniform between (chosen; larger than most QRS, slower than any). */
const amplitudeMv = { min: 0.4, max: 1.6 } as const;
const riseS = { min: 0.06, max: 0.25 } as const;
/** A movement is cut off after this many rises, at 4e-8 of its height. */
const endRises = 21;

const between = (range: { min: number; max: number }, u: number): number =>
  range.min + (range.max - range.min) * u;

/** Height of a unit movement at `t` s from its start: (t/rise) exp(1 − t/rise). */
function unitHeight(t: number, rise: number): number {
  return t <= 0 || t >= endRises * rise ? 0 : (t / rise) * Math.exp(1 - t / rise);
}

/**
 * Electrode movements at random times, `perMinute` a minute on average (a Poisson process), each at one electrode:
 * swings of the baseline that can hide or imitate a beat in the leads that this electrode serves.
 */
export function createMotion(
  perMinute: number,
  random: RandomStream,
  clock: SampleClock,
  first: number,
): PotentialSource {
  const draw = (afterS: number): Movement => ({
    startS: afterS - (Math.log(1 - random.uniform()) * 60) / perMinute,
    electrode: electrodes[Math.floor(random.uniform() * electrodes.length)],
    amplitudeMv: between(amplitudeMv, random.uniform()) * (random.uniform() < 0.5 ? -1 : 1),
    riseS: between(riseS, random.uniform()),
  });
  let upcoming = draw(processStartS);
  let active: Movement[] = [];
  let done = first;

  const addMovement = (movement: Movement, out: Float64Array, length: number): void => {
    for (let i = 0; i < length; i++) {
      const t = clock.firstTimeS + (done + i) / clock.rateHz - movement.startS;
      out[i] += movement.amplitudeMv * unitHeight(t, movement.riseS);
    }
  };

  return {
    add(potentials, length) {
      const startS = clock.firstTimeS + done / clock.rateHz;
      const endS = clock.firstTimeS + (done + length) / clock.rateHz;
      for (; upcoming.startS < endS; upcoming = draw(upcoming.startS)) active.push(upcoming);
      active = active.filter((movement) => movement.startS + endRises * movement.riseS > startS);
      for (const movement of active) addMovement(movement, potentials[movement.electrode], length);
      done += length;
    },
  };
}
