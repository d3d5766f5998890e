import { atLeast, atMost, exactly, within } from '../criterion';
import type { GalleryPreset } from '../gallery-preset';
import { sources } from '../sources';
import { completeBlock } from './patients';

const group = 'upper-rate';

export const upperRate: readonly GalleryPreset[] = [
  {
    id: 'upper-rate-wenckebach',
    title: 'Upper rate, grouped beats',
    teachingPoint:
      'The sinus node runs above the upper tracking rate: the AV delay stretches beat by beat until a P wave falls into PVARP and is dropped. The pacemaker makes its own Wenckebach.',
    tags: ['DDD', 'upper rate', 'Wenckebach'],
    group,
    parameters: {
      patient: { atrialRateBpm: 132, rateVariabilityPercent: 0, avConduction: 'complete' },
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        upperTrackingRateBpm: 115,
        pvarpMs: 250,
        sensedAvDelayMs: 130,
      },
    },
    criteria: [
      within('ms.rrShortest', 521, 523, sources.upperRate),
      atLeast('pWaves.perQrs', 1.05, sources.upperRate),
      atLeast('ms.rrSpread', 100, sources.upperRate),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'upper-rate-two-to-one',
    title: 'Upper rate, every second P wave',
    teachingPoint:
      'The sinus cycle is shorter than AV delay and PVARP together, so every second P wave falls on deaf ears: the paced rate halves all at once.',
    tags: ['DDD', 'upper rate', '2:1'],
    group,
    parameters: {
      patient: { atrialRateBpm: 150, rateVariabilityPercent: 0, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD', modeSwitching: false },
    },
    criteria: [
      within('pWaves.perQrs', 1.9, 2.1, sources.upperRate),
      within('rate.ventricular', 74, 76, sources.upperRate),
      atMost('ms.rrSpread', 2, sources.upperRate),
    ],
  },
  {
    id: 'tracking-at-the-upper-rate',
    title: 'Fast, and rightly so',
    teachingPoint:
      'Sinus tachycardia at 110 with a spike after every P wave: the device does what it should. Fast paced rhythm is not yet a fault of the pacemaker.',
    tags: ['DDD', 'tracking', 'sinus tachycardia'],
    group,
    parameters: {
      patient: { atrialRateBpm: 110, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD', pvarpMs: 250 },
    },
    criteria: [
      within('pWaves.perQrs', 0.9, 1.1, sources.practice),
      within('rate.ventricular', 105, 115, sources.practice),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'endless-loop',
    title: 'Pacemaker-mediated tachycardia',
    teachingPoint:
      'A lost atrial stimulus opens the way back: the paced beat climbs to the atria, the device tracks the retrograde P wave and paces again. The loop runs at the upper rate.',
    tags: ['DDD', 'endless loop', 'retrograde conduction'],
    group,
    parameters: {
      patient: { atrialRhythm: 'arrest', avConduction: 'complete', retrogradeConductionMs: 280 },
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        pvarpMs: 250,
        faults: [{ kind: 'failureToCapture', chamber: 'atrium', fromS: 2, toS: 3.2 }],
      },
    },
    criteria: [
      atLeast('pWaves.retrograde', 8, sources.loop),
      within('ms.rrShortest', 499.9, 500.1, sources.loop),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
  {
    id: 'loop-prevented',
    title: 'The loop prevented',
    teachingPoint:
      'The same patient and the same lost stimulus, but PVARP outlasts the way back: the retrograde P wave is not tracked, and nothing starts.',
    tags: ['DDD', 'PVARP', 'retrograde conduction'],
    group,
    parameters: {
      patient: { atrialRhythm: 'arrest', avConduction: 'complete', retrogradeConductionMs: 280 },
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        pvarpMs: 330,
        faults: [{ kind: 'failureToCapture', chamber: 'atrium', fromS: 2, toS: 3.2 }],
      },
    },
    criteria: [
      atLeast('pWaves.retrograde', 1, sources.loop),
      atLeast('ms.rrShortest', 990, sources.timing),
      within('rate.ventricular', 59, 61, sources.timing),
    ],
  },
  {
    id: 'mode-switch',
    title: 'Mode switch',
    teachingPoint:
      'The atria race, and the ventricles do not follow for long: the device leaves tracking and paces at its lower rate until the atria calm down.',
    tags: ['DDD', 'mode switch', 'atrial tachycardia'],
    group,
    parameters: {
      patient: {
        atrialRhythm: 'tachycardia',
        atrialRateBpm: 200,
        rateVariabilityPercent: 1,
        avConduction: 'complete',
      },
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        faults: [{ kind: 'undersensing', chamber: 'atrium', fromS: 0, toS: 2.5 }],
      },
    },
    criteria: [
      exactly('markers.modeSwitchOn', 1, sources.practice),
      within('ms.rrLongest', 990, 1010, sources.timing),
      atMost('ms.rrShortest', 800, sources.practice),
    ],
  },
  {
    id: 'no-mode-switch',
    title: 'Tachycardia tracked',
    teachingPoint:
      'Atrial tachycardia without mode switch: the ventricles are driven at half the atrial rate, as fast as AV delay and PVARP let them.',
    tags: ['DDD', 'atrial tachycardia', 'tracking'],
    group,
    parameters: {
      patient: {
        atrialRhythm: 'tachycardia',
        atrialRateBpm: 190,
        rateVariabilityPercent: 1,
        avConduction: 'complete',
      },
      pacing: { source: 'implanted', mode: 'DDD', modeSwitching: false },
    },
    criteria: [
      exactly('markers.modeSwitchOn', 0, sources.practice),
      within('pWaves.perQrs', 1.8, 2.2, sources.upperRate),
      atLeast('rate.ventricular', 85, sources.upperRate),
    ],
  },
  {
    id: 'sensor-rate',
    title: 'The sensor asks for more',
    teachingPoint:
      'No activity of the atria, and yet the paced rate is 100: the fourth letter R lets the sensor raise it. Rate alone does not tell a fault.',
    tags: ['DDDR', 'rate response', 'sensor'],
    group,
    parameters: {
      patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDDR', sensorRateBpm: 100 },
    },
    criteria: [
      within('rate.ventricular', 99.9, 100.1, sources.nbg),
      exactly('captured.atrium', 1, sources.nbg),
    ],
  },
  {
    id: 'flutter-with-pacemaker',
    title: 'Flutter under a dual-chamber device',
    teachingPoint:
      'Sawtooth waves at 300 and paced beats at the lower rate: the device has switched its mode and lets the flutter run without following it.',
    tags: ['DDD', 'flutter', 'mode switch'],
    group,
    parameters: {
      patient: { ...completeBlock, atrialRhythm: 'flutter', atrialRateBpm: 300 },
      pacing: { source: 'implanted', mode: 'DDD' },
    },
    criteria: [
      atLeast('rate.atrial', 290, sources.practice),
      within('rate.ventricular', 59, 61, sources.timing),
      exactly('captured.rightVentricle', 1, sources.nbg),
    ],
  },
];
