import type { MarkerEvent, StripEvent } from '../engine/events';
import {
  atrialBlankingAfterVentricleUs,
  atrialBlankingUs,
  deviceIntervals,
  singleChamberBlankingUs,
  ventricularBlankingUs,
} from '../engine/rhythm/device/intervals';
import { actingMode } from '../parameters/applies';
import type { PacingParameters } from '../parameters/strip-parameters';
import { usToS } from '../units';

/** A stretch of time in which a channel of the device is deaf, notes without acting, or acts on what it hears. */
export interface SensingWindow {
  channel: 'atrium' | 'ventricle';
  kind: 'blanking' | 'refractory' | 'crosstalk' | 'alert';
  label: string;
  fromS: number;
  toS: number;
}

/** One channel, cut into windows as events come. Times in s. */
class Channel {
  readonly windows: SensingWindow[] = [];
  private plan: { kind: SensingWindow['kind']; label: string; untilS: number }[] = [];
  private atS: number | null = null;

  constructor(private readonly channel: SensingWindow['channel']) {}

  /** Writes what was planned up to a time. */
  private runTo(timeS: number): void {
    if (this.atS === null) return;
    for (const { kind, label, untilS } of this.plan) {
      const toS = Math.min(untilS, timeS);
      if (toS > this.atS) this.windows.push({ channel: this.channel, kind, label, fromS: this.atS, toS });
      this.atS = Math.max(this.atS, toS);
    }
    this.plan = this.plan.filter((window) => window.untilS > timeS);
  }

  /** From a time on: these windows, one after another, each until its end; the last has none. */
  start(timeS: number, plan: { kind: SensingWindow['kind']; label: string; untilS: number }[]): void {
    this.runTo(timeS);
    this.atS = timeS;
    this.plan = plan.filter((window) => window.untilS > timeS);
  }

  /** What comes after a time as it was planned, behind windows that go before it. */
  rest(timeS: number): { kind: SensingWindow['kind']; label: string; untilS: number }[] {
    return this.plan.filter((window) => window.untilS > timeS);
  }

  end(timeS: number): SensingWindow[] {
    this.runTo(timeS);
    return this.windows;
  }
}

const alert = { kind: 'alert', label: 'alert', untilS: Infinity } as const;

/**
 * The device's windows on its channels that sense, from its first event in the strip on (what went before is not in
 * the events). None for a device that senses nothing.
 */
export function sensingWindows(
  events: readonly StripEvent[],
  pacing: PacingParameters,
  durationS: number,
): SensingWindow[] {
  if (pacing.source === 'none') return [];
  const mode = actingMode(pacing);
  if (mode.endsWith('OO')) return [];
  const intervals = deviceIntervals(pacing, false);
  const atrium = new Channel('atrium');
  const ventricle = new Channel('ventricle');
  const after = (timeS: number, us: number): number => timeS + usToS(us);
  const markers = events.filter((event): event is MarkerEvent => event.type === 'marker');
  let atrialEventInCycle = false;
  let cycleKnown = false;
  /** End of the crosstalk window: a sense in it makes the channel deaf until then. */
  let deafUntilS = 0;

  const afterVentricle = (timeS: number, ectopic: boolean): void => {
    ventricle.start(timeS, [
      { kind: 'blanking', label: 'blanking', untilS: after(timeS, ventricularBlankingUs) },
      { kind: 'refractory', label: 'VRP', untilS: after(timeS, intervals.ventricularRefractoryUs) },
      alert,
    ]);
    if (mode === 'VVI') return;
    const pvarpUs = ectopic ? intervals.pvarpAfterEctopicUs : intervals.pvarpUs;
    atrium.start(timeS, [
      { kind: 'blanking', label: 'blanking', untilS: after(timeS, atrialBlankingAfterVentricleUs) },
      { kind: 'refractory', label: 'PVARP', untilS: after(timeS, pvarpUs) },
      alert,
    ]);
  };
  const afterAtrium = (timeS: number, paced: boolean): void => {
    if (mode === 'AAI') {
      atrium.start(timeS, [
        { kind: 'blanking', label: 'blanking', untilS: after(timeS, singleChamberBlankingUs) },
        { kind: 'refractory', label: 'ARP', untilS: after(timeS, intervals.pvarpUs) },
        alert,
      ]);
      return;
    }
    atrium.start(timeS, [
      { kind: 'blanking', label: 'blanking', untilS: after(timeS, atrialBlankingUs) },
      { kind: 'refractory', label: 'AV', untilS: Infinity },
    ]);
    if (!paced) return;
    const blankUntilS = after(timeS, intervals.postAtrialBlankingUs);
    const crosstalkUntilS = intervals.safetyUs === null ? blankUntilS : after(timeS, intervals.safetyUs);
    deafUntilS = crosstalkUntilS;
    // A refractory period that still runs goes before the crosstalk window.
    const running = ventricle.rest(timeS).filter((window) => window.kind === 'refractory');
    ventricle.start(timeS, [
      { kind: 'blanking', label: 'blanking', untilS: blankUntilS },
      ...running,
      { kind: 'crosstalk', label: 'crosstalk', untilS: crosstalkUntilS },
      alert,
    ]);
  };

  for (const { code, timeS, window } of markers) {
    if (code === 'atrialPace' || code === 'atrialSense') {
      afterAtrium(timeS, code === 'atrialPace');
      atrialEventInCycle = true;
    }
    const ventricular = code === 'ventricularPace' || code === 'safetyPace' || code === 'ventricularSense';
    if (window === 'crosstalk') {
      ventricle.start(timeS, [{ kind: 'blanking', label: 'blanking', untilS: deafUntilS }, alert]);
      continue;
    }
    if (!ventricular) continue;
    const ectopic = code === 'ventricularSense' && cycleKnown && !atrialEventInCycle;
    afterVentricle(timeS, ectopic);
    cycleKnown = true;
    atrialEventInCycle = false;
  }
  return [...atrium.end(durationS), ...ventricle.end(durationS)];
}
