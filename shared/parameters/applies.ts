import type { FaultKind } from './faults';
import { isTemporary } from './pacing';
import {
  basicMode,
  modeUnderMagnet,
  pacesAtrium,
  pacesBothVentricles,
  pacesVentricles,
  respondsToSensor,
  sensesAtrium,
  sensesVentricle,
  type BasicMode,
} from './pacing-mode';
import type { PacingParameters, StripParameters } from './strip-parameters';

type Predicate = (parameters: StripParameters) => boolean;
/** `index`: which item, for a path through a list. */
type Rule = (parameters: StripParameters, index: number) => boolean;

/** The mode that acts: as set, or what a magnet makes of it. */
export function actingMode({ source, mode, magnetApplied }: PacingParameters): BasicMode {
  const basic = basicMode(mode);
  return source === 'implanted' && magnetApplied ? modeUnderMagnet[basic] : basic;
}

const implanted: Predicate = ({ pacing }) => pacing.source === 'implanted';
const transvenous: Predicate = ({ pacing }) => pacing.source === 'transvenous';
const transcutaneous: Predicate = ({ pacing }) => pacing.source === 'transcutaneous';
const paced: Predicate = ({ pacing }) => pacing.source !== 'none';
const underMagnet: Predicate = (parameters) => implanted(parameters) && parameters.pacing.magnetApplied;
const inMode =
  (...modes: BasicMode[]): Predicate =>
  ({ pacing }) =>
    pacing.source !== 'none' && modes.includes(actingMode(pacing));
const all =
  (...several: Predicate[]): Predicate =>
  (parameters) =>
    several.every((rule) => rule(parameters));

const atrialPacing: Predicate = (parameters) =>
  implanted(parameters) && pacesAtrium(actingMode(parameters.pacing));
const atrialSensing: Predicate = (parameters) =>
  implanted(parameters) && sensesAtrium(actingMode(parameters.pacing));
const ventricularPacing: Predicate = (parameters) =>
  implanted(parameters) && pacesVentricles(actingMode(parameters.pacing));
const ventricularSensing: Predicate = (parameters) =>
  implanted(parameters) && sensesVentricle(actingMode(parameters.pacing));
const rightPacing: Predicate = (parameters) =>
  ventricularPacing(parameters) && parameters.pacing.ventricularChambers !== 'left';
const leftPacing: Predicate = (parameters) =>
  ventricularPacing(parameters) && parameters.pacing.ventricularChambers !== 'right';
const rightOrTransvenousPacing: Predicate = (parameters) =>
  rightPacing(parameters) || transvenous(parameters);
const demand: Predicate = ({ pacing }) => basicMode(pacing.mode) === 'VVI';
const irregularAtria: Predicate = ({ patient }) =>
  patient.atrialRhythm === 'sinus' || patient.atrialRhythm === 'tachycardia';

/**
 * When a parameter acts. A path that is not here acts always. A field that does not act is not shown: a test sets it
 * all the same and finds the same events.
 */
