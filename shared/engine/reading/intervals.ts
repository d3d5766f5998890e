import { msPerS } from '../../units';
import type { StripEvent } from '../events';
import type { AtrialPartner, RawBeat } from './beats';
import { differences, mean } from './statistics';

/** Heart rate from the mean interval between onset times (s); null for fewer than two. */
export function rateBpm(timesS: readonly number[]): number | null {
  const interval = mean(differences(timesS));
  return interval === null ? null : 60 / interval;
}

/** Onset times of one chamber's depolarizations. */
export function onsetsS(events: readonly StripEvent[], chamber: 'atrium' | 'ventricle'): number[] {
  return events
    .filter((event) => event.type === 'depolarization' && event.chamber === chamber)
    .map((event) => event.timeS);
}

/**
 * P onset to the onset of a QRS that came through the AV node; null for any other beat, and in flutter and fibrillation,
 * which have no P wave to measure from.
 */
export function prIntervalMs(beat: RawBeat, partner: AtrialPartner): number | null {
  const event = beat.depolarization;
  const conducted = event?.sources.find((source) => source.site === 'conducted');
  if (!conducted || event?.conductedFromS === undefined) return null;
  const origin = partner.depolarization?.origin;
  if (origin === 'flutter' || origin === 'fibrillation') return null;
  return (conducted.timeS - event.conductedFromS) * msPerS;
}

/** Atrial stimulus, or the onset of a P wave that the device sensed, to the first ventricular stimulus. */
export function avIntervalMs(beat: RawBeat, partner: AtrialPartner): number | null {
  const ventricular = beat.stimuli[0];
  const atrial = partner.stimulus ?? (partner.depolarization?.sensed ? partner.depolarization : null);
  if (!ventricular || !atrial) return null;
  return (ventricular.timeS - atrial.timeS) * msPerS;
}

/** Left ventricular minus right ventricular stimulus time: positive when the right ventricle comes first. */
export function interventricularIntervalMs(beat: RawBeat): number | null {
  const right = beat.stimuli.find((stimulus) => stimulus.chamber === 'rightVentricle');
  const left = beat.stimuli.find((stimulus) => stimulus.chamber === 'leftVentricle');
  return right && left ? (left.timeS - right.timeS) * msPerS : null;
}

/** First ventricular stimulus that captured to the end of the QRS. */
export function stimulusToQrsEndMs(beat: RawBeat): number | null {
  const stimulus = beat.stimuli.find((one) => one.captured);
  if (!stimulus || !beat.complex || !beat.depolarization) return null;
  return (beat.depolarization.timeS - stimulus.timeS) * msPerS + beat.complex.qrsOffsetMs;
}

/**
 * QT corrected for rate by the Framingham formula, QT + 154 (1 − RR in s), ms
 * (Sagie et al. 1992, Am J Cardiol 70:797; formula from memory).
 */
export function framinghamQtcMs(qtMs: number, rrMs: number): number {
  return qtMs + 154 * (1 - rrMs / msPerS);
}
