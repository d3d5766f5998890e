import { mkdtempSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { bundleExports } from '../../server/exports/bundle';
import { checkExport } from '../../server/exports/check-export';
import { exporters } from '../../server/exports/exporters';
import { InvalidInputError } from '../../shared/errors';
import { renderStrip, type StripRecording } from '../../shared/engine/render';
import { nominalStart, type ExportFormat, type ExportOptions } from '../../shared/formats/export-format';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import type { StripCommand } from './command';

const bundleName = 'strip.zip';

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

const options: ExportOptions = { madeAt: nominalStart };

interface Written {
  names: string[];
  warnings: string[];
}

/** Writes every file of the formats into `directory`. */
async function writeFiles(
  recording: StripRecording,
  directory: string,
  formats: readonly ExportFormat[],
): Promise<Written> {
  const written: Written = { names: [], warnings: [] };
  for (const format of formats) {
    const { files, warnings } = await exporters[format](recording, options);
    written.warnings.push(...warnings.map((warning) => `${format}: ${warning}`));
    for (const { name, parts } of files) {
      writeFileSync(join(directory, name), '');
      for (const part of parts) writeFileSync(join(directory, name), part, { flag: 'a' });
      written.names.push(name);
    }
  }
  return written;
}

/** Writes strip.zip into `directory`. */
async function writeBundle(
  recording: StripRecording,
  directory: string,
  formats: readonly ExportFormat[],
): Promise<Written> {
  const { bytes, manifest } = await bundleExports(recording, formats, options);
  writeFileSync(join(directory, bundleName), bytes);
  return {
    names: [bundleName],
    warnings: manifest.warnings.map(({ format, text }) => `${format}: ${text}`),
  };
}

/**
 * Renders a strip and writes its files, or one archive of them. They are written beside their place and moved there when
 * all are complete, so nothing is left half-written. Returns the exporters' warnings, each with its format.
 */
export async function writeStrip(
  parameters: StripParameters,
  { outDirectory, formats, bundle }: Pick<StripCommand, 'outDirectory' | 'formats' | 'bundle'>,
): Promise<string[]> {
  checkExport(parameters, formats);
  const unfinished = workingDirectory(outDirectory);
  try {
    const write = bundle ? writeBundle : writeFiles;
    const { names, warnings } = await write(renderStrip(parameters), unfinished, formats);
    for (const name of names) renameSync(join(unfinished, name), join(outDirectory, name));
    return warnings;
  } finally {
    rmSync(unfinished, { recursive: true, force: true });
  }
}
