import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { renderStrip } from '../../../shared/engine/render';
import { tabledCharacters } from '../../../shared/paper/font-advances';
import { leadNames } from '../../../shared/parameters/sheet';
import type { SheetKind } from '../../../shared/paper/pages/sheet-document';
import type { PageSetup } from '../../../shared/parameters/page-setup';
import { arbitraryStrip } from '../../support/arbitrary-strips';
import { buildSetup, sheetsOf, subjectOf, wordsOf, type PageSetupInput } from '../../support/sheets';
import { buildStrip } from '../../support/strips';
import { documentFaults, drawnSpans } from './sheet-checks';

const layouts = ['single', 'stacked', '3x4', '3x4+1', '3x4+3', '6x2', '12x1'] as const;
const strip = renderStrip(
  buildStrip({
    patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
    pacing: { source: 'implanted', mode: 'DDD' },
  }),
);
const minute = renderStrip(buildStrip({ durationS: 60, pacing: { source: 'implanted', mode: 'VVI' } }));

const places = layouts.flatMap((layout) =>
  (['a4', 'letter'] as const).flatMap((paper) =>
    (['landscape', 'portrait'] as const).map((orientation) => ({ layout, paper, orientation })),
  ),
);

describe('every layout on every paper, at every speed and gain', () => {
  it.each(places)('$layout on $paper $orientation', (place) => {
    for (const speedMmPerS of [25, 50] as const) {
      for (const gainMmPerMv of [5, 10, 20] as const) {
        const setup = buildSetup({ ...place, speedMmPerS, gainMmPerMv });
        const subjects = [subjectOf(strip)];
        const document = sheetsOf(subjects, setup);
        expect(documentFaults(document, subjects, setup)).toEqual([]);
        expect(document.pages.length).toBeGreaterThanOrEqual(2);
      }
    }
  });
});

const choice = <T>(...values: readonly T[]): fc.Arbitrary<T> => fc.constantFrom(...values);
const words = (maxLength: number): fc.Arbitrary<string> =>
  fc.string({ maxLength, unit: fc.constantFrom(...tabledCharacters) });

const arbitrarySetup: fc.Arbitrary<PageSetup> = fc
  .record({
    paper: choice('a4' as const, 'letter' as const),
    orientation: choice('landscape' as const, 'portrait' as const),
    layout: choice(...layouts),
    leads: fc.shuffledSubarray([...leadNames], { minLength: 1 }),
    leadOrder: choice('usual' as const, 'cabrera' as const),
    speedMmPerS: choice(25 as const, 50 as const),
    gainMmPerMv: choice(5 as const, 10 as const, 20 as const),
    chestGainMmPerMv: choice(null, 5 as const, 10 as const, 20 as const),
    gridTint: choice('rose' as const, 'grey' as const),
    sheets: choice('plain' as const, 'question' as const, 'answer' as const, 'both' as const),
    cohort: words(80),
    nameLine: fc.boolean(),
    answerLines: fc.integer({ min: 0, max: 8 }),
    stimuliNamed: fc.boolean(),
    intervals: fc.boolean(),
    ladder: fc.boolean(),
    reading: fc.boolean(),
  })
  .map((input) => buildSetup(input));

const arbitrarySubject = fc
  .record({
    input: arbitraryStrip,
    durationS: choice(1, 2, 7, 12, 23),
    title: words(120),
    teachingPoint: words(300),
  })
  .map(({ input, durationS, title, teachingPoint }) => {
    const parameters = { ...input, durationS, title };
    return { strip: renderStrip(buildStrip(parameters)), title, teachingPoint };
  });

describe('any strips in any setup', () => {
  it('lie within the margins, no text on another, every sample at its millimetre', () => {
    fc.assert(
      fc.property(
        arbitrarySetup,
        fc.array(arbitrarySubject, { minLength: 1, maxLength: 3 }),
        (setup, made) => {
          const subjects = made.map((one, i) => subjectOf(one.strip, i + 1, one));
          expect(documentFaults(sheetsOf(subjects, setup), subjects, setup)).toEqual([]);
        },
      ),
      { numRuns: 25, seed: 20261201, endOnFailure: true },
    );
  }, 120_000);
});

