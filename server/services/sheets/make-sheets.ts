import {
  longestSheetsS,
  sheetFileName,
  sheetLengthProblem,
  usualSheetDpi,
  type SheetDpi,
  type SheetsRequest,
} from '../../../shared/api/sheets';
import { untitled } from '../../../shared/paper/header';
import { longestDrawnS } from '../../../shared/paper/layout';
import { invalidInput, type AppError } from '../../errors';
import type { Database } from '../../models/database';
import type { SheetTaskStrip } from '../../workers/sheet-worker';
import type { Account } from '../session/account';
import { getStrip } from '../strips/keep-strips';
import { readKeptParameters } from '../strips/kept-parameters';
import type { SheetPool } from './sheet-pool';

export interface SheetDependencies {
  database: Database;
  sheetPool: SheetPool;
  now: () => Date;
}

export interface MadeSheets {
  fileName: string;
  mediaType: string;
  bytes: Uint8Array<ArrayBuffer>;
}

type RequestStrip = SheetsRequest['strips'][number];

const mediaTypes = { pdf: 'application/pdf', svg: 'image/svg+xml', png: 'image/png' } as const;

async function wantedStrip(
  database: Database,
  account: Account,
  { stripId, parameters, title, teachingPoint = '' }: RequestStrip,
): Promise<SheetTaskStrip> {
  if (parameters) return { parameters, title: title ?? (parameters.title || untitled), teachingPoint };
  const strip = await getStrip(database, account, stripId ?? '');
  return {
    parameters: readKeptParameters(strip),
    title: strip.title,
    teachingPoint: strip.teachingPoint,
  };
}

/** Refuses strips that are longer than a sheet draws, one or all together, naming where it was asked for. */
function mustBeShort(asked: readonly RequestStrip[], strips: readonly SheetTaskStrip[]): void {
  const problem = sheetLengthProblem(strips.map(({ parameters }) => parameters.durationS));
  if (!problem) return;
  const { tooLong, durationS } = problem;
  if (tooLong === 'together') {
    const allowed = `strips of at most ${longestSheetsS} s together`;
    throw invalidInput([{ path: 'strips', value: `${durationS} s together`, allowed }]);
  }
  const stripId = asked[tooLong].stripId;
  throw invalidInput([
    {
      path: `strips.${tooLong}.${stripId === undefined ? 'parameters.durationS' : 'stripId'}`,
      value: stripId === undefined ? String(durationS) : `${stripId}, which lasts ${durationS} s`,
      allowed: stripId === undefined ? `1 to ${longestDrawnS} s` : `a strip of 1 to ${longestDrawnS} s`,
    },
  ]);
}

/** The refusal of a page that is not there, or of all pages where they are too many for an archive. */
function wrongPage(
  page: number | null,
  dpi: SheetDpi,
  { pages, mostPages }: { pages: number; mostPages?: number },
): AppError {
  const there = pages === 1 ? '1: the document has one page' : `1 to ${pages}`;
  const tooMany = `${there}; all pages at once up to ${mostPages} at ${dpi} dpi`;
  const allowed = mostPages === undefined ? there : tooMany;
  return invalidInput([{ path: 'page', value: page === null ? 'missing' : String(page), allowed }]);
}

/**
 * Strips on pages as a file, rendered in a worker thread. Throws `notFound` for a strip the account may not see,
 * `invalidInput` for strips that are too long and for a page that is not there, and what `SheetPool.make` throws.
 */
export async function makeSheets(
  { database, sheetPool, now }: SheetDependencies,
  account: Account,
  request: SheetsRequest,
  signal: AbortSignal,
): Promise<MadeSheets> {
  const strips = await Promise.all(request.strips.map((strip) => wantedStrip(database, account, strip)));
  mustBeShort(request.strips, strips);
  const { setup, format, page = null, dpi = usualSheetDpi } = request;
  const { organisation } = account;
  const made = await sheetPool.make(
    { strips, setup, format, page, dpi, organisation, madeAt: now() },
    signal,
  );
  if (!made.ok) throw wrongPage(page, dpi, made);
  const { bytes, title, zipped } = made;
  return {
    fileName: sheetFileName(title, { format, page, zipped }),
    mediaType: zipped ? 'application/zip' : mediaTypes[format],
    bytes,
  };
}
