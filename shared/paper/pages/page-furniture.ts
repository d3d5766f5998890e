import type { PageSetup } from '../../parameters/page-setup';
import { bandwidthLabel } from '../bandwidth-label';
import { syntheticCaution } from '../cautions';
import { moveItem, type DrawingItem } from '../drawing';
import { layoutFooter } from '../footer';
import { layoutHeader, provenanceLabel } from '../header';
import type { PaperStrip } from '../paper-strip';
import { textItem, textWidthMm } from '../text';
import { baselineMm, textBlock } from '../text-block';
import { textStyles } from '../text-styles';
import { lineWeightsMm } from '../tokens';
import type { FlowItem } from './flow';
import type { PageFrame } from './page-frame';
import { gainLabel, pageRows } from './page-rows';
import type { PlacedSystem, SheetKind, SheetMade, SheetPage } from './sheet-document';
import { nameLineBlock } from './tail';

/** Between header, contents and footer, mm. */
const headerGapMm = 3;
const footerGapMm = 3;

/** What stands above the contents of a page. */
export interface PageHead {
  items: DrawingItem[];
  heightMm: number;
}

/** Words that all pages of a document share. */
export interface PageWords {
  setup: PageSetup;
  made: SheetMade;
  frame: PageFrame;
  /** One strip and no question sheet, so that nothing has to be told apart by number. */
  alone: boolean;
}

/** `25 mm/s 10 mm/mV`, with the bandwidth where it is one. */
export function scaleLabel(setup: PageSetup, strip: PaperStrip | null): string {
  const scale = `${setup.speedMmPerS} mm/s ${gainLabel(pageRows(setup))}`;
  return strip ? `${scale} ${bandwidthLabel(strip.parameters.recorder)}` : scale;
}

function madeLabel(made: SheetMade, strip: PaperStrip | null): string {
  const date = made.madeOn === '' ? [] : [`made ${made.madeOn}`];
  return [...date, ...(strip ? [provenanceLabel(strip)] : [])].join(', ');
}

function audience({ setup, made }: PageWords): string {
  const cohort = setup.cohort.trim();
  const words = [made.organisation, cohort === '' ? '' : `cohort ${cohort}`].filter((word) => word !== '');
  return words.join(', ');
}

/** Head of a page of one strip, or without `strip` of several; a question sheet has its line for a name. */
export function pageHead(
  words: PageWords,
  kind: SheetKind,
  title: string,
  strip: PaperStrip | null,
): PageHead {
  const { setup, made, frame } = words;
  const header = layoutHeader(
    {
      title,
      subtitle: audience(words),
      settings: scaleLabel(setup, strip),
      provenance: madeLabel(made, strip),
    },
    { title: textStyles.title, subtitle: textStyles.subtitle },
    frame.contentWidthMm,
  );
  if (kind !== 'question' || !setup.nameLine) return header;
  const name = nameLineBlock(frame.contentWidthMm);
  return {
    items: [...header.items, ...name.items.map((item) => moveItem(item, 0, header.heightMm))],
    heightMm: header.heightMm + name.heightMm,
  };
}

/** Between the title of a strip and what makes it again, where both stand on one line, mm. */
const headingGapMm = 6;

/** Heading of a strip on a page of several: its title, and its bandwidth and what makes it again beside or below it. */
export function stripHeading(strip: PaperStrip, title: string, frame: PageFrame, gapMm: number): FlowItem {
  const { cardTitle, provenance } = textStyles;
  const widthMm = frame.contentWidthMm;
  const origin = `${bandwidthLabel(strip.parameters.recorder)}, ${provenanceLabel(strip)}`;
  const beside = textWidthMm(title, cardTitle) + headingGapMm + textWidthMm(origin, provenance) <= widthMm;
  const left = textBlock([
    { text: title, style: cardTitle, widthMm },
    { text: beside ? '' : origin, style: provenance, widthMm },
  ]);
  const right = beside ? [textItem(origin, provenance, widthMm, baselineMm(0, cardTitle), 'end')] : [];
  return {
    heightMm: Math.ceil(left.heightMm + 0.5),
    gapMm,
    draw: () => ({ items: [...left.items, ...right] }),
  };
}

const kindWords: Readonly<Record<SheetKind, string>> = {
  plain: '',
  question: 'Question sheet',
  answer: 'Answer sheet',
};

/** Length of the line by which a print is checked, mm. */
const scaleBarMm = 50;
const scaleBarTickMm = 1.1;
const scaleBarWords = 'Print at actual size: this line is 50 mm long';
const scaleBarGapMm = 2;

