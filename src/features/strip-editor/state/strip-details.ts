import { z } from 'zod';
import { createStripSchema, type Strip } from '../../../../shared/api/strips';

/** What is kept of a strip beside its parameters. */
export const stripDetailsSchema = createStripSchema.omit({ parameters: true, tags: true }).extend({
  /** Words with commas between; the form's way of writing tags. */
  tagWords: z.string().max(600),
});
export type StripDetails = z.output<typeof stripDetailsSchema>;
export type StripDetailsInput = z.input<typeof stripDetailsSchema>;

export function tagsOf(words: string): string[] {
  return [
    ...new Set(
      words
        .split(',')
        .map((word) => word.trim())
        .filter(Boolean),
    ),
  ];
}

export function detailsOf(strip: Strip | null, title: string): StripDetailsInput {
  return {
    title: strip?.title ?? title,
    teachingPoint: strip?.teachingPoint ?? '',
    tagWords: strip?.tags.join(', ') ?? '',
    group: strip?.group ?? null,
    visibility: strip?.visibility ?? 'private',
  };
}
