import { msPerS } from '../../units';
import type { AtrialOrigin, CaptureFailure, StimulusChamber } from '../events';
import {
  beatCaptured,
  beatOrigin,
  captureFailures,
  type AtrialPartner,
  type BeatOrigin,
  type RawBeat,
} from './beats';
import {
  avIntervalMs,
  framinghamQtcMs,
  interventricularIntervalMs,
  prIntervalMs,
  stimulusToQrsEndMs,
} from './intervals';
import { rounded } from './statistics';

/** What is true of one beat. Times in ms unless said; null where it does not apply. */
export interface BeatReading {
  /** From 1. */
  number: number;
  timeS: number;
  origin: BeatOrigin;
  /** Ventricular chambers stimulated. */
  stimuli: StimulusChamber[];
  /** When each was given, in the same order. */
  stimulusTimesS: number[];
  /** Whether a ventricular stimulus captured; null without one. */
  captured: boolean | null;
  /** Why stimuli that captured nothing did not. */
  reasons: CaptureFailure[];
  fusion: boolean;
  pseudofusion: boolean;
  /** What the atria did before this beat. */
  atrialOrigin: AtrialOrigin | null;
  /** Whether the atrial stimulus before this beat captured; null without one. */
  atrialCaptured: boolean | null;
  /** Whether the device heard this beat; null when it did not have to. */
  sensed: boolean | null;
  /** Interval from the previous ventricular depolarization. */
  rrMs: number | null;
  prIntervalMs: number | null;
  avIntervalMs: number | null;
  interventricularIntervalMs: number | null;
  qrsDurationMs: number | null;
  stimulusToQrsEndMs: number | null;
  qtMs: number | null;
  qtcMs: number | null;
  frontalAxisDeg: number | null;
}

/** Reads one beat; `previousOnsetS` is the last ventricular depolarization before it. */
export function readBeat(
  beat: RawBeat,
  partner: AtrialPartner,
  number: number,
  previousOnsetS: number | null,
): BeatReading {
  const { complex, depolarization } = beat;
  const rrMs =
    depolarization && previousOnsetS !== null ? (depolarization.timeS - previousOnsetS) * msPerS : null;
  const qtMs = complex ? complex.tEndMs - complex.qrsOnsetMs : null;
  return {
    number,
    timeS: beat.timeS,
    origin: beatOrigin(beat),
    stimuli: beat.stimuli.map((stimulus) => stimulus.chamber),
    stimulusTimesS: beat.stimuli.map((stimulus) => stimulus.timeS),
    captured: beatCaptured(beat),
    reasons: captureFailures(beat),
    fusion: depolarization?.fusion ?? false,
    pseudofusion: beat.stimuli.some((stimulus) => stimulus.pseudofusion === true),
    atrialOrigin: partner.depolarization?.origin ?? null,
    atrialCaptured: partner.stimulus?.captured ?? null,
    sensed: depolarization?.sensed ?? null,
    rrMs: rounded(rrMs, 1),
    prIntervalMs: rounded(prIntervalMs(beat, partner), 1),
    avIntervalMs: rounded(avIntervalMs(beat, partner), 1),
    interventricularIntervalMs: rounded(interventricularIntervalMs(beat), 1),
    qrsDurationMs: rounded(complex ? complex.qrsOffsetMs - complex.qrsOnsetMs : null, 1),
    stimulusToQrsEndMs: rounded(stimulusToQrsEndMs(beat), 1),
    qtMs: rounded(qtMs, 1),
    qtcMs: rounded(qtMs !== null && rrMs !== null ? framinghamQtcMs(qtMs, rrMs) : null, 1),
    frontalAxisDeg: rounded(complex ? complex.frontalAxisDeg : null, 1),
  };
}
