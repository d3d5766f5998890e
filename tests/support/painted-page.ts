import { readFileSync } from 'node:fs';
import { decodePng } from './png';
import { runReader } from './python';

/** 254 dots per inch are 10 pixels a millimetre. */
const dpi = 254;
export const pxPerMm = 10;

/** A page as poppler paints it, measured in millimetres from its upper left corner. */
export interface PaintedPage {
  widthMm: number;
  heightMm: number;
  /** x of every heavy vertical grid line between two x, measured along a stretch of blank paper. */
  heavyLinesMm(band: { topMm: number; bottomMm: number; leftMm: number; rightMm: number }): number[];
  /** Middle of the ink met when going down a column; NaN without ink. */
  inkFromTopMm(xMm: number, topMm: number, bottomMm: number): number;
  /** Lower edge of the lowest ink in a window. */
  lowestInkMm(window: { leftMm: number; rightMm: number; topMm: number; bottomMm: number }): number;
  /** Middle of the ink met when going right along a row. */
  inkFromLeftMm(yMm: number, leftMm: number, rightMm: number): number;
}

/** Luminance (ITU-R BT.601) below which a pixel is ink; grids and their tints are far lighter. */
const inkBelow = 128;

/** Paints a page (from 1) of a PDF with poppler's pdftoppm. */
export function paintPage(pdfPath: string, page: number, folder: string): PaintedPage {
  const root = `${folder}/page-${page}`;
  const number = String(page);
  runReader('/usr/bin/pdftoppm', [
    ...['-r', String(dpi), '-f', number, '-l', number, '-singlefile', '-png'],
    ...[pdfPath, root],
  ]);
  const { rgb, widthPx, heightPx } = decodePng(readFileSync(`${root}.png`));
  const light = (x: number, y: number): number => {
    const [r, g, b] = rgb(x, y);
    return 0.299 * r + 0.587 * g + 0.114 * b;
  };
  /** Middle of the first run of ink along `count` pixels, weighted by how dark they are. */
  const firstInk = (count: number, at: (i: number) => number): number => {
    let weight = 0;
    let sum = 0;
    for (let i = 0; i < count; i++) {
      const dark = 255 - at(i);
      if (dark > 255 - inkBelow) {
        sum += dark * (i + 0.5);
        weight += dark;
      } else if (weight > 0) break;
    }
    return sum / weight;
  };
  const px = (mm: number): number => Math.round(mm * pxPerMm);
  return {
    widthMm: widthPx / pxPerMm,
    heightMm: heightPx / pxPerMm,
    heavyLinesMm({ topMm, bottomMm, leftMm, rightMm }) {
      const darkness = (x: number): number => {
        let sum = 0;
        for (let y = px(topMm); y < px(bottomMm); y++) sum += 255 - light(x, y);
        return sum / (px(bottomMm) - px(topMm));
      };
      const columns = Array.from({ length: px(rightMm) - px(leftMm) }, (_, i) => darkness(px(leftMm) + i));
      const ground = [...columns].sort((a, b) => a - b)[columns.length >> 1];
      const found: number[] = [];
      const threshold = ground + (Math.max(...columns) - ground) * 0.5;
      for (let i = 1; i < columns.length - 1; i++) {
        if (columns[i] < threshold || columns[i] < columns[i - 1] || columns[i] <= columns[i + 1]) continue;
        const near = [i - 2, i - 1, i, i + 1, i + 2].filter((k) => k >= 0 && k < columns.length);
        const weights = near.map((k) => Math.max(0, columns[k] - ground));
        const total = weights.reduce((sum, weight) => sum + weight, 0);
        const middle = near.reduce((sum, k, j) => sum + (k + 0.5) * weights[j], 0) / total;
        found.push((px(leftMm) + middle) / pxPerMm);
      }
      return found;
    },
    inkFromTopMm: (xMm, topMm, bottomMm) =>
      (px(topMm) + firstInk(px(bottomMm) - px(topMm), (i) => light(px(xMm), px(topMm) + i))) / pxPerMm,
    lowestInkMm({ leftMm, rightMm, topMm, bottomMm }) {
      for (let y = px(bottomMm) - 1; y >= px(topMm); y--) {
        for (let x = px(leftMm); x < px(rightMm); x++) {
          if (light(x, y) < inkBelow) return (y + 1) / pxPerMm;
        }
      }
      return NaN;
    },
    inkFromLeftMm: (yMm, leftMm, rightMm) =>
      (px(leftMm) + firstInk(px(rightMm) - px(leftMm), (i) => light(px(leftMm) + i, px(yMm)))) / pxPerMm,
  };
}
