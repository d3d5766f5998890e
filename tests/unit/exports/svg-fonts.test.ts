import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { drawingToSvgFile } from '../../../server/exports/svg-fonts';
import { drawingToSvg } from '../../../shared/formats/svg';
import { renderStrip } from '../../../shared/engine/render';
import { layoutStripSheet } from '../../../shared/paper/sheet';
import { hasProgram, runReader } from '../../support/python';
import { temporaryFolder } from '../../support/exports';
import { buildStrip } from '../../support/strips';

const recording = renderStrip(buildStrip({ durationS: 2 }));
const sheet = layoutStripSheet(recording, recording.parameters.sheet);
const file = drawingToSvgFile(sheet);
const folder = temporaryFolder();
const faces = [
  ...file.matchAll(
    /@font-face\{font-family:'IBM Plex (Sans|Mono)';font-weight:(\d+);src:url\(data:font\/woff2;base64,([^)]+)\)/gu,
  ),
];

describe('SVG files', () => {
  it('carry every cut that their texts are set in, and no other', () => {
    const used = new Set(
      [...file.matchAll(/<text [^>]*font-family="'IBM Plex (Sans|Mono)'[^"]*" font-weight="(\d+)"/gu)].map(
        ([, family, weight]) => `${family} ${weight}`,
      ),
    );
    expect(used.size).toBeGreaterThan(2);
    expect(new Set(faces.map(([, family, weight]) => `${family} ${weight}`))).toEqual(used);
    expect(faces).toHaveLength(used.size);
  });

  it('carry the files of the cuts whole', () => {
    for (const [, family, weight, base64] of faces) {
      const name = `ibm-plex-${family.toLowerCase()}`;
      const path = `node_modules/@fontsource/${name}/files/${name}-latin-${weight}-normal.woff2`;
      const bytes = Buffer.from(base64, 'base64');
      // The signature of WOFF 2 (W3C WOFF2, section 4.1).
      expect(bytes.subarray(0, 4).toString('latin1')).toBe('wOF2');
      expect(bytes.equals(readFileSync(path))).toBe(true);
    }
  });

  it('are otherwise the drawing itself, the same every time', () => {
    expect(file.replace(/<style>[^<]*<\/style>\n/u, '')).toBe(drawingToSvg(sheet));
    expect(drawingToSvgFile(sheet)).toBe(file);
  });

  it.skipIf(!hasProgram('/usr/bin/xmllint'))('are well-formed under xmllint', () => {
    const path = join(folder, 'sheet.svg');
    writeFileSync(path, file);
    expect(runReader('/usr/bin/xmllint', ['--noout', '--huge', path])).toBe('');
  });
});
