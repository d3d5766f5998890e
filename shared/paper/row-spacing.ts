import { largeBoxMm, type PaperGainMmPerMv } from './paper-scale';
import type { RowProfile } from './row-profile';

/** Free paper between the ink of neighbouring rows, mm. */
export const clearanceMm = 2;
/** Rows are at least this far apart, mV: up to four rows, and more than four. */
const leastPitchMv = { few: 2.5, many: 1.5 };
const fewRows = 4;
/** Least distance between rows whatever the gain, mm. */
export const leastPitchMm = 15;
/** Beyond this, rows may cross, as on real paper; otherwise one tall spike would tear a sheet apart. */
const greatestPitchMv = 3.5;

/** Rounded up to whole large boxes. */
export function toLargeBoxes(lengthMm: number): number {
  return Math.ceil(lengthMm / largeBoxMm - 1e-9) * largeBoxMm;
}

/** Most distance between rows at a gain, mm. */
function greatestMm(gainMmPerMv: PaperGainMmPerMv): number {
  return Math.max(2 * leastPitchMm, greatestPitchMv * gainMmPerMv);
}

/** Distance between two rows that keeps their inks apart, within the limits, in whole large boxes. */
export function rowGapMm(row: RowProfile, next: RowProfile, gainMmPerMv: PaperGainMmPerMv): number {
  const neededMm = row.distanceToNextMm(next) + clearanceMm;
  return toLargeBoxes(Math.min(greatestMm(gainMmPerMv), Math.max(leastPitchMm, neededMm)));
}

/** Heights in whole large boxes, so that every 0 mV line lies on a heavy line. */
export interface RowSpacing {
  /** From the upper edge of the paper to the first 0 mV line, mm. */
  topMm: number;
  /** Between 0 mV lines, mm. */
  pitchMm: number;
  /** From the last 0 mV line to the lower edge, mm. */
  bottomMm: number;
}

/**
 * One even pitch for all rows of a sheet, wide enough that no row's ink touches the next one's, within
 * limits that grow with the gain. `rowsPerLine` decides whether the sheet counts as dense; `edgeMm` is the least room
 * above the first line and below the last, half the least pitch unless given.
 */
export function rowSpacing(
  profiles: readonly RowProfile[],
  rowsPerLine: number,
  gainMmPerMv: PaperGainMmPerMv,
  edgeMm?: number,
): RowSpacing {
  const leastMv = rowsPerLine <= fewRows ? leastPitchMv.few : leastPitchMv.many;
  const least = Math.max(leastPitchMm, leastMv * gainMmPerMv);
  const greatest = greatestMm(gainMmPerMv);
  const within = (neededMm: number, floorMm: number) =>
    toLargeBoxes(Math.min(greatest, Math.max(floorMm, neededMm)));
  const needed = profiles
    .slice(1)
    .reduce((most, profile, i) => Math.max(most, profiles[i].distanceToNextMm(profile)), 0);
  return {
    topMm: within(profiles[0].reachUpMm() + clearanceMm, edgeMm ?? least / 2),
    pitchMm: within(needed + clearanceMm, least),
    bottomMm: within(profiles[profiles.length - 1].reachDownMm() + clearanceMm, edgeMm ?? least / 2),
  };
}
