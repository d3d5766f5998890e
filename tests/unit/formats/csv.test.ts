import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { csvHeader, stripCsvRows, stripToCsv } from '../../../shared/formats/csv';
import { leadNames, type LeadName } from '../../../shared/parameters/sheet';

/** A recording whose lead k holds whole half steps: (i * 7 + k * 3 − 40) of them at sample i. */
function quantised(resolutionUv: number, sampleRateHz: number, count = 50) {
  const halfSteps = (i: number, k: number) => i * 7 + k * 3 - 40;
  const leads = Object.fromEntries(
    leadNames.map((lead, k) => [
      lead,
      Float32Array.from({ length: count }, (_, i) => (halfSteps(i, k) * resolutionUv) / 2000),
    ]),
  ) as Record<LeadName, Float32Array>;
  return { strip: { sampleRateHz, resolutionUv, leads }, halfSteps };
}

const fieldsOf = (csv: string) =>
  csv
    .trimEnd()
    .split('\n')
    .slice(1)
    .map((line) => line.split(','));

describe('strip CSV', () => {
  it('starts with the agreed header and has one row a sample', () => {
    const csv = stripToCsv(quantised(5, 500).strip);
    expect(csv.split('\n')[0]).toBe('time_s,I,II,III,aVR,aVL,aVF,V1,V2,V3,V4,V5,V6');
    expect(csvHeader.split(',')).toHaveLength(13);
    expect(fieldsOf(csv)).toHaveLength(50);
    expect(csv.endsWith('\n')).toBe(true);
  });

  it.each([1, 2.5, 4.88, 5, 10])('gives every half step of %d µV back exactly', (resolutionUv) => {
    const { strip, halfSteps } = quantised(resolutionUv, 500);
    fieldsOf(stripToCsv(strip)).forEach((fields, i) => {
      fields.slice(1).forEach((field, k) => {
        // Exact: the decimal that was written is the double nearest to the same decimal computed in µV.
        const microvolts = Number((halfSteps(i, k) * resolutionUv * 0.5).toFixed(6));
        expect(Number(field)).toBe(Number((microvolts / 1000).toFixed(9)));
      });
    });
  });

  it('carries no digits of Float32 and no negative zero', () => {
    const { strip } = quantised(5, 500);
    strip.leads.I[0] = 0.0025;
    strip.leads.II[0] = -1e-9;
    const [first] = fieldsOf(stripToCsv(strip));
    expect(first.slice(0, 3)).toEqual(['0.000', '0.0025', '0.0000']);
    expect(first.every((field) => /^-?\d+\.\d{3,4}$/u.test(field))).toBe(true);
  });

  it.each([
    [250, '0.196'],
    [500, '0.098'],
    [1000, '0.049'],
    [2000, '0.0245'],
  ])('writes time at %i samples/s exactly', (sampleRateHz, last) => {
    const rows = fieldsOf(stripToCsv(quantised(5, sampleRateHz).strip));
    expect(Number(rows[0][0])).toBe(0);
    expect(rows[49][0]).toBe(last);
  });

  it('writes an empty field for a gap', () => {
    const { strip } = quantised(5, 500);
    strip.leads.V6[0] = NaN;
    expect(fieldsOf(stripToCsv(strip))[0][12]).toBe('');
  });

  it('is the same in pieces', () => {
    const { strip } = quantised(5, 500);
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 50 }), (cut) => {
        const pieces = stripCsvRows(strip, 0, cut) + stripCsvRows(strip, cut, 50);
        expect(`${csvHeader}\n${pieces}`).toBe(stripToCsv(strip));
      }),
    );
  });
});
