import { basicModes, pacesAtrium, pacesVentricles, type BasicMode } from '../../parameters/pacing-mode';
import type { StripEvent } from '../events';
import type { BeatReading } from './beat-reading';
import { differences } from './statistics';

/** Intervals within this of each other are the same, ms: device timing, kept to the microsecond, needs no more. */
const sameMs = 3;
/** P–V delays that stay within this follow the P wave; those that spread more than the second do not, ms. */
const followsMs = 6;
const wandersMs = 60;
/** Fewer examples than this prove nothing. */
const leastExamples = 3;
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

function isRegular(timesMs: readonly number[]): boolean {
  const intervals = differences(timesMs);
  return intervals.length > 0 && spread(intervals) <= sameMs;
}

/** Delays from each unpaced P wave to the ventricular stimulus that follows without an atrial one between. */
function ownPDelays(events: readonly StripEvent[]): number[] {
  let lastP: number | null = null;
  const delays: number[] = [];
  for (const event of events) {
    if (event.type === 'depolarization' && event.chamber === 'atrium') {
      lastP = event.origin === 'paced' ? null : 1000 * event.timeS;
    }
    if (event.type !== 'stimulus') continue;
    if (event.chamber !== 'atrium' && lastP !== null) delays.push(1000 * event.timeS - lastP);
    lastP = null;
  }
  return delays.filter((delay) => delay <= longestAvMs);
}

function evidenceOf(events: readonly StripEvent[], beats: readonly BeatReading[]): Evidence {
  const times = (atrial: boolean): number[] =>
    events
      .filter((event) => event.type === 'stimulus' && (event.chamber === 'atrium') === atrial)
      .map((event) => 1000 * event.timeS);
  const atrial = times(true);
  const ventricular = beats.filter((beat) => beat.stimuli.length > 0).map((beat) => 1000 * beat.timeS);
  const stimuli = times(false);
  const delays = ownPDelays(events);
  const intervals = differences(ventricular);
  const shortest = Math.min(...intervals.filter((interval) => interval > 0), Infinity);
  const intrinsic = beats
    .filter((beat) => beat.origin !== 'paced' && beat.origin !== 'none')
    .map((beat) => 1000 * beat.timeS);
  return {
    atrialStimuli: atrial.length > 0,
    ventricularStimuli: stimuli.length > 0,
    atrialRegular: isRegular(atrial),
    ventricularRegular: isRegular(ventricular),
    tracks: delays.length >= leastExamples && spread(delays) <= followsMs && !isRegular(ventricular),
    ignoresP: delays.length >= leastExamples && spread(delays) > wandersMs,
    ignoresQrs: intrinsic.some((qrs) => stimuli.some((time) => time > qrs + 5 && time - qrs < shortest - 20)),
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
  return !((mode === 'VVI' || mode === 'DDI') && seen.ignoresQrs);
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
