import type { RandomStream } from '../random';
import { electrodes } from './electrodes';
import type { PeriodicComponent } from './periodic';

/** Shares of the wander's size (chosen): breathing with its second harmonic, and slower drift. */
const breathingShare = 0.55;
const breathingHarmonicShare = 0.1;
const driftShares = [0.2, 0.15] as const;
/** Drift of skin and electrode lies below breathing, Hz (NR entries put wander below about 0.5 Hz). */
const driftBandHz = [0.02, 0.12] as const;
/** The least that an electrode gets of the full size (chosen). */
const smallestWeight = 0.6;

function spread(frequencyHz: number, amplitudeMv: number, random: RandomStream): PeriodicComponent {
  const common = 2 * Math.PI * random.uniform();
  const at = Object.fromEntries(
    electrodes.map((electrode) => [
      electrode,
      {
        amplitudeMv: amplitudeMv * (smallestWeight + (1 - smallestWeight) * random.uniform()),
        phaseRad: common + Math.PI * (random.uniform() - 0.5),
      },
    ]),
  ) as PeriodicComponent['at'];
  return { frequencyHz, at };
}

/**
 * Baseline wander: sines at the breathing rate, its second harmonic and two seeded frequencies below it. At an
 * electrode the peaks never lie more than `peakToPeakMv` apart. Without breathing (rate 0) only the drift is left.
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
