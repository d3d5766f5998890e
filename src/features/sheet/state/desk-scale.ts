import { cssPxToMm } from '../../../../shared/paper/paper-scale';
import { desktopPxPerMm } from '../../../lib/canvas/scale';

/** The whole page, or close enough to read it like print. */
export type DeskView = 'whole' | 'close';

/** A page is shown no higher than this, CSS px, so that most of an upright one is seen at once. */
const mostHeightPx = 900;
/**
 * From here on 1 mm lines are drawn, and every millimetre gets the same whole number of device pixels; not on a small
 * screen, where size matters more.
 */
const leastWholePx = 3;
const smallDeskPx = 480;

/**
 * CSS pixels a millimetre for a page on a desk of `roomPx`: whole device pixels where the 1 mm grid is drawn (so that
 * its lines are even), otherwise as large as fits.
 */
export function deskScale(
  view: DeskView,
  { widthMm, heightMm }: { widthMm: number; heightMm: number },
  roomPx: number,
  deviceRatio: number,
): number {
  if (view === 'close') return desktopPxPerMm;
  const fits = Math.min(roomPx / widthMm, mostHeightPx / heightMm);
  const devicePx = Math.floor(fits * deviceRatio);
  return devicePx >= leastWholePx && roomPx > smallDeskPx ? devicePx / deviceRatio : fits;
}

/** Size on a screen of 96 CSS pixels to the inch beside that on paper, whole per cent. */
export function percentOf(pxPerMm: number): number {
  return Math.round(pxPerMm * cssPxToMm(1) * 100);
}
