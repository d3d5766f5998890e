import type { BeatReading } from '../../../../shared/engine/reading/beat-reading';

/** The column of one beat: from a little before it to a little before the next. */
export interface BeatColumn {
  number: number;
  timeS: number;
  fromS: number;
  toS: number;
}

/** A column that is tinted: chosen, or lighter, under the pointer. */
export interface TintedColumn {
  fromS: number;
  toS: number;
  hovered: boolean;
}

/** A beat's column begins this long before its onset, so that its P wave and stimuli are inside, s. */
const before = (rrS: number): number => Math.min(0.28, 0.45 * rrS);

/** Columns of all beats, side by side, within the strip. */
export function beatColumns(beats: readonly BeatReading[], durationS: number): BeatColumn[] {
  const starts = beats.map((beat, i) => {
    const previous = beats[i - 1]?.timeS ?? beat.timeS - 0.8;
    return Math.max(0, beat.timeS - before(beat.timeS - previous));
  });
  return beats.map((beat, i) => ({
    number: beat.number,
    timeS: beat.timeS,
    fromS: starts[i],
    toS: starts[i + 1] ?? Math.min(durationS, beat.timeS + 0.6),
  }));
}

/** The beat in whose column a time lies. */
export function columnAt(columns: readonly BeatColumn[], timeS: number): BeatColumn | undefined {
  return columns.find(({ fromS, toS }) => timeS >= fromS && timeS < toS);
}

/** The columns to tint: those of chosen beats, and the one under the pointer. */
export function tintedColumns(
  columns: readonly BeatColumn[],
  chosen: readonly number[],
  hovered: number | null,
): TintedColumn[] {
  return columns.flatMap(({ number, fromS, toS }): TintedColumn[] => {
    if (chosen.includes(number)) return [{ fromS, toS, hovered: false }];
    return number === hovered ? [{ fromS, toS, hovered: true }] : [];
  });
}
