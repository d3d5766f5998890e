import { z } from 'zod';
import { roleSchema } from './roles';

/** One invented person that a demonstration can be entered as. */
export const demoAccountSchema = z.object({
  name: z.string(),
  role: roleSchema,
  email: z.string(),
  password: z.string(),
  department: z.string(),
});
export type DemoAccount = z.infer<typeof demoAccountSchema>;

/** GET /api/demo: the accounts while the demonstration data is in place, otherwise an empty list. */
export const demoResponseSchema = z.object({
  organisation: z.string().nullable(),
  accounts: z.array(demoAccountSchema),
});
export type DemoResponse = z.infer<typeof demoResponseSchema>;
