import type { StripRecording } from '../../shared/engine/render';
import { nominalStart, type ExportOptions, type ExportResult } from '../../shared/formats/export-format';
import { printedDay } from '../../shared/paper/dates';
import { layoutSheetPages } from '../../shared/paper/pages/sheet-pages';
import { pageSetupOf, type PageSetup } from '../../shared/parameters/page-setup';
import { sheetPdf } from './sheet-pdf';

/** A plain sheet, or with the strip's own ladder where it asks for one. */
function setupOf({ parameters: { sheet } }: StripRecording): PageSetup {
  const setup = pageSetupOf(sheet);
  if (!sheet.ladder) return { ...setup, sheets: 'plain' };
  return { ...setup, sheets: 'answer', stimuliNamed: false, intervals: false, reading: false };
}

/**
 * The strip as its own sheet parameters say, on A4 landscape pages at true scale; what had to be wrapped or cut is told in
 * the warnings. A file that names no start of its own carries no date.
 */
export async function encodePdf(recording: StripRecording, { madeAt }: ExportOptions): Promise<ExportResult> {
  const madeOn = madeAt.getTime() === nominalStart.getTime() ? '' : printedDay(madeAt);
  const { title } = recording.parameters;
  const document = layoutSheetPages(
    [{ strip: recording, title, questionTitle: 'Strip', teachingPoint: '' }],
    setupOf(recording),
    { madeOn, organisation: '' },
  );
  const parts = [await sheetPdf(document, { madeAt })];
  const warnings = document.notes.map((note) => note.replace(/^Strip: /u, ''));
  return { files: [{ name: 'strip.pdf', mediaType: 'application/pdf', parts }], warnings };
}
