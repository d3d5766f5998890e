import { Resvg } from '@resvg/resvg-js';
import { syntheticCaution } from '../../shared/paper/cautions';
import { fontFiles } from './fonts';
import { withDescription, withPixelDensity } from './png-chunks';

/**
 * Paints an SVG whose size is given in mm at `dpi` dots per inch (pixels = mm × dpi / 25.4, to whole ones) and
 * notes the density and the caution in the file, so that it opens and prints at true scale. Only the project's own fonts are
 * used. Throws when the SVG cannot be read.
 */
export function svgToPng(svg: string, dpi: number): Buffer {
  const image = new Resvg(svg, {
    dpi,
    font: {
      loadSystemFonts: false,
      fontFiles: Object.values(fontFiles),
      defaultFontFamily: 'IBM Plex Sans',
    },
  });
  return withPixelDensity(withDescription(image.render().asPng(), syntheticCaution), dpi);
}
