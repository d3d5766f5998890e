import type { PolylineItem } from './drawing';
import { msToMm, mvToMm, type PaperGainMmPerMv, type PaperSpeedMmPerS } from './paper-scale';
import { lineWeightsMm } from './tokens';

/** BW-75: a 1 mV step; its height is what a reader checks. */
export const calibrationMv = 1;
/** BW-75: 200 ms wide, by habit. */
export const calibrationMs = 200;

/** Length of the baseline drawn before and after the pulse, mm. */
export const calibrationFootMm = 1;

/** Width of the pulse on paper, mm: 5 at 25 mm/s. */
export function calibrationWidthMm(speedMmPerS: PaperSpeedMmPerS): number {
  return msToMm(calibrationMs, speedMmPerS);
}

/** The pulse with its rising edge at `xMm`, standing on the row's 0 mV line at `baselineMm`. */
export function calibrationPulse(
  xMm: number,
  baselineMm: number,
  speedMmPerS: PaperSpeedMmPerS,
  gainMmPerMv: PaperGainMmPerMv,
): PolylineItem {
  const right = xMm + calibrationWidthMm(speedMmPerS);
  const top = baselineMm - mvToMm(calibrationMv, gainMmPerMv);
  return {
    kind: 'polyline',
    role: 'calibration',
    pointsMm: Float64Array.of(
      ...[xMm - calibrationFootMm, baselineMm, xMm, baselineMm, xMm, top],
      ...[right, top, right, baselineMm, right + calibrationFootMm, baselineMm],
    ),
    colour: 'ink',
    weightMm: lineWeightsMm.calibration,
  };
}
