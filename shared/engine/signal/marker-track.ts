import { measuredLeads } from '../leads';
import { createStimulusDetector } from '../recorder/stimulus-detector';
import type { ChannelSource } from './channel-source';

/** Stimulus markers along a stream; knows where samples lie in time, not what the signal is made of. */
export interface MarkerTrack {
  /** Looks at the next `length` samples of the channels at the internal rate. */
  look(channels: readonly Float64Array[], length: number): void;
  /** Takes every marker before a time, s, in order. */
  takeBefore(timeS: number): number[];
}

/** The detector over the eight measured leads, before the band-limit. */
export function createMarkerTrack(
  source: Pick<ChannelSource, 'toMeasured'>,
  rateHz: number,
  firstTimeS: number,
): MarkerTrack {
  const detector = createStimulusDetector(measuredLeads.length, rateHz, firstTimeS);
  let waiting: number[] = [];
  return {
    look(channels, length) {
      const measured = source.toMeasured(channels);
      const leads = measuredLeads.map((lead) => measured[lead]);
      waiting.push(...detector.process(leads, length));
    },
    takeBefore(timeS) {
      const taken = waiting.filter((one) => one < timeS);
      waiting = waiting.filter((one) => one >= timeS);
      return taken;
    },
  };
}
