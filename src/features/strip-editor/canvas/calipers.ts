import type { ScreenWindow } from '../../../lib/canvas/paint-grid';
import { timeToPx, type ScreenScale } from '../../../lib/canvas/scale';

const plum = '#6b3fa0';

/** Two marks, and whether their interval is repeated along the strip. Times in s, in the order they were set. */
export interface CaliperMarks {
  firstS: number;
  secondS: number | null;
  marching: boolean;
}

/** What the calipers read: ms, mm on paper, and per minute. */
export function caliperWords(marks: CaliperMarks, speedMmPerS: number): string | null {
  if (marks.secondS === null) return null;
  const intervalS = Math.abs(marks.secondS - marks.firstS);
  if (intervalS === 0) return null;
  const ms = Math.round(1000 * intervalS);
  return `${ms} ms, ${(intervalS * speedMmPerS).toFixed(1)} mm, ${(60 / intervalS).toFixed(0)} /min`;
}

/** Times at which the measured interval repeats over the strip, the two marks left out. */
export function marchTimes(marks: CaliperMarks, durationS: number): number[] {
  if (marks.secondS === null || !marks.marching) return [];
  const intervalS = Math.abs(marks.secondS - marks.firstS);
  if (intervalS < 0.02) return [];
  const start = Math.min(marks.firstS, marks.secondS);
  const first = Math.ceil(-start / intervalS);
  const last = Math.floor((durationS - start) / intervalS);
  return Array.from({ length: last - first + 1 }, (_, i) => first + i)
    .filter((step) => step !== 0 && step !== 1)
    .map((step) => start + step * intervalS);
}

function paintMark(context: CanvasRenderingContext2D, x: number, heightPx: number): void {
  context.beginPath();
  context.moveTo(x, 0);
  context.lineTo(x, heightPx);
  context.stroke();
  context.beginPath();
  context.arc(x, 14, 5, 0, 2 * Math.PI);
  context.fillStyle = '#ffffff';
  context.fill();
  context.stroke();
}

function paintMarch(context: CanvasRenderingContext2D, x: number, heightPx: number): void {
  context.setLineDash([2, 4]);
  context.beginPath();
  context.moveTo(x, 6);
  context.lineTo(x, heightPx);
  context.stroke();
  context.setLineDash([]);
  context.beginPath();
  context.moveTo(x - 4, 6);
  context.lineTo(x + 4, 6);
  context.stroke();
}

function paintLabel(context: CanvasRenderingContext2D, words: string, x: number, window: ScreenWindow): void {
  context.font = '500 13px "IBM Plex Sans"';
  const width = context.measureText(words).width + 16;
  const left = Math.max(4, Math.min(window.widthPx - width - 4, x - width / 2));
  context.fillStyle = plum;
  context.fillRect(left, 26, width, 24);
  context.fillStyle = '#ffffff';
  context.textBaseline = 'middle';
  context.fillText(words, left + 8, 38);
}

/** Calipers: plum lines with ring handles, one label, and the march-out as dotted lines with caps. */
export function paintCalipers(
  context: CanvasRenderingContext2D,
  scale: ScreenScale,
  window: ScreenWindow,
  marks: CaliperMarks,
  durationS: number,
  speedMmPerS: number,
): void {
  const at = (timeS: number): number => timeToPx(scale, timeS) - window.scrollPx;
  context.strokeStyle = plum;
  context.lineWidth = 1.6;
  for (const timeS of marchTimes(marks, durationS)) paintMarch(context, at(timeS), window.heightPx);
  paintMark(context, at(marks.firstS), window.heightPx);
  if (marks.secondS === null) return;
  paintMark(context, at(marks.secondS), window.heightPx);
  const words = caliperWords(marks, speedMmPerS);
  if (!words) return;
  context.beginPath();
  context.moveTo(at(marks.firstS), 38);
  context.lineTo(at(marks.secondS), 38);
  context.stroke();
  paintLabel(context, words, at((marks.firstS + marks.secondS) / 2), window);
}
