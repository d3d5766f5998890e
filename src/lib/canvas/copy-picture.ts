import type { Drawing } from '../../../shared/paper/drawing';
import { download } from '../download';
import { pagePicture } from './paint-page';
import { loadPaperFonts } from './paper-fonts';

/** Pixels a millimetre of a copied picture: 203 dots per inch, sharp on slides. */
const pxPerMm = 8;

export type PictureOutcome = 'copied' | 'downloaded';

async function pngOf(canvas: HTMLCanvasElement): Promise<Blob> {
  return new Promise((done, fail) =>
    canvas.toBlob((blob) => (blob ? done(blob) : fail(new Error('no picture'))), 'image/png'),
  );
}

/** Puts a drawing on the clipboard as a picture; saves it under `name` where the browser does not let a page copy. */
export async function copyPicture(drawing: Drawing, name: string): Promise<PictureOutcome> {
  await loadPaperFonts();
  const blob = await pngOf(pagePicture(drawing, pxPerMm));
  try {
    await navigator.clipboard.write([new ClipboardItem({ 'image/png': blob })]);
    return 'copied';
  } catch {
    download(name, 'image/png', blob);
    return 'downloaded';
  }
}
