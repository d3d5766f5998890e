import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readStripParameters } from '../../shared/parameters/parse';
import { checkTimingAssertion, type TimingCase } from '../support/timing-case-checker';
import { eventsOf } from '../support/strips';

// Worked cases with their arithmetic and sources (TM-, NR-, PP-, E codes: tests/fixtures/README.md).
const { cases } = JSON.parse(
  readFileSync(new URL('../fixtures/timing-cases.json', import.meta.url), 'utf8'),
) as { cases: TimingCase[] };

const seeds = [1, 2, 20261201];
const runnable = cases.filter((one) => readStripParameters(one.parameters).ok);

describe('worked timing cases', () => {
  it('runs every case whose parameters exist', () => {
    // Cases with keys of later behaviour are refused by the schema; this number rises as they arrive.
    expect({ runnable: runnable.length, all: cases.length }).toEqual({ runnable: 80, all: 80 });
  });

  for (const one of runnable) {
    for (const seed of seeds) {
      it(`${one.id}, seed ${seed}: ${one.title}`, () => {
        const result = readStripParameters({ ...(one.parameters as object), seed });
        if (!result.ok) throw new Error('refused');
        const events = eventsOf(result.parameters);
        for (const assertion of one.assertions) {
          const found = checkTimingAssertion(assertion, events, result.parameters.durationS);
          expect(
            found,
            `${assertion.measure} ${assertion.of}: ${assertion.why} [${assertion.source}]`,
          ).toBeNull();
        }
      });
    }
  }
});
