import { readFileSync } from 'node:fs';
import { InvalidInputError } from '../../shared/errors';
import { galleryPreset, presetInput } from '../../shared/gallery/gallery';
import { assignPath } from '../../shared/parameters/assign-path';
import { parseStripParameters } from '../../shared/parameters/parse';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import type { StripCommand } from './command';

const standardInput = 0;

function readText(path: string): string {
  try {
    return readFileSync(path === '-' ? standardInput : path, 'utf8');
  } catch (error) {
    const reason = (error as NodeJS.ErrnoException).code ?? 'unreadable';
    throw new InvalidInputError([
      { path: '--in', value: `${JSON.stringify(path)} (${reason})`, allowed: 'a readable file, or -' },
    ]);
  }
}

function readJson(path: string): unknown {
  const text = readText(path);
  try {
    return JSON.parse(text) as unknown;
  } catch (error) {
    throw new InvalidInputError([
      { path: '--in', value: (error as Error).message, allowed: 'strip parameters as JSON, such as {}' },
    ]);
  }
}

/** The parameters a command names, with its assignments applied and checked. Throws `InvalidInputError`. */
export function readParameters(command: StripCommand): StripParameters {
  const { source } = command;
  const given: unknown =
    source.kind === 'preset' ? presetInput(galleryPreset(source.id)) : readJson(source.path);
  return parseStripParameters(command.assignments.reduce(assignPath, given));
}
