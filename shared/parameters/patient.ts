import { z } from 'zod';
import { injurySchema } from './injury';
import { choiceField, dependentNumberField, nullableNumberField, numberField } from './fields';

const atrialRhythms = {
  sinus: 'Sinus rhythm',
  arrest: 'Atrial arrest',
  tachycardia: 'Atrial tachycardia',
  flutter: 'Atrial flutter',
  fibrillation: 'Atrial fibrillation',
} as const;
export type AtrialRhythm = keyof typeof atrialRhythms;

/** Atrial rate where none is given, /min (chosen within NR-20, NR-23, NR-35). */
export const usualAtrialRateBpm: Readonly<Record<AtrialRhythm, number>> = {
  sinus: 70,
  arrest: 70,
  tachycardia: 160,
  flutter: 300,
  fibrillation: 400,
};

/** The patient: sinus node, AV node, escape foci, bundle branches, ectopic foci. */
export const patientSchema = z
  .strictObject({
    atrialRhythm: choiceField(atrialRhythms, 'sinus', {
      label: 'Atrial rhythm',
      help: 'What the atria do of their own accord.',
    }),
    atrialRateBpm: dependentNumberField({
      label: 'Atrial rate',
      unit: '/min',
      min: 20,
      max: 400,
      usual: [50, 100],
      help: 'Discharges of the atria per minute.',
    }),
    rateVariabilityPercent: numberField(2, {
      label: 'Rate variability',
      unit: '%',
      min: 0,
      max: 30,
      usual: [1, 5],
      help: 'Beat-to-beat spread of the atrial interval, and the depth of respiratory arrhythmia.',
    }),
    respiratoryRateBpm: numberField(14, {
      label: 'Respiratory rate',
      unit: '/min',
      min: 0,
      max: 60,
      usual: [12, 20],
      help: 'Breaths per minute; sets the period of respiratory arrhythmia and of baseline wander.',
    }),
    avConduction: choiceField(
      {
        intact: 'Intact',
        wenckebach: 'Wenckebach',
        mobitzTwo: 'Mobitz II',
        twoToOne: '2:1',
        complete: 'Complete block',
      },
      'intact',
      { label: 'AV conduction', help: 'How the AV node passes atrial impulses on.' },
    ),
    conductedPerGroup: numberField(3, {
      label: 'Conducted per group',
      unit: '',
      min: 2,
      max: 8,
      integer: true,
      usual: [2, 5],
      help: 'Beats conducted before the dropped one, in Wenckebach and Mobitz II.',
    }),
    prIntervalMs: numberField(160, {
      label: 'PR interval',
      unit: 'ms',
      min: 80,
      max: 500,
      usual: [120, 200],
      help: 'From P onset to the onset of a conducted QRS, at rest.',
    }),
    retrogradeConductionMs: nullableNumberField({
      label: 'Retrograde conduction',
      emptyWords: 'none',
      unit: 'ms',
      min: 80,
      max: 450,
      usual: [150, 300],
      help: 'From a ventricular beat to the atrial electrogram; empty: none.',
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
    prematureVentricularPerMinute: numberField(0, {
      label: 'Premature ventricular beats',
      unit: '/min',
      min: 0,
      max: 60,
      usual: [0, 6],
      help: 'Ectopic beats from the outflow tract.',
    }),
    prematureAtrialPerMinute: numberField(0, {
      label: 'Premature atrial beats',
      unit: '/min',
      min: 0,
      max: 60,
      usual: [0, 6],
      help: 'Ectopic beats from low in the atrium.',
    }),
    prematureCouplingMs: numberField(500, {
      label: 'Coupling',
      unit: 'ms',
      min: 250,
      max: 800,
      usual: [400, 600],
      help: 'From a beat to the premature one; at most 0.65 of the last interval.',
    }),
    injury: injurySchema,
  })
  .transform((patient) => ({
    ...patient,
    atrialRateBpm: patient.atrialRateBpm ?? usualAtrialRateBpm[patient.atrialRhythm],
  }))
  .prefault({});
