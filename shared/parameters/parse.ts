import type { z } from 'zod';
import { InvalidInputError, type Problem } from '../errors';
import { allowedWords, schemaAt, unwrap } from './allowed';
import { stripParametersSchema, type StripParameters } from './strip-parameters';

const longestValueShown = 60;

function valueAt(input: unknown, path: readonly PropertyKey[]): unknown {
  let value = input;
  for (const key of path) {
    if (typeof value !== 'object' || value === null) return undefined;
    value = (value as Record<PropertyKey, unknown>)[key];
  }
  return value;
}

/** A value as it stands in the message: JSON, cut when long. */
function showValue(value: unknown): string {
  if (value === undefined) return 'missing';
  if (typeof value === 'number') return String(value);
  const json = JSON.stringify(value) ?? typeof value;
  return json.length > longestValueShown ? `${json.slice(0, longestValueShown)}…` : json;
}

function showPath(path: readonly PropertyKey[]): string {
  return path.length === 0 ? '(root)' : path.map(String).join('.');
}

function unknownKeyProblems(root: z.ZodType, input: unknown, path: PropertyKey[], keys: string[]): Problem[] {
  const parent = schemaAt(root, path);
  const known = parent ? allowedWords(unwrap(parent)) : 'nothing';
  return keys.map((key) => ({
    path: showPath([...path, key]),
    value: `the key with value ${showValue(valueAt(input, [...path, key]))}`,
    allowed: known,
  }));
}

function issueProblems(root: z.ZodType, input: unknown, issue: z.core.$ZodIssue): Problem[] {
  if (issue.code === 'unrecognized_keys') return unknownKeyProblems(root, input, issue.path, issue.keys);
  const params = issue.code === 'custom' ? issue.params : undefined;
  const schema = schemaAt(root, issue.path);
  return [
    {
      path: showPath(issue.path),
      value: showValue(params && 'value' in params ? params.value : valueAt(input, issue.path)),
      allowed: String(params?.allowed ?? (schema ? allowedWords(schema) : issue.message)),
    },
  ];
}

/** Every problem of a failed parse: path, value and allowed range for each. */
export function problemsOf(root: z.ZodType, input: unknown, error: z.ZodError): Problem[] {
  return error.issues.flatMap((issue) => issueProblems(root, input, issue));
}

export type ParseResult =
  { ok: true; parameters: StripParameters } | { ok: false; problems: readonly Problem[] };

/** Reads strip parameters from anything; defaults filled in, or every problem listed. Never throws. */
export function readStripParameters(input: unknown): ParseResult {
  const result = stripParametersSchema.safeParse(input);
  if (result.success) return { ok: true, parameters: result.data };
  return { ok: false, problems: problemsOf(stripParametersSchema, input, result.error) };
}

/** As `readStripParameters`, but throws `InvalidInputError` with every problem. */
export function parseStripParameters(input: unknown): StripParameters {
  const result = readStripParameters(input);
  if (result.ok) return result.parameters;
  throw new InvalidInputError(result.problems);
}
