import { usToS } from '../../../units';
import type { MarkerEvent, StimulusEvent, StripEvent } from '../../events';
import type { Agenda } from '../agenda';
import type { CaptureOutcome } from '../capture';
import { faultChamber, type Faults } from '../faults';
import type { Patient, VentricularStimulusSite } from '../patient';
import type { Outlet, Outlets } from './outlet';

/** What the device puts out: markers and stimuli. */
export interface DeviceOutput {
  mark(timeUs: number, code: MarkerEvent['code'], details?: Partial<MarkerEvent>): void;
  /** Returns whether a stimulus left the device: a failure to pace is marked all the same. */
  paceAtrium(timeUs: number): boolean;
  paceVentricles(timeUs: number, code: 'ventricularPace' | 'safetyPace'): void;
  /** The second site of a multisite pace, committed by the first. */
  secondSite(timeUs: number): void;
}

export function createDeviceOutput(
  outlets: Outlets,
  interventricularUs: number,
  faults: Faults,
  patient: Patient,
  agenda: Agenda,
  emit: (event: StripEvent) => void,
): DeviceOutput {
  const act = (outlet: Outlet, timeUs: number, fault: boolean): CaptureOutcome => {
    const strength = { output: outlet.output, threshold: outlet.threshold, fault };
    return outlet.chamber === 'atrium'
      ? patient.stimulateAtrium(timeUs, strength)
      : patient.stimulateVentricle(outlet.chamber satisfies VentricularStimulusSite, timeUs, strength);
  };

  /** The stimulus stands before the depolarization it starts. Returns whether one was given. */
  const stimulate = (outlet: Outlet, timeUs: number): boolean => {
    const { chamber, amplitudeMv, widthMs } = outlet;
    if (faults.strikes('failureToPace', faultChamber(chamber), timeUs)) return false;
    const stimulus: StimulusEvent = {
      type: 'stimulus',
      timeS: usToS(timeUs),
      chamber,
      amplitudeMv,
      widthMs,
      captured: true,
    };
    emit(stimulus);
    const fault = faults.strikes('failureToCapture', faultChamber(chamber), timeUs);
    const outcome = act(outlet, timeUs, fault);
    if (outcome === 'captured' || outcome === 'capturedFresh') return true;
    stimulus.captured = false;
    stimulus.reason = outcome;
    if (chamber !== 'atrium' && outcome === 'refractoryTissue' && patient.isPseudofusion(timeUs)) {
      stimulus.pseudofusion = true;
    }
    return true;
  };

  const mark: DeviceOutput['mark'] = (timeUs, code, details = {}) =>
    emit({ type: 'marker', timeS: usToS(timeUs), code, ...details });

  return {
    mark,
    paceAtrium(timeUs) {
      mark(timeUs, 'atrialPace');
      return stimulate(outlets.atrium, timeUs);
    },
    paceVentricles(timeUs, code) {
      mark(timeUs, code);
      if (outlets.second) agenda.set('secondSite', timeUs + interventricularUs);
      stimulate(outlets.first, timeUs);
    },
    secondSite(timeUs) {
      agenda.clear('secondSite');
      if (outlets.second) stimulate(outlets.second, timeUs);
    },
  };
}
