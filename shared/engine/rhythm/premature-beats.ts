import { msToUs, rateToIntervalUs } from '../../units';
import type { RandomStream } from '../random';
import type { Agenda } from './agenda';

/** A premature beat comes at most this far into the last interval of its chamber (chosen). */
const latestShare = 0.65;

/** A focus that fires now and then, coupled to the beat before. Times in µs. */
export interface PrematureFocus {
  /** The focus is armed: it fires after the next beat. */
  arm(timeUs: number): void;
  /** Another beat of its chamber, at which an armed focus sets its time. */
  beat(timeUs: number): void;
}

export function createPrematureFocus(
  chamber: 'Ventricle' | 'Atrium',
  perMinute: number,
  couplingMs: number,
  startUs: number,
  agenda: Agenda,
  random: RandomStream,
): PrematureFocus {
  const everyUs = perMinute > 0 ? rateToIntervalUs(perMinute) : Infinity;
  let armed = false;
  let lastBeatUs = -Infinity;
  if (perMinute > 0) {
    agenda.set(`armPremature${chamber}`, startUs + Math.floor(random.uniform() * everyUs));
  }
  return {
    arm(timeUs) {
      armed = true;
      agenda.set(`armPremature${chamber}`, timeUs + everyUs);
    },
    beat(timeUs) {
      const interval = timeUs - lastBeatUs;
      lastBeatUs = timeUs;
      if (!armed) return;
      armed = false;
      agenda.set(
        `premature${chamber}`,
        timeUs + Math.min(msToUs(couplingMs), Math.floor(latestShare * interval + 0.5)),
      );
    },
  };
}
