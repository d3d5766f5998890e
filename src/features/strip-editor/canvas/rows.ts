import type { StripRecording } from '../../../../shared/engine/render';
import type { LeadName } from '../../../../shared/parameters/sheet';
import type { ScreenScale } from '../../../lib/canvas/scale';

/** One lead on the screen. */
export interface Row {
  lead: LeadName;
  /** The trace that is drawn heavier, in ink. */
  recording: StripRecording;
  /** The hairline behind it; null when not wanted. */
  electrodes: StripRecording | null;
  /** Said under the lead's name when two bandwidths are compared. */
  caption: string | null;
  /** px of 0 mV from the top of the canvas. */
  baselinePx: number;
}

export interface RowLayout {
  rows: Row[];
  heightPx: number;
}

interface Extent {
  up: number;
  down: number;
}

/** The strip is never less than this high. */
const leastHeightPx = 160;
/** Room that a row keeps, mV, and the most it asks for: taller spikes cross rows, as on paper. */
const leastMv = { two: 0.7, twelve: 0.45 } as const;
const mostMv = 2.4;
/** The calibration pulse of the top row must not be cut. */
const calibrationMv = 1;

function extentOf(samples: Float32Array): Extent {
  let up = 0;
  let down = 0;
  for (const value of samples) {
    if (value > up) up = value;
    else if (value < down) down = value;
  }
  return { up, down: -down };
}

/** Rows one under the other, each as high as its trace needs, on whole 5 mm steps. */
export function layoutRows(rows: readonly Omit<Row, 'baselinePx'>[], scale: ScreenScale): RowLayout {
  const least = rows.length > 4 ? leastMv.twelve : leastMv.two;
  const bigBoxPx = 5 * scale.pxPerMm;
  const boxes = (mv: number): number =>
    Math.ceil((Math.min(mostMv, Math.max(least, mv + 0.1)) * scale.pxPerMv) / bigBoxPx) * bigBoxPx;
  let y = 0;
  const placed = rows.map((row): Row => {
    const { up, down } = extentOf(row.recording.leads[row.lead]);
    const baselinePx = y + boxes(y === 0 ? Math.max(calibrationMv, up) : up);
    y = baselinePx + boxes(down);
    return { ...row, baselinePx };
  });
  const missing = Math.max(0, Math.ceil((leastHeightPx - y) / (2 * bigBoxPx)) * bigBoxPx);
  return {
    rows: placed.map((row) => ({ ...row, baselinePx: row.baselinePx + missing })),
    heightPx: y + 2 * missing,
  };
}
