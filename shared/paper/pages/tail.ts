import { moveItem, type DrawingItem, type LineItem } from '../drawing';
import { textItem, type TextStyle } from '../text';
import { textBlock, type TextBlock } from '../text-block';
import { textStyles } from '../text-styles';
import { lineWeightsMm } from '../tokens';
import type { FlowItem } from './flow';

/** Texts stand in two columns from this width, mm: longer lines are hard to read. */
const twoColumnsFromMm = 220;
const columnGapMm = 10;
/** Between sentences of a reading, mm. */
const sentenceGapMm = 0.8;
/** Above the first of a reading or of lines for answers, mm. */
const aboveMm = 4;
/** Lines to write on are this far apart, mm: ruled paper for handwriting has 8. */
const writingPitchMm = 8;
/** From the number of a line to the line, mm. */
const numberMm = 6;
/** Below the baseline, mm. */
const lineDropMm = 0.8;

function columnsOf(widthMm: number): { count: number; widthMm: number } {
  const count = widthMm >= twoColumnsFromMm ? 2 : 1;
  return { count, widthMm: (widthMm - (count - 1) * columnGapMm) / count };
}

function flowOf(items: DrawingItem[], heightMm: number, gapMm: number): FlowItem {
  return { heightMm: Math.ceil(heightMm), gapMm, draw: () => ({ items }) };
}

/** Paragraphs divided in order between two columns so that the higher is as low as can be. */
function balanced(blocks: readonly TextBlock[]): [TextBlock[], TextBlock[]] {
  const height = (part: readonly TextBlock[]): number => part.reduce((sum, one) => sum + one.heightMm, 0);
  let best: [TextBlock[], TextBlock[]] = [[...blocks], []];
  for (let split = 0; split <= blocks.length; split++) {
    const parts: [TextBlock[], TextBlock[]] = [blocks.slice(0, split), blocks.slice(split)];
    if (Math.max(...parts.map(height)) < Math.max(...best.map(height))) best = parts;
  }
  return best;
}

function stacked(blocks: readonly TextBlock[], xMm: number): { items: DrawingItem[]; heightMm: number } {
  const items: DrawingItem[] = [];
  let yMm = 0;
  for (const block of blocks) {
    items.push(...block.items.map((item) => moveItem(item, xMm, yMm)));
    yMm += block.heightMm + sentenceGapMm;
  }
  return { items, heightMm: yMm };
}

function paragraph(text: string, style: TextStyle, widthMm: number): TextBlock {
  return textBlock([{ text, style, widthMm }]);
}

/** What is true of a strip in sentences, under the point it teaches; in two columns where there is room. */
export function readingFlow(
  teachingPoint: string,
  sentences: readonly string[],
  widthMm: number,
): FlowItem[] {
  const flow: FlowItem[] = [];
  const point = paragraph(teachingPoint, textStyles.teachingPoint, widthMm);
  if (point.items.length > 0) flow.push(flowOf(point.items, point.heightMm, aboveMm));
  if (sentences.length === 0) return flow;
  const columns = columnsOf(widthMm);
  const blocks = sentences.map((text) => paragraph(text, textStyles.reading, columns.widthMm));
  const gapMm = flow.length > 0 ? 1 : aboveMm;
  if (columns.count === 1) {
    const each = blocks.map(({ items, heightMm }, i) => flowOf(items, heightMm, i > 0 ? 0 : gapMm));
    return [...flow, ...each];
  }
  const [left, right] = balanced(blocks).map((part, i) => stacked(part, i * (columns.widthMm + columnGapMm)));
  flow.push(flowOf([...left.items, ...right.items], Math.max(left.heightMm, right.heightMm), gapMm));
  return flow;
}

function writingLine(x1Mm: number, x2Mm: number, yMm: number): LineItem {
  return {
    kind: 'line',
    role: 'answerLine',
    ...{ x1Mm, y1Mm: yMm, x2Mm, y2Mm: yMm },
    colour: 'edge',
    weightMm: lineWeightsMm.writingLine,
  };
}

/** Numbered blank lines to write on, in two columns where there is room. */
export function answerLinesFlow(count: number, widthMm: number): FlowItem[] {
  const columns = columnsOf(widthMm);
  const perColumn = Math.ceil(count / columns.count);
  const baselineMm = writingPitchMm - lineDropMm - 0.2;
  return Array.from({ length: perColumn }, (_, row) => {
    const numbers = [row + 1, row + 1 + perColumn].slice(0, columns.count).filter((n) => n <= count);
    const items = numbers.flatMap((number, column): DrawingItem[] => {
      const xMm = column * (columns.widthMm + columnGapMm);
      return [
        textItem(String(number), textStyles.answerLine, xMm, baselineMm),
        writingLine(xMm + numberMm, xMm + columns.widthMm, baselineMm + lineDropMm),
      ];
    });
    return flowOf(items, writingPitchMm, row === 0 ? aboveMm / 2 : 0);
  });
}

/** Share of the width that the name takes of a line for name and date. */
const nameShare = 0.62;
const fieldGapMm = 8;
const nameMm = 13;
const dateMm = 11;

/** A blank line for a name and one for a date. */
export function nameLineBlock(widthMm: number): { items: DrawingItem[]; heightMm: number } {
  const baselineMm = writingPitchMm - lineDropMm - 0.2;
  const lineMm = baselineMm + lineDropMm;
  const splitMm = widthMm * nameShare;
  return {
    items: [
      textItem('Name', textStyles.answerLine, 0, baselineMm),
      writingLine(nameMm, splitMm - fieldGapMm, lineMm),
      textItem('Date', textStyles.answerLine, splitMm, baselineMm),
      writingLine(splitMm + dateMm, widthMm, lineMm),
    ],
    heightMm: writingPitchMm,
  };
}
