import { z } from 'zod';
import { disturbanceSchema } from './disturbance';
import { numberField, textField } from './fields';
import { pacingSchema } from './pacing';
import { patientSchema } from './patient';
import { recorderSchema } from './recorder';
import { sheetSchema } from './sheet';
import { waveformSchema } from './waveform';

/** Version of the parameter schema; saved strips carry it. */
export const schemaVersion = 1;

/**
 * The one contract of a strip: everything that decides its samples. `{}` is a valid strip (normal sinus
 * rhythm, no pacing). Unknown keys are refused. Units are in the names.
 */
export const stripParametersSchema = z
  .strictObject({
    schemaVersion: z.literal(schemaVersion).default(schemaVersion),
    title: textField({ label: 'Title', maxLength: 120, help: 'Shown on the sheet and in the library.' }),
    notes: textField({ label: 'Notes', maxLength: 4000, help: 'For the educator; not drawn.' }),
    seed: numberField(1, {
      label: 'Seed',
      unit: '',
      min: 0,
      max: 4294967295,
      integer: true,
      help: 'Same seed, same chance: variability and noise repeat exactly.',
    }),
    durationS: numberField(10, {
      label: 'Duration',
      unit: 's',
      min: 1,
      max: 86400,
      usual: [6, 60],
      help: 'Length of the strip.',
    }),
    patient: patientSchema,
    pacing: pacingSchema,
    waveform: waveformSchema,
    disturbance: disturbanceSchema,
    recorder: recorderSchema,
    sheet: sheetSchema,
  })
  .meta({ id: 'StripParameters' });

/** Parameters with every default filled in. */
export type StripParameters = z.output<typeof stripParametersSchema>;
/** Parameters as a person or a file gives them: every key optional. */
export type StripParametersInput = z.input<typeof stripParametersSchema>;

export type PatientParameters = StripParameters['patient'];
export type PacingParameters = StripParameters['pacing'];
export type AtrialLead = PacingParameters['atrialLead'];
export type RightVentricularLead = PacingParameters['rightVentricularLead'];
export type LeftVentricularLead = PacingParameters['leftVentricularLead'];
export type PacingLead = AtrialLead | RightVentricularLead | LeftVentricularLead;
export type WaveformParameters = StripParameters['waveform'];
export type DisturbanceParameters = StripParameters['disturbance'];
export type RecorderParameters = StripParameters['recorder'];
export type SheetParameters = StripParameters['sheet'];
