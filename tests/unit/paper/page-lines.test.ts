import { describe, expect, it } from 'vitest';
import { planLines } from '../../../shared/paper/pages/page-lines';
import { pageRows } from '../../../shared/paper/pages/page-rows';
import { buildSetup, type PageSetupInput } from '../../support/sheets';

function planned(setup: PageSetupInput, durationS: number, lineS: number) {
  const { lines, notes } = planLines(pageRows(buildSetup(setup)), durationS, lineS);
  return { lines: lines.map(({ fromS, toS }) => [fromS, toS]), notes };
}

describe('lines of rows of one lead', () => {
  it.each([
    [10, 10, [[0, 10]]],
    [
      25,
      10,
      [
        [0, 10],
        [10, 20],
        [20, 25],
      ],
    ],
    // A stub of 2 s is avoided by two lines of 6 s.
    [
      12,
      10,
      [
        [0, 6],
        [6, 12],
      ],
    ],
    // Whole seconds a line where the paper holds 7.2 s.
    [
      10,
      7.2,
      [
        [0, 7],
        [7, 10],
      ],
    ],
    [7.1, 7.2, [[0, 7.1]]],
  ])('%d s on lines of at most %d s', (durationS, lineS, expected) => {
    expect(planned({ layout: 'single' }, durationS, lineS).lines).toEqual(expected);
  });

  it('a strip of more than five minutes is cut, and that is said first', () => {
    const { lines, notes } = planned({ layout: 'single' }, 310, 10);
    expect(lines[lines.length - 1]).toEqual([290, 300]);
    expect(notes).toEqual([
      'Only the first 300 s of 310 s are drawn.',
      'Continued on 30 lines, 10 s a line.',
    ]);
  });
});

describe('lines of rows shared by several leads', () => {
  it.each([
    ['3x4', 10, 10, [[0, 10]], []],
    [
      '3x4',
      10,
      7.2,
      [
        [0, 5],
        [5, 10],
      ],
      ['Rows are wrapped to keep true scale: 2 of 4 columns a line.'],
    ],
    [
      '3x4',
      10,
      4.9,
      [
        [0, 4.9],
        [4.9, 9.8],
      ],
      [
        'Columns are shortened to 2.45 s a lead to keep true scale.',
        'The last 0.2 s are not drawn.',
        'Rows are wrapped to keep true scale: 2 of 4 columns a line.',
      ],
    ],
    // A column of 5 s does not fit on 3.5 s: two blocks of 5 s with columns of 2.5 s, and nothing is lost.
    [
      '6x2',
      10,
      3.5,
      [
        [0, 2.5],
        [2.5, 5],
        [5, 7.5],
        [7.5, 10],
      ],
      [
        'Columns are shortened to 2.5 s a lead to keep true scale.',
        'Continued on 2 blocks of 5 s.',
        'Rows are wrapped to keep true scale: 1 of 2 columns a line.',
      ],
    ],
  ] as const)('%s, %d s on lines of at most %d s', (layout, durationS, lineS, expected, notes) => {
    const plan = planned({ layout }, durationS, lineS);
    plan.lines.flat().forEach((time, i) => expect(time).toBeCloseTo(expected.flat()[i], 9));
    expect(plan.lines).toHaveLength(expected.length);
    expect(plan.notes).toEqual(notes);
  });
});
