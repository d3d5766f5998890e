import type { StripEvent, StimulusEvent, VentricularDepolarization } from '../engine/events';
import type { StripRecording } from '../engine/render';
import { median } from '../engine/reading/statistics';
import type { LeadName } from '../parameters/sheet';
import type { Measure, PresetCriterion } from './criterion';

/** Window of a beat on the samples, s after its onset event: ends before T of the next. */
interface Complex {
  onsetS: number;
  endS: number;
  event: VentricularDepolarization;
}

const medianOf = (values: readonly number[]): number | null => median(values);
const differencesMs = (times: readonly number[]): number[] =>
  times.slice(1).map((time, i) => 1000 * (time - times[i]));

const stimuliOf = (events: readonly StripEvent[]): StimulusEvent[] =>
  events.filter((event): event is StimulusEvent => event.type === 'stimulus');

/** Complexes of the commonest kind of beat, far enough from the strip's ends and from each other to be measured. */
function complexesOf({ events, reading, parameters }: StripRecording): Complex[] {
  const beats = reading.beats.filter(
    (beat) => beat.origin === reading.dominantOrigin && !beat.fusion && beat.qrsDurationMs !== null,
  );
  return beats.flatMap((beat) => {
    const event = events.find(
      (one): one is VentricularDepolarization =>
        one.type === 'depolarization' && one.chamber === 'ventricle' && one.timeS === beat.timeS,
    );
    const endS = beat.timeS + (beat.stimulusToQrsEndMs ?? beat.qrsDurationMs ?? 0) / 1000;
    return event && beat.timeS > 0.3 && endS + 0.5 < parameters.durationS
      ? [{ onsetS: beat.timeS, endS, event }]
      : [];
  });
}

/** Samples of a lead from one time to another, less the line just before the complex (and its stimulus). */
function samplesOf(
  recording: StripRecording,
  lead: LeadName,
  fromS: number,
  toS: number,
  zeroS: number,
): number[] {
  const { leads, sampleRateHz } = recording;
  const at = (timeS: number): number => Math.round(timeS * sampleRateHz);
  const before = leads[lead].subarray(Math.max(0, at(zeroS - 0.02)), Math.max(1, at(zeroS - 0.008)));
  const zero = before.reduce((sum, value) => sum + value, 0) / before.length;
  return [...leads[lead].subarray(at(fromS), at(toS))].map((value) => value - zero);
}

/** A spike and what the recorder makes of it are left out of the QRS, s. */
const spikeS = 0.012;

function qrsSamples(recording: StripRecording, lead: LeadName, { onsetS, endS, event }: Complex): number[] {
  const paced = event.sources.some((source) => source.site.endsWith('Ventricle') || source.site === 'chest');
  return samplesOf(recording, lead, onsetS + (paced ? spikeS : -0.01), endS + 0.01, onsetS - 0.01);
}

function leadMeasure(recording: StripRecording, kind: string, lead: LeadName): number | null {
  const values = complexesOf(recording).map((complex): number => {
    const qrs = qrsSamples(recording, lead, complex);
    const r = Math.max(0, ...qrs);
    const s = Math.min(0, ...qrs);
    if (kind === 'r') return r;
    if (kind === 's') return s;
    if (kind === 'net') return r + s;
    const zeroS = complex.onsetS - 0.01;
    if (kind === 'st')
      return samplesOf(recording, lead, complex.endS + 0.018, complex.endS + 0.024, zeroS)[0];
    const t = samplesOf(recording, lead, complex.endS + 0.06, complex.endS + 0.36, zeroS);
    return t.reduce((most, value) => (Math.abs(value) > Math.abs(most) ? value : most), 0);
  });
  return medianOf(values);
}

/** Height of ventricular spikes on the samples, peak to peak within 4 ms, over the slope of what lies beneath. */
function spikeMv({ leads, sampleRateHz, events, parameters }: StripRecording, lead: LeadName): number | null {
  const stimuli = stimuliOf(events).filter(
    ({ chamber, timeS }) => chamber !== 'atrium' && timeS > 0.2 && timeS < parameters.durationS - 0.2,
  );
  return medianOf(
    stimuli.map(({ timeS }) => {
      const around = leads[lead].subarray(
        Math.round((timeS - 0.004) * sampleRateHz),
        Math.round((timeS + 0.006) * sampleRateHz),
      );
      return Math.max(...around) - Math.min(...around);
    }),
  );
}

/** Amplitude of a lead's content between 45 and 55 Hz, by correlation at 50 Hz over the strip, mV. */
function mainsMv({ leads, sampleRateHz }: StripRecording): number {
  const samples = leads.II;
  let re = 0;
  let im = 0;
  samples.forEach((value, i) => {
    const phase = (2 * Math.PI * 50 * i) / sampleRateHz;
    re += value * Math.cos(phase);
    im += value * Math.sin(phase);
  });
  return (2 * Math.hypot(re, im)) / samples.length;
}

/** Range of the means of lead II over half seconds, mV. */
function wanderMv({ leads, sampleRateHz }: StripRecording): number {
  const size = sampleRateHz;
  const means: number[] = [];
  for (let from = 0; from + size <= leads.II.length; from += size / 2) {
    means.push(leads.II.subarray(from, from + size).reduce((sum, value) => sum + value, 0) / size);
  }
  return Math.max(...means) - Math.min(...means);
}

function stimulusMeasure({ events }: StripRecording, kind: string, chamber: string): number | null {
  const stimuli = stimuliOf(events).filter((stimulus) => stimulus.chamber === chamber);
  if (kind === 'stimuli') return stimuli.length;
  const judged = stimuli.filter((stimulus) => stimulus.reason !== 'refractoryTissue');
  return judged.length === 0 ? null : judged.filter((stimulus) => stimulus.captured).length / judged.length;
}

