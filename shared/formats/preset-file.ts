import { z } from 'zod';
import { InvalidInputError } from '../errors';
import { textField } from '../parameters/fields';
import { problemsOf } from '../parameters/parse';
import { stripParametersSchema } from '../parameters/strip-parameters';

/** Version of the preset file; a reader refuses newer ones. */
export const presetFileVersion = 1;

/** Presets a file may hold. */
export const mostPresetsInFile = 500;

const filedPresetSchema = z.strictObject({
  title: textField({ label: 'Title', maxLength: 120, help: 'Shown on the sheet and in the library.' }),
  teachingPoint: textField({ label: 'Teaching point', maxLength: 500, help: 'What a learner should see.' }),
  tags: z.array(z.string().max(40)).max(12).default([]),
  parameters: stripParametersSchema,
});
export type FiledPreset = z.output<typeof filedPresetSchema>;

/** Presets as they travel between libraries: what is taught and how it is made, never whose it is. */
export const presetFileSchema = z.strictObject({
  format: z.literal('paceloom-presets'),
  fileVersion: z.literal(presetFileVersion),
  strips: z.array(filedPresetSchema).min(1).max(mostPresetsInFile),
});
export type PresetFile = z.output<typeof presetFileSchema>;

/** A preset file as text: JSON, two spaces, a newline at its end. */
export function writePresetFile(strips: readonly FiledPreset[]): string {
  const file = {
    format: 'paceloom-presets',
    fileVersion: presetFileVersion,
    strips: strips.map(({ title, teachingPoint, tags, parameters }) => ({
      title,
      teachingPoint,
      tags,
      parameters,
    })),
  };
  return `${JSON.stringify(file, null, 2)}\n`;
}

/** Reads parsed JSON; throws `InvalidInputError` with every problem. */
export function readPresetFile(input: unknown): PresetFile {
  const result = presetFileSchema.safeParse(input);
  if (result.success) return result.data;
  throw new InvalidInputError(problemsOf(presetFileSchema, input, result.error));
}
