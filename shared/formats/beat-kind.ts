import type { AtrialDepolarization, StripEvent, VentricularDepolarization } from '../engine/events';
import type { StripParameters } from '../parameters/strip-parameters';

/** What published tables of beats distinguish among ventricular depolarizations. */
export type BeatKind =
  | 'normal'
  | 'leftBundleBranchBlock'
  | 'rightBundleBranchBlock'
  | 'afterPrematureAtrial'
  | 'premature'
  | 'junctionalEscape'
  | 'ventricularEscape'
  | 'paced'
  | 'pacedFusion';

/** Two onsets are the same when they lie closer than this, s; events keep whole microseconds. */
const sameTimeS = 5e-7;

const conductedWithBlock: Record<StripParameters['patient']['bundleBranchBlock'], BeatKind> = {
  none: 'normal',
  left: 'leftBundleBranchBlock',
  right: 'rightBundleBranchBlock',
};

/** Onsets of premature P waves in a strip, s. */
function prematureAtrialOnsets(events: readonly StripEvent[]): number[] {
  return events
    .filter(
      (event): event is AtrialDepolarization =>
        event.type === 'depolarization' && event.chamber === 'atrium' && event.origin === 'premature',
    )
    .map((event) => event.timeS);
}

/** Sorts ventricular depolarizations of a strip into the kinds of published tables. */
export function beatSorter(
  events: readonly StripEvent[],
  { patient }: StripParameters,
): (beat: VentricularDepolarization) => BeatKind {
  const premature = prematureAtrialOnsets(events);
  return ({ origin, fusion, conductedFromS }) => {
    if (fusion) return 'pacedFusion';
    if (origin !== 'conducted') return origin;
    const fromPremature = premature.some((onsetS) => Math.abs(onsetS - (conductedFromS ?? NaN)) < sameTimeS);
    return fromPremature ? 'afterPrematureAtrial' : conductedWithBlock[patient.bundleBranchBlock];
  };
}
