import type { PacingParameters } from '../../../parameters/strip-parameters';
import type { PendingSense } from '../agenda';
import type { Faults } from '../faults';

/** Decides what a channel hears. */
export interface Sensing {
  hears(sense: PendingSense): boolean;
}

/** Fibrillation waves are smaller at the lead than a P wave (rules, section 3). */
const fibrillationShare = 0.5;

/** Signals of at least the sensitivity are sensed; pads on the chest hear every QRS. */
function isLargeEnough(pacing: PacingParameters, { chamber, halfSignal }: PendingSense): boolean {
  const { atrialLead, rightVentricularLead, transvenous, source } = pacing;
  if (chamber === 'atrium') {
    return atrialLead.signalMv * (halfSignal ? fibrillationShare : 1) >= atrialLead.sensitivityMv;
  }
  if (source === 'transcutaneous') return true;
  const sensitivityMv =
    source === 'transvenous' ? transvenous.sensitivityMv : rightVentricularLead.sensitivityMv;
  return rightVentricularLead.signalMv >= sensitivityMv;
}

/** Sensing by signal and sensitivity, with its faults. Crosstalk and false senses are loud by definition. */
export function createSensing(pacing: PacingParameters, faults: Faults): Sensing {
  return {
    hears(sense) {
      if (sense.cause !== 'depolarization') return true;
      if (!isLargeEnough(pacing, sense)) return false;
      const chamber = sense.chamber === 'atrium' ? 'atrium' : 'rightVentricle';
      return !faults.strikes('undersensing', chamber, sense.timeUs);
    },
  };
}
