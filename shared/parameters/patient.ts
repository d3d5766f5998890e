import { choiceField, numberField, section } from './fields';

/** The patient: sinus node, AV node, escape foci, bundle branches. */
export const patientSchema = section({
  atrialRhythm: choiceField({ sinus: 'Sinus rhythm', arrest: 'Atrial arrest' }, 'sinus', {
    label: 'Atrial rhythm',
    help: 'What the atria do of their own accord.',
  }),
  atrialRateBpm: numberField(70, {
    label: 'Atrial rate',
    unit: '/min',
    min: 20,
    max: 400,
    usual: [50, 100],
    help: 'Discharges of the sinus node per minute.',
  }),
  rateVariabilityPercent: numberField(2, {
    label: 'Rate variability',
    unit: '%',
    min: 0,
    max: 30,
    usual: [1, 5],
    help: 'Beat-to-beat spread of the sinus interval, and the depth of respiratory arrhythmia.',
  }),
  respiratoryRateBpm: numberField(14, {
    label: 'Respiratory rate',
    unit: '/min',
    min: 0,
    max: 60,
    usual: [12, 20],
    help: 'Breaths per minute; sets the period of respiratory arrhythmia and of baseline wander.',
  }),
  avConduction: choiceField({ intact: 'Intact', complete: 'Complete block' }, 'intact', {
    label: 'AV conduction',
    help: 'How the AV node passes atrial impulses on.',
  }),
  prIntervalMs: numberField(160, {
    label: 'PR interval',
    unit: 'ms',
    min: 80,
    max: 500,
    usual: [120, 200],
    help: 'From P onset to the onset of a conducted QRS, at rest.',
  }),
  escapeSite: choiceField({ none: 'None', junctional: 'Junctional', ventricular: 'Ventricular' }, 'none', {
    label: 'Escape focus',
    help: 'Where a beat starts when nothing else does.',
  }),
  escapeRateBpm: numberField(40, {
    label: 'Escape rate',
    unit: '/min',
    min: 10,
    max: 80,
    usual: [25, 60],
    help: 'The focus fires one interval after the last ventricular beat.',
  }),
  bundleBranchBlock: choiceField({ none: 'None', left: 'Left', right: 'Right' }, 'none', {
    label: 'Bundle branch block',
    help: 'A blocked bundle branch changes every conducted beat.',
  }),
});
