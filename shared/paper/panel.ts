import { ladderOf } from '../ladder/ladder';
import type { SheetParameters } from '../parameters/strip-parameters';
import { calibrationPulse } from './calibration';
import { moveItem, type DrawingItem } from './drawing';
import { gridItems, type GridArea } from './grid';
import { ladderHeightMm, ladderItems } from './ladder';
import { lineSpans, longestDrawnS, type TimeSpan } from './layout';
import { markerLaneItems, markerLaneMm } from './marker-lane';
import { largeBoxMm } from './paper-scale';
import { stripDurationS, type PaperStrip } from './paper-strip';
import {
  paperGapMm,
  paperWidthMm,
  segmentsAlongPaper,
  traceInsetMm,
  type PlacedSegment,
  type RowSegment,
} from './placed-segment';
import { layRow, leadChangeStroke, stoppedLeads, traceItems, type Row } from './row';
import { rowSpacing } from './row-spacing';

/** The gridded paper of a strip with everything on it. */
export interface Panel {
  area: GridArea;
  segments: PlacedSegment[];
  items: DrawingItem[];
  /** Sentences that a reader of this paper must know. */
  notes: string[];
}

export interface PanelOptions {
  /** The paper is at least this wide. */
  leastWidthMm: number;
  /** Longest line of paper, s. */
  lineS: number;
}

/** Extra paper between the lines of a long strip, mm; only where a line has several rows. */
const lineGapMm = 10;
/** Room for a ladder under a line of paper: whole large boxes. */
const ladderBandMm = Math.ceil(ladderHeightMm / largeBoxMm) * largeBoxMm;
/** The pen stops this far from the edge of the paper, mm. */
export const penStopMm = 0.5;

/** Segments by row; they come in the order of lines and rows. */
function segmentsByRow(segments: readonly RowSegment[]): RowSegment[][] {
  const rows: RowSegment[][] = [];
  for (const segment of segments) {
    if (segment.column === 0) rows.push([]);
    rows[rows.length - 1].push(segment);
  }
  return rows;
}

function panelNotes(
  durationS: number,
  drawnS: number,
  lines: readonly TimeSpan[],
  stopped: readonly string[],
): string[] {
  const notes: string[] = [];
  if (drawnS < durationS) notes.push(`Only the first ${drawnS} s of ${durationS} s are drawn.`);
  if (lines.length > 1) notes.push(`Continued on ${lines.length} lines, ${lines[0].toS} s a line.`);
  if (stopped.length > 0) notes.push(`Cut at the edge of the paper: ${stopped.join(', ')}.`);
  return notes;
}

/** Where rows and bands of a panel lie, from the upper edge of the paper. */
interface RowPlaces {
  /** y of each row's 0 mV line. */
  baselines: number[];
  /** Upper edge of the ladder's band under each line of paper. */
  bandTops: number[];
  heightMm: number;
}

/** Without a band all rows of all lines stand evenly; with one each line is a block with its band below. */
function rowPlaces(rows: readonly Row[], sheet: SheetParameters, bandMm: number): RowPlaces {
  const rowsPerLine = rows.filter((row) => row.line === 0).length;
  const profiles = rows.map((row) => row.profile);
  const { topMm, pitchMm, bottomMm } = rowSpacing(profiles, rowsPerLine, sheet.gainMmPerMv);
  if (bandMm === 0) {
    const gapMm = rowsPerLine > 1 ? lineGapMm : 0;
    const baselines = rows.map((row, i) => topMm + i * pitchMm + row.line * gapMm);
    return { baselines, bandTops: [], heightMm: baselines[baselines.length - 1] + bottomMm };
  }
  const rowsMm = topMm + (rowsPerLine - 1) * pitchMm + bottomMm;
  const lineMm = rowsMm + bandMm;
  const lines = rows[rows.length - 1].line + 1;
  return {
    baselines: rows.map((row, i) => row.line * lineMm + topMm + (i - row.line * rowsPerLine) * pitchMm),
    bandTops: Array.from({ length: lines }, (_, line) => line * lineMm + rowsMm),
    heightMm: lines * lineMm,
  };
}

/** Where the recorder found stimuli, when the sheet shows it. */
function shownMarkers(strip: PaperStrip, sheet: SheetParameters): readonly number[] | null {
  return sheet.stimulusMarkers ? (strip.stimulusMarkersS ?? null) : null;
}

