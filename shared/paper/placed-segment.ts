import type { SheetParameters } from '../parameters/strip-parameters';
import { calibrationWidthMm } from './calibration';
import { leadSegments, lineSpans, type LeadSegment } from './layout';
import { largeBoxMm, sToMm, type PaperGainMmPerMv } from './paper-scale';

/** A lead's stretch of trace with its place along the paper; its row has no height yet. */
export interface RowSegment extends LeadSegment {
  /** x of `fromS`. */
  xMm: number;
  widthMm: number;
  /** The name printed: that of the lead, or `−aVR` where it is drawn inverted. */
  label: string;
  inverted: boolean;
  gainMmPerMv: PaperGainMmPerMv;
}

/** A lead's stretch of trace on the sheet. */
export interface PlacedSegment extends RowSegment {
  /** y of 0 mV. */
  baselineMm: number;
}

/** Paper left of the calibration pulse, between it and the trace, and right of the trace, mm. */
export const paperGapMm = largeBoxMm;

/** Distance from the edge of the paper to the start of the trace, mm: whole large boxes. */
export function traceInsetMm(speedMmPerS: SheetParameters['speedMmPerS']): number {
  return 2 * paperGapMm + calibrationWidthMm(speedMmPerS);
}

/**
 * Segments of a strip, with x from the left edge of the paper. Those of one row follow each other without a
 * gap; every line starts at the same x.
 */
export function segmentsAlongPaper(sheet: SheetParameters, durationS: number, lineS: number): RowSegment[] {
  const speed = sheet.speedMmPerS;
  const lines = lineSpans(sheet, durationS, lineS);
  const traceXMm = traceInsetMm(speed);
  return leadSegments(sheet, durationS, lineS).map((segment) => ({
    ...segment,
    xMm: traceXMm + sToMm(segment.fromS - lines[segment.line].fromS, speed),
    widthMm: sToMm(segment.toS - segment.fromS, speed),
    label: segment.lead,
    inverted: false,
    gainMmPerMv: sheet.gainMmPerMv,
  }));
}

/** Width of the paper that holds the segments, in whole large boxes, at least `leastWidthMm`. */
export function paperWidthMm(segments: readonly RowSegment[], leastWidthMm: number): number {
  const rightMm = Math.max(...segments.map((segment) => segment.xMm + segment.widthMm));
  return Math.ceil(Math.max(leastWidthMm, rightMm + paperGapMm) / largeBoxMm - 1e-9) * largeBoxMm;
}
