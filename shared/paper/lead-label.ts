import { calibrationMv } from './calibration';
import type { TextItem } from './drawing';
import { mvToMm, type PaperGainMmPerMv } from './paper-scale';
import type { RowSegment } from './placed-segment';
import type { RowProfile } from './row-profile';
import { textItem, textWidthMm } from './text';
import { textStyles } from './text-styles';
import { capHeightEm } from './tokens';

/** From the start of the trace to the label, mm. */
const insetMm = 1;
/** Free paper around a label, mm. */
const clearanceMm = 1;
/** Lowest foot of a label above the 0 mV line, mm: out of the way of a P wave. */
const lowestMm = 4.5;
/** Labels stand no higher than this by themselves, mm, however tall the calibration pulse. */
const highestUsualMm = 10;
/** A label may rise by this much to get out of the way of a trace, mV and at least mm. */
const furthestUpMv = 0.6;
const furthestUpMm = 5;
/** A label may move right by this much, mm. */
const furthestRightMm = 10;
const stepMm = 0.5;
/** Moving right costs more than rising: a label belongs at the start of its trace. */
const costOfMovingRight = 2;
/** Between a lead's name and the time beside it, mm. */
const lineTimeGapMm = 1.5;

const capHeightMm = textStyles.leadName.size.sizeMm * capHeightEm;

/** Foot of a label above the line when nothing is in the way: capitals level with the calibration pulse. */
function usualFootMm(gainMmPerMv: PaperGainMmPerMv): number {
  const pulseTopMm = Math.min(highestUsualMm, mvToMm(calibrationMv, gainMmPerMv));
  return Math.max(lowestMm, pulseTopMm - capHeightMm);
}

interface Label {
  segment: RowSegment;
  /** `from 10 s` on the first label of a line that continues; else empty. */
  timeText: string;
  nameWidthMm: number;
  widthMm: number;
  xMm: number;
  footMm: number;
}

function labelOf(segment: RowSegment, footMm: number): Label {
  const goesOn = segment.line > 0 && segment.row === 0 && segment.column === 0;
  const timeText = goesOn ? `from ${Number(segment.fromS.toFixed(2))} s` : '';
  const nameWidthMm = textWidthMm(segment.label, textStyles.leadName);
  const timeWidthMm = goesOn ? lineTimeGapMm + textWidthMm(timeText, textStyles.lineTime) : 0;
  const widthMm = nameWidthMm + timeWidthMm;
  return { segment, timeText, nameWidthMm, widthMm, xMm: segment.xMm + insetMm, footMm };
}

/** The label at the cheapest place that the row's ink leaves free, else at the usual one. */
function clearOfInk(label: Label, profile: RowProfile, gainMmPerMv: PaperGainMmPerMv): Label {
  const furthestMm = Math.max(furthestUpMm, mvToMm(furthestUpMv, gainMmPerMv));
  const endMm = label.segment.xMm + label.segment.widthMm;
  let best = label;
  let leastCost = Infinity;
  for (let rightMm = 0; rightMm <= furthestRightMm; rightMm += stepMm) {
    const xMm = label.xMm + rightMm;
    if (rightMm > 0 && xMm + label.widthMm > endMm) break;
    const reachMm = profile.reachUpMm(xMm - clearanceMm, xMm + label.widthMm + clearanceMm);
    const upMm = Math.max(0, reachMm + clearanceMm - label.footMm);
    const cost = upMm + costOfMovingRight * rightMm;
    if (upMm <= furthestMm && cost < leastCost) {
      best = { ...label, xMm, footMm: label.footMm + upMm };
      leastCost = cost;
    }
  }
  return best;
}

function labelTexts({ segment, timeText, nameWidthMm, xMm }: Label, footMm: number): TextItem[] {
  const name = textItem(segment.label, textStyles.leadName, xMm, -footMm);
  if (timeText === '') return [name];
  return [name, textItem(timeText, textStyles.lineTime, xMm + nameWidthMm + lineTimeGapMm, -footMm)];
}

/** All at one level, but a label that would run into the one before it steps up over it. */
function steppedFeet(labels: readonly Label[], levelMm: number): number[] {
  const feet: number[] = [];
  labels.forEach(({ xMm }, i) => {
    const before = labels[i - 1];
    const free = !before || before.xMm + before.widthMm + clearanceMm <= xMm;
    feet.push(free ? levelMm : feet[i - 1] + capHeightMm + clearanceMm);
  });
  return feet;
}

/**
 * The names of a row's leads above the starts of their traces, all at one height clear of the row's ink, and on
 * the first row of a continued line the second at which it goes on. The labels are added to the row's profile,
 * so that the row above keeps clear of them. y is relative to the row's 0 mV line.
 */
export function leadLabels(segments: readonly RowSegment[], profile: RowProfile): TextItem[] {
  const labels = segments.map((segment) =>
    clearOfInk(labelOf(segment, usualFootMm(segment.gainMmPerMv)), profile, segment.gainMmPerMv),
  );
  const levelMm = Math.max(...labels.map((label) => label.footMm));
  const feet = steppedFeet(labels, levelMm);
  labels.forEach(({ xMm, widthMm }, i) => profile.add(xMm, xMm + widthMm, feet[i] + capHeightMm));
  return labels.flatMap((label, i) => labelTexts(label, feet[i]));
}
