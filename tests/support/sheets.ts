import type { StripRecording } from '../../shared/engine/render';
import type { DrawingItem, TextItem } from '../../shared/paper/drawing';
import { layoutSheetPages } from '../../shared/paper/pages/sheet-pages';
import type { SheetDocument, SheetPage, SheetSubject } from '../../shared/paper/pages/sheet-document';
import { textWidthMm } from '../../shared/paper/text';
import { pageSetupSchema, type PageSetup } from '../../shared/parameters/page-setup';

export type PageSetupInput = Partial<PageSetup>;

export const made = { madeOn: '1 December 2026', organisation: 'Tarn Valley Ambulance College' };

export function buildSetup(overrides: PageSetupInput = {}): PageSetup {
  return pageSetupSchema.parse(overrides);
}

/** A recording as the n-th strip of a document, with words that tell the answer. */
export function subjectOf(strip: StripRecording, n = 1, words: Partial<SheetSubject> = {}): SheetSubject {
  return {
    strip,
    title: 'Ventricular pacing from the apex',
    questionTitle: `Strip ${n}`,
    teachingPoint: 'Look for the spike before every wide complex.',
    ...words,
  };
}

export function sheetsOf(subjects: readonly SheetSubject[], overrides: PageSetupInput = {}): SheetDocument {
  return layoutSheetPages(subjects, buildSetup(overrides), made);
}

/** A rectangle on paper, mm. */
export interface Box {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

/** From the baseline to the height of capitals. */
export function textBox(item: TextItem): Box {
  const size = { sizeMm: item.sizeMm, lineMm: item.sizeMm };
  const width = textWidthMm(item.text, { ...item, size });
  const share = { start: 0, middle: 0.5, end: 1 }[item.anchor];
  const left = item.xMm - share * width;
  return { left, right: left + width, top: item.yMm - 0.7 * item.sizeMm, bottom: item.yMm };
}

function pointsBox(points: Float64Array): Box {
  const box: Box = { left: Infinity, right: -Infinity, top: Infinity, bottom: -Infinity };
  for (let i = 0; i < points.length; i += 2) {
    box.left = Math.min(box.left, points[i]);
    box.right = Math.max(box.right, points[i]);
    box.top = Math.min(box.top, points[i + 1]);
    box.bottom = Math.max(box.bottom, points[i + 1]);
  }
  return box;
}

export function itemBox(item: DrawingItem): Box {
  switch (item.kind) {
    case 'polyline':
    case 'polygon':
      return pointsBox(item.pointsMm);
    case 'line':
      return pointsBox(Float64Array.of(item.x1Mm, item.y1Mm, item.x2Mm, item.y2Mm));
    case 'rect': {
      const [right, bottom] = [item.xMm + item.widthMm, item.yMm + item.heightMm];
      return { left: item.xMm, right, top: item.yMm, bottom };
    }
    case 'circle': {
      const { cxMm, cyMm, radiusMm: r } = item;
      return { left: cxMm - r, right: cxMm + r, top: cyMm - r, bottom: cyMm + r };
    }
    case 'text':
      return textBox(item);
  }
}

export function overlap(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
}

export function textsOf(page: SheetPage): TextItem[] {
  return page.items.filter((item) => item.kind === 'text');
}

/** All words of a page in one string, lines joined by blanks. */
export function wordsOf(page: SheetPage): string {
  return textsOf(page)
    .map((item) => item.text)
    .join(' ');
}
