import type { PatientParameters } from '../../parameters/strip-parameters';
import { msToUs, rateToIntervalUs } from '../../units';
import type { RandomStream } from '../random';

/** An intact node's refractory period and full recovery time, ms (timing-cycles rules, section 3; chosen). */
const intactRefractoryUs = msToUs(100);
const intactRecoveryUs = msToUs(250);
/** How much of the missing recovery is added to the PR interval (chosen: linear, so that sums go by hand). */
const decrement = 0.5;
/** First lengthening of PR in a Wenckebach group, ms; each further one is half of the last. */
const firstIncrementMs = 80;
/** A ventricular beat from below conceals itself in the node and shuts it for this long. */
const concealedPenetrationUs = msToUs(350);
/** A node used less than this before a ventricular beat does not conduct it up. */
const retrogradeRestUs = msToUs(300);
/** Fibrillation waves that a node lets in (exponential tail of RR: NR-27). */
const fibrillationShare = 0.5;

type NodeParameters = Pick<
  PatientParameters,
  'avConduction' | 'prIntervalMs' | 'conductedPerGroup' | 'atrialRateBpm' | 'atrialRhythm'
>;

/** The AV node: conducts what the atria send, with decrement, and is invaded from below. Times in µs. */
export interface AvNode {
  /** When an impulse under way will reach the ventricles; null without one, or when it will stop below the node. */
  arrivalUs(): number | null;
  /** An atrial impulse meets one from below: both end, and the way up is closed as by any impulse from above. */
  collide(timeUs: number): void;
  /** An atrial impulse arrives; returns when it will leave the node, or null when it is blocked. */
  enter(timeUs: number): number | null;
  /** The impulse under way leaves the node; returns whether it reaches the ventricles. */
  exit(timeUs: number): boolean;
  /** A ventricular beat that did not come through the node enters it from below; returns whether it passes upwards. */
  enterFromBelow(timeUs: number, mayPass: boolean): boolean;
}

interface Recovery {
  refractoryUs: number;
  fullUs: number;
}

/**
 * Recovery that lets groups of `conductedPerGroup` emerge by themselves: PR grows by 80, 40, 20 … ms, and the impulse
 * after the last finds the node refractory.
 */
function recoveryOf(parameters: NodeParameters): Recovery {
  if (parameters.avConduction !== 'wenckebach') {
    return { refractoryUs: intactRefractoryUs, fullUs: intactRecoveryUs };
  }
  const cycleUs = rateToIntervalUs(parameters.atrialRateBpm);
  const intervals = [parameters.prIntervalMs];
  for (let i = 1; i < parameters.conductedPerGroup; i++) {
    intervals.push(intervals[i - 1] + firstIncrementMs * 0.5 ** (i - 1));
  }
  const [beforeLast, last] = intervals.slice(-2);
  return {
    fullUs: cycleUs - msToUs(parameters.prIntervalMs) + msToUs(2 * firstIncrementMs),
    refractoryUs: cycleUs - msToUs((beforeLast + last) / 2),
  };
}

export function createAvNode(parameters: NodeParameters, random: RandomStream): AvNode {
  const { avConduction, atrialRhythm, conductedPerGroup } = parameters;
  const prUs = msToUs(parameters.prIntervalMs);
  const recovery = recoveryOf(parameters);
  const perGroup =
    avConduction === 'mobitzTwo' ? conductedPerGroup : avConduction === 'twoToOne' ? 1 : Infinity;
  let lastExitUs = -Infinity;
  let closedUntilUs = -Infinity;
  let lastUseUs = -Infinity;
  let pending: { exitUs: number; stopsBelow: boolean } | null = null;
  let conducted = 0;

  const isBlocked = (timeUs: number): boolean =>
    avConduction === 'complete' ||
    (pending !== null && timeUs < pending.exitUs) ||
    timeUs < closedUntilUs ||
    timeUs - lastExitUs < recovery.refractoryUs ||
    (atrialRhythm === 'fibrillation' && random.uniform() >= fibrillationShare);

  return {
    arrivalUs: () => (pending && !pending.stopsBelow ? pending.exitUs : null),
    collide: (timeUs) => void (lastUseUs = timeUs),
    enter(timeUs) {
      lastUseUs = timeUs;
      if (isBlocked(timeUs)) return null;
      const missing = Math.max(0, recovery.fullUs - (timeUs - lastExitUs));
      const stopsBelow = conducted >= perGroup;
      conducted = stopsBelow ? 0 : conducted + 1;
      pending = { exitUs: timeUs + prUs + Math.round(decrement * missing), stopsBelow };
      return pending.exitUs;
    },
    exit(timeUs) {
      const passes = pending?.stopsBelow !== true;
      lastExitUs = timeUs;
      lastUseUs = timeUs;
      pending = null;
      return passes;
    },
    enterFromBelow(timeUs, mayPass) {
      const collides = pending !== null;
      pending = null;
      lastExitUs = timeUs;
      closedUntilUs = timeUs + concealedPenetrationUs;
      const passes = mayPass && !collides && timeUs >= lastUseUs + retrogradeRestUs;
      if (passes) lastUseUs = timeUs;
      return passes;
    },
  };
}
