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

/** What the dual-chamber device is set to. */
export interface DualChamberSetting {
  mode: 'DDD' | 'DDI' | 'VDD';
  /** Whether an atrial stimulus leaves an after-potential that the ventricular channel hears. */
  crosstalk: boolean;
  /** null: mode switching is off. */
  modeSwitchRateBpm: number | null;
  /** Mode codes for the marker of a mode switch. */
  trackingMode: string;
  switchedMode: string;
}

/** How the device behaves now: as set, or while the mode is switched. */
interface Behaviour {
  pacesAtrium: boolean;
  tracks: boolean;
  /** A ventricular pace is due one lower rate interval after each ventricular event. */
  keepsVentricularInterval: boolean;
}

const asSet: Record<DualChamberSetting['mode'], Behaviour> = {
  DDD: { pacesAtrium: true, tracks: true, keepsVentricularInterval: false },
  DDI: { pacesAtrium: true, tracks: false, keepsVentricularInterval: true },
  VDD: { pacesAtrium: false, tracks: true, keepsVentricularInterval: true },
};

/** DDD becomes DDI; VDD becomes VVI that still logs the atrium. */
function whileSwitched(mode: DualChamberSetting['mode']): Behaviour {
  return { pacesAtrium: asSet[mode].pacesAtrium, tracks: false, keepsVentricularInterval: true };
}

