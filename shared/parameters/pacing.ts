import { z } from 'zod';
import { faultsSchema } from './faults';
import { choiceField, flagField, nullableNumberField, numberField } from './fields';
import { atrialLeadSchema, leftVentricularLeadSchema, rightVentricularLeadSchema } from './leads';
import { pacesBothVentricles, pacingModeCodes, temporaryModes, type PacingMode } from './pacing-mode';
import { transcutaneousSchema, transvenousSchema } from './temporary-pacing';

const sources = {
  none: 'No pacemaker',
  implanted: 'Implanted',
  transvenous: 'Transvenous',
  transcutaneous: 'Transcutaneous',
} as const;
export type PacingSource = keyof typeof sources;

/** A source that paces through a wire or pads of its own and knows VVI and VOO only. */
export function isTemporary(source: PacingSource): boolean {
  return source === 'transvenous' || source === 'transcutaneous';
}

/** The mode where none is given. */
export function usualMode(source: PacingSource): PacingMode {
  return isTemporary(source) ? 'VVI' : 'DDD';
}

const pacingObject = z.strictObject({
  source: choiceField(sources, 'none', {
    label: 'Pacing',
    help: 'Whether and how this patient is paced.',
  }),
  mode: z
    .enum(pacingModeCodes as [PacingMode, ...PacingMode[]])
    .meta({
      field: {
        kind: 'choice',
        label: 'Mode',
        options: Object.fromEntries(pacingModeCodes.map((code) => [code, code])),
        help: 'NBG code: chambers paced, sensed, response; R for rate response, fifth letter V for two ventricles.',
      },
    })
    .optional(),
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
  sensorRateBpm: nullableNumberField({
    label: 'Sensor rate',
    emptyWords: 'at rest',
    unit: '/min',
    min: 30,
    max: 200,
    usual: [70, 120],
    help: 'Rate that the activity sensor asks for; acts in modes with R. Empty: at rest.',
  }),
  hysteresisRateBpm: nullableNumberField({
    label: 'Hysteresis rate',
    emptyWords: 'off',
    unit: '/min',
    min: 20,
    max: 200,
    usual: [40, 55],
    help: 'After a sensed beat the pacemaker waits as if at this slower rate. Empty: off.',
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
  pvarpAfterEctopic: choiceField({ unchanged: 'Unchanged', lengthened: 'Lengthened' }, 'unchanged', {
    label: 'PVARP after an ectopic',
    help: 'Lengthened to 400 ms after a ventricular beat without a P wave, so that no loop starts.',
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
  safetyPacing: flagField(true, {
    label: 'Safety pacing',
    help: 'A sense in the crosstalk window brings an early ventricular stimulus instead of a pause.',
  }),
  modeSwitching: flagField(true, {
    label: 'Mode switching',
    help: 'Stops tracking while the atria are too fast.',
  }),
  modeSwitchRateBpm: numberField(170, {
    label: 'Mode switch rate',
    unit: '/min',
    min: 120,
    max: 200,
    usual: [150, 180],
    help: 'Atrial rate above which tracking stops.',
  }),
  magnetApplied: flagField(false, {
    label: 'Magnet applied',
    help: 'An implanted device paces asynchronously while a magnet lies on it.',
  }),
  magnetRateBpm: numberField(90, {
    label: 'Magnet rate',
    unit: '/min',
    min: 50,
    max: 120,
    usual: [85, 100],
    help: 'Rate under a magnet; it differs by maker and battery.',
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
  transvenous: transvenousSchema,
  transcutaneous: transcutaneousSchema,
  faults: faultsSchema,
});

/** With what follows from the rest filled in. */
function complete(pacing: z.output<typeof pacingObject>) {
  const mode = pacing.mode ?? usualMode(pacing.source);
  const chambers = pacesBothVentricles(mode) ? ('both' as const) : ('right' as const);
  return { ...pacing, mode, ventricularChambers: pacing.ventricularChambers ?? chambers };
}
type CompletePacing = ReturnType<typeof complete>;

interface Mismatch {
  path: keyof CompletePacing;
  value: unknown;
  allowed: string;
}

/** Settings that contradict each other. */
function mismatches(pacing: CompletePacing): Mismatch[] {
  const { source, mode, ventricularChambers, lowerRateBpm, upperTrackingRateBpm, hysteresisRateBpm } = pacing;
  const found: Mismatch[] = [];
  if (isTemporary(source) && !temporaryModes.includes(mode)) {
    found.push({ path: 'mode', value: mode, allowed: `VVI or VOO, because the source is ${source}` });
  }
  if ((ventricularChambers === 'both') !== pacesBothVentricles(mode)) {
    const allowed = pacesBothVentricles(mode)
      ? `both, because the mode ${mode} has the fifth letter V`
      : `right or left with the mode ${mode}; both needs the fifth letter V, such as DDDOV`;
    found.push({ path: 'ventricularChambers', value: ventricularChambers, allowed });
  }
  if (upperTrackingRateBpm < lowerRateBpm) {
    const allowed = `at least the lower rate, ${lowerRateBpm} /min, up to 200 /min`;
    found.push({ path: 'upperTrackingRateBpm', value: upperTrackingRateBpm, allowed });
  }
  if (hysteresisRateBpm !== null && hysteresisRateBpm >= lowerRateBpm) {
    const allowed = `null or below the lower rate, ${lowerRateBpm} /min, from 20 /min`;
    found.push({ path: 'hysteresisRateBpm', value: hysteresisRateBpm, allowed });
  }
  return found;
}

/** The pacemaker. What follows from source and mode is filled in; what contradicts them is refused. */
export const pacingSchema = pacingObject
  .transform(complete)
  .superRefine((pacing, context) => {
    for (const { path, value, allowed } of mismatches(pacing)) {
      context.addIssue({ code: 'custom', path: [path], params: { value, allowed }, message: 'does not fit' });
    }
  })
  .prefault({});
