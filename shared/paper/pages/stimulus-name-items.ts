import type { DrawingItem } from '../drawing';
import { textItem } from '../text';
import { textStyles } from '../text-styles';
import { capMm, clearanceMm, stroke, xOf, type AnnotatedRow } from './annotated-row';
import type { NamedStimulus } from './stimulus-names';

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

/** `waitingMm` are the stimuli further left that still need their leaders: no name covers them where it can stand elsewhere. */
function placesOf(
  row: AnnotatedRow,
  xMm: number,
  widthMm: number,
  waitingMm: readonly number[],
): NamePlace[] {
  const ranges = [
    { fromMm: xMm - besideMm - widthMm, left: true },
    { fromMm: xMm + besideMm, left: false },
  ].filter(({ fromMm }) => fromMm >= row.traceXMm && fromMm + widthMm <= row.widthMm - clearanceMm);
  const free = ranges.filter(
    ({ fromMm, left }) => !left || waitingMm.every((waiting) => waiting <= fromMm - clearanceMm),
  );
  return (free.length > 0 ? free : ranges).flatMap((range) =>
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
