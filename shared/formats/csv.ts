import { leadNames, type LeadName } from '../parameters/sheet';
import { uvPerMv } from '../units';

/** What a CSV holds of a recording; every `StripRecording` is one. */
export interface SampledLeads {
  sampleRateHz: number;
  /** The quantiser's step; limb leads that are derived may lie on half of one. */
  resolutionUv: number;
  /** mV; all twelve equally long. */
  leads: Readonly<Record<LeadName, Float32Array>>;
}

/** First line of every strip CSV. */
export const csvHeader = ['time_s', ...leadNames].join(',');

/** Decimals beyond which a step is taken as rounded: a tenth of a nanovolt, or of a nanosecond. */
const mostDecimals = 7;

/** Fewest decimals that write a step exactly, at most 7. */
function decimalsOf(step: number): number {
  for (let decimals = 0; decimals < mostDecimals; decimals++) {
    const scaled = step * 10 ** decimals;
    if (Math.abs(scaled - Math.round(scaled)) < 1e-9) return decimals;
  }
  return mostDecimals;
}

/** Writes millivolts as whole half steps of the quantiser, free of the digits that Float32 adds. */
function halfStepWriter(resolutionUv: number): (valueMv: number) => string {
  const halfStepMv = resolutionUv / (2 * uvPerMv);
  const decimals = decimalsOf(halfStepMv);
  const written = new Map<number, string>();
  return (valueMv) => {
    const halfSteps = Math.round(valueMv / halfStepMv);
    let text = written.get(halfSteps);
    if (text === undefined) {
      text = Number.isNaN(halfSteps) ? '' : (halfSteps * halfStepMv).toFixed(decimals);
      written.set(halfSteps, text);
    }
    return text;
  };
}

/**
 * Rows [from, to) of a strip's CSV, each ended by a newline, for writers that stream. Time starts at 0 and is
 * written to as many decimals as the sampling interval needs.
 */
export function stripCsvRows(strip: SampledLeads, from: number, to: number): string {
  const voltage = halfStepWriter(strip.resolutionUv);
  const timeDecimals = decimalsOf(1 / strip.sampleRateHz);
  const columns = leadNames.map((lead) => strip.leads[lead]);
  let rows = '';
  for (let i = from; i < to; i++) {
    rows += (i / strip.sampleRateHz).toFixed(timeDecimals);
    for (const column of columns) rows += `,${voltage(column[i])}`;
    rows += '\n';
  }
  return rows;
}

/**
 * A strip as CSV: `time_s` and the twelve leads in mV, one row a sample from t = 0. Every value is written as
 * the whole number of half quantiser steps nearest to it, exactly (a step of a third of a microvolt is cut at
 * 1e-7 mV); a gap (NaN) is an empty field.
 */
export function stripToCsv(strip: SampledLeads): string {
  return `${csvHeader}\n${stripCsvRows(strip, 0, strip.leads.I.length)}`;
}
