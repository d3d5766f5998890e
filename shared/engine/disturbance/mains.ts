import type { RandomStream } from '../random';
import { electrodes } from './electrodes';
import type { PeriodicComponent } from './periodic';

/** Odd harmonics of the supply beside the fundamental, as shares of its size (chosen; NR-13 only says they exist). */
const harmonicShares: readonly { order: number; share: number }[] = [
  { order: 3, share: 0.08 },
  { order: 5, share: 0.04 },
];
/** The least that an electrode picks up of the full size (chosen). */
const smallestWeight = 0.4;
/** Phases of the electrodes differ by at most this much either way (chosen). */
const phaseSpreadRad = Math.PI / 4;
/** The size of the fundamental swings slowly by this share, as body and cables move in the field (chosen). */
const swingShare = 0.15;
/** How slowly, Hz (chosen). */
const swingHz = { min: 0.05, max: 0.2 } as const;

/** What one electrode picks up: its share of the full size, and its phase. */
interface PickUp {
  weight: number;
  phaseRad: number;
}

/**
 * Mains interference: each electrode picks up the supply's frequency with its own size and phase. The amplitude of
 * the fundamental at an electrode is at most `amplitudeMv`, reached where the pick-up is best and the slow swing
 * highest. The swing is two side lines of the fundamental: A (1 − s + s cos Ωt) cos ωt.
 */
export function mainsInterference(
  amplitudeMv: number,
  mainsHz: number,
  random: RandomStream,
): PeriodicComponent[] {
  const common = 2 * Math.PI * random.uniform();
  const pickUps = electrodes.map((): PickUp => ({
    weight: smallestWeight + (1 - smallestWeight) * random.uniform(),
    phaseRad: common + phaseSpreadRad * (2 * random.uniform() - 1),
  }));
  const swing = swingHz.min + (swingHz.max - swingHz.min) * random.uniform();
  const swingPhaseRad = 2 * Math.PI * random.uniform();
  const line = (
    frequencyHz: number,
    share: number,
    phaseOf: (pickUp: PickUp) => number,
  ): PeriodicComponent => ({
    frequencyHz,
    at: Object.fromEntries(
      electrodes.map((electrode, e) => [
        electrode,
        { amplitudeMv: amplitudeMv * share * pickUps[e].weight, phaseRad: phaseOf(pickUps[e]) },
      ]),
    ) as PeriodicComponent['at'],
  });
  return [
    line(mainsHz, 1 - swingShare, ({ phaseRad }) => phaseRad),
    line(mainsHz + swing, swingShare / 2, ({ phaseRad }) => phaseRad + swingPhaseRad),
    line(mainsHz - swing, swingShare / 2, ({ phaseRad }) => phaseRad - swingPhaseRad),
    ...harmonicShares.map(({ order, share }) =>
      line(order * mainsHz, share, ({ phaseRad }) => order * phaseRad),
    ),
  ];
}
