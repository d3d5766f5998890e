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

function nameOf(stimulus: StimulusEvent, bothVentricles: boolean): string {
  const { chamber, reason, pseudofusion } = stimulus;
  const ventricular = chamber === 'rightVentricle' || chamber === 'leftVentricle';
  const words = ventricular && !bothVentricles ? 'ventricular stimulus' : chamberWords[chamber];
  if (pseudofusion) return `${words}, pseudofusion`;
  return words + (reason ? failureWords[reason] : '');
}

/** The first stimulus of every kind among `events`: by chamber, and by why it did not capture. */
export function namedStimuli(events: readonly StripEvent[]): NamedStimulus[] {
  const stimuli = events.filter((event) => event.type === 'stimulus');
  const chambers = new Set(stimuli.map((stimulus) => stimulus.chamber));
  const both = chambers.has('rightVentricle') && chambers.has('leftVentricle');
  const named = new Map<string, NamedStimulus>();
  for (const stimulus of stimuli) {
    const text = nameOf(stimulus, both);
    if (named.has(text)) continue;
    const widthMm = textWidthMm(text, textStyles.stimulusName);
    named.set(text, { timeS: stimulus.timeS, atrial: stimulus.chamber === 'atrium', text, widthMm });
  }
  return [...named.values()];
}
