import type { AtrialLead } from '../../parameters/strip-parameters';
import { msToUs, usToS } from '../../units';
import type { AtrialDepolarization, AtrialOrigin } from '../events';
import { refractoryMs } from './capture';
import { atrialDelayMs } from './local-activation';

/** The atria: when they were last activated, and when the wave reaches the lead. Times in µs. */
export interface Atria {
  localUs(): number;
  depolarize(origin: AtrialOrigin, timeUs: number): AtrialDepolarization;
  /** Whether a wave that reaches the lead at `localUs` finds rested muscle. */
  isRestedAt(localUs: number): boolean;
  /** A stimulus joins the P wave that is under way. */
  join(timeUs: number): void;
}

export function createAtria(site: AtrialLead['site']): Atria {
  let last: AtrialDepolarization | null = null;
  let localUs = -Infinity;
  return {
    localUs: () => localUs,
    isRestedAt: (timeUs) => timeUs >= localUs + msToUs(refractoryMs.atrium),
    depolarize(origin, timeUs) {
      const source = origin === 'paced' ? 'atrium' : origin;
      localUs = timeUs + msToUs(atrialDelayMs(source, site));
      last = {
        type: 'depolarization',
        timeS: usToS(timeUs),
        chamber: 'atrium',
        origin,
        sources: [{ site: source, timeS: usToS(timeUs) }],
        fusion: false,
      };
      return last;
    },
    join(timeUs) {
      if (!last) throw new Error('no depolarization to join');
      last.sources.push({ site: 'atrium', timeS: usToS(timeUs) });
      if (last.origin !== 'paced') last.fusion = true;
      localUs = Math.min(localUs, timeUs);
    },
  };
}
