import type { StripEvent, VentricularDepolarization } from '../events';
import type { ComplexMeasures } from '../reading/complex';
import type { RenderedEvents } from './electrode-signal';

/** Events that were fetched for the samples ahead and are not yet put out. */
export interface EventQueue {
  add(rendered: RenderedEvents): void;
  /** Takes every event before a time, with the measured complexes that belong to them. */
  takeBefore(timeS: number): RenderedEvents;
}

export function createEventQueue(): EventQueue {
  let pending: StripEvent[] = [];
  const complexes = new Map<VentricularDepolarization, ComplexMeasures>();
  return {
    add(rendered) {
      pending.push(...rendered.events);
      for (const [event, complex] of rendered.complexes) complexes.set(event, complex);
    },
    takeBefore(timeS) {
      const kept = pending.findIndex((event) => event.timeS >= timeS);
      const events = kept === -1 ? pending : pending.slice(0, kept);
      pending = kept === -1 ? [] : pending.slice(kept);
      const taken: RenderedEvents = { events, complexes: new Map() };
      for (const event of events) {
        if (event.type !== 'depolarization' || event.chamber !== 'ventricle') continue;
        const complex = complexes.get(event);
        if (complex) taken.complexes.set(event, complex);
        complexes.delete(event);
      }
      return taken;
    },
  };
}
