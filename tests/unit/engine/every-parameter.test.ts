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
];

/** What a person could notice of a strip: samples, events, reading. */
function observe(input: unknown) {
  const { leads, events, reading } = renderStrip(buildStrip(input as StripParametersInput));
  return JSON.stringify([Object.values(leads).map((lead) => [...lead]), events, reading]);
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
    expect(all.filter((path) => !rows.some(([covered]) => covered === path))).toEqual([]);
  });
});
