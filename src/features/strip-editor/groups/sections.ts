import type { ParameterPath } from '../state/parameter-paths';

/** Fields of a group that belong together, under one small heading. */
export interface Section {
  /** null: no heading, for the first fields of a group. */
  title: string | null;
  paths: readonly ParameterPath[];
}

const at = (prefix: string, ...keys: string[]): ParameterPath[] => keys.map((key) => `${prefix}.${key}`);

export const patientSections: readonly Section[] = [
  {
    title: 'Atria',
    paths: at('patient', 'atrialRhythm', 'atrialRateBpm', 'rateVariabilityPercent', 'respiratoryRateBpm'),
  },
  {
    title: 'Conduction',
    paths: at(
      'patient',
      'avConduction',
      'prIntervalMs',
      'conductedPerGroup',
      'bundleBranchBlock',
      'retrogradeConductionMs',
    ),
  },
  {
    title: 'Escape and premature beats',
    paths: at(
      'patient',
      'escapeSite',
      'escapeRateBpm',
      'prematureVentricularPerMinute',
      'prematureAtrialPerMinute',
      'prematureCouplingMs',
    ),
  },
  { title: 'Injury', paths: at('patient.injury', 'territory', 'stElevationMv') },
];

export const pacingSections: readonly Section[] = [
  { title: null, paths: at('pacing', 'source', 'mode', 'ventricularChambers', 'magnetApplied') },
  {
    title: 'Rates',
    paths: at(
      'pacing',
      'lowerRateBpm',
      'magnetRateBpm',
      'upperTrackingRateBpm',
      'hysteresisRateBpm',
      'sensorRateBpm',
    ),
  },
  {
    title: 'Atrium to ventricles',
    paths: at('pacing', 'pacedAvDelayMs', 'sensedAvDelayMs', 'interventricularDelayMs'),
  },
  {
    title: 'Refractory and blanking',
    paths: at('pacing', 'pvarpMs', 'pvarpAfterEctopic', 'ventricularRefractoryMs', 'ventricularBlankingMs'),
  },
  { title: 'Safeguards', paths: at('pacing', 'safetyPacing', 'modeSwitching', 'modeSwitchRateBpm') },
];

export const waveformSections: readonly Section[] = [
  { title: 'P wave', paths: at('waveform', 'pAmplitudeMv', 'pDurationMs') },
  { title: 'QRS', paths: at('waveform', 'qrsDurationMs', 'qrsScale', 'axisRotationDeg') },
  { title: 'Repolarization', paths: at('waveform', 'tScale', 'qtcMs') },
];

export const disturbanceSections: readonly Section[] = [
  {
    title: null,
    paths: [
      ...at(
        'disturbance',
        'baselineWanderMv',
        'muscleMv',
        'motionPerMinute',
        'mainsMv',
        'mainsHz',
        'electrodeReversal',
      ),
      'seed',
    ],
  },
];

export const sheetSection: Section = {
  title: 'On the sheet',
  paths: at('sheet', 'gridTint', 'ladder', 'stimulusMarkers'),
};

/** Fields of a permanent lead. */
export function leadPaths(
  lead: 'atrialLead' | 'rightVentricularLead' | 'leftVentricularLead',
): ParameterPath[] {
  return [
    `pacing.${lead}.site`,
    ...(lead === 'rightVentricularLead' ? ['pacing.hisCapture'] : []),
    ...at(
      `pacing.${lead}`,
      'polarity',
      'amplitudeV',
      'pulseWidthMs',
      'captureThresholdV',
      'sensitivityMv',
      'signalMv',
      'surfaceSpikeMv',
    ),
  ];
}

export const temporaryLeadPaths: readonly ParameterPath[] = [
  ...at('pacing.transvenous', 'outputMa', 'captureThresholdMa', 'sensitivityMv'),
  'pacing.rightVentricularLead.signalMv',
  'pacing.rightVentricularLead.site',
  'pacing.hisCapture',
  ...at('pacing.rightVentricularLead', 'polarity', 'pulseWidthMs', 'surfaceSpikeMv'),
];

export const chestPaths: readonly ParameterPath[] = at(
  'pacing.transcutaneous',
  'currentMa',
  'captureThresholdMa',
  'pulseWidthMs',
  'artefactMv',
);

/** Fields of the recorder, which have controls of their own. */
export const recorderPaths: readonly ParameterPath[] = at(
  'recorder',
  'bandwidth',
  'mainsNotchHz',
  'sampleRateHz',
  'resolutionUv',
  'stimulusMarker',
);
