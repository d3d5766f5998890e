import type { SheetParameters } from '../../../shared/parameters/strip-parameters';

/** How time and voltage lie on the screen, CSS px. */
export interface ScreenScale {
  /** Whole px a mm at 100 %, so that grid lines are even. */
  pxPerMm: number;
  pxPerS: number;
  pxPerMv: number;
  /** Room left of 0 s for calibration pulse and lead name. */
  leftPx: number;
}

export const desktopPxPerMm = 5;
export const phonePxPerMm = 4;
/** 0 s lies this many mm from the left edge: a 5 mm pulse with air around it and the lead's name. */
const leftMm = 20;

export function screenScale(
  sheet: Pick<SheetParameters, 'speedMmPerS' | 'gainMmPerMv'>,
  basePxPerMm: number,
  zoom: number,
): ScreenScale {
  const pxPerMm = Math.max(2, Math.round(basePxPerMm * zoom));
  return {
    pxPerMm,
    pxPerS: pxPerMm * sheet.speedMmPerS,
    pxPerMv: pxPerMm * sheet.gainMmPerMv,
    leftPx: leftMm * pxPerMm,
  };
}

export function timeToPx(scale: ScreenScale, timeS: number): number {
  return scale.leftPx + timeS * scale.pxPerS;
}

export function pxToTime(scale: ScreenScale, px: number): number {
  return (px - scale.leftPx) / scale.pxPerS;
}
