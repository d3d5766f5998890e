import type { StripRecording } from '../../shared/engine/render';
import { csvHeader, stripCsvRows } from '../../shared/formats/csv';
import type { Exporter, ExportFormat } from '../../shared/formats/export-format';
import { encodeEdf } from '../../shared/formats/edf/edf';
import { stripJson } from '../../shared/formats/strip-json';
import { drawingToSvg } from '../../shared/formats/svg';
import { encodeWav } from '../../shared/formats/wav';
import { encodeWfdb } from '../../shared/formats/wfdb/wfdb';
import type { Drawing } from '../../shared/paper/drawing';
import { layoutStripSheet } from '../../shared/paper/sheet';
import { encodeAecg } from './aecg/aecg';
import { encodeDicom } from './dicom/dicom';
import { encodePdf } from './strip-pdf';
import { drawingToSvgFile } from './svg-fonts';
import { svgToPng } from './svg-to-png';

/** Resolution of PNG files, dots per inch. */
const pngDpi = 150;
/** Rows of CSV made at a time. */
const csvRowsAtOnce = 50_000;

function json(value: unknown): string {
  return `${JSON.stringify(value, null, 2)}\n`;
}

/** Parts of a strip's CSV: the head, and rows a block at a time. */
function csvPartCount({ leads }: StripRecording): number {
  return 1 + Math.ceil(leads.I.length / csvRowsAtOnce);
}

function* csvParts(recording: StripRecording): Generator<string> {
  yield `${csvHeader}\n`;
  const length = recording.leads.I.length;
  for (let from = 0; from < length; from += csvRowsAtOnce) {
    yield stripCsvRows(recording, from, Math.min(length, from + csvRowsAtOnce));
  }
}

function sheetOf(recording: StripRecording): Drawing {
  return layoutStripSheet(recording, recording.parameters.sheet);
}

/** One file without warnings. */
function oneFile(name: string, mediaType: string, parts: Iterable<string | Uint8Array>, partCount?: number) {
  return { files: [{ name, mediaType, parts, partCount }], warnings: [] };
}

/** The exporter of every format; the one list that the command line and the server share. */
export const exporters: Readonly<Record<ExportFormat, Exporter>> = {
  csv: (recording) => oneFile('strip.csv', 'text/csv', csvParts(recording), csvPartCount(recording)),
  events: ({ events }) => oneFile('events.json', 'application/json', [json(events)]),
  reading: ({ reading }) => oneFile('reading.json', 'application/json', [json(reading)]),
  json: (recording) => oneFile('strip.json', 'application/json', [json(stripJson(recording))]),
  svg: (recording) => oneFile('strip.svg', 'image/svg+xml', [drawingToSvgFile(sheetOf(recording))]),
  png: (recording) => oneFile('strip.png', 'image/png', [svgToPng(drawingToSvg(sheetOf(recording)), pngDpi)]),
  pdf: encodePdf,
  edf: encodeEdf,
  wfdb: encodeWfdb,
  dicom: encodeDicom,
  aecg: encodeAecg,
  wav: encodeWav,
};
