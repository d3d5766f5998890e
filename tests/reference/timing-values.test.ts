import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { thresholdV } from '../../shared/engine/rhythm/capture';
import type { MarkerEvent } from '../../shared/engine/events';
import { eventsOf, steadyStrip } from '../support/strips';

// Worked examples E (dual-chamber timing) and F (strength–duration): formulas and sources in the fixture.
interface UpperRateCase {
  id: string;
  name: string;
  inputs: { sav_ms: number; pvarp_ms: number; upper_tracking_rate: number; pp_ms: number };
  value: { ratio_P_to_V: string };
}
interface StrengthCase {
  id: string;
  inputs: { rheobase_V: number; chronaxie_ms: number; width_ms: number[] };
  value: { threshold_V: number[] };
}
const { cases } = JSON.parse(
  readFileSync(new URL('../fixtures/worked-examples.json', import.meta.url), 'utf8'),
) as { cases: { id: string }[] };
const byId = <T>(...ids: string[]): T[] => ids.map((id) => cases.find((one) => one.id === id) as T);

describe('upper rate behaviour (E06 to E10; TM-27, TM-28)', () => {
  it.each(byId<UpperRateCase>('E06', 'E07', 'E08', 'E09', 'E10'))('$id: $name', ({ inputs, value }) => {
    const events = eventsOf(
      steadyStrip({
        durationS: 60,
        patient: { atrialRateBpm: 60_000 / inputs.pp_ms, avConduction: 'complete' },
        pacing: {
          source: 'implanted',
          mode: 'DDD',
          sensedAvDelayMs: inputs.sav_ms,
          pvarpMs: inputs.pvarp_ms,
          upperTrackingRateBpm: inputs.upper_tracking_rate,
        },
      }),
    );
    const atrial = events.filter((event) => event.type === 'depolarization' && event.chamber === 'atrium');
    const paces = events.filter(
      (event): event is MarkerEvent => event.type === 'marker' && event.code === 'ventricularPace',
    );
    const [p, v] = value.ratio_P_to_V.split(':').map(Number);
    expect(atrial.length / paces.length).toBeCloseTo(p / v, 1);
    const shortest = paces
      .slice(1)
      .reduce((least, pace, i) => Math.min(least, pace.timeS - paces[i].timeS), 9);
    expect(shortest).toBeGreaterThanOrEqual(60 / inputs.upper_tracking_rate - 1e-6);
  });
});

describe('strength–duration (F01, F02, F03; TM-50)', () => {
  it('is b (1 + c/d) for a chronaxie of 0.3 ms', () => {
    const [f01] = byId<StrengthCase>('F01');
    const { rheobase_V: rheobase, chronaxie_ms: chronaxie, width_ms: widths } = f01.inputs;
    expect(chronaxie).toBe(0.3);
    const at04 = rheobase * (1 + chronaxie / 0.4);
    widths.forEach((width, i) => expect(thresholdV(at04, width)).toBeCloseTo(f01.value.threshold_V[i], 6));
  });
});
