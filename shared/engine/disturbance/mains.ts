import type { RandomStream } from '../random';
import { electrodes } from './electrodes';
import type { PeriodicComponent } from './periodic';

/** Odd harmonics of the supply beside the fundamental, as shares of its size (chosen). */
const harmonicShares: readonly { order: number; share: number }[] = [
  { order: 1, share: 1 },
  { order: 3, share: 0.08 },
  { order: 5, share: 0.04 },
];
/** The least that an electrode picks up of the full size (chosen). */
const smallestWeight = 0.4;
/** Phases of the electrodes differ by at most this much either way (chosen). */
const phaseSpreadRad = Math.PI / 4;

/** Mains interference: each electrode picks up the supply's frequency with its own size, up to `amplitudeMv`. */
export function mainsInterference(
  amplitudeMv: number,
  mainsHz: number,
  random: RandomStream,
): PeriodicComponent[] {
  const common = 2 * Math.PI * random.uniform();
  const pickUp = electrodes.map(() => ({
    weight: smallestWeight + (1 - smallestWeight) * random.uniform(),
    phaseRad: common + phaseSpreadRad * (2 * random.uniform() - 1),
  }));
  return harmonicShares.map(({ order, share }) => ({
    frequencyHz: order * mainsHz,
    at: Object.fromEntries(
      electrodes.map((electrode, e) => [
        electrode,
        { amplitudeMv: amplitudeMv * share * pickUp[e].weight, phaseRad: order * pickUp[e].phaseRad },
      ]),
    ) as PeriodicComponent['at'],
  }));
}
