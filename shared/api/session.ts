import { z } from 'zod';
import { roleSchema } from './roles';

/** POST /api/session. */
export const signInRequestSchema = z.strictObject({
  email: z
    .string()
    .trim()
    .toLowerCase()
    .max(254)
    .regex(/^[^\s@]+@[^\s@]+$/, { message: 'Give an e-mail address' })
    .meta({
      field: { kind: 'text', label: 'E-mail', maxLength: 254, help: 'The address you were invited by.' },
    }),
  password: z
    .string()
    .min(1, { message: 'Give your password' })
    .max(200)
    .meta({ field: { kind: 'text', label: 'Password', maxLength: 200, help: 'At most 200 characters.' } }),
});
export type SignInRequest = z.infer<typeof signInRequestSchema>;

/** The person who is signed in. */
export const userSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  /** Name of the department. */
  department: z.string(),
  /** Name of the college. */
  organisation: z.string(),
});
export type User = z.infer<typeof userSchema>;

/** Answer of POST and GET /api/session. */
export const sessionResponseSchema = z.object({ user: userSchema });
export type SessionResponse = z.infer<typeof sessionResponseSchema>;