/** DDD, DDI and VDD: the table of section 6 of the timing-cycles rules. Timing is ventricular-based. */
export function createDualChamberDevice(
  setting: DualChamberSetting,
  intervals: DeviceIntervals,
  agenda: Agenda,
  output: DeviceOutput,
  listening: Listening,
): Device {
  const modeSwitch = createModeSwitch(setting.modeSwitchRateBpm);
  let behaviour = asSet[setting.mode];
  let lastVentricularUs = -Infinity;
  let pvarpEndUs = -Infinity;
  let atrialPaceUs = -Infinity;
  let atrialBlankUntilUs = -Infinity;
  let ventricularBlankUntilUs = -Infinity;
  /** The atrial event of this cycle; its ventricular event has not been yet. */
  let atrialEventOfCycle: 'none' | 'sensed' | 'paced' = 'none';
  /** A ventricular sense in the crosstalk window asks for a safety pace. */
  let safetyDue = false;

  const armFirstPace = (): void => {
    if (behaviour.pacesAtrium) agenda.set('atrialPace', listening.firstPaceUs);
    if (behaviour.keepsVentricularInterval) {
      const av = behaviour.pacesAtrium ? intervals.pacedAvUs : 0;
      agenda.set('ventricularPace', listening.firstPaceUs + av);
    } else agenda.clear('ventricularPace');
  };
  armFirstPace();

  const atrialEvent = (timeUs: number, kind: 'sensed' | 'paced'): void => {
    atrialEventOfCycle = kind;
    atrialBlankUntilUs = Math.max(atrialBlankUntilUs, timeUs + atrialBlankingUs);
    modeSwitch.atrialEvent(timeUs);
    agenda.clear('atrialPace');
  };

  const switchMode = (timeUs: number): void => {
    if (!modeSwitch.ventricularEvent(timeUs)) return;
    behaviour = modeSwitch.switched ? whileSwitched(setting.mode) : asSet[setting.mode];
    const mode = modeSwitch.switched ? setting.switchedMode : setting.trackingMode;
    output.mark(timeUs, modeSwitch.switched ? 'modeSwitchOn' : 'modeSwitchOff', { mode });
  };

  /** Restarts PVARP, refractory period, blanking and upper rate, ends the AV interval, arms what is due next. */
  const ventricularEvent = (timeUs: number, sensed: boolean): void => {
    const ectopic = sensed && atrialEventOfCycle === 'none';
    const afterSense = atrialEventOfCycle === 'sensed' && !modeSwitch.switched;
    lastVentricularUs = timeUs;
    pvarpEndUs = timeUs + (ectopic ? intervals.pvarpAfterEctopicUs : intervals.pvarpUs);
    ventricularBlankUntilUs = timeUs + ventricularBlankingUs;
    atrialBlankUntilUs = Math.max(atrialBlankUntilUs, timeUs + atrialBlankingAfterVentricleUs);
    atrialEventOfCycle = 'none';
    safetyDue = false;
    atrialPaceUs = -Infinity;
    switchMode(timeUs);
    const intervalUs = afterSense && !modeSwitch.switched ? intervals.hysteresisUs : intervals.lowerRateUs;
    if (behaviour.pacesAtrium) agenda.set('atrialPace', timeUs + intervalUs - intervals.pacedAvUs);
    if (behaviour.keepsVentricularInterval) agenda.set('ventricularPace', timeUs + intervalUs);
    else agenda.clear('ventricularPace');
  };

  const inCrosstalkWindow = (timeUs: number): boolean =>
    intervals.safetyUs !== null &&
    timeUs >= atrialPaceUs + intervals.postAtrialBlankingUs &&
    timeUs < atrialPaceUs + intervals.safetyUs;

  const senseAtrium = ({ timeUs, cause }: PendingSense): void => {
    if (timeUs < atrialBlankUntilUs) return;
    if (atrialEventOfCycle !== 'none' || timeUs < pvarpEndUs) {
      modeSwitch.atrialEvent(timeUs);
      output.mark(timeUs, 'atrialRefractorySense', { cause });
      return;
    }
    output.mark(timeUs, 'atrialSense', { cause });
    atrialEvent(timeUs, 'sensed');
    if (!behaviour.tracks) return;
    const tracked = Math.max(timeUs + intervals.sensedAvUs, lastVentricularUs + intervals.upperRateUs);
    agenda.set('ventricularPace', tracked);
  };

  const senseVentricle = ({ timeUs, cause }: PendingSense): void => {
    if (timeUs < ventricularBlankUntilUs) return;
    if (timeUs < lastVentricularUs + intervals.ventricularRefractoryUs) {
      output.mark(timeUs, 'ventricularRefractorySense', { cause });
      return;
    }
    if (inCrosstalkWindow(timeUs)) {
      output.mark(timeUs, 'ventricularSense', { cause, window: 'crosstalk' });
      safetyDue = true;
      ventricularBlankUntilUs = atrialPaceUs + (intervals.safetyUs ?? 0);
      agenda.set('ventricularPace', ventricularBlankUntilUs);
      return;
    }
    output.mark(timeUs, 'ventricularSense', { cause });
    ventricularEvent(timeUs, true);
  };

  /** Nothing is paced while the device listens; a timer that ends then waits for the first pace. */
  const stillListening = (timeUs: number): boolean => {
    if (timeUs >= listening.endUs) return false;
    atrialEventOfCycle = 'none';
    armFirstPace();
    return true;
  };

  const isAlert: Device['isAlert'] = (chamber, timeUs) =>
    chamber === 'atrium'
      ? timeUs >= atrialBlankUntilUs && atrialEventOfCycle === 'none' && timeUs >= pvarpEndUs
      : timeUs >= ventricularBlankUntilUs && timeUs >= lastVentricularUs + intervals.ventricularRefractoryUs;

  return {
    isAlert,
    atrialPace(timeUs) {
      if (stillListening(timeUs)) return;
      atrialEvent(timeUs, 'paced');
      atrialPaceUs = timeUs;
      const blankEndUs = timeUs + intervals.postAtrialBlankingUs;
      ventricularBlankUntilUs = Math.max(ventricularBlankUntilUs, blankEndUs);
      agenda.set('ventricularPace', timeUs + intervals.pacedAvUs);
      const delivered = output.paceAtrium(timeUs);
      if (setting.crosstalk && delivered) {
        agenda.addSense({ timeUs: blankEndUs, chamber: 'ventricle', cause: 'crosstalk' });
      }
    },
    ventricularPace(timeUs) {
      if (stillListening(timeUs)) return;
      const code = safetyDue ? 'safetyPace' : 'ventricularPace';
      ventricularEvent(timeUs, false);
      output.paceVentricles(timeUs, code);
    },
    secondSite: (timeUs) => output.secondSite(timeUs),
    sense(sense) {
      if (sense.chamber === 'atrium') senseAtrium(sense);
      else senseVentricle(sense);
    },
  };
}
