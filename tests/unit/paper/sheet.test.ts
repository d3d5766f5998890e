import { describe, expect, it } from 'vitest';
import { educationCaution, syntheticCaution } from '../../../shared/paper/cautions';
import type { TextItem } from '../../../shared/paper/drawing';
import { layoutStripSheet, marginMm, type SheetOptions } from '../../../shared/paper/sheet';
import { textWidthMm } from '../../../shared/paper/text';
import { typeSizes } from '../../../shared/paper/tokens';
import { parseStripParameters } from '../../../shared/parameters/parse';
import type { SheetParameters, StripParametersInput } from '../../../shared/parameters/strip-parameters';
import { renderStrip } from '../../../shared/engine/render';
import { ladderHeightMm } from '../../../shared/paper/ladder';
import { buildStrip } from '../../support/strips';
import { coordinates, lines, polylines, texts } from './items';
import { pacedShape, stripOf, type Shape } from './synthetic-strip';

function sheetOf(input: StripParametersInput, shape: Shape = pacedShape(), options: SheetOptions = {}) {
  return layoutStripSheet(stripOf(shape, input), parseStripParameters(input).sheet, options);
}

const layouts: SheetParameters['layout'][] = ['single', 'stacked', '3x4', '3x4+1', '3x4+3', '6x2', '12x1'];
const smallestTypeMm = 2.1;

describe('true scale', () => {
  it.each(layouts)('%s of 10 s at 25 mm/s: 294 mm wide, its grid on whole millimetres', (layout) => {
    const { widthMm, grid } = sheetOf({ sheet: { layout } });
    expect(widthMm).toBe(2 * marginMm + 15 + 250 + 5);
    expect([grid.xMm, grid.yMm, grid.widthMm % 5, grid.heightMm % 5].every(Number.isInteger)).toBe(true);
  });

  it('grows with speed and time and is never fitted', () => {
    const width = (durationS: number, speedMmPerS: 25 | 50) =>
      sheetOf({ durationS, sheet: { speedMmPerS } }).widthMm;
    expect(width(10, 50) - width(8, 50)).toBe(100);
    expect(width(10, 25) - width(8, 25)).toBe(50);
  });

  it.each([
    [25, 10, 5],
    [25, 5, 5],
    [25, 20, 5],
    [50, 10, 10],
  ] as const)(
    'calibration at %i mm/s and %i mm/mV: 1 mV high, 200 ms = %i mm wide, on grid lines',
    (speed, gain, wide) => {
      const sheet = sheetOf({ sheet: { layout: '3x4+1', speedMmPerS: speed, gainMmPerMv: gain } });
      const pulses = polylines(sheet, 'calibration').map((item) => coordinates(item.pointsMm));
      expect(pulses).toHaveLength(4);
      for (const { x, y } of pulses) {
        expect(x[3] - x[1]).toBe(wide);
        expect(Math.max(...y) - Math.min(...y)).toBe(gain);
        expect((x[1] - sheet.grid.xMm) % 5).toBe(0);
        expect((y[0] - sheet.grid.yMm) % 5).toBe(0);
      }
    },
  );

  it('a beat 1 s and 1 mV away is the speed and the gain away', () => {
    const shape: Shape = (timeS) => (Math.round(timeS * 500) % 500 === 250 ? 1 : 0);
    for (const [speed, gain] of [
      [25, 10],
      [50, 20],
      [25, 5],
    ] as const) {
      const sheet = sheetOf({ sheet: { layout: 'single', speedMmPerS: speed, gainMmPerMv: gain } }, shape);
      const { x, y } = coordinates(polylines(sheet, 'trace')[0].pointsMm);
      const peaks = x.filter((_, i) => y[i] < sheet.segments[0].baselineMm - gain / 2);
      expect(peaks).toHaveLength(10);
      expect(peaks[1] - peaks[0]).toBeCloseTo(speed, 9);
      expect(sheet.segments[0].baselineMm - Math.min(...y)).toBeCloseTo(gain, 6);
    }
  });
});