function scaleBar(rightMm: number): DrawingItem[] {
  const yMm = textStyles.sheetKind.size.lineMm / 2;
  const bar = { kind: 'line', role: 'scaleBar', colour: 'ink2', weightMm: lineWeightsMm.annotation } as const;
  const leftMm = rightMm - scaleBarMm;
  const tick = (xMm: number): DrawingItem => ({
    ...bar,
    ...{ x1Mm: xMm, y1Mm: yMm - scaleBarTickMm, x2Mm: xMm, y2Mm: yMm + scaleBarTickMm },
  });
  const style = textStyles.note;
  return [
    textItem(scaleBarWords, style, leftMm - scaleBarGapMm, baselineMm(0, style), 'end'),
    { ...bar, x1Mm: leftMm, y1Mm: yMm, x2Mm: rightMm, y2Mm: yMm },
    tick(leftMm),
    tick(rightMm),
  ];
}

/** Height that the foot of a page takes with such notes, mm. */
export function footHeightMm(notes: readonly string[], frame: PageFrame): number {
  return layoutFooter(notes, frame.contentWidthMm).heightMm;
}

/** Height left for the contents of a page, mm. */
export function roomMm(frame: PageFrame, head: PageHead, notes: readonly string[]): number {
  return frame.bottomMm - footHeightMm(notes, frame) - footerGapMm - contentTopMm(frame, head);
}

/** Where contents begin: whole millimetres, so that grids do. */
function contentTopMm(frame: PageFrame, head: PageHead): number {
  return Math.ceil(frame.topMm + head.heightMm + headerGapMm);
}

/** Notes, cautions, the line of 50 mm, the kind of sheet and its number. */
function footItems(
  frame: PageFrame,
  notes: readonly string[],
  kind: SheetKind,
  number: string,
): DrawingItem[] {
  const width = frame.contentWidthMm;
  const footer = layoutFooter(notes, width);
  const cautionsMm = footer.heightMm - 2 * textStyles.caution.size.lineMm;
  const words = [kindWords[kind], number].filter((part) => part !== '').join(', ');
  const secondMm = textStyles.caution.size.lineMm;
  const right = [
    ...scaleBar(width),
    ...(words === ''
      ? []
      : [textItem(words, textStyles.sheetKind, width, baselineMm(secondMm, textStyles.sheetKind), 'end')]),
  ];
  return [...footer.items, ...right.map((item) => moveItem(item, 0, cautionsMm))];
}

/** A page before it has its number. */
export interface PageDraft {
  kind: SheetKind;
  label: string;
  title: string;
  head: PageHead;
  flow: readonly FlowItem[];
  /** Notes besides those that the contents bring. */
  notes: readonly string[];
}

/** The finished page with all its notes; `number` is `page 1 of 2`, or empty. */
export function finishPage(
  draft: PageDraft,
  words: PageWords,
  number: string,
): { page: SheetPage; notes: string[] } {
  const { frame, setup } = words;
  const systems: PlacedSystem[] = [];
  const notes = [...draft.notes];
  const content: DrawingItem[] = [];
  let yMm = contentTopMm(frame, draft.head);
  draft.flow.forEach((item, i) => {
    if (i > 0) yMm += item.gapMm;
    const drawn = item.draw();
    content.push(...drawn.items.map((one) => moveItem(one, frame.xMm, yMm)));
    if (drawn.system) systems.push(movedSystem(drawn.system, frame.xMm, yMm));
    notes.push(...(drawn.notes ?? []).filter((note) => !notes.includes(note)));
    yMm += item.heightMm;
  });
  const foot = footItems(frame, notes, draft.kind, number);
  const footTopMm = frame.bottomMm - footHeightMm(notes, frame);
  const { widthMm, heightMm } = frame;
  const page: SheetPage = {
    ...{ widthMm, heightMm, kind: draft.kind, label: draft.label, title: draft.title, systems },
    description: `${syntheticCaution}. ${scaleLabel(setup, null)}.`,
    items: [
      { kind: 'rect', role: 'page', xMm: 0, yMm: 0, widthMm, heightMm, fill: 'page' },
      ...draft.head.items.map((item) => moveItem(item, frame.xMm, frame.topMm)),
      ...content,
      ...foot.map((item) => moveItem(item, frame.xMm, footTopMm)),
    ],
  };
  return { page, notes };
}

function movedSystem({ subject, grid, segments }: PlacedSystem, dxMm: number, dyMm: number): PlacedSystem {
  return {
    subject,
    grid: { ...grid, xMm: grid.xMm + dxMm, yMm: grid.yMm + dyMm },
    segments: segments.map((one) => ({ ...one, xMm: one.xMm + dxMm, baselineMm: one.baselineMm + dyMm })),
  };
}
