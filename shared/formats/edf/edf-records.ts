/** Seconds of a data record; EDF advises whole seconds. */
const usualRecordS = 1;
/** A record is not made shorter than this fraction of a second to avoid padding. */
const shortestRecordS = 0.1;

/** How the samples of a strip are cut into data records. */
export interface EdfRecords {
  /** Samples of a lead in a record. */
  samples: number;
  count: number;
  /** Samples of a lead added at the end to fill the last record. */
  padding: number;
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}

/**
 * Records of a second; of a shorter time, but at least 0.1 s, when the strip then comes out even; otherwise of a second
 * with the last one padded, because a continuous EDF+ file has whole records only.
 */
export function edfRecords(length: number, sampleRateHz: number): EdfRecords {
  const usual = usualRecordS * sampleRateHz;
  const common = greatestCommonDivisor(length, usual);
  const samples = common >= shortestRecordS * sampleRateHz ? common : usual;
  const count = Math.ceil(length / samples);
  return { samples, count, padding: count * samples - length };
}
