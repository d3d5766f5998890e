import { ladderLevels, type LadderMark } from '../ladder/ladder';
import type { SensingWindow } from '../ladder/sensing-windows';
import type { DrawingItem, LineItem, PolygonItem } from './drawing';
import { textItem, textWidthMm, type TextStyle } from './text';
import { textStyles } from './text-styles';
import { capHeightEm, lineWeightsMm, type PaperColour } from './tokens';

/** Height of a lane, and room above and below for stimuli from outside, mm. */
const laneMm = 5;
const outsideMm = 4;
const strokeMm = 3.2;
const ladderLanes = 3;
export const ladderHeightMm = ladderLanes * laneMm + 2 * outsideMm;

/** Sizes of signs, mm. */
const dotMm = 0.5;
const captureDotMm = 0.55;
const ringMm = 0.95;
const ringInsideMm = 1.7;
const diamondMm = 0.85;
const barHalfMm = 1;
const barGapMm = 0.75;
const hatchPitchMm = 1.2;
const windowInsetMm = 0.5;
/** Letters of ventricles, below their strokes: distance of the baseline from the bottom of the lanes. */
const labelDropMm = outsideMm - 0.2;
/** From a stroke to its letter, mm; stimuli of one pace lie at most this far apart, s. */
const letterGapMm = 0.7;
const pairS = 0.1;

/** Where a ladder lies: the same x for the same time as the traces above it. */
export interface LadderPlace {
  /** x of `fromS`. */
  xMm: number;
  topMm: number;
  fromS: number;
  toS: number;
  /** Millimetres of paper a second takes. */
  mmPerS: number;
  /** Names of the lanes, and where they begin. */
  names: readonly [atria: string, junction: string, ventricles: string];
  namesXMm: number;
  /** Size of its type; that of captions on paper when absent. */
  captionMm?: number;
}

interface Frame extends LadderPlace {
  x(timeS: number): number;
  y(level: number): number;
  shows(timeS: number): boolean;
  style(name: 'ladderName' | 'ladderLetter' | 'ladderWindow'): TextStyle;
}

function frameOf(place: LadderPlace): Frame {
  return {
    ...place,
    x: (timeS) => place.xMm + (timeS - place.fromS) * place.mmPerS,
    y: (level) => place.topMm + outsideMm + level * laneMm,
    shows: (timeS) => timeS >= place.fromS && timeS < place.toS,
    style: (name) => {
      const style: TextStyle = textStyles[name];
      return place.captionMm === undefined
        ? style
        : { ...style, size: { ...style.size, sizeMm: place.captionMm } };
    },
  };
}

function stroke(
  [x1Mm, y1Mm]: readonly [number, number],
  [x2Mm, y2Mm]: readonly [number, number],
  colour: PaperColour,
  weightMm: number,
): LineItem {
  return { kind: 'line', role: 'ladder', x1Mm, y1Mm, x2Mm, y2Mm, colour, weightMm };
}

function diamond(xMm: number, yMm: number, filled: boolean): PolygonItem {
  const r = diamondMm;
  return {
    kind: 'polygon',
    role: 'ladder',
    pointsMm: Float64Array.of(xMm, yMm - r, xMm + r, yMm, xMm, yMm + r, xMm - r, yMm),
    fill: filled ? 'ink' : 'page',
    stroke: 'ink',
    weightMm: lineWeightsMm.ladderSign,
  };
}

/** Hairlines at the edges of the lanes, and their names. */
function laneItems(frame: Frame): DrawingItem[] {
  const [left, right] = [frame.x(frame.fromS), frame.x(frame.toS)];
  const edges = [0, 1, 2, 3].map((level) =>
    stroke([left, frame.y(level)], [right, frame.y(level)], 'edge', lineWeightsMm.ladderLane),
  );
  const style = frame.style('ladderName');
  const names = frame.names.map((name, lane) =>
    textItem(name, style, frame.namesXMm, frame.y(lane + 0.5) + (style.size.sizeMm * capHeightEm) / 2),
  );
  return [...edges, ...names];
}

