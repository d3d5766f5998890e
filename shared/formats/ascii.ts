/** Characters that do not come apart into a letter and a mark, and what is written for them. */
const plain: Readonly<Record<string, string>> = {
  µ: 'u',
  μ: 'u',
  '–': '-',
  '—': '-',
  '−': '-',
  '‘': "'",
  '’': "'",
  '“': '"',
  '”': '"',
  '…': '...',
  '×': 'x',
  '°': ' deg',
  ß: 'ss',
  æ: 'ae',
  Æ: 'AE',
  ø: 'o',
  Ø: 'O',
  œ: 'oe',
  Œ: 'OE',
  ł: 'l',
  Ł: 'L',
  đ: 'd',
  ð: 'd',
  þ: 'th',
};

/**
 * Text in printable ASCII (32 to 126), for headers that take nothing else: accents are dropped, a few characters
 * spelled out, white space becomes a space, anything else `?`.
 */
export function toAscii(text: string): string {
  return [...text.normalize('NFD').replace(/\p{M}/gu, '')]
    .map((character) => plain[character] ?? (/\s/u.test(character) ? ' ' : character))
    .map((character) => (/^[ -~]+$/u.test(character) ? character : '?'))
    .join('');
}
