import type { PacingParameters } from '../../../parameters/strip-parameters';
import { msToUs, rateToIntervalUs } from '../../../units';

/** Every interval and window of the device, formed once, in whole µs (timing-cycles rules, section 6). */
export interface DeviceIntervals {
  lowerRateUs: number;
  upperRateUs: number;
  pacedAvUs: number;
  sensedAvUs: number;
  /** From a ventricular event to the next atrial pace: ventricular-based timing (TM-29). */
  vaUs: number;
  pvarpUs: number;
  ventricularRefractoryUs: number;
  /** Ventricular blanking after an atrial pace. */
  postAtrialBlankingUs: number;
  /** From an atrial pace to the safety pace. */
  safetyUs: number;
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

export function deviceIntervals(pacing: PacingParameters): DeviceIntervals {
  const lowerRateUs = rateToIntervalUs(pacing.lowerRateBpm);
  const pacedAvUs = Math.min(msToUs(pacing.pacedAvDelayMs), lowerRateUs - leastVaUs);
  return {
    lowerRateUs,
    upperRateUs: rateToIntervalUs(pacing.upperTrackingRateBpm),
    pacedAvUs,
    sensedAvUs: msToUs(pacing.sensedAvDelayMs),
    vaUs: lowerRateUs - pacedAvUs,
    pvarpUs: msToUs(pacing.pvarpMs),
    ventricularRefractoryUs: msToUs(pacing.ventricularRefractoryMs),
    postAtrialBlankingUs: msToUs(pacing.ventricularBlankingMs),
    safetyUs: Math.min(safetyPaceUs, pacedAvUs),
    interventricularUs: msToUs(Math.abs(pacing.interventricularDelayMs)),
  };
}
