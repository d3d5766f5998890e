import type { AtrialDepolarization, AtrialOrigin, StripEvent } from '../events';
import type { BeatReading } from './beat-reading';

const atrialWords: Partial<Record<AtrialOrigin, string>> = {
  sinus: 'Sinus rhythm',
  tachycardia: 'Atrial tachycardia',
  flutter: 'Atrial flutter',
  fibrillation: 'Atrial fibrillation',
};
/** PR above this is a first degree block, ms (NR-36). */
const longPrMs = 200;
/** P waves this much more than QRS complexes mean dropped beats. */
const droppedShare = 0.95;

function atrialPart(events: readonly StripEvent[]): string | null {
  const waves = events.filter(
    (event): event is AtrialDepolarization => event.type === 'depolarization' && event.chamber === 'atrium',
  );
  const own = waves.find((event) => event.origin in atrialWords);
  if (own) return atrialWords[own.origin] ?? null;
  return waves.length === 0 ? 'No atrial activity' : null;
}

/** What can be said of AV conduction: only where the ventricles were not paced before it could show. */
function conductionPart(events: readonly StripEvent[], beats: readonly BeatReading[]): string | null {
  const waves = events.filter(
    (event) => event.type === 'depolarization' && event.chamber === 'atrium' && event.origin !== 'retrograde',
  ).length;
  const conducted = beats.filter((beat) => beat.origin === 'conducted');
  if (waves === 0) return null;
  if (conducted.length === 0) {
    return beats.some((beat) => beat.origin === 'paced') ? null : 'no AV conduction';
  }
  const irregular = events.some(
    (event) => event.type === 'depolarization' && event.origin === 'fibrillation',
  );
  if (irregular) return 'irregularly conducted';
  const prs = conducted.flatMap((beat) => beat.prIntervalMs ?? []);
  const shortest = Math.min(...prs);
  const longest = Math.max(...prs);
  if (conducted.length < droppedShare * waves - 1) {
    const growing = longest - shortest > 20 ? 'with growing PR intervals' : 'with a constant PR interval';
    return `second degree AV block (${waves} P waves, ${conducted.length} conducted) ${growing}`;
  }
  return shortest > longPrMs ? 'first degree AV block' : 'conducted one to one';
}

function escapePart(beats: readonly BeatReading[]): string | null {
  const escape = beats.find(
    (beat) => beat.origin === 'junctionalEscape' || beat.origin === 'ventricularEscape',
  );
  if (!escape) return null;
  return escape.origin === 'junctionalEscape' ? 'junctional escape' : 'ventricular escape';
}

/** The rhythm under the pacing, in words, as far as it shows; null when nothing of it does. */
export function underlyingRhythm(
  events: readonly StripEvent[],
  beats: readonly BeatReading[],
): string | null {
  const parts = [atrialPart(events), conductionPart(events, beats), escapePart(beats)];
  const known = parts.filter((part) => part !== null);
  if (known.length === 0) return null;
  const words = known.join(', ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}
