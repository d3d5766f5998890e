/** Longest text of a long string (LO) and of a short text (ST), characters (DICOM PS3.5, table 6.2-1). */
export const longStringLength = 64;
export const shortTextLength = 1024;

/** Text for a DICOM string: a backslash would part values, and control characters are not allowed. */
export function dicomText(text: string, maxLength: number): string {
  return [...text.replace(/[\p{Cc}\s]+/gu, ' ').replace(/\\/gu, '/')].slice(0, maxLength).join('').trim();
}