/** A line of conduction, cut where the paper ends. */
function conductionItems(mark: Extract<LadderMark, { kind: 'conduction' }>, frame: Frame): DrawingItem[] {
  const { fromS, toS, fromLevel, toLevel } = mark;
  const within = (timeS: number): number => Math.max(frame.fromS, Math.min(frame.toS, timeS));
  if (Math.max(fromS, toS) < frame.fromS || Math.min(fromS, toS) > frame.toS) return [];
  const levelAt = (timeS: number): number =>
    toS === fromS ? toLevel : fromLevel + ((timeS - fromS) / (toS - fromS)) * (toLevel - fromLevel);
  const [a, b] = [within(fromS), within(toS)];
  if (a === b && fromS !== toS) return [];
  const start = [frame.x(a), frame.y(a === fromS ? fromLevel : levelAt(a))] as const;
  const end = [frame.x(b), frame.y(b === toS ? toLevel : levelAt(b))] as const;
  return [stroke(start, end, 'ink', lineWeightsMm.ladderConduction)];
}

/** Two bars across the end of an impulse, or facing each other where two impulses meet. */
function barItems(timeS: number, level: number, gapMm: number, frame: Frame): DrawingItem[] {
  const [x, y] = [frame.x(timeS), frame.y(level)];
  return [-gapMm / 2, gapMm / 2].map((dy) =>
    stroke([x - barHalfMm, y + dy], [x + barHalfMm, y + dy], 'ink', lineWeightsMm.ladderConduction),
  );
}

type StimulusMark = Extract<LadderMark, { kind: 'stimulus' }>;

/** The letter of a ventricle beside its stroke: on the outer side of a pair, so that the two never meet. */
function letterItem(
  mark: StimulusMark,
  label: string,
  marks: readonly LadderMark[],
  frame: Frame,
): DrawingItem {
  const hasNext = marks.some(
    (other) =>
      other.kind === 'stimulus' &&
      other.label !== null &&
      other.timeS > mark.timeS &&
      other.timeS - mark.timeS <= pairS,
  );
  const baseline = frame.y(ladderLevels.bottom) + labelDropMm;
  const xMm = frame.x(mark.timeS) + (hasNext ? -letterGapMm : letterGapMm);
  return textItem(label, frame.style('ladderLetter'), xMm, baseline, hasNext ? 'end' : 'start');
}

function stimulusItems(mark: StimulusMark, marks: readonly LadderMark[], frame: Frame): DrawingItem[] {
  const above = mark.edge === 'atria';
  const x = frame.x(mark.timeS);
  const edge = frame.y(above ? ladderLevels.top : ladderLevels.bottom);
  const outward = above ? -1 : 1;
  const items: DrawingItem[] = [
    stroke([x, edge], [x, edge + outward * strokeMm], 'copper', lineWeightsMm.ladderStimulus),
  ];
  if (mark.captured) {
    items.push({
      kind: 'circle',
      role: 'ladder',
      cxMm: x,
      cyMm: edge,
      radiusMm: captureDotMm,
      fill: 'copper',
      stroke: null,
      weightMm: 0,
    });
  } else {
    const centre = edge - outward * ringInsideMm;
    const slant = ringMm * Math.SQRT1_2;
    items.push(
      {
        kind: 'circle',
        role: 'ladder',
        cxMm: x,
        cyMm: centre,
        radiusMm: ringMm,
        fill: 'page',
        stroke: 'copper',
        weightMm: lineWeightsMm.ladderSign,
      },
      stroke([x - slant, centre + slant], [x + slant, centre - slant], 'copper', lineWeightsMm.ladderSign),
    );
  }
  if (mark.label) items.push(letterItem(mark, mark.label, marks, frame));
  return items;
}

