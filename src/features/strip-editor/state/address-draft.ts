import type { Problem } from '../../../../shared/errors';
import { parseStripParameters, readStripParameters } from '../../../../shared/parameters/parse';
import type { StripParameters } from '../../../../shared/parameters/strip-parameters';

/** The address bar can carry a whole unsaved draft behind this. */
const prefix = '#draft=';

type Tree = Record<string, unknown>;

/** Only what differs from the defaults, so that addresses stay short. */
function differences(value: Tree, base: Tree): Tree {
  return Object.fromEntries(
    Object.entries(value).flatMap(([key, one]) => {
      const other = base[key];
      if (JSON.stringify(one) === JSON.stringify(other)) return [];
      const bothTrees = [one, other].every(
        (each) => typeof each === 'object' && each !== null && !Array.isArray(each),
      );
      return [[key, bothTrees ? differences(one as Tree, other as Tree) : one]];
    }),
  );
}

function toBase64Url(text: string): string {
  const bytes = new TextEncoder().encode(text);
  const binary = Array.from(bytes, (byte) => String.fromCharCode(byte)).join('');
  return btoa(binary).replaceAll('+', '-').replaceAll('/', '_').replace(/=+$/, '');
}

function fromBase64Url(text: string): string {
  const binary = atob(text.replaceAll('-', '+').replaceAll('_', '/'));
  return new TextDecoder().decode(Uint8Array.from(binary, (character) => character.charCodeAt(0)));
}

/** The hash part of an address that carries these parameters. */
export function draftHash(parameters: StripParameters): string {
  const changed = differences(parameters as unknown as Tree, parseStripParameters({}) as unknown as Tree);
  return `${prefix}${toBase64Url(JSON.stringify(changed))}`;
}

export type AddressDraft =
  | { kind: 'none' }
  | { kind: 'draft'; parameters: StripParameters }
  | { kind: 'damaged'; problems: readonly Problem[] };

/** Reads the draft an address carries. */
export function readAddressDraft(hash: string): AddressDraft {
  if (!hash.startsWith(prefix)) return { kind: 'none' };
  try {
    const result = readStripParameters(JSON.parse(fromBase64Url(hash.slice(prefix.length))));
    return result.ok
      ? { kind: 'draft', parameters: result.parameters }
      : { kind: 'damaged', problems: result.problems };
  } catch {
    return { kind: 'damaged', problems: [] };
  }
}
