import type { CreateStripInput } from '../../../shared/api/strips';
import type { DemoPerson } from './demo-people';

/** A strip of the invented college's own. */
export interface DemoStrip extends CreateStripInput {
  id: string;
  ownerId: DemoPerson['id'];
}

/** Made up, as are the lessons they were made for. */
export const demoStrips: readonly DemoStrip[] = [
  {
    id: 'tarn-valley-week-one-av-sequential',
    ownerId: 'demo-educator',
    title: 'Week 1 opener: two spikes a beat',
    teachingPoint:
      'Ask for the number of spikes before anyone names the rhythm: one before P, one before QRS.',
    tags: ['week 1', 'AV sequential', 'DDD'],
    group: 'two-chambers',
    visibility: 'department',
    parameters: {
      notes:
        'Show it unnamed for half a minute. Then the ladder. Most groups miss the atrial spike at first.',
      seed: 21,
      patient: { atrialRateBpm: 48, avConduction: 'complete', escapeSite: 'ventricular', escapeRateBpm: 32 },
      pacing: { source: 'implanted', mode: 'DDD', lowerRateBpm: 66, pacedAvDelayMs: 170 },
    },
  },
  {
    id: 'tarn-valley-unipolar-ward-story',
    ownerId: 'demo-educator',
    title: 'The old unipolar system',
    teachingPoint: 'The spike dwarfs the QRS. Measure the QRS anyway, and say why the spike is so tall.',
    tags: ['unipolar', 'spike size', 'VVI'],
    group: 'recognise-the-chamber',
    visibility: 'department',
    parameters: {
      notes: 'Pairs with the bipolar strip of the gallery. Print both on one sheet.',
      seed: 22,
      patient: { atrialRateBpm: 84, avConduction: 'complete', escapeSite: 'none' },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 72,
        rightVentricularLead: { polarity: 'unipolar', amplitudeV: 4 },
      },
    },
  },
  {
    id: 'tarn-valley-failing-output-draft',
    ownerId: 'demo-educator',
    title: 'Assessment draft: output just short',
    teachingPoint: 'Every spike is on time and none of them captures; the escape rhythm is what perfuses.',
    tags: ['assessment', 'no capture', 'threshold'],
    group: 'capture',
    visibility: 'private',
    parameters: {
      notes: 'Not for the department before the spring assessment.',
      seed: 23,
      patient: {
        atrialRateBpm: 90,
        avConduction: 'complete',
        escapeSite: 'ventricular',
        escapeRateBpm: 34,
      },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        rightVentricularLead: { amplitudeV: 1.2, captureThresholdV: 1.4 },
      },
    },
  },
  {
    id: 'tarn-valley-mannequin-monitor-lead',
    ownerId: 'demo-technician',
    title: 'Mannequin bay: the same strip on the monitor',
    teachingPoint:
      'At monitor bandwidth the spike all but disappears: the picture on the wall is not the whole story.',
    tags: ['monitor bandwidth', 'bay 2', 'VVI'],
    group: 'traps-and-artefacts',
    visibility: 'department',
    parameters: {
      notes: 'Bay 2, second screen. Switch the recorder to diagnostic halfway through.',
      seed: 24,
      durationS: 30,
      patient: { avConduction: 'complete', escapeSite: 'none' },
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 60 },
      disturbance: { baselineWanderMv: 0.1, muscleMv: 0.02 },
      recorder: { bandwidth: 'monitor', sampleRateHz: 250 },
    },
  },
  {
    id: 'tarn-valley-two-ventricles-trial',
    ownerId: 'demo-technician',
    title: 'Trial: right ventricle first by 60 ms',
    teachingPoint: 'Two ventricular spikes, far enough apart to be seen with the naked eye at 50 mm/s.',
    tags: ['two ventricles', 'DDDOV', '50 mm/s'],
    group: 'two-ventricles',
    visibility: 'private',
    parameters: {
      notes: 'Check whether the projector shows both spikes from the back row.',
      seed: 25,
      patient: { atrialRateBpm: 72, prIntervalMs: 220, bundleBranchBlock: 'left' },
      pacing: { source: 'implanted', mode: 'DDDOV', sensedAvDelayMs: 110, interventricularDelayMs: 60 },
      sheet: { leads: ['II', 'V1', 'V6'], speedMmPerS: 50 },
    },
  },
];
