import type { SheetParameters } from '../parameters/strip-parameters';
import { syntheticCaution } from './cautions';
import { moveItem, type Drawing, type DrawingItem } from './drawing';
import { layoutFooter } from './footer';
import { layoutHeader, settingsLabel } from './header';
import { usualLineS } from './layout';
import { layoutPanel, movePanel, type Panel } from './panel';
import type { PaperStrip } from './paper-strip';
import { placeBlock, textBlock } from './text-block';
import { textStyles } from './text-styles';

/** One strip of a contact sheet. */
export interface ContactCard {
  strip: PaperStrip;
  title: string;
  /** What to see in it, in a sentence or two. */
  caption: string;
}

export interface ContactSheetOptions {
  title: string;
  /** Under the title; none when absent. */
  subtitle?: string;
  /** One layout, speed, gain and tint for all strips, so that they can be compared. */
  sheet: SheetParameters;
  /** Strips side by side, at least 1; 2 by default. */
  columns?: number;
}

/** Free paper around the sheet, mm. */
const marginMm = 20;
/** Between strips side by side, and between one row of strips and the next, mm. */
const columnGapMm = 18;
const rowGapMm = 14;
const headerGapMm = 10;
const captionGapMm = 2;
const footerGapMm = 8;
/** Paper of a strip is at least this wide, mm: room for its title. */
const leastPaperWidthMm = 140;

/** What a card draws, from its upper left corner. */
interface LaidCard {
  items: DrawingItem[];
  heightMm: number;
}

function layCard(card: ContactCard, loosePanel: Panel, sheet: SheetParameters, widthMm: number): LaidCard {
  const texts = {
    title: card.title,
    subtitle: card.caption,
    settings: settingsLabel(card.strip, sheet),
    provenance: '',
  };
  const styles = { title: textStyles.cardTitle, subtitle: textStyles.subtitle };
  const header = layoutHeader(texts, styles, widthMm);
  const panelTopMm = Math.ceil(header.heightMm + captionGapMm);
  const panel = movePanel(loosePanel, 0, panelTopMm);
  const notesTopMm = panelTopMm + panel.area.heightMm + captionGapMm / 2;
  const notes = textBlock([{ text: panel.notes.join(' '), style: textStyles.note, widthMm }]);
  return {
    items: [...placeBlock(header, 0, 0), ...panel.items, ...placeBlock(notes, 0, notesTopMm)],
    heightMm: Math.ceil(notesTopMm + notes.heightMm),
  };
}

/** Cards in rows of `columns`, tops aligned, each row as high as its highest card. */
function arrange(cards: readonly LaidCard[], columns: number, widthMm: number, topMm: number): LaidCard {
  const items: DrawingItem[] = [];
  let rowTopMm = topMm;
  for (let first = 0; first < cards.length; first += columns) {
    const row = cards.slice(first, first + columns);
    row.forEach((card, column) => {
      const xMm = marginMm + column * (widthMm + columnGapMm);
      items.push(...card.items.map((item) => moveItem(item, xMm, rowTopMm)));
    });
    rowTopMm += Math.max(...row.map((card) => card.heightMm)) + rowGapMm;
  }
  return { items, heightMm: rowTopMm - rowGapMm };
}

/**
 * Many strips on one large sheet for looking over a collection, each at true scale with its title, caption and
 * settings above it, in reading order. Throws RangeError without cards, for fewer than one column, and for a
 * strip that is empty or uneven.
 */
export function layoutContactSheet(cards: readonly ContactCard[], options: ContactSheetOptions): Drawing {
  const { sheet, title, subtitle = '', columns = 2 } = options;
  if (cards.length === 0 || columns < 1) {
    throw new RangeError(`A contact sheet needs cards and columns; it has ${cards.length} and ${columns}`);
  }
  const panelOptions = { leastWidthMm: leastPaperWidthMm, lineS: usualLineS };
  const panels = cards.map(({ strip }) => layoutPanel(strip, sheet, panelOptions));
  const cardWidthMm = Math.max(...panels.map((panel) => panel.area.widthMm));
  const laid = cards.map((card, i) => layCard(card, panels[i], sheet, cardWidthMm));
  const used = Math.min(columns, cards.length);
  const widthMm = used * cardWidthMm + (used - 1) * columnGapMm;
  const header = textBlock([
    { text: title, style: textStyles.posterTitle, widthMm },
    { text: subtitle, style: textStyles.posterSubtitle, widthMm },
  ]);
  const body = arrange(laid, used, cardWidthMm, Math.ceil(marginMm + header.heightMm + headerGapMm));
  const footer = layoutFooter([], widthMm);
  const footerTopMm = body.heightMm + footerGapMm;
  const size = {
    widthMm: widthMm + 2 * marginMm,
    heightMm: Math.ceil(footerTopMm + footer.heightMm + marginMm),
  };
  return {
    ...size,
    title,
    description: `${syntheticCaution}. ${cards.map((card) => card.title).join('; ')}.`,
    items: [
      { kind: 'rect', role: 'page', xMm: 0, yMm: 0, ...size, fill: 'page' },
      ...placeBlock(header, marginMm, marginMm),
      ...body.items,
      ...placeBlock(footer, marginMm, footerTopMm),
    ],
  };
}
