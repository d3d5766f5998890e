import { describe, expect, it } from 'vitest';
import { baselineWander } from '../../../shared/engine/disturbance/baseline-wander';
import { mainsInterference } from '../../../shared/engine/disturbance/mains';
import { createMotion } from '../../../shared/engine/disturbance/motion';
import { createMuscleNoise } from '../../../shared/engine/disturbance/muscle-noise';
import { createPeriodicSource } from '../../../shared/engine/disturbance/periodic';
import { randomStream } from '../../../shared/engine/random';
import {
  clock,
  correlation,
  electrodes,
  lineAmplitude,
  peakToPeak,
  potentialsOf,
  powerDensity,
  rms,
} from './disturbance-bench';

const seeds = [1, 2, 3, 4, 5];
const slowClock = { rateHz: 250, firstTimeS: 0 };

function wander(seed: number, respiratoryRateBpm: number, seconds: number, peakToPeakMv = 1) {
  const components = baselineWander(peakToPeakMv, respiratoryRateBpm, randomStream(seed, 'baselineWander'));
  return potentialsOf(createPeriodicSource(components, slowClock, 0), seconds * slowClock.rateHz);
}

describe('baseline wander', () => {
  it('swings about as far as it is told at an electrode, and in proportion', () => {
    for (const seed of seeds) {
      const one = wander(seed, 14, 60);
      const half = wander(seed, 14, 60, 0.5);
      for (const electrode of electrodes) {
        expect(peakToPeak(one[electrode])).toBeGreaterThan(0.5);
        expect(peakToPeak(one[electrode])).toBeLessThan(1.2);
        expect(peakToPeak(half[electrode])).toBeCloseTo(peakToPeak(one[electrode]) / 2, 9);
      }
    }
  });

  it('breathes at the breathing rate: its strongest line above 0.15 Hz (NR-11: 0.15 to 0.3 Hz)', () => {
    for (const [respiratoryRateBpm, lineHz] of [
      [12, 0.2],
      [15, 0.25],
      [18, 0.3],
    ]) {
      const { LA } = wander(1, respiratoryRateBpm, 300);
      const lines = Array.from({ length: 50 }, (_, i) => 0.15 + 0.01 * i);
      const sizes = lines.map((line) => lineAmplitude(LA, line, slowClock.rateHz));
      expect(lines[sizes.indexOf(Math.max(...sizes))]).toBeCloseTo(lineHz, 6);
    }
  });

  it('has no power above 0.6 Hz at rest', () => {
    const { V3 } = wander(2, 14, 300);
    for (const line of [0.7, 1, 2, 5]) expect(lineAmplitude(V3, line, slowClock.rateHz)).toBeLessThan(0.003);
  });

  it('without breathing only drifts, below 0.15 Hz', () => {
    const { RA } = wander(3, 0, 600);
    expect(peakToPeak(RA)).toBeGreaterThan(0.2);
    for (const line of [0.2, 0.25, 0.5])
      expect(lineAmplitude(RA, line, slowClock.rateHz)).toBeLessThan(0.003);
  });

  it('differs between electrodes, or no lead would show it', () => {
    for (const seed of seeds) {
      const { RA, LA } = wander(seed, 14, 60);
      expect(peakToPeak(LA.map((value, i) => value - RA[i]))).toBeGreaterThan(0.05);
    }
  });
});

describe('mains', () => {
  function mains(seed: number, mainsHz: number, seconds: number) {
    const components = mainsInterference(0.1, mainsHz, randomStream(seed, 'mains'));
    return potentialsOf(createPeriodicSource(components, clock, 0), seconds * clock.rateHz);
  }

  it.each([50, 60])('sounds at %d Hz with small odd harmonics', (mainsHz) => {
    for (const seed of seeds.slice(0, 2)) {
      const { V1 } = mains(seed, mainsHz, 1);
      const fundamental = lineAmplitude(V1, mainsHz, clock.rateHz);
      expect(fundamental).toBeGreaterThan(0.1 * 0.4 * 0.65);
      expect(fundamental).toBeLessThanOrEqual(0.1);
      for (const order of [3, 5]) {
        const harmonic = lineAmplitude(V1, order * mainsHz, clock.rateHz);
        expect(harmonic).toBeGreaterThan(0.02 * fundamental);
        expect(harmonic).toBeLessThan(0.15 * fundamental);
      }
      expect(lineAmplitude(V1, 2 * mainsHz, clock.rateHz)).toBeLessThan(0.01 * fundamental);
      expect(lineAmplitude(V1, mainsHz === 50 ? 60 : 50, clock.rateHz)).toBeLessThan(0.02 * fundamental);
    }
  });

  it('swings slowly in size, by a few tenths at most', () => {
    for (const seed of seeds) {
      const { LL } = mains(seed, 50, 20);
      const sizes = Array.from({ length: 50 }, (_, i) =>
        lineAmplitude(LL.subarray(i * 3200, (i + 1) * 3200), 50, clock.rateHz),
      );
      const ratio = Math.max(...sizes) / Math.min(...sizes);
      expect(ratio).toBeGreaterThan(1.2);
      expect(ratio).toBeLessThan(1.5);
    }
  });

  it('reaches electrodes unequally, so that it does not cancel in the leads', () => {
    const { RA, LA } = mains(4, 50, 1);
    expect(
      lineAmplitude(
        LA.map((value, i) => value - RA[i]),
        50,
        clock.rateHz,
      ),
    ).toBeGreaterThan(0.005);
  });
});

