import { z } from 'zod';
import { mostPresetsInFile } from '../formats/preset-file';
import { stripIdSchema } from '../parameters/strip-id';
import { stripListQuerySchema } from './strip-list';
import { keepers } from './strips';

/** Largest preset file that is read: a preset takes about 4 kB, its texts at most another 20. */
export const presetFileLimitMb = 8;

/** Name under which presets are saved. */
export const presetFileName = 'paceloom-presets.json';

/** The filters of the library, without its pages. */
const stripFilterSchema = stripListQuerySchema.pick({ search: true, tag: true, keptBy: true, group: true });

/** POST /api/strips/export: strips by id, or all that filters leave. Answers a preset file. */
export const exportPresetsSchema = z
  .strictObject({
    ids: z
      .array(stripIdSchema)
      .refine((ids) => ids.length >= 1 && ids.length <= mostPresetsInFile, {
        params: { allowed: `1 to ${mostPresetsInFile} ids` },
        message: 'names too few or too many strips',
      })
      .optional(),
    filter: stripFilterSchema.optional(),
  })
  .refine((request) => (request.ids === undefined) !== (request.filter === undefined), {
    params: { allowed: 'ids or filter, one of the two' },
    message: 'needs ids or filter, one of the two',
  });
export type ExportPresets = z.output<typeof exportPresetsSchema>;
export type ExportPresetsInput = z.input<typeof exportPresetsSchema>;

/** What to do with a preset that is here already. */
export const importChoices = ['keepBoth', 'replace', 'skip'] as const;
const importChoiceSchema = z.enum(importChoices);
export type ImportChoice = z.infer<typeof importChoiceSchema>;

/** The field `decision` of POST /api/strips/import, as JSON: what to do, by a look at the same file. */
export const importDecisionSchema = z.strictObject({
  /** Of the look that it was decided by. */
  token: z.string().regex(/^[0-9a-f]{64}$/),
  /** For every preset that is here already … */
  choice: importChoiceSchema,
  /** … but for these, by their number in the file. */
  exceptions: z
    .array(
      z.strictObject({
        number: z.number().int().min(1).max(mostPresetsInFile),
        choice: importChoiceSchema,
      }),
    )
    .max(mostPresetsInFile)
    .default([]),
});
export type ImportDecision = z.output<typeof importDecisionSchema>;
export type ImportDecisionInput = z.input<typeof importDecisionSchema>;

/** A strip of the library that a preset of the file is. */
const importMatchSchema = z.object({
  id: stripIdSchema,
  title: z.string(),
  keptBy: z.enum(keepers),
  /** Whether the one who asks may replace it. */
  replaceable: z.boolean(),
});

/**
 * What a preset of the file is to this library: new; here already with the same content; or here, by its id, with
 * another content.
 */
export const presetStatuses = ['new', 'same', 'changed'] as const;

export const lookedAtPresetSchema = z.object({
  /** Its place in the file, from 1. */
  number: z.number().int(),
  title: z.string(),
  status: z.enum(presetStatuses),
  /** null when it is new. */
  match: importMatchSchema.nullable(),
  /** The file places it in a group that this course does not have: it is kept outside the course. */
  groupUnknown: z.boolean(),
});
export type LookedAtPreset = z.output<typeof lookedAtPresetSchema>;

/** A look at a preset file: nothing is changed by it. */
export const importAnalysisSchema = z.object({
  fileVersion: z.number().int(),
  /** What upgrading an older file filled in, in sentences. */
  upgrades: z.array(z.string()),
  presets: z.array(lookedAtPresetSchema),
  /** Stands for the file and for what of the library it was looked at against. */
  token: z.string(),
});
export type ImportAnalysis = z.output<typeof importAnalysisSchema>;

const importedStripSchema = z.object({ id: stripIdSchema, title: z.string() });

/** What an import did. */
export const importResultSchema = z.object({
  /** New strips, also those kept beside one that was here; private and one's own. */
  added: z.array(importedStripSchema),
  replaced: z.array(importedStripSchema),
  /** Left as they are: skipped, or the same already. */
  skipped: z.number().int(),
  /** Asked to be replaced, but not this person's to change: left as they are. */
  notReplaceable: z.array(importedStripSchema),
});
export type ImportResult = z.output<typeof importResultSchema>;

/** Answers of POST /api/strips/import, without and with a decision. */
export const importAnalysisResponseSchema = z.object({ analysis: importAnalysisSchema });
export const importResultResponseSchema = z.object({ result: importResultSchema });
