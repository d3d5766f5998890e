import { foldText } from '../../shared/api/text';

/** What a search looks through, folded. Parts are kept apart so that no match spans two of them. */
export function searchTextOf(parts: readonly string[]): string {
  return foldText(parts.join('\n'));
}

/** A LIKE pattern (escape character `\`) that finds a word anywhere. */
export function containsPattern(word: string): string {
  return `%${foldText(word).replace(/[\\%_]/g, '\\$&')}%`;
}
