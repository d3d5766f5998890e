import { describe, expect, it } from 'vitest';
import { renderStrip } from '../../../shared/engine/render';
import { assignPath } from '../../../shared/parameters/assign-path';
import type { StripParametersInput } from '../../../shared/parameters/strip-parameters';
import { buildStrip } from '../../support/strips';

// A parameter that changes nothing is a defect: each row sets one, on a strip on which it matters.

const short = { durationS: 4 } as const;
const ddd: StripParametersInput = {
  ...short,
  patient: { avConduction: 'complete', atrialRateBpm: 40 },
  pacing: { source: 'implanted' },
};
const multisite: StripParametersInput = { ...ddd, pacing: { source: 'implanted', mode: 'DDDOV' } };
const fast: StripParametersInput = {
  durationS: 8,
  patient: { avConduction: 'complete', atrialRateBpm: 135 },
  pacing: { source: 'implanted' },
};
const crosstalk: StripParametersInput = {
  ...ddd,
  pacing: { source: 'implanted', atrialLead: { amplitudeV: 8 }, rightVentricularLead: { sensitivityMv: 1 } },
};
const his: StripParametersInput = {
  ...ddd,
  pacing: { source: 'implanted', rightVentricularLead: { site: 'his' } },
};
const escaping: StripParametersInput = {
  ...short,
  patient: { avConduction: 'complete', escapeSite: 'junctional' },
};
const vvi: StripParametersInput = {
  ...short,
  patient: { atrialRateBpm: 62 },
  pacing: { source: 'implanted', mode: 'VVI' },
};

const grouped: StripParametersInput = {
  durationS: 8,
  patient: { atrialRateBpm: 90, avConduction: 'wenckebach' },
};
const looping: StripParametersInput = {
  durationS: 8,
  patient: { atrialRateBpm: 62, prematureVentricularPerMinute: 20, prematureCouplingMs: 400 },
  pacing: { source: 'implanted', pvarpMs: 200 },
};
const premature: StripParametersInput = { durationS: 8, patient: { prematureVentricularPerMinute: 30 } };
const rateResponsive: StripParametersInput = {
  ...short,
  patient: { atrialRhythm: 'arrest' },
  pacing: { source: 'implanted', mode: 'AAIR' },
};
const hearing: StripParametersInput = {
  durationS: 8,
  patient: { prematureVentricularPerMinute: 12, avConduction: 'complete' },
  pacing: { source: 'implanted', mode: 'VVI' },
};
const tachycardia: StripParametersInput = {
  durationS: 8,
  patient: { atrialRhythm: 'tachycardia', atrialRateBpm: 175, avConduction: 'complete' },
  pacing: { source: 'implanted', pvarpMs: 150 },
};
const transvenous: StripParametersInput = {
  durationS: 6,
  patient: { atrialRateBpm: 65 },
  pacing: { source: 'transvenous', lowerRateBpm: 70 },
};
const transcutaneous: StripParametersInput = {
  durationS: 6,
  patient: { avConduction: 'complete' },
  pacing: { source: 'transcutaneous', transcutaneous: { currentMa: 70 } },
};
const faulty: StripParametersInput = {
  durationS: 8,
  patient: { atrialRateBpm: 75, prIntervalMs: 240 },
  pacing: {
    source: 'implanted',
    faults: [{ kind: 'failureToCapture', chamber: 'rightVentricle', fromS: 2, toS: 6 }],
  },
};
const falseSenses: StripParametersInput = {
  ...faulty,
  pacing: {
    source: 'implanted',
    mode: 'VVI',
    lowerRateBpm: 90,
    faults: [{ kind: 'oversensing', intervalMs: 400 }],
  },
};

