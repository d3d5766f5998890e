import type { AtrialDepolarization, StripEvent } from '../../events';
import type { BeatReading } from '../beat-reading';
import type { Finding, ReadingFigures } from '../reading';
import { mean } from '../statistics';
import { countOf, numberWord } from '../words';
import { capitalised, numbersOf } from './chamber-words';

type Origin = Exclude<BeatReading['origin'], 'none'>;

const originSubject: Record<Origin, (count: number) => string> = {
  paced: (count) => (count === 1 ? 'One beat is paced' : `${capitalised(numberWord(count))} beats are paced`),
  conducted: (count) =>
    count === 1 ? 'One beat is conducted' : `${capitalised(numberWord(count))} beats are conducted`,
  premature: (count) => countOf(count, 'premature ventricular beat', 'premature ventricular beats'),
  junctionalEscape: (count) => countOf(count, 'junctional escape', 'junctional escapes'),
  ventricularEscape: (count) => countOf(count, 'ventricular escape', 'ventricular escapes'),
};

function originFindings(reading: ReadingFigures): Finding[] {
  return (Object.keys(originSubject) as Origin[]).flatMap((origin) => {
    const beats = reading.beats.filter((beat) => beat.origin === origin);
    if (beats.length === 0) return [];
    const duration = mean(beats.flatMap((beat) => beat.qrsDurationMs ?? [])) ?? 0;
    const pr = mean(beats.flatMap((beat) => (origin === 'conducted' ? (beat.prIntervalMs ?? []) : [])));
    const interval = pr === null ? '' : `PR ${Math.round(pr)} ms, `;
    const text = `${originSubject[origin](beats.length)}: ${interval}QRS ${Math.round(duration)} ms.`;
    return [{ id: `origin.${origin}`, text, beats: numbersOf(beats) }];
  });
}

function fusionFindings(reading: ReadingFigures): Finding[] {
  const fused = reading.beats.filter((beat) => beat.fusion);
  const pseudofused = reading.beats.filter((beat) => beat.pseudofusion);
  const findings: Finding[] = [];
  if (fused.length > 0) {
    const text = `${countOf(fused.length, 'fusion beat', 'fusion beats')}: two fronts meet in the ventricles.`;
    findings.push({ id: 'fusion', text, beats: numbersOf(fused) });
  }
  if (pseudofused.length > 0) {
    const text = `${countOf(pseudofused.length, 'pseudofusion beat', 'pseudofusion beats')}: the stimulus falls in a QRS that it does not change.`;
    findings.push({ id: 'pseudofusion', text, beats: numbersOf(pseudofused) });
  }
  return findings;
}

function asystoleFinding(reading: ReadingFigures): Finding[] {
  if (reading.beats.some((beat) => beat.origin !== 'none')) return [];
  const text = 'No ventricular depolarization: asystole.';
  return [{ id: 'asystole', text, beats: numbersOf(reading.beats) }];
}

/** Beats whose P wave is of a kind. */
function beatsWithP(reading: ReadingFigures, origin: AtrialDepolarization['origin']): BeatReading[] {
  return reading.beats.filter((beat) => beat.atrialOrigin === origin);
}

function atrialFindings(events: readonly StripEvent[], reading: ReadingFigures): Finding[] {
  const count = (origin: AtrialDepolarization['origin']): number =>
    events.filter(
      (event) => event.type === 'depolarization' && event.origin === origin && event.chamber === 'atrium',
    ).length;
  const findings: Finding[] = [];
  const retrograde = count('retrograde');
  if (retrograde > 0) {
    const tracked = beatsWithP(reading, 'retrograde').filter((beat) => beat.origin === 'paced');
    const loop = tracked.length >= 3 && reading.pacedChambers.length > 0;
    const text = loop
      ? `Retrograde P waves are tracked: pacemaker-mediated tachycardia.`
      : `${countOf(retrograde, 'P wave is', 'P waves are')} conducted backwards from the ventricles.`;
    const beats = loop ? tracked : beatsWithP(reading, 'retrograde');
    findings.push({
      id: loop ? 'pacemakerMediatedTachycardia' : 'retrograde',
      text,
      beats: numbersOf(beats),
    });
  }
  const premature = count('premature');
  if (premature > 0) {
    const text = `${countOf(premature, 'premature atrial beat', 'premature atrial beats')}.`;
    findings.push({ id: 'origin.prematureAtrial', text, beats: numbersOf(beatsWithP(reading, 'premature')) });
  }
  return findings;
}

function underlyingFinding(reading: ReadingFigures): Finding[] {
  const { underlyingRhythm, beats } = reading;
  if (underlyingRhythm === null) return [];
  return [
    {
      id: 'underlyingRhythm',
      text: `Underlying rhythm: ${underlyingRhythm.charAt(0).toLowerCase()}${underlyingRhythm.slice(1)}.`,
      beats: numbersOf(beats),
    },
  ];
}

/** Where the beats come from, and what lies under the pacing. */
export function beatFindings(events: readonly StripEvent[], reading: ReadingFigures): Finding[] {
  return [
    ...asystoleFinding(reading),
    ...underlyingFinding(reading),
    ...originFindings(reading),
    ...fusionFindings(reading),
    ...atrialFindings(events, reading),
  ];
}
