import type { RandomStream } from '../random';
import { electrodes } from './electrodes';
import type { PeriodicComponent } from './periodic';

/** Shares of the wander's size (chosen): breathing with its second harmonic, and slower drift. */
const breathingShare = 0.55;
const breathingHarmonicShare = 0.1;
const driftShares = [0.2, 0.15] as const;
/**
 * Drift of skin and electrode lies below breathing, Hz (chosen; NR-11, Friesen et al. 1990 from memory, puts
 * breathing at 0.15 to 0.3).
 */
const driftBandHz = [0.02, 0.12] as const;
/** What an electrode gets of the nominal size lies between (chosen). */
const weights = { min: 0.8, max: 1.2 } as const;

function spread(frequencyHz: number, amplitudeMv: number, random: RandomStream): PeriodicComponent {
  const common = 2 * Math.PI * random.uniform();
  const at = Object.fromEntries(
    electrodes.map((electrode) => [
      electrode,
      {
        amplitudeMv: amplitudeMv * (weights.min + (weights.max - weights.min) * random.uniform()),
        phaseRad: common + Math.PI * (random.uniform() - 0.5),
      },
    ]),
  ) as PeriodicComponent['at'];
  return { frequencyHz, at };
}

/**
 * Baseline wander: sines at the breathing rate, its second harmonic and two seeded frequencies below it.
 *
 * `peakToPeakMv` is nominal: an electrode would swing that far, on average over the electrodes, if all four sines
 * agreed at once. Measured over 60 seeds, the swing at an electrode is 0.5 to 1 of it in 10 s (typically 0.7) and 0.55
 * to 1.05 of it in a minute (typically 0.86). A lead is a difference of electrodes, whose phases differ, and may show
 * more or less. Without breathing (rate 0) only the drift is left, about a third.
 */
export function baselineWander(
  peakToPeakMv: number,
  respiratoryRateBpm: number,
  random: RandomStream,
): PeriodicComponent[] {
  const amplitude = peakToPeakMv / 2;
  const breathingHz = respiratoryRateBpm / 60;
  const drift = driftShares.map((share) => {
    const frequencyHz = driftBandHz[0] + (driftBandHz[1] - driftBandHz[0]) * random.uniform();
    return spread(frequencyHz, amplitude * share, random);
  });
  if (breathingHz === 0) return drift;
  return [
    ...drift,
    spread(breathingHz, amplitude * breathingShare, random),
    spread(2 * breathingHz, amplitude * breathingHarmonicShare, random),
  ];
}
