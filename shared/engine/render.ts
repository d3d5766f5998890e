import { leadNames, type LeadName } from '../parameters/sheet';
import type { StripParameters } from '../parameters/strip-parameters';
import { createDisturbance } from './disturbance/disturbance';
import { engineVersion } from './engine-version';
import type { StripEvent, VentricularDepolarization } from './events';
import { dowerMatrix, measuredLeads, type MeasuredLead } from './leads';
import type { ComplexMeasures } from './reading/complex';
import { readStrip } from './reading/read-strip';
import type { Reading } from './reading/reading';
import { createBandLimiter } from './recorder/band-limiter';
import { quantiseLeads } from './recorder/quantiser';
import { designRecorder, internalRateHz, type RecorderDesign } from './recorder/recorder-design';
import { createRhythm, preRollS } from './rhythm/rhythm';
import { createElectrodeSignal } from './signal/electrode-signal';
import type { VectorWindow } from './signal/wave-painter';

/** A finished strip: samples, truth and the parameters it was made from. */
export interface StripRecording {
  sampleRateHz: number;
  resolutionUv: number;
  /** Delay of the recorder's low-pass that was removed, so that trace and events stay aligned. */
  delayRemovedMs: number;
  /** durationS × sampleRateHz samples a lead, mV, quantised; sample k is at k / sampleRateHz s. */
  leads: Record<LeadName, Float32Array>;
  events: StripEvent[];
  reading: Reading;
  parameters: StripParameters;
  engineVersion: string;
}

/** The eight measured leads in doubles, mV, before the quantiser. */
export type MeasuredSamples = Record<MeasuredLead, Float64Array>;

export interface StripChunk {
  /** Number of the chunk's first sample. */
  firstSample: number;
  length: number;
  /** Before the quantiser. */
  measured: MeasuredSamples;
  /** Events with times inside the chunk. */
  events: StripEvent[];
  complexes: Map<VentricularDepolarization, ComplexMeasures>;
}

/** A strip without an end: the same samples whatever the chunks. */
export interface StripStream {
  readonly sampleRateHz: number;
  readonly delayRemovedMs: number;
  /** The next `length` samples. */
  next(length: number): StripChunk;
}

/** Output samples computed at a time; keeps memory flat. */
const blockSamples = 1000;
/** The high-pass settles on the pre-roll at this rate … */
const settleRateHz = 250;
/** … but for its last stretch, which also settles low-pass and notch at the full rate. */
const fullRatePreRollS = 1;

function vectorWindow(length: number): VectorWindow {
  return { x: new Float64Array(length), y: new Float64Array(length), z: new Float64Array(length) };
}

/** Dower projection of a heart vector onto the eight measured leads. */
function project(vector: VectorWindow, length: number): MeasuredSamples {
  const entries = measuredLeads.map((lead) => {
    const [wx, wy, wz] = dowerMatrix[lead];
    const samples = new Float64Array(length);
    for (let i = 0; i < length; i++) samples[i] = wx * vector.x[i] + wy * vector.y[i] + wz * vector.z[i];
    return [lead, samples];
  });
  return Object.fromEntries(entries) as MeasuredSamples;
}

/**
 * The whole pipeline as a stream: rhythm, heart, stimuli, disturbance, recorder.
 *
 * The recorder is linear, so an undisturbed strip is band-limited as the three components of the heart vector
 * and projected to leads afterwards; disturbance enters at the electrodes, and then the eight leads are
 * band-limited. Both are the same sums in another order.
 */
export function createStripStream(parameters: StripParameters): StripStream {
  const design = designRecorder(parameters.recorder);
  const rhythm = createRhythm(parameters);
  const signal = createElectrodeSignal(parameters, rhythm);
  const source = createChannelSource(parameters, design, signal);
  const limiter = createBandLimiter(design, source.channelCount);
  const pending: StripEvent[] = [];
  const complexes = new Map<VentricularDepolarization, ComplexMeasures>();
  let nextSample = 0;

  const take = (rendered: {
    events: StripEvent[];
    complexes: Map<VentricularDepolarization, ComplexMeasures>;
  }) => {
    pending.push(...rendered.events);
    for (const [event, complex] of rendered.complexes) complexes.set(event, complex);
  };

  settle();

  function settle(): void {
    const low = source.renderPreRoll(take);
    limiter.settle(low.channels, settleRateHz);
    const firstInternal = -fullRatePreRollS * internalRateHz;
    limiter.process(source.render(firstInternal, -firstInternal, take), -firstInternal);
    dropBefore(0);
  }

  function dropBefore(timeS: number): void {
    const dropped = pending.findIndex((event) => event.timeS >= timeS);
    for (const event of pending.splice(0, dropped === -1 ? pending.length : dropped)) {
      if (event.type === 'depolarization' && event.chamber === 'ventricle') complexes.delete(event);
    }
  }

  function releaseBefore(timeS: number): Pick<StripChunk, 'events' | 'complexes'> {
    const end = pending.findIndex((event) => event.timeS >= timeS);
    const events = pending.splice(0, end === -1 ? pending.length : end);
    const released = new Map<VentricularDepolarization, ComplexMeasures>();
    for (const event of events) {
      if (event.type !== 'depolarization' || event.chamber !== 'ventricle') continue;
      const complex = complexes.get(event);
      if (complex) released.set(event, complex);
      complexes.delete(event);
    }
    return { events, complexes: released };
  }

  function nextBlock(length: number): MeasuredSamples {
    const first = nextSample * design.decimation;
    const outputs = limiter.process(
      source.render(first, length * design.decimation, take),
      length * design.decimation,
    );
    nextSample += length;
    return source.toMeasured(outputs, length);
  }

  return {
    sampleRateHz: design.settings.sampleRateHz,
    delayRemovedMs: design.delayRemovedMs,
    next(length) {
      const firstSample = nextSample;
      const measured = Object.fromEntries(
        measuredLeads.map((lead) => [lead, new Float64Array(length)]),
      ) as MeasuredSamples;
      for (let done = 0; done < length; done += blockSamples) {
        const block = nextBlock(Math.min(blockSamples, length - done));
        for (const lead of measuredLeads) measured[lead].set(block[lead], done);
      }
      const endS = nextSample / design.settings.sampleRateHz;
      return { firstSample, length, measured, ...releaseBefore(endS) };
    },
  };
}
