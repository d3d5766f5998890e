import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Drawing, FontFamily, FontWeight } from '../../shared/paper/drawing';
import { drawingToSvg } from '../../shared/formats/svg';

const require = createRequire(import.meta.url);

const families: Readonly<Record<FontFamily, { name: string; package: string }>> = {
  sans: { name: 'IBM Plex Sans', package: 'ibm-plex-sans' },
  mono: { name: 'IBM Plex Mono', package: 'ibm-plex-mono' },
};

const faces = new Map<string, string>();

/** A cut as a font face with its file inside (WOFF2, Latin letters and signs; others come from the reader's fonts). */
function fontFace(family: FontFamily, weight: FontWeight): string {
  const { name, package: folder } = families[family];
  const file = `@fontsource/${folder}/files/${folder}-latin-${weight}-normal.woff2`;
  const known = faces.get(file);
  if (known) return known;
  const bytes = readFileSync(require.resolve(file)).toString('base64');
  const face = `@font-face{font-family:'${name}';font-weight:${weight};src:url(data:font/woff2;base64,${bytes}) format('woff2')}`;
  faces.set(file, face);
  return face;
}

/** The cuts that a drawing's texts are set in, each once, in a fixed order. */
function cutsOf({ items }: Drawing): [FontFamily, FontWeight][] {
  const cuts = new Map<string, [FontFamily, FontWeight]>();
  for (const item of items) {
    if (item.kind === 'text') cuts.set(`${item.family} ${item.weight}`, [item.family, item.weight]);
  }
  return [...cuts.entries()].sort(([a], [b]) => (a < b ? -1 : 1)).map(([, cut]) => cut);
}

/**
 * A drawing as a standalone SVG file that carries its own fonts, so that it looks the same where they are not installed.
 * Same drawing, same text.
 */
export function drawingToSvgFile(drawing: Drawing): string {
  const style = cutsOf(drawing)
    .map(([family, weight]) => fontFace(family, weight))
    .join('');
  return drawingToSvg(drawing).replace('</desc>\n', () => `</desc>\n<style>${style}</style>\n`);
}