function beatMeasure({ reading, events }: StripRecording, kind: string): number {
  if (kind === 'fusion') return reading.beats.filter((beat) => beat.fusion).length;
  if (kind === 'pseudofusion') return reading.beats.filter((beat) => beat.pseudofusion).length;
  if (kind === 'unsensed') return reading.beats.filter((beat) => beat.sensed === false).length;
  if (kind === 'onT') {
    const own = reading.beats.filter((beat) => beat.origin !== 'paced' && beat.origin !== 'none');
    return stimuliOf(events).filter(
      ({ captured, chamber, timeS }) =>
        captured &&
        chamber !== 'atrium' &&
        own.some((beat) => timeS - beat.timeS > 0.2 && timeS - beat.timeS < 0.48),
    ).length;
  }
  return reading.beats.filter((beat) => beat.origin === kind && !beat.fusion).length;
}

function pWaveMeasure({ events }: StripRecording, kind: string | undefined): number | null {
  const waves = events.filter((event) => event.type === 'depolarization' && event.chamber === 'atrium');
  if (kind === undefined) return waves.length;
  if (kind === 'retrograde') {
    return waves.filter((event) => event.type === 'depolarization' && event.origin === 'retrograde').length;
  }
  const beats = events.filter((event) => event.type === 'depolarization' && event.chamber === 'ventricle');
  return beats.length === 0 ? null : waves.length / beats.length;
}

function markerMeasure({ events }: StripRecording, kind: string): number {
  return events.filter((event) => event.type === 'marker' && (event.code === kind || event.cause === kind))
    .length;
}

/** Largest growth of PR from one conducted beat to the next, ms. */
function prGrowthMs({ reading }: StripRecording): number | null {
  const growths = reading.beats.flatMap((beat, i) => {
    const before = reading.beats[i - 1]?.prIntervalMs ?? null;
    return i > 0 && beat.prIntervalMs !== null && before !== null ? beat.prIntervalMs - before : [];
  });
  return growths.length === 0 ? null : Math.max(...growths);
}

function intervalMeasure(recording: StripRecording, kind: string): number | null {
  const { reading, events } = recording;
  const onsets = events.flatMap((event) =>
    event.type === 'depolarization' && event.chamber === 'ventricle' ? event.timeS : [],
  );
  const rr = differencesMs(onsets);
  switch (kind) {
    case 'av':
      return medianOf(
        reading.beats.flatMap((beat) => (beat.atrialCaptured === null ? [] : (beat.avIntervalMs ?? []))),
      );
    case 'pToStimulus':
      return medianOf(
        reading.beats.flatMap((beat) => (beat.atrialCaptured === null ? (beat.avIntervalMs ?? []) : [])),
      );
    case 'interventricular':
      return reading.interventricularIntervalMs;
    case 'qrs':
      return reading.qrsDurationMs;
    case 'stimulusToQrs':
      return reading.stimulusToQrsEndMs === null || reading.qrsDurationMs === null
        ? null
        : reading.stimulusToQrsEndMs - reading.qrsDurationMs;
    case 'pr':
      return reading.prIntervalMs;
    case 'prGrowth':
      return prGrowthMs(recording);
    case 'rrSpread':
      return rr.length === 0 ? null : Math.max(...rr) - Math.min(...rr);
    case 'rrLongest':
      return rr.length === 0 ? null : Math.max(...rr);
    default:
      return rr.length === 0 ? null : Math.min(...rr);
  }
}

function discordantShare({ reading }: StripRecording): number | null {
  const judged = Object.values(reading.qrsTRelation ?? {}).filter((relation) => relation !== null);
  return judged.length === 0
    ? null
    : judged.filter((relation) => relation === 'discordant').length / judged.length;
}

function criterionMet({ reading }: StripRecording, kind: string): number {
  const id = kind === 'modified' ? 'modified.rule' : 'native.stElevation';
  return reading.criteria?.find((one) => one.id === id)?.met ? 1 : 0;
}

/** The value of a measure on a rendered strip; null where there is nothing to measure. */
export function measureStrip(recording: StripRecording, measure: Measure): number | null {
  const [family, kind = ''] = measure.split('.');
  switch (family) {
    case 'stimuli':
    case 'captured':
      return stimulusMeasure(recording, family, kind);
    case 'lost':
      return stimuliOf(recording.events).filter((stimulus) => stimulus.reason === kind).length;
    case 'beats':
      return beatMeasure(recording, kind);
    case 'pWaves':
      return pWaveMeasure(recording, kind === '' ? undefined : kind);
    case 'markers':
      return markerMeasure(recording, kind);
    case 'ms':
      return intervalMeasure(recording, kind);
    case 'rate':
      return kind === 'atrial' ? recording.reading.atrialRateBpm : recording.reading.ventricularRateBpm;
    case 'deg':
      return recording.reading.frontalAxisDeg;
    case 'spike':
      return spikeMv(recording, kind as LeadName);
    case 'mv':
      return kind === 'mains' ? mainsMv(recording) : wanderMv(recording);
    case 'share':
      return discordantShare(recording);
    case 'criteria':
      return criterionMet(recording, kind);
    default:
      return leadMeasure(recording, family, kind as LeadName);
  }
}

/** Whether a criterion holds on a strip, with its figure. */
export function judgeCriterion(
  recording: StripRecording,
  { measure, min = -Infinity, max = Infinity }: PresetCriterion,
): { value: number | null; met: boolean } {
  const value = measureStrip(recording, measure);
  const slack = 1e-6;
  return { value, met: value !== null && value >= min - slack && value <= max + slack };
}
