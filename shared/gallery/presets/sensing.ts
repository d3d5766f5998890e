import { atLeast, atMost, exactly, within } from '../criterion';
import type { GalleryPreset } from '../gallery-preset';
import { sources } from '../sources';
import { completeBlock, silentHeart } from './patients';

const group = 'sensing';

export const sensing: readonly GalleryPreset[] = [
  {
    id: 'demand-pacing-inhibited',
    title: 'Demand pacing inhibited',
    teachingPoint:
      'No spike at all, and nothing is wrong: sinus rhythm is faster than the lower rate, so the pacemaker senses every beat and waits.',
    tags: ['inhibition', 'VVI', 'sinus rhythm'],
    group,
    parameters: {
      patient: { atrialRateBpm: 76 },
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 60 },
    },
    criteria: [
      exactly('stimuli.rightVentricle', 0, sources.nbg),
      exactly('beats.unsensed', 0, sources.practice),
      atLeast('rate.ventricular', 60, sources.timing),
    ],
  },
  {
    id: 'premature-beat-resets',
    title: 'A premature beat resets the pacemaker',
    teachingPoint:
      'After each premature beat the next spike waits one full interval: the device heard it and started counting anew.',
    tags: ['VVI', 'premature beat', 'escape interval'],
    group,
    parameters: {
      patient: { ...silentHeart, prematureVentricularPerMinute: 20 },
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 65 },
    },
    criteria: [
      atLeast('beats.premature', 2, sources.practice),
      exactly('beats.unsensed', 0, sources.practice),
      exactly('captured.rightVentricle', 1, sources.nbg),
      within('ms.rrLongest', 975, 990, sources.timing),
    ],
  },
  {
    id: 'hysteresis',
    title: 'Hysteresis',
    teachingPoint:
      'Paced beats come every 1000 ms, but after a beat of the patient’s own the device waits 1333 ms: room for a rhythm of its own. It is a setting, not a fault.',
    tags: ['VVI', 'hysteresis', 'escape interval'],
    group,
    parameters: {
      patient: { ...silentHeart, prematureVentricularPerMinute: 15 },
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 60, hysteresisRateBpm: 45 },
    },
    criteria: [
      atLeast('beats.premature', 1, sources.practice),
      within('ms.rrLongest', 1380, 1400, sources.timing),
      exactly('beats.unsensed', 0, sources.practice),
    ],
  },
  {
    id: 'ventricular-undersensing',
    title: 'Ventricular undersensing',
    teachingPoint:
      'Spikes march through the patient’s own beats as if they were not there. Where they fall on rested muscle they capture; elsewhere they cannot.',
    tags: ['undersensing', 'VVI', 'sensitivity'],
    group,
    parameters: {
      patient: { atrialRateBpm: 66 },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 60,
        rightVentricularLead: { sensitivityMv: 12 },
      },
    },
    criteria: [
      atLeast('beats.unsensed', 4, sources.practice),
      atLeast('stimuli.rightVentricle', 8, sources.practice),
      atMost('ms.rrShortest', 950, sources.practice),
    ],
  },
  {
    id: 'stimulus-on-the-t-wave',
    title: 'Stimulus on the T wave',
    teachingPoint:
      'An unheard beat, and a spike that captures on its T wave: the reason why undersensing is not harmless.',
    tags: ['undersensing', 'VVI', 'T wave'],
    group,
    parameters: {
      seed: 3,
      patient: { atrialRateBpm: 74 },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 68,
        rightVentricularLead: { signalMv: 1.5 },
      },
    },
    criteria: [atLeast('beats.onT', 1, sources.practice), atLeast('beats.unsensed', 3, sources.practice)],
  },
  {
    id: 'atrial-undersensing',
    title: 'Atrial undersensing',
    teachingPoint:
      'P waves are there, and the device paces the atrium as if they were not; the ventricle follows its own atrial spike instead of the patient’s P wave.',
    tags: ['undersensing', 'atrial', 'DDD'],
    group,
    parameters: {
      patient: { atrialRateBpm: 75, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD', atrialLead: { signalMv: 0.3 } },
    },
    criteria: [
      atLeast('stimuli.atrium', 6, sources.practice),
      atLeast('lost.refractoryTissue', 1, sources.practice),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'ventricular-oversensing',
    title: 'Ventricular oversensing',
    teachingPoint:
      'Pauses much longer than the lower rate allows, and no spike in them: the device hears something that is no heartbeat, and keeps waiting.',
    tags: ['oversensing', 'VVI', 'pause', 'fault'],
    group,
    parameters: {
      patient: { ...silentHeart, escapeSite: 'junctional', escapeRateBpm: 30 },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        faults: [{ kind: 'oversensing', chamber: 'rightVentricle', fromS: 3, toS: 7, intervalMs: 500 }],
      },
    },
    criteria: [
      atLeast('markers.oversensing', 4, sources.practice),
      atLeast('ms.rrLongest', 1500, sources.practice),
      exactly('captured.rightVentricle', 1, sources.practice),
    ],
  },
  {
    id: 'crosstalk-inhibition',
    title: 'Crosstalk inhibition',
    teachingPoint:
      'Only atrial spikes, and asystole below them: the ventricular channel takes the atrial stimulus for a QRS and keeps silent. High atrial output and short blanking make it.',
    tags: ['crosstalk', 'oversensing', 'DDD', 'asystole'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        lowerRateBpm: 65,
        safetyPacing: false,
        ventricularBlankingMs: 20,
        atrialLead: { amplitudeV: 7 },
        rightVentricularLead: { sensitivityMv: 1 },
      },
    },
    criteria: [
      atLeast('markers.crosstalk', 8, sources.practice),
      exactly('stimuli.rightVentricle', 0, sources.practice),
      exactly('beats.paced', 0, sources.practice),
    ],
  },
  {
    id: 'safety-pacing',
    title: 'Safety pacing',
    teachingPoint:
      'The same crosstalk with safety pacing on: the ventricular spike comes 110 ms after the atrial one instead of 180. A shortened AV delay is the sign.',
    tags: ['crosstalk', 'safety pacing', 'DDD', 'AV delay'],
    group,
    parameters: {
      patient: silentHeart,
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        lowerRateBpm: 65,
        ventricularBlankingMs: 20,
        atrialLead: { amplitudeV: 7 },
        rightVentricularLead: { sensitivityMv: 1 },
      },
    },
    criteria: [
      atLeast('markers.safetyPace', 8, sources.safetyPace),
      within('ms.av', 109.9, 110.1, sources.safetyPace),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'demand-pacing-in-fibrillation',
    title: 'Demand pacing in atrial fibrillation',
    teachingPoint:
      'Irregular narrow beats without P waves; whenever a pause lasts too long, one wide paced beat fills it. Paced and own rhythm share the strip.',
    tags: ['VVI', 'atrial fibrillation', 'inhibition'],
    group,
    parameters: {
      seed: 2,
      patient: { atrialRhythm: 'fibrillation', prIntervalMs: 200 },
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 70 },
    },
    criteria: [
      atLeast('beats.paced', 1, sources.practice),
      atLeast('beats.conducted', 5, sources.fibrillation),
      atLeast('ms.rrSpread', 200, sources.fibrillation),
      exactly('stimuli.atrium', 0, sources.nbg),
    ],
  },
  {
    id: 'sick-sinus-two-chambers',
    title: 'Pauses of the sinus node filled',
    teachingPoint:
      'A lazy sinus node with healthy AV conduction: atrial spikes come only when it is late, and the QRS stays the patient’s own.',
    tags: ['AAI', 'atrial', 'inhibition'],
    group,
    parameters: {
      seed: 6,
      patient: { atrialRateBpm: 62, rateVariabilityPercent: 18, respiratoryRateBpm: 9 },
      pacing: { source: 'implanted', mode: 'AAI', lowerRateBpm: 60 },
    },
    criteria: [
      atLeast('stimuli.atrium', 2, sources.practice),
      atMost('stimuli.atrium', 9, sources.practice),
      within('ms.qrs', 70, 110, sources.normal),
      exactly('captured.atrium', 1, sources.nbg),
    ],
  },
  {
    id: 'pacing-after-block',
    title: 'Block answered',
    teachingPoint:
      'Mobitz II in the node, and the ventricular spike fills exactly the beats that would have been dropped: demand pacing at its plainest.',
    tags: ['DDD', 'Mobitz II', 'inhibition'],
    group,
    parameters: {
      patient: { ...completeBlock, avConduction: 'mobitzTwo', conductedPerGroup: 3, prIntervalMs: 150 },
      pacing: { source: 'implanted', mode: 'DDD', sensedAvDelayMs: 200 },
    },
    criteria: [
      within('stimuli.rightVentricle', 2, 4, sources.block),
      atLeast('beats.conducted', 7, sources.block),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
];
