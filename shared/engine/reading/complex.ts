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
  /** Largest deflection between 40 and 400 ms after the QRS, signed, mV. */
  tMv: number;
}
