import { atLeast, atMost, exactly, within } from '../criterion';
import type { GalleryPreset } from '../gallery-preset';
import { sources } from '../sources';
import { completeBlock } from './patients';

const group = 'two-chambers';

export const twoChambers: readonly GalleryPreset[] = [
  {
    id: 'av-sequential-pacing',
    title: 'AV sequential pacing',
    teachingPoint:
      'Two spikes to a beat: a small one before the P wave, a larger one before a wide QRS 180 ms later. Atrium and ventricle are paced in sequence.',
    tags: ['atrial', 'ventricular', 'DDD', 'AV delay'],
    group,
    parameters: {
      patient: { atrialRateBpm: 42, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD', lowerRateBpm: 66 },
    },
    criteria: [
      exactly('captured.atrium', 1, sources.nbg),
      exactly('captured.rightVentricle', 1, sources.nbg),
      within('ms.av', 179.9, 180.1, sources.timing),
      within('rate.ventricular', 65.9, 66.1, sources.timing),
    ],
  },
  {
    id: 'atrial-tracking',
    title: 'P waves tracked',
    teachingPoint:
      'One spike to a beat, always the same time after the patient’s own P wave: the pacemaker hears the atrium and follows it with the ventricle.',
    tags: ['ventricular', 'DDD', 'tracking'],
    group,
    parameters: {
      patient: { atrialRateBpm: 78, rateVariabilityPercent: 5, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD' },
    },
    criteria: [
      exactly('stimuli.atrium', 0, sources.nbg),
      exactly('captured.rightVentricle', 1, sources.nbg),
      within('ms.pToStimulus', 175, 185, sources.timing),
      atLeast('ms.rrSpread', 30, sources.practice),
    ],
  },
  {
    id: 'atrium-paced-ventricle-conducted',
    title: 'Atrium paced, ventricle its own',
    teachingPoint:
      'The device is set to both chambers, but only atrial spikes show: the AV node conducts before the AV delay is over, and the ventricular stimulus is not needed.',
    tags: ['atrial', 'DDD', 'inhibition'],
    group,
    parameters: {
      patient: { atrialRateBpm: 45, prIntervalMs: 150 },
      pacing: { source: 'implanted', mode: 'DDD', lowerRateBpm: 65, pacedAvDelayMs: 220 },
    },
    criteria: [
      exactly('captured.atrium', 1, sources.nbg),
      exactly('stimuli.rightVentricle', 0, sources.nbg),
      within('ms.qrs', 70, 110, sources.normal),
    ],
  },
  {
    id: 'dual-chamber-inhibited',
    title: 'Both chambers inhibited',
    teachingPoint:
      'A dual-chamber device, and not one spike: the sinus node is fast enough and the AV node quick enough. It listens, and that is its work.',
    tags: ['DDD', 'inhibition', 'sinus rhythm'],
    group,
    parameters: {
      patient: { atrialRateBpm: 80, prIntervalMs: 140 },
      pacing: { source: 'implanted', mode: 'DDD', sensedAvDelayMs: 180 },
    },
    criteria: [
      exactly('stimuli.atrium', 0, sources.nbg),
      exactly('stimuli.rightVentricle', 0, sources.nbg),
      exactly('beats.unsensed', 0, sources.practice),
    ],
  },
  {
    id: 'long-av-delay',
    title: 'A long AV delay',
    teachingPoint:
      'The same sequence with 300 ms between the two spikes: both chambers still beat in turn, but the atria have long emptied when the ventricles follow.',
    tags: ['atrial', 'ventricular', 'DDD', 'AV delay'],
    group,
    parameters: {
      patient: { atrialRateBpm: 42, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD', lowerRateBpm: 60, pacedAvDelayMs: 300 },
    },
    criteria: [
      within('ms.av', 299.9, 300.1, sources.timing),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'short-av-delay',
    title: 'A short AV delay',
    teachingPoint:
      'Only 80 ms from spike to spike: the QRS begins while the P wave still runs, and the paced ventricle is never given to the AV node.',
    tags: ['atrial', 'ventricular', 'DDD', 'AV delay'],
    group,
    parameters: {
      patient: { atrialRateBpm: 42 },
      pacing: { source: 'implanted', mode: 'DDD', lowerRateBpm: 70, pacedAvDelayMs: 80 },
    },
    criteria: [
      within('ms.av', 79.9, 80.1, sources.timing),
      exactly('beats.conducted', 0, sources.practice),
      atLeast('ms.qrs', 140, sources.apexWidth),
    ],
  },
  {
    id: 'one-lead-tracks-the-atrium',
    title: 'VDD: atrium heard, never paced',
    teachingPoint:
      'The ventricle follows P waves as in DDD. When the sinus node falls below the lower rate, no atrial spike comes to help: the ventricle is paced alone.',
    tags: ['ventricular', 'VDD', 'tracking'],
    group,
    parameters: {
      patient: {
        atrialRateBpm: 62,
        rateVariabilityPercent: 14,
        respiratoryRateBpm: 10,
        avConduction: 'complete',
      },
      pacing: { source: 'implanted', mode: 'VDD', lowerRateBpm: 60 },
      durationS: 10,
      seed: 5,
    },
    criteria: [
      exactly('stimuli.atrium', 0, sources.nbg),
      exactly('captured.rightVentricle', 1, sources.nbg),
      // A P wave late in the cycle lets the ventricle come up to a sensed AV delay after the lower rate interval.
      atMost('ms.rrLongest', 1150.1, sources.timing),
      atLeast('ms.rrSpread', 60, sources.practice),
    ],
  },
  {
    id: 'ddi-does-not-track',
    title: 'DDI: P waves heard, not followed',
    teachingPoint:
      'The sinus node runs at 85 and the ventricular spikes keep to 60: this mode inhibits in the atrium, but it never tracks.',
    tags: ['ventricular', 'DDI', 'no tracking'],
    group,
    parameters: {
      patient: { atrialRateBpm: 85, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDI' },
    },
    criteria: [
      within('rate.ventricular', 59.9, 60.1, sources.timing),
      atLeast('rate.atrial', 80, sources.practice),
      atMost('ms.rrSpread', 1, sources.timing),
    ],
  },
  {
    id: 'asynchronous-both-chambers',
    title: 'DOO: both chambers, deaf',
    teachingPoint:
      'Spikes march through P waves and QRS complexes alike: an asynchronous device listens to nothing. Some stimuli capture, others fall into refractory muscle.',
    tags: ['DOO', 'asynchronous', 'competition'],
    group,
    parameters: {
      patient: { atrialRateBpm: 77 },
      pacing: { source: 'implanted', mode: 'DOO', lowerRateBpm: 70 },
    },
    criteria: [
      atLeast('stimuli.atrium', 10, sources.nbg),
      atLeast('stimuli.rightVentricle', 10, sources.nbg),
      atLeast('lost.refractoryTissue', 2, sources.practice),
    ],
  },
  {
    id: 'first-degree-block-helped',
    title: 'A long PR cut short',
    teachingPoint:
      'The patient’s own PR would be 320 ms. The ventricular spike comes 150 ms after the sensed P wave, so every QRS is paced although the node still conducts.',
    tags: ['ventricular', 'DDD', 'first degree block', 'tracking'],
    group,
    parameters: {
      patient: { ...completeBlock, avConduction: 'intact', prIntervalMs: 320 },
      pacing: { source: 'implanted', mode: 'DDD' },
    },
    criteria: [
      exactly('captured.rightVentricle', 1, sources.nbg),
      exactly('beats.conducted', 0, sources.practice),
      within('ms.pToStimulus', 175, 185, sources.timing),
    ],
  },
];
