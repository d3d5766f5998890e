/**
 * Longest text of a long string (LO) and of a short text (ST) (DICOM PS3.5, table 6.2-1). The standard counts
 * characters; some readers and validators count bytes, so these are kept to as bytes.
 */
export const longStringBytes = 64;
export const shortTextBytes = 1024;

/** Text for a DICOM string: a backslash would part values, and control characters are not allowed. Cut between characters. */
export function dicomText(text: string, maxBytes: number): string {
  const clean = text
    .replace(/[\p{Cc}\s]+/gu, ' ')
    .replace(/\\/gu, '/')
    .trim();
  let kept = '';
  let bytes = 0;
  for (const character of clean) {
    bytes += Buffer.byteLength(character, 'utf8');
    if (bytes > maxBytes) break;
    kept += character;
  }
  return kept.trim();
}
