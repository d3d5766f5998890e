import { z } from 'zod';

/** GET /api/health. */
export const healthResponseSchema = z.object({ status: z.literal('ok'), engineVersion: z.string() });
export type HealthResponse = z.infer<typeof healthResponseSchema>;
