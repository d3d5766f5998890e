import { basicModes, pacesAtrium, pacesVentricles, type BasicMode } from '../../parameters/pacing-mode';
import type { StimulusChamber, StripEvent } from '../events';
import type { BeatReading } from './beat-reading';
import { differences } from './statistics';

/** Intervals within this of each other are the same, ms: device timing, kept to the microsecond, needs no more. */
const sameMs = 3;
/** P–V delays that stay within this follow the P wave; those that spread more than the second do not, ms. */
const followsMs = 6;
const wandersMs = 60;
/** Fewer examples than this prove nothing. */
const leastExamples = 3;
/** A QRS this soon after a stimulus may lie in the refractory period of the device (its longest is 500), ms. */
const unheardMs = 500;
/** Ventricular pacing this slow is not held back by an upper rate (80 /min is the lowest there is), ms. */
const slowestUpperMs = 750;
/** Sooner than the shortest paced interval by this much is too soon, ms: the QRS is sensed later than it begins. */
const sooner = 150;
/** P waves further than this before a stimulus do not belong to it, ms. */
const longestAvMs = 360;

interface Evidence {
  atrialStimuli: boolean;
  ventricularStimuli: boolean;
  atrialRegular: boolean;
  ventricularRegular: boolean;
  /** Ventricular stimuli come at a fixed delay after the patient's own P waves, which are not regular by themselves. */
  tracks: boolean;
  /** The patient's own P waves and the ventricular stimuli go their own ways. */
  ignoresP: boolean;
  /** A ventricular stimulus came sooner after an intrinsic QRS than after a paced one. */
  ignoresQrs: boolean;
}

const spread = (values: readonly number[]): number => Math.max(...values) - Math.min(...values);

/** Whether stimuli come like clockwork; a single one says nothing against it, none at all does. */
function isRegular(timesMs: readonly number[]): boolean {
  const intervals = differences(timesMs);
  return timesMs.length === 1 || (intervals.length > 0 && spread(intervals) <= sameMs);
}

/**
 * Delays from each unpaced P wave to the ventricular stimulus that follows without an atrial one between. A stimulus in a
 * conducted QRS is left out: there the node keeps the delay, not the device.
 */
function ownPDelays(events: readonly StripEvent[], beats: readonly BeatReading[]): number[] {
  const conducted = new Set(
    beats.filter((beat) => beat.fusion || beat.origin === 'conducted').flatMap((beat) => beat.stimulusTimesS),
  );
  let lastP: number | null = null;
  const delays: number[] = [];
  for (const event of events) {
    if (event.type === 'depolarization' && event.chamber === 'atrium') {
      // A retrograde P wave follows the ventricles, and a premature one what came before it: neither proves anything.
      const { origin } = event;
      const proves = origin === 'sinus' || origin === 'tachycardia';
      lastP = proves ? 1000 * event.timeS : null;
    }
    if (event.type !== 'stimulus') continue;
    if (event.chamber !== 'atrium' && lastP !== null && !conducted.has(event.timeS)) {
      delays.push(1000 * event.timeS - lastP);
    }
    lastP = null;
  }
  return delays.filter((delay) => delay <= longestAvMs);
}

/**
 * Whether the beat after an intrinsic one is stimulated sooner than the device ever paces after its own. A QRS shortly
 * after a stimulus may be refractory to the device, and proves nothing.
 */
function stimulatedTooSoon(beats: readonly BeatReading[], i: number, shortestMs: number): boolean {
  if (i === 0) return false;
  const [previous, beat, next] = [beats[i - 1], beats[i], beats.at(i + 1)];
  if (!next || next.stimuli.length === 0 || beat.origin === 'paced' || beat.origin === 'none') return false;
  const lastS = previous.stimulusTimesS.at(-1) ?? -Infinity;
  if (1000 * (beat.timeS - lastS) < unheardMs) return false;
  return 1000 * (next.stimulusTimesS[0] - beat.timeS) < shortestMs - sooner;
}

function evidenceOf(events: readonly StripEvent[], beats: readonly BeatReading[]): Evidence {
  const times = (chamber: StimulusChamber): number[] =>
    events
      .filter((event) => event.type === 'stimulus' && event.chamber === chamber)
      .map((event) => 1000 * event.timeS);
  const atrial = times('atrium');
  const perSite = (['rightVentricle', 'leftVentricle', 'chest'] as const)
    .map(times)
    .filter((stimuli) => stimuli.length > 0);
  const ventricularRegular = perSite.length > 0 && perSite.every(isRegular);
  const delays = ownPDelays(events, beats);
  const paced = beats.slice(1).flatMap((beat, i) => {
    const previous = beats[i];
    if (beat.stimuli.length === 0 || previous.stimuli.length === 0) return [];
    return 1000 * (beat.stimulusTimesS[0] - previous.stimulusTimesS[0]);
  });
  const shortest = paced.length > 0 ? Math.min(...paced) : 0;
  return {
    atrialStimuli: atrial.length > 0,
    ventricularStimuli: perSite.length > 0,
    atrialRegular: isRegular(atrial),
    ventricularRegular,
    tracks: delays.length >= leastExamples && spread(delays) <= followsMs && !ventricularRegular,
    ignoresP: delays.length >= leastExamples && spread(delays) > wandersMs && shortest > slowestUpperMs,
    ignoresQrs: beats.some((_, i) => stimulatedTooSoon(beats, i, shortest)),
  };
}

function isConsistent(mode: BasicMode, seen: Evidence): boolean {
  if (seen.atrialStimuli && !pacesAtrium(mode)) return false;
  if (seen.ventricularStimuli && !pacesVentricles(mode)) return false;
  const asynchronous = mode.endsWith('OO');
  if (asynchronous) {
    if (pacesAtrium(mode) && !seen.atrialRegular) return false;
    return !pacesVentricles(mode) || seen.ventricularRegular;
  }
  const tracking = mode === 'DDD' || mode === 'VDD';
  if (tracking && seen.ignoresP) return false;
  if (!tracking && seen.tracks) return false;
  // Dual modes may be deaf to a QRS in the blanking after an atrial stimulus, or answer it with a safety pace.
  return !(mode === 'VVI' && seen.ignoresQrs);
}

/**
 * Modes that could have made this strip, judged as a reader would from stimuli, P waves and QRS complexes: without
 * R and fifth letter, which do not show. Empty when it holds no stimulus and no pacemaker acts.
 */
export function consistentModes(events: readonly StripEvent[], beats: readonly BeatReading[]): BasicMode[] {
  if (!events.some((event) => event.type === 'stimulus' || event.type === 'marker')) return [];
  const seen = evidenceOf(events, beats);
  return basicModes.filter((mode) => isConsistent(mode, seen));
}
