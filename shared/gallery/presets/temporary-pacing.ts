import { atLeast, atMost, exactly, within } from '../criterion';
import type { GalleryPreset } from '../gallery-preset';
import { sources } from '../sources';
import { completeBlock } from './patients';

const group = 'temporary-pacing';
const blocked = { ...completeBlock, escapeSite: 'ventricular', escapeRateBpm: 30 } as const;

export const temporaryPacing: readonly GalleryPreset[] = [
  {
    id: 'transvenous-demand',
    title: 'Transvenous, on demand',
    teachingPoint:
      'A wire in the right ventricle paces a blocked patient at 70: spike, wide QRS, discordant T, with P waves marching through.',
    tags: ['transvenous', 'VVI', 'capture'],
    group,
    parameters: { patient: blocked, pacing: { source: 'transvenous', lowerRateBpm: 70 } },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.nbg),
      within('rate.ventricular', 69.9, 70.1, sources.timing),
      atLeast('ms.qrs', 140, sources.apexWidth),
    ],
  },
  {
    id: 'transvenous-output-turned-down',
    title: 'Transvenous, output turned down',
    teachingPoint:
      'Just below the threshold: spikes without an answer, and slow escapes. Turn it up until every spike captures; that output is the threshold.',
    tags: ['transvenous', 'no capture', 'threshold'],
    group,
    parameters: {
      patient: blocked,
      pacing: {
        source: 'transvenous',
        lowerRateBpm: 70,
        transvenous: { outputMa: 0.9, captureThresholdMa: 1 },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 0, sources.strength),
      atLeast('lost.belowThreshold', 5, sources.strength),
      atLeast('beats.ventricularEscape', 3, sources.practice),
    ],
  },
  {
    id: 'transvenous-sensitivity-too-low',
    title: 'Transvenous, deaf to the patient',
    teachingPoint:
      'The patient’s own rhythm has come back, and the temporary device paces through it: its sensitivity asks for a larger signal than the wire delivers.',
    tags: ['transvenous', 'undersensing', 'competition'],
    group,
    parameters: {
      patient: { atrialRateBpm: 78 },
      pacing: {
        source: 'transvenous',
        lowerRateBpm: 70,
        rightVentricularLead: { signalMv: 4 },
        transvenous: { sensitivityMv: 10 },
      },
    },
    criteria: [
      atLeast('beats.unsensed', 4, sources.practice),
      atLeast('stimuli.rightVentricle', 8, sources.practice),
    ],
  },
  {
    id: 'transvenous-asynchronous',
    title: 'Transvenous, asynchronous',
    teachingPoint:
      'Set to pace without listening: spikes keep their own time whatever the heart does. Useful for a moment, risky when the patient’s rhythm returns.',
    tags: ['transvenous', 'VOO', 'asynchronous'],
    group,
    parameters: {
      patient: { atrialRateBpm: 64 },
      pacing: { source: 'transvenous', mode: 'VOO', lowerRateBpm: 75 },
    },
    criteria: [
      within('stimuli.rightVentricle', 12, 13, sources.nbg),
      atLeast('beats.paced', 3, sources.practice),
    ],
  },
  {
    id: 'transcutaneous-capture',
    title: 'Transcutaneous, captured',
    teachingPoint:
      'A broad artefact, then a wide QRS and its own T wave after every one: electrical capture. Whether blood moves, only a pulse can tell.',
    tags: ['transcutaneous', 'capture', 'artefact'],
    group,
    parameters: {
      patient: blocked,
      pacing: {
        source: 'transcutaneous',
        lowerRateBpm: 70,
        transcutaneous: { currentMa: 80, captureThresholdMa: 65, artefactMv: 3 },
      },
    },
    criteria: [
      exactly('captured.chest', 1, sources.chest),
      atLeast('beats.paced', 9, sources.chest),
      atLeast('t.V1', 0.2, sources.chest),
    ],
  },
  {
    id: 'transcutaneous-no-capture',
    title: 'Transcutaneous, artefact without capture',
    teachingPoint:
      'The artefact and its slow decay look like a QRS and a T wave, but no T wave follows: the current is below the threshold, and the real rhythm runs beneath.',
    tags: ['transcutaneous', 'no capture', 'artefact', 'look-alike'],
    group,
    parameters: {
      patient: blocked,
      pacing: {
        source: 'transcutaneous',
        lowerRateBpm: 70,
        transcutaneous: { currentMa: 50, captureThresholdMa: 65, artefactMv: 3 },
      },
    },
    criteria: [
      exactly('captured.chest', 0, sources.chest),
      atLeast('lost.belowThreshold', 5, sources.chest),
      exactly('beats.paced', 0, sources.chest),
      atLeast('beats.ventricularEscape', 3, sources.chest),
    ],
  },
  {
    id: 'transcutaneous-now-and-then',
    title: 'Transcutaneous, capture now and then',
    teachingPoint:
      'Some artefacts are followed by a wide QRS with a T wave, some by nothing: pads that have come loose, or a current too near the threshold.',
    tags: ['transcutaneous', 'intermittent', 'artefact'],
    group,
    parameters: {
      seed: 3,
      patient: blocked,
      pacing: {
        source: 'transcutaneous',
        lowerRateBpm: 70,
        transcutaneous: { currentMa: 80, artefactMv: 3 },
        faults: [{ kind: 'failureToCapture', proportion: 0.5 }],
      },
    },
    criteria: [
      within('captured.chest', 0.2, 0.8, sources.chest),
      atLeast('beats.paced', 2, sources.chest),
      atLeast('lost.fault', 2, sources.chest),
    ],
  },
  {
    id: 'transcutaneous-on-a-monitor',
    title: 'Transcutaneous, as the monitor draws it',
    teachingPoint:
      'The narrow band makes the artefact rounder and longer: even more like a QRS. Look for the T wave, and feel for a pulse.',
    tags: ['transcutaneous', 'monitor', 'bandwidth', 'artefact'],
    group,
    parameters: {
      patient: blocked,
      pacing: {
        source: 'transcutaneous',
        lowerRateBpm: 70,
        transcutaneous: { currentMa: 50, captureThresholdMa: 65, artefactMv: 3 },
      },
      recorder: { bandwidth: 'monitor' },
    },
    criteria: [
      exactly('captured.chest', 0, sources.chest),
      atLeast('spike.II', 0.3, sources.chest),
      atMost('beats.paced', 0, sources.chest),
    ],
  },
];
