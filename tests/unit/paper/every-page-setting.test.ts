import { describe, expect, it } from 'vitest';
import { renderStrip } from '../../../shared/engine/render';
import { pageSetupOf, pageSetupSchema, type PageSetup } from '../../../shared/parameters/page-setup';
import type { SheetDocument, SheetPage } from '../../../shared/paper/pages/sheet-document';
import { sheetsOf, subjectOf, wordsOf, type PageSetupInput } from '../../support/sheets';
import { buildStrip } from '../../support/strips';
import { lines, polylines, texts } from './items';

const strip = renderStrip(
  buildStrip({
    patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
    pacing: { source: 'implanted', mode: 'DDD' },
  }),
);

/** What a setting changes, measured on the pages, and its value before and after. */
interface SettingRow {
  base?: PageSetupInput;
  change: PageSetupInput;
  measure: (document: SheetDocument) => unknown;
  before: unknown;
  after: unknown;
}

const last = ({ pages }: SheetDocument): SheetPage => pages[pages.length - 1];
const first = ({ pages }: SheetDocument): SheetPage => pages[0];
const labels = (page: SheetPage): string[] =>
  page.systems.flatMap(({ segments }) => segments.map(({ label }) => label));
/** Heights of the steps of a page's first calibration pulse, mm. */
function pulseHeights(page: SheetPage): number[] {
  const { pointsMm } = polylines(page, 'calibration')[0];
  const heights = [...pointsMm.filter((_, i) => i % 2 === 1)].map((y) => pointsMm[1] - y);
  return [...new Set(heights.filter((height) => height > 0).map((height) => Math.round(height * 1e6) / 1e6))];
}
const annotations = (document: SheetDocument): string[] =>
  texts(last(document), 'annotation').map(({ text }) => text);
const includes = (words: string) => (document: SheetDocument) => wordsOf(last(document)).includes(words);

/** One row for every leaf of the page setup; a leaf without one, or one that changes nothing, fails. */
const rows: Record<keyof PageSetup, SettingRow> = {
  paper: {
    change: { paper: 'letter' },
    measure: (document) => [first(document).widthMm, first(document).heightMm],
    before: [297, 210],
    after: [279.4, 215.9],
  },
  orientation: {
    change: { orientation: 'portrait' },
    measure: (document) => [first(document).widthMm, first(document).heightMm],
    before: [297, 210],
    after: [210, 297],
  },
  layout: {
    base: { layout: 'single' },
    change: { layout: '6x2' },
    measure: (document) => labels(first(document)).slice(0, 4),
    before: ['II'],
    after: ['I', 'V1', 'II', 'V2'],
  },
  leads: {
    change: { leads: ['aVF'] },
    measure: (document) => labels(first(document)),
    before: ['II', 'V1'],
    after: ['aVF'],
  },
  // The order round the frontal plane, aVR inverted: AHA/ACC/HRS 2007, ECG part I (LD-31).
  leadOrder: {
    base: { layout: '6x2', gainMmPerMv: 5, sheets: 'question' },
    change: { leadOrder: 'cabrera' },
    measure: (document) => labels(first(document)).filter((label) => !label.startsWith('V')),
    before: ['I', 'II', 'III', 'aVR', 'aVL', 'aVF'],
    after: ['aVL', 'I', '−aVR', 'II', 'aVF', 'III'],
  },
  speedMmPerS: {
    base: { sheets: 'plain' },
    change: { speedMmPerS: 50 },
    measure: (document) => {
      const [segment] = first(document).systems[0].segments;
      return segment.widthMm / (segment.toS - segment.fromS);
    },
    before: 25,
    after: 50,
  },
  gainMmPerMv: {
    change: { gainMmPerMv: 20 },
    measure: (document) => pulseHeights(first(document)),
    before: [10],
    after: [20],
  },
  chestGainMmPerMv: {
    base: { layout: '3x4' },
    change: { chestGainMmPerMv: 5 },
    measure: (document) => [
      pulseHeights(first(document)),
      includes('10 mm/mV limb, 5 mm/mV chest')(document),
    ],
    before: [[10], false],
    after: [[10, 5], true],
  },
  gridTint: {
    change: { gridTint: 'sage' },
    measure: (document) => lines(first(document), 'gridMajor')[0].colour,
    before: 'rose.major',
    after: 'sage.major',
  },
  sheets: {
    change: { sheets: 'question' },
    measure: ({ pages }) => pages.map(({ kind }) => kind),
    before: ['question', 'answer'],
    after: ['question'],
  },
  cohort: {
    change: { cohort: 'Autumn B' },
    measure: includes('cohort Autumn B'),
    before: false,
    after: true,
  },
  nameLine: {
    change: { nameLine: false },
    measure: (document) => wordsOf(first(document)).includes('Name'),
    before: true,
    after: false,
  },
  answerLines: {
    change: { answerLines: 7, nameLine: true },
    // One line to write on for each answer, and two for name and date.
    measure: (document) => lines(first(document), 'answerLine').length - 2,
    before: 4,
    after: 7,
  },
  stimuliNamed: {
    change: { stimuliNamed: false },
    measure: (document) => annotations(document).filter((text) => text.includes('stimulus')),
    before: ['ventricular stimulus', 'atrial stimulus'],
    after: [],
  },
  intervals: {
    change: { intervals: false },
    measure: (document) => annotations(document).filter((text) => text.includes(' ms')),
    before: [`AV ${strip.reading.avIntervalMs} ms`, 'VV 1000 ms'],
    after: [],
  },
  ladder: {
    change: { ladder: false },
    measure: (document) => lines(last(document), 'ladder').length > 0,
    before: true,
    after: false,
  },
  reading: {
    change: { reading: false },
    measure: (document) => [
      includes(strip.reading.findings[0].text)(document),
      includes('Look for')(document),
    ],
    before: [true, true],
    after: [false, false],
  },
};

describe('every setting of a page', () => {
  it('has a row here', () => {
    expect(Object.keys(rows).sort()).toEqual(Object.keys(pageSetupSchema.parse({})).sort());
  });

  it.each(Object.entries(rows))('%s changes what it says', (_, { base, change, measure, before, after }) => {
    expect(measure(sheetsOf([subjectOf(strip)], { ...base }))).toEqual(before);
    expect(measure(sheetsOf([subjectOf(strip)], { ...base, ...change }))).toEqual(after);
  });

  it("a strip's own sheet parameters are taken over", () => {
    const sheet = buildStrip({
      sheet: { layout: '6x2', leads: ['V2'], speedMmPerS: 50, gainMmPerMv: 20, gridTint: 'slate' },
    }).sheet;
    expect(pageSetupOf(sheet)).toMatchObject({
      layout: '6x2',
      leads: ['V2'],
      speedMmPerS: 50,
      gainMmPerMv: 20,
      gridTint: 'slate',
    });
  });
});
