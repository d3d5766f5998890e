import { z } from 'zod';
import { exportFormats, type ExportFormat } from '../formats/export-format';
import { keptParametersSchema } from '../parameters/strip-texts';
import { stripIdSchema } from '../parameters/strip-id';

/**
 * Samples a lead that an export may have: an hour at 500 samples/s. Most formats need the whole strip in memory; this many
 * in every format but the pictures took 906 MB at most.
 */
export const mostExportSamples = 1_800_000;

/** Longest strip that is exported at a sample rate, s. */
export function longestExportS(sampleRateHz: number): number {
  return Math.floor(mostExportSamples / sampleRateHz);
}

/** Exports a person may have waiting and running. */
export const mostUnfinishedExports = 5;

/** Bytes that a person's exports may take. */
export const exportSpaceBytes = 1_000_000_000;

/** Days an export is kept. */
export const exportKeptDays = 7;

const formatSchema = z.enum(exportFormats);
const formatsAllowed = `one or more of ${exportFormats.join(', ')}, each once`;

const formatsSchema = z
  .array(formatSchema)
  .refine((formats) => formats.length > 0 && new Set(formats).size === formats.length, {
    params: { allowed: formatsAllowed },
    message: 'needs each format once',
  });

/**
 * POST /api/exports: a saved strip by its id, or parameters, in formats. More than one file comes as a ZIP archive with a
 * manifest; `bundle` asks for one even for a single file.
 */
export const createExportSchema = z
  .strictObject({
    stripId: stripIdSchema.optional(),
    parameters: keptParametersSchema.optional(),
    formats: formatsSchema,
    bundle: z.boolean().default(false),
    /** Another length than the strip's own, s. */
    durationS: z
      .number()
      .min(1)
      .max(86_400)
      .meta({
        field: {
          kind: 'number',
          label: 'Duration',
          unit: 's',
          min: 1,
          max: 86_400,
          help: 'Length of the recording.',
        },
      })
      .optional(),
  })
  .refine((request) => (request.parameters === undefined) !== (request.stripId === undefined), {
    params: { allowed: 'parameters or stripId, one of the two' },
    message: 'needs parameters or stripId, one of the two',
  });
export type CreateExport = z.output<typeof createExportSchema>;
export type CreateExportInput = z.input<typeof createExportSchema>;

export const exportIdSchema = z.uuid();

export const exportStates = ['waiting', 'running', 'done', 'failed', 'cancelled'] as const;
export type ExportState = (typeof exportStates)[number];

/** What a format lost or changed on the way. */
const exportWarningSchema = z.object({ format: formatSchema, text: z.string() });
export type ExportWarning = { format: ExportFormat; text: string };

/** An export as the API gives it to the person whose it is. */
export const exportJobSchema = z.object({
  id: exportIdSchema,
  /** Of the strip; may be empty. */
  title: z.string(),
  /** The saved strip it was made from; null for a draft. */
  stripId: stripIdSchema.nullable(),
  formats: z.array(formatSchema),
  durationS: z.number(),
  sampleRateHz: z.number(),
  state: z.enum(exportStates),
  /** 0 to 1. */
  progress: z.number().min(0).max(1),
  /** Why it failed, in a sentence; null otherwise. */
  failure: z.string().nullable(),
  warnings: z.array(exportWarningSchema),
  /** Name and size of its file; null until it is done. */
  file: z.object({ name: z.string(), bytes: z.number() }).nullable(),
  /** ISO 8601, UTC. */
  createdAt: z.string(),
  finishedAt: z.string().nullable(),
  /** When it will be removed; null while it waits or runs. */
  removedAt: z.string().nullable(),
});
export type ExportJob = z.output<typeof exportJobSchema>;

/** Answer of every request for one export. */
export const exportResponseSchema = z.object({ export: exportJobSchema });

/** Answer of GET /api/exports: one's own, the newest first. */
export const exportListResponseSchema = z.object({
  exports: z.array(exportJobSchema),
  /** Bytes of their files, and how many there may be. */
  usedBytes: z.number(),
  spaceBytes: z.number(),
});
export type ExportList = z.output<typeof exportListResponseSchema>;
