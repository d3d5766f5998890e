import type { Finding, ReadingFigures } from '../reading';
import { listWords } from '../words';
import { chamberNames } from '../../chamber-names';
import { capitalised, numbersOf } from './chamber-words';

function pacedChambersFinding(reading: ReadingFigures): Finding {
  const { pacedChambers, beats } = reading;
  if (pacedChambers.length === 0) {
    return { id: 'noStimulus', text: 'No stimulus is given.', beats: numbersOf(beats) };
  }
  if (pacedChambers.includes('chest')) {
    const stimulated = beats.filter((beat) => beat.stimuli.length > 0);
    return {
      id: 'pacedChambers',
      text: 'Stimuli are given through chest pads.',
      beats: numbersOf(stimulated),
    };
  }
  const chambers = listWords(pacedChambers.map((chamber) => chamberNames[chamber]));
  const sequence =
    pacedChambers.includes('atrium') && pacedChambers.length > 1 && reading.avIntervalMs !== null
      ? ` in sequence, ${Math.round(reading.avIntervalMs)} ms apart`
      : '';
  const verb = pacedChambers.length > 1 ? 'are' : 'is';
  const stimulated = beats.filter((beat) => beat.stimuli.length > 0 || beat.atrialCaptured !== null);
  return {
    id: 'pacedChambers',
    text: `${capitalised(chambers)} ${verb} stimulated${sequence}.`,
    beats: numbersOf(stimulated),
  };
}

function interventricularFinding(reading: ReadingFigures): Finding[] {
  const interval = reading.interventricularIntervalMs;
  if (interval === null) return [];
  const beats = numbersOf(reading.beats.filter((beat) => beat.interventricularIntervalMs !== null));
  const text =
    interval === 0
      ? 'Both ventricles are stimulated together.'
      : `Two ventricular stimuli, ${Math.abs(Math.round(interval))} ms apart, the ${interval > 0 ? 'right' : 'left'} ventricle first.`;
  return [{ id: 'interventricularInterval', text, beats }];
}

/** Which chambers are stimulated, and how far apart. */
export function pacingFindings(reading: ReadingFigures): Finding[] {
  return [pacedChambersFinding(reading), ...interventricularFinding(reading)];
}
