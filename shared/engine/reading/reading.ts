import type { LeadName } from '../../parameters/sheet';
import type { StimulusChamber } from '../events';
import type { BeatReading } from './beat-reading';
import type { BeatOrigin } from './beats';
import type { CaptureByChamber } from './capture';
import type { BasicMode } from '../../parameters/pacing-mode';
import type { Criterion } from './criteria';
import type { QrsTRelation } from './qrs-t-relation';
import type { SensingByChamber } from './sensing';

/** A sentence an educator would sign, with the beats it speaks of. */
export interface Finding {
  id: string;
  text: string;
  /** Beat numbers; every beat when the sentence speaks of the whole strip. */
  beats: number[];
}

/**
 * What is true of a strip, derived from its events and the noise-free heart vector; never typed in.
 * Figures of a complex (QRS, QT, axis, QRS–T relation) are those of the commonest kind of beat,
 * `dominantOrigin`. null: absent, or cannot be assessed.
 */
export interface Reading {
  /** Chambers that are stimulated, whether or not they are captured. */
  pacedChambers: StimulusChamber[];
  capture: CaptureByChamber;
  sensing: SensingByChamber;
  atrialRateBpm: number | null;
  ventricularRateBpm: number | null;
  /**
   * Share of depolarizations that a stimulus started or joined: of the ventricles when they are stimulated,
   * otherwise of the atria. 0 without stimuli.
   */
  pacedSharePercent: number;
  prIntervalMs: number | null;
  avIntervalMs: number | null;
  dominantOrigin: Exclude<BeatOrigin, 'none'> | null;
  qrsDurationMs: number | null;
  stimulusToQrsEndMs: number | null;
  qtMs: number | null;
  qtcMs: number | null;
  interventricularIntervalMs: number | null;
  frontalAxisDeg: number | null;
  qrsTRelation: Record<LeadName, QrsTRelation | null> | null;
  /** The rhythm under the pacing in words, as far as it shows. */
  underlyingRhythm: string | null;
  /** Modes that could have made this strip. */
  consistentModes: BasicMode[];
  /** Criteria of acute injury, each with its figure and limit; null without a complex. */
  criteria: Criterion[] | null;
  beats: BeatReading[];
  findings: Finding[];
}

/** A reading before its sentences are written. */
export type ReadingFigures = Omit<Reading, 'findings'>;
