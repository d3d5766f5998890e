import { msPerMinute, msPerS } from '../units';

/**
 * Conversions between time, voltage, rate and the millimetres of the paper. The chart conventions behind
 * them (25 and 50 mm/s, 5, 10 and 20 mm/mV, 1 mm and 5 mm lines) are BW-70 to BW-74: common practice.
 */

export type PaperSpeedMmPerS = 25 | 50;
export type PaperGainMmPerMv = 5 | 10 | 20;

/** Pitch of the fine lines, mm. */
export const smallBoxMm = 1;
/** Pitch of the heavy lines, mm. */
export const largeBoxMm = 5;

export const mmPerInch = 25.4;
/** CSS defines its pixel as 1/96 inch (CSS Values and Units Level 3, section 5.2). */
export const cssPxPerInch = 96;

/** Millimetres of paper that pass in `timeS` seconds. */
export function sToMm(timeS: number, speedMmPerS: PaperSpeedMmPerS): number {
  return timeS * speedMmPerS;
}

/** Millimetres of paper that pass in `timeMs` milliseconds. */
export function msToMm(timeMs: number, speedMmPerS: PaperSpeedMmPerS): number {
  return (timeMs * speedMmPerS) / msPerS;
}

/** Milliseconds that a distance along the paper stands for. */
export function mmToMs(lengthMm: number, speedMmPerS: PaperSpeedMmPerS): number {
  return (lengthMm * msPerS) / speedMmPerS;
}

/** Height on paper of a voltage; positive is up, so subtract it from a y coordinate. */
export function mvToMm(voltageMv: number, gainMmPerMv: PaperGainMmPerMv): number {
  return voltageMv * gainMmPerMv;
}

/** Voltage that a height on paper stands for. */
export function mmToMv(heightMm: number, gainMmPerMv: PaperGainMmPerMv): number {
  return heightMm / gainMmPerMv;
}

/** Large boxes (5 mm) in a distance. */
export function mmToLargeBoxes(lengthMm: number): number {
  return lengthMm / largeBoxMm;
}

/** Events per minute that come `lengthMm` apart: 1500/mm at 25 mm/s. */
export function mmToRatePerMinute(lengthMm: number, speedMmPerS: PaperSpeedMmPerS): number {
  return msPerMinute / mmToMs(lengthMm, speedMmPerS);
}

/** Device pixels of a length at `dpi` dots per inch. */
export function mmToPx(lengthMm: number, dpi: number): number {
  return (lengthMm * dpi) / mmPerInch;
}

/** Length of a number of device pixels at `dpi` dots per inch. */
export function pxToMm(lengthPx: number, dpi: number): number {
  return (lengthPx * mmPerInch) / dpi;
}

/** Millimetres of a CSS pixel length on paper. */
export function cssPxToMm(lengthPx: number): number {
  return pxToMm(lengthPx, cssPxPerInch);
}