describe('segments and traces', () => {
  it.each(layouts)('%s: traces of a row follow each other along the paper as time does', (layout) => {
    const sheet = sheetOf({ durationS: 25, sheet: { layout } });
    for (const segment of sheet.segments) {
      const first = sheet.segments.find((other) => other.line === segment.line && other.row === segment.row);
      expect(segment.xMm - (first?.xMm ?? NaN)).toBeCloseTo((segment.fromS - (first?.fromS ?? NaN)) * 25, 9);
      expect((segment.baselineMm - sheet.grid.yMm) % 5).toBe(0);
      if (segment.column === 0) expect(segment.xMm).toBe(sheet.grid.xMm + 15);
    }
    const traces = polylines(sheet, 'trace');
    expect(traces).toHaveLength(sheet.segments.length);
    traces.forEach(({ pointsMm }, i) => {
      const { xMm, widthMm } = sheet.segments[i];
      expect(pointsMm[0]).toBeCloseTo(xMm, 9);
      // The last sample lies one sampling interval before the segment's end.
      expect(pointsMm[pointsMm.length - 2]).toBeCloseTo(xMm + widthMm - 0.05, 9);
    });
  });

  it('a dashed stroke stands at every lead change and nowhere else', () => {
    const sheet = sheetOf({ sheet: { layout: '3x4+1' } });
    const strokes = lines(sheet, 'leadChange');
    const changes = sheet.segments.filter((segment) => segment.column > 0);
    expect(strokes.map((stroke) => stroke.x1Mm)).toEqual(changes.map((segment) => segment.xMm));
    expect(strokes.every((stroke) => stroke.dashMm !== undefined)).toBe(true);
    expect(lines(sheetOf({ sheet: { layout: '12x1' } }), 'leadChange')).toEqual([]);
  });

  it.each([5, 10, 20] as const)(
    'rows do not touch at %i mm/mV: no trace enters the ink of the next row',
    (gainMmPerMv) => {
      const sheet = sheetOf({ sheet: { layout: '12x1', gainMmPerMv } }, pacedShape());
      const traces = polylines(sheet, 'trace').map((item) => coordinates(item.pointsMm));
      traces.slice(1).forEach((below, i) => {
        below.x.forEach((x, k) => {
          const above = traces[i].y.filter((_, j) => Math.abs(traces[i].x[j] - x) < 0.3);
          expect(below.y[k] - Math.max(...above, -Infinity)).toBeGreaterThan(1);
        });
      });
    },
  );
});

describe('lead names', () => {
  it('stand above the start of their traces, clear of every trace, level within a row', () => {
    for (const layout of layouts) {
      const sheet = sheetOf({ sheet: { layout } });
      const names = texts(sheet, 'leadName');
      expect(names.map((name) => name.text)).toEqual(sheet.segments.map((segment) => segment.lead));
      names.forEach((name, i) => {
        const { xMm, baselineMm } = sheet.segments[i];
        expect(name.xMm - xMm).toBeGreaterThanOrEqual(1);
        expect(name.xMm - xMm).toBeLessThanOrEqual(11);
        expect(name.yMm).toBeLessThanOrEqual(baselineMm - 4.5);
        expect(inkWithin(sheet, name)).toEqual([]);
      });
      const levels = new Map<number, Set<number>>();
      sheet.segments.forEach(({ baselineMm }, i) => {
        levels.set(baselineMm, (levels.get(baselineMm) ?? new Set()).add(names[i].yMm));
      });
      expect([...levels.values()].every((level) => level.size === 1)).toBe(true);
    }
  });

  it('on a continued line say from when', () => {
    const sheet = sheetOf({ durationS: 25, sheet: { leads: ['II', 'V1'] } });
    expect(texts(sheet, 'lineTime').map((item) => item.text)).toEqual(['from 10 s', 'from 20 s']);
  });
});

