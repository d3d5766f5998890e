import type { StripParameters } from '../../parameters/strip-parameters';
import { msToUs, rateToIntervalUs } from '../../units';
import type { SourceSite, StripEvent, VentricularOrigin } from '../events';
import { randomStream } from '../random';
import type { Agenda } from './agenda';
import { createAtria } from './atria';
import { createAvNode } from './av-node';
import { captureOutcome, type CaptureOutcome } from './capture';
import { createSinusNode } from './sinus-node';
import { createVentricles } from './ventricles';

/** A paced or ectopic beat this long before a conducted one fuses with it, ms. */
const fusionWindowUs = msToUs(80);

/** The patient: spontaneous rhythm, conduction, and what stimuli do to the muscle. Times in µs. */
export interface Patient {
  nodeExit(timeUs: number): void;
  atrialDischarge(timeUs: number): void;
  escape(timeUs: number): void;
  stimulateAtrium(timeUs: number): CaptureOutcome;
  stimulateVentricle(site: 'rightVentricle' | 'leftVentricle', timeUs: number): CaptureOutcome;
  /** Whether a stimulus that captured nothing lies in an intrinsic QRS. */
  isPseudofusion(timeUs: number): boolean;
}

export function createPatient(
  parameters: Pick<StripParameters, 'seed' | 'patient' | 'pacing'>,
  startUs: number,
  agenda: Agenda,
  emit: (event: StripEvent) => void,
): Patient {
  const { seed, patient, pacing } = parameters;
  const node = createAvNode(patient);
  const sinus = createSinusNode(patient, randomStream(seed, 'sinus'));
  const atria = createAtria(pacing.atrialLead.site);
  const ventricles = createVentricles(patient, pacing);
  const escapeUs = rateToIntervalUs(patient.escapeRateBpm);
  const startRandom = randomStream(seed, 'start');

  const armEscape = (timeUs: number): void => {
    if (patient.escapeSite !== 'none') agenda.set('escape', timeUs);
  };

  const startFraction = (intervalUs: number): number => Math.floor(startRandom.uniform() * intervalUs);
  const sinusFraction = startFraction(rateToIntervalUs(patient.atrialRateBpm));
  if (patient.atrialRhythm === 'sinus') agenda.set('atrialRhythm', startUs + sinusFraction);
  armEscape(startUs + startFraction(escapeUs));

  const depolarizeAtria = (origin: 'sinus' | 'paced', timeUs: number): void => {
    emit(atria.depolarize(origin, timeUs));
    if (origin === 'sinus') {
      agenda.addSense({ timeUs: atria.localUs(), chamber: 'atrium', cause: 'depolarization' });
    }
    if (patient.atrialRhythm === 'sinus') agenda.set('atrialRhythm', timeUs + sinus.cycleUs(timeUs));
    const exitUs = node.enter(timeUs);
    if (exitUs !== null) agenda.set('nodeExit', exitUs);
  };

  /** A beat from below: it meets the conducted impulse within the fusion window, or cancels it. */
  const depolarizeVentricles = (origin: VentricularOrigin, site: SourceSite, timeUs: number): void => {
    const pendingUs = node.pendingExitUs();
    const fuses = pendingUs !== null && pendingUs - timeUs <= fusionWindowUs && origin !== 'junctionalEscape';
    const sources = [{ site, timeUs }];
    if (fuses) sources.push({ site: 'conducted', timeUs: pendingUs });
    emit(ventricles.depolarize(origin, sources));
    armEscape(timeUs + escapeUs);
    if (!fuses && site !== 'conducted') {
      node.invadeFromBelow(timeUs);
      agenda.clear('nodeExit');
    }
    if (site !== 'rightVentricle') {
      agenda.addSense({ timeUs: ventricles.localUs('right'), chamber: 'ventricle', cause: 'depolarization' });
    }
  };

  return {
    nodeExit(timeUs) {
      agenda.clear('nodeExit');
      node.exit(timeUs);
      if (ventricles.isExcitable(timeUs)) depolarizeVentricles('conducted', 'conducted', timeUs);
    },
    atrialDischarge: (timeUs) => depolarizeAtria('sinus', timeUs),
    escape(timeUs) {
      const origin = patient.escapeSite === 'junctional' ? 'junctionalEscape' : 'ventricularEscape';
      depolarizeVentricles(origin, origin, timeUs);
    },
    stimulateAtrium(timeUs) {
      const outcome = captureOutcome(timeUs, atria.localUs(), 'atrium', pacing.atrialLead);
      if (outcome === 'captured') depolarizeAtria('paced', timeUs);
      if (outcome === 'capturedFresh') atria.join(timeUs);
      return outcome;
    },
    stimulateVentricle(site, timeUs) {
      const right = site === 'rightVentricle';
      const lead = right ? pacing.rightVentricularLead : pacing.leftVentricularLead;
      const outcome = captureOutcome(timeUs, ventricles.localUs(right ? 'right' : 'left'), 'ventricle', lead);
      if (outcome === 'captured') depolarizeVentricles('paced', site, timeUs);
      if (outcome === 'capturedFresh') ventricles.join(site, timeUs);
      return outcome;
    },
    isPseudofusion: (timeUs) => ventricles.isPseudofusion(timeUs),
  };
}
