import { gridColours, type GridTint } from '../../../shared/paper/tokens';
import type { ScreenScale } from './scale';

/** The part of the strip that is on the screen: px from the strip's left edge, and the canvas's size. */
export interface ScreenWindow {
  scrollPx: number;
  widthPx: number;
  heightPx: number;
}

function paintLines(
  context: CanvasRenderingContext2D,
  window: ScreenWindow,
  stepPx: number,
  colour: string,
  width: number,
): void {
  context.beginPath();
  for (let x = -(window.scrollPx % stepPx); x <= window.widthPx; x += stepPx) {
    context.moveTo(Math.round(x) + 0.5, 0);
    context.lineTo(Math.round(x) + 0.5, window.heightPx);
  }
  for (let y = 0; y <= window.heightPx; y += stepPx) {
    context.moveTo(0, Math.round(y) + 0.5);
    context.lineTo(window.widthPx, Math.round(y) + 0.5);
  }
  context.strokeStyle = colour;
  context.lineWidth = width;
  context.stroke();
}

/** Paper in true proportion: 1 mm and 5 mm lines over the ground. */
export function paintGrid(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  window: ScreenWindow,
  tint: GridTint,
): void {
  const { ground, minor, major } = gridColours[tint];
  context.fillStyle = ground;
  context.fillRect(0, 0, window.widthPx, window.heightPx);
  if (scale.pxPerMm >= 4) paintLines(context, window, scale.pxPerMm, minor, 1);
  paintLines(context, window, 5 * scale.pxPerMm, major, 1);
}
