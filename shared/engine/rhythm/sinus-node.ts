import type { PatientParameters } from '../../parameters/strip-parameters';
import { msPerMinute, msToUs, usPerS } from '../../units';
import type { RandomStream } from '../random';

/** Normal draws are cut at this many standard deviations. */
const largestDeviation = 2.5;
/** A cycle never falls below this share of its mean (chosen; only the widest variability gets there). */
const shortestShare = 0.2;

/** The sinus node's cycle after a discharge. */
export interface SinusNode {
  /** Interval to the next discharge after an atrial depolarization at `timeUs`, µs. */
  cycleUs(timeUs: number): number;
}

/**
 * Cycle = 60000/rate × (1 + v g + v sin(2π t × breathing)), with v the variability and g a normal draw: beat-to-beat
 * variability and respiratory arrhythmia.
 */
export function createSinusNode(patient: PatientParameters, random: RandomStream): SinusNode {
  const variability = patient.rateVariabilityPercent / 100;
  const meanMs = msPerMinute / patient.atrialRateBpm;
  const breathingHz = patient.respiratoryRateBpm / 60;
  return {
    cycleUs(timeUs) {
      const g = Math.max(-largestDeviation, Math.min(largestDeviation, random.normal()));
      const breath = Math.sin((2 * Math.PI * timeUs * breathingHz) / usPerS);
      return msToUs(meanMs * Math.max(shortestShare, 1 + variability * (g + breath)));
    },
  };
}
