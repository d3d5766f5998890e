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

/** An index of a list, or the one after its last. */
function isIndex(list: readonly unknown[], key: string): boolean {
  return /^\d{1,4}$/u.test(key) && Number(key) <= list.length;
}

/**
 * A copy of a tree with the value at a path set. Objects on the way are made where there are none; a number in the
 * path is an index of a list, where there is one.
 */
export function withValueAt(target: unknown, path: readonly string[], value: unknown): unknown {
  const [key, ...rest] = path;
  if (key === undefined) return value;
  if (Array.isArray(target) && isIndex(target, key)) {
    const index = Number(key);
    const copy: unknown[] = [...(target as unknown[])];
    copy[index] = withValueAt(copy[index], rest, value);
    return copy;
  }
  const object = isPlainObject(target) ? target : {};
  const child = Object.hasOwn(object, key) ? object[key] : undefined;
  return { ...object, [key]: withValueAt(child, rest, value) };
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
  return withValueAt(input, path, readValue(assignment.slice(equals + 1)));
}
