import { respondsToSensor } from '../../../parameters/pacing-mode';
import type { PacingParameters } from '../../../parameters/strip-parameters';
import { msToUs, rateToIntervalUs } from '../../../units';

/** Every interval and window of the device, formed once, in whole µs (timing-cycles rules, section 6). */
export interface DeviceIntervals {
  lowerRateUs: number;
  /** Interval after a sensed event; the lower rate interval when hysteresis is off. */
  hysteresisUs: number;
  upperRateUs: number;
  pacedAvUs: number;
  sensedAvUs: number;
  pvarpUs: number;
  /** PVARP of one cycle after a ventricular event without an atrial one. */
  pvarpAfterEctopicUs: number;
  ventricularRefractoryUs: number;
  /** Ventricular blanking after an atrial pace. */
  postAtrialBlankingUs: number;
  /** From an atrial pace to the safety pace; null when safety pacing is off. */
  safetyUs: number | null;
  /** Magnitude of the interventricular delay. */
  interventricularUs: number;
}

/** Blanking after events, ms (chosen within TM-18 to TM-20). */
export const ventricularBlankingUs = msToUs(100);
export const atrialBlankingAfterVentricleUs = msToUs(100);
export const atrialBlankingUs = msToUs(50);
/** Atrial blanking in AAI, after an atrial event. */
export const singleChamberBlankingUs = msToUs(100);
/** The paced AV delay leaves at least this much of the lower rate interval. */
const leastVaUs = msToUs(100);
/** Safety pacing interval (TM-21). */
const safetyPaceUs = msToUs(110);
/** A lengthened PVARP after an ectopic (TM-35). */
const lengthenedPvarpUs = msToUs(400);

/** The rate that the device keeps: under a magnet its own, otherwise the faster of lower rate and sensor. */
function keptRateBpm(pacing: PacingParameters, magnet: boolean): number {
  if (magnet) return pacing.magnetRateBpm;
  const sensor = respondsToSensor(pacing.mode) ? pacing.sensorRateBpm : null;
  return Math.max(pacing.lowerRateBpm, sensor ?? 0);
}

/** Intervals of an implanted device, with or without a magnet on it, or of a temporary one. */
export function deviceIntervals(pacing: PacingParameters, magnet: boolean): DeviceIntervals {
  const rateBpm = keptRateBpm(pacing, magnet);
  const lowerRateUs = rateToIntervalUs(rateBpm);
  const hysteresisOff =
    pacing.source !== 'implanted' ||
    magnet ||
    pacing.hysteresisRateBpm === null ||
    rateBpm > pacing.lowerRateBpm;
  const pacedAvUs = Math.min(msToUs(pacing.pacedAvDelayMs), lowerRateUs - leastVaUs);
  const pvarpUs = msToUs(pacing.pvarpMs);
  return {
    lowerRateUs,
    hysteresisUs: hysteresisOff ? lowerRateUs : rateToIntervalUs(pacing.hysteresisRateBpm ?? rateBpm),
    upperRateUs: rateToIntervalUs(pacing.upperTrackingRateBpm),
    pacedAvUs,
    sensedAvUs: msToUs(pacing.sensedAvDelayMs),
    pvarpUs,
    pvarpAfterEctopicUs:
      pacing.pvarpAfterEctopic === 'lengthened' ? Math.max(pvarpUs, lengthenedPvarpUs) : pvarpUs,
    ventricularRefractoryUs: msToUs(pacing.ventricularRefractoryMs),
    postAtrialBlankingUs: msToUs(pacing.ventricularBlankingMs),
    safetyUs: pacing.safetyPacing ? Math.min(safetyPaceUs, pacedAvUs) : null,
    interventricularUs: msToUs(Math.abs(pacing.interventricularDelayMs)),
  };
}
