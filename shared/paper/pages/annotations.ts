import type { DrawingItem, LineItem } from '../drawing';
import type { TimeSpan } from '../layout';
import type { RowProfile } from '../row-profile';
import { textItem, textWidthMm } from '../text';
import { textStyles } from '../text-styles';
import { capHeightEm, lineWeightsMm, type PaperColour } from '../tokens';
import type { Interval } from './intervals';
import type { NamedStimulus } from './stimulus-names';

/** Words at a row: a leader that passes through them would strike them out. */
interface Words {
  fromMm: number;
  toMm: number;
  /** How far they reach from the 0 mV line, on which side. */
  reachMm: number;
  above: boolean;
}

/** The row that annotations stand at; y is relative to its 0 mV line. */
export interface AnnotatedRow extends TimeSpan {
  profile: RowProfile;
  /** The traces alone. */
  ink: RowProfile;
  /** Lead names, and names of stimuli as they are placed. */
  words: Words[];
  /** x of `fromS`, and millimetres a second takes. */
  traceXMm: number;
  mmPerS: number;
  /** Right edge of the grid. */
  widthMm: number;
  /** The profile's ink is clipped to this, so that a giant artefact is passed beside, not over, mm. */
  tallMm: number;
}

const capMm = textStyles.interval.size.sizeMm * capHeightEm;
/** Free paper around annotations, mm. */
const clearanceMm = 1;
/** From a stimulus to the start of its name, and from the name to its leader, mm. */
const besideMm = 2.2;
const leaderGapMm = 0.7;
/** A leader stops this far above the ink, mm. */
const leaderStopMm = 0.8;
/** Lowest foot of a name above the 0 mV line, mm. */
const lowestMm = 5;
/** A name on its less usual side, below the trace, or cut off from it costs as much as standing this much further off, mm. */
const costOfOtherSideMm = 4;
const costOfBelowMm = 8;
const costOfBlockedMm = 20;
/** Descenders, mm. */
const belowBaselineMm = 0.8;
/** Dimension lines: below the ink, one below the other, and their ends, mm. */
const belowInkMm = 3.5;
const laneMm = 5;
const tickHalfMm = 1.1;
/** Least stretch of line on either side of words within it, and from a line to words beside it, mm. */
const leastLegMm = 1;
const wordGapMm = 0.9;
/** Between dimension lines of one lane that do not follow each other, mm. */
const apartMm = 3;
/** A lane further down costs as much as standing this share of the line off its middle. */
const costOfLane = 0.6;

function stroke(x1Mm: number, y1Mm: number, x2Mm: number, y2Mm: number, colour: PaperColour): LineItem {
  return {
    kind: 'line',
    role: 'annotation',
    ...{ x1Mm, y1Mm, x2Mm, y2Mm },
    colour,
    weightMm: lineWeightsMm.annotation,
  };
}

function xOf(row: AnnotatedRow, timeS: number): number {
  return row.traceXMm + (timeS - row.fromS) * row.mmPerS;
}

/** Where a name can stand: its left edge, how far its near edge is from the 0 mV line, on which sides. */
interface NamePlace {
  fromMm: number;
  footMm: number;
  left: boolean;
  above: boolean;
  /** Where a leader down to the trace ends, and whether words are in its way. */
  leaderMm: number;
  blocked: boolean;
}

/** The end of a leader at `xMm` from a name whose middle is `middleMm` off: just off the trace, or off words in between. */
function leaderEnd(row: AnnotatedRow, xMm: number, above: boolean, middleMm: number) {
  const [a, b] = [xMm - 0.5, xMm + 0.5];
  const inkMm = above ? row.ink.reachUpMm(a, b) : row.ink.reachDownMm(a, b);
  const between = row.words.filter(
    (one) => one.above === above && one.fromMm <= b && one.toMm >= a && one.reachMm < middleMm,
  );
  const reachMm = Math.max(inkMm, ...between.map((one) => one.reachMm));
  return { leaderMm: reachMm + leaderStopMm, blocked: between.length > 0 };
}

