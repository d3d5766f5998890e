/** Levels of lists and objects that JSON from outside may have; our deepest body has six. */
export const deepestJson = 24;

const quote = '"'.charCodeAt(0);
const backslash = '\\'.charCodeAt(0);
const opening = new Set(['{'.charCodeAt(0), '['.charCodeAt(0)]);
const closing = new Set(['}'.charCodeAt(0), ']'.charCodeAt(0)]);

/** Whether JSON (as UTF-8) nests deeper than anything of ours, where recursive code would run out of stack. */
export function nestsTooDeep(json: Uint8Array): boolean {
  let depth = 0;
  let inText = false;
  for (let i = 0; i < json.length; i++) {
    const byte = json[i];
    if (inText) {
      if (byte === backslash) i++;
      else if (byte === quote) inText = false;
    } else if (byte === quote) inText = true;
    else if (opening.has(byte) && ++depth > deepestJson) return true;
    else if (closing.has(byte)) depth--;
  }
  return false;
}
