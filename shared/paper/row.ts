import { calibrationMv, calibrationWidthMm } from './calibration';
import type { LineItem, PolylineItem, TextItem } from './drawing';
import { leadLabels } from './lead-label';
import { mvToMm, sToMm, type PaperSpeedMmPerS } from './paper-scale';
import type { PaperStrip } from './paper-strip';
import type { PlacedSegment, RowSegment } from './placed-segment';
import { RowProfile } from './row-profile';
import { lineWeightsMm } from './tokens';
import { sampleRange, tracePolylines, type TracePlacement } from './trace';

/** Half the height of the stroke at a lead change, mm, and its dashes. */
const leadChangeHalfMm = 4;
const leadChangeDashMm = [1, 0.75] as const;

/** One row of one line of paper: what lies on it and how far its ink reaches. */
export interface Row {
  line: number;
  segments: RowSegment[];
  profile: RowProfile;
  /** The same without the labels. */
  ink: RowProfile;
  /** Set relative to the row's 0 mV line. */
  labels: TextItem[];
}

/** How far the traces and the calibration pulse, which rises at `pulseXMm`, of a row reach. */
function inkProfile(
  strip: PaperStrip,
  speedMmPerS: PaperSpeedMmPerS,
  segments: readonly RowSegment[],
  pulseXMm: number,
  widthMm: number,
): RowProfile {
  const profile = new RowProfile(widthMm);
  const greatestGain = Math.max(...segments.map((segment) => segment.gainMmPerMv));
  profile.add(pulseXMm, pulseXMm + calibrationWidthMm(speedMmPerS), calibrationMv * greatestGain);
  for (const segment of segments) {
    const samples = strip.leads[segment.lead];
    const [from, to] = sampleRange(segment, strip.sampleRateHz, samples.length);
    const sign = segment.inverted ? -1 : 1;
    for (let i = from; i < to; i++) {
      const alongMm = sToMm(i / strip.sampleRateHz - segment.fromS, speedMmPerS);
      const xMm = segment.xMm + alongMm;
      profile.add(xMm, xMm, sign * mvToMm(samples[i], segment.gainMmPerMv));
    }
  }
  return profile;
}

/** A row with its names placed; `pulseXMm` is where its calibration pulse rises. */
export function layRow(
  strip: PaperStrip,
  speedMmPerS: PaperSpeedMmPerS,
  segments: RowSegment[],
  pulseXMm: number,
  widthMm: number,
): Row {
  const profile = inkProfile(strip, speedMmPerS, segments, pulseXMm, widthMm);
  const ink = profile.clipped(Infinity);
  const labels = leadLabels(segments, profile);
  return { line: segments[0].line, segments, profile, ink, labels };
}

/** The short dashed stroke where a row changes its lead. */
export function leadChangeStroke(segment: PlacedSegment): LineItem {
  return {
    kind: 'line',
    role: 'leadChange',
    x1Mm: segment.xMm,
    y1Mm: segment.baselineMm - leadChangeHalfMm,
    x2Mm: segment.xMm,
    y2Mm: segment.baselineMm + leadChangeHalfMm,
    colour: 'ink2',
    weightMm: lineWeightsMm.leadChange,
    dashMm: leadChangeDashMm,
  };
}

/** A segment's trace between the pen's stops, one polyline for each run without a gap. */
export function traceItems(
  strip: PaperStrip,
  speedMmPerS: PaperSpeedMmPerS,
  segment: PlacedSegment,
  stops: { topMm: number; bottomMm: number },
): PolylineItem[] {
  const place: TracePlacement = {
    sampleRateHz: strip.sampleRateHz,
    speedMmPerS,
    gainMmPerMv: segment.inverted ? -segment.gainMmPerMv : segment.gainMmPerMv,
    xMm: segment.xMm,
    baselineMm: segment.baselineMm,
    ...stops,
  };
  return tracePolylines(strip.leads[segment.lead], segment, place).map((pointsMm) => ({
    kind: 'polyline',
    role: 'trace',
    pointsMm,
    colour: 'ink',
    weightMm: lineWeightsMm.trace,
  }));
}

/** Names of the leads whose trace ran along a pen stop; `traces` belong to `segments` one to one. */
export function stoppedLeads(
  segments: readonly PlacedSegment[],
  traces: readonly (readonly PolylineItem[])[],
  stops: { topMm: number; bottomMm: number },
): string[] {
  const atStop = (mm: number, i: number) => i % 2 === 1 && (mm <= stops.topMm || mm >= stops.bottomMm);
  const stopped = segments.filter((_, i) => traces[i].some(({ pointsMm }) => pointsMm.some(atStop)));
  return [...new Set(stopped.map((segment) => segment.label))];
}
