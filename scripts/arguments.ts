import { parseArgs, type ParseArgsConfig } from 'node:util';
import { InvalidInputError, type Problem } from '../shared/errors';

/** Refuses an argument: one line with its name, the value given and what is allowed. */
export function refuse(path: string, value: unknown, allowed: string): never {
  const problem: Problem = { path, value: value === undefined ? 'missing' : JSON.stringify(value), allowed };
  throw new InvalidInputError([problem]);
}

type Options = NonNullable<ParseArgsConfig['options']>;

/** The values of the options after `--`. Throws `InvalidInputError` with all options for what is none of them. */
export function readArguments<const T extends Options>(args: string[], options: T) {
  try {
    return parseArgs({ args, options, strict: true, allowPositionals: false }).values;
  } catch (error) {
    const names = Object.keys(options).map((name) => `--${name}`);
    return refuse('command line', (error as Error).message, names.join(', '));
  }
}
