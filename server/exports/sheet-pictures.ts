import { InvalidInputError } from '../../shared/errors';
import { drawingToSvg } from '../../shared/formats/svg';
import type { SheetPage } from '../../shared/paper/pages/sheet-document';
import { drawingToSvgFile } from './svg-fonts';
import { svgToPng } from './svg-to-png';

/** Resolutions of pictures of a page, dots per inch: screens and slides, print, fine print. */
export const sheetPictureDpis = [150, 300, 600] as const;

/** A page as a standalone SVG at true size with its fonts. Same page, same text. */
export function sheetPageSvg(page: SheetPage): string {
  return drawingToSvgFile(page);
}

/**
 * A page as a PNG at 150, 300 or 600 dots per inch, the density noted in the file. Throws `InvalidInputError` for another
 * resolution, naming the field `dpi`.
 */
export function sheetPagePng(page: SheetPage, dpi: number): Buffer {
  if (!sheetPictureDpis.some((allowed) => allowed === dpi)) {
    const allowed = sheetPictureDpis.join(', ');
    throw new InvalidInputError([{ path: 'dpi', value: String(dpi), allowed }]);
  }
  return svgToPng(drawingToSvg(page), dpi);
}
