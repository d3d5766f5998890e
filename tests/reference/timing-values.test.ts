import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { thresholdV } from '../../shared/engine/rhythm/capture';
import type { MarkerEvent, StripEvent } from '../../shared/engine/events';
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

/** Markers of a strip, with gaps in µs between neighbours of wanted codes. */
const markersOf = (events: readonly StripEvent[], ...codes: MarkerEvent['code'][]): MarkerEvent[] =>
  events.filter((event): event is MarkerEvent => event.type === 'marker' && codes.includes(event.code));
const gapsMs = (markers: readonly MarkerEvent[]): number[] =>
  markers.slice(1).map((marker, i) => 1000 * (marker.timeS - markers[i].timeS));

interface TarpCase {
  id: string;
  name: string;
  inputs: { sav_ms: number; pvarp_ms: number; upper_tracking_rate: number };
  value: { tarp_ms: number; two_to_one_rate_per_min: number; ventricular_rate_just_past_2to1_point: number };
}

describe('two-to-one point (E01 to E05; TM-24, TM-25)', () => {
  const share = (inputs: TarpCase['inputs'], ppMs: number): number => {
    const events = eventsOf(
      steadyStrip({
        durationS: 60,
        patient: { atrialRateBpm: 60_000 / ppMs, avConduction: 'complete' },
        pacing: {
          source: 'implanted',
          sensedAvDelayMs: inputs.sav_ms,
          pvarpMs: inputs.pvarp_ms,
          upperTrackingRateBpm: inputs.upper_tracking_rate,
          modeSwitching: false,
        },
      }),
    );
    const atrial = events.filter((event) => event.type === 'depolarization' && event.chamber === 'atrium');
    return markersOf(events, 'ventricularPace').length / atrial.length;
  };
  it.each(byId<TarpCase>('E01', 'E02', 'E03', 'E04', 'E05'))('$id: $name', ({ inputs, value }) => {
    expect(value.tarp_ms).toBe(inputs.sav_ms + inputs.pvarp_ms);
    const past = share(inputs, value.tarp_ms - 2);
    expect(past).toBeCloseTo(0.5, 1);
    expect(past * (60_000 / (value.tarp_ms - 2))).toBeCloseTo(
      value.ventricular_rate_just_past_2to1_point,
      -1,
    );
    expect(share(inputs, value.tarp_ms + 2)).toBeGreaterThan(0.55);
  });
});

interface EscapeCase {
  inputs: { lower_rate: number[]; paced_av_ms: number[] };
  value: { va_ms: number[] };
}

describe('atrial escape interval (E11; TM-29)', () => {
  const [{ inputs, value }] = byId<EscapeCase>('E11');
  it.each(inputs.lower_rate.map((rate, i) => [rate, inputs.paced_av_ms[i], value.va_ms[i]]))(
    'lower rate %d, AV %d: VA %d ms',
    (lowerRateBpm, pacedAvDelayMs, vaMs) => {
      const events = eventsOf(
        steadyStrip({
          patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
          pacing: { source: 'implanted', lowerRateBpm, pacedAvDelayMs },
        }),
      );
      const all = markersOf(events, 'atrialPace', 'ventricularPace');
      const va = gapsMs(all).filter((_, i) => all[i].code === 'ventricularPace');
      expect(va.length).toBeGreaterThan(5);
      for (const gap of va) expect(gap).toBeCloseTo(vaMs, 2);
    },
  );
});

interface LoopCase {
  inputs: { va_conduction_ms: number[]; sav_ms: number[]; upper_rate: number[]; pvarp_ms: number[] };
  value: { cycle_ms: number[] };
}
interface LoopEndCase {
  inputs: { va_conduction_ms: number[]; margin_ms: number };
  value: { pvarp_ms: number[]; two_to_one_rate: number[] };
}

/** The atrial stimulus captures nothing for two seconds (TM-34), so the ventricular beat finds the way up open. */
const loopStrip = (va: number, savMs: number, upperRate: number, pvarpMs: number) =>
  eventsOf(
    steadyStrip({
      durationS: 60,
      patient: {
        atrialRateBpm: 45,
        avConduction: 'complete',
        retrogradeConductionMs: va,
      },
      pacing: {
        source: 'implanted',
        faults: [{ kind: 'failureToCapture', chamber: 'atrium', fromS: 10, toS: 12 }],
        sensedAvDelayMs: savMs,
        upperTrackingRateBpm: upperRate,
        pvarpMs,
        modeSwitching: false,
      },
    }),
  );
/** The longest run of ventricular paces that keep one cycle, to the microsecond. */
const longestRun = (events: readonly StripEvent[], cycleMs: number): number => {
  let run = 0;
  let longest = 0;
  for (const gap of gapsMs(markersOf(events, 'ventricularPace'))) {
    run = Math.abs(gap - cycleMs) < 0.01 ? run + 1 : 0;
    longest = Math.max(longest, run);
  }
  return longest;
};

