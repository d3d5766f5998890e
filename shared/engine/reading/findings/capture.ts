import type { CaptureFailure, StimulusChamber, StimulusEvent, StripEvent } from '../../events';
import { stimuliOf } from '../capture';
import type { Finding, ReadingFigures } from '../reading';
import { countOf, numberWord } from '../words';
import { chamberNames } from '../../chamber-names';
import { capitalised, numbersOf, reasonWords } from './chamber-words';

const lossReasons = ['belowThreshold', 'fault'] as const satisfies CaptureFailure[];

function beatsOf(reading: ReadingFigures, chamber: StimulusChamber, reason: CaptureFailure | null): number[] {
  if (chamber === 'atrium') {
    return numbersOf(reading.beats.filter((beat) => beat.atrialCaptured === (reason === null)));
  }
  return numbersOf(
    reading.beats.filter(
      (beat) => beat.stimuli.includes(chamber) && (reason === null || beat.reasons.includes(reason)),
    ),
  );
}

function lossFinding(
  reading: ReadingFigures,
  chamber: StimulusChamber,
  judged: readonly StimulusEvent[],
  reason: (typeof lossReasons)[number],
): Finding[] {
  const lost = judged.filter((stimulus) => stimulus.reason === reason).length;
  if (lost === 0) return [];
  const where = chamber === 'chest' ? 'through the chest pads' : `in the ${chamberNames[chamber]}`;
  const subject =
    lost === judged.length
      ? `No stimulus ${where} captures`
      : `${capitalised(numberWord(lost))} of ${numberWord(judged.length)} stimuli ${where} ${lost === 1 ? 'captures' : 'capture'} nothing`;
  return [
    {
      id: reason === 'fault' ? `captureFault.${chamber}` : `captureLost.${chamber}`,
      text: `${subject}: ${reasonWords[reason]}.`,
      beats: beatsOf(reading, chamber, reason),
    },
  ];
}

function chamberFindings(
  events: readonly StripEvent[],
  reading: ReadingFigures,
  chamber: StimulusChamber,
): Finding[] {
  const stimuli = stimuliOf(events, chamber);
  const judged = stimuli.filter((stimulus) => stimulus.reason !== 'refractoryTissue');
  const refractory = stimuli.length - judged.length;
  const where = chamber === 'chest' ? 'through the chest pads' : `in the ${chamberNames[chamber]}`;
  const findings = lossReasons.flatMap((reason) => lossFinding(reading, chamber, judged, reason));
  if (judged.length > 0 && findings.length === 0) {
    findings.push({
      id: `capture.${chamber}`,
      text: `Every stimulus ${where} captures.`,
      beats: beatsOf(reading, chamber, null),
    });
  }
  if (refractory > 0) {
    findings.push({
      id: `refractory.${chamber}`,
      text: `${countOf(refractory, 'stimulus', 'stimuli')} ${where} cannot capture: ${reasonWords.refractoryTissue}. Capture cannot be judged there.`,
      beats: chamber === 'atrium' ? [] : beatsOf(reading, chamber, 'refractoryTissue'),
    });
  }
  return findings;
}

/** Whether stimuli capture, chamber by chamber; why not where they do not. */
export function captureFindings(events: readonly StripEvent[], reading: ReadingFigures): Finding[] {
  return reading.pacedChambers.flatMap((chamber) => chamberFindings(events, reading, chamber));
}
