import type { StripParameters } from '../../parameters/strip-parameters';
import { msToUs, usPerS } from '../../units';
import type { StripEvent } from '../events';
import { createAgenda, type AgendaKind } from './agenda';
import { createDevice } from './device/create-device';
import { createFaults } from './faults';
import { createPatient } from './patient';

/** A strip is cut from a run that began this long before it. */
export const preRollS = 30;
/** A depolarization may gain a source or fusion for this long after its time, so events are held back for it. */
export const releaseLagMs = 150;

/** The rhythm as a stream of events. */
export interface Rhythm {
  /**
   * All events before `untilUs` (µs from the start of the strip) that were not given out yet, in time order and
   * final. Events of the pre-roll have negative times. The size of the steps changes nothing.
   */
  advance(untilUs: number): StripEvent[];
}

/** Patient and pacemaker, run as discrete events from 30 s before the strip. */
export function createRhythm(parameters: Pick<StripParameters, 'seed' | 'patient' | 'pacing'>): Rhythm {
  const startUs = -preRollS * usPerS;
  const agenda = createAgenda();
  let held: StripEvent[] = [];
  const emit = (event: StripEvent): void => void held.push(event);
  const faults = createFaults(parameters.pacing.faults, parameters.seed, startUs);
  const patient = createPatient(parameters, startUs, agenda, emit);
  const device = createDevice(parameters, startUs, faults, patient, agenda, emit);

  const armOversensing = (): void => agenda.set('oversensing', faults.nextFalseSenseUs());
  armOversensing();
  const handle: Record<AgendaKind, (timeUs: number) => void> = {
    armPrematureVentricle: (timeUs) => patient.armPrematureVentricle(timeUs),
    armPrematureAtrium: (timeUs) => patient.armPrematureAtrium(timeUs),
    nodeExit: (timeUs) => patient.nodeExit(timeUs),
    retrograde: (timeUs) => patient.retrograde(timeUs),
    prematureVentricle: (timeUs) => patient.prematureVentricle(timeUs),
    prematureAtrium: (timeUs) => patient.prematureAtrium(timeUs),
    atrialRhythm: (timeUs) => patient.atrialDischarge(timeUs),
    escape: (timeUs) => patient.escape(timeUs),
    sense: () => device.sense(agenda.takeSense()),
    oversensing: () => {
      const sense = faults.takeFalseSense();
      if (sense) device.sense({ ...sense, cause: 'oversensing' });
      armOversensing();
    },
    secondSite: (timeUs) => device.secondSite(timeUs),
    ventricularPace: (timeUs) => device.ventricularPace(timeUs),
    atrialPace: (timeUs) => device.atrialPace(timeUs),
  };
  const runUntil = (untilUs: number): void => {
    for (let next = agenda.next(); next.timeUs < untilUs; next = agenda.next())
      handle[next.kind](next.timeUs);
  };

  return {
    advance(untilUs) {
      runUntil(untilUs + msToUs(releaseLagMs));
      const untilS = untilUs / usPerS;
      const kept = held.findIndex((event) => event.timeS >= untilS);
      const released = kept === -1 ? held : held.slice(0, kept);
      held = kept === -1 ? [] : held.slice(kept);
      return released;
    },
  };
}
