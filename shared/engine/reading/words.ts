const smallNumbers = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];

/** Numbers to ten in words, larger ones in figures. */
export function numberWord(count: number): string {
  return smallNumbers[count] ?? String(count);
}

/** "One escape", "Three escapes": a sentence's opening. */
export function countOf(count: number, one: string, many: string): string {
  const word = numberWord(count);
  return `${word.charAt(0).toUpperCase()}${word.slice(1)} ${count === 1 ? one : many}`;
}

/** "a", "a and b", "a, b and c". */
export function listWords(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}`;
}
