import type { Request } from 'express';
import type { z } from 'zod';
import { problemsOf } from '../../shared/parameters/parse';
import { stripIdSchema } from '../../shared/api/strip-id';
import { invalidInput, notFound } from '../errors';

/** An input as the schema has it; throws `invalidInput` with every problem. */
export function parsed<Schema extends z.ZodType>(schema: Schema, input: unknown): z.output<Schema> {
  const result = schema.safeParse(input);
  if (result.success) return result.data;
  throw invalidInput(problemsOf(schema, input, result.error));
}

/** A request's body as the schema has it; throws `invalidInput` with every problem. */
export function bodyOf<Schema extends z.ZodType>(schema: Schema, request: Request): z.output<Schema> {
  return parsed(schema, request.body as unknown);
}

/** As `bodyOf`, for routes that also take no body at all. */
export function optionalBodyOf<Schema extends z.ZodType>(schema: Schema, request: Request): z.output<Schema> {
  return parsed(schema, (request.body as unknown) ?? {});
}

/** A request's query as the schema has it; throws `invalidInput` with every problem. */
export function queryOf<Schema extends z.ZodType>(schema: Schema, request: Request): z.output<Schema> {
  return parsed(schema, { ...request.query });
}

/** The strip id in a request's address; one that cannot be an id is `notFound`, like one that is none. */
export function stripIdOf(request: Request): string {
  const result = stripIdSchema.safeParse(request.params.stripId);
  if (!result.success) throw notFound('strip');
  return result.data;
}
