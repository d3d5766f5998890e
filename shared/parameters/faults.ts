import { z } from 'zod';
import { choiceField, nullableNumberField, numberField } from './fields';

/** A fault of the system over a stretch of time. Times count from the start of the strip. */
const faultSchema = z
  .strictObject({
    kind: choiceField(
      {
        failureToCapture: 'Failure to capture',
        failureToPace: 'Failure to pace',
        undersensing: 'Undersensing',
        oversensing: 'Oversensing',
      },
      'failureToCapture',
      { label: 'Fault', help: 'What goes wrong.' },
    ),
    chamber: choiceField(
      { atrium: 'Atrium', rightVentricle: 'Right ventricle', leftVentricle: 'Left ventricle' },
      'rightVentricle',
      { label: 'Chamber', help: 'On which lead; transcutaneous pacing counts as right ventricle.' },
    ),
    proportion: numberField(1, {
      label: 'Proportion',
      unit: '',
      min: 0,
      max: 1,
      usual: [0.2, 1],
      help: 'Share of stimuli or senses that are hit.',
    }),
    fromS: numberField(0, {
      label: 'From',
      unit: 's',
      min: 0,
      max: 86400,
      help: 'Start of the fault; 0 means it was there before the strip.',
    }),
    toS: nullableNumberField({
      label: 'To',
      emptyWords: 'it stays',
      unit: 's',
      min: 0,
      max: 86400,
      help: 'End of the fault; empty: it stays.',
    }),
    intervalMs: numberField(200, {
      label: 'Interval of false senses',
      unit: 'ms',
      min: 100,
      max: 2000,
      usual: [150, 600],
      help: 'Oversensing only: time between false senses.',
    }),
  })
  .superRefine((fault, context) => {
    if (fault.toS !== null && fault.toS <= fault.fromS) {
      context.addIssue({
        code: 'custom',
        path: ['toS'],
        params: { value: fault.toS, allowed: `null or more than fromS, ${fault.fromS} s` },
        message: 'ends before it begins',
      });
    }
    if (fault.kind.endsWith('sensing') && fault.chamber === 'leftVentricle') {
      context.addIssue({
        code: 'custom',
        path: ['chamber'],
        params: { value: fault.chamber, allowed: 'atrium or rightVentricle; the left lead never senses' },
        message: 'never senses',
      });
    }
  });

const mostFaults = 20;
export const faultsSchema = z.array(faultSchema).max(mostFaults).default([]);
export type Fault = z.output<typeof faultSchema>;
export type FaultKind = Fault['kind'];
