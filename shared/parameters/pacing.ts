import { z } from 'zod';
import { choiceField, numberField } from './fields';
import { atrialLeadSchema, leftVentricularLeadSchema, rightVentricularLeadSchema } from './leads';

/** NBG codes implemented; the fifth letter V is multisite ventricular pacing (TM-01 to TM-05, Bernstein et al. 2002). */
export const pacingModes = {
  AOO: 'AOO',
  AAI: 'AAI',
  VOO: 'VOO',
  VVI: 'VVI',
  DOO: 'DOO',
  DDD: 'DDD',
  VVIOV: 'VVIOV',
  DOOOV: 'DOOOV',
  DDDOV: 'DDDOV',
} as const;
export type PacingMode = keyof typeof pacingModes;

const pacingObject = z.strictObject({
  source: choiceField({ none: 'No pacemaker', implanted: 'Implanted' }, 'none', {
    label: 'Pacing',
    help: 'Whether a pacemaker acts on this patient.',
  }),
  mode: choiceField(pacingModes, 'DDD', {
    label: 'Mode',
    help: 'NBG code: chambers paced, sensed, response; fifth letter V for two ventricles.',
  }),
  ventricularChambers: z
    .enum(['right', 'left', 'both'])
    .optional()
    .meta({
      field: {
        kind: 'choice',
        label: 'Ventricles paced',
        options: { right: 'Right', left: 'Left', both: 'Both' },
        help: 'Both exactly when the mode has the fifth letter V.',
      },
    }),
  lowerRateBpm: numberField(60, {
    label: 'Lower rate',
    unit: '/min',
    min: 20,
    max: 200,
    usual: [50, 70],
    help: 'The pacemaker does not let the rate fall below this.',
  }),
  upperTrackingRateBpm: numberField(120, {
    label: 'Upper tracking rate',
    unit: '/min',
    min: 80,
    max: 200,
    usual: [110, 140],
    help: 'The fastest that the ventricles are paced after sensed P waves.',
  }),
  pacedAvDelayMs: numberField(180, {
    label: 'Paced AV delay',
    unit: 'ms',
    min: 30,
    max: 350,
    usual: [150, 200],
    help: 'From an atrial stimulus to the ventricular one.',
  }),
  sensedAvDelayMs: numberField(150, {
    label: 'Sensed AV delay',
    unit: 'ms',
    min: 30,
    max: 350,
    usual: [120, 170],
    help: 'From a sensed P wave to the ventricular stimulus.',
  }),
  pvarpMs: numberField(275, {
    label: 'PVARP',
    unit: 'ms',
    min: 150,
    max: 500,
    usual: [250, 310],
    help: 'Post-ventricular atrial refractory period: P waves inside it are not tracked.',
  }),
  ventricularRefractoryMs: numberField(250, {
    label: 'Ventricular refractory',
    unit: 'ms',
    min: 150,
    max: 500,
    usual: [230, 280],
    help: 'After a ventricular event, senses inside it restart nothing.',
  }),
  ventricularBlankingMs: numberField(30, {
    label: 'Ventricular blanking',
    unit: 'ms',
    min: 10,
    max: 100,
    usual: [20, 60],
    help: 'After an atrial stimulus the ventricular channel is deaf for this long.',
  }),
  interventricularDelayMs: numberField(0, {
    label: 'Interventricular delay',
    unit: 'ms',
    min: -100,
    max: 100,
    usual: [-40, 40],
    help: 'Positive: right ventricle first; negative: left first.',
  }),
  hisCapture: choiceField({ selective: 'Selective', nonselective: 'Nonselective' }, 'nonselective', {
    label: 'His capture',
    help: 'For the His bundle site: the bundle alone, or with the septal muscle around it.',
  }),
  atrialLead: atrialLeadSchema,
  rightVentricularLead: rightVentricularLeadSchema,
  leftVentricularLead: leftVentricularLeadSchema,
});

/** The fifth letter of an NBG code is V: two ventricular sites are paced. */
export function pacesBothVentricles(mode: PacingMode): boolean {
  return mode.charAt(4) === 'V';
}

/** The pacemaker. `ventricularChambers` follows from the mode when not given, and must agree with it when given. */
export const pacingSchema = pacingObject
  .transform((pacing) => ({
    ...pacing,
    ventricularChambers:
      pacing.ventricularChambers ??
      (pacesBothVentricles(pacing.mode) ? ('both' as const) : ('right' as const)),
  }))
  .superRefine((pacing, context) => {
    if ((pacing.ventricularChambers === 'both') !== pacesBothVentricles(pacing.mode)) {
      context.addIssue({
        code: 'custom',
        path: ['ventricularChambers'],
        params: {
          value: pacing.ventricularChambers,
          allowed: pacesBothVentricles(pacing.mode)
            ? `both, because the mode ${pacing.mode} has the fifth letter V`
            : `right or left with the mode ${pacing.mode}; both needs the fifth letter V (VVIOV, DOOOV, DDDOV)`,
        },
        message: 'does not fit the mode',
      });
    }
    if (pacing.upperTrackingRateBpm < pacing.lowerRateBpm) {
      context.addIssue({
        code: 'custom',
        path: ['upperTrackingRateBpm'],
        params: {
          value: pacing.upperTrackingRateBpm,
          allowed: `at least the lower rate, ${pacing.lowerRateBpm} /min, up to 200 /min`,
        },
        message: 'is below the lower rate',
      });
    }
  })
  .prefault({});
