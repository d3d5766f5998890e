import { longestDrawnS, usualLineS, type TimeSpan } from '../layout';
import { sToMm, type PaperSpeedMmPerS } from '../paper-scale';
import type { RowSegment } from '../placed-segment';
import type { LeadCell } from './page-rows';

/** A line of paper: a stretch of time, and of rows shared by several leads the columns it holds. */
export interface PageLine extends TimeSpan {
  fromColumn: number;
  /** Not included. */
  toColumn: number;
  /** Time of a column, s; that of the line where rows are not shared. */
  columnS: number;
}

/** A strip cut into lines, and in sentences what that did to it. */
export interface LinePlan {
  lines: PageLine[];
  notes: string[];
}

/** Columns may lose this share of their usual time when that saves a line. */
const mostShortened = 0.1;
/** Columns end at whole twentieths of a second: 1.25 mm at 25 mm/s. */
const columnStepS = 0.05;
/** A last line shorter than this share of the others is avoided by making all alike. */
const leastLastShare = 0.25;

/** A time in seconds as short as it can be written. */
function seconds(timeS: number): string {
  return String(Number(timeS.toFixed(2)));
}

function spans(drawnS: number, eachS: number): TimeSpan[] {
  const out: TimeSpan[] = [];
  for (let fromS = 0; fromS < drawnS - 1e-9; fromS += eachS) {
    out.push({ fromS, toS: Math.min(fromS + eachS, drawnS) });
  }
  return out;
}

/** Rows of one lead: full lines of whole seconds, or even ones where the last would be a stub. */
function linesOfOneLead(drawnS: number, lineS: number): LinePlan {
  const fullS = drawnS <= lineS + 1e-9 ? drawnS : Math.max(1, Math.floor(lineS + 1e-9));
  const count = Math.ceil(drawnS / fullS - 1e-9);
  const lastS = drawnS - (count - 1) * fullS;
  const eachS = lastS < leastLastShare * fullS ? Math.ceil(drawnS / count) : fullS;
  const lines = spans(drawnS, eachS).map((span) => ({
    ...span,
    fromColumn: 0,
    toColumn: 1,
    columnS: span.toS - span.fromS,
  }));
  const notes = lines.length > 1 ? [`Continued on ${lines.length} lines, ${seconds(eachS)} s a line.`] : [];
  return { lines, notes };
}

/** Columns of one span broken into lines of as many whole columns as fit. */
function brokenSpan(span: TimeSpan, columns: number, lineS: number): PageLine[] {
  const columnS = (span.toS - span.fromS) / columns;
  const perLine = Math.min(columns, Math.max(1, Math.floor(lineS / columnS + 1e-6)));
  const lines: PageLine[] = [];
  for (let fromColumn = 0; fromColumn < columns; fromColumn += perLine) {
    const toColumn = Math.min(columns, fromColumn + perLine);
    const fromS = span.fromS + fromColumn * columnS;
    lines.push({ fromS, toS: span.fromS + toColumn * columnS, fromColumn, toColumn, columnS });
  }
  return lines;
}

/** Longest time of a column: the usual one, less where it does not fit, or where a little less saves a line. */
function longestColumnS(columns: number, lineS: number): number {
  const usualS = usualLineS / columns;
  if (lineS < usualS) return lineS;
  const whole = Math.floor(lineS / usualS + 1e-9);
  const squeezed = Math.min(columns, Math.floor(lineS / (usualS * (1 - mostShortened)) + 1e-9));
  return Math.ceil(columns / squeezed) < Math.ceil(columns / whole) ? lineS / squeezed : usualS;
}

function columnNotes(
  lines: readonly PageLine[],
  columns: number,
  systems: number,
  drawnS: number,
  lostS: number,
): string[] {
  const { columnS, fromColumn, toColumn } = lines[0];
  const notes: string[] = [];
  const shortened = columnS < Math.min(usualLineS, drawnS) / columns - 1e-9;
  if (shortened) notes.push(`Columns are shortened to ${seconds(columnS)} s a lead to keep true scale.`);
  if (lostS > 0) notes.push(`The last ${seconds(lostS)} s are not drawn.`);
  if (systems > 1) notes.push(`Continued on ${systems} blocks of ${seconds(columnS * columns)} s.`);
  if (toColumn - fromColumn < columns) {
    const held = toColumn - fromColumn;
    notes.push(`Rows are wrapped to keep true scale: ${held} of ${columns} columns a line.`);
  }
  return notes;
}

/** Rows shared by several leads: blocks of at most 10 s, broken between columns where a line cannot hold them all. */
function linesOfColumns(columns: number, drawnS: number, lineS: number): LinePlan {
  const longestS = Math.floor(longestColumnS(columns, lineS) / columnStepS + 1e-6) * columnStepS * columns;
  const cutS = drawnS > longestS && drawnS <= usualLineS && longestS >= usualLineS * (1 - mostShortened);
  const shownS = cutS ? longestS : drawnS;
  const count = Math.ceil(shownS / (shownS <= longestS ? longestS : Math.floor(longestS)) - 1e-9);
  const blocks = spans(shownS, count === 1 ? shownS : Math.ceil(shownS / count));
  const lines = blocks.flatMap((span) => brokenSpan(span, columns, lineS));
  return { lines, notes: columnNotes(lines, columns, blocks.length, drawnS, drawnS - shownS) };
}

/**
 * Lines of paper of at most `lineS` seconds each for a strip of `durationS`. Nothing is squeezed: where the paper is
 * too narrow, rows go on below. At most the first `longestDrawnS` seconds are drawn.
 */
export function planLines(
  rows: readonly (readonly LeadCell[])[],
  durationS: number,
  lineS: number,
): LinePlan {
  const drawnS = Math.min(durationS, longestDrawnS);
  const columns = Math.max(...rows.map((row) => row.length));
  const plan = columns > 1 ? linesOfColumns(columns, drawnS, lineS) : linesOfOneLead(drawnS, lineS);
  if (drawnS === durationS) return plan;
  const cut = `Only the first ${seconds(drawnS)} s of ${seconds(durationS)} s are drawn.`;
  return { lines: plan.lines, notes: [cut, ...plan.notes] };
}

/** The segments of one row on one line, with x from the left edge of the grid. */
export function lineSegments(
  cells: readonly LeadCell[],
  at: { line: PageLine; lineIndex: number; row: number; traceXMm: number; speedMmPerS: PaperSpeedMmPerS },
): RowSegment[] {
  const { line, lineIndex, row, traceXMm, speedMmPerS } = at;
  const shared = cells.length > 1;
  const drawn = shared ? cells.slice(line.fromColumn, line.toColumn) : cells;
  const eachS = shared ? line.columnS : line.toS - line.fromS;
  return drawn.map((cell, column) => {
    const fromS = line.fromS + column * eachS;
    return {
      ...cell,
      line: lineIndex,
      row,
      column,
      fromS,
      toS: fromS + eachS,
      xMm: traceXMm + sToMm(column * eachS, speedMmPerS),
      widthMm: sToMm(eachS, speedMmPerS),
    };
  });
}
