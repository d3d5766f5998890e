import type { DrawingItem } from '../../../shared/paper/drawing';
import { colourValue, lineWeightsMm } from '../../../shared/paper/tokens';

/** Least width of a line on a screen by its weight on paper, px (look: conduction 1.6, stimulus 2.4). */
const leastPx = new Map<number, number>([
  [lineWeightsMm.ladderConduction, 1.6],
  [lineWeightsMm.ladderStimulus, 2.4],
  [lineWeightsMm.ladderSign, 1.4],
  [lineWeightsMm.ladderHatch, 0.8],
]);
const usualLeastPx = 1;

const families = { sans: '"IBM Plex Sans"', mono: '"IBM Plex Mono"' } as const;
const textAligns = { start: 'left', middle: 'center', end: 'right' } as const;

function trace(context: CanvasRenderingContext2D, points: Float64Array, pxPerMm: number): void {
  context.beginPath();
  for (let i = 0; i < points.length; i += 2) {
    context.lineTo(points[i] * pxPerMm, points[i + 1] * pxPerMm);
  }
}

/**
 * Paints items of a drawing, in their order; `pxPerMm` pixels to the millimetre. Lines are at least as wide as the look
 * asks for on a screen, or, where a page is shown in true proportion, at least `leastLinePx`.
 */
export function paintDrawing(
  context: CanvasRenderingContext2D,
  items: readonly DrawingItem[],
  pxPerMm: number,
  leastLinePx?: number,
): void {
  const width = (weightMm: number): number =>
    Math.max(leastLinePx ?? leastPx.get(weightMm) ?? usualLeastPx, weightMm * pxPerMm);
  context.lineJoin = 'round';
  for (const item of items) {
    switch (item.kind) {
      case 'line':
        context.beginPath();
        context.moveTo(item.x1Mm * pxPerMm, item.y1Mm * pxPerMm);
        context.lineTo(item.x2Mm * pxPerMm, item.y2Mm * pxPerMm);
        context.setLineDash(item.dashMm ? item.dashMm.map((mm) => mm * pxPerMm) : []);
        context.strokeStyle = colourValue(item.colour);
        context.lineWidth = width(item.weightMm);
        context.stroke();
        context.setLineDash([]);
        break;
      case 'polyline':
        trace(context, item.pointsMm, pxPerMm);
        context.strokeStyle = colourValue(item.colour);
        context.lineWidth = width(item.weightMm);
        context.stroke();
        break;
      case 'circle':
      case 'polygon':
        if (item.kind === 'circle') {
          context.beginPath();
          context.arc(item.cxMm * pxPerMm, item.cyMm * pxPerMm, item.radiusMm * pxPerMm, 0, 2 * Math.PI);
        } else {
          trace(context, item.pointsMm, pxPerMm);
          context.closePath();
        }
        if (item.fill) {
          context.fillStyle = colourValue(item.fill);
          context.fill();
        }
        if (item.stroke) {
          context.strokeStyle = colourValue(item.stroke);
          context.lineWidth = width(item.weightMm);
          context.stroke();
        }
        break;
      case 'rect':
        context.fillStyle = colourValue(item.fill);
        context.fillRect(
          item.xMm * pxPerMm,
          item.yMm * pxPerMm,
          item.widthMm * pxPerMm,
          item.heightMm * pxPerMm,
        );
        break;
      case 'text':
        context.fillStyle = colourValue(item.colour);
        context.font = `${item.weight} ${item.sizeMm * pxPerMm}px ${families[item.family]}`;
        context.textAlign = textAligns[item.anchor];
        context.textBaseline = 'alphabetic';
        context.letterSpacing = `${(item.trackingEm ?? 0) * item.sizeMm * pxPerMm}px`;
        context.fillText(item.text, item.xMm * pxPerMm, item.yMm * pxPerMm);
        context.textAlign = 'left';
        context.letterSpacing = '0px';
        break;
    }
  }
}
