import type { PacingLead, PacingParameters } from '../../../parameters/strip-parameters';
import { usToS } from '../../../units';
import type { MarkerEvent, StimulusChamber, StripEvent } from '../../events';
import type { Agenda } from '../agenda';
import type { CaptureOutcome } from '../capture';
import type { Patient } from '../patient';

/** Surface spike per volt, mV, by chamber and polarity (engine contract; chosen). */
const surfaceMvPerV = { atrium: 0.3, ventricle: 0.7 } as const;
const unipolarFactor = 8;

/** Size of a stimulus at the body surface, mV: as set, or from output and polarity. */
export function surfaceSpikeMv(chamber: StimulusChamber, lead: PacingLead): number {
  if (lead.surfaceSpikeMv !== null) return lead.surfaceSpikeMv;
  const perVolt = chamber === 'atrium' ? surfaceMvPerV.atrium : surfaceMvPerV.ventricle;
  return lead.amplitudeV * perVolt * (lead.polarity === 'unipolar' ? unipolarFactor : 1);
}

/** What the device puts out: markers and stimuli. */
export interface DeviceOutput {
  mark(timeUs: number, code: MarkerEvent['code'], details?: Partial<MarkerEvent>): void;
  paceAtrium(timeUs: number): void;
  paceVentricles(timeUs: number, code: 'ventricularPace' | 'safetyPace'): void;
  /** The second site of a multisite pace, committed by the first. */
  secondSite(timeUs: number): void;
}

type VentricularSite = 'rightVentricle' | 'leftVentricle';

export function createDeviceOutput(
  pacing: PacingParameters,
  interventricularUs: number,
  patient: Patient,
  agenda: Agenda,
  emit: (event: StripEvent) => void,
): DeviceOutput {
  const leads = {
    atrium: pacing.atrialLead,
    rightVentricle: pacing.rightVentricularLead,
    leftVentricle: pacing.leftVentricularLead,
  };
  const both = pacing.ventricularChambers === 'both';
  const leftFirst = both ? pacing.interventricularDelayMs < 0 : pacing.ventricularChambers === 'left';
  const firstSite: VentricularSite = leftFirst ? 'leftVentricle' : 'rightVentricle';
  const otherSite: VentricularSite = leftFirst ? 'rightVentricle' : 'leftVentricle';

  /** The stimulus stands before the depolarization it starts. */
  const stimulate = (chamber: StimulusChamber, timeUs: number, act: () => CaptureOutcome): void => {
    const lead = leads[chamber];
    const stimulus: StripEvent = {
      type: 'stimulus',
      timeS: usToS(timeUs),
      chamber,
      amplitudeMv: surfaceSpikeMv(chamber, lead),
      widthMs: lead.pulseWidthMs,
      captured: true,
    };
    emit(stimulus);
    const outcome = act();
    if (outcome === 'captured' || outcome === 'capturedFresh') return;
    stimulus.captured = false;
    stimulus.reason = outcome;
    if (chamber !== 'atrium' && outcome === 'refractoryTissue' && patient.isPseudofusion(timeUs)) {
      stimulus.pseudofusion = true;
    }
  };
  const stimulateVentricle = (site: VentricularSite, timeUs: number): void =>
    stimulate(site, timeUs, () => patient.stimulateVentricle(site, timeUs));

  const mark: DeviceOutput['mark'] = (timeUs, code, details = {}) =>
    emit({ type: 'marker', timeS: usToS(timeUs), code, ...details });

  return {
    mark,
    paceAtrium(timeUs) {
      mark(timeUs, 'atrialPace');
      stimulate('atrium', timeUs, () => patient.stimulateAtrium(timeUs));
    },
    paceVentricles(timeUs, code) {
      mark(timeUs, code);
      if (both) agenda.set('secondSite', timeUs + interventricularUs);
      stimulateVentricle(firstSite, timeUs);
    },
    secondSite(timeUs) {
      agenda.clear('secondSite');
      stimulateVentricle(otherSite, timeUs);
    },
  };
}
