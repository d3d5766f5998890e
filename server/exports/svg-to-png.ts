import { createRequire } from 'node:module';
import { Resvg } from '@resvg/resvg-js';
import { syntheticCaution } from '../../shared/paper/cautions';
import { withDescription, withPixelDensity } from './png-chunks';

const require = createRequire(import.meta.url);

/** The cuts that drawings use. */
const fontFiles = [
  '@expo-google-fonts/ibm-plex-sans/400Regular/IBMPlexSans_400Regular.ttf',
  '@expo-google-fonts/ibm-plex-sans/500Medium/IBMPlexSans_500Medium.ttf',
  '@expo-google-fonts/ibm-plex-sans/600SemiBold/IBMPlexSans_600SemiBold.ttf',
  '@expo-google-fonts/ibm-plex-mono/400Regular/IBMPlexMono_400Regular.ttf',
  '@expo-google-fonts/ibm-plex-mono/500Medium/IBMPlexMono_500Medium.ttf',
];

/**
 * Paints an SVG whose size is given in mm at `dpi` dots per inch (pixels = mm × dpi / 25.4, rounded up) and
 * notes the density and the caution in the file, so that it opens and prints at true scale. Only the project's own fonts are
 * used. Throws when the SVG cannot be read.
 */
export function svgToPng(svg: string, dpi: number): Buffer {
  const image = new Resvg(svg, {
    dpi,
    font: {
      loadSystemFonts: false,
      fontFiles: fontFiles.map((file) => require.resolve(file)),
      defaultFontFamily: 'IBM Plex Sans',
    },
  });
  return withPixelDensity(withDescription(image.render().asPng(), syntheticCaution), dpi);
}
