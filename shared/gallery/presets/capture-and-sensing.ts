import type { GalleryPreset } from '../gallery-preset';

export const captureAndSensing: readonly GalleryPreset[] = [
  {
    id: 'spikes-over-asystole',
    title: 'Spikes over asystole',
    teachingPoint:
      'Spikes march in both chambers and both ventricles, and nothing follows any of them: a working generator is not a beating heart.',
    tags: ['no capture', 'asystole', 'DOOOV'],
    group: 'capture',
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
  },
  {
    id: 'capture-lost-junctional-escape',
    title: 'Capture lost, junctional escape',
    teachingPoint:
      'The output has fallen below the threshold: spikes stand alone, and a slow, narrow junctional escape keeps the patient alive and resets the pacemaker.',
    tags: ['no capture', 'threshold', 'junctional escape', 'VVI'],
    group: 'capture',
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
  },
  {
    id: 'demand-pacing-inhibited',
    title: 'Demand pacing inhibited',
    teachingPoint:
      'No spike at all, and nothing is wrong: sinus rhythm is faster than the lower rate, so the pacemaker senses every beat and waits.',
    tags: ['inhibition', 'VVI', 'sinus rhythm'],
    group: 'sensing',
    parameters: {
      patient: { atrialRateBpm: 76 },
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 60 },
    },
  },
  {
    id: 'apex-in-monitor-bandwidth',
    title: 'The apical strip on a monitor',
    teachingPoint:
      'The same heart and the same spike as in diagnostic bandwidth, seen from 0.5 to 40 Hz: the spike all but vanishes, the wide QRS and its discordant T remain.',
    tags: ['bandwidth', 'monitor', 'apex', 'VVI'],
    group: 'traps-and-artefacts',
    parameters: {
      patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 70 },
      recorder: { bandwidth: 'monitor' },
    },
  },
  {
    id: 'unipolar-spike',
    title: 'Unipolar against bipolar',
    teachingPoint:
      'The same apical pacing with a unipolar lead: the current returns through the body, and the spike towers over the QRS that it starts.',
    tags: ['unipolar', 'spike', 'apex', 'VVI'],
    group: 'traps-and-artefacts',
    parameters: {
      patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        rightVentricularLead: { polarity: 'unipolar' },
      },
    },
  },
];
