import type { LadderMark } from '../../ladder/ladder';
import type { PageSetup } from '../../parameters/page-setup';
import { calibrationPulse } from '../calibration';
import { moveItem, type DrawingItem } from '../drawing';
import { gridItems } from '../grid';
import { ladderHeightMm, ladderItems } from '../ladder';
import { penStopMm } from '../panel';
import { largeBoxMm } from '../paper-scale';
import type { PaperStrip } from '../paper-strip';
import type { PlacedSegment } from '../placed-segment';
import { layRow, leadChangeStroke, stoppedLeads, traceItems, type Row } from '../row';
import { clearanceMm, rowGapMm, rowSpacing, toLargeBoxes } from '../row-spacing';
import type { RowProfile } from '../row-profile';
import { textWidthMm } from '../text';
import { textStyles } from '../text-styles';
import { capHeightEm } from '../tokens';
import type { AnnotatedRow } from './annotated-row';
import { intervalItems } from './dimension-lines';
import type { Interval } from './intervals';
import type { PageFrame } from './page-frame';
import { lineSegments, type PageLine } from './page-lines';
import type { LeadCell } from './page-rows';
import type { PlacedSystem } from './sheet-document';
import type { Spacing } from './spacing';
import { stimulusNameItems } from './stimulus-name-items';
import type { NamedStimulus } from './stimulus-names';

/** Room for a ladder under a grid, mm. */
const ladderBandMm = Math.ceil(ladderHeightMm / largeBoxMm) * largeBoxMm;
/** Annotations pass beside ink that reaches further than this, mm. */
const tallMm = 24;
/** Least room above the first line and below the last where paper is short, mm. */
const trimmedEdgeMm = 10;
/** Lane names need this much room left of the traces, mm; elsewhere they are letters. */
const laneNamesMm = 15;

/** All rows of one line of paper, laid out along the paper and annotated, but not yet spaced. */
export interface System {
  line: PageLine;
  rows: Row[];
  /** At the last row, y from its 0 mV line, and how far they reach. */
  annotations: DrawingItem[];
  aboveMm: number;
  belowMm: number;
  /** Least distance from the last row to the one before it, mm. */
  lastGapMm: number;
  /** Distance from each row to the next that their ink asks for, mm, and the one that suits all. */
  gapsMm: number[];
  pitchMm: number;
  gainMmPerMv: LeadCell['gainMmPerMv'];
  ladder: readonly LadderMark[] | null;
}

/** What all systems of a strip share. */
export interface SystemContext {
  strip: PaperStrip;
  setup: PageSetup;
  frame: PageFrame;
  rows: readonly (readonly LeadCell[])[];
}

/** What an answer sheet shows of a strip at its lines. */
export interface SystemMarks {
  stimuli: readonly NamedStimulus[];
  intervals: readonly Interval[];
  ladder: readonly LadderMark[] | null;
}

function annotate(
  row: AnnotatedRow,
  marks: SystemMarks,
): { items: DrawingItem[]; kinds: Interval['kind'][] } {
  const names = stimulusNameItems(row, marks.stimuli);
  const { items, kinds } = intervalItems(row, marks.intervals);
  return { items: [...names, ...items], kinds };
}

/** How far items reach above and below the line they are relative to, mm. */
function extent(items: readonly DrawingItem[]): { aboveMm: number; belowMm: number } {
  const ys = items.flatMap((item) => {
    if (item.kind === 'text') return [item.yMm - item.sizeMm * 0.75, item.yMm + item.sizeMm * 0.25];
    return item.kind === 'line' ? [item.y1Mm, item.y2Mm] : [];
  });
  return { aboveMm: Math.max(0, ...ys.map((y) => -y)), belowMm: Math.max(0, ...ys) };
}

/** Lays one line of a strip; also returns the kinds of interval that it drew. */
export function laySystem(
  context: SystemContext,
  line: PageLine,
  lineIndex: number,
  marks: SystemMarks,
): { system: System; kinds: Interval['kind'][] } {
  const { strip, setup, frame, rows: cells } = context;
  const { speedMmPerS } = setup;
  const { traceXMm, pulseXMm, contentWidthMm } = frame;
  const rows = cells.map((row, i) => {
    const segments = lineSegments(row, { line, lineIndex, row: i, traceXMm, speedMmPerS });
    return layRow(strip, speedMmPerS, segments, pulseXMm, contentWidthMm);
  });
  const last = rows[rows.length - 1];
  const profile = last.profile.clipped(tallMm);
  const words = last.labels.map((label) => {
    const fromMm = label.xMm;
    const toMm = fromMm + textWidthMm(label.text, textStyles.leadName);
    return { fromMm, toMm, reachMm: -label.yMm + label.sizeMm * capHeightEm, above: true };
  });
  const place = { traceXMm, mmPerS: speedMmPerS, widthMm: contentWidthMm, tallMm };
  const { items, kinds } = annotate(
    { ...line, ...place, profile, ink: last.ink.clipped(tallMm), words },
    marks,
  );
  const gainMmPerMv = Math.max(...cells.flat().map((cell) => cell.gainMmPerMv)) as System['gainMmPerMv'];
  const profiles = rows.map((row) => row.profile);
  const before = rows.length > 1 ? rows[rows.length - 2].profile.clipped(tallMm) : null;
  const system = {
    ...{ line, rows, annotations: items, gainMmPerMv },
    ...extent(items),
    lastGapMm: before && items.length > 0 ? before.distanceToNextMm(profile) + clearanceMm : 0,
    gapsMm: profiles.slice(1).map((next, i) => rowGapMm(profiles[i], next, gainMmPerMv)),
    pitchMm: rowSpacing(profiles, rows.length, gainMmPerMv).pitchMm,
    ladder: marks.ladder,
  };
  return { system, kinds };
}

