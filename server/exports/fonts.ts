import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';

const require = createRequire(import.meta.url);

/** Files of the cuts that drawings and reports use; they ship with the packages. */
export const fontFiles = {
  sans400: require.resolve('@expo-google-fonts/ibm-plex-sans/400Regular/IBMPlexSans_400Regular.ttf'),
  sans500: require.resolve('@expo-google-fonts/ibm-plex-sans/500Medium/IBMPlexSans_500Medium.ttf'),
  sans600: require.resolve('@expo-google-fonts/ibm-plex-sans/600SemiBold/IBMPlexSans_600SemiBold.ttf'),
  mono400: require.resolve('@expo-google-fonts/ibm-plex-mono/400Regular/IBMPlexMono_400Regular.ttf'),
  mono500: require.resolve('@expo-google-fonts/ibm-plex-mono/500Medium/IBMPlexMono_500Medium.ttf'),
} as const;

export type FontCut = keyof typeof fontFiles;
export const fontCuts = Object.keys(fontFiles) as FontCut[];

/** More than the header of a glyph (10 bytes). */
const paddingBytes = 32;

/**
 * A font file as pdfkit can read it. In the mono cuts the space is the last glyph and empty, so its place is the end of
 * the file, and the font library reads a glyph's header there all the same: zeros behind the file give it an empty one.
 */
export function fontForPdf(cut: FontCut): Buffer {
  return Buffer.concat([readFileSync(fontFiles[cut]), Buffer.alloc(paddingBytes)]);
}
