import type { StripEvent } from '../../engine/events';
import type { BeatReading } from '../../engine/reading/beat-reading';
import { differences } from '../../engine/reading/statistics';
import { msPerS } from '../../units';
import type { TimeSpan } from '../layout';

/** A measured stretch of time with the words that stand at its dimension line. */
export interface Interval extends TimeSpan {
  /** Intervals of one kind measure the same thing; one good instance of each is drawn. */
  kind: 'av' | 'interventricular' | 'vv' | 'aa' | 'pr' | 'rr' | 'pacemakerEscape' | 'escape';
  text: string;
}

function ms(fromS: number, toS: number): string {
  return `${Math.round((toS - fromS) * msPerS)} ms`;
}

function interval(kind: Interval['kind'], name: string, fromS: number, toS: number): Interval {
  return { kind, fromS, toS, text: `${name} ${ms(fromS, toS)}` };
}

const paced = (beat: BeatReading): boolean => beat.captured === true && !beat.fusion;
const own = (beat: BeatReading): boolean => beat.stimuli.length === 0 && beat.origin !== 'none';
const escaped = (beat: BeatReading): boolean =>
  own(beat) && (beat.origin === 'junctionalEscape' || beat.origin === 'ventricularEscape');

/** Within a beat: atrium to ventricle, and between the ventricles. */
function withinBeat(beat: BeatReading): Interval[] {
  const found: Interval[] = [];
  const { avIntervalMs, prIntervalMs, interventricularIntervalMs: between } = beat;
  const stimulusS = beat.stimulusTimesS[0];
  if (avIntervalMs !== null && paced(beat)) {
    found.push(interval('av', 'AV', stimulusS - avIntervalMs / msPerS, stimulusS));
  }
  if (prIntervalMs !== null && own(beat)) {
    found.push(interval('pr', 'PR', beat.timeS - prIntervalMs / msPerS, beat.timeS));
  }
  if (between !== null && between !== 0) {
    const name = between > 0 ? 'RV–LV' : 'LV–RV';
    found.push(interval('interventricular', name, stimulusS, stimulusS + Math.abs(between) / msPerS));
  }
  return found;
}

/** From one beat to the next. */
function betweenBeats(beat: BeatReading, next: BeatReading): Interval[] {
  const found: Interval[] = [];
  const [fromS, toS] = [beat.stimulusTimesS[0], next.stimulusTimesS[0]];
  if (paced(beat) && paced(next)) found.push(interval('vv', 'VV', fromS, toS));
  if (own(beat) && beat.sensed === true && paced(next) && next.origin === 'paced') {
    found.push(interval('pacemakerEscape', 'R to stimulus', beat.timeS, toS));
  }
  if (escaped(next)) {
    // From the last depolarization: a stimulus without capture between them makes no difference.
    if (next.rrMs === null) return found;
    found.push(interval('escape', 'escape after', next.timeS - next.rrMs / msPerS, next.timeS));
  } else if (own(beat) && own(next)) found.push(interval('rr', 'RR', beat.timeS, next.timeS));
  return found;
}

/** Atrial stimuli that follow each other, where no ventricle is paced. */
function atrialCycles(events: readonly StripEvent[]): Interval[] {
  const stimuli = events.filter((event) => event.type === 'stimulus');
  if (stimuli.some((stimulus) => stimulus.chamber !== 'atrium')) return [];
  const timesS = stimuli.map((stimulus) => stimulus.timeS);
  return differences(timesS).map((_, i) => interval('aa', 'AA', timesS[i], timesS[i + 1]));
}

/**
 * Every interval that could be drawn, kinds in the order in which places are given to them: AV from atrial stimulus or
 * sensed P wave to ventricular stimulus, VV and AA between stimuli, PR and RR between onsets of the heart's own beats, and
 * escape intervals. Fused beats measure nothing.
 */
export function intervalsOf(beats: readonly BeatReading[], events: readonly StripEvent[]): Interval[] {
  return [
    ...beats.flatMap(withinBeat),
    ...beats.slice(1).flatMap((next, i) => betweenBeats(beats[i], next)),
    ...atrialCycles(events),
  ];
}
