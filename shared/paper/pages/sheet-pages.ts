import type { PageSetup } from '../../parameters/page-setup';
import { expectedNotes, flowHeightMm, paginate, roomiest, type FlowItem } from './flow';
import { pageFrame } from './page-frame';
import { finishPage, pageHead, roomMm, stripHeading, type PageDraft, type PageWords } from './page-furniture';
import type { SheetDocument, SheetKind, SheetMade, SheetPage, SheetSubject } from './sheet-document';
import { longestDrawnNotes, planSpacings, planStrip, stripFlow, type StripPlan } from './strip-plan';

/** Between the strips of a page, mm. */
const stripGapMm = 6;
/** Over several pages rows are not brought closer than this share of what they ask for. */
const leastCrowdedShare = 0.75;
const goesOn = 'Continued on the next page.';

const kindsOf: Readonly<Record<PageSetup['sheets'], readonly SheetKind[]>> = {
  plain: ['plain'],
  question: ['question'],
  answer: ['answer'],
  both: ['question', 'answer'],
};

/** `Strip 1`, `Strips 1 to 3`, or the first and last name where they are no numbers. */
function groupName(subjects: readonly SheetSubject[]): string {
  const names = subjects.map(({ questionTitle }) => questionTitle);
  const [first, last] = [names[0], names[names.length - 1]];
  if (first === last) return first;
  const numbers = [first, last].map((name) => /^Strip (\d+)$/u.exec(name)?.[1]);
  const between = subjects.length === 2 ? 'and' : 'to';
  return numbers[0] && numbers[1]
    ? `Strips ${numbers[0]} ${between} ${numbers[1]}`
    : `${first} ${between} ${last}`;
}

function labelOf(name: string, kind: SheetKind): string {
  return kind === 'plain' ? name : `${name}: ${kind}`;
}

/** Several strips on one page, each under its heading; null when they do not fit. */
function sharedPage(plans: readonly StripPlan[], words: PageWords): PageDraft | null {
  const [{ kind }] = plans;
  const name = groupName(plans.map(({ subject }) => subject));
  const title = kind === 'answer' ? `${name}: answers` : name;
  const head = pageHead(words, kind, title, null);
  const notes = plans.flatMap((plan) => plan.notes.map((note) => `${plan.subject.questionTitle}: ${note}`));
  for (const trimmed of [false, true]) {
    const flow = plans.flatMap((plan) => {
      const { context, heading } = plan;
      const spacing = { ...planSpacings(plan)[0], trimmed };
      const top = stripHeading(context.strip, heading, words.frame, stripGapMm);
      return [top, ...named(stripFlow(plan, spacing), plan.subject.questionTitle)];
    });
    const room = roomMm(words.frame, head, [...notes, ...expectedNotes(flow)]);
    if (flowHeightMm(flow) <= room) return { kind, label: labelOf(name, kind), title, head, flow, notes };
  }
  return null;
}

/** Items whose notes say which strip they speak of. */
function named(flow: readonly FlowItem[], name: string): FlowItem[] {
  return flow.map((item) => ({
    ...item,
    expects: item.expects?.map((note) => `${name}: ${note}`),
    draw: () => {
      const drawn = item.draw();
      return { ...drawn, notes: (drawn.notes ?? []).map((note) => `${name}: ${note}`) };
    },
  }));
}

/** A long strip over as few pages as its rows allow without much crowding, each page then as roomy as it can be. */
function fewestPages(plan: StripPlan, room: number): FlowItem[][] {
  const choices = planSpacings(plan)
    .filter((spacing, _, [{ pitchMm }]) => spacing.pitchMm >= pitchMm * leastCrowdedShare)
    .map((spacing) => paginate(stripFlow(plan, spacing, room), room));
  const fewest = choices.reduce((best, pages) => (pages.length < best.length ? pages : best));
  return fewest.map((page) => roomiest(page, planSpacings(plan), room));
}

/** One strip on one page where any spacing allows it, else over as many pages as it takes. */
function ownPages(plan: StripPlan, words: PageWords): PageDraft[] {
  const { kind, heading, context, subject, notes } = plan;
  const head = pageHead(words, kind, heading, context.strip);
  const label = labelOf(subject.questionTitle, kind);
  const draft = { kind, title: heading, head };
  for (const spacing of planSpacings(plan)) {
    const flow = stripFlow(plan, spacing);
    const room = roomMm(words.frame, head, [...notes, ...expectedNotes(flow)]);
    if (flowHeightMm(flow) <= room) return [{ ...draft, label, flow, notes }];
  }
  const pages = fewestPages(plan, roomMm(words.frame, head, [...notes, ...longestDrawnNotes, goesOn]));
  return pages.map((flow, i) => ({
    ...draft,
    label: `${label}, page ${i + 1} of ${pages.length}`,
    flow,
    notes: [...(i === 0 ? notes : []), ...(i < pages.length - 1 ? [goesOn] : [])],
  }));
}

