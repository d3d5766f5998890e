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

/**
 * The pulse with its rising edge at `xMm`, standing on the row's 0 mV line at `baselineMm`. A row drawn at two gains has
 * both: 1 mV at the first, then 1 mV at the second, half the width each.
 */
export function calibrationPulse(
  xMm: number,
  baselineMm: number,
  speedMmPerS: PaperSpeedMmPerS,
  ...gainsMmPerMv: PaperGainMmPerMv[]
): PolylineItem {
  const stepMm = calibrationWidthMm(speedMmPerS) / gainsMmPerMv.length;
  const right = xMm + calibrationWidthMm(speedMmPerS);
  const steps = gainsMmPerMv.flatMap((gainMmPerMv, i) => {
    const top = baselineMm - mvToMm(calibrationMv, gainMmPerMv);
    return [xMm + i * stepMm, top, xMm + (i + 1) * stepMm, top];
  });
  return {
    kind: 'polyline',
    role: 'calibration',
    pointsMm: Float64Array.of(
      ...[xMm - calibrationFootMm, baselineMm, xMm, baselineMm],
      ...steps,
      ...[right, baselineMm, right + calibrationFootMm, baselineMm],
    ),
    colour: 'ink',
    weightMm: lineWeightsMm.calibration,
  };
}
