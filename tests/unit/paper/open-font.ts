/** A TrueType font's measures, read from its tables (OpenType specification: head, hhea, hmtx, cmap 4, OS/2). */
export interface OpenFont {
  capHeightEm: number;
  /** Advance width of a character; throws when the font has no glyph for it. */
  advanceEm(character: string): number;
}

function tableOffsets(font: Buffer): Map<string, number> {
  const count = font.readUInt16BE(4);
  return new Map(
    Array.from({ length: count }, (_, i) => {
      const record = 12 + 16 * i;
      return [font.toString('latin1', record, record + 4), font.readUInt32BE(record + 8)];
    }),
  );
}

/** Offset of the segment mapping (format 4) within the file. */
function segmentMap(font: Buffer, cmap: number): number {
  const count = font.readUInt16BE(cmap + 2);
  for (let i = 0; i < count; i++) {
    const offset = cmap + font.readUInt32BE(cmap + 4 + 8 * i + 4);
    if (font.readUInt16BE(offset) === 4) return offset;
  }
  throw new Error('The font has no format 4 character map');
}

function glyphOf(font: Buffer, map: number, codePoint: number): number {
  const segments = font.readUInt16BE(map + 6) / 2;
  const [ends, starts] = [map + 14, map + 16 + 2 * segments];
  const [deltas, ranges] = [starts + 2 * segments, starts + 4 * segments];
  for (let i = 0; i < segments; i++) {
    if (codePoint > font.readUInt16BE(ends + 2 * i)) continue;
    const start = font.readUInt16BE(starts + 2 * i);
    if (codePoint < start) break;
    const delta = font.readUInt16BE(deltas + 2 * i);
    const range = font.readUInt16BE(ranges + 2 * i);
    if (range === 0) return (codePoint + delta) & 0xffff;
    const glyph = font.readUInt16BE(ranges + 2 * i + range + 2 * (codePoint - start));
    return glyph === 0 ? 0 : (glyph + delta) & 0xffff;
  }
  return 0;
}

/** Opens a TTF file's bytes. */
export function openFont(font: Buffer): OpenFont {
  const tables = tableOffsets(font);
  const table = (name: string): number => {
    const offset = tables.get(name);
    if (offset === undefined) throw new Error(`The font has no ${name} table`);
    return offset;
  };
  const unitsPerEm = font.readUInt16BE(table('head') + 18);
  const measures = font.readUInt16BE(table('hhea') + 34);
  const map = segmentMap(font, table('cmap'));
  return {
    capHeightEm: font.readInt16BE(table('OS/2') + 88) / unitsPerEm,
    advanceEm(character) {
      const glyph = glyphOf(font, map, character.codePointAt(0) ?? 0);
      if (glyph === 0) throw new Error(`The font has no ${character}`);
      return font.readUInt16BE(table('hmtx') + 4 * Math.min(glyph, measures - 1)) / unitsPerEm;
    },
  };
}
