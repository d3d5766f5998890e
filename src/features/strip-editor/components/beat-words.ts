import { chamberNames } from '../../../../shared/engine/chamber-names';
import type { BeatReading } from '../../../../shared/engine/reading/beat-reading';
import type { CaptureFailure } from '../../../../shared/engine/events';

const origins: Record<BeatReading['origin'], string> = {
  conducted: 'Conducted from the atria',
  paced: 'Paced',
  premature: 'Premature ventricular beat',
  junctionalEscape: 'Junctional escape',
  ventricularEscape: 'Ventricular escape',
  none: 'Stimulus without a beat',
};

const failures: Record<CaptureFailure, string> = {
  belowThreshold: 'output below the threshold',
  refractoryTissue: 'muscle refractory',
  fault: 'a fault',
};

const atria: Record<NonNullable<BeatReading['atrialOrigin']>, string> = {
  sinus: 'sinus P wave before it',
  tachycardia: 'atrial tachycardia',
  flutter: 'atrial flutter',
  fibrillation: 'atrial fibrillation',
  paced: 'paced P wave before it',
  premature: 'premature P wave before it',
  retrograde: 'retrograde P wave before it',
};

function stimulusWords({ stimuli, captured, pseudofusion, reasons }: BeatReading): string | null {
  if (stimuli.length === 0) return null;
  const where = [...new Set(stimuli.map((chamber) => chamberNames[chamber]))].join(' and ');
  if (pseudofusion) return `stimulus (${where}) in its QRS changes nothing: pseudofusion`;
  if (captured) return `stimulus from ${where} captures`;
  return `stimulus from ${where} captures nothing: ${reasons.map((reason) => failures[reason]).join(', ')}`;
}

const ms = (name: string, value: number | null): string | null =>
  value === null ? null : `${name} ${Math.round(value)} ms`;

/** One beat in a line of words. */
export function beatWords(beat: BeatReading): string {
  const parts = [
    origins[beat.origin],
    stimulusWords(beat),
    beat.fusion ? 'fusion' : null,
    beat.sensed === false ? 'not sensed' : null,
    beat.atrialOrigin && atria[beat.atrialOrigin],
    beat.atrialCaptured === false ? 'atrial stimulus captures nothing' : null,
    ms('PR', beat.prIntervalMs),
    ms('AV', beat.avIntervalMs),
    ms('QRS', beat.qrsDurationMs),
    ms('QT', beat.qtMs),
    ms('RR', beat.rrMs),
  ];
  return `${parts.filter((part) => part !== null).join(', ')}.`;
}
