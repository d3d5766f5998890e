import type { DrawingItem } from '../drawing';
import { textItem, textWidthMm } from '../text';
import { textStyles } from '../text-styles';
import { capMm, clearanceMm, stroke, xOf, type AnnotatedRow } from './annotated-row';
import type { Interval } from './intervals';

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
