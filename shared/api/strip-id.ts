import { z } from 'zod';

/** Id of a saved strip: a UUID, or the kebab-case id of a preset that ships. */
export const stripIdSchema = z
  .string()
  .max(64)
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/);