/** Points of traces inside a label's box. */
function inkWithin(sheet: ReturnType<typeof sheetOf>, label: TextItem): number[] {
  const widthMm = textWidthMm(label.text, { ...label, size: typeSizes.section });
  return polylines(sheet, 'trace').flatMap((item) => {
    const { x, y } = coordinates(item.pointsMm);
    return x.filter(
      (value, i) =>
        value >= label.xMm && value <= label.xMm + widthMm && y[i] <= label.yMm && y[i] >= label.yMm - 2.77,
    );
  });
}

describe('texts', () => {
  it('header: title, settings, provenance; footer: both cautions', () => {
    const sheet = sheetOf({ title: 'Paced rhythm 4', seed: 9, recorder: { mainsNotchHz: 50 } });
    expect(texts(sheet, 'title').map((item) => item.text)).toEqual(['Paced rhythm 4']);
    expect(texts(sheet, 'settings')[0].text).toBe('25 mm/s 10 mm/mV 0.05–150 Hz, 50 Hz notch');
    expect(texts(sheet, 'provenance')[0].text).toBe('500 samples/s, 5 µV, seed 9, engine 0.0.0-test');
    expect(texts(sheet, 'caution').map((item) => item.text)).toEqual([syntheticCaution, educationCaution]);
  });

  it('an option replaces the title, and a strip without one says so', () => {
    expect(sheetOf({ title: 'A' }, pacedShape(), { title: 'Answer' }).title).toBe('Answer');
    expect(texts(sheetOf({}), 'title')[0].text).toBe('Untitled strip');
  });

  it('settings stand beside a short title and below one that leaves no room', () => {
    const places = (title: string) => {
      const sheet = sheetOf({ title, durationS: 2 });
      const titles = texts(sheet, 'title');
      return { lines: titles.length, below: texts(sheet, 'settings')[0].yMm - titles[titles.length - 1].yMm };
    };
    expect(places('Short')).toEqual({ lines: 1, below: 0 });
    const long = places('A title that leaves no room for settings');
    expect(long.lines).toBe(1);
    expect(long.below).toBeGreaterThan(4);
  });

  it('a subtitle stands under the title', () => {
    const sheet = sheetOf({ title: 'A' }, pacedShape(), { subtitle: 'Two spikes.' });
    const [subtitle] = texts(sheet, 'caption');
    expect(subtitle.text).toBe('Two spikes.');
    expect(subtitle.yMm).toBeGreaterThan(texts(sheet, 'title')[0].yMm + 4);
  });

  it.each([
    { title: 'Short', durationS: 1 },
    {
      title: 'A title of many words that goes on and on until nothing else would fit beside it',
      durationS: 2,
    },
    { title: 'A title that leaves no room for settings', durationS: 2 },
    { title: 'W'.repeat(120), durationS: 10 },
  ])('stay on the page, never overlap, and are at least 6 pt: $title', (input) => {
    const sheet = sheetOf(input);
    const boxes = sheet.items
      .filter((item) => item.kind === 'text')
      .map((item) => {
        const size = { sizeMm: item.sizeMm, lineMm: item.sizeMm };
        const widthMm = textWidthMm(item.text, { ...item, size });
        const left = item.anchor === 'end' ? item.xMm - widthMm : item.xMm;
        return { left, right: left + widthMm, top: item.yMm - 0.7 * item.sizeMm, bottom: item.yMm, item };
      });
    boxes.forEach((box, i) => {
      expect(box.item.sizeMm).toBeGreaterThanOrEqual(smallestTypeMm);
      expect(box.left).toBeGreaterThanOrEqual(marginMm);
      expect(box.right).toBeLessThanOrEqual(sheet.widthMm - marginMm + 1e-9);
      expect(box.bottom).toBeLessThan(sheet.heightMm);
      const overlapping = boxes
        .slice(i + 1)
        .filter(
          (other) =>
            box.left < other.right &&
            other.left < box.right &&
            box.top < other.bottom &&
            other.top < box.bottom,
        );
      expect(overlapping).toEqual([]);
    });
  });
});

