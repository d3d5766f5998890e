import type { DepolarizationEvent, MarkerEvent, StripEvent } from '../../events';
import type { BeatReading } from '../beat-reading';
import type { Finding, ReadingFigures } from '../reading';
import { isOversensed } from '../sensing';
import { countOf, numberWord } from '../words';
import { numbersOf } from './chamber-words';

type Chamber = 'atrium' | 'ventricle';

const names: Record<Chamber, { signal: string; signals: string; title: string }> = {
  atrium: { signal: 'P wave', signals: 'P waves', title: 'Atrial' },
  ventricle: { signal: 'QRS', signals: 'QRS complexes', title: 'Ventricular' },
};

/** The beat that a time belongs to: the first whose onset lies at or after it, otherwise the last. */
function beatAt(beats: readonly BeatReading[], timeS: number): BeatReading | undefined {
  return beats.find((beat) => beat.timeS >= timeS - 1e-9) ?? beats.at(-1);
}

function beatsAt(beats: readonly BeatReading[], times: readonly { timeS: number }[]): number[] {
  const found = times.flatMap(({ timeS }) => beatAt(beats, timeS) ?? []);
  return [...new Set(numbersOf(found))];
}

function missed(events: readonly StripEvent[], chamber: Chamber): DepolarizationEvent[] {
  return events.filter(
    (event): event is DepolarizationEvent =>
      event.type === 'depolarization' && event.chamber === chamber && event.sensed === false,
  );
}

function missedFinding(
  events: readonly StripEvent[],
  beats: readonly BeatReading[],
  chamber: Chamber,
): Finding[] {
  const unheard = missed(events, chamber);
  if (unheard.length === 0) return [];
  const { signal, signals, title } = names[chamber];
  const text = `${title} undersensing: ${unheard.length === 1 ? `one ${signal} is` : `${numberWord(unheard.length)} ${signals} are`} not sensed.`;
  return [{ id: `undersensing.${chamber}`, text, beats: beatsAt(beats, unheard) }];
}

function inventedFinding(
  events: readonly StripEvent[],
  beats: readonly BeatReading[],
  chamber: Chamber,
): Finding[] {
  const invented = events.filter((event): event is MarkerEvent => isOversensed(event, chamber));
  if (invented.length === 0) return [];
  const crosstalk = invented.every((marker) => marker.cause === 'crosstalk');
  const cause = crosstalk
    ? 'the atrial stimulus is taken for a QRS'
    : 'something is sensed that is no heartbeat';
  return [
    {
      id: crosstalk ? 'crosstalk' : `oversensing.${chamber}`,
      text: `${names[chamber].title} oversensing: ${cause}, ${invented.length === 1 ? 'once' : `${invented.length} times`}.`,
      beats: beatsAt(beats, invented),
    },
  ];
}

function soundFinding(reading: ReadingFigures, chamber: Chamber): Finding[] {
  const state = chamber === 'atrium' ? reading.sensing.atrium : reading.sensing.rightVentricle;
  if (state !== 'appropriate') return [];
  const heard = reading.beats.filter((beat) => chamber === 'atrium' || beat.sensed === true);
  const text = `${names[chamber].title} sensing is appropriate.`;
  return [{ id: `sensing.${chamber}`, text, beats: numbersOf(heard) }];
}

function markedFinding(
  events: readonly StripEvent[],
  beats: readonly BeatReading[],
  code: MarkerEvent['code'],
  id: string,
  words: (count: number) => string,
): Finding[] {
  const markers = events.filter((event) => event.type === 'marker' && event.code === code);
  return markers.length === 0 ? [] : [{ id, text: words(markers.length), beats: beatsAt(beats, markers) }];
}

/** What the device hears, misses and invents, and what it does about it. */
export function sensingFindings(events: readonly StripEvent[], reading: ReadingFigures): Finding[] {
  const { beats } = reading;
  const chambers: Chamber[] = ['atrium', 'ventricle'];
  return [
    ...chambers.flatMap((chamber) => [
      ...soundFinding(reading, chamber),
      ...missedFinding(events, beats, chamber),
      ...inventedFinding(events, beats, chamber),
    ]),
    ...markedFinding(
      events,
      beats,
      'safetyPace',
      'safetyPace',
      (count) => `${countOf(count, 'safety pace', 'safety paces')}, with a short AV interval.`,
    ),
    ...markedFinding(
      events,
      beats,
      'modeSwitchOn',
      'modeSwitch',
      () => 'The mode switches: fast atria are no longer tracked.',
    ),
  ];
}
