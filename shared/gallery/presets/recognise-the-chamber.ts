import type { GalleryPreset } from '../gallery-preset';

/** A silent heart without escape, so that nothing but the paced ventricle is on the strip. */
const silentHeart = { atrialRhythm: 'arrest', avConduction: 'complete' } as const;

export const recogniseTheChamber: readonly GalleryPreset[] = [
  {
    id: 'atrial-pacing',
    title: 'Atrial pacing',
    teachingPoint:
      'A small spike before every P wave, then a PR interval and the patient’s own narrow QRS: the atrium is paced, the ventricles are conducted.',
    tags: ['atrial', 'AAI', 'narrow QRS'],
    group: 'recognise-the-chamber',
    parameters: {
      patient: { atrialRateBpm: 48 },
      pacing: { source: 'implanted', mode: 'AAI', lowerRateBpm: 70 },
    },
  },
  {
    id: 'ventricular-pacing-apex',
    title: 'Ventricular pacing, apex',
    teachingPoint:
      'A spike, then a wide QRS, negative in V1 and in II, III and aVF, with every T wave pointing the other way: the right ventricular apex is paced.',
    tags: ['ventricular', 'VVI', 'apex', 'discordance'],
    group: 'recognise-the-chamber',
    parameters: {
      patient: silentHeart,
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 70 },
    },
  },
  {
    id: 'ventricular-pacing-outflow-tract',
    title: 'Ventricular pacing, outflow tract',
    teachingPoint:
      'Still wide and negative in V1, but upright in II, III and aVF: activation runs downwards from the right ventricular outflow tract.',
    tags: ['ventricular', 'VVI', 'outflow tract', 'axis'],
    group: 'recognise-the-chamber',
    parameters: {
      patient: silentHeart,
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        rightVentricularLead: { site: 'outflow' },
      },
    },
  },
  {
    id: 'ventricular-pacing-septum',
    title: 'Ventricular pacing, septum',
    teachingPoint:
      'From the septum the QRS is narrower than from the apex and turns upright by V4: both ventricles are reached sooner.',
    tags: ['ventricular', 'VVI', 'septum'],
    group: 'recognise-the-chamber',
    parameters: {
      patient: silentHeart,
      pacing: {
        source: 'implanted',
        mode: 'VVI',
        lowerRateBpm: 70,
        rightVentricularLead: { site: 'septum' },
      },
    },
  },
  {
    id: 'his-bundle-pacing',
    title: 'His bundle pacing',
    teachingPoint:
      'The spike stands an isoelectric moment before a QRS that looks like the patient’s own: the His bundle is captured alone.',
    tags: ['ventricular', 'conduction system', 'His', 'narrow QRS'],
    group: 'recognise-the-chamber',
    parameters: {
      patient: { atrialRateBpm: 75, avConduction: 'complete' },
      pacing: {
        source: 'implanted',
        mode: 'DDD',
        sensedAvDelayMs: 110,
        hisCapture: 'selective',
        rightVentricularLead: { site: 'his', captureThresholdV: 1.2 },
      },
    },
  },
  {
    id: 'left-bundle-area-pacing',
    title: 'Left bundle area pacing',
    teachingPoint:
      'A spike, a fairly narrow QRS and a late r in V1: the left ventricle goes first through its own bundle, the right follows.',
    tags: ['ventricular', 'conduction system', 'left bundle area'],
    group: 'recognise-the-chamber',
    parameters: {
      patient: { atrialRateBpm: 75, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD', rightVentricularLead: { site: 'leftBundle' } },
    },
  },
];
