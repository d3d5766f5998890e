import { InvalidInputError } from '../errors';

type PlainObject = Record<string, unknown>;

function isPlainObject(value: unknown): value is PlainObject {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** A value typed on a command line: JSON when it parses (numbers, null, lists), otherwise the text itself. */
function readValue(text: string): unknown {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return text;
  }
}

function withValue(target: PlainObject, path: readonly string[], value: unknown): PlainObject {
  const [key, ...rest] = path;
  if (rest.length === 0) return { ...target, [key]: value };
  const child = Object.hasOwn(target, key) ? target[key] : undefined;
  return { ...target, [key]: withValue(isPlainObject(child) ? child : {}, rest, value) };
}

/**
 * A copy of `input` with one `path=value` assignment applied, such as `pacing.lowerRateBpm=70`.
 * Throws `InvalidInputError` when the assignment has no path or no equals sign. The path itself is checked
 * later, by the schema.
 */
export function assignPath(input: unknown, assignment: string): unknown {
  const equals = assignment.indexOf('=');
  const path = assignment.slice(0, Math.max(equals, 0)).split('.');
  if (equals < 1 || path.some((key) => key === '' || key === '__proto__')) {
    throw new InvalidInputError([
      {
        path: '--set',
        value: JSON.stringify(assignment),
        allowed: 'path=value, such as pacing.lowerRateBpm=70',
      },
    ]);
  }
  if (!isPlainObject(input)) return input;
  return withValue(input, path, readValue(assignment.slice(equals + 1)));
}
