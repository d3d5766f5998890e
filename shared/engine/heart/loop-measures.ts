import { leadNames, type LeadName } from '../../parameters/sheet';
import { radToDeg } from '../../units';
import type { Activation } from './activation';
import { twelveLeadRows } from '../leads';
import type { VectorLoop } from './vector-loop';

/** Deflections of one lead, mV. */
export interface VentricularLeadMeasures {
  /** Largest positive value within the QRS, at least 0. */
  rMv: number;
  /** Largest negative value within the QRS, at most 0. */
  sMv: number;
  /** rMv + sMv. */
  netMv: number;
  /** Value at the QRS offset. */
  jMv: number;
  /** Value 20 ms after it. */
  stMv: number;
  /** Value of largest magnitude from 40 ms after the QRS offset on. */
  tMv: number;
  /** Largest negative value before the peak of R; absent when there is none. */
  qMv?: number;
}

/** What is measured on the heart vector of one ventricular complex; ms on the loop's clock unless a duration. */
export interface VentricularMeasures {
  qrsOnsetMs: number;
  qrsOffsetMs: number;
  qrsDurationMs: number;
  /** QRS offset after the clock's zero, where the stimulus is. */
  stimulusToQrsEndMs: number;
  tEndMs: number;
  /** From QRS onset to T end. */
  qtMs: number;
  /** −180 … 180. */
  frontalAxisDeg: number;
  leads: Record<LeadName, VentricularLeadMeasures>;
  activationStartMs: number;
  activationEndMs: number;
}

/** The QRS is where the vector of depolarization moves faster than this, mV/ms (own rule of the model). */
const qrsSpeedMvPerMs = 0.003;
/** … looked for from this long before the first to this long after the last activation, ms. */
const qrsLeadInMs = 20;
const qrsLeadOutMs = 25;
/** ST is read this long after the QRS offset, ms (engine contract). */
export const stDelayMs = 20;
/** T is looked for from here on after the QRS offset, ms. */
const tSearchDelayMs = 40;
/**
 * T ends where the spatial magnitude falls below this share of its peak: the threshold method of computerized QT
 * measurement, whose published shares are 5–15 % (from memory). Ours is chosen: it gives the QT table of the model
 * within 1 ms, and unlike a fixed slope it does not depend on the size of the complex.
 */
const tEndShare = 0.075;
/** Augmented leads are √3/2 of a bipolar lead for the same frontal vector (LD-09). */
const augmentedLeadGain = 2 / Math.sqrt(3);

type Samples = Pick<VectorLoop, 'startMs' | 'x' | 'y' | 'z'>;

/**
 * First and last sample of the QRS: |dH/dt| (central difference) above a threshold near activation, on the heart
 * vector of depolarization. On the whole vector the limits are the same within 1 ms while QT exceeds about 300 ms;
 * at shorter QT the slope of a beginning T would count as QRS.
 * A complex too small for the threshold gets the time of activation itself.
 */
export function measureQrs(
  { startMs, x, y, z }: Samples,
  activation: Pick<Activation, 'earliestMs' | 'latestMs'>,
): { onsetMs: number; offsetMs: number } {
  const first = Math.max(1, Math.ceil(activation.earliestMs - qrsLeadInMs) - startMs);
  const last = Math.min(x.length - 2, Math.floor(activation.latestMs + qrsLeadOutMs) - startMs);
  const moves = (j: number): boolean =>
    Math.hypot(x[j + 1] - x[j - 1], y[j + 1] - y[j - 1], z[j + 1] - z[j - 1]) / 2 > qrsSpeedMvPerMs;
  let onset = first;
  while (onset <= last && !moves(onset)) onset++;
  if (onset > last) {
    return { onsetMs: Math.floor(activation.earliestMs), offsetMs: Math.ceil(activation.latestMs) };
  }
  let offset = last;
  while (!moves(offset)) offset--;
  return { onsetMs: startMs + onset, offsetMs: startMs + offset };
}

/** End of T on the spatial magnitude of `repolarization`, interpolated between samples; its scale does not matter. */
export function measureTEnd({ startMs, x, y, z }: Samples, qrsOffsetMs: number): number {
  const magnitude = (j: number): number => Math.hypot(x[j], y[j], z[j]);
  const first = Math.max(0, qrsOffsetMs + tSearchDelayMs - startMs);
  let peak = 0;
  for (let j = first; j < x.length; j++) peak = Math.max(peak, magnitude(j));
  const threshold = tEndShare * peak;
  let j = x.length - 1;
  while (j > first && magnitude(j) <= threshold) j--;
  const above = magnitude(j);
  const below = j + 1 < x.length ? magnitude(j + 1) : 0;
  return startMs + j + (above > below ? (above - threshold) / (above - below) : 0);
}

function measureLead(
  lead: LeadName,
  { startMs, x, y, z }: Samples,
  onsetMs: number,
  offsetMs: number,
): VentricularLeadMeasures {
  const [cx, cy, cz] = twelveLeadRows[lead];
  const value = (j: number): number => cx * x[j] + cy * y[j] + cz * z[j];
  let rMv = 0;
  let sMv = 0;
  let lowest = 0;
  let qMv = 0;
  for (let j = onsetMs - startMs; j <= offsetMs - startMs; j++) {
    const v = value(j);
    lowest = Math.min(lowest, v);
    sMv = Math.min(sMv, v);
    if (v > rMv) {
      rMv = v;
      qMv = lowest;
    }
  }
  let tMv = 0;
  for (let j = offsetMs + tSearchDelayMs - startMs; j < x.length; j++) {
    const v = value(j);
    if (Math.abs(v) > Math.abs(tMv)) tMv = v;
  }
  const measures: VentricularLeadMeasures = {
    rMv,
    sMv,
    netMv: rMv + sMv,
    jMv: value(offsetMs - startMs),
    stMv: value(Math.min(x.length - 1, offsetMs + stDelayMs - startMs)),
    tMv,
  };
  return rMv > 0 && qMv < 0 ? { ...measures, qMv } : measures;
}

/** Frontal axis in degrees from net I and aVF, aVF scaled to a bipolar lead (LD-09). */
export function frontalAxisDeg(netIMv: number, netAvfMv: number): number {
  return radToDeg(Math.atan2(augmentedLeadGain * netAvfMv, netIMv));
}

/**
 * Measures one complex.
 *
 * @param tEndMs from {@link measureTEnd}, taken before T is scaled: a T made flat still ends when the heart has
 *   recovered
 */
export function measureLoop(
  loop: Samples,
  activation: Pick<Activation, 'earliestMs' | 'latestMs'>,
  qrs: { onsetMs: number; offsetMs: number },
  tEndMs: number,
): VentricularMeasures {
  const leads = Object.fromEntries(
    leadNames.map((lead) => [lead, measureLead(lead, loop, qrs.onsetMs, qrs.offsetMs)]),
  ) as Record<LeadName, VentricularLeadMeasures>;
  return {
    qrsOnsetMs: qrs.onsetMs,
    qrsOffsetMs: qrs.offsetMs,
    qrsDurationMs: qrs.offsetMs - qrs.onsetMs,
    stimulusToQrsEndMs: qrs.offsetMs,
    tEndMs,
    qtMs: tEndMs - qrs.onsetMs,
    frontalAxisDeg: frontalAxisDeg(leads.I.netMv, leads.aVF.netMv),
    leads,
    activationStartMs: activation.earliestMs,
    activationEndMs: activation.latestMs,
  };
}
