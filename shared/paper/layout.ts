import type { LeadName } from '../parameters/sheet';
import type { SheetParameters } from '../parameters/strip-parameters';

/** A line of paper holds this many seconds unless told otherwise: the usual twelve-lead page (LD-30). */
export const usualLineS = 10;

/** Longest strip that is drawn; a longer one is cut, and the sheet says so. A render is refused beyond it. */
export const longestDrawnS = 300;

const limbColumns: readonly (readonly LeadName[])[] = [
  ['I', 'II', 'III'],
  ['aVR', 'aVL', 'aVF'],
];
const threeByFour: readonly (readonly LeadName[])[] = [
  ['I', 'aVR', 'V1', 'V4'],
  ['II', 'aVL', 'V2', 'V5'],
  ['III', 'aVF', 'V3', 'V6'],
];

/** Rhythm lead below 3 × 4 (LD-30, common practice). */
const oneRhythmLead: LeadName = 'II';
/** Rhythm leads below 3 × 4 (common practice, no source). */
const threeRhythmLeads: readonly LeadName[] = ['V1', 'II', 'V5'];

/**
 * The rows of a layout from top to bottom, each with its leads from left to right. The leads of a row share
 * its time in equal, consecutive parts, as on real paper. Orders: LD-30 (3 × 4), LD-32 (6 × 2).
 * `single` takes the first of `leads`, `stacked` all of them in the order given.
 */
export function leadRows(sheet: Pick<SheetParameters, 'layout' | 'leads'>): (readonly LeadName[])[] {
  switch (sheet.layout) {
    case 'single':
      return [[sheet.leads[0]]];
    case 'stacked':
      return sheet.leads.map((lead) => [lead]);
    case '3x4':
      return [...threeByFour];
    case '3x4+1':
      return [...threeByFour, [oneRhythmLead]];
    case '3x4+3':
      return [...threeByFour, ...threeRhythmLeads.map((lead) => [lead])];
    case '6x2':
      return limbColumns.flat().map((lead, i) => [lead, `V${i + 1}` as LeadName]);
    case '12x1':
      return threeByFour[0].flatMap((_, column) => threeByFour.map((row) => [row[column]]));
  }
}

/** A stretch of time. */
export interface TimeSpan {
  fromS: number;
  /** Not included. */
  toS: number;
}

/**
 * Lines of paper for a strip, at most `lineS` seconds each. Where every row is one lead, lines are full and the
 * last takes the rest; where leads share a row, the lines share the time in whole seconds, so that no column
 * becomes too short to hold a beat. A strip no longer than `lineS` is one line.
 */
export function lineSpans(
  sheet: Pick<SheetParameters, 'layout' | 'leads'>,
  durationS: number,
  lineS: number,
): TimeSpan[] {
  const count = Math.ceil(durationS / lineS);
  const shared = leadRows(sheet).some((leads) => leads.length > 1);
  const eachS = shared ? Math.min(lineS, Math.ceil(durationS / count)) : lineS;
  const spans: TimeSpan[] = [];
  for (let fromS = 0; fromS < durationS; fromS += eachS) {
    spans.push({ fromS, toS: Math.min(fromS + eachS, durationS) });
  }
  return spans;
}

/** One lead over one stretch of time, and its place on the sheet. */
export interface LeadSegment extends TimeSpan {
  lead: LeadName;
  /** Line of paper, from 0. */
  line: number;
  /** Row within the line, from 0. */
  row: number;
  /** Column within the row, from 0. */
  column: number;
}

/** Every segment of a sheet: line by line, row by row, column by column. */
export function leadSegments(
  sheet: Pick<SheetParameters, 'layout' | 'leads'>,
  durationS: number,
  lineS: number,
): LeadSegment[] {
  const rows = leadRows(sheet);
  return lineSpans(sheet, durationS, lineS).flatMap(({ fromS, toS }, line) =>
    rows.flatMap((leads, row) =>
      leads.map((lead, column) => ({
        lead,
        line,
        row,
        column,
        fromS: fromS + ((toS - fromS) * column) / leads.length,
        toS: fromS + ((toS - fromS) * (column + 1)) / leads.length,
      })),
    ),
  );
}
