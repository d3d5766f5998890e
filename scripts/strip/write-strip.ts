import { mkdtempSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { InvalidInputError } from '../../shared/errors';
import { renderStrip, type StripRecording } from '../../shared/engine/render';
import { csvHeader, stripCsvRows } from '../../shared/formats/csv';
import { drawingToSvg } from '../../shared/formats/svg';
import { layoutStripSheet } from '../../shared/paper/sheet';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import { svgToPng } from '../render/svg-to-png';
import type { StripFormat } from './command';

/** Resolution of PNG files, dots per inch. */
const pngDpi = 150;
/** Rows of CSV written at a time, so that long strips do not become one string. */
const csvRowsAtOnce = 50_000;
/** A picture of more than this would be metres long. */
const longestPictureS = 300;

function json(value: unknown): string {
  return `${JSON.stringify(value, null, 2)}\n`;
}

function* csvParts(recording: StripRecording): Generator<string> {
  yield `${csvHeader}\n`;
  const length = recording.leads.I.length;
  for (let from = 0; from < length; from += csvRowsAtOnce) {
    yield stripCsvRows(recording, from, Math.min(length, from + csvRowsAtOnce));
  }
}

function svg(recording: StripRecording): string {
  return drawingToSvg(layoutStripSheet(recording, recording.parameters.sheet));
}

/** Name and contents, in parts, of the file of each format. */
const files: Record<
  StripFormat,
  { name: string; parts: (recording: StripRecording) => Iterable<string | Buffer> }
> = {
  csv: { name: 'strip.csv', parts: csvParts },
  events: { name: 'events.json', parts: ({ events }) => [json(events)] },
  reading: { name: 'reading.json', parts: ({ reading }) => [json(reading)] },
  svg: { name: 'strip.svg', parts: (recording) => [svg(recording)] },
  png: { name: 'strip.png', parts: (recording) => [svgToPng(svg(recording), pngDpi)] },
};

function checkPictureLength(parameters: StripParameters, formats: readonly StripFormat[]): void {
  const picture = formats.find((format) => format === 'svg' || format === 'png');
  if (!picture || parameters.durationS <= longestPictureS) return;
  throw new InvalidInputError([
    {
      path: 'durationS',
      value: String(parameters.durationS),
      allowed: `at most ${longestPictureS} s for ${picture}`,
    },
  ]);
}

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

/**
 * Renders a strip and writes its files. They are written beside their place and moved there when all are complete,
 * so nothing is left half-written.
 */
export function writeStrip(
  parameters: StripParameters,
  outDirectory: string,
  formats: readonly StripFormat[],
): void {
  checkPictureLength(parameters, formats);
  const unfinished = workingDirectory(outDirectory);
  try {
    const recording = renderStrip(parameters);
    for (const format of formats) {
      const { name, parts } = files[format];
      writeFileSync(join(unfinished, name), '');
      for (const part of parts(recording)) writeFileSync(join(unfinished, name), part, { flag: 'a' });
    }
    for (const format of formats) {
      const { name } = files[format];
      renameSync(join(unfinished, name), join(outDirectory, name));
    }
  } finally {
    rmSync(unfinished, { recursive: true, force: true });
  }
}