/** `waitingMm` are the stimuli further left that still need their leaders: no name may cover them. */
function placesOf(
  row: AnnotatedRow,
  xMm: number,
  widthMm: number,
  waitingMm: readonly number[],
): NamePlace[] {
  const ranges = [
    { fromMm: xMm - besideMm - widthMm, left: true },
    { fromMm: xMm + besideMm, left: false },
  ].filter(
    ({ fromMm, left }) =>
      fromMm >= row.traceXMm &&
      fromMm + widthMm <= row.widthMm - clearanceMm &&
      !(left && waitingMm.some((waiting) => waiting > fromMm - clearanceMm)),
  );
  return ranges.flatMap((range) =>
    [true, false].map((above) => {
      const [a, b] = [range.fromMm - clearanceMm, range.fromMm + widthMm + clearanceMm];
      const inkMm = above ? row.profile.reachUpMm(a, b) : row.profile.reachDownMm(a, b);
      const footMm = Math.max(lowestMm, inkMm + clearanceMm);
      return { ...range, above, footMm, ...leaderEnd(row, xMm, above, footMm + capMm / 2) };
    }),
  );
}

function costOf({ footMm, left, above, blocked }: NamePlace, { atrial }: NamedStimulus): number {
  const side = (left === atrial ? 0 : costOfOtherSideMm) + (above ? 0 : costOfBelowMm);
  return footMm + side + (blocked ? costOfBlockedMm : 0);
}

function nameItems(row: AnnotatedRow, stimulus: NamedStimulus, waitingMm: readonly number[]): DrawingItem[] {
  const xMm = xOf(row, stimulus.timeS);
  const { widthMm } = stimulus;
  const places = placesOf(row, xMm, widthMm, waitingMm).sort(
    (a, b) => costOf(a, stimulus) - costOf(b, stimulus),
  );
  if (places.length === 0) return [];
  const { fromMm, footMm, left, above, leaderMm } = places[0];
  const sign = above ? -1 : 1;
  const middleMm = footMm + capMm / 2;
  const edgeMm = left ? fromMm + widthMm + leaderGapMm : fromMm - leaderGapMm;
  // Beside an artefact taller than its name the leader points at it from the side.
  const turns = leaderMm < middleMm;
  const endMm = turns ? xMm : xMm + (left ? -leaderStopMm : leaderStopMm);
  row.profile.add(fromMm, fromMm + widthMm, -sign * (footMm + capMm + belowBaselineMm));
  row.words.push({ fromMm, toMm: fromMm + widthMm, reachMm: footMm + capMm, above });
  row.profile.add(Math.min(xMm, edgeMm), Math.max(xMm, edgeMm), -sign * (middleMm + belowBaselineMm));
  const baselineMm = above ? -footMm : footMm + capMm;
  return [
    textItem(stimulus.text, textStyles.stimulusName, fromMm, baselineMm),
    stroke(edgeMm, sign * middleMm, endMm, sign * middleMm, 'copper'),
    ...(turns ? [stroke(xMm, sign * middleMm, xMm, sign * leaderMm, 'copper')] : []),
  ];
}

/** Names of stimuli over the row, each with a line that leads to its stimulus; the row's profile takes them up. */
export function stimulusNameItems(row: AnnotatedRow, stimuli: readonly NamedStimulus[]): DrawingItem[] {
  // From right to left: a name right of its stimulus then rises above the one after it and keeps its leader free.
  const here = stimuli
    .filter(({ timeS }) => timeS >= row.fromS && timeS < row.toS)
    .sort((a, b) => b.timeS - a.timeS);
  return here.flatMap((stimulus, i) => {
    const waitingMm = here.slice(i + 1).map(({ timeS }) => xOf(row, timeS));
    return nameItems(row, stimulus, waitingMm);
  });
}

/** A dimension line with its words, and the stretch of paper that both take. */
interface Dimension {
  x1Mm: number;
  x2Mm: number;
  text: string;
  textXMm: number;
  textWidthMm: number;
  fromMm: number;
  toMm: number;
  lane: number;
}

/** Words within the line where they fit, else to the left of it, else to the right. */
function dimensionOf(row: AnnotatedRow, { fromS, toS, text }: Interval): Dimension {
  const [x1Mm, x2Mm] = [xOf(row, fromS), xOf(row, toS)];
  const width = textWidthMm(text, textStyles.interval);
  const base = { x1Mm, x2Mm, text, textWidthMm: width, lane: 0 };
  if (x2Mm - x1Mm >= width + 2 * (leastLegMm + wordGapMm)) {
    return { ...base, textXMm: (x1Mm + x2Mm - width) / 2, fromMm: x1Mm, toMm: x2Mm };
  }
  const leftMm = x1Mm - wordGapMm - width;
  if (leftMm >= clearanceMm) return { ...base, textXMm: leftMm, fromMm: leftMm, toMm: x2Mm };
  const rightMm = x2Mm + wordGapMm;
  return { ...base, textXMm: rightMm, fromMm: x1Mm, toMm: rightMm + width };
}

