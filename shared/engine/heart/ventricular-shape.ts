import type { Injury } from './injury';

/** What a strip may change of the ventricular complex without moving its sources. */
export interface VentricularShape {
  /** Multiplies every action potential duration; recovery slopes stretch with its square root. 0.2 … 2.2. */
  rateFactor: number;
  /** Wanted QRS duration, ms; null leaves conduction as fitted. */
  qrsDurationMs: number | null;
  /** Multiplies the whole complex. */
  qrsScale: number;
  /** Turns the heart vector in the frontal plane, degrees; positive is clockwise, to the right. */
  axisRotationDeg: number;
  /** Multiplies repolarization only. */
  tScale: number;
  /** null: healthy. */
  injury: Injury | null;
}

/** The model as fitted. */
export const nativeShape: VentricularShape = {
  rateFactor: 1,
  qrsDurationMs: null,
  qrsScale: 1,
  axisRotationDeg: 0,
  tScale: 1,
  injury: null,
};
