import type { DrawingRole, FontFamily, FontWeight, TextAnchor, TextItem } from './drawing';
import { monoAdvance, sansAdvances, tabledCharacters } from './font-advances';
import type { PaperColour, TypeSize } from './tokens';

export interface TextStyle {
  role: DrawingRole;
  family: FontFamily;
  weight: FontWeight;
  size: TypeSize;
  trackingEm?: number;
  colour: PaperColour;
}

/** Advance taken for a character that is not tabled, thousandths of an em: that of a wide capital. */
const untabledAdvance = 720;

const indexOfCharacter = new Map([...tabledCharacters].map((character, i) => [character, i]));

function advance(character: string, style: TextStyle): number {
  if (style.family === 'mono') return monoAdvance;
  const index = indexOfCharacter.get(character);
  return index === undefined ? untabledAdvance : sansAdvances[style.weight][index];
}

/** Width of a text set on one line, mm, without kerning. */
export function textWidthMm(text: string, style: TextStyle): number {
  const characters = [...text];
  const thousandths = characters.reduce((sum, character) => sum + advance(character, style), 0);
  return (thousandths / 1000 + characters.length * (style.trackingEm ?? 0)) * style.size.sizeMm;
}

/** Longest head of a word that fits; at least one character, so that setting always gets on. */
function fittingHead(word: string, style: TextStyle, widthMm: number): string {
  const characters = [...word];
  let count = characters.length;
  while (count > 1 && textWidthMm(characters.slice(0, count).join(''), style) > widthMm) count--;
  return characters.slice(0, count).join('');
}

/**
 * Breaks a text into lines no wider than `widthMm`, between words; a word wider than a line is broken inside.
 * An empty text gives no line.
 */
export function wrapText(text: string, style: TextStyle, widthMm: number): string[] {
  const lines: string[] = [];
  let line = '';
  const words = text.split(/\s+/u).filter((word) => word !== '');
  while (words.length > 0) {
    const word = words[0];
    const longer = line === '' ? word : `${line} ${word}`;
    if (textWidthMm(longer, style) <= widthMm) {
      line = longer;
      words.shift();
    } else if (line !== '') {
      lines.push(line);
      line = '';
    } else {
      line = fittingHead(word, style, widthMm);
      words.shift();
      if (line.length < word.length) words.unshift(word.slice(line.length));
    }
  }
  return line === '' ? lines : [...lines, line];
}

/** One line of text; `yMm` is its baseline. */
export function textItem(
  text: string,
  style: TextStyle,
  xMm: number,
  yMm: number,
  anchor: TextAnchor = 'start',
): TextItem {
  const { size, trackingEm, ...rest } = style;
  return {
    kind: 'text',
    ...rest,
    text,
    xMm,
    yMm,
    anchor,
    sizeMm: size.sizeMm,
    ...(trackingEm ? { trackingEm } : {}),
  };
}
