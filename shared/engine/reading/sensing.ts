import type { DepolarizationEvent, MarkerEvent, StripEvent } from '../events';

export type SensingState = 'appropriate' | 'undersensing' | 'oversensing' | 'notAssessable';
/** The left lead never senses. */
export type SensingByChamber = Record<'atrium' | 'rightVentricle' | 'leftVentricle', SensingState>;

/** A sense that no depolarization stands behind. */
export function isFalseSense(event: StripEvent): event is MarkerEvent {
  return event.type === 'marker' && (event.cause === 'oversensing' || event.cause === 'crosstalk');
}

/** A false sense that the device took for an event of the chamber. */
export function isOversensed(event: StripEvent, chamber: 'atrium' | 'ventricle'): event is MarkerEvent {
  if (!isFalseSense(event)) return false;
  return event.code === (chamber === 'atrium' ? 'atrialSense' : 'ventricularSense');
}

/** Depolarizations that had to be sensed in a chamber. */
function alertOnes(events: readonly StripEvent[], chamber: 'atrium' | 'ventricle'): DepolarizationEvent[] {
  return events.filter(
    (event): event is DepolarizationEvent =>
      event.type === 'depolarization' && event.chamber === chamber && event.sensed !== undefined,
  );
}

/** Of two faults the more frequent names the state; a lead that never had to sense is not judged. */
function sensingState(events: readonly StripEvent[], chamber: 'atrium' | 'ventricle'): SensingState {
  const judged = alertOnes(events, chamber);
  const missed = judged.filter((event) => event.sensed === false).length;
  const invented = events.filter((event) => isOversensed(event, chamber)).length;
  if (missed === 0 && invented === 0) return judged.length > 0 ? 'appropriate' : 'notAssessable';
  return invented > missed ? 'oversensing' : 'undersensing';
}

/** How each lead senses, from what reached it in alert windows and what the device made of it. */
export function sensingByChamber(events: readonly StripEvent[]): SensingByChamber {
  return {
    atrium: sensingState(events, 'atrium'),
    rightVentricle: sensingState(events, 'ventricle'),
    leftVentricle: 'notAssessable',
  };
}
