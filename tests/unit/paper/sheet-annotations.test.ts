import { describe, expect, it } from 'vitest';
import type { StripEvent } from '../../../shared/engine/events';
import { renderStrip } from '../../../shared/engine/render';
import type { SheetPage } from '../../../shared/paper/pages/sheet-document';
import { gallery, galleryPreset, presetParameters } from '../../../shared/gallery/gallery';
import { namedStimuli } from '../../../shared/paper/pages/stimulus-names';
import { itemBox, overlap, sheetsOf, subjectOf, textBox } from '../../support/sheets';
import { coordinates, lines, polylines, texts } from './items';

function answerOf(id: string) {
  const strip = renderStrip(presetParameters(galleryPreset(id)));
  const { pages } = sheetsOf([subjectOf(strip)], { layout: 'single', leads: ['II'], sheets: 'answer' });
  return { strip, page: pages[0], pages };
}

/** x of the ends of the dimension line whose words are `text`, mm: within it, or left of it. */
function dimension(page: SheetPage, text: string, within: boolean): [number, number] {
  const words = texts(page, 'annotation').find((item) => item.text === text);
  if (!words) throw new Error(`no "${text}" on the page`);
  const middle = words.yMm - 0.35 * words.sizeMm;
  const ticks = lines(page, 'annotation')
    .filter((line) => line.x1Mm === line.x2Mm && Math.abs((line.y1Mm + line.y2Mm) / 2 - middle) < 0.2)
    .map((tick) => tick.x1Mm)
    .sort((a, b) => a - b);
  const after = ticks.filter((x) => x > textBox(words).right);
  const before = ticks.filter((x) => x < words.xMm);
  return within ? [before[before.length - 1], after[0]] : [after[0], after[1]];
}

const xOf = (page: SheetPage, timeS: number): number => {
  const [segment] = page.systems[0].segments;
  return segment.xMm + (timeS - segment.fromS) * 25;
};

const stimuliOf = (events: readonly StripEvent[]) => events.filter((event) => event.type === 'stimulus');

describe('intervals drawn', () => {
  it('AV and VV are as long as they say, between stimuli of the strip', () => {
    const { strip, page } = answerOf('av-sequential-pacing');
    const av = dimension(page, 'AV 180 ms', false);
    expect(av[1] - av[0]).toBeCloseTo(0.18 * 25, 9);
    const vv = dimension(page, 'VV 909 ms', true);
    // The words round to 1 ms, which is 0.025 mm.
    expect(Math.abs(vv[1] - vv[0] - 0.909 * 25)).toBeLessThan(0.0125);
    const at = (chamber: string) =>
      stimuliOf(strip.events)
        .filter((stimulus) => stimulus.chamber === chamber)
        .map((stimulus) => xOf(page, stimulus.timeS));
    const near = (xs: number[], x: number) => Math.min(...xs.map((one) => Math.abs(one - x)));
    expect(near(at('atrium'), av[0])).toBeLessThan(1e-9);
    for (const x of [av[1], ...vv]) expect(near(at('rightVentricle'), x)).toBeLessThan(1e-9);
  });

  it('an escape is measured from the last depolarization, over a stimulus without capture', () => {
    const { strip, page } = answerOf('capture-lost-and-regained');
    const escapes = strip.reading.beats.filter((beat) => beat.origin === 'junctionalEscape');
    const told = texts(page, 'annotation').find((item) => item.text.startsWith('escape after'));
    expect(escapes.map((beat) => `escape after ${Math.round(beat.rrMs ?? NaN)} ms`)).toContain(told?.text);
  });

  it('every kind is drawn once, and none where there is nothing to measure', () => {
    for (const id of ['two-ventricles-right-first', 'ventricular-undersensing', 'atrial-pacing']) {
      const { pages } = answerOf(id);
      const kinds = pages.flatMap((page) =>
        texts(page, 'annotation')
          .filter((item) => item.text.endsWith(' ms'))
          .map((item) => item.text.replace(/ \d+ ms$/u, '')),
      );
      expect(new Set(kinds).size).toBe(kinds.length);
      expect(kinds.length).toBeGreaterThan(0);
    }
    // Two stimuli 40 ms apart and not one complex: that is all there is to measure.
    const flat = texts(answerOf('spikes-over-asystole').page, 'annotation').map((item) => item.text);
    expect(flat.filter((text) => text.endsWith(' ms'))).toEqual(['RV–LV 40 ms']);
  });
});

describe('stimuli named', () => {
  it.each([
    ['av-sequential-pacing', ['atrial stimulus', 'ventricular stimulus']],
    ['two-ventricles-right-first', ['right ventricular stimulus', 'left ventricular stimulus']],
    ['transcutaneous-no-capture', ['transcutaneous stimulus, no capture: below threshold']],
    ['pseudofusion', ['ventricular stimulus, pseudofusion']],
    ['fusion', ['ventricular stimulus, fusion']],
  ])('%s: each kind where it first appears', (id, names) => {
    const { page } = answerOf(id);
    const found = texts(page, 'annotation').map((item) => item.text);
    for (const name of names) expect(found.filter((text) => text === name)).toHaveLength(1);
  });

  it('the first of each kind is the earliest of it', () => {
    const { strip } = answerOf('capture-lost-and-regained');
    const named = namedStimuli(strip.events);
    const lost = stimuliOf(strip.events).find(
      (stimulus) => stimulus.chamber === 'rightVentricle' && !stimulus.captured,
    );
    expect(named.find((one) => one.text === 'ventricular stimulus, no capture')?.timeS).toBe(lost?.timeS);
  });
});

describe('annotations over the whole gallery', () => {
  it.each(gallery.map(({ id }) => id))('%s: no words on a trace or on other words', (id) => {
    const { pages } = answerOf(id);
    for (const page of pages) {
      const words = texts(page, 'annotation').map((item) => ({ item, box: textBox(item) }));
      for (const { item, box } of words) {
        const struck = polylines(page, 'trace').some(({ pointsMm }) => {
          const { x, y } = coordinates(pointsMm);
          return x.some((at, i) => at > box.left && at < box.right && y[i] > box.top && y[i] < box.bottom);
        });
        // Beside giant artefacts there may be no free place.
        if (!id.startsWith('transcutaneous')) expect([id, item.text, struck]).toEqual([id, item.text, false]);
        const others = page.items.filter((other) => other.kind === 'text' && other !== item);
        expect(others.filter((other) => overlap(itemBox(other), box))).toEqual([]);
      }
    }
  });
});