function markItems(mark: LadderMark, marks: readonly LadderMark[], frame: Frame): DrawingItem[] {
  if (mark.kind === 'conduction') return conductionItems(mark, frame);
  if (!frame.shows(mark.timeS)) return [];
  switch (mark.kind) {
    case 'stimulus':
      return stimulusItems(mark, marks, frame);
    case 'intrinsic':
      return [
        {
          kind: 'circle',
          role: 'ladder',
          cxMm: frame.x(mark.timeS),
          cyMm: frame.y(mark.level),
          radiusMm: dotMm,
          fill: 'ink',
          stroke: null,
          weightMm: 0,
        },
      ];
    case 'escape':
      return [diamond(frame.x(mark.timeS), frame.y(mark.level), true)];
    case 'fusion':
      return [diamond(frame.x(mark.timeS), frame.y(mark.level), false)];
    case 'block':
      return barItems(mark.timeS, mark.level, barGapMm, frame);
    case 'collision':
      return barItems(mark.timeS, mark.level, barGapMm, frame);
  }
}

/** Slanted hatching of a box. */
function hatchItems(left: number, right: number, top: number, bottom: number, pitchMm: number): LineItem[] {
  const height = bottom - top;
  const lines: LineItem[] = [];
  for (let x = left - height + pitchMm; x < right; x += pitchMm) {
    const from = Math.max(left, x);
    const to = Math.min(right, x + height);
    if (to - from < 0.05) continue;
    lines.push(
      stroke([from, bottom - (from - x)], [to, bottom - (to - x)], 'ruleStrong', lineWeightsMm.ladderHatch),
    );
  }
  return lines;
}

function outline(left: number, right: number, top: number, bottom: number): LineItem[] {
  const dotted = (from: readonly [number, number], to: readonly [number, number]): LineItem => ({
    ...stroke(from, to, 'edge', lineWeightsMm.ladderHatch),
    dashMm: [0.3, 0.6],
  });
  return [
    dotted([left, top], [right, top]),
    dotted([left, bottom], [right, bottom]),
    dotted([left, top], [left, bottom]),
    dotted([right, top], [right, bottom]),
  ];
}

/** Refractory: hatched, closer when blanked. Alert: a dotted outline. Each with its name where there is room. */
function windowItems(window: SensingWindow, frame: Frame): DrawingItem[] {
  const fromS = Math.max(window.fromS, frame.fromS);
  const toS = Math.min(window.toS, frame.toS);
  if (toS <= fromS) return [];
  const [left, right] = [frame.x(fromS), frame.x(toS)];
  const lane = window.channel === 'atrium' ? 0 : 2;
  const top = frame.y(lane) + windowInsetMm;
  const bottom = frame.y(lane + 1) - windowInsetMm;
  const box: DrawingItem[] =
    window.kind === 'alert'
      ? outline(left, right, top, bottom)
      : [
          ...hatchItems(
            left,
            right,
            top,
            bottom,
            window.kind === 'blanking' ? hatchPitchMm / 2 : hatchPitchMm,
          ),
          ...(window.kind === 'crosstalk' ? outline(left, right, top, bottom) : []),
        ];
  const style = frame.style('ladderWindow');
  const width = textWidthMm(window.label, style);
  if (width + 1 > right - left) return box;
  const middle = (left + right) / 2;
  const baseline = (top + bottom) / 2 + (style.size.sizeMm * capHeightEm) / 2;
  const words = textItem(window.label, style, middle, baseline, 'middle');
  if (window.kind === 'alert') return [...box, words];
  return [
    ...box,
    {
      kind: 'rect',
      role: 'ladder',
      xMm: middle - width / 2 - 0.4,
      yMm: baseline - style.size.sizeMm * 0.85,
      widthMm: width + 0.8,
      heightMm: style.size.sizeMm * 1.1,
      fill: 'page',
    },
    words,
  ];
}

/**
 * A ladder diagram in millimetres, `ladderHeightMm` high, on the time axis of the traces above it. `windows` are drawn
 * behind it on request.
 */
export function ladderItems(
  marks: readonly LadderMark[],
  windows: readonly SensingWindow[],
  place: LadderPlace,
): DrawingItem[] {
  const frame = frameOf(place);
  return [
    ...windows.flatMap((window) => windowItems(window, frame)),
    ...laneItems(frame),
    ...marks.flatMap((mark) => markItems(mark, marks, frame)),
  ];
}
