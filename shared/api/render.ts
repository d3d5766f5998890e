import { z } from 'zod';
import { stripParametersSchema } from '../parameters/strip-parameters';
import { stripIdSchema } from './strip-id';

/** Longest strip that POST /api/strips/render makes, s; longer ones belong to an export job. */
export const longestRenderS = 300;

const unquantised = z
  .boolean()
  .default(false)
  .describe('Samples before the quantiser, in doubles; for comparing engines, not for drawing.');

/**
 * POST /api/strips/render: parameters, or the id of a saved strip. Answers `application/octet-stream` as
 * shared/formats/strip-binary.ts has it.
 */
export const renderRequestSchema = z
  .strictObject({
    parameters: stripParametersSchema.optional(),
    stripId: stripIdSchema.optional(),
    unquantised,
  })
  .refine((request) => (request.parameters === undefined) !== (request.stripId === undefined), {
    params: { allowed: 'parameters or stripId, one of the two' },
    message: 'needs parameters or stripId, one of the two',
  });
export type RenderRequest = z.output<typeof renderRequestSchema>;
export type RenderRequestInput = z.input<typeof renderRequestSchema>;
