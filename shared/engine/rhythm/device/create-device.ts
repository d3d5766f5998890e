import type { PacingMode } from '../../../parameters/pacing';
import type { PacingLead, StripParameters } from '../../../parameters/strip-parameters';
import { msToUs } from '../../../units';
import type { StripEvent } from '../../events';
import { randomStream } from '../../random';
import type { Agenda } from '../agenda';
import type { Patient } from '../patient';
import { createAsynchronousDevice } from './asynchronous';
import { hasCrosstalk } from './crosstalk';
import { createDemandDevice } from './demand';
import { noDevice, type Device } from './device';
import { createDualChamberDevice } from './dual-chamber';
import { deviceIntervals } from './intervals';
import { createDeviceOutput } from './output';

/** A device listens this long before its first own pace, so that it starts from the patient's own rhythm. */
const listenUs = msToUs(5000);

/** Signals of at least the sensitivity are sensed. */
function senses(lead: PacingLead): boolean {
  return lead.signalMv >= lead.sensitivityMv;
}

/** The NBG code without its position for multisite pacing. */
function basicMode(mode: PacingMode): string {
  return mode.slice(0, 3);
}

/** The device these parameters describe, listening from `startUs` on. */
export function createDevice(
  { seed, pacing }: Pick<StripParameters, 'seed' | 'pacing'>,
  startUs: number,
  patient: Patient,
  agenda: Agenda,
  emit: (event: StripEvent) => void,
): Device {
  if (pacing.source === 'none') return noDevice;
  const intervals = deviceIntervals(pacing);
  const output = createDeviceOutput(pacing, intervals.interventricularUs, patient, agenda, emit);
  const fraction = randomStream(seed, 'device').uniform();
  const endUs = startUs + listenUs;
  const listening = { endUs, firstPaceUs: endUs + Math.floor(fraction * intervals.lowerRateUs) };
  const asynchronous = (atrium: boolean, ventricles: boolean): Device =>
    createAsynchronousDevice({ atrium, ventricles }, intervals, agenda, output, listening.firstPaceUs);
  const heard = { atrium: senses(pacing.atrialLead), ventricle: senses(pacing.rightVentricularLead) };

  switch (basicMode(pacing.mode)) {
    case 'AOO':
      return asynchronous(true, false);
    case 'VOO':
      return asynchronous(false, true);
    case 'DOO':
      return asynchronous(true, true);
    case 'AAI':
      return createDemandDevice('atrium', heard.atrium, intervals, agenda, output, listening);
    case 'VVI':
      return createDemandDevice('ventricle', heard.ventricle, intervals, agenda, output, listening);
    case 'DDD':
      return createDualChamberDevice(
        {
          sensesAtrium: heard.atrium,
          sensesVentricle: heard.ventricle,
          crosstalk: hasCrosstalk(pacing),
          trackingMode: pacing.mode,
          switchedMode: pacing.mode.replace('DDD', 'DDI'),
        },
        intervals,
        agenda,
        output,
        listening,
      );
    default:
      throw new Error(`no device for the mode ${pacing.mode}`);
  }
}
