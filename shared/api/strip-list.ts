import { z } from 'zod';
import { isPlainText, plainTextRule } from './text';
import { courseGroupIdSchema, keepers, longestTag, mostTags, stripSchema } from './strips';

export const stripSorts = ['course', 'title', 'updated'] as const;
export type StripSort = (typeof stripSorts)[number];

export const largestPageSize = 100;

/** A count in a query, where everything is text. */
function queryCount(defaultValue: number, max: number, label: string) {
  return z.coerce
    .number()
    .int()
    .min(1)
    .max(max)
    .meta({ field: { kind: 'number', label, unit: '', min: 1, max, integer: true, help: label } })
    .default(defaultValue);
}

/** A query key that may be given once or again and again. */
const tagFilter = z
  .preprocess(
    (value) => (typeof value === 'string' ? [value] : value),
    z.array(z.string().trim().min(1).max(longestTag).refine(isPlainText, plainTextRule)).max(mostTags),
  )
  .default([]);

/**
 * Query of GET /api/strips. All filters must hold: every word of `search` (in title, teaching point, tags or
 * notes, whatever the case and accents), every `tag`. Without `direction`, `course` and `title` ascend and
 * `updated` starts with the newest.
 */
export const stripListQuerySchema = z.strictObject({
  search: z.string().trim().max(200).refine(isPlainText, plainTextRule).default(''),
  tag: tagFilter,
  keptBy: z.enum(['everyone', ...keepers]).default('everyone'),
  group: courseGroupIdSchema.optional(),
  sort: z.enum(stripSorts).default('course'),
  direction: z.enum(['ascending', 'descending']).optional(),
  page: queryCount(1, 1_000_000, 'Page'),
  pageSize: queryCount(24, largestPageSize, 'Strips per page'),
});
export type StripListQuery = z.output<typeof stripListQuerySchema>;
export type StripListQueryInput = z.input<typeof stripListQuerySchema>;

const count = z.number().int().min(0);

/**
 * Counts for the filters. Each facet counts what all *other* filters leave, so that it shows what choosing
 * another of its values would give; `tags` counts within the tags already chosen.
 */
export const stripFacetsSchema = z.object({
  keptBy: z.object({ everyone: count, me: count, department: count, gallery: count }),
  /** Every group of the course, in its order, those without a strip too. */
  groups: z.array(z.object({ id: courseGroupIdSchema, title: z.string(), count })),
  /** Most frequent first, then by name; at most 40. */
  tags: z.array(z.object({ tag: z.string(), count })),
});
export type StripFacets = z.infer<typeof stripFacetsSchema>;

/** Answer of GET /api/strips. A page past the end is empty. */
export const stripListResponseSchema = z.object({
  strips: z.array(stripSchema),
  /** Strips that the filters leave, on all pages. */
  total: count,
  page: count,
  pageSize: count,
  facets: stripFacetsSchema,
});
export type StripListResponse = z.output<typeof stripListResponseSchema>;