/** Markers and ladder under each line of paper, on a band without a grid. */
function bandItems(
  strip: PaperStrip,
  sheet: SheetParameters,
  lines: readonly TimeSpan[],
  bandTops: readonly number[],
  { widthMm, bandMm }: { widthMm: number; bandMm: number },
): DrawingItem[] {
  const markers = shownMarkers(strip, sheet);
  const markersMm = markers ? markerLaneMm : 0;
  const marks = sheet.ladder ? ladderOf(strip.events ?? []) : null;
  return bandTops.flatMap((topMm, line): DrawingItem[] => {
    const place = { ...lines[line], xMm: traceInsetMm(sheet.speedMmPerS), namesXMm: 0 };
    const ladderTopMm = topMm + markersMm + (ladderBandMm - ladderHeightMm) / 2;
    const { speedMmPerS } = sheet;
    return [
      { kind: 'rect', role: 'page', xMm: 0, yMm: topMm, widthMm, heightMm: bandMm, fill: 'page' },
      ...(markers ? markerLaneItems(markers, { ...place, topMm, speedMmPerS }) : []),
      ...(marks
        ? ladderItems(marks, [], {
            ...place,
            topMm: ladderTopMm,
            mmPerS: speedMmPerS,
            names: ['Atria', 'AV', 'Ventricles'],
          })
        : []),
    ];
  });
}

/**
 * Lays a strip on gridded paper at true scale, upper left corner at (0, 0): 1 s is `speedMmPerS` mm and 1 mV is
 * `gainMmPerMv` mm, whatever becomes of the sheet's size. Every 0 mV line and every start of a line lies on a
 * heavy line of the grid. Rows stand an even distance apart that keeps their inks clear of each other within
 * limits (`rowSpacing`). Throws RangeError for a strip that is empty or uneven.
 */
export function layoutPanel(strip: PaperStrip, sheet: SheetParameters, options: PanelOptions): Panel {
  const durationS = stripDurationS(strip);
  const drawnS = Math.min(durationS, longestDrawnS);
  const along = segmentsAlongPaper(sheet, drawnS, options.lineS);
  const widthMm = paperWidthMm(along, options.leastWidthMm);
  const rows = segmentsByRow(along).map((segments) =>
    layRow(strip, sheet.speedMmPerS, segments, paperGapMm, widthMm),
  );
  const bandMm = (shownMarkers(strip, sheet) ? markerLaneMm : 0) + (sheet.ladder ? ladderBandMm : 0);
  const { baselines, bandTops, heightMm } = rowPlaces(rows, sheet, bandMm);
  const area = { xMm: 0, yMm: 0, widthMm, heightMm };
  const segments = rows.flatMap((row, i) =>
    row.segments.map((segment) => ({ ...segment, baselineMm: baselines[i] })),
  );
  const pulse = (baselineMm: number) =>
    calibrationPulse(paperGapMm, baselineMm, sheet.speedMmPerS, sheet.gainMmPerMv);
  const stops = { topMm: penStopMm, bottomMm: heightMm - penStopMm };
  const traces = segments.map((segment) => traceItems(strip, sheet.speedMmPerS, segment, stops));
  const lines = lineSpans(sheet, drawnS, options.lineS);
  const items: DrawingItem[] = [
    ...gridItems(area, sheet.gridTint),
    ...bandItems(strip, sheet, lines, bandTops, { widthMm, bandMm }),
    ...segments.filter((segment) => segment.column > 0).map(leadChangeStroke),
    ...baselines.map(pulse),
    ...traces.flat(),
    ...rows.flatMap((row, i) => row.labels.map((label) => moveItem(label, 0, baselines[i]))),
  ];
  const stopped = stoppedLeads(segments, traces, stops);
  return { area, segments, items, notes: panelNotes(durationS, drawnS, lines, stopped) };
}

/** The panel with its upper left corner moved by (dxMm, dyMm). */
export function movePanel(panel: Panel, dxMm: number, dyMm: number): Panel {
  const { area, segments, items, notes } = panel;
  return {
    area: { ...area, xMm: area.xMm + dxMm, yMm: area.yMm + dyMm },
    segments: segments.map((segment) => ({
      ...segment,
      xMm: segment.xMm + dxMm,
      baselineMm: segment.baselineMm + dyMm,
    })),
    items: items.map((item) => moveItem(item, dxMm, dyMm)),
    notes,
  };
}
