import { basicMode, modeUnderMagnet, type BasicMode } from '../../../parameters/pacing-mode';
import type { StripParameters } from '../../../parameters/strip-parameters';
import { msToUs } from '../../../units';
import type { StripEvent } from '../../events';
import { randomStream } from '../../random';
import type { Agenda } from '../agenda';
import type { Faults } from '../faults';
import type { Patient } from '../patient';
import { createAsynchronousDevice } from './asynchronous';
import { hasCrosstalk } from './crosstalk';
import { createDemandDevice } from './demand';
import { noDevice, type Device } from './device';
import { createDualChamberDevice } from './dual-chamber';
import { deviceIntervals } from './intervals';
import { outletsOf } from './outlet';
import { createDeviceOutput } from './output';
import { createSensing } from './sensing';

/** A device listens this long before its first own pace, so that it starts from the patient's own rhythm. */
const listenUs = msToUs(5000);

/** The device these parameters describe, listening from `startUs` on. */
export function createDevice(
  { seed, pacing }: Pick<StripParameters, 'seed' | 'pacing'>,
  startUs: number,
  faults: Faults,
  patient: Patient,
  agenda: Agenda,
  emit: (event: StripEvent) => void,
): Device {
  if (pacing.source === 'none') return noDevice;
  const magnet = pacing.magnetApplied && pacing.source === 'implanted';
  const intervals = deviceIntervals(pacing, magnet);
  const output = createDeviceOutput(
    outletsOf(pacing),
    intervals.interventricularUs,
    faults,
    patient,
    agenda,
    emit,
  );
  const fraction = randomStream(seed, 'device').uniform();
  const endUs = startUs + listenUs;
  const listening = { endUs, firstPaceUs: endUs + Math.floor(fraction * intervals.lowerRateUs) };
  const asynchronous = (atrium: boolean, ventricles: boolean): Device =>
    createAsynchronousDevice({ atrium, ventricles }, intervals, agenda, output, listening.firstPaceUs);
  const set = basicMode(pacing.mode);

  const build = (mode: BasicMode): Device => {
    switch (mode) {
      case 'AOO':
        return asynchronous(true, false);
      case 'VOO':
        return asynchronous(false, true);
      case 'DOO':
        return asynchronous(true, true);
      case 'AAI':
        return createDemandDevice('atrium', intervals, agenda, output, listening);
      case 'VVI':
        return createDemandDevice('ventricle', intervals, agenda, output, listening);
      case 'DDD':
      case 'DDI':
      case 'VDD':
        return createDualChamberDevice(
          {
            mode,
            crosstalk: mode !== 'VDD' && hasCrosstalk(pacing),
            modeSwitchRateBpm: pacing.modeSwitching && mode !== 'DDI' ? pacing.modeSwitchRateBpm : null,
            trackingMode: pacing.mode,
            switchedMode: pacing.mode.replace(mode, mode === 'VDD' ? 'VVI' : 'DDI'),
          },
          intervals,
          agenda,
          output,
          listening,
        );
    }
  };
  const device = build(magnet ? modeUnderMagnet[set] : set);
  const sensing = createSensing(pacing, faults);
  return {
    ...device,
    sense: (sense) => {
      const heard = sensing.hears(sense);
      const { depolarization, chamber, timeUs } = sense;
      if (depolarization && device.isAlert(chamber, timeUs)) depolarization.sensed = heard;
      if (heard) device.sense(sense);
    },
  };
}
