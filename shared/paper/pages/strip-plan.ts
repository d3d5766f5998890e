import { ladderOf } from '../../ladder/ladder';
import { leadNames } from '../../parameters/sheet';
import { untitled } from '../header';
import { stripDurationS } from '../paper-strip';
import { flowHeightMm, type FlowItem } from './flow';
import { intervalsOf, type Interval } from './intervals';
import type { PageWords } from './page-furniture';
import { planLines } from './page-lines';
import { pageRows } from './page-rows';
import type { SheetKind, SheetSubject } from './sheet-document';
import { spacingsOf, type Spacing } from './spacing';
import { namedStimuli, type NamedStimulus } from './stimulus-names';
import { drawPart, laySystem, partOf, type System, type SystemContext, type SystemPart } from './system';
import { answerLinesFlow, readingFlow } from './tail';

/** Between the lines of a strip where a line has several rows or a ladder, mm. */
const systemGapMm = 3;
const longestCutNote = `Cut at the edge of the paper: ${leadNames.join(', ')}, −.`;
const crowdedNote = 'Rows stand closer than their traces are tall.';

/** Room to keep for notes where it is open what will be drawn. */
export const longestDrawnNotes: readonly string[] = [crowdedNote, longestCutNote];

/** A strip on one kind of sheet, laid out along the paper; where its rows stand is still open. */
export interface StripPlan {
  kind: SheetKind;
  subject: SheetSubject;
  /** Index among the document's subjects. */
  index: number;
  /** `Strip 1` on a question sheet; with the title on others. */
  heading: string;
  context: SystemContext;
  systems: System[];
  tail: FlowItem[];
  /** What cutting it into lines did. */
  notes: string[];
}

function headingOf(kind: SheetKind, { title, questionTitle }: SheetSubject, alone: boolean): string {
  if (kind === 'question') return questionTitle;
  const words = title === '' ? untitled : title;
  return kind === 'answer' && !alone ? `${questionTitle}: ${words}` : words;
}

function tailOf(kind: SheetKind, subject: SheetSubject, { setup, frame }: PageWords): FlowItem[] {
  if (kind === 'plain') return [];
  if (kind === 'question') return answerLinesFlow(setup.answerLines, frame.contentWidthMm);
  const sentences = setup.reading ? (subject.strip.reading?.findings ?? []).map(({ text }) => text) : [];
  return readingFlow(setup.reading ? subject.teachingPoint : '', sentences, frame.contentWidthMm);
}

/** Lines with what an answer sheet draws at them; every kind of interval is drawn once. */
function laySystems(
  context: SystemContext,
  lines: ReturnType<typeof planLines>['lines'],
  answer: boolean,
): System[] {
  const { setup, strip } = context;
  const { reading, events = [] }: SheetSubject['strip'] = strip;
  const { toS } = lines[lines.length - 1];
  const shown = events.filter(({ timeS }) => timeS < toS);
  const stimuli: NamedStimulus[] = answer && setup.stimuliNamed ? namedStimuli(shown) : [];
  let intervals: Interval[] = answer && setup.intervals ? intervalsOf(reading?.beats ?? [], shown) : [];
  const ladder = answer && setup.ladder ? ladderOf(events) : null;
  return lines.map((line, i) => {
    const { system, kinds } = laySystem(context, line, i, { stimuli, intervals, ladder });
    intervals = intervals.filter(({ kind }) => !kinds.includes(kind));
    return system;
  });
}

/** Plans a strip on one kind of sheet. Throws RangeError for a strip that is empty or uneven. */
export function planStrip(
  subject: SheetSubject,
  index: number,
  kind: SheetKind,
  words: PageWords,
): StripPlan {
  const { setup, frame } = words;
  const rows = pageRows(setup);
  const context: SystemContext = { strip: subject.strip, setup, frame, rows };
  const { lines, notes } = planLines(rows, stripDurationS(subject.strip), frame.lineS);
  return {
    ...{ kind, subject, index, context, notes },
    heading: headingOf(kind, subject, words.alone),
    systems: laySystems(context, lines, kind === 'answer'),
    tail: tailOf(kind, subject, words),
  };
}

/** Rows that still go on the page where a system begins are not cut where they fit on one page. */
function partsOf(system: System, spacing: Spacing, roomMm: number): SystemPart[] {
  const { length } = system.rows;
  for (let count = 1; count <= length; count++) {
    const each = Math.ceil(length / count);
    const parts: SystemPart[] = [];
    for (let from = 0; from < length; from += each) {
      parts.push(partOf(system, spacing, from, Math.min(length, from + each)));
    }
    if (parts.every((part) => part.heightMm <= roomMm)) return parts;
  }
  const last = partOf(system, spacing, length - 1, length);
  const limitMm = Math.floor((roomMm - (last.heightMm - last.gridHeightMm)) / 10) * 5;
  const limited = { ...spacing, edgeLimitMm: limitMm };
  return system.rows.map((_, row) => partOf(system, limited, row, row + 1));
}

function partFlow(part: SystemPart, plan: StripPlan, gapMm: number): FlowItem {
  const draw = (): ReturnType<FlowItem['draw']> => {
    const { items, stopped, placed } = drawPart(part, plan.context);
    const notes = [
      ...(part.crowded ? [crowdedNote] : []),
      ...(stopped.length > 0 ? [`Cut at the edge of the paper: ${stopped.join(', ')}.`] : []),
    ];
    return { items, notes, system: { subject: plan.index, ...placed } };
  };
  const expects = [...(part.crowded ? [crowdedNote] : []), ...(part.cut ? [longestCutNote] : [])];
  const respaced = (spacing: Spacing): FlowItem =>
    partFlow(partOf(part.system, spacing, part.fromRow, part.toRow), plan, gapMm);
  return { heightMm: part.heightMm, gapMm, expects, respaced, draw };
}

/** The systems of a plan at a spacing, rows broken where a page of `roomMm` cannot hold them, then what follows them. */
export function stripFlow(plan: StripPlan, spacing: Spacing, roomMm = Infinity): FlowItem[] {
  const { systems, tail } = plan;
  const close = systems[0].rows.length === 1 && !systems[0].ladder;
  const tailMm = tail.length > 0 ? flowHeightMm(tail) + tail[0].gapMm : 0;
  // What follows the strip should find room under its last rows.
  const lastRoomMm = tailMm < roomMm / 2 ? roomMm - tailMm : roomMm;
  const parts = systems.flatMap((system, i) =>
    partsOf(system, spacing, i === systems.length - 1 ? lastRoomMm : roomMm),
  );
  const rows = parts.map((part) => partFlow(part, plan, close ? 0 : systemGapMm));
  return [...rows, ...tail.map((item, i) => ({ ...item, keep: i === 0 }))];
}

/** Spacings to try for a plan, roomiest first. */
export function planSpacings(plan: StripPlan): Spacing[] {
  return spacingsOf(Math.max(...plan.systems.map((system) => system.pitchMm)));
}
