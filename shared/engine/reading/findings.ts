import type { StimulusChamber, StripEvent } from '../events';
import type { BeatReading } from './beat-reading';
import { assessable, stimuliOf } from './capture';
import type { Finding, ReadingFigures } from './reading';
import { mean } from './statistics';
import { countOf, listWords, numberWord } from './words';

const chamberName: Record<StimulusChamber, string> = {
  atrium: 'atrium',
  rightVentricle: 'right ventricle',
  leftVentricle: 'left ventricle',
};

const reasonWords = {
  belowThreshold: 'the output is below the threshold',
  refractoryTissue: 'the muscle is still refractory',
} as const;

const numbers = (beats: readonly BeatReading[]): number[] => beats.map((beat) => beat.number);

function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

function pacingFinding(reading: ReadingFigures): Finding {
  const { pacedChambers, beats } = reading;
  const stimulated = beats.filter((beat) => beat.stimuli.length > 0);
  if (pacedChambers.length === 0) {
    return { id: 'noStimulus', text: 'No stimulus is given.', beats: numbers(beats) };
  }
  const chambers = listWords(pacedChambers.map((chamber) => chamberName[chamber]));
  const sequence =
    pacedChambers.includes('atrium') && pacedChambers.length > 1 && reading.avIntervalMs !== null
      ? ` in sequence, ${Math.round(reading.avIntervalMs)} ms apart`
      : '';
  const verb = pacedChambers.length > 1 ? 'are' : 'is';
  return {
    id: 'pacedChambers',
    text: `${capitalised(chambers)} ${verb} stimulated${sequence}.`,
    beats: numbers(pacedChambers.every((chamber) => chamber === 'atrium') ? beats : stimulated),
  };
}

function captureFindings(events: readonly StripEvent[], reading: ReadingFigures): Finding[] {
  return reading.pacedChambers.flatMap((chamber) => {
    const stimuli = assessable(stimuliOf(events, chamber));
    const refractory = stimuliOf(events, chamber).length - stimuli.length;
    const findings: Finding[] = [];
    if (stimuli.length > 0) findings.push(captureFinding(chamber, stimuli, reading));
    if (refractory > 0) findings.push(refractoryFinding(chamber, refractory, reading));
    return findings;
  });
}

function beatsWith(reading: ReadingFigures, chamber: StimulusChamber, captured: boolean): number[] {
  if (chamber === 'atrium') return numbers(reading.beats);
  return numbers(
    reading.beats.filter((beat) => beat.stimuli.includes(chamber) && (captured || beat.reasons.length > 0)),
  );
}

function captureFinding(
  chamber: StimulusChamber,
  stimuli: readonly { captured: boolean }[],
  reading: ReadingFigures,
): Finding {
  const name = chamberName[chamber];
  const lost = stimuli.filter((stimulus) => !stimulus.captured).length;
  const cause = `: ${reasonWords.belowThreshold}`;
  if (lost === 0) {
    const text = `Every stimulus in the ${name} captures.`;
    return { id: `capture.${chamber}`, text, beats: beatsWith(reading, chamber, true) };
  }
  const text =
    lost === stimuli.length
      ? `No stimulus in the ${name} captures${cause}.`
      : `${capitalised(numberWord(lost))} of ${numberWord(stimuli.length)} stimuli in the ${name} capture nothing${cause}.`;
  return { id: `captureLost.${chamber}`, text, beats: beatsWith(reading, chamber, false) };
}

function refractoryFinding(chamber: StimulusChamber, count: number, reading: ReadingFigures): Finding {
  const beats = reading.beats.filter(
    (beat) => beat.stimuli.includes(chamber) && beat.reasons.includes('refractoryTissue'),
  );
  return {
    id: `refractory.${chamber}`,
    text: `${countOf(count, 'stimulus', 'stimuli')} in the ${chamberName[chamber]} cannot capture: ${reasonWords.refractoryTissue}. Capture cannot be judged there.`,
    beats: numbers(beats),
  };
}

