import { moveItem, type DrawingItem, type TextItem } from './drawing';
import { textItem, wrapText, type TextStyle } from './text';
import { capHeightEm } from './tokens';

/** Lines of text set from the corner (0, 0); `heightMm` ends below the last line, descenders included. */
export interface TextBlock {
  items: TextItem[];
  heightMm: number;
}

/** Baseline of a line that starts at `topMm`: its capitals stand in the middle of the line height. */
export function baselineMm(topMm: number, style: TextStyle): number {
  return topMm + (style.size.lineMm + style.size.sizeMm * capHeightEm) / 2;
}

/** Texts one below the other, each broken to the width; empty ones take no room. */
export function textBlock(
  texts: readonly { text: string; style: TextStyle; widthMm: number; gapAboveMm?: number }[],
): TextBlock {
  const items: TextItem[] = [];
  let topMm = 0;
  for (const { text, style, widthMm, gapAboveMm } of texts) {
    const lines = wrapText(text, style, widthMm);
    if (lines.length > 0) topMm += gapAboveMm ?? 0;
    for (const line of lines) {
      items.push(textItem(line, style, 0, baselineMm(topMm, style)));
      topMm += style.size.lineMm;
    }
  }
  return { items, heightMm: topMm };
}

/** The block's items with its corner at (xMm, yMm). */
export function placeBlock(block: TextBlock, xMm: number, yMm: number): DrawingItem[] {
  return block.items.map((item) => moveItem(item, xMm, yMm));
}
