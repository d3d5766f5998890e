import type { Agenda } from '../agenda';
import type { Device } from './device';
import type { DeviceIntervals } from './intervals';
import type { DeviceOutput } from './output';

/** AOO, VOO and DOO: paces every lower rate interval and senses nothing. */
export function createAsynchronousDevice(
  paces: { atrium: boolean; ventricles: boolean },
  intervals: DeviceIntervals,
  agenda: Agenda,
  output: DeviceOutput,
  firstPaceUs: number,
): Device {
  agenda.set(paces.atrium ? 'atrialPace' : 'ventricularPace', firstPaceUs);
  return {
    atrialPace(timeUs) {
      agenda.set('atrialPace', timeUs + intervals.lowerRateUs);
      if (paces.ventricles) agenda.set('ventricularPace', timeUs + intervals.pacedAvUs);
      output.paceAtrium(timeUs);
    },
    ventricularPace(timeUs) {
      if (paces.atrium) agenda.clear('ventricularPace');
      else agenda.set('ventricularPace', timeUs + intervals.lowerRateUs);
      output.paceVentricles(timeUs, 'ventricularPace');
    },
    secondSite: (timeUs) => output.secondSite(timeUs),
    sense: () => undefined,
    isAlert: () => false,
  };
}