const rows: [path: string, value: unknown, on: StripParametersInput][] = [
  ['seed', 9, {}],
  ['durationS', 5, {}],
  ['patient.atrialRhythm', 'arrest', short],
  ['patient.atrialRateBpm', 90, short],
  ['patient.rateVariabilityPercent', 12, short],
  ['patient.respiratoryRateBpm', 30, short],
  ['patient.avConduction', 'complete', short],
  ['patient.prIntervalMs', 220, short],
  ['patient.escapeSite', 'ventricular', escaping],
  ['patient.escapeRateBpm', 55, escaping],
  ['patient.bundleBranchBlock', 'left', short],
  ['pacing.source', 'implanted', { ...short, patient: { avConduction: 'complete' } }],
  ['pacing.mode', 'VVI', ddd],
  ['pacing.ventricularChambers', 'left', ddd],
  ['pacing.lowerRateBpm', 80, ddd],
  ['pacing.upperTrackingRateBpm', 150, fast],
  ['pacing.pacedAvDelayMs', 120, ddd],
  ['pacing.sensedAvDelayMs', 100, fast],
  ['pacing.pvarpMs', 400, fast],
  ['pacing.ventricularRefractoryMs', 400, { ...short, patient: { atrialRateBpm: 170 }, pacing: vvi.pacing }],
  ['pacing.ventricularBlankingMs', 100, crosstalk],
  ['pacing.interventricularDelayMs', 40, multisite],
  ['pacing.hisCapture', 'selective', his],
  ...(['atrialLead', 'rightVentricularLead', 'leftVentricularLead'] as const).flatMap(
    (lead): [string, unknown, StripParametersInput][] => [
      [`pacing.${lead}.polarity`, 'unipolar', multisite],
      [`pacing.${lead}.amplitudeV`, 0.1, multisite],
      [`pacing.${lead}.pulseWidthMs`, 1.5, multisite],
      [`pacing.${lead}.captureThresholdV`, 9, multisite],
      [`pacing.${lead}.surfaceSpikeMv`, 9, multisite],
    ],
  ),
  ['pacing.atrialLead.site', 'lateral', multisite],
  ['pacing.rightVentricularLead.site', 'outflow', multisite],
  ['pacing.leftVentricularLead.site', 'anterolateral', multisite],
  ['pacing.atrialLead.sensitivityMv', 10, { ...fast, durationS: 4 }],
  ['pacing.atrialLead.signalMv', 0.1, { ...fast, durationS: 4 }],
  ['pacing.rightVentricularLead.sensitivityMv', 19, vvi],
  ['pacing.rightVentricularLead.signalMv', 1, vvi],
  ['patient.injury.territory', 'anterior', { ...short, patient: { injury: { stElevationMv: 0.2 } } }],
  ['patient.injury.stElevationMv', 0.4, { ...short, patient: { injury: { territory: 'inferior' } } }],
  ['patient.conductedPerGroup', 2, grouped],
  ['patient.retrogradeConductionMs', 260, looping],
  ['patient.prematureVentricularPerMinute', 20, { ...short, durationS: 8 }],
  ['patient.prematureAtrialPerMinute', 20, { ...short, durationS: 8 }],
  ['patient.prematureCouplingMs', 350, premature],
  ['pacing.sensorRateBpm', 100, rateResponsive],
  ['pacing.hysteresisRateBpm', 40, hearing],
  [
    'pacing.pvarpAfterEctopic',
    'lengthened',
    { ...looping, patient: { ...looping.patient, retrogradeConductionMs: 260 } },
  ],
  ['pacing.safetyPacing', false, crosstalk],
  ['pacing.modeSwitching', false, tachycardia],
  ['pacing.modeSwitchRateBpm', 190, tachycardia],
  ['pacing.magnetApplied', true, vvi],
  ['pacing.magnetRateBpm', 100, { ...vvi, pacing: { ...vvi.pacing, magnetApplied: true } }],
  ['pacing.transvenous.outputMa', 0.5, transvenous],
  ['pacing.transvenous.captureThresholdMa', 9, transvenous],
  ['pacing.transvenous.sensitivityMv', 15, transvenous],
  ['pacing.transcutaneous.currentMa', 40, transcutaneous],
  ['pacing.transcutaneous.captureThresholdMa', 90, transcutaneous],
  ['pacing.transcutaneous.pulseWidthMs', 10, transcutaneous],
  ['pacing.transcutaneous.artefactMv', 9, transcutaneous],
  ['pacing.faults', [], faulty],
  ['pacing.faults.0.kind', 'failureToPace', faulty],
  ['pacing.faults.0.chamber', 'atrium', { ...faulty, patient: { atrialRateBpm: 40 } }],
  ['pacing.faults.0.proportion', 0.3, faulty],
  ['pacing.faults.0.fromS', 4, faulty],
  ['pacing.faults.0.toS', 4, faulty],
  ['pacing.faults.0.intervalMs', 900, falseSenses],
  ['disturbance.electrodeReversal', 'RA-LA', short],
  ['waveform.pAmplitudeMv', 0.3, short],
  ['waveform.pDurationMs', 160, short],
  ['waveform.qrsDurationMs', 120, short],
  ['waveform.qrsScale', 1.6, short],
  ['waveform.axisRotationDeg', -60, short],
  ['waveform.tScale', 0.3, short],
  ['waveform.qtcMs', 520, short],
  ['disturbance.baselineWanderMv', 0.4, short],
  ['disturbance.mainsMv', 0.2, short],
  ['disturbance.mainsHz', 60, { ...short, disturbance: { mainsMv: 0.2 } }],
  ['disturbance.muscleMv', 0.1, short],
  ['disturbance.motionPerMinute', 30, short],
  ['recorder.bandwidth', 'monitor', short],
  ['recorder.mainsNotchHz', 50, { ...short, disturbance: { mainsMv: 0.2 } }],
  ['recorder.sampleRateHz', 1000, short],
  ['recorder.resolutionUv', 10, short],
  ['recorder.stimulusMarker', true, vvi],
];

/** What a person could notice of a strip: samples, events, markers, reading. */
function observe(input: unknown) {
  const { leads, events, stimulusMarkersS, reading } = renderStrip(buildStrip(input as StripParametersInput));
  return JSON.stringify([Object.values(leads).map((lead) => [...lead]), events, stimulusMarkersS, reading]);
}

describe('every parameter changes the strip', () => {
  it.each(rows)('%s', (path, value, on) => {
    const changed = assignPath(on, `${path}=${JSON.stringify(value)}`);
    expect(observe(changed)).not.toBe(observe(on));
  });

  // A left ventricular lead never senses: its sensing fields describe the lead and act on nothing.
  it('covers every leaf of the schema that acts on samples', () => {
    const leaves = (value: object, prefix = ''): string[] =>
      Object.entries(value).flatMap(([key, inner]) =>
        typeof inner === 'object' && inner !== null && !Array.isArray(inner)
          ? leaves(inner as object, `${prefix}${key}.`)
          : [`${prefix}${key}`],
      );
    const silent = ['schemaVersion', 'title', 'notes'];
    const all = leaves(buildStrip({})).filter(
      (path) =>
        !path.startsWith('sheet.') &&
        !silent.includes(path) &&
        !/leftVentricularLead\.(sensitivityMv|signalMv)$/.test(path),
    );
    const fault = leaves(buildStrip({ pacing: { faults: [{}] } }).pacing.faults[0], 'pacing.faults.0.');
    expect([...all, ...fault].filter((path) => !rows.some(([covered]) => covered === path))).toEqual([]);
  });
});