const rules: Readonly<Record<string, Rule>> = {
  'sheet.stimulusMarkers': ({ recorder }) => recorder.stimulusMarker,
  // In arrest the rate still shapes the recovery of a Wenckebach node.
  'patient.atrialRateBpm': ({ patient }) =>
    patient.atrialRhythm !== 'arrest' || patient.avConduction === 'wenckebach',
  'patient.rateVariabilityPercent': irregularAtria,
  'patient.respiratoryRateBpm': ({ patient, disturbance }) =>
    patient.atrialRhythm === 'sinus' || disturbance.baselineWanderMv > 0,
  'patient.conductedPerGroup': ({ patient }) =>
    patient.avConduction === 'wenckebach' || patient.avConduction === 'mobitzTwo',
  'patient.prIntervalMs': ({ patient }) => patient.avConduction !== 'complete',
  'patient.retrogradeConductionMs': ({ patient }) =>
    patient.atrialRhythm !== 'flutter' && patient.atrialRhythm !== 'fibrillation',
  'patient.escapeRateBpm': ({ patient }) => patient.escapeSite !== 'none',
  'patient.prematureAtrialPerMinute': ({ patient }) =>
    patient.atrialRhythm !== 'flutter' && patient.atrialRhythm !== 'fibrillation',
  'patient.prematureCouplingMs': ({ patient }) =>
    patient.prematureVentricularPerMinute > 0 || patient.prematureAtrialPerMinute > 0,

  'patient.injury.stElevationMv': ({ patient }) => patient.injury.territory !== 'none',

  'pacing.mode': paced,
  'pacing.ventricularChambers': all(ventricularPacing, ({ pacing }) => !pacesBothVentricles(pacing.mode)),
  'pacing.lowerRateBpm': (parameters) => paced(parameters) && !underMagnet(parameters),
  'pacing.upperTrackingRateBpm': inMode('DDD', 'VDD'),
  'pacing.sensorRateBpm': (parameters) =>
    implanted(parameters) && !underMagnet(parameters) && respondsToSensor(parameters.pacing.mode),
  'pacing.hysteresisRateBpm': all(implanted, inMode('AAI', 'VVI', 'VDD', 'DDI', 'DDD')),
  'pacing.pacedAvDelayMs': inMode('DOO', 'DDI', 'DDD'),
  'pacing.sensedAvDelayMs': inMode('VDD', 'DDD'),
  'pacing.pvarpMs': inMode('AAI', 'VDD', 'DDI', 'DDD'),
  'pacing.pvarpAfterEctopic': inMode('VDD', 'DDI', 'DDD'),
  'pacing.ventricularRefractoryMs': inMode('VVI', 'VDD', 'DDI', 'DDD'),
  'pacing.ventricularBlankingMs': inMode('DDI', 'DDD'),
  'pacing.safetyPacing': inMode('DDI', 'DDD'),
  'pacing.modeSwitching': inMode('VDD', 'DDD'),
  'pacing.modeSwitchRateBpm': all(inMode('VDD', 'DDD'), ({ pacing }) => pacing.modeSwitching),
  'pacing.magnetApplied': implanted,
  'pacing.magnetRateBpm': underMagnet,
  'pacing.interventricularDelayMs': all(ventricularPacing, ({ pacing }) => pacesBothVentricles(pacing.mode)),
  'pacing.hisCapture': all(
    rightOrTransvenousPacing,
    ({ pacing }) => pacing.rightVentricularLead.site === 'his',
  ),

  'pacing.atrialLead.site': (parameters) => atrialPacing(parameters) || atrialSensing(parameters),
  'pacing.atrialLead.polarity': atrialPacing,
  'pacing.atrialLead.amplitudeV': atrialPacing,
  'pacing.atrialLead.pulseWidthMs': atrialPacing,
  'pacing.atrialLead.captureThresholdV': atrialPacing,
  'pacing.atrialLead.surfaceSpikeMv': atrialPacing,
  'pacing.atrialLead.sensitivityMv': atrialSensing,
  'pacing.atrialLead.signalMv': atrialSensing,
  'pacing.rightVentricularLead.site': (parameters) =>
    ventricularPacing(parameters) || ventricularSensing(parameters) || transvenous(parameters),
  'pacing.rightVentricularLead.polarity': rightOrTransvenousPacing,
  'pacing.rightVentricularLead.amplitudeV': rightPacing,
  'pacing.rightVentricularLead.pulseWidthMs': rightOrTransvenousPacing,
  'pacing.rightVentricularLead.captureThresholdV': rightPacing,
  'pacing.rightVentricularLead.surfaceSpikeMv': rightOrTransvenousPacing,
  'pacing.rightVentricularLead.sensitivityMv': ventricularSensing,
  'pacing.rightVentricularLead.signalMv': (parameters) =>
    ventricularSensing(parameters) || (transvenous(parameters) && demand(parameters)),
  'pacing.leftVentricularLead.site': leftPacing,
  'pacing.leftVentricularLead.polarity': leftPacing,
  'pacing.leftVentricularLead.amplitudeV': leftPacing,
  'pacing.leftVentricularLead.pulseWidthMs': leftPacing,
  'pacing.leftVentricularLead.captureThresholdV': leftPacing,
  'pacing.leftVentricularLead.surfaceSpikeMv': leftPacing,
  'pacing.leftVentricularLead.sensitivityMv': () => false,
  'pacing.leftVentricularLead.signalMv': () => false,
  'pacing.transvenous.outputMa': transvenous,
  'pacing.transvenous.captureThresholdMa': transvenous,
  'pacing.transvenous.sensitivityMv': all(transvenous, demand),
  'pacing.transcutaneous.currentMa': transcutaneous,
  'pacing.transcutaneous.captureThresholdMa': transcutaneous,
  'pacing.transcutaneous.pulseWidthMs': transcutaneous,
  'pacing.transcutaneous.artefactMv': transcutaneous,
  'pacing.faults': paced,
  'pacing.faults.*.intervalMs': ({ pacing }, index) => pacing.faults[index].kind === 'oversensing',

  'disturbance.mainsHz': ({ disturbance }) => disturbance.mainsMv > 0,
};

/** Whether a parameter acts on this strip, given the others. Unknown paths act. */
export function parameterApplies(parameters: StripParameters, path: string): boolean {
  const index = /\.(\d+)\./u.exec(path)?.[1];
  const rule = rules[index === undefined ? path : path.replace(`.${index}.`, '.*.')] as Rule | undefined;
  return rule?.(parameters, Number(index)) ?? true;
}

/** Paths that act only under a condition. */
export const conditionalPaths: readonly string[] = Object.keys(rules);

/** Chambers in which a fault of a kind can strike: those paced, or those sensed. */
function faultChambers(parameters: StripParameters, kind: FaultKind): readonly string[] {
  const { pacing } = parameters;
  const mode = actingMode(pacing);
  if (kind === 'undersensing' || kind === 'oversensing') {
    return [sensesAtrium(mode) && 'atrium', sensesVentricle(mode) && 'rightVentricle'].filter(
      (one) => one !== false,
    );
  }
  if (isTemporary(pacing.source)) return ['rightVentricle'];
  return [
    pacesAtrium(mode) && 'atrium',
    rightPacing(parameters) && 'rightVentricle',
    leftPacing(parameters) && 'leftVentricle',
  ].filter((one) => one !== false);
}

/** Whether a choice of a parameter goes with the others at all; what does not is not offered. */
export function choiceApplies(parameters: StripParameters, path: string, choice: string): boolean {
  const { pacing } = parameters;
  if (path === 'pacing.mode' && isTemporary(pacing.source)) return choice === 'VVI' || choice === 'VOO';
  if (path === 'pacing.ventricularChambers') return pacesBothVentricles(pacing.mode) === (choice === 'both');
  const fault = /^pacing\.faults\.(\d+)\.chamber$/u.exec(path);
  if (fault) return faultChambers(parameters, pacing.faults[Number(fault[1])].kind).includes(choice);
  return true;
}
