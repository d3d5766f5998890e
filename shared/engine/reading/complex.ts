import type { LeadName } from '../../parameters/sheet';

/** What is measured on the heart vector of one ventricular complex, times in ms from the complex's own onset event. */
export interface ComplexMeasures {
  qrsOnsetMs: number;
  qrsOffsetMs: number;
  tEndMs: number;
  frontalAxisDeg: number;
  leads: Readonly<Record<LeadName, LeadMeasures>>;
}

export interface LeadMeasures {
  /** Largest positive deflection plus largest negative one, mV. */
  netMv: number;
  /** Height of R (at least 0) and depth of S (at most 0), mV. */
  rMv: number;
  sMv: number;
  /** ST 20 ms after the end of the QRS, against the line before it, mV. */
  stMv: number;
  /** Largest deflection between 40 and 400 ms after the QRS, signed, mV. */
  tMv: number;
}