/** Whether one dimension line ends where the other begins, without words between them. */
function chained(a: Dimension, b: Dimension): boolean {
  return Math.abs(a.x2Mm - b.x1Mm) < 0.01 && a.toMm === a.x2Mm && b.fromMm === b.x1Mm;
}

/** The first lane in which nothing is in the way. */
function freeLane(dimension: Dimension, placed: readonly Dimension[]): number {
  for (let lane = 0; ; lane++) {
    const taken = placed.some(
      (other) =>
        other.lane === lane &&
        other.fromMm < dimension.toMm + apartMm &&
        other.toMm > dimension.fromMm - apartMm &&
        !chained(other, dimension) &&
        !chained(dimension, other),
    );
    if (!taken) return lane;
  }
}

/** How good an instance is: near the middle of the row, in a lane above, not beside ink that is too deep; s. */
function badness(row: AnnotatedRow, interval: Interval, dimension: Dimension): number {
  const lineS = row.toS - row.fromS;
  const offS = Math.abs((interval.fromS + interval.toS - row.fromS - row.toS) / 2);
  const deepMm = row.profile.reachDownMm(dimension.fromMm, dimension.toMm);
  return offS + dimension.lane * lineS * costOfLane + (deepMm >= row.tallMm ? lineS : 0);
}

/** Gives one instance of every kind that lies within the row its place. */
function placeInstances(row: AnnotatedRow, intervals: readonly Interval[]): Map<Interval['kind'], Dimension> {
  const placed = new Map<Interval['kind'], Dimension>();
  const within = intervals.filter(({ fromS, toS }) => fromS >= row.fromS && toS < row.toS);
  for (const kind of new Set(within.map((interval) => interval.kind))) {
    const taken = [...placed.values()];
    const candidates = within
      .filter((interval) => interval.kind === kind)
      .map((interval) => {
        const dimension = dimensionOf(row, interval);
        const laned = { ...dimension, lane: freeLane(dimension, taken) };
        return { dimension: laned, cost: badness(row, interval, laned) };
      });
    placed.set(kind, candidates.reduce((best, one) => (one.cost < best.cost ? one : best)).dimension);
  }
  return placed;
}

function dimensionItems(dimension: Dimension, yMm: number): DrawingItem[] {
  const { x1Mm, x2Mm, text, textXMm, textWidthMm: width } = dimension;
  const inside = textXMm > x1Mm && textXMm < x2Mm;
  const line = inside
    ? [
        stroke(x1Mm, yMm, textXMm - wordGapMm, yMm, 'ink'),
        stroke(textXMm + width + wordGapMm, yMm, x2Mm, yMm, 'ink'),
      ]
    : [stroke(x1Mm, yMm, x2Mm, yMm, 'ink')];
  const ticks = [x1Mm, x2Mm].map((xMm) => stroke(xMm, yMm - tickHalfMm, xMm, yMm + tickHalfMm, 'ink'));
  return [...line, ...ticks, textItem(text, textStyles.interval, textXMm, yMm + capMm / 2)];
}

/**
 * One good instance of every kind of interval as a dimension line below the row's ink, all of a lane at one height, and the
 * kinds drawn. The row's profile takes them up.
 */
export function intervalItems(
  row: AnnotatedRow,
  intervals: readonly Interval[],
): { items: DrawingItem[]; kinds: Interval['kind'][] } {
  const placed = placeInstances(row, intervals);
  const dimensions = [...placed.values()];
  const inkMm = Math.max(
    ...dimensions.map(({ fromMm, toMm }) =>
      row.profile.reachDownMm(fromMm - clearanceMm, toMm + clearanceMm),
    ),
  );
  const items = dimensions.flatMap((dimension) => {
    const yMm = inkMm + belowInkMm + dimension.lane * laneMm;
    row.profile.add(dimension.fromMm, dimension.toMm, -(yMm + capMm));
    return dimensionItems(dimension, yMm);
  });
  return { items, kinds: [...placed.keys()] };
}
