import type { ScreenWindow } from '../../../lib/canvas/paint-grid';
import { timeToPx, type ScreenScale } from '../../../lib/canvas/scale';
import { calibrationOf, type BenchLayout, type PlacedRow } from './bench-layout';

const ink = '#1f2a37';
const ink2 = '#46515e';
const edge = '#867b68';
const copper = '#b4532a';
const plum = '#6b3fa0';
const selected = 'rgb(15 107 102 / 0.11)';

/** What is drawn over the traces: the beat that is measured, and where. */
export interface BenchMarks {
  /** Column of the chosen beat, s. */
  beat: { fromS: number; toS: number } | null;
  spikeS: number | null;
  stS: number | null;
}

function paintTrace(context: CanvasRenderingContext2D, scale: ScreenScale, row: PlacedRow): void {
  context.save();
  context.beginPath();
  context.rect(0, row.topPx, 1e6, row.heightPx);
  context.clip();
  context.beginPath();
  row.samplesMv.forEach((value, k) => {
    const x = timeToPx(scale, k / row.sampleRateHz);
    const y = row.baselinePx - value * scale.pxPerMv;
    if (k === 0) context.moveTo(x, y);
    else context.lineTo(x, y);
  });
  context.strokeStyle = ink;
  context.lineWidth = Math.max(1.4, 0.3 * scale.pxPerMm);
  context.lineJoin = 'round';
  context.stroke();
  context.restore();
}

function paintCalibration(
  context: CanvasRenderingContext2D,
  { scale, gainMmPerMv }: BenchLayout,
  row: PlacedRow,
): void {
  const mm = scale.pxPerMm;
  const top = row.baselinePx - calibrationOf(gainMmPerMv) * scale.pxPerMv;
  context.beginPath();
  context.moveTo(5 * mm, row.baselinePx);
  context.lineTo(6 * mm, row.baselinePx);
  context.lineTo(6 * mm, top);
  context.lineTo(11 * mm, top);
  context.lineTo(11 * mm, row.baselinePx);
  context.lineTo(12 * mm, row.baselinePx);
  context.strokeStyle = ink;
  context.lineWidth = 1.4;
  context.stroke();
}

function paintName(context: CanvasRenderingContext2D, { scale }: BenchLayout, row: PlacedRow): void {
  const x = scale.leftPx + 4;
  const y = row.topPx + 2.4 * scale.pxPerMm + 4;
  context.textBaseline = 'alphabetic';
  context.font = '600 13px "IBM Plex Sans"';
  const width = context.measureText(row.name).width;
  context.font = '400 13px "IBM Plex Sans"';
  const bandWidth = context.measureText(row.band).width;
  // Words on a grid need quiet ground.
  context.fillStyle = 'rgb(251 252 253 / 0.85)';
  context.fillRect(x - 3, y - 14, width + bandWidth + 14, 19);
  context.fillStyle = ink2;
  context.fillText(row.band, x + width + 7, y);
  context.fillStyle = ink;
  context.font = '600 13px "IBM Plex Sans"';
  context.fillText(row.name, x, y);
}

/** Traces with their names and calibration pulses, divided by rules. */
export function paintRows(context: CanvasRenderingContext2D, layout: BenchLayout): void {
  for (const row of layout.rows) {
    paintTrace(context, layout.scale, row);
    paintCalibration(context, layout, row);
    paintName(context, layout, row);
    if (row.topPx === 0) continue;
    context.strokeStyle = edge;
    context.lineWidth = 1;
    context.beginPath();
    context.moveTo(0, row.topPx + 0.5);
    context.lineTo(layout.widthPx, row.topPx + 0.5);
    context.stroke();
  }
}

function paintUpright(
  context: CanvasRenderingContext2D,
  x: number,
  heightPx: number,
  colour: string,
  dash: number[],
): void {
  context.setLineDash(dash);
  context.strokeStyle = colour;
  context.lineWidth = 1.5;
  context.beginPath();
  context.moveTo(x, 0);
  context.lineTo(x, heightPx);
  context.stroke();
  context.setLineDash([]);
}

/** The chosen beat's column, its stimulus and where its ST is read. */
export function paintMarks(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  window: ScreenWindow,
  marks: BenchMarks,
): void {
  if (marks.beat) {
    const x = timeToPx(scale, marks.beat.fromS);
    context.fillStyle = selected;
    context.fillRect(x, 0, timeToPx(scale, marks.beat.toS) - x, window.heightPx);
  }
  if (marks.spikeS !== null) {
    paintUpright(context, timeToPx(scale, marks.spikeS), window.heightPx, copper, [2, 3]);
  }
  if (marks.stS !== null) {
    paintUpright(context, timeToPx(scale, marks.stS), window.heightPx, plum, [6, 4]);
  }
}

/** Stimuli and markers as strokes on lines of their own: given above, marked below. */
export function paintMarkerLines(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  widthPx: number,
  givenS: readonly number[],
  foundS: readonly number[],
): void {
  const lines = [
    { name: 'Given', timesS: givenS, y: 0, colour: copper },
    { name: 'Marked', timesS: foundS, y: 20, colour: ink },
  ];
  for (const { name, timesS, y, colour } of lines) {
    context.strokeStyle = edge;
    context.lineWidth = 1;
    context.beginPath();
    context.moveTo(scale.leftPx, y + 17.5);
    context.lineTo(widthPx, y + 17.5);
    context.stroke();
    context.fillStyle = ink2;
    context.font = '400 12px "IBM Plex Sans"';
    context.textBaseline = 'alphabetic';
    context.fillText(name, 6, y + 16);
    context.strokeStyle = colour;
    context.lineWidth = 2.2;
    context.beginPath();
    for (const timeS of timesS) {
      const x = timeToPx(scale, timeS);
      context.moveTo(x, y + 5);
      context.lineTo(x, y + 17);
    }
    context.stroke();
  }
}
