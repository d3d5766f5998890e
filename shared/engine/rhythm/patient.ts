import type { StripParameters } from '../../parameters/strip-parameters';
import { msToUs, rateToIntervalUs, usToS } from '../../units';
import type {
  AtrialOrigin,
  AvBlock,
  StripEvent,
  VentricularDepolarization,
  VentricularOrigin,
  VentricularSourceSite,
} from '../events';
import { randomStream } from '../random';
import type { Agenda } from './agenda';
import { createAtria } from './atria';
import { createAtrialRhythm } from './atrial-rhythm';
import { createAvNode } from './av-node';
import { captureOutcome, type CaptureOutcome, type StimulusStrength } from './capture';
import { atrialDelayMs } from './local-activation';
import { createPrematureFocus } from './premature-beats';
import { createVentricles } from './ventricles';

/** A paced or escape beat this long before a conducted one fuses with it, ms. */
const fusionWindowUs = msToUs(80);
/** Chest pads sense the surface, this long after the QRS begins, ms. */
const chestSenseUs = msToUs(40);

export type VentricularStimulusSite = 'rightVentricle' | 'leftVentricle' | 'chest';

/** The patient: spontaneous rhythm, conduction, and what stimuli do to the muscle. Times in µs. */
export interface Patient {
  armPrematureVentricle(timeUs: number): void;
  armPrematureAtrium(timeUs: number): void;
  nodeExit(timeUs: number): void;
  retrograde(timeUs: number): void;
  prematureVentricle(timeUs: number): void;
  prematureAtrium(timeUs: number): void;
  atrialDischarge(timeUs: number): void;
  escape(timeUs: number): void;
  stimulateAtrium(timeUs: number, strength: StimulusStrength): CaptureOutcome;
  stimulateVentricle(
    site: VentricularStimulusSite,
    timeUs: number,
    strength: StimulusStrength,
  ): CaptureOutcome;
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
  const node = createAvNode(patient, randomStream(seed, 'node'));
  const rhythm = createAtrialRhythm(patient, randomStream(seed, 'sinus'));
  const atria = createAtria(pacing.atrialLead.site);
  const ventricles = createVentricles(patient, pacing);
  const escapeUs = rateToIntervalUs(patient.escapeRateBpm);
  const focus = (chamber: 'Ventricle' | 'Atrium', perMinute: number) =>
    createPrematureFocus(
      chamber,
      perMinute,
      patient.prematureCouplingMs,
      startUs,
      agenda,
      randomStream(seed, `premature${chamber}`),
    );
  const ventricularFocus = focus('Ventricle', patient.prematureVentricularPerMinute);
  const atrialFocus = focus('Atrium', patient.prematureAtrialPerMinute);
  /** In flutter and fibrillation nothing else takes the atria. */
  const atriaAreOpen = rhythm === null || rhythm.resets;
  const retrogradeUs =
    patient.retrogradeConductionMs === null || !atriaAreOpen
      ? null
      : msToUs(patient.retrogradeConductionMs - atrialDelayMs('retrograde', pacing.atrialLead.site));

  const armEscape = (timeUs: number): void => {
    if (patient.escapeSite !== 'none') agenda.set('escape', timeUs);
  };
  const startRandom = randomStream(seed, 'start');
  const startFraction = (intervalUs: number): number => Math.floor(startRandom.uniform() * intervalUs);
  const atrialStartUs = startUs + startFraction(rateToIntervalUs(patient.atrialRateBpm));
  if (rhythm) agenda.set('atrialRhythm', atrialStartUs);
  armEscape(startUs + startFraction(escapeUs));

  /** Onset of the P wave whose impulse is in the node, and of the beat whose impulse is on its way up. */
  let downFromUs = 0;
  let upFromUs = 0;

  /** Sends an atrial impulse into the node; returns where it is stopped at once, if it is. */
  const enterNode = (timeUs: number): AvBlock | undefined => {
    if (agenda.dueUs('retrograde') !== null) {
      agenda.clear('retrograde');
      node.collide(timeUs);
      return 'collision';
    }
    const exitUs = node.enter(timeUs);
    if (exitUs === null) return 'inNode';
    agenda.set('nodeExit', exitUs);
    downFromUs = timeUs;
    return node.arrivalUs() === null ? 'belowNode' : undefined;
  };

  const depolarizeAtria = (origin: AtrialOrigin, timeUs: number): void => {
    const depolarization = atria.depolarize(origin, timeUs);
    emit(depolarization);
    if (origin !== 'paced') {
      agenda.addSense({
        depolarization,
        timeUs: atria.localUs(),
        chamber: 'atrium',
        cause: 'depolarization',
        halfSignal: origin === 'fibrillation',
      });
    }
    if (rhythm && (rhythm.resets || origin === rhythm.origin)) {
      agenda.set('atrialRhythm', timeUs + rhythm.cycleUs(timeUs));
    }
    if (origin !== 'premature') atrialFocus.beat(timeUs);
    if (origin === 'retrograde') depolarization.conductedFromS = usToS(upFromUs);
    else {
      const blocked = enterNode(timeUs);
      if (blocked) depolarization.blocked = blocked;
    }
  };

