import type { Agenda, PendingSense } from '../agenda';
import type { Listening } from './demand';
import type { Device } from './device';
import {
  atrialBlankingAfterVentricleUs,
  atrialBlankingUs,
  ventricularBlankingUs,
  type DeviceIntervals,
} from './intervals';
import { createModeSwitch } from './mode-switch';
import type { DeviceOutput } from './output';

/** What the dual-chamber device needs to know of its leads. */
export interface DualChamberSetting {
  sensesAtrium: boolean;
  sensesVentricle: boolean;
  crosstalk: boolean;
  /** Mode codes for the marker of a mode switch. */
  trackingMode: string;
  switchedMode: string;
}

/**
 * DDD, and DDI while the mode is switched: the table of section 6 of the timing-cycles rules. Timing is
 * ventricular-based; safety pacing is on.
 */
export function createDualChamberDevice(
  setting: DualChamberSetting,
  intervals: DeviceIntervals,
  agenda: Agenda,
  output: DeviceOutput,
  listening: Listening,
): Device {
  const modeSwitch = createModeSwitch();
  let lastVentricularUs = -Infinity;
  let atrialPaceUs = -Infinity;
  let atrialBlankUntilUs = -Infinity;
  let ventricularBlankUntilUs = -Infinity;
  /** An atrial event has been, its ventricular event not yet. */
  let inAvInterval = false;
  /** A ventricular sense in the crosstalk window asks for a safety pace. */
  let safetyDue = false;
  agenda.set('atrialPace', listening.firstPaceUs);

  const atrialEvent = (timeUs: number): void => {
    inAvInterval = true;
    atrialBlankUntilUs = Math.max(atrialBlankUntilUs, timeUs + atrialBlankingUs);
    modeSwitch.atrialEvent(timeUs);
    agenda.clear('atrialPace');
  };

  /** Restarts PVARP, refractory period, blanking and upper rate, ends the AV interval, arms the next pace. */
  const ventricularEvent = (timeUs: number): void => {
    lastVentricularUs = timeUs;
    ventricularBlankUntilUs = timeUs + ventricularBlankingUs;
    atrialBlankUntilUs = Math.max(atrialBlankUntilUs, timeUs + atrialBlankingAfterVentricleUs);
    inAvInterval = false;
    safetyDue = false;
    atrialPaceUs = -Infinity;
    if (modeSwitch.ventricularEvent(timeUs)) {
      const mode = modeSwitch.switched ? setting.switchedMode : setting.trackingMode;
      output.mark(timeUs, modeSwitch.switched ? 'modeSwitchOn' : 'modeSwitchOff', { mode });
    }
    agenda.set('atrialPace', timeUs + intervals.vaUs);
    if (modeSwitch.switched) agenda.set('ventricularPace', timeUs + intervals.lowerRateUs);
    else agenda.clear('ventricularPace');
  };

  const inCrosstalkWindow = (timeUs: number): boolean =>
    timeUs >= atrialPaceUs + intervals.postAtrialBlankingUs && timeUs < atrialPaceUs + intervals.safetyUs;

  const senseAtrium = ({ timeUs, cause }: PendingSense): void => {
    if (!setting.sensesAtrium || timeUs < atrialBlankUntilUs) return;
    if (inAvInterval || timeUs < lastVentricularUs + intervals.pvarpUs) {
      modeSwitch.atrialEvent(timeUs);
      output.mark(timeUs, 'atrialRefractorySense', { cause });
      return;
    }
    output.mark(timeUs, 'atrialSense', { cause });
    atrialEvent(timeUs);
    if (modeSwitch.switched) return;
    const tracked = Math.max(timeUs + intervals.sensedAvUs, lastVentricularUs + intervals.upperRateUs);
    agenda.set('ventricularPace', tracked);
  };

  const senseVentricle = ({ timeUs, cause }: PendingSense): void => {
    const heard = cause === 'crosstalk' || setting.sensesVentricle;
    if (!heard || timeUs < ventricularBlankUntilUs) return;
    if (timeUs < lastVentricularUs + intervals.ventricularRefractoryUs) {
      output.mark(timeUs, 'ventricularRefractorySense', { cause });
      return;
    }
    if (inCrosstalkWindow(timeUs)) {
      output.mark(timeUs, 'ventricularSense', { cause, window: 'crosstalk' });
      safetyDue = true;
      ventricularBlankUntilUs = atrialPaceUs + intervals.safetyUs;
      agenda.set('ventricularPace', ventricularBlankUntilUs);
      return;
    }
    output.mark(timeUs, 'ventricularSense', { cause });
    ventricularEvent(timeUs);
  };

  /** Nothing is paced while the device listens; a timer that ends then waits for the first pace. */
  const stillListening = (timeUs: number): boolean => {
    if (timeUs >= listening.endUs) return false;
    agenda.clear('ventricularPace');
    agenda.set('atrialPace', listening.firstPaceUs);
    inAvInterval = false;
    return true;
  };

  return {
    atrialPace(timeUs) {
      if (stillListening(timeUs)) return;
      atrialEvent(timeUs);
      atrialPaceUs = timeUs;
      const blankEndUs = timeUs + intervals.postAtrialBlankingUs;
      ventricularBlankUntilUs = Math.max(ventricularBlankUntilUs, blankEndUs);
      agenda.set('ventricularPace', timeUs + intervals.pacedAvUs);
      if (setting.crosstalk) {
        agenda.addSense({ timeUs: blankEndUs, chamber: 'ventricle', cause: 'crosstalk' });
      }
      output.paceAtrium(timeUs);
    },
    ventricularPace(timeUs) {
      if (stillListening(timeUs)) return;
      const code = safetyDue ? 'safetyPace' : 'ventricularPace';
      ventricularEvent(timeUs);
      output.paceVentricles(timeUs, code);
    },
    secondSite: (timeUs) => output.secondSite(timeUs),
    sense(sense) {
      if (sense.chamber === 'atrium') senseAtrium(sense);
      else senseVentricle(sense);
    },
  };
}
