import { screenScale, type ScreenScale } from '../../../lib/canvas/scale';

/** One trace on the bench: mV at a rate, and what is written over it. */
export interface BenchRow {
  name: string;
  band: string;
  sampleRateHz: number;
  samplesMv: Float64Array;
}

export interface PlacedRow extends BenchRow {
  /** px from the top. */
  topPx: number;
  baselinePx: number;
  heightPx: number;
}

export interface BenchLayout {
  rows: PlacedRow[];
  heightPx: number;
  widthPx: number;
  scale: ScreenScale;
  gainMmPerMv: number;
}

const gains = [200, 100, 50, 20, 10, 5, 2, 1, 0.5, 0.2, 0.1, 0.05];
/** A row is as high as its trace needs, up to this far either side of its line, mm; what is beyond is cut. */
const mostRowMm = 40;
/** Room for the setting's name over the trace, mm. */
const nameMm = 5;
export const speedMmPerS = 25;

function extent(samples: Float64Array): { up: number; down: number } {
  let up = 0;
  let down = 0;
  for (const value of samples) {
    if (value > up) up = value;
    else if (-value > down) down = -value;
  }
  return { up, down };
}

/** The greatest gain at which no row is higher than allowed; `mostGain` where all of them fit. */
function fittingGain(rows: readonly BenchRow[], mostGain: number): number {
  const highest = Math.max(
    ...rows.map(({ samplesMv }) => {
      const { up, down } = extent(samplesMv);
      return up + down;
    }),
  );
  return gains.find((gain) => gain <= mostGain && highest * gain <= mostRowMm) ?? gains[gains.length - 1];
}

/**
 * Rows one above the other, all at one gain and on one time axis, on whole large boxes.
 *
 * @param gain the greatest that may be taken, or the one that must
 */
export function layoutBench(
  rows: readonly BenchRow[],
  durationS: number,
  pxPerMm: number,
  gain: { most: number } | { exactly: number },
): BenchLayout {
  const gainMmPerMv = 'exactly' in gain ? gain.exactly : fittingGain(rows, gain.most);
  const base = screenScale({ speedMmPerS, gainMmPerMv: 10 }, pxPerMm, 1);
  const scale: ScreenScale = { ...base, pxPerMv: pxPerMm * gainMmPerMv };
  const box = 5 * pxPerMm;
  const boxes = (mm: number): number => Math.ceil(mm / 5) * box;
  let y = 0;
  const placed = rows.map((row): PlacedRow => {
    const { up, down } = extent(row.samplesMv);
    const topPx = y;
    const calibrationMv = calibrationOf(gainMmPerMv);
    const above = boxes(Math.min(mostRowMm, Math.max(up, calibrationMv) * gainMmPerMv) + nameMm);
    const heightPx = above + boxes(Math.min(mostRowMm, down * gainMmPerMv) + 2);
    y += heightPx;
    return { ...row, topPx, baselinePx: topPx + above, heightPx };
  });
  return {
    rows: placed,
    heightPx: y,
    widthPx: Math.ceil(scale.leftPx + durationS * scale.pxPerS + 4 * pxPerMm),
    scale,
    gainMmPerMv,
  };
}

/** Height of the calibration pulse at a gain: 10 mm wherever that is a round figure, mV. */
export function calibrationOf(gainMmPerMv: number): number {
  return 10 / gainMmPerMv;
}
