import { describe, expect, it } from 'vitest';
import { encodePdf } from '../../../server/exports/strip-pdf';
import { sheetPagePng, sheetPageSvg } from '../../../server/exports/sheet-pictures';
import { InvalidInputError } from '../../../shared/errors';
import { renderStrip } from '../../../shared/engine/render';
import { nominalStart } from '../../../shared/formats/export-format';
import { decodePng } from '../../support/png';
import { sheetsOf, subjectOf } from '../../support/sheets';
import { buildStrip } from '../../support/strips';

const recording = renderStrip(buildStrip({ durationS: 2 }));
const [page] = sheetsOf([subjectOf(recording)], { layout: 'single', sheets: 'question' }).pages;

describe('pictures of a page', () => {
  // 297 × 210 mm (ISO 216) at dpi / 25.4 pixels a millimetre, whole pixels; width and height: PNG, 11.2.2.
  it.each([
    [150, 1754, 1240],
    [300, 3508, 2480],
    [600, 7016, 4961],
  ])('PNG at %i dpi: A4 in whole pixels', (dpi, wide, high) => {
    const png = sheetPagePng(page, dpi);
    expect([png.readUInt32BE(16), png.readUInt32BE(20)]).toEqual([wide, high]);
  });

  it('PNG notes its density', () => {
    expect(decodePng(sheetPagePng(page, 150)).pixelsPerM).toEqual([5906, 5906]);
  });

  it.each([0, 72, 151, 1200, NaN])('%d dpi is refused by name, value and what is allowed', (dpi) => {
    expect(() => sheetPagePng(page, dpi)).toThrow(InvalidInputError);
    expect(() => sheetPagePng(page, dpi)).toThrow(`dpi: ${dpi} is not allowed; allowed: 150, 300, 600`);
  });

  it('SVG is as large as the paper and tells no answer in its title', () => {
    const svg = sheetPageSvg(page);
    expect(svg).toContain('width="297mm" height="210mm" viewBox="0 0 297 210"');
    expect(svg).toContain('<title>Strip 1</title>');
    expect(svg).not.toContain('Ventricular pacing');
  });
});

describe('the sheet of a strip as PDF', () => {
  it('pages a long strip and warns of it', async () => {
    const long = renderStrip(buildStrip({ durationS: 90, sheet: { layout: '3x4+1' } }));
    const { files, warnings } = await encodePdf(long, { madeAt: nominalStart });
    expect(files.map(({ name, mediaType }) => [name, mediaType])).toEqual([['strip.pdf', 'application/pdf']]);
    expect(warnings).toContain('Continued on 9 blocks of 10 s.');
    expect(warnings).toContain('Goes on over 9 pages.');
  });
});
