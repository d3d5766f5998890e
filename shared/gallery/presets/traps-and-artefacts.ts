import { atLeast, atMost, exactly, within } from '../criterion';
import type { GalleryPreset } from '../gallery-preset';
import { sources } from '../sources';
import { completeBlock, silentHeart } from './patients';

const group = 'traps-and-artefacts';
const apex = { source: 'implanted', mode: 'VVI', lowerRateBpm: 70 } as const;

export const trapsAndArtefacts: readonly GalleryPreset[] = [
  {
    id: 'apex-in-monitor-bandwidth',
    title: 'The apical strip on a monitor',
    teachingPoint:
      'The same heart and the same spike as in diagnostic bandwidth, seen from 0.5 to 40 Hz: the spike all but vanishes, the wide QRS and its discordant T remain.',
    tags: ['bandwidth', 'monitor', 'apex', 'VVI'],
    group,
    parameters: { patient: silentHeart, pacing: apex, recorder: { bandwidth: 'monitor' } },
    criteria: [
      atMost('spike.II', 0.15, sources.bandwidth),
      exactly('captured.rightVentricle', 1, sources.nbg),
      atLeast('ms.qrs', 145, sources.apexWidth),
    ],
  },
  {
    id: 'apex-at-the-electrodes',
    title: 'The apical strip, unfiltered',
    teachingPoint:
      'What the electrodes carry before any recorder touches it: the spike at its full height. Every other strip shows what a band-limit left of it.',
    tags: ['bandwidth', 'unfiltered', 'apex', 'VVI'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: apex,
      recorder: { bandwidth: 'unfiltered', sampleRateHz: 2000 },
    },
    criteria: [
      atLeast('spike.II', 0.5, sources.bandwidth),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'unipolar-spike',
    title: 'Unipolar against bipolar',
    teachingPoint:
      'The same apical pacing with a unipolar lead: the current returns through the body, and the spike towers over the QRS that it starts.',
    tags: ['unipolar', 'spike', 'apex', 'VVI'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: { ...apex, rightVentricularLead: { polarity: 'unipolar' } },
    },
    criteria: [
      atLeast('spike.II', 0.8, sources.practice),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'magnet',
    title: 'A magnet on the device',
    teachingPoint:
      'The patient’s own rhythm would do, and yet spikes march through it at 90: under a magnet the device paces without listening. What a magnet does differs by maker.',
    tags: ['magnet', 'asynchronous', 'DDD'],
    group,
    parameters: {
      patient: { atrialRateBpm: 76 },
      pacing: { source: 'implanted', mode: 'DDD', magnetApplied: true },
    },
    criteria: [
      within('stimuli.atrium', 14, 16, sources.magnet),
      within('stimuli.rightVentricle', 14, 16, sources.magnet),
    ],
  },
  {
    id: 'arm-electrodes-exchanged',
    title: 'Arm electrodes exchanged',
    teachingPoint:
      'Lead I is upside down and aVR looks like a normal lead, while the chest leads are as they were: not the axis, the wires.',
    tags: ['electrode reversal', 'native', 'lead I'],
    group,
    parameters: {
      patient: { atrialRateBpm: 70 },
      disturbance: { electrodeReversal: 'RA-LA' },
      sheet: { layout: '3x4+1' },
    },
    criteria: [
      atMost('net.I', -0.1, sources.electrodes),
      atMost('t.I', -0.05, sources.electrodes),
      atLeast('net.V6', 0.5, sources.electrodes),
    ],
  },
  {
    id: 'chest-electrodes-exchanged',
    title: 'V1 and V2 exchanged under pacing',
    teachingPoint:
      'The depth of the S wave does not grow from V1 to V2 as it should, it shrinks: two chest electrodes have changed places.',
    tags: ['electrode reversal', 'VVI', 'chest leads'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: apex,
      disturbance: { electrodeReversal: 'V1-V2' },
      sheet: { layout: '3x4+1' },
    },
    criteria: [atMost('s.V1', -1.6, sources.electrodes), atLeast('s.V2', -1.6, sources.electrodes)],
  },
  {
    id: 'mains-hum-hides-spikes',
    title: 'Mains hum over the spikes',
    teachingPoint:
      'A fine comb lies over everything, and the spikes drown in it. The wide, discordant QRS still says that the ventricle is paced.',
    tags: ['mains', 'artefact', 'VVI'],
    group,
    parameters: { patient: silentHeart, pacing: apex, disturbance: { mainsMv: 0.15 } },
    criteria: [
      atLeast('mv.mains', 0.03, sources.practice),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'muscle-noise',
    title: 'A shivering patient',
    teachingPoint:
      'Muscle activity draws dozens of little spikes that are none. Real stimuli keep their distance from each other; noise keeps none.',
    tags: ['muscle', 'artefact', 'VVI', 'look-alike'],
    group,
    parameters: { patient: silentHeart, pacing: apex, disturbance: { muscleMv: 0.08 } },
    criteria: [
      within('stimuli.rightVentricle', 11, 12, sources.practice),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'wandering-baseline',
    title: 'A wandering baseline',
    teachingPoint:
      'The line swings with the breath and carries ST up and down with it: measure against the line just before each QRS, or not at all.',
    tags: ['baseline wander', 'artefact', 'DDD'],
    group,
    parameters: {
      patient: completeBlock,
      pacing: { source: 'implanted', mode: 'DDD' },
      disturbance: { baselineWanderMv: 0.8 },
    },
    criteria: [
      atLeast('mv.wander', 0.3, sources.practice),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'electrode-movement',
    title: 'Electrodes that move',
    teachingPoint:
      'Sudden swings of the line at odd moments, unlike any beat and tied to none: somebody moved. The rhythm beneath goes on as before.',
    tags: ['motion', 'artefact', 'DDD'],
    group,
    parameters: {
      seed: 13,
      patient: completeBlock,
      pacing: { source: 'implanted', mode: 'DDD' },
      disturbance: { motionPerMinute: 20 },
    },
    criteria: [
      atLeast('mv.wander', 0.1, sources.practice),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
];