function interventricularFinding(reading: ReadingFigures): Finding[] {
  const interval = reading.interventricularIntervalMs;
  if (interval === null) return [];
  const beats = numbers(reading.beats.filter((beat) => beat.interventricularIntervalMs !== null));
  const text =
    interval === 0
      ? 'Both ventricles are stimulated together.'
      : `Two ventricular stimuli, ${Math.abs(Math.round(interval))} ms apart, the ${interval > 0 ? 'right' : 'left'} ventricle first.`;
  return [{ id: 'interventricularInterval', text, beats }];
}

const originSubject: Record<Exclude<BeatReading['origin'], 'none'>, (count: number) => string> = {
  paced: (count) => (count === 1 ? 'One beat is paced' : `${capitalised(numberWord(count))} beats are paced`),
  conducted: (count) =>
    count === 1 ? 'One beat is conducted' : `${capitalised(numberWord(count))} beats are conducted`,
  junctionalEscape: (count) => countOf(count, 'junctional escape', 'junctional escapes'),
  ventricularEscape: (count) => countOf(count, 'ventricular escape', 'ventricular escapes'),
};

function originFindings(reading: ReadingFigures): Finding[] {
  const kinds = Object.keys(originSubject) as (keyof typeof originSubject)[];
  const present = kinds
    .map((origin) => ({ origin, beats: reading.beats.filter((beat) => beat.origin === origin) }))
    .filter(({ beats }) => beats.length > 0);
  return present.map(({ origin, beats }) => {
    const duration = mean(beats.flatMap((beat) => beat.qrsDurationMs ?? []));
    const pr = mean(beats.flatMap((beat) => (origin === 'conducted' ? (beat.prIntervalMs ?? []) : [])));
    const interval = pr === null ? '' : `PR ${Math.round(pr)} ms, `;
    const text = `${originSubject[origin](beats.length)}: ${interval}QRS ${Math.round(duration ?? 0)} ms.`;
    return { id: `origin.${origin}`, text, beats: numbers(beats) };
  });
}

function fusionFindings(reading: ReadingFigures): Finding[] {
  const fused = reading.beats.filter((beat) => beat.fusion);
  const pseudofused = reading.beats.filter((beat) => beat.pseudofusion);
  const findings: Finding[] = [];
  if (fused.length > 0) {
    const text = `${countOf(fused.length, 'fusion beat', 'fusion beats')}: part of the ventricles is paced, part conducted.`;
    findings.push({ id: 'fusion', text, beats: numbers(fused) });
  }
  if (pseudofused.length > 0) {
    const text = `${countOf(pseudofused.length, 'pseudofusion beat', 'pseudofusion beats')}: the stimulus falls in a QRS that it does not change.`;
    findings.push({ id: 'pseudofusion', text, beats: numbers(pseudofused) });
  }
  return findings;
}

function axisWord(axisDeg: number): string {
  const axis = Math.round(axisDeg);
  return axis < 0 ? `−${-axis}°` : `${axis}°`;
}

function qrsTFinding(reading: ReadingFigures): Finding[] {
  const { qrsTRelation, frontalAxisDeg } = reading;
  if (qrsTRelation === null || frontalAxisDeg === null) return [];
  const judged = Object.values(qrsTRelation).filter((relation) => relation !== null);
  const discordant = judged.filter((relation) => relation === 'discordant').length;
  const text = `Frontal axis ${axisWord(frontalAxisDeg)}; T opposes QRS in ${discordant} of ${judged.length} leads in which both are large enough to judge.`;
  const beats = reading.beats.filter((beat) => beat.origin === reading.dominantOrigin);
  return [{ id: 'qrsTRelation', text, beats: numbers(beats) }];
}

function asystoleFinding(reading: ReadingFigures): Finding[] {
  if (reading.beats.some((beat) => beat.origin !== 'none')) return [];
  return [
    { id: 'asystole', text: 'No ventricular depolarization: asystole.', beats: numbers(reading.beats) },
  ];
}

/** Sentences in the order in which a strip is read: stimuli, capture, beats, complexes. */
export function findingsOf(events: readonly StripEvent[], reading: ReadingFigures): Finding[] {
  return [
    pacingFinding(reading),
    ...captureFindings(events, reading),
    ...interventricularFinding(reading),
    ...asystoleFinding(reading),
    ...originFindings(reading),
    ...fusionFindings(reading),
    ...qrsTFinding(reading),
  ];
}
