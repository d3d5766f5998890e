import { describe, expect, it } from 'vitest';
import type { ImportAnalysis, LookedAtPreset } from '../../../shared/api/preset-files';
import {
  analysisWords,
  planOf,
  planWords,
  presetWords,
} from '../../../src/features/strip-library/presets/import-plan';
import { parseQuantity } from '../../../src/lib/parse-quantity';
import { durationWords, sizeWords } from '../../../src/lib/quantity-words';

describe('sizes and lengths in words', () => {
  it.each([
    [0, '0 bytes'],
    [999, '999 bytes'],
    [1000, '1 kB'],
    [98_342, '98.3 kB'],
    [146_678_243, '147 MB'],
    [1e9, '1 GB'],
  ])('%d bytes is %s', (bytes, words) => expect(sizeWords(bytes)).toBe(words));

  it.each([
    [10, '10 s'],
    [2.5, '2.5 s'],
    [90, '90 s'],
    [119, '119 s'],
    [120, '2 min'],
    [3600, '1 h'],
    [5400, '1 h 30 min'],
    [3601, '3601 s'],
  ])('%d s is %s', (seconds, words) => expect(durationWords(seconds)).toBe(words));

  it.each([
    ['30 min', 1800],
    ['1 h + 30 min', 5400],
    ['2 h', 7200],
    ['1.5 minutes', 90],
  ])('“%s” is %d s when typed', async (typed, value) => {
    expect(await parseQuantity(typed, 's')).toEqual({ value });
  });
});

const match = { id: 'x', title: 'X', keptBy: 'me', replaceable: true } as const;
const preset = (change: Partial<LookedAtPreset>, number: number): LookedAtPreset => ({
  number,
  title: 'X',
  status: 'new',
  match: null,
  groupUnknown: false,
  ...change,
});
const analysis: ImportAnalysis = {
  fileVersion: 2,
  upgrades: [],
  token: '',
  presets: [
    preset({}, 1),
    preset({ status: 'same', match }, 2),
    preset({ status: 'changed', match }, 3),
    preset({ status: 'changed', match: { ...match, keptBy: 'gallery', replaceable: false } }, 4),
  ],
};

describe('what an import would do', () => {
  it('is counted for each choice, and by preset', () => {
    const plan = (all: 'skip' | 'keepBoth' | 'replace', single = {}) => planOf(analysis, { all, single });
    expect(plan('skip')).toEqual({ adds: 1, replaces: 0, leaves: 3, refused: 0 });
    expect(plan('keepBoth')).toEqual({ adds: 4, replaces: 0, leaves: 0, refused: 0 });
    expect(plan('replace')).toEqual({ adds: 1, replaces: 1, leaves: 2, refused: 1 });
    expect(plan('replace', { 3: 'keepBoth' })).toEqual({ adds: 2, replaces: 0, leaves: 2, refused: 1 });
  });

  it('is said in a sentence', () => {
    expect(analysisWords(analysis)).toBe('4 presets: 1 new, 3 here already.');
    expect(planWords(planOf(analysis, { all: 'replace', single: {} }))).toBe(
      'This adds 1 strip of your own, replaces 1, leaves 2 as they are. 1 of them ships with the product and cannot be replaced.',
    );
    expect(planWords({ adds: 0, replaces: 0, leaves: 3, refused: 0 })).toBe('Nothing would change.');
    expect(analysis.presets.map(presetWords)).toEqual([
      'New',
      'Here already, the same (yours)',
      'Here with other content (yours)',
      'Here with other content (in the gallery)',
    ]);
  });
});
