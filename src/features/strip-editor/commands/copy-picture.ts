import type { StripRecording } from '../../../../shared/engine/render';
import { layoutStripSheet } from '../../../../shared/paper/sheet';
import { copyPicture, type PictureOutcome } from '../../../lib/canvas/copy-picture';

/**
 * Puts the strip on the clipboard as its sheet: the leads that the editor shows one below the other, at true proportion,
 * with scale, caution and, where the sheet asks for them, ladder and markers.
 */
export function copyStripPicture(recording: StripRecording, twelve: boolean): Promise<PictureOutcome> {
  const { sheet } = recording.parameters;
  const drawing = layoutStripSheet(recording, { ...sheet, layout: twelve ? '12x1' : 'stacked' });
  return copyPicture(drawing, 'strip.png');
}
