import { describe, expect, it } from 'vitest';
import type { Conformance } from '../../../shared/recorder-bench/conformance';
import { fails, measureConformance } from '../../../shared/recorder-bench/conformance';
import { builtInSettings } from '../../../shared/recorder-bench/built-in-settings';
import { conformanceCsv, conformanceText, marginWords, summary } from '../../../shared/recorder-bench/report';

const origin = { madeOn: '2026-12-01', productVersion: '1.2.3', engineVersion: '4.5.6' };

/** A reader of RFC 4180, written here. */
function csvRows(text: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  const pattern = /("(?:[^"]|"")*"|[^",\r\n]*)(,|\r\n)/gu;
  for (const [, field, end] of text.matchAll(pattern)) {
    row.push(field.startsWith('"') ? field.slice(1, -1).replaceAll('""', '"') : field);
    if (end === ',') continue;
    rows.push(row);
    row = [];
  }
  return rows;
}

describe('the conformance report', () => {
  const conformance = measureConformance([builtInSettings.monitor, builtInSettings.diagnostic]);
  const text = conformanceText(conformance, origin);
  const [header, ...rows] = csvRows(conformanceCsv(conformance, origin));
  const column = (name: string): string[] => rows.map((row) => row[header.indexOf(name)]);

  it('is a table of one row for each requirement and setting, with versions and day', () => {
    expect(rows).toHaveLength(2 * conformance.rows.length);
    expect(new Set(rows.map((row) => row.length))).toEqual(new Set([header.length]));
    expect(new Set(column('made_on'))).toEqual(new Set(['2026-12-01']));
    expect(new Set(column('product_version'))).toEqual(new Set(['1.2.3']));
    expect(new Set(column('engine_version'))).toEqual(new Set(['4.5.6']));
    expect(column('source').every((source) => source.length > 5)).toBe(true);
  });

  it('says of every row whether it is met, failed or not claimed, and why it is not', () => {
    const verdicts = column('verdict');
    const expected = conformance.rows.flatMap(({ findings }) =>
      findings.map(({ verdict }) => ({ met: 'met', failed: 'FAILED', notClaimed: 'not claimed' })[verdict]),
    );
    expect(verdicts).toEqual(expected);
    column('reason').forEach((reason, i) => {
      expect(reason === '').toBe(verdicts[i] !== 'not claimed');
    });
    // A monitor is not meant to pass 150 Hz: it must not count as passed.
    const monitor = conformance.rows.map(({ findings }) => findings[0].verdict);
    expect(monitor).toContain('notClaimed');
  });

  it('judges by the figures that it prints', () => {
    column('margin_of_limit').forEach((margin, i) => {
      if (margin === '' || column('verdict')[i] === 'not claimed') return;
      expect(column('verdict')[i] === 'FAILED').toBe(Number(margin) < 0);
    });
  });

  it('keeps commas, quotes and line breaks in one field', () => {
    const [row] = conformance.rows;
    const applied = 'a "peak", then\r\nnothing';
    const odd: Conformance = { ...conformance, rows: [{ ...row, applied }] };
    expect(csvRows(conformanceCsv(odd, origin))[1][1]).toBe(applied);
  });

  it('counts in its last lines what each setting meets of what it claims', () => {
    expect(text.trimEnd().endsWith(summary(conformance))).toBe(true);
    expect(text).toContain('Made on 2026-12-01 with Paceloom 1.2.3, engine 4.5.6');
    expect([0, 1].map((setting) => fails(conformance, setting))).toEqual([false, false]);
  });

  it('says in words how much of a limit is left', () => {
    expect(marginWords(null)).toBe('');
    expect(marginWords(0.62)).toBe('62 % of the limit left');
    expect(marginWords(-0.27)).toBe('beyond the limit by 27 %');
    expect(marginWords(1.94)).toBe('100 % of the limit left');
    expect(marginWords(0.004)).toBe('0.4 % of the limit left');
  });
});