describe('muscle noise', () => {
  const seconds = 10;
  const rmsMv = 0.05;
  const noise = potentialsOf(createMuscleNoise(rmsMv, 11, clock.rateHz), seconds * clock.rateHz);

  it('has the RMS that it is told at every electrode', () => {
    // 250 Hz of bandwidth over 10 s are some 5000 independent values: 1 % standard error; 4 % is four of them.
    for (const electrode of electrodes)
      expect(Math.abs(rms(noise[electrode]) / rmsMv - 1)).toBeLessThan(0.04);
  });

  it('has the same RMS at every internal rate', () => {
    for (const rateHz of [16000, 32000]) {
      const { V5 } = potentialsOf(createMuscleNoise(rmsMv, 11, rateHz), seconds * rateHz);
      expect(Math.abs(rms(V5) / rmsMv - 1)).toBeLessThan(0.04);
    }
  });

  it('is independent between electrodes', () => {
    electrodes.forEach((a, i) =>
      electrodes.slice(i + 1).forEach((b) => {
        expect(Math.abs(correlation(noise[a], noise[b]))).toBeLessThan(0.06);
      }),
    );
  });

  it('is Gaussian: skewness and excess kurtosis near nothing', () => {
    const { V1 } = noise;
    const sigma = rms(V1);
    const moment = (power: number): number =>
      V1.reduce((sum, value) => sum + (value / sigma) ** power, 0) / V1.length;
    expect(Math.abs(moment(3))).toBeLessThan(0.15);
    expect(Math.abs(moment(4) - 3)).toBeLessThan(0.3);
  });

  it('lies between about 20 and 250 Hz (NR-14: from 20 Hz; upper edge common practice)', () => {
    // Mean density in bands, over all electrodes so that the estimate is steady.
    const density = (from: number, to: number): number => {
      const lines = Array.from({ length: 4 }, (_, i) => from + ((to - from) * i) / 3);
      const sums = electrodes.map((electrode) =>
        powerDensity(noise[electrode].subarray(0, 5 * clock.rateHz), lines, clock.rateHz, 2000).reduce(
          (sum, one) => sum + one,
          0,
        ),
      );
      return sums.reduce((sum, one) => sum + one, 0);
    };
    const middle = density(60, 120);
    expect(density(4, 8) / middle).toBeLessThan(0.25);
    expect(density(236, 264) / middle).toBeGreaterThan(0.3);
    expect(density(236, 264) / middle).toBeLessThan(0.7);
    expect(density(700, 900) / middle).toBeLessThan(0.03);
    expect(density(1700, 2300) / middle).toBeLessThan(0.01);
  }, 30_000);
});

describe('electrode movement', () => {
  function motion(perMinute: number, seconds: number, seed = 5) {
    return potentialsOf(createMotion(perMinute, randomStream(seed, 'motion'), slowClock, 0), seconds * 250);
  }

  it('comes about as often as it is told', () => {
    // Rising edges through 0.2 mV in any electrode, over ten minutes: 100 expected, ±3 standard deviations.
    const potentials = motion(10, 600);
    let edges = 0;
    for (const electrode of electrodes) {
      const values = potentials[electrode];
      for (let i = 1; i < values.length; i++)
        if (Math.abs(values[i - 1]) < 0.2 && Math.abs(values[i]) >= 0.2) edges++;
    }
    expect(edges).toBeGreaterThan(70);
    expect(edges).toBeLessThan(130);
  });

  it('moves one electrode at a time, by up to 1.6 mV', () => {
    const potentials = motion(2, 600);
    for (const electrode of electrodes) expect(peakToPeak(potentials[electrode])).toBeLessThan(2 * 1.6);
    expect(correlation(potentials.V1, potentials.V2)).toBeLessThan(0.2);
  });
});
