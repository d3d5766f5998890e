import { zipSync } from 'fflate';
import { mostArchivePages, type SheetDpi, type SheetFormat } from '../../shared/api/sheets';
import { renderStrip } from '../../shared/engine/render';
import { printedDay } from '../../shared/paper/dates';
import type { SheetDocument, SheetPage } from '../../shared/paper/pages/sheet-document';
import { layoutSheetPages } from '../../shared/paper/pages/sheet-pages';
import type { PageSetup } from '../../shared/parameters/page-setup';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import { sheetPdf } from '../exports/sheet-pdf';
import { sheetPagePng, sheetPageSvg } from '../exports/sheet-pictures';
import { releasePixels } from './release-pixels';

/** A strip to print and the words that go with it. */
export interface SheetTaskStrip {
  parameters: StripParameters;
  title: string;
  teachingPoint: string;
}

export interface SheetTask {
  strips: SheetTaskStrip[];
  setup: PageSetup;
  format: SheetFormat;
  /** From 1; null for all pages. */
  page: number | null;
  /** Of PNG. */
  dpi: SheetDpi;
  organisation: string;
  madeAt: Date;
}

export type SheetFile =
  | { ok: true; bytes: Uint8Array<ArrayBuffer>; title: string; zipped: boolean }
  /** The document has only so many pages, or too many for an archive. */
  | { ok: false; pages: number; mostPages?: number };

async function picture(page: SheetPage, { format, dpi }: SheetTask): Promise<Uint8Array> {
  if (format === 'svg') return new TextEncoder().encode(sheetPageSvg(page));
  const png = sheetPagePng(page, dpi);
  await releasePixels();
  return png;
}

/** The ZIP clock is local time: the local moment whose fields are those of UTC, so that every machine packs alike. */
function archiveTime(at: Date): Date {
  return new Date(
    at.getUTCFullYear(),
    at.getUTCMonth(),
    at.getUTCDate(),
    at.getUTCHours(),
    at.getUTCMinutes(),
    at.getUTCSeconds(),
  );
}

/** One picture a page; a PNG is packed already. */
async function archive(pages: readonly SheetPage[], task: SheetTask): Promise<Uint8Array> {
  const digits = String(pages.length).length;
  const names = pages.map((_, i) => `page-${String(i + 1).padStart(digits, '0')}.${task.format}`);
  const files: Record<string, Uint8Array> = {};
  for (const [i, page] of pages.entries()) files[names[i]] = await picture(page, task);
  return zipSync(files, { level: task.format === 'png' ? 0 : 6, mtime: archiveTime(task.madeAt) });
}

function layOut({ strips, setup, organisation, madeAt }: SheetTask): SheetDocument {
  const subjects = strips.map(({ parameters, title, teachingPoint }, i) => ({
    strip: renderStrip(parameters),
    title,
    questionTitle: `Strip ${i + 1}`,
    teachingPoint,
  }));
  return layoutSheetPages(subjects, setup, { madeOn: printedDay(madeAt), organisation });
}

/** Renders the strips, lays them on pages and writes the file that was asked for. */
export default async function makeSheets(task: SheetTask): Promise<SheetFile> {
  const document = layOut(task);
  const { page, format, madeAt } = task;
  if (page !== null && page > document.pages.length) return { ok: false, pages: document.pages.length };
  const mostPages = mostArchivePages[task.dpi];
  if (format === 'png' && page === null && document.pages.length > mostPages) {
    return { ok: false, pages: document.pages.length, mostPages };
  }
  const pages = page === null ? document.pages : [document.pages[page - 1]];
  const zipped = format !== 'pdf' && page === null;
  const made =
    format === 'pdf'
      ? await sheetPdf({ ...document, pages }, { madeAt })
      : zipped
        ? await archive(pages, task)
        : await picture(pages[0], task);
  // In a buffer of its own, so that no other's is copied along to the thread that asked.
  return { ok: true, bytes: new Uint8Array(made), title: document.title, zipped };
}