/** Pages of one kind: strips share a page while they fit, others have their own. */
function pagesOf(
  plans: readonly StripPlan[],
  words: PageWords,
): { drafts: PageDraft[]; plans: StripPlan[] }[] {
  const pages: { drafts: PageDraft[]; plans: StripPlan[] }[] = [];
  for (const plan of plans) {
    const last = pages.at(-1);
    const shared = last ? sharedPage([...last.plans, plan], words) : null;
    if (last && shared) {
      last.drafts = [shared];
      last.plans.push(plan);
    } else {
      pages.push({ drafts: ownPages(plan, words), plans: [plan] });
    }
  }
  return pages;
}

/** Pages of the first kind, and after each of them the other sheets of its strips. */
function allDrafts(subjects: readonly SheetSubject[], words: PageWords): PageDraft[] {
  const [first, ...others] = kindsOf[words.setup.sheets];
  const plansOf = (kind: SheetKind, indices: readonly number[]): StripPlan[] =>
    indices.map((index) => planStrip(subjects[index], index, kind, words));
  return pagesOf(plansOf(first, [...subjects.keys()]), words).flatMap(({ drafts, plans }) => {
    const indices = plans.map(({ index }) => index);
    const rest = others.flatMap((kind) => pagesOf(plansOf(kind, indices), words));
    return [...drafts, ...rest.flatMap((page) => page.drafts)];
  });
}

/** Pages of one kind are numbered by themselves, so that question sheets can be handed out alone. */
function finished(drafts: readonly PageDraft[], words: PageWords): { page: SheetPage; notes: string[] }[] {
  return drafts.map((draft) => {
    const alike = drafts.filter((other) => other.kind === draft.kind);
    const number = alike.length > 1 ? `page ${alike.indexOf(draft) + 1} of ${alike.length}` : '';
    return finishPage(draft, words, number);
  });
}

/** Notes of all pages, each once and with its strip, and which strips take several pages. */
function documentNotes(
  subjects: readonly SheetSubject[],
  done: readonly { page: SheetPage; notes: string[] }[],
): string[] {
  const notes = done.flatMap(({ page, notes: own }) => {
    const strips = [...new Set(page.systems.map(({ subject }) => subject))];
    const name = strips.length === 1 ? `${subjects[strips[0]].questionTitle}: ` : '';
    return own
      .filter((note) => note !== goesOn)
      .map((note) => (note.startsWith(name) ? note : `${name}${note}`));
  });
  const long = subjects.flatMap(({ questionTitle }, subject) => {
    const pages = (kind: SheetKind): number =>
      done.filter(({ page }) => page.kind === kind && page.systems.some((one) => one.subject === subject))
        .length;
    const most = Math.max(pages('plain'), pages('question'), pages('answer'));
    return most > 1 ? [`${questionTitle}: Goes on over ${most} pages.`] : [];
  });
  return [...new Set([...notes, ...long])];
}

function documentTitle(
  subjects: readonly SheetSubject[],
  setup: PageSetup,
  drafts: readonly PageDraft[],
): string {
  if (setup.sheets === 'question') return 'Question sheets';
  if (setup.sheets === 'both') return 'Question and answer sheets';
  if (subjects.length === 1) return drafts[0].title;
  return setup.sheets === 'answer' ? 'Answer sheets' : groupName(subjects);
}

/**
 * Lays strips on pages of the chosen paper at true scale: as many whole strips to a page as fit, in order, long ones
 * over several pages. Nothing is ever fitted by scaling: what is too wide is wrapped, and the notes say so. A question
 * sheet holds no title, teaching point, ladder or reading. Throws RangeError without strips and for a strip that is empty
 * or uneven.
 */
export function layoutSheetPages(
  subjects: readonly SheetSubject[],
  setup: PageSetup,
  made: SheetMade,
): SheetDocument {
  if (subjects.length === 0) throw new RangeError('A document of sheets needs at least one strip; it has 0');
  const alone = subjects.length === 1 && setup.sheets !== 'both';
  const words: PageWords = { setup, made, frame: pageFrame(setup), alone };
  const drafts = allDrafts(subjects, words);
  const done = finished(drafts, words);
  return {
    title: documentTitle(subjects, setup, drafts),
    pages: done.map(({ page }) => page),
    notes: documentNotes(subjects, done),
  };
}