describe('nothing is scaled', () => {
  it('ten seconds are one line of 250 mm on A4 and Letter landscape', () => {
    for (const paper of ['a4', 'letter'] as const) {
      const { pages, notes } = sheetsOf([subjectOf(strip)], { paper, layout: '3x4+1', sheets: 'question' });
      expect(pages).toHaveLength(1);
      const rhythm = pages[0].systems[0].segments.at(-1);
      expect([rhythm?.fromS, rhythm?.toS, rhythm?.widthMm]).toEqual([0, 10, 250]);
      expect(notes).toEqual([]);
    }
  });

  it('what is too wide goes on below, without losing a second, and says so', () => {
    const { pages, notes } = sheetsOf([subjectOf(strip)], {
      orientation: 'portrait',
      layout: '3x4+1',
      sheets: 'question',
    });
    const spans = (column: string) =>
      drawnSpans({ title: '', pages, notes }, 'question', 0, ({ label }) => label === column);
    expect(spans('I')).toEqual([[0, 2.5]]);
    expect(spans('V4')).toEqual([[7.5, 10]]);
    expect(spans('II')).toEqual([
      [0, 2.5],
      [0, 5],
      [5, 10],
    ]);
    expect(notes).toContain('Strip 1: Rows are wrapped to keep true scale: 2 of 4 columns a line.');
    expect(wordsOf(pages[0])).toContain('Rows are wrapped to keep true scale: 2 of 4 columns a line.');
  });

  it.each(['single', 'stacked', '12x1'] as const)('a minute of %s is drawn whole, over pages', (layout) => {
    for (const orientation of ['landscape', 'portrait'] as const) {
      const document = sheetsOf([subjectOf(minute)], { layout, orientation, leads: ['V1', 'II'] });
      for (const kind of ['question', 'answer'] as const) {
        const spans = drawnSpans(document, kind, 0, ({ label }) => label === 'V1');
        expect(spans[0][0]).toBe(0);
        spans.slice(1).forEach(([fromS], i) => expect(fromS).toBeCloseTo(spans[i][1], 9));
        expect(spans[spans.length - 1][1]).toBeCloseTo(60, 9);
      }
      expect(document.notes.some((note) => note.startsWith('Strip 1: Continued on'))).toBe(true);
    }
  });

  it('columns are shortened where that saves lines, and what is lost is said', () => {
    const document = sheetsOf([subjectOf(strip)], { paper: 'letter', layout: '3x4', speedMmPerS: 50 });
    expect(drawnSpans(document, 'question', 0, ({ label }) => label === 'V6')[0][1]).toBeCloseTo(9.8, 9);
    expect(document.notes).toContain('Strip 1: Columns are shortened to 2.45 s a lead to keep true scale.');
    expect(document.notes).toContain('Strip 1: The last 0.2 s are not drawn.');
  });
});

describe('several strips', () => {
  const three = [1, 2, 3].map((n) => subjectOf(strip, n));
  const leads: PageSetupInput = { layout: 'single', leads: ['II'] };

  it('share a page while they fit, in order, each under its heading', () => {
    const { pages } = sheetsOf(three, { ...leads, sheets: 'plain' });
    expect(pages).toHaveLength(1);
    expect(pages[0].systems.map(({ subject }) => subject)).toEqual([0, 1, 2]);
    expect(pages[0].label).toBe('Strips 1 to 3');
  });

  it('question sheets are followed by the answers of their strips', () => {
    const { pages } = sheetsOf(three, leads);
    const subjectsOf = (wanted: SheetKind): number[] =>
      pages
        .filter(({ kind }) => kind === wanted)
        .flatMap(({ systems }) => systems.map(({ subject }) => subject));
    expect(subjectsOf('question')).toEqual([0, 1, 2]);
    expect(subjectsOf('answer')).toEqual([0, 1, 2]);
    expect([pages[0].kind, pages[pages.length - 1].kind]).toEqual(['question', 'answer']);
  });

  it('a document needs a strip', () => {
    expect(() => sheetsOf([])).toThrow('at least one strip');
  });
});

describe('question and answer', () => {
  const sentences = strip.reading.findings.map(({ text }) => text);

  it.each(layouts)('%s: the question tells nothing, the answer everything', (layout) => {
    const subject = subjectOf(strip);
    const { pages, title } = sheetsOf([subject], { layout });
    for (const page of pages.filter(({ kind }) => kind === 'question')) {
      const all = `${wordsOf(page)} ${page.title} ${page.description} ${page.label} ${title}`;
      for (const secret of [
        subject.title,
        subject.teachingPoint,
        ...sentences,
        'stimulus',
        'Atria',
        'AV 1',
      ]) {
        expect(all).not.toContain(secret);
      }
      expect(page.items.some((item) => item.role === 'ladder' || item.role === 'annotation')).toBe(false);
    }
    const answer = pages
      .filter(({ kind }) => kind === 'answer')
      .map(wordsOf)
      .join(' ');
    const told = [
      subject.title,
      subject.teachingPoint,
      ...sentences,
      'atrial stimulus',
      'ventricular stimulus',
    ];
    for (const words of told) expect(answer).toContain(words);
    expect(answer).toContain(`AV ${strip.reading.avIntervalMs} ms`);
  });

  it('both carry the cautions, the cohort, the scale and the date', () => {
    for (const page of sheetsOf([subjectOf(strip)], { cohort: 'Autumn B', layout: '3x4+1' }).pages) {
      const all = wordsOf(page);
      expect(all).toContain('Synthetic teaching strip, not a patient recording');
      expect(all).toContain('Tarn Valley Ambulance College, cohort Autumn B');
      expect(all).toContain('25 mm/s 10 mm/mV 0.05–150 Hz');
      expect(all).toContain('made 1 December 2026');
      expect(all).toContain(page.kind === 'question' ? 'Question sheet' : 'Answer sheet');
    }
  });
});
