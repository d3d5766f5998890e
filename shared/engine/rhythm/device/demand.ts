import type { Agenda } from '../agenda';
import type { Device } from './device';
import { singleChamberBlankingUs, ventricularBlankingUs, type DeviceIntervals } from './intervals';
import type { DeviceOutput } from './output';

/** Until the end of listening a device senses but does not pace; then it paces when this is due. */
export interface Listening {
  endUs: number;
  firstPaceUs: number;
}

/** AAI and VVI: one chamber, inhibited by what is sensed in it. */
export function createDemandDevice(
  chamber: 'atrium' | 'ventricle',
  intervals: DeviceIntervals,
  agenda: Agenda,
  output: DeviceOutput,
  listening: Listening,
): Device {
  const atrial = chamber === 'atrium';
  const pace = atrial ? 'atrialPace' : 'ventricularPace';
  const codes = atrial
    ? ({ sense: 'atrialSense', refractory: 'atrialRefractorySense' } as const)
    : ({ sense: 'ventricularSense', refractory: 'ventricularRefractorySense' } as const);
  const blankingUs = atrial ? singleChamberBlankingUs : ventricularBlankingUs;
  // In AAI the PVARP setting is the atrial refractory period.
  const refractoryUs = atrial ? intervals.pvarpUs : intervals.ventricularRefractoryUs;
  let lastEventUs = -Infinity;
  agenda.set(pace, listening.firstPaceUs);

  const restart = (timeUs: number, intervalUs: number): void => {
    lastEventUs = timeUs;
    agenda.set(pace, timeUs + intervalUs);
  };
  const paceAt = (timeUs: number): void => {
    if (timeUs < listening.endUs) {
      agenda.set(pace, listening.firstPaceUs);
      return;
    }
    restart(timeUs, intervals.lowerRateUs);
    if (atrial) output.paceAtrium(timeUs);
    else output.paceVentricles(timeUs, 'ventricularPace');
  };

  return {
    atrialPace: paceAt,
    ventricularPace: paceAt,
    secondSite: (timeUs) => output.secondSite(timeUs),
    isAlert: (where, timeUs) => where === chamber && timeUs >= lastEventUs + refractoryUs,
    sense({ timeUs, chamber: where, cause }) {
      if (where !== chamber || timeUs < lastEventUs + blankingUs) return;
      if (timeUs < lastEventUs + refractoryUs) {
        output.mark(timeUs, codes.refractory, { cause });
        return;
      }
      output.mark(timeUs, codes.sense, { cause });
      restart(timeUs, intervals.hysteresisUs);
    },
  };
}
