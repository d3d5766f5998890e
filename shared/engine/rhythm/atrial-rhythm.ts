import type { PatientParameters } from '../../parameters/strip-parameters';
import { msPerMinute, msToUs, usPerS } from '../../units';
import type { AtrialOrigin } from '../events';
import type { RandomStream } from '../random';

/** Normal draws are cut at this many standard deviations. */
const largestDeviation = 2.5;
/** A cycle never falls below this share of its mean (chosen; only the widest variability gets there). */
const shortestShare = 0.2;
/** Fibrillation cycles are uniform between these shares of the mean. */
const fibrillationSpread = { from: 0.7, to: 1.3 } as const;

/** What the atria do of their own accord. Times in µs. */
export interface AtrialRhythmSource {
  origin: Extract<AtrialOrigin, 'sinus' | 'tachycardia' | 'flutter' | 'fibrillation'>;
  /**
   * Every captured, premature or retrograde P wave resets it. Flutter and fibrillation are not reset: no atrial
   * stimulus captures in them, and nothing enters from below.
   */
  resets: boolean;
  /** Interval to the next discharge after one at `timeUs`. */
  cycleUs(timeUs: number): number;
}

function normalCycle(patient: PatientParameters, random: RandomStream, breathes: boolean) {
  const variability = patient.rateVariabilityPercent / 100;
  const meanMs = msPerMinute / patient.atrialRateBpm;
  const breathingHz = patient.respiratoryRateBpm / 60;
  return (timeUs: number): number => {
    const g = Math.max(-largestDeviation, Math.min(largestDeviation, random.normal()));
    const breath = breathes ? Math.sin((2 * Math.PI * timeUs * breathingHz) / usPerS) : 0;
    return msToUs(meanMs * Math.max(shortestShare, 1 + variability * (g + breath)));
  };
}

/**
 * The source of an atrial rhythm; null in arrest. Sinus and tachycardia: cycle = 60000/rate × (1 + v g + v sin(2π t ×
 * breathing)), with v the variability, g a normal draw, the sine in sinus rhythm only. Flutter: a fixed cycle.
 * Fibrillation: cycles uniform within 0.7 to 1.3 of the mean.
 */
export function createAtrialRhythm(
  patient: PatientParameters,
  random: RandomStream,
): AtrialRhythmSource | null {
  const meanMs = msPerMinute / patient.atrialRateBpm;
  const { from, to } = fibrillationSpread;
  switch (patient.atrialRhythm) {
    case 'arrest':
      return null;
    case 'sinus':
      return { origin: 'sinus', resets: true, cycleUs: normalCycle(patient, random, true) };
    case 'tachycardia':
      return { origin: 'tachycardia', resets: true, cycleUs: normalCycle(patient, random, false) };
    case 'flutter':
      return { origin: 'flutter', resets: false, cycleUs: () => msToUs(meanMs) };
    case 'fibrillation':
      return {
        origin: 'fibrillation',
        resets: false,
        cycleUs: () => msToUs(meanMs * (from + (to - from) * random.uniform())),
      };
  }
}