  const scheduleVentricularSense = (
    depolarization: VentricularDepolarization,
    site: VentricularSourceSite,
    onsetUs: number,
  ): void => {
    const chest = pacing.source === 'transcutaneous';
    if (site === (chest ? 'chest' : 'rightVentricle')) return;
    const timeUs = chest ? onsetUs + chestSenseUs : ventricles.localUs('right');
    agenda.addSense({ timeUs, chamber: 'ventricle', cause: 'depolarization', depolarization });
  };

  const enterNodeFromBelow = (timeUs: number): void => {
    const mayPass = retrogradeUs !== null && agenda.dueUs('retrograde') === null;
    const passes = node.enterFromBelow(timeUs, mayPass);
    agenda.clear('nodeExit');
    if (!passes || retrogradeUs === null) return;
    upFromUs = timeUs;
    agenda.set('retrograde', timeUs + retrogradeUs);
  };

  /** Starts a beat; one from below meets the conducted impulse within the fusion window, or cancels it. */
  const depolarizeVentricles = (
    origin: VentricularOrigin,
    site: VentricularSourceSite,
    timeUs: number,
  ): void => {
    const arrivalUs = node.arrivalUs();
    const mayFuse = origin === 'paced' || origin === 'ventricularEscape';
    const fuses = mayFuse && arrivalUs !== null && arrivalUs - timeUs <= fusionWindowUs;
    const sources = [{ site, timeUs }];
    if (fuses) sources.push({ site: 'conducted', timeUs: arrivalUs });
    const depolarization = ventricles.depolarize(origin, sources);
    if (fuses || site === 'conducted') depolarization.conductedFromS = usToS(downFromUs);
    emit(depolarization);
    armEscape(timeUs + escapeUs);
    if (origin !== 'premature') ventricularFocus.beat(timeUs);
    if (!fuses && site !== 'conducted') enterNodeFromBelow(timeUs);
    scheduleVentricularSense(depolarization, site, timeUs);
  };

  return {
    armPrematureVentricle: (timeUs) => ventricularFocus.arm(timeUs),
    armPrematureAtrium: (timeUs) => atrialFocus.arm(timeUs),
    nodeExit(timeUs) {
      agenda.clear('nodeExit');
      const passes = node.exit(timeUs);
      if (passes && ventricles.isExcitable(timeUs)) depolarizeVentricles('conducted', 'conducted', timeUs);
    },
    retrograde(timeUs) {
      agenda.clear('retrograde');
      const localUs = timeUs + msToUs(atrialDelayMs('retrograde', pacing.atrialLead.site));
      if (atria.isRestedAt(localUs)) depolarizeAtria('retrograde', timeUs);
    },
    prematureVentricle(timeUs) {
      agenda.clear('prematureVentricle');
      if (ventricles.isExcitable(timeUs)) depolarizeVentricles('premature', 'premature', timeUs);
    },
    prematureAtrium(timeUs) {
      agenda.clear('prematureAtrium');
      const localUs = timeUs + msToUs(atrialDelayMs('premature', pacing.atrialLead.site));
      if (atriaAreOpen && atria.isRestedAt(localUs)) depolarizeAtria('premature', timeUs);
    },
    atrialDischarge(timeUs) {
      if (rhythm) depolarizeAtria(rhythm.origin, timeUs);
    },
    escape(timeUs) {
      const origin = patient.escapeSite === 'junctional' ? 'junctionalEscape' : 'ventricularEscape';
      depolarizeVentricles(origin, origin, timeUs);
    },
    stimulateAtrium(timeUs, strength) {
      if (!atriaAreOpen) return 'refractoryTissue';
      const outcome = captureOutcome(timeUs, atria.localUs(), 'atrium', strength);
      if (outcome === 'captured') depolarizeAtria('paced', timeUs);
      if (outcome === 'capturedFresh') atria.join(timeUs);
      return outcome;
    },
    stimulateVentricle(site, timeUs, strength) {
      const lead = site === 'leftVentricle' ? 'left' : 'right';
      const outcome = captureOutcome(timeUs, ventricles.localUs(lead), 'ventricle', strength);
      if (outcome === 'captured') depolarizeVentricles('paced', site, timeUs);
      if (outcome === 'capturedFresh') ventricles.join(site, timeUs);
      return outcome;
    },
    isPseudofusion: (timeUs) => ventricles.isPseudofusion(timeUs),
  };
}
