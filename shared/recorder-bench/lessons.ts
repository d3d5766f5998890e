import { galleryPreset, presetParameters } from '../gallery/gallery';
import type { LeadName } from '../parameters/sheet';
import type { StripParameters } from '../parameters/strip-parameters';
import { measureBeats, usualBeat, wholeBeats, type MeasuredBeat } from './beat-measures';
import type { BenchSetting } from './bench-setting';
import { builtInSettings } from './built-in-settings';
import { largest } from './fit';
import { stripOnBench, type BenchTrace, type StripOnBench } from './strip-traces';

/** What a lesson says of the strip and the settings that stand on the bench. */
export interface LessonWords {
  /** A few characters for the list. */
  figure: string;
  /** Every number in it was measured on the traces shown. */
  text: string;
}

/** A pitfall with a live pair of strips. */
export interface Lesson {
  id: string;
  title: string;
  parameters: StripParameters;
  lead: LeadName;
  settings: readonly BenchSetting[];
  /** Whether the difference tells more than the traces. */
  view: 'traces' | 'difference';
  words(strip: StripOnBench, beats: readonly MeasuredBeat[]): LessonWords;
}

function preset(id: string, change: (parameters: StripParameters) => StripParameters = (one) => one) {
  return change(presetParameters(galleryPreset(id)));
}

const mv = (value: number): string => `${Math.abs(value).toFixed(2)} mV`;
const signedMv = (value: number): string => `${value < 0 ? '−' : '+'}${mv(value)}`;
const uv = (value: number): string => `${Math.round(1000 * Math.abs(value))} µV`;
const percent = (value: number): string => `${Math.abs(value) < 10 ? value.toFixed(1) : value.toFixed(0)} %`;

/** Of a strip without beats there is nothing to say; no lesson has one. */
const nothing: LessonWords = { figure: '–', text: '' };

function average(values: readonly number[]): number {
  return values.length === 0 ? 0 : values.reduce((sum, value) => sum + value, 0) / values.length;
}

function spikes(beats: readonly MeasuredBeat[], setting: number): number[] {
  return beats.flatMap((beat) => {
    const { spikeMv } = beat.bySetting[setting];
    return spikeMv === null ? [] : [Math.abs(spikeMv)];
  });
}

function range(values: readonly number[]): string {
  return `${Math.min(...values).toFixed(2)} to ${mv(Math.max(...values))}`;
}

function spikeVanishes(_: StripOnBench, beats: readonly MeasuredBeat[]): LessonWords {
  const beat = usualBeat(beats);
  if (!beat) return nothing;
  const [wide, narrow] = beat.bySetting;
  const share = (one: typeof wide): string => `${mv(one.spikeMv ?? 0)} (${percent(one.spikePercent ?? 0)})`;
  return {
    figure: `${Math.abs(wide.spikeMv ?? 0).toFixed(2)} to ${mv(narrow.spikeMv ?? 0)}`,
    text: `At the electrodes the spike of beat ${beat.number} is ${mv(beat.spike?.electrodesMv ?? 0)} high. The diagnostic band leaves ${share(wide)} of it, the monitor band ${share(narrow)}: ${(10 * Math.abs(narrow.spikeMv ?? 0)).toFixed(1)} mm of paper. A pulse of less than a millisecond is spread over many; its area stays, its height goes. A rhythm without spikes on a monitor may be paced all the same.`,
  };
}

function aliasing(_: StripOnBench, beats: readonly MeasuredBeat[]): LessonWords {
  const [limited, plain] = [spikes(beats, 0), spikes(beats, 1)];
  const spread = 100 * (1 - Math.min(...limited) / Math.max(...limited));
  return {
    figure: `${plain.length > 0 ? range(plain) : '–'}`,
    text: `All ${limited.length} stimuli are alike. Band-limited to 150 Hz they are ${range(limited)} high, because two samples may lie either side of the peak: they differ by ${percent(spread)}. Sampled without a band-limit they are ${range(plain)} high: a pulse narrower than the 2 ms between samples is caught whole or not at all. That spikes change in height says nothing about the pacemaker.`,
  };
}

function stDisplaced(_: StripOnBench, beats: readonly MeasuredBeat[]): LessonWords {
  const measured = wholeBeats(beats);
  const level = (setting: number): number =>
    average(measured.map((beat) => beat.bySetting[setting].stMv ?? 0));
  const change = level(1) - level(0);
  return {
    figure: signedMv(change),
    text: `80 ms after the QRS the level is ${signedMv(level(0))} with a low limit of 0.05 Hz and ${signedMv(level(1))} with 0.5 Hz: moved by ${signedMv(change)}, ${(10 * Math.abs(change)).toFixed(1)} mm, by the filter alone (mean of ${measured.length} beats). After a deep S the low-cut swings back. Judge ST on a diagnostic recording.`,
  };
}

function within({ exactMv, sampleRateHz }: BenchTrace, fromS: number, toS: number): Float64Array {
  return exactMv.subarray(
    Math.max(0, Math.round(fromS * sampleRateHz)),
    Math.max(0, Math.round(toS * sampleRateHz)),
  );
}

/** From 10 to 110 ms after the QRS, where late potentials are looked for. */
function notchRinging(strip: StripOnBench): LessonWords {
  const [plain, notched] = strip.traces;
  const rings = strip.beats.flatMap(({ qrsEndS }) => {
    if (qrsEndS === null || qrsEndS + 0.11 > strip.durationS) return [];
    const [a, b] = [plain, notched].map((trace) => within(trace, qrsEndS + 0.01, qrsEndS + 0.11));
    return [largest(a.map((value, i) => value - b[i]))];
  });
  const ring = average(rings);
  return {
    figure: uv(ring),
    text: `The two traces differ by the notch alone, and there is no mains here. From 10 to 110 ms after the QRS it rings by ${uv(ring)} (mean of ${rings.length} beats), at 50 Hz, in every beat alike: so averaging does not take it away, and it looks like a late potential. Switch a notch on against mains that is there, not by habit.`,
  };
}

