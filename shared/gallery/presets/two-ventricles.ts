import { atLeast, atMost, exactly, within } from '../criterion';
import type { GalleryPreset } from '../gallery-preset';
import { sources } from '../sources';
import { completeBlock } from './patients';

const group = 'two-ventricles';

export const twoVentricles: readonly GalleryPreset[] = [
  {
    id: 'two-ventricles-right-first',
    title: 'Two ventricles, right first by 40 ms',
    teachingPoint:
      'Two ventricular spikes 40 ms apart before one QRS: the right ventricle is stimulated first, and V1 is still negative.',
    tags: ['biventricular', 'DDDOV', 'interventricular delay'],
    group,
    parameters: {
      patient: completeBlock,
      pacing: { source: 'implanted', mode: 'DDDOV', interventricularDelayMs: 40 },
    },
    criteria: [
      exactly('ms.interventricular', 40, sources.practice),
      exactly('captured.rightVentricle', 1, sources.nbg),
      exactly('captured.leftVentricle', 1, sources.nbg),
      atMost('ms.qrs', 145, sources.biventricular),
    ],
  },
  {
    id: 'two-ventricles-together',
    title: 'Two ventricles together',
    teachingPoint:
      'One spike on the surface, two sites at work: the QRS is narrower than from either ventricle alone, V1 turns positive and lead I begins with a q.',
    tags: ['biventricular', 'DDDOV'],
    group,
    parameters: {
      patient: completeBlock,
      pacing: { source: 'implanted', mode: 'DDDOV' },
    },
    criteria: [
      exactly('ms.interventricular', 0, sources.practice),
      atLeast('net.V1', 0.05, sources.biventricular),
      atMost('net.I', 0, sources.biventricular),
      atMost('ms.qrs', 145, sources.biventricular),
    ],
  },
  {
    id: 'two-ventricles-left-first',
    title: 'Two ventricles, left first by 40 ms',
    teachingPoint:
      'The left spike comes 40 ms before the right: V1 is clearly positive, and the axis swings to the right, because the left wall has a start.',
    tags: ['biventricular', 'DDDOV', 'interventricular delay'],
    group,
    parameters: {
      patient: completeBlock,
      pacing: { source: 'implanted', mode: 'DDDOV', interventricularDelayMs: -40 },
    },
    criteria: [
      exactly('ms.interventricular', -40, sources.practice),
      atLeast('net.V1', 0.2, sources.biventricular),
      atMost('net.I', -0.1, sources.biventricular),
    ],
  },
  {
    id: 'left-ventricle-alone',
    title: 'Left ventricle alone',
    teachingPoint:
      'Positive in V1, negative in I and aVL: activation starts on the lateral wall of the left ventricle and runs to the right.',
    tags: ['left ventricle', 'DDD', 'axis'],
    group,
    parameters: {
      patient: completeBlock,
      pacing: { source: 'implanted', mode: 'DDD', ventricularChambers: 'left' },
    },
    criteria: [
      exactly('captured.leftVentricle', 1, sources.nbg),
      exactly('stimuli.rightVentricle', 0, sources.nbg),
      atLeast('net.V1', 0.4, sources.leftVentricle),
      atMost('net.I', -0.25, sources.leftVentricle),
      atMost('net.aVL', 0, sources.leftVentricle),
    ],
  },
  {
    id: 'left-capture-lost',
    title: 'Two spikes, left capture lost',
    teachingPoint:
      'Both ventricular stimuli are given, but the QRS is the one of the right ventricle alone: wide, negative in V1, leftward. The left output lies below its threshold.',
    tags: ['biventricular', 'DDDOV', 'no capture', 'threshold'],
    group,
    parameters: {
      patient: completeBlock,
      pacing: {
        source: 'implanted',
        mode: 'DDDOV',
        interventricularDelayMs: 40,
        leftVentricularLead: { amplitudeV: 2, captureThresholdV: 3 },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.nbg),
      atMost('net.V1', -0.5, sources.biventricular),
      within('deg.axis', -90, -60, sources.apexPattern),
      atLeast('ms.qrs', 145, sources.apexWidth),
    ],
  },
  {
    id: 'right-capture-lost',
    title: 'Two spikes, right capture lost',
    teachingPoint:
      'Both stimuli are given, yet V1 is tall and lead I deeply negative: only the left ventricle answers.',
    tags: ['biventricular', 'DDDOV', 'no capture', 'threshold'],
    group,
    parameters: {
      patient: completeBlock,
      pacing: {
        source: 'implanted',
        mode: 'DDDOV',
        rightVentricularLead: { amplitudeV: 1, captureThresholdV: 2 },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 0, sources.strength),
      exactly('captured.leftVentricle', 1, sources.nbg),
      atLeast('net.V1', 0.4, sources.leftVentricle),
      atMost('net.I', -0.25, sources.leftVentricle),
    ],
  },
  {
    id: 'left-lead-anterolateral',
    title: 'Left lead in an anterolateral vein',
    teachingPoint:
      'Same device, another vein: the shape of the QRS follows the place of the left lead, here higher and further forward.',
    tags: ['biventricular', 'DDDOV', 'lead position'],
    group,
    parameters: {
      patient: completeBlock,
      pacing: { source: 'implanted', mode: 'DDDOV', leftVentricularLead: { site: 'anterolateral' } },
    },
    criteria: [
      exactly('captured.leftVentricle', 1, sources.nbg),
      atMost('ms.qrs', 150, sources.biventricular),
      atLeast('net.V1', 0, sources.biventricular),
      atMost('net.I', 0, sources.biventricular),
    ],
  },
  {
    id: 'two-ventricles-in-fibrillation',
    title: 'Two ventricles in atrial fibrillation',
    teachingPoint:
      'No P waves, an irregular baseline, and paired ventricular stimuli whenever the ventricles would wait too long: VVI with two sites.',
    tags: ['biventricular', 'VVIOV', 'atrial fibrillation'],
    group,
    parameters: {
      patient: { atrialRhythm: 'fibrillation', avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'VVIOV', lowerRateBpm: 75, interventricularDelayMs: 20 },
    },
    criteria: [
      exactly('ms.interventricular', 20, sources.practice),
      within('rate.ventricular', 74.9, 75.1, sources.timing),
      exactly('stimuli.atrium', 0, sources.nbg),
    ],
  },
];