/** Some rows of a system as they lie under each other on one page, from the upper edge of their grid. */
export interface SystemPart {
  system: System;
  fromRow: number;
  /** Not included. */
  toRow: number;
  baselines: number[];
  gridHeightMm: number;
  /** With the ladder below it. */
  heightMm: number;
  /** Whether rows stand closer than their ink asks for. */
  crowded: boolean;
  /** Whether a trace reaches the edge of the paper. */
  cut: boolean;
}

/** Distance from the row before; before the last there is also room for what is written there. */
function gapBeforeMm(system: System, spacing: Spacing, row: number): number {
  const ownMm = Math.max(system.gapsMm[row - 1], spacing.leastMm);
  const writtenMm = row === system.rows.length - 1 ? Math.max(0, toLargeBoxes(system.lastGapMm - ownMm)) : 0;
  return Math.min(ownMm, spacing.pitchMm) + writtenMm;
}

/** Spaces the rows [fromRow, toRow) of a system. */
export function partOf(system: System, spacing: Spacing, fromRow: number, toRow: number): SystemPart {
  const rows = system.rows.slice(fromRow, toRow);
  const profiles: RowProfile[] = rows.map((row) => row.profile);
  const edgeMm = spacing.trimmed ? trimmedEdgeMm : undefined;
  const edges = rowSpacing(profiles, system.rows.length, system.gainMmPerMv, edgeMm);
  const hasLast = toRow === system.rows.length;
  const limitMm = spacing.edgeLimitMm ?? Infinity;
  const aboveMm = hasLast && rows.length === 1 ? toLargeBoxes(system.aboveMm + 1) : 0;
  const belowMm = hasLast ? toLargeBoxes(system.belowMm + 1) : 0;
  const topMm = Math.max(Math.min(edges.topMm, limitMm), aboveMm);
  const bottomMm = Math.max(Math.min(edges.bottomMm, limitMm), belowMm);
  const baselines = [topMm];
  for (let row = fromRow + 1; row < toRow; row++) {
    baselines.push(baselines[baselines.length - 1] + gapBeforeMm(system, spacing, row));
  }
  const gridHeightMm = baselines[baselines.length - 1] + bottomMm;
  return {
    ...{ system, fromRow, toRow, baselines, gridHeightMm },
    heightMm: gridHeightMm + (hasLast && system.ladder ? ladderBandMm : 0),
    crowded: system.gapsMm.slice(fromRow, toRow - 1).some((gapMm) => gapMm > spacing.pitchMm),
    cut: profiles.some(
      (profile, i) =>
        profile.reachUpMm() >= baselines[i] - penStopMm ||
        profile.reachDownMm() >= gridHeightMm - baselines[i] - penStopMm,
    ),
  };
}

function stopsOf(part: SystemPart): { topMm: number; bottomMm: number } {
  return { topMm: penStopMm, bottomMm: part.gridHeightMm - penStopMm };
}

function placedSegments(part: SystemPart): PlacedSegment[] {
  return part.system.rows
    .slice(part.fromRow, part.toRow)
    .flatMap((row, i) => row.segments.map((segment) => ({ ...segment, baselineMm: part.baselines[i] })));
}

function ladderBand(part: SystemPart, context: SystemContext): DrawingItem[] {
  const { line, ladder, rows } = part.system;
  if (!ladder || part.toRow < rows.length) return [];
  const { traceXMm } = context.frame;
  return ladderItems(ladder, [], {
    ...line,
    xMm: traceXMm,
    topMm: part.gridHeightMm + (ladderBandMm - ladderHeightMm) / 2,
    mmPerS: context.setup.speedMmPerS,
    names: traceXMm >= laneNamesMm ? ['Atria', 'AV', 'Ventricles'] : ['A', 'AV', 'V'],
    namesXMm: 0,
  });
}

/** Everything on and under the grid of a part, from its upper left corner, and the leads whose pen was stopped. */
export function drawPart(
  part: SystemPart,
  context: SystemContext,
): { items: DrawingItem[]; stopped: string[]; placed: Omit<PlacedSystem, 'subject'> } {
  const { strip, setup, frame } = context;
  const grid = { xMm: 0, yMm: 0, widthMm: frame.contentWidthMm, heightMm: part.gridHeightMm };
  const segments = placedSegments(part);
  const traces = segments.map((one) => traceItems(strip, setup.speedMmPerS, one, stopsOf(part)));
  const rows = part.system.rows.slice(part.fromRow, part.toRow);
  const pulses = rows.map((row, i) => {
    const gains = [...new Set(row.segments.map((segment) => segment.gainMmPerMv))];
    return calibrationPulse(frame.pulseXMm, part.baselines[i], setup.speedMmPerS, ...gains);
  });
  const lastMm = part.baselines[part.baselines.length - 1];
  const annotations = part.toRow === part.system.rows.length ? part.system.annotations : [];
  return {
    items: [
      ...gridItems(grid, setup.gridTint),
      ...segments.filter((segment) => segment.column > 0).map(leadChangeStroke),
      ...pulses,
      ...traces.flat(),
      ...rows.flatMap((row, i) => row.labels.map((label) => moveItem(label, 0, part.baselines[i]))),
      ...annotations.map((item) => moveItem(item, 0, lastMm)),
      ...ladderBand(part, context),
    ],
    stopped: stoppedLeads(segments, traces, stopsOf(part)),
    placed: { grid, segments },
  };
}
