import { inflateSync } from 'node:zlib';

export interface DecodedPng {
  widthPx: number;
  heightPx: number;
  /** From the pHYs chunk, pixels per metre along x and y; null without one. */
  pixelsPerM: readonly [number, number] | null;
  /** Type and whether the CRC holds, in file order. */
  chunks: { type: string; crcHolds: boolean }[];
  /** Red, green, blue of a pixel. */
  rgb(xPx: number, yPx: number): [number, number, number];
}

/** CRC-32 bit by bit, as in annex D of the PNG specification: independent of zlib's own. */
function crc32(bytes: Uint8Array): number {
  let crc = 0xffffffff;
  for (const byte of bytes) {
    crc ^= byte;
    for (let bit = 0; bit < 8; bit++) crc = crc & 1 ? (crc >>> 1) ^ 0xedb88320 : crc >>> 1;
  }
  return (crc ^ 0xffffffff) >>> 0;
}

function paeth(left: number, up: number, upLeft: number): number {
  const estimate = left + up - upLeft;
  const [dLeft, dUp, dUpLeft] = [left, up, upLeft].map((value) => Math.abs(estimate - value));
  if (dLeft <= dUp && dLeft <= dUpLeft) return left;
  return dUp <= dUpLeft ? up : upLeft;
}

/** Undoes the five filter types of section 9 over 8-bit samples. */
function unfilter(raw: Buffer, rowBytes: number, rows: number, bytesPerPixel: number): Uint8Array {
  const out = new Uint8Array(rowBytes * rows);
  for (let row = 0; row < rows; row++) {
    const filter = raw[row * (rowBytes + 1)];
    for (let i = 0; i < rowBytes; i++) {
      const at = row * rowBytes + i;
      const left = i >= bytesPerPixel ? out[at - bytesPerPixel] : 0;
      const up = row > 0 ? out[at - rowBytes] : 0;
      const upLeft = row > 0 && i >= bytesPerPixel ? out[at - rowBytes - bytesPerPixel] : 0;
      const predicted = [0, left, up, (left + up) >> 1, paeth(left, up, upLeft)][filter];
      out[at] = raw[row * (rowBytes + 1) + 1 + i] + predicted;
    }
  }
  return out;
}

/** Decodes an 8-bit, non-interlaced RGB or RGBA PNG; enough to measure our own pictures. Throws on others. */
export function decodePng(png: Buffer): DecodedPng {
  if (png.toString('latin1', 1, 4) !== 'PNG') throw new Error('Not a PNG');
  const chunks: DecodedPng['chunks'] = [];
  const data: Buffer[] = [];
  let pixelsPerM: DecodedPng['pixelsPerM'] = null;
  for (let at = 8; at < png.length;) {
    const length = png.readUInt32BE(at);
    const type = png.toString('latin1', at + 4, at + 8);
    const body = png.subarray(at + 8, at + 8 + length);
    const crcHolds = crc32(png.subarray(at + 4, at + 8 + length)) === png.readUInt32BE(at + 8 + length);
    chunks.push({ type, crcHolds });
    if (type === 'IDAT') data.push(body);
    if (type === 'pHYs' && body[8] === 1) pixelsPerM = [body.readUInt32BE(0), body.readUInt32BE(4)];
    at += length + 12;
  }
  const [widthPx, heightPx] = [png.readUInt32BE(16), png.readUInt32BE(20)];
  const [depth, colourType, , , interlace] = png.subarray(24, 29);
  if (depth !== 8 || (colourType !== 2 && colourType !== 6) || interlace !== 0) {
    throw new Error(
      `PNG of depth ${depth}, colour type ${colourType}, interlace ${interlace} is not read here`,
    );
  }
  const bytesPerPixel = colourType === 2 ? 3 : 4;
  const pixels = unfilter(inflateSync(Buffer.concat(data)), widthPx * bytesPerPixel, heightPx, bytesPerPixel);
  const rgb = (xPx: number, yPx: number): [number, number, number] => {
    const at = (yPx * widthPx + xPx) * bytesPerPixel;
    return [pixels[at], pixels[at + 1], pixels[at + 2]];
  };
  return { widthPx, heightPx, pixelsPerM, chunks, rgb };
}
