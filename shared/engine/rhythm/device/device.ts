import type { PendingSense } from '../agenda';

/** A pacemaker: it acts only when a timer of its own is due, or on what its leads sense. Times in µs. */
export interface Device {
  atrialPace(timeUs: number): void;
  ventricularPace(timeUs: number): void;
  secondSite(timeUs: number): void;
  sense(sense: PendingSense): void;
  /** Whether a signal in a chamber would be taken for an event now: not blanked, not in a refractory period. */
  isAlert(chamber: PendingSense['chamber'], timeUs: number): boolean;
}

/** No pacemaker: nothing is sensed and nothing is ever due. */
export const noDevice: Device = {
  atrialPace: () => undefined,
  ventricularPace: () => undefined,
  secondSite: () => undefined,
  sense: () => undefined,
  isAlert: () => false,
};
