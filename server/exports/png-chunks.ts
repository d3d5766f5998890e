import { crc32 } from 'node:zlib';
import { mmPerInch } from '../../shared/paper/paper-scale';

const mmPerM = 1000;
/** Unit specifier of a pHYs chunk: the metre. */
const perMetre = 1;
/** The signature (8 bytes), then IHDR: length, type, 13 bytes of data, CRC. */
const endOfHeaderChunk = 8 + 4 + 4 + 13 + 4;

/** A PNG chunk: length, type, data, CRC over type and data (PNG specification, third edition, section 5.3). */
function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const length = Buffer.alloc(4);
  length.writeUInt32BE(data.length);
  const check = Buffer.alloc(4);
  check.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, check]);
}

/** The file with a chunk right after its header. */
function withChunk(png: Buffer, added: Buffer): Buffer {
  return Buffer.concat([png.subarray(0, endOfHeaderChunk), added, png.subarray(endOfHeaderChunk)]);
}

/**
 * The PNG with a pHYs chunk (section 11.3.4.3) right after its header: whole pixels per metre, so 300 dpi is
 * kept to 4 parts in a million. The file must not have one yet.
 */
export function withPixelDensity(png: Buffer, dpi: number): Buffer {
  const pixelsPerM = Math.round((dpi * mmPerM) / mmPerInch);
  const data = Buffer.alloc(9);
  data.writeUInt32BE(pixelsPerM, 0);
  data.writeUInt32BE(pixelsPerM, 4);
  data.writeUInt8(perMetre, 8);
  return withChunk(png, chunk('pHYs', data));
}

/** The PNG with a tEXt chunk (section 11.3.3.2) of the keyword Description; `text` in Latin-1. */
export function withDescription(png: Buffer, text: string): Buffer {
  return withChunk(png, chunk('tEXt', Buffer.from(`Description\0${text}`, 'latin1')));
}
