import { describe, expect, it } from 'vitest';
import { caliperWords, marchTimes } from '../../../src/features/strip-editor/canvas/calipers';
import { beatColumns } from '../../../src/features/strip-editor/canvas/beat-columns';
import { beatRanges, rangeWords } from '../../../src/features/strip-editor/components/beat-ranges';
import { draftHash, readAddressDraft } from '../../../src/features/strip-editor/state/address-draft';
import {
  change,
  preview,
  redo,
  settle,
  startHistory,
  undo,
} from '../../../src/features/strip-editor/state/history';
import { changeParameter, parameterMeta } from '../../../src/features/strip-editor/state/parameter-paths';
import { parseQuantity } from '../../../src/lib/parse-quantity';
import { tagsOf } from '../../../src/features/strip-editor/state/strip-details';
import { renderStrip } from '../../../shared/engine/render';
import { gallery, presetParameters } from '../../../shared/gallery/gallery';
import { buildStrip } from '../../support/strips';

describe('history', () => {
  it('makes one step of a drag, and goes back and forth', () => {
    let history = startHistory(1);
    for (const value of [2, 3, 4]) history = preview(history, value);
    history = settle(history);
    history = change(history, 9);
    expect(history.present).toBe(9);
    history = undo(history);
    expect(history.present).toBe(4);
    history = undo(history);
    expect(history.present).toBe(1);
    expect(undo(history).present).toBe(1);
    history = redo(redo(history));
    expect(history.present).toBe(9);
    expect(change(undo(history), 5).future).toEqual([]);
  });

  it('takes back a drag that is still under way', () => {
    expect(undo(preview(startHistory(1), 7)).present).toBe(1);
  });
});

describe('typed quantities (mathjs)', () => {
  it.each([
    ['70', '/min', 70],
    ['0,4', 'ms', 0.4],
    ['180 ms', 'ms', 180],
    ['1.2 s', 'ms', 1200],
    ['1 s + 50 ms', 'ms', 1050],
    ['800 uV', 'mV', 0.8],
    ['800 µV', 'mV', 0.8],
    ['2500 mV', 'V', 2.5],
    ['800 ms', '/min', 75],
    ['72 /min', '/min', 72],
    ['−30', '°', -30],
    ['0.05 kHz', 'Hz', 50],
  ])('%s in %s is %d', async (text, unit, expected) => {
    const parsed = await parseQuantity(text, unit);
    expect('value' in parsed && parsed.value).toBeCloseTo(expected, 9);
  });

  it.each([
    ['fast', '/min'],
    ['3 kg', 'ms'],
    ['', 'ms'],
    ['1/0', 'ms'],
    ['[1, 2]', 'ms'],
  ])('%j in %s is refused in words', async (text, unit) => {
    expect(await parseQuantity(text, unit)).toEqual({
      error: expect.stringContaining('is not a number') as string,
    });
  });
});

describe('parameters by path', () => {
  it('takes labels and ranges from the schema', () => {
    expect(parameterMeta('pacing.rightVentricularLead.amplitudeV')).toMatchObject({
      label: 'Output',
      unit: 'V',
      max: 10,
    });
    expect(() => parameterMeta('pacing.nothing')).toThrow();
  });

  it('paces both ventricles exactly with the fifth letter', () => {
    const both = changeParameter(buildStrip({}), 'pacing.mode', 'DDDOV');
    if (!both.ok) throw new Error(both.words);
    expect(both.parameters.pacing.ventricularChambers).toBe('both');
    const back = changeParameter(both.parameters, 'pacing.mode', 'DDD');
    expect(back.ok && back.parameters.pacing.ventricularChambers).toBe('right');
  });

  it('refuses what does not fit, in words', () => {
    const refused = changeParameter(buildStrip({}), 'pacing.lowerRateBpm', 150);
    expect(refused).toMatchObject({ ok: false, path: 'pacing.lowerRateBpm' });
    expect(!refused.ok && refused.words).toContain('upperTrackingRateBpm');
  });
});

describe('drafts in the address', () => {
  it('carries every preset there and back, and says when it is damaged', () => {
    expect(readAddressDraft('')).toEqual({ kind: 'none' });
    for (const preset of gallery) {
      const parameters = presetParameters(preset);
      expect(readAddressDraft(draftHash(parameters))).toEqual({ kind: 'draft', parameters });
    }
    expect(readAddressDraft('#draft=%%%').kind).toBe('damaged');
    const wrong = `#draft=${btoa('{"seed":-1}').replace(/=+$/, '')}`;
    expect(readAddressDraft(wrong)).toMatchObject({ kind: 'damaged', problems: [{ path: 'seed' }] });
  });
});

describe('calipers', () => {
  it('read ms, mm and per minute', () => {
    expect(caliperWords({ firstS: 2, secondS: 1.2, marching: false }, 25)).toBe('800 ms, 20.0 mm, 75 /min');
    expect(caliperWords({ firstS: 2, secondS: null, marching: false }, 25)).toBeNull();
  });

  it('march out over the strip on both sides', () => {
    const times = marchTimes({ firstS: 2, secondS: 3, marching: true }, 6);
    expect(times).toEqual([0, 1, 4, 5, 6]);
    expect(marchTimes({ firstS: 2, secondS: 3, marching: false }, 6)).toEqual([]);
  });
});

describe('beats', () => {
  it('stand side by side in columns without gaps', () => {
    const { reading } = renderStrip(presetParameters(gallery[6]));
    const columns = beatColumns(reading.beats, 10);
    columns.slice(1).forEach((column, i) => expect(column.fromS).toBe(columns[i].toS));
    columns.forEach(({ fromS, timeS, toS }) => expect(timeS >= fromS && timeS < toS).toBe(true));
  });

  it('are said as ranges', () => {
    expect(beatRanges([11, 1, 2, 3, 4, 7, 8]).map(rangeWords)).toEqual(['1–4', '7–8', '11']);
  });
});

describe('tags', () => {
  it('are words between commas, each once', () => {
    expect(tagsOf(' capture, two chambers ,,capture')).toEqual(['capture', 'two chambers']);
  });
});
