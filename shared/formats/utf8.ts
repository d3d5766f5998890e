/** Halves of a character outside the basic plane that stand alone, and cannot be encoded. */
const loneSurrogates = /\p{Surrogate}/gu;

/** Text as UTF-8; lone surrogates become U+FFFD. */
export function utf8Bytes(text: string): Uint8Array {
  // encodeURIComponent is the language's own UTF-8 encoder: ASCII, or %XX for each byte.
  const escaped = encodeURIComponent(text.replace(loneSurrogates, '\uFFFD'));
  const bytes: number[] = [];
  for (let i = 0; i < escaped.length; i++) {
    const isEscape = escaped[i] === '%';
    bytes.push(isEscape ? parseInt(escaped.slice(i + 1, i + 3), 16) : escaped.charCodeAt(i));
    if (isEscape) i += 2;
  }
  return Uint8Array.from(bytes);
}

/** ASCII text as bytes; a character above 127 throws, because it would be cut. */
export function asciiBytes(text: string): Uint8Array {
  const bytes = new Uint8Array(text.length);
  for (let i = 0; i < text.length; i++) {
    const code = text.charCodeAt(i);
    if (code > 127) throw new RangeError(`not ASCII: ${JSON.stringify(text)}`);
    bytes[i] = code;
  }
  return bytes;
}
