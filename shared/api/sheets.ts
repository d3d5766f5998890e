import { z } from 'zod';
import { longestDrawnS } from '../paper/layout';
import { pageSetupSchema } from '../parameters/page-setup';
import { stripParametersSchema } from '../parameters/strip-parameters';
import { foldText, plainText, requiredText } from './text';
import { stripIdSchema } from './strip-id';

/** Strips in one document, at most. */
export const mostSheetStrips = 12;
/** Seconds that the strips of one document last together, at most: twelve strips of a minute. */
export const longestSheetsS = 720;

export const sheetFormats = ['pdf', 'svg', 'png'] as const;
export type SheetFormat = (typeof sheetFormats)[number];

/** Resolutions of a picture, dots per inch. */
export const sheetDpis = [150, 300, 600] as const;
export type SheetDpi = (typeof sheetDpis)[number];
export const usualSheetDpi: SheetDpi = 300;

/**
 * Pages in an archive of PNG, at most: what can be painted well within the time a document may take (measured: about
 * 0.3 s a page at 300 dots per inch). PDF and SVG have no such limit.
 */
export const mostArchivePages: Readonly<Record<SheetDpi, number>> = { 150: 200, 300: 100, 600: 30 };

/** A saved strip by its id, or parameters with the words that go with them. */
const sheetStripSchema = z
  .strictObject({
    stripId: stripIdSchema.optional(),
    parameters: stripParametersSchema.optional(),
    title: requiredText({
      label: 'Title',
      maxLength: 120,
      help: 'Not shown on a question sheet.',
    }).optional(),
    teachingPoint: plainText({
      label: 'Teaching point',
      maxLength: 500,
      help: 'Shown on an answer sheet.',
    }).optional(),
  })
  .refine((strip) => (strip.parameters === undefined) !== (strip.stripId === undefined), {
    params: { allowed: 'parameters or stripId, one of the two' },
    message: 'needs parameters or stripId, one of the two',
  })
  .refine(
    ({ stripId, title, teachingPoint }) =>
      stripId === undefined || (title === undefined && teachingPoint === undefined),
    {
      params: { allowed: 'title and teachingPoint beside parameters only: a saved strip has its own' },
      message: 'a saved strip has its own words',
    },
  );

/**
 * POST /api/sheets: strips on printed pages. PDF holds all pages, or only `page`; SVG and PNG are the picture of `page`,
 * or without it a ZIP archive with one of every page. `dpi` is that of PNG, 300 when absent.
 */
export const sheetsRequestSchema = z
  .strictObject({
    strips: z.array(sheetStripSchema).min(1).max(mostSheetStrips),
    setup: pageSetupSchema,
    format: z.enum(sheetFormats),
    page: z.number().int().min(1).max(1_000_000).optional(),
    dpi: z.literal(sheetDpis).optional(),
  })
  .refine(({ format, dpi }) => format === 'png' || dpi === undefined, {
    path: ['dpi'],
    params: { allowed: 'only with the format png' },
    message: 'only a PNG has a resolution',
  });
export type SheetsRequest = z.output<typeof sheetsRequestSchema>;
export type SheetsRequestInput = z.input<typeof sheetsRequestSchema>;

/** Whether the strips are short enough to be drawn; which is too long (its index), or all together. */
export function sheetLengthProblem(
  durationsS: readonly number[],
): { tooLong: number; durationS: number } | { tooLong: 'together'; durationS: number } | null {
  const index = durationsS.findIndex((durationS) => durationS > longestDrawnS);
  if (index >= 0) return { tooLong: index, durationS: durationsS[index] };
  const togetherS = durationsS.reduce((sum, durationS) => sum + durationS, 0);
  return togetherS > longestSheetsS ? { tooLong: 'together', durationS: togetherS } : null;
}

/** Longest stem of a file name, characters. */
const longestStem = 60;

/**
 * Plain name of a document's file: lower case, ASCII, no spaces. Made from the document's own title, which tells no
 * answer where there is a question sheet. `page` is null for all pages; `zipped` for an archive of pictures.
 */
export function sheetFileName(
  documentTitle: string,
  { format, page, zipped = false }: { format: SheetFormat; page: number | null; zipped?: boolean },
): string {
  const words = foldText(documentTitle).replace(/[^a-z0-9]+/gu, '-');
  const stem = words.slice(0, longestStem).replace(/^-+|-+$/gu, '') || 'sheet';
  const which = page === null ? '' : `-page-${page}`;
  return `${stem}${which}.${zipped ? `${format}.zip` : format}`;
}
