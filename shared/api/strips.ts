import { z } from 'zod';
import { courseGroups, type CourseGroupId } from '../gallery/course';
import { stripParametersSchema } from '../parameters/strip-parameters';
import {
  keptParametersSchema,
  tagsSchema,
  teachingPointSchema,
  titleSchema,
} from '../parameters/strip-texts';
import { stripIdSchema } from './strip-id';

const groupIds = courseGroups.map((group) => group.id) as [CourseGroupId, ...CourseGroupId[]];
export const courseGroupIdSchema = z.enum(groupIds);

export const visibilities = ['private', 'department'] as const;
/** Who sees a strip: its owner, or the department (its educators, technicians and administrators). */
export const visibilitySchema = z.enum(visibilities);
export type Visibility = z.infer<typeof visibilitySchema>;

export { longestTag, mostTags, tagSchema } from '../parameters/strip-texts';

/** POST /api/strips. `title` also becomes `parameters.title`: a kept strip has one title. */
export const createStripSchema = z.strictObject({
  title: titleSchema,
  teachingPoint: teachingPointSchema.default(''),
  tags: tagsSchema.default([]),
  group: courseGroupIdSchema.nullable().default(null),
  visibility: visibilitySchema.default('private'),
  parameters: keptParametersSchema,
});
export type CreateStrip = z.output<typeof createStripSchema>;
export type CreateStripInput = z.input<typeof createStripSchema>;

/** PUT /api/strips/:stripId: the whole strip, and the version that it was made from. */
export const updateStripSchema = z.strictObject({
  version: z.number().int().min(1).max(Number.MAX_SAFE_INTEGER),
  title: titleSchema,
  teachingPoint: teachingPointSchema,
  tags: tagsSchema,
  group: courseGroupIdSchema.nullable(),
  visibility: visibilitySchema,
  parameters: keptParametersSchema,
});
export type UpdateStrip = z.output<typeof updateStripSchema>;
export type UpdateStripInput = z.input<typeof updateStripSchema>;

/** POST /api/strips/:stripId/duplicate. Without a title: `Copy of …`. The copy is private and one's own. */
export const duplicateStripSchema = z.strictObject({ title: titleSchema.optional() });
export type DuplicateStrip = z.infer<typeof duplicateStripSchema>;

/** Whose strip it is, to the one who asks: one's own, someone else's of the department, or shipped. */
export const keepers = ['me', 'department', 'gallery'] as const;
export type Keeper = (typeof keepers)[number];

/** A strip as the API gives it. */
export const stripSchema = z.object({
  id: stripIdSchema,
  title: z.string(),
  teachingPoint: z.string(),
  tags: z.array(z.string()),
  group: courseGroupIdSchema.nullable(),
  visibility: visibilitySchema,
  keptBy: z.enum(keepers),
  /** null for the gallery. */
  owner: z.object({ id: z.string(), name: z.string() }).nullable(),
  /** Goes up by one with every save. */
  version: z.number().int(),
  /** The engine that it was last saved with. */
  engineVersion: z.string(),
  /** ISO 8601, UTC. */
  createdAt: z.string(),
  updatedAt: z.string(),
  /** Complete; what was saved under an older schema comes upgraded. */
  parameters: stripParametersSchema,
  /** Whether the one who asks may save changes. */
  canEdit: z.boolean(),
  /** Whether the one who asks may delete it or change who sees it. */
  canDelete: z.boolean(),
});
export type Strip = z.output<typeof stripSchema>;

/** A strip in a list: complete, since its card is drawn from its parameters. */
export type StripSummary = Strip;

/** Answer of every request for one strip. */
export const stripResponseSchema = z.object({ strip: stripSchema });
export type StripResponse = z.infer<typeof stripResponseSchema>;