/** How far the line before the beats wanders, mV peak to valley. */
function lineSpread(strip: StripOnBench, setting: number): number {
  const levels = strip.beats
    .filter(({ startS }) => startS > 0.05)
    .map(({ startS }) => average([...within(strip.traces[setting], startS - 0.036, startS - 0.016)]));
  return Math.max(...levels) - Math.min(...levels);
}

function wanderRemoved(strip: StripOnBench, beats: readonly MeasuredBeat[]): LessonWords {
  const measured = wholeBeats(beats);
  const level = (setting: number): number =>
    average(measured.map((beat) => beat.bySetting[setting].stMv ?? 0));
  const [wide, cut, both] = [0, 1, 2].map((setting) => lineSpread(strip, setting));
  return {
    figure: `${wide.toFixed(2)} to ${mv(cut)}`,
    text: `The line before the beats wanders over ${mv(wide)} at 0.05 Hz. A running low-cut at 0.5 Hz leaves ${mv(cut)}, and moves the level 80 ms after the QRS by ${signedMv(level(1) - level(0))} on the way. Run forwards and backwards over the finished recording, at 0.67 Hz, it leaves ${mv(both)} and moves the level by ${signedMv(level(2) - level(0))}, but it needs the future: no monitor at the bedside can do it.`,
  };
}

/** How long the stimulus's own share of a trace stands above a tenth of a millivolt, ms. */
function artefactWidthMs(trace: BenchTrace, timeS: number): number {
  const line = average([...within(trace, timeS - 0.03, timeS - 0.02)]);
  const high = within(trace, timeS - 0.02, timeS + 0.08).filter((value) => Math.abs(value - line) > 0.1);
  return (1000 * high.length) / trace.sampleRateHz;
}

function spikeBlanks(strip: StripOnBench, beats: readonly MeasuredBeat[]): LessonWords {
  const beat = usualBeat(beats);
  if (!beat) return nothing;
  const timeS = beat.spike?.timeS ?? beat.startS;
  const [wide, narrow] = strip.artefacts.map((trace) => artefactWidthMs(trace, timeS));
  const heights = beat.bySetting.map(({ spikeMv }) => mv(spikeMv ?? 0));
  return {
    figure: `${wide.toFixed(0)} to ${narrow.toFixed(0)} ms`,
    text: `This unipolar spike is ${mv(beat.spike?.electrodesMv ?? 0)} high at the electrodes. The diagnostic band leaves ${heights[0]} of it, above 0.1 mV for ${wide.toFixed(0)} ms; the monitor band leaves ${heights[1]}, for ${narrow.toFixed(0)} ms, and then the first part of the QRS lies under it. A QRS may be missed, or seen where there is only a spike: look for the T wave.`,
  };
}

/** The lessons in the order of the page. */
export const lessons: readonly Lesson[] = [
  {
    id: 'spike-vanishes',
    title: 'The spike vanishes on a monitor',
    parameters: preset('ventricular-pacing-apex'),
    lead: 'II',
    settings: [builtInSettings.diagnostic, builtInSettings.monitor],
    view: 'traces',
    words: spikeVanishes,
  },
  {
    id: 'aliasing',
    title: 'A spike sampled without the band-limit',
    parameters: preset('ventricular-pacing-apex'),
    lead: 'II',
    settings: [builtInSettings.diagnostic, builtInSettings.pointSampled],
    view: 'traces',
    words: aliasing,
  },
  {
    id: 'st-displaced',
    title: 'ST displaced by a 0.5 Hz low-cut',
    parameters: preset('ventricular-pacing-apex'),
    lead: 'V2',
    settings: [builtInSettings.slowWave, builtInSettings.monitor],
    view: 'traces',
    words: stDisplaced,
  },
  {
    id: 'notch-ringing',
    title: 'Notch ringing that imitates a late potential',
    // Steep and tall, as in the young: the notch rings with what the QRS has at its frequency.
    parameters: preset('sinus-rhythm', (one) => ({
      ...one,
      waveform: { ...one.waveform, qrsDurationMs: 70, qrsScale: 1.5 },
    })),
    lead: 'V3',
    settings: [builtInSettings.diagnostic, builtInSettings.notched],
    view: 'difference',
    words: notchRinging,
  },
  {
    id: 'wander-removed',
    title: 'Baseline wander removed, at a price',
    parameters: preset('ventricular-pacing-apex', (one) => ({
      ...one,
      disturbance: { ...one.disturbance, baselineWanderMv: 0.6 },
    })),
    lead: 'II',
    settings: [builtInSettings.diagnostic, builtInSettings.monitor, builtInSettings.zeroPhase],
    view: 'traces',
    words: wanderRemoved,
  },
  {
    id: 'spike-blanks',
    title: 'A unipolar spike that blanks the QRS',
    parameters: preset('ventricular-pacing-apex', (one) => ({
      ...one,
      pacing: {
        ...one.pacing,
        rightVentricularLead: { ...one.pacing.rightVentricularLead, polarity: 'unipolar', amplitudeV: 5 },
      },
    })),
    lead: 'II',
    settings: [builtInSettings.diagnostic, builtInSettings.monitor],
    view: 'traces',
    words: spikeBlanks,
  },
];

/** A lesson's words, measured by putting it on the bench. */
export function measureLesson(lesson: Lesson): LessonWords {
  const strip = stripOnBench(lesson.parameters, lesson.settings, lesson.lead);
  return lesson.words(strip, measureBeats(strip));
}
