import { describe, expect, it } from 'vitest';
import { leadRows, leadSegments, lineSpans } from '../../../shared/paper/layout';
import { leadNames } from '../../../shared/parameters/sheet';
import type { SheetParameters } from '../../../shared/parameters/strip-parameters';

type Layout = SheetParameters['layout'];
const sheet = (layout: Layout, leads: SheetParameters['leads'] = ['II', 'V1']) => ({ layout, leads });
const layouts: Layout[] = ['single', 'stacked', '3x4', '3x4+1', '3x4+3', '6x2', '12x1'];

/** LD-30: twelve-lead print layout 3 × 4 plus rhythm, columns from left to right. */
const ld30 = {
  columns: [
    ['I', 'II', 'III'],
    ['aVR', 'aVL', 'aVF'],
    ['V1', 'V2', 'V3'],
    ['V4', 'V5', 'V6'],
  ],
  secondsPerColumn: 2.5,
  rhythm: ['II'],
};
/** LD-32: 6 × 2. */
const ld32 = {
  columns: [
    ['I', 'II', 'III', 'aVR', 'aVL', 'aVF'],
    ['V1', 'V2', 'V3', 'V4', 'V5', 'V6'],
  ],
  secondsPerColumn: 5,
};

function columnsOf(layout: Layout): string[][] {
  const shared = leadRows(sheet(layout)).filter((row) => row.length > 1);
  return shared[0].map((_, column) => shared.map((row) => row[column]));
}

describe('lead orders', () => {
  it.each(['3x4', '3x4+1', '3x4+3'] as const)('%s has the columns of LD-30', (layout) => {
    expect(columnsOf(layout)).toEqual(ld30.columns);
  });

  it('6x2 has the columns of LD-32', () => {
    expect(columnsOf('6x2')).toEqual(ld32.columns);
  });

  it('rhythm leads stand below: none, II, or V1, II and V5', () => {
    const below = (layout: Layout) => leadRows(sheet(layout)).slice(3);
    expect(below('3x4')).toEqual([]);
    expect(below('3x4+1')).toEqual([ld30.rhythm]);
    expect(below('3x4+3')).toEqual([['V1'], ['II'], ['V5']]);
  });

  it('12x1 lists the twelve leads; stacked the chosen ones in their order; single the first of them', () => {
    expect(leadRows(sheet('12x1'))).toEqual(leadNames.map((lead) => [lead]));
    expect(leadRows(sheet('stacked', ['V5', 'I']))).toEqual([['V5'], ['I']]);
    expect(leadRows(sheet('single', ['V5', 'I']))).toEqual([['V5']]);
  });
});

describe('time', () => {
  it('is 2.5 s a column in 3 × 4 and 5 s in 6 × 2 of a ten-second strip', () => {
    const columnS = (layout: Layout) => leadSegments(sheet(layout), 10, 10)[0].toS;
    expect(columnS('3x4+1')).toBe(ld30.secondsPerColumn);
    expect(columnS('6x2')).toBe(ld32.secondsPerColumn);
  });

  it.each(layouts)('%s: the columns of a row run on without gap or overlap, on every line', (layout) => {
    const segments = leadSegments(sheet(layout), 25, 10);
    const rows = new Map<number, typeof segments>();
    for (const segment of segments) rows.set(segment.row, [...(rows.get(segment.row) ?? []), segment]);
    for (const row of rows.values()) {
      expect(row[0].fromS).toBe(0);
      row.slice(1).forEach((segment, i) => expect(segment.fromS).toBeCloseTo(row[i].toS, 12));
      expect(row[row.length - 1].toS).toBeCloseTo(25, 12);
    }
  });

  it('lines of single leads are full and the last takes the rest', () => {
    expect(lineSpans(sheet('stacked'), 25, 10).map((span) => span.toS)).toEqual([10, 20, 25]);
  });

  it('lines of shared rows share the time in whole seconds', () => {
    expect(lineSpans(sheet('3x4'), 12, 10).map((span) => span.toS)).toEqual([6, 12]);
    expect(lineSpans(sheet('3x4'), 25, 10).map((span) => span.toS)).toEqual([9, 18, 25]);
  });

  it('a strip that fits is one line of its own length', () => {
    expect(lineSpans(sheet('3x4'), 2.5, 10)).toEqual([{ fromS: 0, toS: 2.5 }]);
    expect(lineSpans(sheet('single'), 10, 10)).toEqual([{ fromS: 0, toS: 10 }]);
  });
});
