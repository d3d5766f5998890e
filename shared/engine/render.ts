import { leadNames, type LeadName } from '../parameters/sheet';
import type { StripParameters } from '../parameters/strip-parameters';
import { reverseElectrodes } from './disturbance/electrode-reversal';
import { engineVersion } from './engine-version';
import type { StripEvent, VentricularDepolarization } from './events';
import { measuredLeads } from './leads';
import type { ComplexMeasures } from './reading/complex';
import { readStrip } from './reading/read-strip';
import type { Reading } from './reading/reading';
import { createBandLimiter } from './recorder/band-limiter';
import { quantiseLeads } from './recorder/quantiser';
import { designRecorder, type RecorderDesign } from './recorder/recorder-design';
import { createRhythm, preRollS } from './rhythm/rhythm';
import { createChannelSource, type MeasuredSamples } from './signal/channel-source';
import { createElectrodeSignal } from './signal/electrode-signal';
import { createEventQueue } from './signal/event-queue';
import { createMarkerTrack } from './signal/marker-track';
import type { SampleClock } from './signal/wave-painter';

export type { MeasuredSamples } from './signal/channel-source';

/** A finished strip: samples, truth and the parameters it was made from. */
export interface StripRecording {
  sampleRateHz: number;
  resolutionUv: number;
  /** Delay of the recorder's low-pass that was removed, so that trace and events stay aligned. */
  delayRemovedMs: number;
  /** durationS × sampleRateHz samples a lead, mV, quantised; sample k is at k / sampleRateHz s. */
  leads: Record<LeadName, Float32Array>;
  events: StripEvent[];
  /**
   * Where stimuli were found in the wide-band signal, s; null unless `recorder.stimulusMarker` is on. What truly was
   * given stands in `events`.
   */
  stimulusMarkersS: number[] | null;
  reading: Reading;
  parameters: StripParameters;
  engineVersion: string;
}

/** A stretch of a stream. */
export interface StripChunk {
  /** Number of the chunk's first sample. */
  firstSample: number;
  length: number;
  /** mV, before the quantiser. */
  measured: MeasuredSamples;
  /** Events with times inside the chunk. */
  events: StripEvent[];
  /** Markers found up to the chunk's end; null when they are off. */
  stimulusMarkersS: number[] | null;
  /** Measured complex of each ventricular depolarization among them. */
  complexes: Map<VentricularDepolarization, ComplexMeasures>;
}

/** A strip without an end; the size of the chunks changes no sample and no event. */
export interface StripStream {
  readonly sampleRateHz: number;
  readonly resolutionUv: number;
  readonly delayRemovedMs: number;
  /** The next `length` samples; `length` is a whole number of at least 1. */
  next(length: number): StripChunk;
}

/** Output samples computed at a time; keeps memory flat. */
const blockSamples = 500;
/** The high-pass settles on the pre-roll at this rate … */
const settleRateHz = 250;
/** … but for its last stretch at the full rate, which also settles low-pass and notch. */
const fullRatePreRollS = 1;

function emptyMeasured(length: number): MeasuredSamples {
  return Object.fromEntries(measuredLeads.map((lead) => [lead, new Float64Array(length)])) as MeasuredSamples;
}

/**
 * The whole pipeline as a stream: rhythm, heart, stimuli, disturbance, recorder.
 *
 * @param design the recorder that runs; the one that the parameters name unless the recorder bench tries another
 */
