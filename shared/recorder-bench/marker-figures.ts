import { compareMarkers, type MarkerFigures } from '../engine/recorder/stimulus-detector';
import { createStripStream, stripLength } from '../engine/render';
import type { StripParameters } from '../parameters/strip-parameters';

/** Muscle noise at which the marker is tried, mV: from none to more than anybody would accept. */
export const markerNoiseMv = [0, 0.05, 0.1, 0.2, 0.5] as const;

export interface MarkerRow extends MarkerFigures {
  muscleMv: number;
  /** Stimuli with a marker of their own, %; null without stimuli. */
  sensitivityPercent: number | null;
  /** Markers that are stimuli, %; null without markers. */
  positivePredictivePercent: number | null;
}

/** Markers of one strip against its stimuli, under muscle noise. */
export function markStrip(parameters: StripParameters, muscleMv: number): MarkerFigures {
  const stream = createStripStream({
    ...parameters,
    disturbance: { ...parameters.disturbance, muscleMv },
    recorder: { ...parameters.recorder, stimulusMarker: true },
  });
  const { events, stimulusMarkersS } = stream.next(stripLength(parameters));
  const givenS = events.flatMap((event) => (event.type === 'stimulus' ? [event.timeS] : []));
  return compareMarkers(stimulusMarkersS ?? [], givenS);
}

/** The sum over strips, with the two shares. */
export function markerRow(muscleMv: number, strips: readonly MarkerFigures[]): MarkerRow {
  const sum = (of: (one: MarkerFigures) => number): number => strips.reduce((all, one) => all + of(one), 0);
  const [given, hits, falseMarkers] = [
    sum((one) => one.given),
    sum((one) => one.hits),
    sum((one) => one.falseMarkers),
  ];
  return {
    muscleMv,
    given,
    hits,
    falseMarkers,
    sensitivityPercent: given === 0 ? null : (100 * hits) / given,
    positivePredictivePercent: hits + falseMarkers === 0 ? null : (100 * hits) / (hits + falseMarkers),
  };
}
