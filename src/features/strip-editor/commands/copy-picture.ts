import type { StripRecording } from '../../../../shared/engine/render';
import { bandwidthLabel } from '../../../../shared/paper/bandwidth-label';
import type { DrawingItem } from '../../../../shared/paper/drawing';
import { ladderHeightMm, ladderItems } from '../../../../shared/paper/ladder';
import { ladderOf } from '../../../../shared/ladder/ladder';
import { leadNames } from '../../../../shared/parameters/sheet';
import { paintGrid, type ScreenWindow } from '../../../lib/canvas/paint-grid';
import { paintRow, ink } from '../canvas/paint';
import { paintDrawing } from '../../../lib/canvas/paint-drawing';
import { layoutRows } from '../canvas/rows';
import { screenScale, timeToPx, type ScreenScale } from '../../../lib/canvas/scale';

/** Pixels a mm: 203 dots per inch, sharp on slides. */
const pxPerMm = 8;
const marginPx = 40;
const headPx = 64;
const footPx = 44;

export type PictureOutcome = 'copied' | 'downloaded';

function paintTexts(
  context: CanvasRenderingContext2D,
  recording: StripRecording,
  widthPx: number,
  heightPx: number,
): void {
  const { title, sheet, recorder } = recording.parameters;
  context.fillStyle = ink;
  context.textBaseline = 'alphabetic';
  context.font = '600 26px "IBM Plex Sans"';
  context.fillText(title || 'Strip', marginPx, 44, widthPx * 0.6);
  context.font = '400 18px "IBM Plex Mono"';
  const scaleWords = `${sheet.speedMmPerS} mm/s ${sheet.gainMmPerMv} mm/mV ${bandwidthLabel(recorder)}`;
  context.textAlign = 'right';
  context.fillText(scaleWords, widthPx - marginPx, 44);
  context.textAlign = 'left';
  context.font = '500 18px "IBM Plex Sans"';
  context.fillText('Synthetic teaching strip, not a patient recording', marginPx, heightPx - 16);
}

/** The ladder under the strip, when the sheet asks for it. */
function pictureLadder({ events, parameters }: StripRecording, scale: ScreenScale): DrawingItem[] {
  return ladderItems(ladderOf(events), [], {
    xMm: scale.leftPx / pxPerMm,
    topMm: 0,
    fromS: 0,
    toS: parameters.durationS,
    mmPerS: scale.pxPerS / pxPerMm,
    names: ['Atria', 'AV', 'Ventricles'],
    namesXMm: 0,
    captionMm: 18 / pxPerMm,
  });
}

function drawPicture(recording: StripRecording, twelve: boolean): HTMLCanvasElement {
  const { sheet, durationS } = recording.parameters;
  const scale = screenScale(sheet, pxPerMm, 1);
  const leads = twelve ? leadNames : sheet.leads;
  const layout = layoutRows(
    leads.map((lead) => ({ lead, recording, electrodes: null, caption: null })),
    scale,
  );
  const window: ScreenWindow = {
    scrollPx: 0,
    widthPx: Math.ceil(timeToPx(scale, durationS) + 4 * pxPerMm),
    heightPx: layout.heightPx,
  };
  const ladderPx = sheet.ladder ? ladderHeightMm * pxPerMm : 0;
  const canvas = document.createElement('canvas');
  canvas.width = window.widthPx + 2 * marginPx;
  canvas.height = window.heightPx + ladderPx + headPx + footPx;
  const context = canvas.getContext('2d');
  if (!context) throw new Error('no canvas');
  context.fillStyle = '#ffffff';
  context.fillRect(0, 0, canvas.width, canvas.height);
  paintTexts(context, recording, canvas.width, canvas.height);
  context.save();
  context.translate(marginPx, headPx);
  context.beginPath();
  context.rect(0, 0, window.widthPx, window.heightPx);
  context.clip();
  paintGrid(context, scale, window, sheet.gridTint);
  for (const row of layout.rows) paintRow(context, scale, window, row, 'recorded');
  context.restore();
  if (sheet.ladder) {
    context.translate(marginPx, headPx + window.heightPx);
    paintDrawing(context, pictureLadder(recording, scale), pxPerMm);
  }
  return canvas;
}

function download(blob: Blob, name: string): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(blob);
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(link.href), 1000);
}

/** Puts the strip on the clipboard as a picture with its scale and caution; saves it where there is no clipboard. */
export async function copyPicture(recording: StripRecording, twelve: boolean): Promise<PictureOutcome> {
  await document.fonts.ready;
  const canvas = drawPicture(recording, twelve);
  const blob = await new Promise<Blob>((done, fail) =>
    canvas.toBlob((made) => (made ? done(made) : fail(new Error('no picture'))), 'image/png'),
  );
  try {
    await navigator.clipboard.write([new ClipboardItem({ 'image/png': blob })]);
    return 'copied';
  } catch {
    download(blob, 'strip.png');
    return 'downloaded';
  }
}
