import { msToUs, rateToIntervalUs } from '../../../units';

/** Fast intervals counted up before it switches, slow ones in a row before it comes back. */
const countToSwitch = 8;
const slowToReturn = 5;
/** Silence of the atrium that also ends a switch. */
const silenceUs = msToUs(2000);

/** Counts atrial events and says when to stop and start tracking. Times in µs. */
export interface ModeSwitch {
  readonly switched: boolean;
  /** Any atrial event: sensed, sensed in refractoriness, or paced. */
  atrialEvent(timeUs: number): void;
  /** A ventricular event; returns true when the mode changes with it. */
  ventricularEvent(timeUs: number): boolean;
}

/** A mode switch at an atrial rate (TM-39: often 150 to 180 /min); with null it never switches. */
export function createModeSwitch(switchRateBpm: number | null): ModeSwitch {
  const fastUs = switchRateBpm === null ? 0 : rateToIntervalUs(switchRateBpm);
  let switched = false;
  let count = 0;
  let slowInARow = 0;
  let lastAtrialUs = -Infinity;
  return {
    get switched() {
      return switched;
    },
    atrialEvent(timeUs) {
      const fast = timeUs - lastAtrialUs < fastUs;
      count = fast ? Math.min(countToSwitch, count + 1) : Math.max(0, count - 1);
      slowInARow = fast ? 0 : slowInARow + 1;
      lastAtrialUs = timeUs;
    },
    ventricularEvent(timeUs) {
      if (!switched) {
        if (count < countToSwitch) return false;
        switched = true;
        slowInARow = 0;
        return true;
      }
      if (slowInARow < slowToReturn && timeUs - lastAtrialUs < silenceUs) return false;
      switched = false;
      count = 0;
      return true;
    },
  };
}
