import type { LineItem } from '../drawing';
import type { TimeSpan } from '../layout';
import type { RowProfile } from '../row-profile';
import { textStyles } from '../text-styles';
import { capHeightEm, lineWeightsMm, type PaperColour } from '../tokens';

/** Words at a row: a leader that passes through them would strike them out. */
export interface Words {
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

/** Height of the capitals of annotations, mm. */
export const capMm = textStyles.interval.size.sizeMm * capHeightEm;
/** Free paper around annotations, mm. */
export const clearanceMm = 1;

/** A line of an annotation. */
export function stroke(
  x1Mm: number,
  y1Mm: number,
  x2Mm: number,
  y2Mm: number,
  colour: PaperColour,
): LineItem {
  return {
    kind: 'line',
    role: 'annotation',
    ...{ x1Mm, y1Mm, x2Mm, y2Mm },
    colour,
    weightMm: lineWeightsMm.annotation,
  };
}

/** x of a moment. */
export function xOf(row: AnnotatedRow, timeS: number): number {
  return row.traceXMm + (timeS - row.fromS) * row.mmPerS;
}
