import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sheetFileName, sheetLengthProblem } from '../../../shared/api/sheets';
import { pageSetupSchema, type PageSetup } from '../../../shared/parameters/page-setup';
import { leadNames } from '../../../shared/parameters/sheet';
import { actingOptions } from '../../../src/features/sheet/state/acting-options';
import { deskScale, percentOf } from '../../../src/features/sheet/state/desk-scale';
import { readSheetAddress, writeSheetAddress } from '../../../src/features/sheet/state/sheet-address';

const setups: fc.Arbitrary<Partial<PageSetup>> = fc.record(
  {
    paper: fc.constantFrom('a4', 'letter'),
    orientation: fc.constantFrom('landscape', 'portrait'),
    layout: fc.constantFrom('single', 'stacked', '3x4', '3x4+1', '3x4+3', '6x2', '12x1'),
    leads: fc.shuffledSubarray([...leadNames], { minLength: 1 }),
    leadOrder: fc.constantFrom('usual', 'cabrera'),
    speedMmPerS: fc.constantFrom(25, 50),
    gainMmPerMv: fc.constantFrom(5, 10, 20),
    chestGainMmPerMv: fc.constantFrom(null, 5, 10, 20),
    gridTint: fc.constantFrom('rose', 'sand', 'sage', 'slate', 'grey'),
    sheets: fc.constantFrom('plain', 'question', 'answer', 'both'),
    cohort: fc.oneof(
      fc.string({ maxLength: 80 }),
      fc.constantFrom('', 'on', 'limb', '7', 'a.b', 'Wöche & 3'),
    ),
    nameLine: fc.boolean(),
    answerLines: fc.integer({ min: 0, max: 8 }),
    stimuliNamed: fc.boolean(),
    intervals: fc.boolean(),
    ladder: fc.boolean(),
    reading: fc.boolean(),
  },
  { requiredKeys: [] },
) as fc.Arbitrary<Partial<PageSetup>>;

/** Through the text of an address and back. */
function roundTrip(address: Parameters<typeof writeSheetAddress>[0]) {
  return readSheetAddress('first', new URLSearchParams(writeSheetAddress(address).toString()));
}

describe('the address of a sheet', () => {
  it('gives back every option, strip and page', () => {
    fc.assert(
      fc.property(
        setups,
        fc.uniqueArray(fc.constantFrom('one', 'two-b', '0b0f'), { maxLength: 3 }),
        fc.integer({ min: 1, max: 40 }),
        (chosen, others, page) => {
          expect(roundTrip({ chosen, others, page })).toEqual({ chosen, others, page });
        },
      ),
    );
  });

  it('holds every option of the schema', () => {
    const chosen = pageSetupSchema.parse({ cohort: 'B', chestGainMmPerMv: 5 });
    const written = writeSheetAddress({ chosen, others: [], page: 1 });
    expect([...written.keys()].sort()).toEqual(Object.keys(pageSetupSchema.unwrap().shape).sort());
  });

  it('is empty when nothing was chosen', () => {
    expect(writeSheetAddress({ chosen: {}, others: [], page: 1 }).toString()).toBe('');
  });

  it('takes what cannot be read as not given', () => {
    const search = new URLSearchParams(
      'paper=a3&answerLines=9&answerLines=&leads=II.II&nameLine=yes&cohort=&page=-2&and=../x&and=first&and=b&and=b',
    );
    search.append('speedMmPerS', '');
    expect(readSheetAddress('first', search)).toEqual({ chosen: { cohort: '' }, others: ['b'], page: 1 });
  });

  it('names at most twelve strips with the first', () => {
    const search = new URLSearchParams(Array.from({ length: 20 }, (_, i) => ['and', `s${i}`]));
    expect(readSheetAddress('first', search).others).toHaveLength(11);
  });
});

describe('options that change nothing are not shown', () => {
  const acting = (input: Partial<PageSetup>) => actingOptions(pageSetupSchema.parse(input));

  it('the order of limb leads only where it moves or turns one', () => {
    expect(acting({ layout: '3x4+1' }).leadOrder).toBe(true);
    expect(acting({ layout: 'stacked', leads: ['II', 'V1'] }).leadOrder).toBe(false);
    expect(acting({ layout: 'stacked', leads: ['II', 'I'] }).leadOrder).toBe(true);
    expect(acting({ layout: 'single', leads: ['aVR'] }).leadOrder).toBe(true);
  });

  it('gains only for leads that are drawn', () => {
    expect(acting({ layout: 'stacked', leads: ['I', 'II'] })).toMatchObject({
      chestGain: false,
      limbGain: true,
    });
    const chest: Partial<PageSetup> = { layout: 'stacked', leads: ['V1', 'V2'] };
    expect(acting({ ...chest, chestGainMmPerMv: 5 })).toMatchObject({ chestGain: true, limbGain: false });
    expect(acting(chest).limbGain).toBe(true);
  });

  it('what stands on question and answer sheets only with those', () => {
    expect(acting({ sheets: 'plain' })).toMatchObject({ question: false, answer: false });
    expect(acting({ sheets: 'question' })).toMatchObject({ question: true, answer: false });
    expect(acting({ sheets: 'both' })).toMatchObject({ question: true, answer: true });
  });
});

describe('a page on the desk', () => {
  const landscape = { widthMm: 297, heightMm: 210 };

  it('has whole pixels a millimetre where it is large enough for the 1 mm grid', () => {
    expect(deskScale('whole', landscape, 900, 1)).toBe(3);
    expect(deskScale('whole', landscape, 900, 2)).toBe(3);
    expect(deskScale('whole', landscape, 358, 3)).toBeCloseTo(358 / 297, 12);
    expect(deskScale('whole', landscape, 700, 1)).toBeCloseTo(700 / 297, 12);
  });

  it('is no wider than the desk and no higher than 900 px', () => {
    for (const roomPx of [200, 358, 700, 900, 3000]) {
      const scale = deskScale('whole', { widthMm: 210, heightMm: 297 }, roomPx, 1);
      expect(scale * 210).toBeLessThanOrEqual(roomPx);
      expect(scale * 297).toBeLessThanOrEqual(900);
    }
  });

  it('tells its size in per cent of paper at 96 pixels to the inch (CSS Values 4, 6.2)', () => {
    expect(percentOf(96 / 25.4)).toBe(100);
    expect(percentOf(3)).toBe(79);
  });
});

describe('names and lengths', () => {
  it('makes file names of letters, digits and hyphens only', () => {
    fc.assert(
      fc.property(fc.string(), fc.option(fc.integer({ min: 1, max: 99 })), (title, page) => {
        const name = sheetFileName(title, { format: 'png', page, zipped: page === null });
        expect(name).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*\.png(\.zip)?$/u);
      }),
    );
  });

  it('finds the strip that is too long, or that all are together', () => {
    expect(sheetLengthProblem([10, 300])).toBeNull();
    expect(sheetLengthProblem([10, 300.5])).toEqual({ tooLong: 1, durationS: 300.5 });
    expect(sheetLengthProblem([300, 300, 121])).toEqual({ tooLong: 'together', durationS: 721 });
  });
});