describe('notes', () => {
  const notes = (...args: Parameters<typeof sheetOf>) =>
    texts(sheetOf(...args), 'note').map((item) => item.text);

  it('say nothing of a plain strip', () => {
    expect(notes({})).toEqual([]);
  });

  it('say how a long strip goes on', () => {
    expect(notes({ durationS: 30 })).toEqual(['Continued on 3 lines, 10 s a line.']);
    expect(notes({ durationS: 12 }, pacedShape(), { lineS: 4 })).toEqual([
      'Continued on 3 lines, 4 s a line.',
    ]);
  });

  it('say what is not drawn', () => {
    const input = { durationS: 301, recorder: { sampleRateHz: 250, bandwidth: 'monitor' } } as const;
    expect(notes(input, () => 0)[0]).toContain('Only the first 300 s of 301 s are drawn.');
  });

  it('say which leads ran into the edge of the paper, where their pen stops', () => {
    const shape: Shape = (timeS, lead) => (lead === 'V1' && timeS > 1 && timeS < 1.01 ? -30 : 0);
    const sheet = sheetOf({ sheet: { leads: ['II', 'V1'] } }, shape);
    expect(texts(sheet, 'note')[0].text).toBe('Cut at the edge of the paper: V1.');
    const { y } = coordinates(polylines(sheet, 'trace')[1].pointsMm);
    expect(Math.max(...y)).toBe(sheet.grid.yMm + sheet.grid.heightMm - 0.5);
  });
});

describe('refusals and repeatability', () => {
  it('refuses an empty or uneven recording', () => {
    const strip = stripOf(() => 0);
    const { sheet } = parseStripParameters({});
    const uneven = { ...strip, leads: { ...strip.leads, V6: new Float32Array(3) } };
    expect(() => layoutStripSheet(uneven, sheet)).toThrow(RangeError);
  });

  it('gives the same drawing again', () => {
    expect(sheetOf({ sheet: { layout: '3x4+3' } })).toEqual(sheetOf({ sheet: { layout: '3x4+3' } }));
  });
});

describe('ladder on request', () => {
  const recording = (ladder: boolean, durationS = 10) =>
    renderStrip(
      buildStrip({
        durationS,
        patient: { avConduction: 'complete' },
        pacing: { source: 'implanted' },
        sheet: { ladder, layout: 'single' },
      }),
    );

  it('stands below the trace, each stroke at the x of its stimulus, and is absent otherwise', () => {
    const strip = recording(true);
    const sheet = layoutStripSheet(strip, strip.parameters.sheet);
    const plain = layoutStripSheet(recording(false), recording(false).parameters.sheet);
    expect(lines(plain, 'ladder')).toEqual([]);
    expect(sheet.heightMm).toBeGreaterThanOrEqual(plain.heightMm + ladderHeightMm);
    const strokes = lines(sheet, 'ladder').filter(
      (item) => item.colour === 'copper' && item.x1Mm === item.x2Mm,
    );
    const [segment] = sheet.segments;
    const stimuli = strip.events.filter((event) => event.type === 'stimulus');
    expect(strokes.map((item) => item.x1Mm)).toEqual(
      stimuli.map((stimulus) => expect.closeTo(segment.xMm + 25 * stimulus.timeS, 9) as number),
    );
    for (const stroke of strokes) expect(stroke.y1Mm).toBeGreaterThan(segment.baselineMm);
    expect(texts(sheet, 'ladder').map((item) => item.text)).toEqual(['Atria', 'AV', 'Ventricles']);
  });

  it('stands under every line of a long strip, and no line runs over its edge', () => {
    const strip = recording(true, 25);
    const sheet = layoutStripSheet(strip, strip.parameters.sheet);
    expect(texts(sheet, 'ladder').filter((item) => item.text === 'AV')).toHaveLength(3);
    const left = sheet.segments[0].xMm;
    for (const line of lines(sheet, 'ladder')) {
      expect(Math.min(line.x1Mm, line.x2Mm)).toBeGreaterThanOrEqual(left - 1.01);
      expect(Math.max(line.x1Mm, line.x2Mm)).toBeLessThanOrEqual(left + 250 + 1.01);
    }
  });
});