describe('endless loop (E12, E13; TM-31, TM-33, TM-34)', () => {
  const [{ inputs, value }] = byId<LoopCase>('E12');
  it.each(value.cycle_ms.map((cycle, i) => [cycle, i] as const))('runs at a cycle of %d ms', (cycle, i) => {
    const events = loopStrip(
      inputs.va_conduction_ms[i],
      inputs.sav_ms[i],
      inputs.upper_rate[i],
      inputs.pvarp_ms[i],
    );
    expect(longestRun(events, cycle)).toBeGreaterThan(8);
  });

  const [end] = byId<LoopEndCase>('E13');
  it.each(end.value.pvarp_ms.map((pvarp, i) => [pvarp, i] as const))(
    'a PVARP of %d ms stops it',
    (pvarp, i) => {
      const va = end.inputs.va_conduction_ms[i];
      const cycle = Math.max(500, va + 150);
      expect(longestRun(loopStrip(va, 150, 120, pvarp), cycle)).toBeLessThan(3);
      expect(longestRun(loopStrip(va, 150, 120, Math.max(150, va - 20)), cycle)).toBeGreaterThan(8);
    },
  );
});

interface SafetyCase {
  inputs: { paced_av_ms: number[] };
  value: { v_pace_after_a_pace_ms: number[] };
}

describe('safety pace (E14; TM-21)', () => {
  const [{ inputs, value }] = byId<SafetyCase>('E14');
  it.each(inputs.paced_av_ms.map((av, i) => [av, value.v_pace_after_a_pace_ms[i]]))(
    'AV %d: %d ms after the atrial stimulus',
    (pacedAvDelayMs, afterMs) => {
      const events = eventsOf(
        steadyStrip({
          patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
          pacing: {
            source: 'implanted',
            pacedAvDelayMs,
            atrialLead: { amplitudeV: 8 },
            rightVentricularLead: { sensitivityMv: 1 },
          },
        }),
      );
      const all = markersOf(events, 'atrialPace', 'safetyPace');
      const av = gapsMs(all).filter((_, i) => all[i].code === 'atrialPace');
      expect(av.length).toBeGreaterThan(5);
      for (const gap of av) expect(gap).toBeCloseTo(afterMs, 3);
    },
  );
});

describe('hysteresis (TM-30) and magnet (TM-36, TM-37)', () => {
  it('waits longer after a sensed beat than after a paced one', () => {
    const events = eventsOf(
      steadyStrip({
        durationS: 60,
        patient: { avConduction: 'complete', prematureVentricularPerMinute: 10 },
        pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 60, hysteresisRateBpm: 40 },
      }),
    );
    const all = markersOf(events, 'ventricularPace', 'ventricularSense');
    const gaps = gapsMs(all).map((gap, i) => ({ gap, after: all[i].code, before: all[i + 1].code }));
    const paced = gaps.filter(({ before }) => before === 'ventricularPace');
    const afterSense = paced.filter(({ after }) => after === 'ventricularSense');
    expect(afterSense.length).toBeGreaterThan(5);
    for (const { gap } of afterSense) expect(gap).toBeCloseTo(1500, 3);
    for (const { gap, after } of paced) if (after === 'ventricularPace') expect(gap).toBeCloseTo(1000, 3);
  });

  it.each([
    ['DDD', true, true],
    ['VVI', false, true],
    ['AAI', true, false],
  ] as const)('makes %s asynchronous at the magnet rate', (mode, atrium, ventricle) => {
    const events = eventsOf(
      steadyStrip({
        patient: { atrialRateBpm: 100 },
        pacing: { source: 'implanted', mode, magnetApplied: true },
      }),
    );
    const senses = events.filter((event) => event.type === 'marker' && event.code.endsWith('Sense'));
    expect(senses).toEqual([]);
    const paces = (code: MarkerEvent['code']) => gapsMs(markersOf(events, code));
    expect(paces('atrialPace').length > 0).toBe(atrium);
    expect(paces('ventricularPace').length > 0).toBe(ventricle);
    for (const gap of [...paces('atrialPace'), ...paces('ventricularPace')])
      expect(gap).toBeCloseTo(60_000 / 90, 2);
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

  it('leaves a margin at twice the threshold, as measured by turning the output down (F04)', () => {
    const [f04] = byId<{ inputs: { threshold_V: number[] }; value: { output_V: number[] } }>('F04');
    const captures = (captureThresholdV: number, amplitudeV: number): boolean =>
      eventsOf(
        steadyStrip({
          patient: { avConduction: 'complete' },
          pacing: {
            source: 'implanted',
            mode: 'VVI',
            rightVentricularLead: { captureThresholdV, amplitudeV },
          },
        }),
      ).every((event) => event.type !== 'stimulus' || event.captured);
    f04.inputs.threshold_V.forEach((threshold, i) => {
      const output = f04.value.output_V[i];
      let amplitude = output;
      while (captures(threshold, amplitude - 0.01)) amplitude = Math.round(100 * (amplitude - 0.01)) / 100;
      expect(output / amplitude).toBeCloseTo(2, 2);
    });
  });
});
