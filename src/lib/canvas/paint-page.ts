import type { Drawing, LineItem } from '../../../shared/paper/drawing';
import { colourValue } from '../../../shared/paper/tokens';
import { paintDrawing } from './paint-drawing';

/** Below this many pixels a millimetre the 1 mm lines would run together and are left out. */
const leastMinorPxPerMm = 3;
/** Below this many pixels a millimetre even the 5 mm lines, a pixel wide, would outweigh the traces; they are paler then. */
const leastFullPxPerMm = 2;
const paleAlpha = 0.45;
/** Thinnest line of a page in true proportion, px: still seen in a thumbnail. */
const leastLinePx = 0.7;

/** A line of the grid on whole pixels, so that all of them look alike. */
function paintGridLine(context: CanvasRenderingContext2D, line: LineItem, pxPerMm: number): void {
  const widthPx = Math.max(1, Math.round(line.weightMm * pxPerMm));
  const snap = (mm: number): number => Math.round(mm * pxPerMm - widthPx / 2);
  const upright = line.x1Mm === line.x2Mm;
  const x = upright ? snap(line.x1Mm) : line.x1Mm * pxPerMm;
  const y = upright ? line.y1Mm * pxPerMm : snap(line.y1Mm);
  context.fillStyle = colourValue(line.colour);
  context.globalAlpha = pxPerMm < leastFullPxPerMm ? paleAlpha : 1;
  context.fillRect(
    x,
    y,
    upright ? widthPx : (line.x2Mm - line.x1Mm) * pxPerMm,
    upright ? (line.y2Mm - line.y1Mm) * pxPerMm : widthPx,
  );
  context.globalAlpha = 1;
}

/** Paints a page of paper in true proportion, `pxPerMm` pixels of the canvas to the millimetre. */
export function paintPage(
  context: CanvasRenderingContext2D,
  { items }: Pick<Drawing, 'items'>,
  pxPerMm: number,
): void {
  for (const item of items) {
    if (item.kind !== 'line' || (item.role !== 'gridMinor' && item.role !== 'gridMajor')) {
      paintDrawing(context, [item], pxPerMm, leastLinePx);
    } else if (item.role === 'gridMajor' || pxPerMm >= leastMinorPxPerMm) {
      paintGridLine(context, item, pxPerMm);
    }
  }
}

/** A page as a picture on a canvas of its own. */
export function pagePicture(page: Drawing, pxPerMm: number): HTMLCanvasElement {
  const canvas = document.createElement('canvas');
  canvas.width = Math.round(page.widthMm * pxPerMm);
  canvas.height = Math.round(page.heightMm * pxPerMm);
  const context = canvas.getContext('2d');
  if (!context) throw new Error('no canvas');
  paintPage(context, page, pxPerMm);
  return canvas;
}
