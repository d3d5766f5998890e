import type {
  AtrialDepolarization,
  CaptureFailure,
  StimulusEvent,
  StripEvent,
  VentricularDepolarization,
  VentricularOrigin,
} from '../events';
import type { ComplexMeasures } from './complex';

/** Stimuli of one multisite pace lie at most this far apart (the schema's limit on the interventricular delay). */
const pairWindowS = 0.1;
/** Slack for times that are whole microseconds kept as seconds. */
const sameTimeS = 1e-9;

/**
 * A ventricular depolarization with the stimuli that belong to it, or a ventricular stimulus (or pair) that
 * captured nothing and fell outside a QRS.
 */
export interface RawBeat {
  timeS: number;
  depolarization: VentricularDepolarization | null;
  complex: ComplexMeasures | null;
  /** Ventricular stimuli, in time order. */
  stimuli: StimulusEvent[];
}

export type BeatOrigin = VentricularOrigin | 'none';

export function beatOrigin(beat: RawBeat): BeatOrigin {
  return beat.depolarization?.origin ?? 'none';
}

/** True, false, or null for a beat without a ventricular stimulus. */
export function beatCaptured(beat: RawBeat): boolean | null {
  return beat.stimuli.length === 0 ? null : beat.stimuli.some((stimulus) => stimulus.captured);
}

/** Reasons why stimuli of this beat captured nothing, each once. */
export function captureFailures(beat: RawBeat): CaptureFailure[] {
  return [...new Set(beat.stimuli.flatMap((stimulus) => stimulus.reason ?? []))];
}

function isVentricularStimulus(event: StripEvent): event is StimulusEvent {
  return event.type === 'stimulus' && event.chamber !== 'atrium';
}

/** The beat whose QRS, pair or start a stimulus belongs to. */
function ownerOf(stimulus: StimulusEvent, depolarizations: readonly RawBeat[]): RawBeat | undefined {
  return depolarizations.find((beat) => {
    const event = beat.depolarization;
    if (!event) return false;
    if (stimulus.captured) {
      return event.sources.some(
        (source) => source.site === stimulus.chamber && Math.abs(source.timeS - stimulus.timeS) < sameTimeS,
      );
    }
    const qrsEndS = event.timeS + (beat.complex?.qrsOffsetMs ?? 0) / 1000;
    return stimulus.timeS >= event.timeS - sameTimeS && stimulus.timeS <= qrsEndS;
  });
}

/** Whether a stimulus and a beat's stimuli are the two halves of one multisite pace. */
function isPair(stimulus: StimulusEvent, beat: RawBeat): boolean {
  return beat.stimuli.some(
    (other) => other.chamber !== stimulus.chamber && Math.abs(other.timeS - stimulus.timeS) <= pairWindowS,
  );
}

/** Beats (in time order) within a second of a time: the only ones that can own a stimulus there. */
function near(beats: readonly RawBeat[], timeS: number): RawBeat[] {
  let low = 0;
  let high = beats.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (beats[middle].timeS < timeS - 1) low = middle + 1;
    else high = middle;
  }
  const found: RawBeat[] = [];
  for (let i = low; i < beats.length && beats[i].timeS <= timeS + 1; i++) found.push(beats[i]);
  return found;
}

/** Beats made of stimuli that no depolarization owns; the halves of a pair make one beat. */
function uncapturedBeats(alone: readonly StimulusEvent[], depolarized: readonly RawBeat[]): RawBeat[] {
  const beats: RawBeat[] = [];
  for (const stimulus of alone) {
    const last = beats.at(-1);
    const pair = [...near(depolarized, stimulus.timeS), ...(last ? [last] : [])].find((beat) =>
      isPair(stimulus, beat),
    );
    if (pair) pair.stimuli.push(stimulus);
    else beats.push({ timeS: stimulus.timeS, depolarization: null, complex: null, stimuli: [stimulus] });
  }
  return beats;
}

/**
 * Beats in time order. `complexOf` gives the measured complex of a ventricular depolarization.
 */
export function findBeats(
  events: readonly StripEvent[],
  complexOf: (event: VentricularDepolarization) => ComplexMeasures | null,
): RawBeat[] {
  const depolarized: RawBeat[] = events.flatMap((event) =>
    event.type === 'depolarization' && event.chamber === 'ventricle'
      ? [{ timeS: event.timeS, depolarization: event, complex: complexOf(event), stimuli: [] }]
      : [],
  );
  const alone: StimulusEvent[] = [];
  for (const stimulus of events.filter(isVentricularStimulus)) {
    const owner = ownerOf(stimulus, near(depolarized, stimulus.timeS));
    if (owner) owner.stimuli.push(stimulus);
    else alone.push(stimulus);
  }
  const beats = [...depolarized, ...uncapturedBeats(alone, depolarized)];
  for (const beat of beats) beat.stimuli.sort((a, b) => a.timeS - b.timeS);
  return beats.sort((a, b) => a.timeS - b.timeS);
}

/** The last atrial depolarization, or uncaptured atrial stimulus, before a beat and after the previous one. */
export interface AtrialPartner {
  depolarization: AtrialDepolarization | null;
  stimulus: StimulusEvent | null;
}

/** For each beat, what the atria did between the previous beat's onset and its own. */
export function atrialPartners(events: readonly StripEvent[], beats: readonly RawBeat[]): AtrialPartner[] {
  const partners: AtrialPartner[] = beats.map(() => ({ depolarization: null, stimulus: null }));
  let beat = 0;
  for (const event of events) {
    while (beat < beats.length && event.timeS >= beats[beat].timeS) beat++;
    if (beat >= beats.length) break;
    if (event.type === 'depolarization' && event.chamber === 'atrium') partners[beat].depolarization = event;
    if (event.type === 'stimulus' && event.chamber === 'atrium') partners[beat].stimulus = event;
  }
  return partners;
}
