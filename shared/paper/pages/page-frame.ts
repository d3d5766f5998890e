import type { PageSetup } from '../../parameters/page-setup';
import { calibrationFootMm, calibrationWidthMm } from '../calibration';
import { largeBoxMm } from '../paper-scale';
import { paperGapMm, traceInsetMm } from '../placed-segment';

/** Width and height of a sheet held upright, mm: ISO 216 A4, and ANSI/ASME Y14.1 A (8.5 × 11 in). */
const paperSizesMm = { a4: [210, 297], letter: [215.9, 279.4] } as const;

/** Printers leave up to a quarter of an inch blank; nothing is drawn closer to the edge at the sides, mm. */
export const leastSideMarginMm = 8;
/** Free paper above and below, mm. */
const endMarginMm = 10;
/** Ten seconds at 25 mm/s, five at 50: what a line holds wherever the paper is wide enough (BW-70). */
const fullLineMm = 250;
/** Left of the pulse where paper is short, mm; elsewhere a large box. */
const tightGapMm = 2;
/** Sides are whole tenths, so that the grid falls on whole pixels at 254 dpi. */
const stepsPerMm = 10;

/** Where things lie on every page of a document. */
export interface PageFrame {
  widthMm: number;
  heightMm: number;
  /** Left edge of grids and texts, and how wide they are; the width is whole large boxes. */
  xMm: number;
  contentWidthMm: number;
  topMm: number;
  bottomMm: number;
  /** From the left edge of a grid: where pulses rise and where traces start. */
  pulseXMm: number;
  traceXMm: number;
  /** Longest line of trace, s. */
  lineS: number;
}

interface Across {
  contentWidthMm: number;
  pulseXMm: number;
  traceXMm: number;
  lineMm: number;
}

function across(roomMm: number, speedMmPerS: PageSetup['speedMmPerS']): Across {
  const inset = traceInsetMm(speedMmPerS);
  const usualMm = inset + fullLineMm + paperGapMm;
  if (usualMm <= roomMm) {
    return { contentWidthMm: usualMm, pulseXMm: paperGapMm, traceXMm: inset, lineMm: fullLineMm };
  }
  const contentWidthMm = Math.floor(roomMm / largeBoxMm) * largeBoxMm;
  const pulseEndMm = tightGapMm + calibrationWidthMm(speedMmPerS) + calibrationFootMm;
  const traceXMm = Math.ceil(pulseEndMm / largeBoxMm) * largeBoxMm;
  const lineMm = Math.min(fullLineMm, contentWidthMm - traceXMm);
  return { contentWidthMm, pulseXMm: tightGapMm, traceXMm, lineMm };
}

/** The frame of a page: as wide a line of trace as the paper holds between its margins, at most 250 mm. */
export function pageFrame(setup: Pick<PageSetup, 'paper' | 'orientation' | 'speedMmPerS'>): PageFrame {
  const [shortMm, longMm] = paperSizesMm[setup.paper];
  const upright = setup.orientation === 'portrait';
  const widthMm = upright ? shortMm : longMm;
  const heightMm = upright ? longMm : shortMm;
  const { lineMm, ...places } = across(widthMm - 2 * leastSideMarginMm, setup.speedMmPerS);
  return {
    widthMm,
    heightMm,
    xMm: Math.floor(((widthMm - places.contentWidthMm) / 2) * stepsPerMm + 1e-9) / stepsPerMm,
    topMm: endMarginMm,
    bottomMm: heightMm - endMarginMm,
    ...places,
    lineS: lineMm / setup.speedMmPerS,
  };
}
