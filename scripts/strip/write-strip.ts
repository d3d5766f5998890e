import { mkdtempSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { checkExport, exporters } from '../../server/exports/exporters';
import { InvalidInputError } from '../../shared/errors';
import { renderStrip } from '../../shared/engine/render';
import type { ExportFormat } from '../../shared/formats/export-format';
import type { StripParameters } from '../../shared/parameters/strip-parameters';

/** A new folder inside `outDirectory` for files that are not complete yet. Throws when the folder cannot be made. */
function workingDirectory(outDirectory: string): string {
  try {
    mkdirSync(outDirectory, { recursive: true });
    return mkdtempSync(join(outDirectory, '.unfinished-'));
  } catch (error) {
    const reason = (error as NodeJS.ErrnoException).code ?? 'unusable';
    throw new InvalidInputError([
      {
        path: '--out',
        value: `${JSON.stringify(outDirectory)} (${reason})`,
        allowed: 'a folder that can be written',
      },
    ]);
  }
}

/** Renders a strip and writes every file of the formats into `directory`. Returns their names, and the warnings. */
async function writeFiles(parameters: StripParameters, directory: string, formats: readonly ExportFormat[]) {
  const recording = renderStrip(parameters);
  const names: string[] = [];
  const warnings: string[] = [];
  for (const format of formats) {
    const result = await exporters[format](recording);
    warnings.push(...result.warnings.map((warning) => `${format}: ${warning}`));
    for (const { name, parts } of result.files) {
      writeFileSync(join(directory, name), '');
      for (const part of parts) writeFileSync(join(directory, name), part, { flag: 'a' });
      names.push(name);
    }
  }
  return { names, warnings };
}

/**
 * Renders a strip and writes its files. They are written beside their place and moved there when all are complete,
 * so nothing is left half-written. Returns the exporters' warnings, each with its format.
 */
export async function writeStrip(
  parameters: StripParameters,
  outDirectory: string,
  formats: readonly ExportFormat[],
): Promise<string[]> {
  checkExport(parameters, formats);
  const unfinished = workingDirectory(outDirectory);
  try {
    const { names, warnings } = await writeFiles(parameters, unfinished, formats);
    for (const name of names) renameSync(join(unfinished, name), join(outDirectory, name));
    return warnings;
  } finally {
    rmSync(unfinished, { recursive: true, force: true });
  }
}
