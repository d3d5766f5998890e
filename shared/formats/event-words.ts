import { chamberNames } from '../engine/chamber-names';
import type {
  AtrialDepolarization,
  AtrialOrigin,
  AvBlock,
  CaptureFailure,
  DepolarizationEvent,
  StimulusEvent,
  StripEvent,
  VentricularDepolarization,
  VentricularOrigin,
} from '../engine/events';

/** What annotations are made of: stimuli and depolarizations; a device's own markers are left to the events file. */
export type AnnotatedEvent = StimulusEvent | DepolarizationEvent;

const failures: Record<CaptureFailure, string> = {
  belowThreshold: 'output below the threshold',
  refractoryTissue: 'muscle refractory',
  fault: 'fault',
};

const ventricularOrigins: Record<VentricularOrigin, string> = {
  conducted: 'conducted',
  paced: 'paced',
  premature: 'premature ventricular',
  junctionalEscape: 'junctional escape',
  ventricularEscape: 'ventricular escape',
};

const atrialOrigins: Record<AtrialOrigin, string> = {
  sinus: 'sinus',
  tachycardia: 'atrial tachycardia',
  flutter: 'atrial flutter',
  fibrillation: 'atrial fibrillation',
  paced: 'paced',
  premature: 'premature',
  retrograde: 'retrograde',
};

const blocks: Record<AvBlock, string> = {
  inNode: 'blocked in the AV node',
  belowNode: 'blocked below the AV node',
  collision: 'stopped by an impulse from below',
};

/** Stimuli and depolarizations in time order. */
export function annotatedEvents(events: readonly StripEvent[]): AnnotatedEvent[] {
  return events.filter((event) => event.type !== 'marker');
}

function stimulusWords({ chamber, captured, reason, pseudofusion }: StimulusEvent): string {
  const parts = [`Stimulus, ${chamberNames[chamber]}`, captured ? 'captured' : 'no capture'];
  if (reason) parts.push(failures[reason]);
  if (pseudofusion) parts.push('pseudofusion');
  return parts.join(', ');
}

function atrialWords({ origin, fusion, sensed, blocked }: AtrialDepolarization): string {
  const parts = ['P wave', atrialOrigins[origin]];
  if (fusion) parts.push('fusion');
  if (blocked) parts.push(blocks[blocked]);
  if (sensed === false) parts.push('not sensed');
  return parts.join(', ');
}

function ventricularWords({ origin, fusion, sensed }: VentricularDepolarization): string {
  const parts = ['QRS', ventricularOrigins[origin]];
  if (fusion) parts.push('fusion');
  if (sensed === false) parts.push('not sensed');
  return parts.join(', ');
}

/**
 * An event in plain words, such as `Stimulus, right ventricle, no capture, output below the threshold` or
 * `QRS, paced, fusion`; ASCII only. The time of a depolarization is its onset.
 */
export function eventWords(event: AnnotatedEvent): string {
  if (event.type === 'stimulus') return stimulusWords(event);
  return event.chamber === 'atrium' ? atrialWords(event) : ventricularWords(event);
}
