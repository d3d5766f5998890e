import { describe, expect, it } from 'vitest';
import { renderStrip } from '../../../shared/engine/render';
import type { Drawing, LineItem } from '../../../shared/paper/drawing';
import { markerLaneMm } from '../../../shared/paper/marker-lane';
import { layoutStripSheet } from '../../../shared/paper/sheet';
import { sheetsOf, subjectOf, type PageSetupInput } from '../../support/sheets';
import { buildStrip } from '../../support/strips';

function rendered(stimulusMarker: boolean, sheet: object, durationS = 10) {
  return renderStrip(
    buildStrip({
      durationS,
      patient: { avConduction: 'complete' },
      pacing: { source: 'implanted' },
      recorder: { stimulusMarker },
      sheet: { layout: 'single', ...sheet },
    }),
  );
}
const sheetOf = (recording: ReturnType<typeof rendered>) =>
  layoutStripSheet(recording, recording.parameters.sheet);
const strokes = ({ items }: Drawing): LineItem[] =>
  items.filter((item): item is LineItem => item.kind === 'line' && item.role === 'marker');
const names = ({ items }: Drawing): string[] =>
  items.flatMap((item) => (item.kind === 'text' && item.role === 'marker' ? [item.text] : []));

describe('stimulus markers on a sheet', () => {
  it('are off unless asked for, and nothing without a recorder that looks for stimuli', () => {
    for (const recording of [rendered(true, {}), rendered(false, { stimulusMarkers: true })]) {
      const sheet = sheetOf(recording);
      expect([strokes(sheet), names(sheet)]).toEqual([[], []]);
      expect(sheet.heightMm).toBe(sheetOf(rendered(false, {})).heightMm);
    }
  });

  it('stand below the grid at the x of what was found, and change no trace', () => {
    const recording = rendered(true, { stimulusMarkers: true });
    const sheet = sheetOf(recording);
    const plain = sheetOf(rendered(false, {}));
    const [segment] = sheet.segments;
    const found = recording.stimulusMarkersS ?? [];
    expect(found.length).toBeGreaterThan(10);
    expect(strokes(sheet).map((stroke) => stroke.x1Mm)).toEqual(
      found.map((timeS) => expect.closeTo(segment.xMm + 25 * timeS, 9) as number),
    );
    const traces = (drawing: Drawing) => drawing.items.filter((item) => item.role === 'trace');
    expect(traces(sheet)).toEqual(traces(plain));
    const lowest = plain.grid.yMm + plain.grid.heightMm;
    for (const stroke of strokes(sheet)) {
      expect(stroke.x1Mm).toBe(stroke.x2Mm);
      expect(stroke.y1Mm).toBeGreaterThan(lowest);
      expect(stroke.y2Mm).toBeLessThan(lowest + markerLaneMm);
    }
    expect(names(sheet)).toEqual(['Marked']);
  });

  it('follow the paper speed', () => {
    const recording = rendered(true, { stimulusMarkers: true, speedMmPerS: 50 }, 4);
    const [segment] = sheetOf(recording).segments;
    expect(strokes(sheetOf(recording)).map((stroke) => stroke.x1Mm)).toEqual(
      recording.stimulusMarkersS?.map((timeS) => expect.closeTo(segment.xMm + 50 * timeS, 9) as number),
    );
  });

  it('stand above the ladder, under every line of a long strip', () => {
    const sheet = sheetOf(rendered(true, { stimulusMarkers: true, ladder: true }, 25));
    expect(names(sheet)).toHaveLength(3);
    const bands = sheet.items.flatMap((item) =>
      item.kind === 'text' && item.role === 'ladder' && item.text === 'Atria' ? [item.yMm] : [],
    );
    const lanes = sheet.items.flatMap((item) =>
      item.kind === 'text' && item.role === 'marker' ? [item.yMm] : [],
    );
    lanes.forEach((laneMm, line) => expect(bands[line]).toBeGreaterThan(laneMm));
  });

  it('are drawn on printed pages when the setup asks for them', () => {
    const recording = rendered(true, {});
    const setup: PageSetupInput = { layout: 'single', leads: ['II'], sheets: 'both' };
    const off = sheetsOf([subjectOf(recording)], setup);
    const on = sheetsOf([subjectOf(recording)], { ...setup, stimulusMarkers: true });
    expect(off.pages.flatMap(strokes)).toEqual([]);
    for (const page of on.pages) {
      const xs = page.systems.flatMap(({ segments: [{ xMm, fromS, toS }] }) =>
        (recording.stimulusMarkersS ?? [])
          .filter((timeS) => timeS >= fromS && timeS < toS)
          .map((timeS) => xMm + 25 * (timeS - fromS)),
      );
      expect(strokes(page).map(({ x1Mm }) => x1Mm)).toEqual(
        xs.map((xMm) => expect.closeTo(xMm, 9) as number),
      );
    }
  });
});
