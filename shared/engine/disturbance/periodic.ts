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

/** out += c · cosine + s · sine; a function of its own, because in a closure it runs three times as long. */
function addWeighted(
  out: Float64Array,
  cosine: Float64Array,
  sine: Float64Array,
  c: number,
  s: number,
  length: number,
): void {
  for (let i = 0; i < length; i++) out[i] += c * cosine[i] + s * sine[i];
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
      return { electrode, c: amplitudeMv * Math.sin(phaseRad), s: amplitudeMv * Math.cos(phaseRad) };
    }),
  }));
  return {
    add(potentials, length) {
      const cosine = new Float64Array(length);
      const sine = new Float64Array(length);
      for (const { oscillator, weights } of running) {
        oscillator.next(cosine, sine, length);
        for (const { electrode, c, s } of weights) {
          addWeighted(potentials[electrode], cosine, sine, c, s, length);
        }
      }
    },
  };
}
