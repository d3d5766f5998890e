import type { StripEvent } from '../../../../shared/engine/events';
import type { StripRecording } from '../../../../shared/engine/render';
import { stimulusLeadMv } from '../../../../shared/engine/stimulus/stimulus-artefact';
import type { LeadName } from '../../../../shared/parameters/sheet';
import type { TraceChoice } from '../state/view-state';
import type { TintedColumn } from './beat-columns';
import type { Row } from './rows';
import type { ScreenWindow } from '../../../lib/canvas/paint-grid';
import { pxToTime, timeToPx, type ScreenScale } from '../../../lib/canvas/scale';

const ink = '#1f2a37';
const slate = '#7b8794';
const copper = '#b4532a';

/** Least line widths on a screen, px (look: traces 0.34 and 0.18 mm, calibration 0.3 mm). */
const traceWidth = (scale: ScreenScale): number => Math.max(1.7, 0.34 * scale.pxPerMm);
const electrodeWidth = (scale: ScreenScale): number => Math.max(1, 0.18 * scale.pxPerMm);
const calibrationWidth = (scale: ScreenScale): number => Math.max(1.4, 0.3 * scale.pxPerMm);

function paintTrace(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  window: ScreenWindow,
  recording: StripRecording,
  lead: LeadName,
  baselinePx: number,
): void {
  const samples = recording.leads[lead];
  const rate = recording.sampleRateHz;
  const from = Math.max(0, Math.floor(pxToTime(scale, window.scrollPx) * rate) - 1);
  const end = Math.min(
    samples.length,
    Math.ceil(pxToTime(scale, window.scrollPx + window.widthPx) * rate) + 2,
  );
  context.beginPath();
  for (let i = from; i < end; i++) {
    const x = timeToPx(scale, i / rate) - window.scrollPx;
    const y = baselinePx - samples[i] * scale.pxPerMv;
    if (i === from) context.moveTo(x, y);
    else context.lineTo(x, y);
  }
  context.stroke();
}

/** Stimuli at the electrodes, at their true height: the recorder's narrow view of them is the ink trace. */
function paintStimuli(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  window: ScreenWindow,
  events: readonly StripEvent[],
  row: Row,
): void {
  context.strokeStyle = copper;
  context.lineWidth = Math.max(1.2, 0.25 * scale.pxPerMm);
  context.beginPath();
  for (const event of events) {
    if (event.type !== 'stimulus') continue;
    const x = timeToPx(scale, event.timeS) - window.scrollPx;
    if (x < -2 || x > window.widthPx + 2) continue;
    context.moveTo(x, row.baselinePx);
    context.lineTo(x, row.baselinePx - stimulusLeadMv(event, row.lead) * scale.pxPerMv);
  }
  context.stroke();
}

function paintCalibration(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  window: ScreenWindow,
  row: Row,
): void {
  const mm = scale.pxPerMm;
  const x = 8 * mm - window.scrollPx;
  const top = row.baselinePx - scale.pxPerMv;
  context.strokeStyle = ink;
  context.lineWidth = calibrationWidth(scale);
  context.beginPath();
  context.moveTo(x - mm, row.baselinePx);
  context.lineTo(x, row.baselinePx);
  context.lineTo(x, top);
  context.lineTo(x + 0.2 * scale.pxPerS, top);
  context.lineTo(x + 0.2 * scale.pxPerS, row.baselinePx);
  context.lineTo(x + 0.2 * scale.pxPerS + mm, row.baselinePx);
  context.stroke();
}

function paintNames(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  window: ScreenWindow,
  row: Row,
): void {
  context.fillStyle = ink;
  context.font = `600 ${scale.pxPerMm >= 5 ? 15 : 13}px "IBM Plex Sans"`;
  context.textBaseline = 'middle';
  context.fillText(row.lead, 1.4 * scale.pxPerMm - window.scrollPx, row.baselinePx);
  if (row.caption) {
    context.font = '500 12px "IBM Plex Sans"';
    context.fillText(row.caption, scale.leftPx + 4 - window.scrollPx, row.baselinePx - scale.pxPerMv * 0.9);
  }
}

/** One lead: calibration pulse, name, hairline at the electrodes with its stimuli, trace as recorded. */
export function paintRow(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  window: ScreenWindow,
  row: Row,
  trace: TraceChoice,
): void {
  context.lineJoin = 'round';
  paintCalibration(context, scale, window, row);
  paintNames(context, scale, window, row);
  if (row.electrodes && trace !== 'recorded') {
    context.strokeStyle = slate;
    context.lineWidth = trace === 'electrodes' ? traceWidth(scale) : electrodeWidth(scale);
    if (trace === 'electrodes') context.strokeStyle = ink;
    paintTrace(context, scale, window, row.electrodes, row.lead, row.baselinePx);
    paintStimuli(context, scale, window, row.electrodes.events, row);
  }
  if (trace !== 'electrodes') {
    context.strokeStyle = ink;
    context.lineWidth = traceWidth(scale);
    paintTrace(context, scale, window, row.recording, row.lead, row.baselinePx);
  }
}

/** Columns behind the trace: teal at 11 % for chosen beats, at half of it under the pointer. */
export function paintColumns(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  window: ScreenWindow,
  columns: readonly TintedColumn[],
): void {
  for (const { fromS, toS, hovered } of columns) {
    context.fillStyle = hovered ? 'rgb(15 107 102 / 0.055)' : 'rgb(15 107 102 / 0.11)';
    const x = timeToPx(scale, fromS) - window.scrollPx;
    context.fillRect(x, 0, (toS - fromS) * scale.pxPerS, window.heightPx);
  }
}
