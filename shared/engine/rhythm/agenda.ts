import type { DepolarizationEvent, SenseCause } from '../events';

/**
 * Kinds of things that can be due, in the order in which they are handled when due at the same microsecond
 * (timing-cycles rules, section 1): so a sense at the very end of an escape interval inhibits.
 */
export const agendaKinds = [
  'armPrematureVentricle',
  'armPrematureAtrium',
  'nodeExit',
  'retrograde',
  'prematureVentricle',
  'prematureAtrium',
  'atrialRhythm',
  'escape',
  'sense',
  'oversensing',
  'secondSite',
  'ventricularPace',
  'atrialPace',
] as const;
export type AgendaKind = (typeof agendaKinds)[number];

/** What a sense comes from; kept until the sense is due. Times in µs. */
export interface PendingSense {
  timeUs: number;
  chamber: 'atrium' | 'ventricle';
  cause: SenseCause;
  /** The depolarization behind it is a fibrillation wave, which a lead sees at half its signal. */
  halfSignal?: boolean;
  /** The depolarization that reaches the lead; absent for crosstalk and false senses. */
  depolarization?: DepolarizationEvent;
}

/**
 * What is due next. Every kind has one time at most, but for senses, of which several can be under way. Times are
 * whole microseconds.
 */
export interface Agenda {
  set(kind: Exclude<AgendaKind, 'sense'>, timeUs: number): void;
  clear(kind: Exclude<AgendaKind, 'sense'>): void;
  dueUs(kind: Exclude<AgendaKind, 'sense'>): number | null;
  addSense(sense: PendingSense): void;
  /** The earliest kind and its time; ties by the order of `agendaKinds`. */
  next(): { kind: AgendaKind; timeUs: number };
  /** Takes the earliest sense off the agenda. */
  takeSense(): PendingSense;
}

export function createAgenda(): Agenda {
  const due = new Map<AgendaKind, number>();
  const senses: PendingSense[] = [];
  const timeOf = (kind: AgendaKind): number =>
    kind === 'sense' ? (senses[0]?.timeUs ?? Infinity) : (due.get(kind) ?? Infinity);
  return {
    set: (kind, timeUs) => void due.set(kind, timeUs),
    clear: (kind) => void due.delete(kind),
    dueUs: (kind) => due.get(kind) ?? null,
    addSense(sense) {
      const later = senses.findIndex((other) => other.timeUs > sense.timeUs);
      senses.splice(later === -1 ? senses.length : later, 0, sense);
    },
    next() {
      let first: { kind: AgendaKind; timeUs: number } = { kind: 'nodeExit', timeUs: Infinity };
      for (const kind of agendaKinds) {
        const timeUs = timeOf(kind);
        if (timeUs < first.timeUs) first = { kind, timeUs };
      }
      return first;
    },
    takeSense() {
      const sense = senses.shift();
      if (!sense) throw new Error('no sense is due');
      return sense;
    },
  };
}
