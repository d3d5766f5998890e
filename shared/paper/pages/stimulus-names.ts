import type { CaptureFailure, StimulusChamber, StimulusEvent, StripEvent } from '../../engine/events';
import { textWidthMm } from '../text';
import { textStyles } from '../text-styles';

/** A stimulus that is the first of its kind. */
export interface NamedStimulus {
  timeS: number;
  atrial: boolean;
  text: string;
  widthMm: number;
}

const chamberWords: Readonly<Record<StimulusChamber, string>> = {
  atrium: 'atrial stimulus',
  rightVentricle: 'right ventricular stimulus',
  leftVentricle: 'left ventricular stimulus',
  chest: 'transcutaneous stimulus',
};

const failureWords: Readonly<Record<CaptureFailure, string>> = {
  belowThreshold: ', no capture: below threshold',
  refractoryTissue: ', no capture: tissue refractory',
  fault: ', no capture',
};

/** Slack for times that are whole microseconds kept as seconds. */
const sameTimeS = 1e-9;

/** Whether a stimulus shares its beat with a front of the heart's own. */
function fuses({ timeS, chamber }: StimulusEvent, events: readonly StripEvent[]): boolean {
  return events.some(
    (event) =>
      event.type === 'depolarization' &&
      event.fusion &&
      event.sources.some((source) => source.site === chamber && Math.abs(source.timeS - timeS) < sameTimeS),
  );
}

function nameOf(stimulus: StimulusEvent, bothVentricles: boolean, events: readonly StripEvent[]): string {
  const { chamber, reason, pseudofusion } = stimulus;
  const ventricular = chamber === 'rightVentricle' || chamber === 'leftVentricle';
  const words = ventricular && !bothVentricles ? 'ventricular stimulus' : chamberWords[chamber];
  if (pseudofusion) return `${words}, pseudofusion`;
  if (reason) return words + failureWords[reason];
  return fuses(stimulus, events) ? `${words}, fusion` : words;
}

/** The first stimulus of every kind among `events`: by chamber, and by fusion or why it did not capture. */
export function namedStimuli(events: readonly StripEvent[]): NamedStimulus[] {
  const stimuli = events.filter((event) => event.type === 'stimulus');
  const chambers = new Set(stimuli.map((stimulus) => stimulus.chamber));
  const both = chambers.has('rightVentricle') && chambers.has('leftVentricle');
  const named = new Map<string, NamedStimulus>();
  for (const stimulus of stimuli) {
    const text = nameOf(stimulus, both, events);
    if (named.has(text)) continue;
    const widthMm = textWidthMm(text, textStyles.stimulusName);
    named.set(text, { timeS: stimulus.timeS, atrial: stimulus.chamber === 'atrium', text, widthMm });
  }
  return [...named.values()];
}
