import type { DrawingItem } from './drawing';
import type { TimeSpan } from './layout';
import { largeBoxMm, sToMm, type PaperSpeedMmPerS } from './paper-scale';
import { textItem } from './text';
import { textStyles } from './text-styles';
import { lineWeightsMm } from './tokens';

/** Height of the lane: one large box. */
export const markerLaneMm = largeBoxMm;
/** Strokes keep this far from the grid above and from what follows, mm. */
const strokeInsetMm = 0.75;
/** Baseline of the name below the lane's upper edge, mm. */
const nameDropMm = 3.6;

export interface MarkerPlace extends TimeSpan {
  /** x of `fromS`. */
  xMm: number;
  /** Upper edge of the lane. */
  topMm: number;
  speedMmPerS: PaperSpeedMmPerS;
  namesXMm: number;
}

/**
 * Where a stimulus was found in the signal, as strokes on a lane of their own below the grid: a marker is a finding and
 * never part of a trace. `markersS` in s from the start of the strip; those outside the span are left out.
 */
export function markerLaneItems(markersS: readonly number[], place: MarkerPlace): DrawingItem[] {
  const { fromS, toS, xMm, topMm, speedMmPerS, namesXMm } = place;
  const strokes = markersS
    .filter((timeS) => timeS >= fromS && timeS < toS)
    .map((timeS): DrawingItem => {
      const atMm = xMm + sToMm(timeS - fromS, speedMmPerS);
      return {
        kind: 'line',
        role: 'marker',
        x1Mm: atMm,
        y1Mm: topMm + strokeInsetMm,
        x2Mm: atMm,
        y2Mm: topMm + markerLaneMm - strokeInsetMm,
        colour: 'ink',
        weightMm: lineWeightsMm.marker,
      };
    });
  return [textItem('Marked', textStyles.markerName, namesXMm, topMm + nameDropMm), ...strokes];
}
