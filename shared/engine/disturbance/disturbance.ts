import type { StripParameters } from '../../parameters/strip-parameters';
import type { MeasuredLead } from '../leads';
import { randomStream } from '../random';
import type { SampleClock } from '../signal/wave-painter';
import { baselineWander } from './baseline-wander';
import { addToLeads, electrodePotentials } from './electrodes';
import { mainsInterference } from './mains';
import { createMotion } from './motion';
import { createMuscleNoise } from './muscle-noise';
import { createPeriodicSource, type PotentialSource } from './periodic';

/** Disturbance as a running sum over the measured leads. */
export interface Disturbance {
  /** Adds the next `length` samples, mV. */
  add(leads: Record<MeasuredLead, Float64Array>, length: number): void;
}

type DisturbedParameters = Pick<StripParameters, 'seed' | 'patient' | 'disturbance'>;

/** Whether anything disturbs the strip. */
export function isDisturbed({ disturbance }: Pick<StripParameters, 'disturbance'>): boolean {
  const { baselineWanderMv, mainsMv, muscleMv, motionPerMinute } = disturbance;
  return baselineWanderMv > 0 || mainsMv > 0 || muscleMv > 0 || motionPerMinute > 0;
}

function slowSources(parameters: DisturbedParameters, clock: SampleClock, first: number): PotentialSource[] {
  const { seed, patient, disturbance } = parameters;
  const sources: PotentialSource[] = [];
  if (disturbance.baselineWanderMv > 0) {
    const random = randomStream(seed, 'baselineWander');
    const components = baselineWander(disturbance.baselineWanderMv, patient.respiratoryRateBpm, random);
    sources.push(createPeriodicSource(components, clock, first));
  }
  if (disturbance.motionPerMinute > 0) {
    sources.push(createMotion(disturbance.motionPerMinute, randomStream(seed, 'motion'), clock, first));
  }
  return sources;
}

function fastSources(parameters: DisturbedParameters, clock: SampleClock, first: number): PotentialSource[] {
  const { seed, disturbance } = parameters;
  const sources: PotentialSource[] = [];
  if (disturbance.mainsMv > 0) {
    const random = randomStream(seed, 'mains');
    const components = mainsInterference(disturbance.mainsMv, disturbance.mainsHz, random);
    sources.push(createPeriodicSource(components, clock, first));
  }
  if (disturbance.muscleMv > 0) {
    sources.push(createMuscleNoise(disturbance.muscleMv, seed, clock.rateHz));
  }
  return sources;
}

/**
 * Disturbance at the electrodes from the clock's sample `first` on. Wander and motion are functions of time, the
 * same on every clock. `slowOnly` leaves out mains and muscle, which a settling high-pass does not see.
 */
export function createDisturbance(
  parameters: DisturbedParameters,
  clock: SampleClock,
  first: number,
  { slowOnly = false } = {},
): Disturbance {
  const sources = [
    ...slowSources(parameters, clock, first),
    ...(slowOnly ? [] : fastSources(parameters, clock, first)),
  ];
  return {
    add(leads, length) {
      if (sources.length === 0) return;
      const potentials = electrodePotentials(length);
      for (const source of sources) source.add(potentials, length);
      addToLeads(leads, potentials, length);
    },
  };
}
