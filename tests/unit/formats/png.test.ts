import { beforeAll, describe, expect, it } from 'vitest';
import { svgToPng } from '../../../server/exports/svg-to-png';
import { drawingToSvg } from '../../../shared/formats/svg';
import { layoutStripSheet, type StripSheet } from '../../../shared/paper/sheet';
import { parseStripParameters } from '../../../shared/parameters/parse';
import { decodePng, type DecodedPng } from '../../support/png';
import { stripOf } from '../paper/synthetic-strip';

// 254 dpi is 10 px/mm, so that every grid line and baseline falls on whole pixels.
const dpi = 254;
const pxPerMm = 10;

/** Sum of darkness over a window: 0 for white. */
function darkness(image: DecodedPng, xPx: number, yPx: number): number {
  return 765 - image.rgb(xPx, yPx).reduce((sum, value) => sum + value, 0);
}

describe('PNG of a flat strip at 254 dpi', () => {
  let sheet: StripSheet;
  let image: DecodedPng;
  beforeAll(() => {
    const parameters = parseStripParameters({ durationS: 4, sheet: { layout: 'single' } });
    sheet = layoutStripSheet(
      stripOf(() => 0, { durationS: 4 }),
      parameters.sheet,
    );
    image = decodePng(svgToPng(drawingToSvg(sheet), dpi));
  }, 60_000);

  it('is 10 px to the millimetre and says so', () => {
    expect([image.widthPx, image.heightPx]).toEqual([sheet.widthMm * pxPerMm, sheet.heightMm * pxPerMm]);
    expect(image.pixelsPerM).toEqual([10_000, 10_000]);
    expect(image.chunks.map((chunk) => chunk.type).slice(0, 3)).toEqual(['IHDR', 'pHYs', 'tEXt']);
    expect(image.chunks.every((chunk) => chunk.crcHolds)).toBe(true);
  });

  /** Middle of each heavy and fine line across a stretch of bare paper, px from its edge, by local darkness. */
  function linesAlong(length: number, darknessAt: (offsetPx: number) => number): number[] {
    const ground = darknessAt(5);
    const found: number[] = [];
    for (let mm = 1; mm < length; mm++) {
      let weight = 0;
      let moment = 0;
      for (let px = mm * pxPerMm - 4; px < mm * pxPerMm + 4; px++) {
        const dark = Math.max(0, darknessAt(px) - ground);
        weight += dark;
        moment += dark * (px + 0.5);
      }
      found.push(moment / weight);
    }
    return found;
  }

  it('has grid lines 10 px apart, to a twentieth of a pixel, both ways', () => {
    const left = sheet.grid.xMm * pxPerMm;
    const top = sheet.grid.yMm * pxPerMm;
    // Bare paper: a row of pixels half a millimetre below the upper edge, a column right of the left edge.
    const across = linesAlong(sheet.grid.widthMm, (px) => darkness(image, left + px, top + 5));
    const down = linesAlong(sheet.grid.heightMm, (px) => darkness(image, left + 5, top + px));
    across.forEach((middle, i) => expect(Math.abs(middle - (i + 1) * pxPerMm)).toBeLessThan(0.05));
    down.forEach((middle, i) => expect(Math.abs(middle - (i + 1) * pxPerMm)).toBeLessThan(0.05));
  });

  it('has a calibration pulse 50 px wide and 100 px high', () => {
    const ink = 400;
    const left = (sheet.grid.xMm + 5) * pxPerMm;
    const base = sheet.segments[0].baselineMm * pxPerMm;
    const middleOf = (from: number, darknessAt: (px: number) => number): number => {
      const dark = Array.from({ length: 12 }, (_, i) => from - 6 + i).filter((px) => darknessAt(px) > ink);
      return dark.reduce((sum, px) => sum + px + 0.5, 0) / dark.length;
    };
    const rising = middleOf(left, (px) => darkness(image, px, base - 55));
    const falling = middleOf(left + 50, (px) => darkness(image, px, base - 55));
    const top = middleOf(base - 100, (px) => darkness(image, left + 25, px));
    const foot = middleOf(base, (px) => darkness(image, left + 55, px));
    expect(falling - rising).toBeCloseTo(50, 6);
    expect(foot - top).toBeCloseTo(100, 6);
  });

  it('sets its texts: the title leaves ink where it stands', () => {
    const title = sheet.items.find((item) => item.kind === 'text' && item.role === 'title');
    if (title?.kind !== 'text') throw new Error('The sheet has no title');
    let dark = 0;
    for (let x = title.xMm * pxPerMm; x < (title.xMm + 20) * pxPerMm; x++) {
      for (let y = Math.round((title.yMm - 4) * pxPerMm); y < title.yMm * pxPerMm; y++) {
        if (darkness(image, x, y) > 400) dark++;
      }
    }
    // A semibold line of type covers a fifth to a half of its box.
    expect(dark / (200 * 40)).toBeGreaterThan(0.15);
    expect(dark / (200 * 40)).toBeLessThan(0.6);
  });
});
