import type { PatientParameters } from '../../parameters/strip-parameters';
import { msToUs } from '../../units';

/** An intact node's refractory period and full recovery time, ms (timing-cycles rules, section 3; chosen). */
const effectiveRefractoryUs = msToUs(100);
const fullRecoveryUs = msToUs(250);
/** How much of the missing recovery is added to the PR interval (chosen: linear, so that sums go by hand). */
const decrement = 0.5;
/** A ventricular beat from below conceals itself in the node and shuts it for this long, ms. */
const concealedPenetrationUs = msToUs(350);

/** The AV node: conducts what the atria send, with decrement, and is invaded from below. Times in µs. */
export interface AvNode {
  /** When an impulse under way leaves the node; null without one. */
  pendingExitUs(): number | null;
  /** An atrial impulse arrives; returns when it will leave the node, or null when it is blocked. */
  enter(timeUs: number): number | null;
  /** The impulse under way leaves the node. */
  exit(timeUs: number): void;
  /** A ventricular beat that did not come through the node enters it from below. */
  invadeFromBelow(timeUs: number): void;
}

export function createAvNode(patient: Pick<PatientParameters, 'avConduction' | 'prIntervalMs'>): AvNode {
  const prUs = msToUs(patient.prIntervalMs);
  let lastExitUs = -Infinity;
  let closedUntilUs = -Infinity;
  let pendingUs: number | null = null;
  return {
    pendingExitUs: () => pendingUs,
    enter(timeUs) {
      const recoveryUs = timeUs - lastExitUs;
      const blocked =
        patient.avConduction === 'complete' ||
        (pendingUs !== null && timeUs < pendingUs) ||
        timeUs < closedUntilUs ||
        recoveryUs < effectiveRefractoryUs;
      if (blocked) return null;
      pendingUs = timeUs + prUs + Math.round(decrement * Math.max(0, fullRecoveryUs - recoveryUs));
      return pendingUs;
    },
    exit(timeUs) {
      lastExitUs = timeUs;
      pendingUs = null;
    },
    invadeFromBelow(timeUs) {
      pendingUs = null;
      lastExitUs = timeUs;
      closedUntilUs = timeUs + concealedPenetrationUs;
    },
  };
}
