import type { SampleClock } from '../signal/wave-painter';
import { electrodes, type Electrode, type ElectrodePotentials } from './electrodes';
import { createOscillator } from './oscillator';

/** One sine with its own size and phase at each electrode. */
export interface PeriodicComponent {
  frequencyHz: number;
  at: Readonly<Record<Electrode, { amplitudeMv: number; phaseRad: number }>>;
}

/** Adds its next samples to electrode potentials. */
export interface PotentialSource {
  add(potentials: ElectrodePotentials, length: number): void;
}

/** Components that sound together, from the clock's sample `first` on. */
export function createPeriodicSource(
  components: readonly PeriodicComponent[],
  clock: SampleClock,
  first: number,
): PotentialSource {
  const firstTimeS = clock.firstTimeS + first / clock.rateHz;
  const running = components.map((component) => ({
    oscillator: createOscillator(component.frequencyHz, 0, clock.rateHz, firstTimeS),
    weights: electrodes.map((electrode) => {
      const { amplitudeMv, phaseRad } = component.at[electrode];
      return { cosine: amplitudeMv * Math.sin(phaseRad), sine: amplitudeMv * Math.cos(phaseRad) };
    }),
  }));
  return {
    add(potentials, length) {
      const cosine = new Float64Array(length);
      const sine = new Float64Array(length);
      for (const { oscillator, weights } of running) {
        oscillator.next(cosine, sine, length);
        electrodes.forEach((electrode, e) => {
          const out = potentials[electrode];
          const weight = weights[e];
          for (let i = 0; i < length; i++) out[i] += weight.cosine * cosine[i] + weight.sine * sine[i];
        });
      }
    },
  };
}
