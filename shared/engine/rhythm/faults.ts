import type { Fault, FaultKind } from '../../parameters/faults';
import { msToUs, usPerS } from '../../units';
import type { StimulusChamber } from '../events';
import { randomStream } from '../random';

export type FaultChamber = Fault['chamber'];

/** The chest pads count as the right ventricle. */
export function faultChamber(chamber: StimulusChamber): FaultChamber {
  return chamber === 'chest' ? 'rightVentricle' : chamber;
}

/** Faults as they strike. Times in µs; every draw has its own stream, so that faults shift nothing else. */
export interface Faults {
  /** Whether a fault of a kind strikes a stimulus or sense now; draws once per active fault with a proportion. */
  strikes(kind: Exclude<FaultKind, 'oversensing'>, chamber: FaultChamber, timeUs: number): boolean;
  /** When the next false sense comes; Infinity when none does. */
  nextFalseSenseUs(): number;
  /** Takes that false sense; null when the draw of its fault spares it. */
  takeFalseSense(): { timeUs: number; chamber: 'atrium' | 'ventricle' } | null;
}

interface RunningFault extends Fault {
  fromUs: number;
  toUs: number;
  hits(): boolean;
}

/** False senses of one fault, one after another. */
interface FalseSenses {
  chamber: 'atrium' | 'ventricle';
  nextUs: number;
  /** Goes on to the next; returns whether this one is heard. */
  take(): boolean;
}

function falseSenses(fault: RunningFault): FalseSenses {
  const everyUs = msToUs(fault.intervalMs);
  // A fault from 0 was there before the strip, on the same grid.
  const originUs = Math.round(fault.fromS * usPerS);
  const firstUs = originUs + Math.ceil((fault.fromUs - originUs) / everyUs) * everyUs;
  const untilEnd = (timeUs: number): number => (timeUs < fault.toUs ? timeUs : Infinity);
  const senses: FalseSenses = {
    chamber: fault.chamber === 'atrium' ? 'atrium' : 'ventricle',
    nextUs: untilEnd(firstUs),
    take() {
      senses.nextUs = untilEnd(senses.nextUs + everyUs);
      return fault.hits();
    },
  };
  return senses;
}

export function createFaults(faults: readonly Fault[], seed: number, startUs: number): Faults {
  const running = faults.map((fault, i): RunningFault => {
    const random = randomStream(seed, `fault:${i}`);
    return {
      ...fault,
      fromUs: fault.fromS === 0 ? startUs : Math.round(fault.fromS * usPerS),
      toUs: fault.toS === null ? Infinity : Math.round(fault.toS * usPerS),
      hits: () => fault.proportion >= 1 || random.uniform() < fault.proportion,
    };
  });
  const oversensing = running
    .filter((fault) => fault.kind === 'oversensing' && fault.proportion > 0)
    .map(falseSenses);
  const first = (): FalseSenses | undefined =>
    oversensing.reduce<FalseSenses | undefined>(
      (least, one) => (least === undefined || one.nextUs < least.nextUs ? one : least),
      undefined,
    );
  return {
    strikes: (kind, chamber, timeUs) =>
      running
        .filter(
          (fault) =>
            fault.kind === kind && fault.chamber === chamber && timeUs >= fault.fromUs && timeUs < fault.toUs,
        )
        .map((fault) => fault.hits())
        .some(Boolean),
    nextFalseSenseUs: () => first()?.nextUs ?? Infinity,
    takeFalseSense() {
      const next = first();
      if (!next || next.nextUs === Infinity) throw new Error('no false sense is due');
      const taken = { timeUs: next.nextUs, chamber: next.chamber };
      return next.take() ? taken : null;
    },
  };
}
