import type { GalleryPreset } from '../gallery-preset';

export const twoChambersAndVentricles: readonly GalleryPreset[] = [
  {
    id: 'av-sequential-pacing',
    title: 'AV sequential pacing',
    teachingPoint:
      'Two spikes to a beat: a small one before the P wave, a larger one before a wide QRS 180 ms later. Atrium and ventricle are paced in sequence.',
    tags: ['atrial', 'ventricular', 'DDD', 'AV delay'],
    group: 'two-chambers',
    parameters: {
      patient: { atrialRateBpm: 42, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD', lowerRateBpm: 66 },
    },
  },
  {
    id: 'two-ventricles-right-first',
    title: 'Two ventricles, right first by 40 ms',
    teachingPoint:
      'Two ventricular spikes 40 ms apart before one QRS: the right ventricle is stimulated first, and V1 is still negative.',
    tags: ['biventricular', 'DDDOV', 'interventricular delay'],
    group: 'two-ventricles',
    parameters: {
      patient: { atrialRateBpm: 72, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDDOV', interventricularDelayMs: 40 },
    },
  },
  {
    id: 'two-ventricles-together',
    title: 'Two ventricles together',
    teachingPoint:
      'One spike on the surface, two sites at work: the QRS is narrower than from either ventricle alone, V1 turns positive and lead I begins with a q.',
    tags: ['biventricular', 'DDDOV'],
    group: 'two-ventricles',
    parameters: {
      patient: { atrialRateBpm: 72, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDDOV' },
    },
  },
  {
    id: 'left-ventricle-alone',
    title: 'Left ventricle alone',
    teachingPoint:
      'Positive in V1, negative in I and aVL: activation starts on the lateral wall of the left ventricle and runs to the right.',
    tags: ['left ventricle', 'DDD', 'axis'],
    group: 'two-ventricles',
    parameters: {
      patient: { atrialRateBpm: 72, avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDD', ventricularChambers: 'left' },
    },
  },
];
