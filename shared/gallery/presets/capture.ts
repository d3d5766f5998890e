import { atLeast, atMost, exactly, within } from '../criterion';
import type { GalleryPreset } from '../gallery-preset';
import { sources } from '../sources';
import { completeBlock, silentHeart } from './patients';

const group = 'capture';

export const capture: readonly GalleryPreset[] = [
  {
    id: 'spikes-over-asystole',
    title: 'Spikes over asystole',
    teachingPoint:
      'Spikes march in both chambers and both ventricles, and nothing follows any of them: a working generator is not a beating heart.',
    tags: ['no capture', 'asystole', 'DOOOV'],
    group,
    parameters: {
      patient: { atrialRhythm: 'arrest', avConduction: 'complete', escapeSite: 'none' },
      pacing: {
        source: 'implanted',
        mode: 'DOOOV',
        lowerRateBpm: 70,
        interventricularDelayMs: 40,
        atrialLead: { captureThresholdV: 6 },
        rightVentricularLead: { captureThresholdV: 6 },
        leftVentricularLead: { captureThresholdV: 7 },
      },
    },
    criteria: [
      exactly('captured.atrium', 0, sources.strength),
      exactly('captured.rightVentricle', 0, sources.strength),
      exactly('captured.leftVentricle', 0, sources.strength),
      exactly('beats.paced', 0, sources.practice),
      exactly('pWaves', 0, sources.practice),
    ],
  },
  {
    id: 'capture-lost-junctional-escape',
    title: 'Capture lost, junctional escape',
    teachingPoint:
      'The output has fallen below the threshold: spikes stand alone, and a slow, narrow junctional escape keeps the patient alive and resets the pacemaker.',
    tags: ['no capture', 'threshold', 'junctional escape', 'VVI'],
    group,
    parameters: {
      patient: {
        atrialRhythm: 'arrest',
        avConduction: 'complete',
        escapeSite: 'junctional',
        escapeRateBpm: 38,
      },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        rightVentricularLead: { amplitudeV: 1, captureThresholdV: 1.6 },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 0, sources.strength),
      atLeast('lost.belowThreshold', 4, sources.strength),
      atLeast('beats.junctionalEscape', 4, sources.practice),
      within('ms.qrs', 70, 110, sources.normal),
    ],
  },
  {
    id: 'capture-lost-and-regained',
    title: 'Capture lost and regained',
    teachingPoint:
      'From second 4 to second 7 no ventricular spike is answered, although the output would do; a junctional escape ends each pause. Name the beats that fail.',
    tags: ['no capture', 'intermittent', 'DDD', 'fault'],
    group,
    parameters: {
      patient: { ...completeBlock, escapeSite: 'junctional', escapeRateBpm: 42 },
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        faults: [{ kind: 'failureToCapture', chamber: 'rightVentricle', fromS: 4, toS: 7 }],
      },
    },
    criteria: [
      atLeast('lost.fault', 2, sources.practice),
      atLeast('beats.paced', 4, sources.practice),
      within('captured.rightVentricle', 0.4, 0.9, sources.practice),
      atLeast('beats.junctionalEscape', 1, sources.practice),
    ],
  },
  {
    id: 'capture-now-and-then',
    title: 'Capture now and then',
    teachingPoint:
      'About every second spike captures, without a pattern: a lead that has moved, or a threshold near the output. Each spike must be judged by what follows it.',
    tags: ['no capture', 'intermittent', 'VVI', 'fault'],
    group,
    parameters: {
      seed: 11,
      patient: { ...silentHeart, escapeSite: 'ventricular', escapeRateBpm: 32 },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 75,
        faults: [{ kind: 'failureToCapture', proportion: 0.5 }],
      },
    },
    criteria: [
      within('captured.rightVentricle', 0.2, 0.8, sources.practice),
      atLeast('lost.fault', 2, sources.practice),
      atLeast('beats.paced', 2, sources.practice),
    ],
  },
  {
    id: 'output-at-the-threshold',
    title: 'Output at the threshold',
    teachingPoint:
      'Every spike captures, and the strip looks safe. The output equals the threshold: there is no margin, and the next rise of the threshold will end it.',
    tags: ['capture', 'threshold', 'margin', 'VVI'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        rightVentricularLead: { amplitudeV: 1.5, captureThresholdV: 1.5 },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.strength),
      exactly('lost.belowThreshold', 0, sources.strength),
    ],
  },
  {
    id: 'pulse-too-narrow',
    title: 'The pulse too narrow',
    teachingPoint:
      'The volts would do at 0.4 ms; at 0.1 ms they do not. A stimulus has two measures, and the strength–duration curve ties them.',
    tags: ['no capture', 'pulse width', 'threshold', 'VVI'],
    group,
    parameters: {
      patient: { ...silentHeart, escapeSite: 'junctional', escapeRateBpm: 40 },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 65,
        rightVentricularLead: { amplitudeV: 2, pulseWidthMs: 0.1, captureThresholdV: 1 },
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 0, sources.strength),
      atLeast('lost.belowThreshold', 4, sources.strength),
    ],
  },
  {
    id: 'atrial-capture-lost',
    title: 'Atrial capture lost',
    teachingPoint:
      'The atrial spike stands before nothing, the ventricular one before its QRS: the sequence of spikes is perfect, the sequence of chambers is not. Look for the P wave.',
    tags: ['no capture', 'atrial', 'DDD', 'threshold'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        lowerRateBpm: 65,
        atrialLead: { amplitudeV: 1, captureThresholdV: 2 },
      },
    },
    criteria: [
      exactly('captured.atrium', 0, sources.strength),
      exactly('captured.rightVentricle', 1, sources.nbg),
      exactly('pWaves', 0, sources.practice),
    ],
  },
  {
    id: 'failure-to-pace',
    title: 'Failure to pace',
    teachingPoint:
      'Pauses without a spike where one is due: nothing left the device, or nothing arrived. This is not lost capture, for there is no stimulus to judge.',
    tags: ['failure to pace', 'pause', 'VVI', 'fault'],
    group,
    parameters: {
      patient: { ...silentHeart, escapeSite: 'ventricular', escapeRateBpm: 30 },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        faults: [{ kind: 'failureToPace', chamber: 'rightVentricle', fromS: 3, toS: 7 }],
      },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.practice),
      atLeast('ms.rrLongest', 1900, sources.practice),
      atMost('stimuli.rightVentricle', 9, sources.practice),
      atLeast('beats.ventricularEscape', 1, sources.practice),
    ],
  },
  {
    id: 'fusion',
    title: 'Fusion',
    teachingPoint:
      'The stimulus and the conducted beat meet in the ventricles: the QRS is neither the paced one nor the patient’s own, but something between.',
    tags: ['fusion', 'DDD', 'AV delay'],
    group,
    parameters: {
      patient: { atrialRateBpm: 80, prIntervalMs: 160 },
      pacing: { source: 'implanted', mode: 'DDD', sensedAvDelayMs: 90 },
    },
    criteria: [
      atLeast('beats.fusion', 8, sources.practice),
      exactly('captured.rightVentricle', 1, sources.practice),
    ],
  },
  {
    id: 'pseudofusion',
    title: 'Pseudofusion',
    teachingPoint:
      'A spike stands in a QRS that it does not change: the muscle was already taken. It says nothing about capture, neither for nor against.',
    tags: ['pseudofusion', 'DDD', 'refractory'],
    group,
    parameters: {
      patient: { atrialRateBpm: 74, prIntervalMs: 160 },
      pacing: { source: 'implanted', mode: 'DDD', sensedAvDelayMs: 135 },
    },
    criteria: [
      atLeast('beats.pseudofusion', 8, sources.practice),
      exactly('lost.belowThreshold', 0, sources.practice),
    ],
  },
];
