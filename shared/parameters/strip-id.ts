import { z } from 'zod';
import type { TextFieldMeta } from './fields';

const longestId = 64;
const kebab = /^[a-z0-9]+(-[a-z0-9]+)*$/;

/** Id of a saved strip: a UUID, or the kebab-case id of a preset that ships. */
export const stripIdSchema = z
  .string()
  .refine((id) => id.length <= longestId && kebab.test(id), {
    params: { allowed: `small letters, digits and single hyphens, at most ${longestId} characters` },
    message: 'is not an id',
  })
  .meta({
    field: {
      kind: 'text',
      label: 'Id',
      maxLength: longestId,
      help: 'Names a strip.',
    } satisfies TextFieldMeta,
  });
