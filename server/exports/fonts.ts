import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type PDFDocument from 'pdfkit';

const require = createRequire(import.meta.url);

/** Files of the cuts that drawings and reports use; they ship with the packages. */
export const fontFiles = {
  sans400: require.resolve('@expo-google-fonts/ibm-plex-sans/400Regular/IBMPlexSans_400Regular.ttf'),
  sans500: require.resolve('@expo-google-fonts/ibm-plex-sans/500Medium/IBMPlexSans_500Medium.ttf'),
  sans600: require.resolve('@expo-google-fonts/ibm-plex-sans/600SemiBold/IBMPlexSans_600SemiBold.ttf'),
  mono400: require.resolve('@expo-google-fonts/ibm-plex-mono/400Regular/IBMPlexMono_400Regular.ttf'),
  mono500: require.resolve('@expo-google-fonts/ibm-plex-mono/500Medium/IBMPlexMono_500Medium.ttf'),
} as const;

/**
 * Bytes of nothing after a font file. The blank of the fixed-pitch cuts is an empty outline at the very end of the file, and
 * PDFKit's font reader looks for the ten bytes of an outline's header there, which would run past the end.
 */
const paddingBytes = 16;

/** Makes the cuts known to a PDF by their names here. */
export function registerFonts(doc: InstanceType<typeof PDFDocument>): void {
  for (const [name, file] of Object.entries(fontFiles)) {
    doc.registerFont(name, Buffer.concat([readFileSync(file), Buffer.alloc(paddingBytes)]));
  }
}
