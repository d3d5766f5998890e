import type { StimulusChamber } from '../engine/events';
import type { BenchBeat, BenchTrace, StripOnBench } from './strip-traces';
import { electrodeSpikeMv } from './strip-traces';

/** What one setting makes of one beat; mV, null where there is nothing to measure. */
export interface BeatMeasures {
  /** The largest spike of the beat as it stands in the trace, signed. */
  spikeMv: number | null;
  /** Its share of the height at the electrodes, %. */
  spikePercent: number | null;
  /** Level 80 ms after the QRS, against the line before the beat. */
  stMv: number | null;
  /** Largest deflection between 80 and 400 ms after the QRS, against the line before the beat, signed. */
  tMv: number | null;
}

/** A beat and what every setting makes of it. */
export interface MeasuredBeat {
  number: number;
  startS: number;
  /** The largest stimulus of the beat at the electrodes; null without one. */
  spike: { timeS: number; chamber: StimulusChamber; electrodesMv: number } | null;
  /** Where ST is read, s. */
  stAtS: number | null;
  bySetting: BeatMeasures[];
}

/** ST is read this long after the end of the QRS, s (the distance of the classic exercise reading, from memory). */
const stAfterS = 0.08;
const tUntilS = 0.4;
/** The line before the beat: a band-limit of 10 Hz and more spreads no spike into it. */
const lineFromS = -0.036;
const lineToS = -0.016;
/** A spike is looked for around its stimulus: low-passes lead and trail by up to their own delay. */
const spikeFromS = -0.014;
const spikeToS = 0.03;

function mean(samples: Float64Array): number {
  return samples.reduce((sum, value) => sum + value, 0) / samples.length;
}

function span({ exactMv, sampleRateHz }: BenchTrace, fromS: number, toS: number): Float64Array {
  const from = Math.max(0, Math.round(fromS * sampleRateHz));
  return exactMv.subarray(from, Math.max(from + 1, Math.round(toS * sampleRateHz)));
}

function farthest(samples: Float64Array, from: number): number {
  return samples.reduce((most, value) => (Math.abs(value - from) > Math.abs(most) ? value - from : most), 0);
}

/** Height of a spike in the stimuli's own share of the trace, signed. */
function spikeHeight(artefact: BenchTrace, timeS: number): number {
  const line = span(artefact, timeS + spikeFromS - 0.006, timeS + spikeFromS);
  return farthest(span(artefact, timeS + spikeFromS, timeS + spikeToS), mean(line));
}

function measureBeat(
  trace: BenchTrace,
  artefact: BenchTrace,
  beat: BenchBeat,
  nextStartS: number,
  spike: MeasuredBeat['spike'],
): BeatMeasures {
  const spikeMv = spike ? spikeHeight(artefact, spike.timeS) : null;
  const spikePercent =
    spike && spikeMv !== null && spike.electrodesMv !== 0 ? (100 * spikeMv) / spike.electrodesMv : null;
  const endS = trace.exactMv.length / trace.sampleRateHz;
  const stAtS = beat.qrsEndS === null ? Infinity : beat.qrsEndS + stAfterS;
  const lineS = beat.startS + lineFromS;
  if (lineS < 0 || stAtS >= Math.min(endS, nextStartS - 0.02)) {
    return { spikeMv, spikePercent, stMv: null, tMv: null };
  }
  const line = mean(span(trace, lineS, beat.startS + lineToS));
  const tEndS = Math.min(stAtS - stAfterS + tUntilS, nextStartS - 0.02, endS);
  return {
    spikeMv,
    spikePercent,
    stMv: span(trace, stAtS, stAtS)[0] - line,
    tMv: farthest(span(trace, stAtS, tEndS), line),
  };
}

/** Every beat of a strip on the bench, measured in every trace. */
export function measureBeats(strip: StripOnBench): MeasuredBeat[] {
  return strip.beats.map((beat, i): MeasuredBeat => {
    const nextStartS = strip.beats[i + 1]?.startS ?? Infinity;
    const spike = beat.stimuli
      .map(({ timeS, chamber, ...rest }) => ({
        timeS,
        chamber,
        electrodesMv: electrodeSpikeMv({ timeS, chamber, ...rest }, strip.lead),
      }))
      .reduce<MeasuredBeat['spike']>(
        (most, one) => (!most || Math.abs(one.electrodesMv) > Math.abs(most.electrodesMv) ? one : most),
        null,
      );
    return {
      number: beat.number,
      startS: beat.startS,
      spike,
      stAtS: beat.qrsEndS === null ? null : beat.qrsEndS + stAfterS,
      bySetting: strip.traces.map((trace, at) =>
        measureBeat(trace, strip.artefacts[at], beat, nextStartS, spike),
      ),
    };
  });
}

/** Beats with everything measured in every trace. */
export function wholeBeats(beats: readonly MeasuredBeat[]): MeasuredBeat[] {
  return beats.filter(({ bySetting }) => bySetting.every(({ stMv }) => stMv !== null));
}

/** The beat that stands for the strip: the second whole one, clear of the left edge; null without beats. */
export function usualBeat(beats: readonly MeasuredBeat[]): MeasuredBeat | null {
  const whole = wholeBeats(beats);
  return whole.at(1) ?? whole.at(0) ?? beats.at(0) ?? null;
}
