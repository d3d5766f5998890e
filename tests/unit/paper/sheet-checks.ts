import { sampleRange } from '../../../shared/paper/trace';
import type { SheetDocument, SheetPage, SheetSubject } from '../../../shared/paper/pages/sheet-document';
import type { PlacedSegment } from '../../../shared/paper/placed-segment';
import type { PageSetup } from '../../../shared/parameters/page-setup';
import { itemBox, overlap, textBox, textsOf } from '../../support/sheets';
import { heightAt, polylines } from './items';

/** ISO 216 A4 and ANSI/ASME Y14.1 A, upright, mm. */
const papers = { a4: [210, 297], letter: [215.9, 279.4] } as const;
/** Margins that office printers leave blank are up to a quarter of an inch; the task asks for 8 mm. */
const marginMm = 8;
/** Points left out of a trace are this close to it, and a column of samples this wide, mm. */
const traceToleranceMm = 0.011;

/** What is wrong with the paper of a page and what lies on it, in sentences. */
function paperFaults(page: SheetPage, setup: PageSetup): string[] {
  const [shortMm, longMm] = papers[setup.paper];
  const [widthMm, heightMm] = setup.orientation === 'portrait' ? [shortMm, longMm] : [longMm, shortMm];
  const faults: string[] = [];
  if (page.widthMm !== widthMm || page.heightMm !== heightMm) faults.push('the paper has the wrong size');
  for (const item of page.items) {
    if (item.role === 'page' && item.kind === 'rect' && item.widthMm === widthMm) continue;
    const box = itemBox(item);
    const inside =
      box.left >= marginMm - 1e-9 &&
      box.top >= marginMm - 1e-9 &&
      box.right <= widthMm - marginMm + 1e-9 &&
      box.bottom <= heightMm - marginMm + 1e-9;
    if (!inside) faults.push(`${item.role} ${item.kind} lies outside the margins: ${JSON.stringify(box)}`);
  }
  return faults;
}

function textFaults(page: SheetPage): string[] {
  const boxes = textsOf(page).map((item) => ({ item, box: textBox(item) }));
  return boxes.flatMap(({ item, box }, i) =>
    boxes
      .slice(i + 1)
      .filter((other) => overlap(box, other.box))
      .map((other) => `"${item.text}" and "${other.item.text}" overlap`),
  );
}

/** Grids apart from each other, each of whole large boxes with 0 mV lines on heavy lines. */
function gridFaults(page: SheetPage): string[] {
  const whole = (mm: number): boolean => Math.abs(mm / 5 - Math.round(mm / 5)) < 1e-9;
  const faults: string[] = [];
  page.systems.forEach(({ grid, segments }, i) => {
    if (!whole(grid.widthMm) || !whole(grid.heightMm)) faults.push('a grid is not whole large boxes');
    for (const segment of segments) {
      if (!whole(segment.baselineMm - grid.yMm)) faults.push(`${segment.label} is off the heavy lines`);
      if (segment.xMm + segment.widthMm > grid.xMm + grid.widthMm + 1e-9) {
        faults.push(`${segment.label} leaves its grid`);
      }
    }
    const next = page.systems[i + 1];
    if (next && next.grid.yMm < grid.yMm + grid.heightMm - 1e-9) faults.push('grids overlap');
  });
  return faults;
}

/** Samples of a segment that do not lie where time and voltage put them. */
function sampleFaults(
  segment: PlacedSegment,
  points: Float64Array,
  grid: { yMm: number; heightMm: number },
  subject: SheetSubject,
  setup: PageSetup,
): string[] {
  const { strip } = subject;
  const samples = strip.leads[segment.lead];
  const [from, to] = sampleRange(segment, strip.sampleRateHz, samples.length);
  const chest = segment.lead.startsWith('V');
  const gain = (chest ? setup.chestGainMmPerMv : null) ?? setup.gainMmPerMv;
  const sign = segment.label === `−${segment.lead}` ? -1 : 1;
  // Of samples that share a column of paper only the extremes are kept.
  const dense = (setup.speedMmPerS / strip.sampleRateHz) * 2 <= 0.0501;
  let worst = 0;
  for (let i = from; i < to; i += dense ? to : 7) {
    const xMm = segment.xMm + (i / strip.sampleRateHz - segment.fromS) * setup.speedMmPerS;
    const yMm = segment.baselineMm - sign * samples[i] * gain;
    const clamped = Math.min(grid.yMm + grid.heightMm - 0.5, Math.max(grid.yMm + 0.5, yMm));
    worst = Math.max(worst, Math.abs(heightAt(points, xMm) - clamped));
  }
  return worst > traceToleranceMm ? [`${segment.label} is ${worst} mm off`] : [];
}

function traceFaults(page: SheetPage, subjects: readonly SheetSubject[], setup: PageSetup): string[] {
  const traces = polylines(page, 'trace');
  const segments = page.systems.flatMap(({ grid, subject, segments: own }) =>
    own.map((segment) => ({ grid, subject: subjects[subject], segment })),
  );
  const drawn = segments.filter(({ segment, subject: { strip } }) => {
    const [from, to] = sampleRange(segment, strip.sampleRateHz, strip.leads[segment.lead].length);
    return to - from >= 2;
  });
  if (drawn.length !== traces.length) return [`${traces.length} traces for ${drawn.length} segments`];
  return drawn.flatMap(({ segment, grid, subject }, i) =>
    sampleFaults(segment, traces[i].pointsMm, grid, subject, setup),
  );
}

/** Everything that must hold of any document of sheets; an empty list when it does. */
export function documentFaults(
  document: SheetDocument,
  subjects: readonly SheetSubject[],
  setup: PageSetup,
): string[] {
  return document.pages.flatMap((page) =>
    [
      ...paperFaults(page, setup),
      ...textFaults(page),
      ...gridFaults(page),
      ...traceFaults(page, subjects, setup),
    ].map((fault) => `${page.label}: ${fault}`),
  );
}

/** Stretches of time that a lead is drawn for on pages of a kind, in order. */
export function drawnSpans(
  document: SheetDocument,
  kind: SheetPage['kind'],
  subject: number,
  pick: (segment: PlacedSegment) => boolean,
): [number, number][] {
  return document.pages
    .filter((page) => page.kind === kind)
    .flatMap((page) => page.systems.filter((system) => system.subject === subject))
    .flatMap(({ segments }) => segments.filter(pick))
    .map(({ fromS, toS }) => [fromS, toS]);
}
