import type { StripEvent, StimulusEvent, VentricularDepolarization } from '../engine/events';
import { limbLeadOfIAndII, type MeasuredLead } from '../engine/leads';
import { findBeats } from '../engine/reading/beats';
import type { ComplexMeasures } from '../engine/reading/complex';
import { createBandLimiter } from '../engine/recorder/band-limiter';
import { quantise } from '../engine/recorder/quantiser';
import { createStripStream, type MeasuredSamples } from '../engine/render';
import { addStimulusArtefact, stimulusLeadMv } from '../engine/stimulus/stimulus-artefact';
import { projectVector } from '../engine/leads';
import type { LeadName } from '../parameters/sheet';
import type { StripParameters } from '../parameters/strip-parameters';
import { msPerS } from '../units';
import { benchDesign, finish, samplesAhead, type BenchSetting } from './bench-setting';

/** One lead of a strip as a setting records it. */
export interface BenchTrace {
  sampleRateHz: number;
  /** mV, quantised; sample k lies at k / sampleRateHz s. */
  samplesMv: Float64Array;
  /** The same before the quantiser: figures are read here. */
  exactMv: Float64Array;
}

/** A beat as the bench needs it: where to measure. */
export interface BenchBeat {
  number: number;
  /** First of the ventricular stimuli and the QRS, s. */
  startS: number;
  /** null for a stimulus without a QRS. */
  qrsEndS: number | null;
  /** Stimuli of the ventricles, and of the atria in the 0.4 s before them. */
  stimuli: StimulusEvent[];
}

/** A strip through several settings. */
export interface StripOnBench {
  lead: LeadName;
  durationS: number;
  traces: BenchTrace[];
  /** What the stimuli alone leave in each trace, mV before the quantiser. */
  artefacts: BenchTrace[];
  beats: BenchBeat[];
  events: StripEvent[];
  stimulusMarkersS: number[];
}

function leadSamples(measured: MeasuredSamples, lead: LeadName): Float64Array {
  const limb = limbLeadOfIAndII[lead];
  if (!limb) return measured[lead as MeasuredLead];
  const [ofI, ofII] = limb;
  return measured.I.map((value, k) => ofI * value + ofII * measured.II[k]);
}

function traceOf(setting: BenchSetting, samples: Float64Array, length: number): BenchTrace {
  const { sampleRateHz, resolutionUv } = setting.recorder;
  const exactMv = finish(setting, samples).slice(0, length);
  return { sampleRateHz, exactMv, samplesMv: exactMv.map((value) => quantise(value, resolutionUv)) };
}

function lengthOf(setting: BenchSetting, durationS: number): number {
  return Math.round(durationS * setting.recorder.sampleRateHz);
}

interface Rendered {
  trace: BenchTrace;
  events: StripEvent[];
  complexes: Map<VentricularDepolarization, ComplexMeasures>;
  stimulusMarkersS: number[];
}

/** The strip through one setting; `marked` runs the stimulus detector as well. */
function renderThrough(
  parameters: StripParameters,
  setting: BenchSetting,
  lead: LeadName,
  marked: boolean,
): Rendered {
  const recorder = { ...setting.recorder, stimulusMarker: marked };
  const stream = createStripStream({ ...parameters, recorder }, benchDesign(setting));
  const length = lengthOf(setting, parameters.durationS);
  const chunk = stream.next(length);
  const ahead = samplesAhead(setting);
  const samples = leadSamples(chunk.measured, lead);
  const longer = new Float64Array(length + ahead);
  longer.set(samples);
  if (ahead > 0) longer.set(leadSamples(stream.next(ahead).measured, lead), length);
  return {
    trace: traceOf(setting, longer, length),
    events: chunk.events,
    complexes: chunk.complexes,
    stimulusMarkersS: chunk.stimulusMarkersS ?? [],
  };
}

/** One second before the strip, so that the low-pass is at rest. */
const settleS = 1;

/**
 * The stimuli alone through the same recorder. Because the recorder is linear this is exactly their share of the
 * trace, also where a spike lies on a QRS.
 */
function artefactThrough(
  stimuli: readonly StimulusEvent[],
  setting: BenchSetting,
  lead: LeadName,
  durationS: number,
): BenchTrace {
  const design = benchDesign(setting);
  const length = lengthOf(setting, durationS);
  const first = -settleS * design.internalRateHz;
  const count = (length + samplesAhead(setting)) * design.decimation - first;
  const vector = {
    x: new Float64Array(count),
    y: new Float64Array(count),
    z: new Float64Array(count),
  };
  const clock = { rateHz: design.internalRateHz, firstTimeS: design.inputLeadS };
  for (const stimulus of stimuli) addStimulusArtefact(vector, clock, first, count, stimulus);
  const input = vector.x.map((x, i) => projectVector(lead, x, vector.y[i], vector.z[i]));
  const [output] = createBandLimiter(design, 1).process([input], count);
  return traceOf(setting, output.subarray(settleS * setting.recorder.sampleRateHz), length);
}

/** Atrial stimuli that belong to a beat come at most this long before it, s (the longest AV delay is 350 ms). */
const atrialReachS = 0.4;

function benchBeats(
  events: readonly StripEvent[],
  complexes: Map<VentricularDepolarization, ComplexMeasures>,
): BenchBeat[] {
  const beats = findBeats(events, (event) => complexes.get(event) ?? null);
  return beats.map(({ timeS, complex, stimuli }, i): BenchBeat => {
    const onsetS = complex ? timeS + complex.qrsOnsetMs / msPerS : timeS;
    const startS = Math.min(onsetS, ...stimuli.map((stimulus) => stimulus.timeS));
    const sinceS = Math.max(startS - atrialReachS, beats[i - 1]?.timeS ?? -Infinity);
    const atrial = events.filter(
      (event): event is StimulusEvent =>
        event.type === 'stimulus' &&
        event.chamber === 'atrium' &&
        event.timeS > sinceS &&
        event.timeS <= startS,
    );
    return {
      number: i + 1,
      startS,
      qrsEndS: complex ? timeS + complex.qrsOffsetMs / msPerS : null,
      stimuli: [...atrial, ...stimuli],
    };
  });
}

/** Records one lead of a strip through every setting. */
export function stripOnBench(
  parameters: StripParameters,
  settings: readonly BenchSetting[],
  lead: LeadName,
): StripOnBench {
  const rendered = settings.map((setting, i) => renderThrough(parameters, setting, lead, i === 0));
  const [{ events, complexes, stimulusMarkersS }] = rendered;
  const stimuli = events.filter((event): event is StimulusEvent => event.type === 'stimulus');
  return {
    lead,
    durationS: parameters.durationS,
    traces: rendered.map(({ trace }) => trace),
    artefacts: settings.map((setting) => artefactThrough(stimuli, setting, lead, parameters.durationS)),
    beats: benchBeats(events, complexes),
    events,
    stimulusMarkersS,
  };
}

/** Height of a stimulus at the electrodes in a lead, mV. */
export function electrodeSpikeMv(stimulus: StimulusEvent, lead: LeadName): number {
  return stimulusLeadMv(stimulus, lead);
}
