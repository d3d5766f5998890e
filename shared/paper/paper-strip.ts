import type { StripEvent } from '../engine/events';
import { leadNames, type LeadName } from '../parameters/sheet';
import type { RecorderParameters } from '../parameters/strip-parameters';

/** What the paper needs to know of a recording; every `StripRecording` is one. */
export interface PaperStrip {
  sampleRateHz: number;
  /** mV; all twelve equally long, sample 0 at t = 0. NaN is a gap. */
  leads: Readonly<Record<LeadName, Float32Array>>;
  engineVersion: string;
  /** For the ladder; a sheet without one needs none. */
  events?: readonly StripEvent[];
  /** Where the recorder found a stimulus, s; null when it does not look for them. */
  stimulusMarkersS?: readonly number[] | null;
  parameters: {
    title: string;
    seed: number;
    recorder: Pick<RecorderParameters, 'bandwidth' | 'mainsNotchHz' | 'resolutionUv'>;
  };
}

/** Length of a recording in seconds: samples over rate. Throws RangeError when empty or uneven. */
export function stripDurationS(strip: PaperStrip): number {
  const lengths = leadNames.map((lead) => strip.leads[lead].length);
  if (lengths[0] === 0 || lengths.some((length) => length !== lengths[0])) {
    throw new RangeError(`Leads must be equally long and not empty; they have ${lengths.join(', ')} samples`);
  }
  return lengths[0] / strip.sampleRateHz;
}