export function createStripStream(
  parameters: StripParameters,
  design: RecorderDesign = designRecorder(parameters.recorder),
): StripStream {
  const signal = createElectrodeSignal(parameters, createRhythm(parameters));
  const source = createChannelSource(parameters, signal, design.internalRateHz);
  const limiter = createBandLimiter(design, source.channelCount);
  const queue = createEventQueue();
  const clock: SampleClock = { rateHz: design.internalRateHz, firstTimeS: design.inputLeadS };
  const markers = parameters.recorder.stimulusMarker
    ? createMarkerTrack(source, design.internalRateHz, design.inputLeadS - fullRatePreRollS)
    : null;
  let nextSample = 0;

  const render = (on: SampleClock, first: number, length: number): Float64Array[] => {
    const { channels, ...rendered } = source.render(on, first, length);
    queue.add(rendered);
    return channels;
  };
  const settle = (): void => {
    const slow: SampleClock = { rateHz: settleRateHz, firstTimeS: design.inputLeadS };
    const slowLength = (preRollS - fullRatePreRollS) * settleRateHz;
    limiter.settle(render(slow, -preRollS * settleRateHz, slowLength), settleRateHz);
    const fullLength = fullRatePreRollS * design.internalRateHz;
    const channels = render(clock, -fullLength, fullLength);
    markers?.look(channels, fullLength);
    limiter.process(channels, fullLength);
    queue.takeBefore(0);
    markers?.takeBefore(0);
  };
  const nextBlock = (length: number): MeasuredSamples => {
    const inputs = length * design.decimation;
    const channels = render(clock, nextSample * design.decimation, inputs);
    nextSample += length;
    markers?.look(channels, inputs);
    const measured = source.toMeasured(limiter.process(channels, inputs));
    return reverseElectrodes(measured, parameters.disturbance.electrodeReversal);
  };

  settle();
  return {
    sampleRateHz: design.settings.sampleRateHz,
    resolutionUv: design.settings.resolutionUv,
    delayRemovedMs: design.delayRemovedMs,
    next(length) {
      const firstSample = nextSample;
      const measured = emptyMeasured(length);
      for (let done = 0; done < length; done += blockSamples) {
        const block = nextBlock(Math.min(blockSamples, length - done));
        for (const lead of measuredLeads) measured[lead].set(block[lead], done);
      }
      const endS = nextSample / design.settings.sampleRateHz;
      const stimulusMarkersS = markers?.takeBefore(endS) ?? null;
      return { firstSample, length, measured, stimulusMarkersS, ...queue.takeBefore(endS) };
    },
  };
}

/** Samples of a strip: whole samples that begin before its end. */
export function stripLength({
  durationS,
  recorder,
}: Pick<StripParameters, 'durationS' | 'recorder'>): number {
  return Math.round(durationS * recorder.sampleRateHz);
}

/** Seconds rendered at a time: what is not yet quantised of a long strip never takes much memory. */
const pieceS = 60;

/** A whole strip: the first `durationS` seconds of the stream, quantised and read. */
export function renderStrip(parameters: StripParameters): StripRecording {
  return renderLongStrip(parameters, () => undefined);
}

/** As `renderStrip`; `onProgress` is told the share that is rendered, from 0 to 1, after each minute of it. */
export function renderLongStrip(
  parameters: StripParameters,
  onProgress: (share: number) => void,
): StripRecording {
  const stream = createStripStream(parameters);
  const length = stripLength(parameters);
  const leads = Object.fromEntries(leadNames.map((lead) => [lead, new Float32Array(length)])) as Record<
    LeadName,
    Float32Array
  >;
  const events: StripEvent[] = [];
  const complexes = new Map<VentricularDepolarization, ComplexMeasures>();
  const markers: number[] = [];
  for (let done = 0; done < length;) {
    const chunk = stream.next(Math.min(pieceS * stream.sampleRateHz, length - done));
    const quantised = quantiseLeads(chunk.measured, stream.resolutionUv);
    for (const lead of leadNames) leads[lead].set(quantised[lead], done);
    events.push(...chunk.events);
    for (const [event, complex] of chunk.complexes) complexes.set(event, complex);
    markers.push(...(chunk.stimulusMarkersS ?? []));
    done += chunk.length;
    onProgress(done / length);
  }
  return {
    sampleRateHz: stream.sampleRateHz,
    resolutionUv: stream.resolutionUv,
    delayRemovedMs: stream.delayRemovedMs,
    leads,
    events,
    stimulusMarkersS: parameters.recorder.stimulusMarker ? markers : null,
    reading: readStrip(events, (event) => complexes.get(event) ?? null),
    parameters,
    engineVersion,
  };
}
