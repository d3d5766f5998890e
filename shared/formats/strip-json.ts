import type { StripRecording } from '../engine/render';
import { educationCaution, syntheticCaution } from '../paper/cautions';
import type { StripEvent } from '../engine/events';
import type { Reading } from '../engine/reading/reading';
import type { StripParameters } from '../parameters/strip-parameters';

/** Version of the file; it changes whenever a reader of the old one would go wrong. */
export const stripJsonVersion = 1;

/** A strip without its samples: what makes it, what happened in it and what is true of it. */
export interface StripJson {
  format: 'paceloom-strip-json';
  formatVersion: number;
  /** The cautions that stand on every sheet. */
  synthetic: string;
  use: string;
  engineVersion: string;
  /** What the samples would be: rate, quantiser's step, number a lead. */
  sampleRateHz: number;
  resolutionUv: number;
  samplesPerLead: number;
  delayRemovedMs: number;
  parameters: StripParameters;
  events: StripEvent[];
  reading: Reading;
}

/** The file's contents. `parameters` given back to the same engine make the same samples. */
export function stripJson(recording: StripRecording): StripJson {
  const { engineVersion, sampleRateHz, resolutionUv, delayRemovedMs, parameters, events, reading } =
    recording;
  return {
    format: 'paceloom-strip-json',
    formatVersion: stripJsonVersion,
    synthetic: syntheticCaution,
    use: educationCaution,
    engineVersion,
    sampleRateHz,
    resolutionUv,
    samplesPerLead: recording.leads.I.length,
    delayRemovedMs,
    parameters,
    events,
    reading,
  };
}
