import { z } from 'zod';
import { InvalidInputError, type Problem } from '../errors';
import type { NumberFieldMeta, TextFieldMeta } from '../parameters/fields';
import { problemsOf } from '../parameters/parse';
import { stripIdSchema } from '../parameters/strip-id';
import {
  keptParametersSchema,
  tagsSchema,
  teachingPointSchema,
  titleSchema,
} from '../parameters/strip-texts';
import { upgradePreset, upgradeWords } from './preset-file-upgrades';

/** Version of the preset file; a reader refuses newer ones and upgrades older ones. */
export const presetFileVersion = 2;

/** Presets a file may hold. */
export const mostPresetsInFile = 500;

const fileFormat = 'paceloom-presets';
const countWords = `1 to ${mostPresetsInFile} presets`;

const engineVersionSchema = z
  .string()
  .refine((version) => /^\d{1,4}\.\d{1,4}\.\d{1,4}$/.test(version), {
    params: { allowed: 'three whole numbers with points between, such as 2.0.0' },
    message: 'is no engine version',
  })
  .meta({
    field: { kind: 'text', label: 'Engine', maxLength: 14, help: 'The engine.' } satisfies TextFieldMeta,
  });

/** A preset as it travels between libraries: what is taught and how it is made, never whose it is or who sees it. */
const filedPresetSchema = z.strictObject({
  /** The strip's id where it was made, by which it is recognised when it comes again; null when it is not known. */
  presetId: stripIdSchema.nullable(),
  /** The engine that it was last saved with: another one may draw it differently. */
  engineVersion: engineVersionSchema,
  title: titleSchema,
  teachingPoint: teachingPointSchema.default(''),
  tags: tagsSchema.default([]),
  /** Its group of the course; a library whose course has no such group keeps it outside the course. */
  group: stripIdSchema.nullable().default(null),
  parameters: keptParametersSchema,
});
export type FiledPreset = z.output<typeof filedPresetSchema>;

const fileSchema = z.strictObject({
  format: z.literal(fileFormat),
  fileVersion: z
    .number()
    .int()
    .min(1)
    .max(presetFileVersion)
    .meta({
      field: {
        kind: 'number',
        label: 'File version',
        unit: '',
        min: 1,
        max: presetFileVersion,
        integer: true,
        help: 'Layout of the file.',
      } satisfies NumberFieldMeta,
    }),
  strips: z.custom<unknown[]>((strips) => Array.isArray(strips), {
    params: { allowed: `a list of ${countWords}` },
  }),
});

/** What was read: the presets in the current layout, and what had to be filled in to bring them there. */
export interface PresetFile {
  /** Version the file was written in. */
  fileVersion: number;
  /** In sentences, what upgrading filled in; empty for a file of the current version. */
  upgrades: readonly string[];
  strips: readonly FiledPreset[];
}

/** A file that this version cannot read because a later one wrote it. */
export class NewerFileError extends Error {
  constructor(readonly fileVersion: number) {
    super(
      `This file was written by a newer version of the product (file version ${fileVersion}; this one reads up to ${presetFileVersion}). Bring the product up to date, then import it again.`,
    );
    this.name = 'NewerFileError';
  }
}

/** A preset file as text: JSON, two spaces, a newline at its end. */
export function writePresetFile(strips: readonly FiledPreset[]): string {
  const file = {
    format: fileFormat,
    fileVersion: presetFileVersion,
    strips: strips.map(
      ({ presetId, engineVersion, title, teachingPoint, tags, group, parameters }): FiledPreset => ({
        presetId,
        engineVersion,
        title,
        teachingPoint,
        tags,
        group,
        parameters: { ...parameters, title },
      }),
    ),
  };
  return `${JSON.stringify(file, null, 2)}\n`;
}

const longestNameShown = 60;

/** How messages name a preset of a file: its number from 1, and its title when it has one. */
export function presetItem(index: number, strip: unknown): string {
  const title = typeof strip === 'object' && strip !== null && 'title' in strip ? strip.title : undefined;
  if (typeof title !== 'string' || title.trim() === '') return `strip ${index + 1}`;
  const characters = [...title.trim()];
  const shown = characters.slice(0, longestNameShown).join('');
  return `strip ${index + 1}, “${shown}${characters.length > longestNameShown ? '…' : ''}”`;
}

/** Format, version and number of presets; throws `NewerFileError`, `InvalidInputError`. */
function readEnvelope(input: unknown): z.output<typeof fileSchema> {
  const head = z
    .looseObject({ format: z.literal(fileFormat), fileVersion: z.number().int() })
    .safeParse(input);
  if (head.success && head.data.fileVersion > presetFileVersion) {
    throw new NewerFileError(head.data.fileVersion);
  }
  const envelope = fileSchema.safeParse(input);
  if (!envelope.success) throw new InvalidInputError(problemsOf(fileSchema, input, envelope.error));
  const count = envelope.data.strips.length;
  if (count < 1 || count > mostPresetsInFile) {
    const allowed = `${countWords} in a file`;
    throw new InvalidInputError([{ path: 'strips', value: `${count} presets`, allowed }]);
  }
  return envelope.data;
}

/** One preset, upgraded and checked; its problems go to `problems`. */
function readPreset(strip: unknown, version: number, item: string, problems: Problem[]): FiledPreset | null {
  const upgraded = upgradePreset(strip, version, presetFileVersion);
  if (!upgraded.ok) {
    problems.push(...upgraded.problems.map((problem) => ({ item, ...problem })));
    return null;
  }
  const result = filedPresetSchema.safeParse(upgraded.strip);
  if (!result.success) {
    const found = problemsOf(filedPresetSchema, upgraded.strip, result.error);
    problems.push(...found.map((problem) => ({ item, ...problem })));
    return null;
  }
  const { title, parameters } = result.data;
  return { ...result.data, parameters: { ...parameters, title } };
}

/** A preset that stands in a file twice could not be told apart when it comes again. */
function repeatedIds(strips: readonly FiledPreset[]): Problem[] {
  const first = new Map<string, number>();
  strips.forEach(({ presetId }, index) => {
    if (presetId !== null && !first.has(presetId)) first.set(presetId, index);
  });
  return strips.flatMap((strip, index) => {
    const { presetId } = strip;
    if (presetId === null || first.get(presetId) === index) return [];
    const item = presetItem(index, strip);
    return [{ item, path: 'presetId', value: JSON.stringify(presetId), allowed: 'each id once in a file' }];
  });
}

/**
 * Reads parsed JSON of any version up to the current one. Throws `NewerFileError`, and `InvalidInputError` with every
 * problem, each naming the preset it was found in.
 */
export function readPresetFile(input: unknown): PresetFile {
  const { fileVersion, strips } = readEnvelope(input);
  const problems: Problem[] = [];
  const read = strips.flatMap(
    (strip, index) => readPreset(strip, fileVersion, presetItem(index, strip), problems) ?? [],
  );
  problems.push(...repeatedIds(read));
  if (problems.length > 0) throw new InvalidInputError(problems);
  return { fileVersion, upgrades: upgradeWords(fileVersion, presetFileVersion), strips: read };
}
