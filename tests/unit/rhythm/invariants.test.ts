import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { MarkerEvent, StimulusEvent, StripEvent } from '../../../shared/engine/events';
import { atrialDelayMs } from '../../../shared/engine/rhythm/local-activation';
import { createRhythm } from '../../../shared/engine/rhythm/rhythm';
import { surfaceSpikeMv } from '../../../shared/engine/rhythm/device/outlet';
import { actingMode } from '../../../shared/parameters/applies';
import type { StripParameters, StripParametersInput } from '../../../shared/parameters/strip-parameters';
import { arbitraryRhythm } from '../../support/arbitrary-strips';
import { buildStrip, eventsOf, steadyStrip } from '../../support/strips';

// Invariants of the timing-cycles rules, section 11.

const runs = { numRuns: 200, seed: 42 };
const us = (event: { timeS: number }): number => Math.round(event.timeS * 1e6);
const stimuli = (events: readonly StripEvent[]) =>
  events.filter((event): event is StimulusEvent => event.type === 'stimulus');
const markers = (events: readonly StripEvent[], ...codes: MarkerEvent['code'][]) =>
  events.filter((event): event is MarkerEvent => event.type === 'marker' && codes.includes(event.code));
const onsets = (events: readonly StripEvent[]) =>
  events.filter((event) => event.type === 'depolarization' && event.chamber === 'ventricle');

function forEveryRhythm(check: (strip: StripParameters, events: StripEvent[]) => void): void {
  fc.assert(
    fc.property(arbitraryRhythm, (input) => {
      const strip = buildStrip(input);
      check(strip, eventsOf(strip));
    }),
    runs,
  );
}

/** The device's own intervals in µs, formed anew from the parameters. */
function timing({ pacing }: StripParameters) {
  const magnet = pacing.source === 'implanted' && pacing.magnetApplied;
  const sensor = pacing.mode.charAt(3) === 'R' ? (pacing.sensorRateBpm ?? 0) : 0;
  const rate = magnet ? pacing.magnetRateBpm : Math.max(pacing.lowerRateBpm, sensor);
  const lri = 60_000_000 / rate;
  const pav = Math.min(pacing.pacedAvDelayMs * 1000, lri - 100_000);
  return {
    lri,
    uri: 60_000_000 / pacing.upperTrackingRateBpm,
    pav,
    va: lri - pav,
    safety: Math.min(110_000, pav),
  };
}

const ventricularEvents = (events: readonly StripEvent[]) =>
  markers(events, 'ventricularPace', 'safetyPace', 'ventricularSense').filter(
    (marker) => marker.window !== 'crosstalk',
  );
const isDual = (mode: string): boolean => ['DDD', 'DDI', 'VDD'].includes(mode);
const senses = [
  'atrialSense',
  'atrialRefractorySense',
  'ventricularSense',
  'ventricularRefractorySense',
] as const;
/** A rounding of one interval to whole µs on either side. */
const slack = 2;

describe('every rhythm', () => {
  it('has ventricular onsets at least 250 ms apart (invariant 1)', () => {
    forEveryRhythm((_, events) => {
      const times = onsets(events).map(us);
      times.slice(1).forEach((time, i) => expect(time - times[i]).toBeGreaterThanOrEqual(250_000));
    });
  });

  it('paces the ventricles no sooner after an event there than its timers allow (invariant 1)', () => {
    forEveryRhythm((strip, events) => {
      const mode = actingMode(strip.pacing);
      const { lri, uri, va, safety } = timing(strip);
      const least = mode === 'DDD' || mode === 'VDD' ? Math.min(uri, lri) : lri;
      const ventricular = ventricularEvents(events);
      ventricular.slice(1).forEach((marker, i) => {
        const gap = us(marker) - us(ventricular[i]);
        if (marker.code === 'ventricularPace') expect(gap).toBeGreaterThanOrEqual(least - slack);
        if (marker.code === 'safetyPace') expect(gap).toBeGreaterThanOrEqual(va + safety - slack);
      });
    });
  });

  it('never paces a single chamber within its interval of an alert sense or a pace (invariant 2)', () => {
    forEveryRhythm((strip, events) => {
      const mode = actingMode(strip.pacing);
      if (mode !== 'AAI' && mode !== 'VVI') return;
      const chamber = mode === 'AAI' ? 'atrial' : 'ventricular';
      const own = markers(events, `${chamber}Pace`, `${chamber}Sense`);
      own.slice(1).forEach((marker, i) => {
        if (!marker.code.endsWith('Pace')) return;
        expect(us(marker) - us(own[i])).toBeGreaterThanOrEqual(timing(strip).lri - slack);
      });
    });
  });

  it('logs nothing in a blanking window, nothing alert in a refractory period, nothing when asynchronous (invariant 4)', () => {
    forEveryRhythm((strip, events) => {
      const mode = actingMode(strip.pacing);
      const { pvarpMs, ventricularRefractoryMs, ventricularBlankingMs } = strip.pacing;
      if (mode.slice(1) === 'OO' || strip.pacing.source === 'none') {
        expect(markers(events, ...senses)).toEqual([]);
        return;
      }
      let lastV = -Infinity;
      let lastA = -Infinity;
      let lastAtrialPace = -Infinity;
      const blankV = isDual(mode) || mode === 'VVI' ? 100_000 : 0;
      for (const event of events) {
        if (event.type !== 'marker') continue;
        const time = us(event);
        const sensed = (senses as readonly string[]).includes(event.code);
        if (sensed && event.code.startsWith('ventricular')) {
          expect(time - lastV).toBeGreaterThanOrEqual(blankV);
          if (isDual(mode))
            expect(time - lastAtrialPace).toBeGreaterThanOrEqual(ventricularBlankingMs * 1000);
          if (event.code === 'ventricularSense') {
            expect(time - lastV).toBeGreaterThanOrEqual(ventricularRefractoryMs * 1000);
          }
        }
        if (sensed && event.code.startsWith('atrial')) {
          if (isDual(mode)) expect(time - lastV).toBeGreaterThanOrEqual(100_000);
          expect(time - lastA).toBeGreaterThanOrEqual(mode === 'AAI' ? 100_000 : 50_000);
          if (event.code === 'atrialSense') {
            expect(time - (mode === 'AAI' ? lastA : lastV)).toBeGreaterThanOrEqual(pvarpMs * 1000);
          }
        }
        if (event.code === 'atrialPace' || event.code === 'atrialSense') lastA = time;
        if (event.code === 'atrialPace') lastAtrialPace = time;
        const isV = ['ventricularPace', 'safetyPace', 'ventricularSense'].includes(event.code);
        if (isV && event.window !== 'crosstalk') {
          lastV = time;
          lastAtrialPace = -Infinity;
        }
      }
    });
  });

  it('names a reason exactly when a stimulus does not capture, and makes each capture a source once (invariant 5)', () => {
    forEveryRhythm((_, events) => {
      for (const stimulus of stimuli(events)) {
        expect(stimulus.reason === undefined).toBe(stimulus.captured);
        const chamber = stimulus.chamber === 'atrium' ? 'atrium' : 'ventricle';
        const owners = events.filter(
          (event) =>
            event.type === 'depolarization' &&
            event.chamber === chamber &&
            event.sources.some((source) => source.site === stimulus.chamber && us(source) === us(stimulus)),
        );
        // A stimulus just after the start may have joined a beat of the pre-roll.
        if (stimulus.captured && stimulus.timeS > 0.2) expect(owners).toHaveLength(1);
        if (!stimulus.captured) expect(owners).toHaveLength(0);
        // It starts its beat, or joins one whose wave had not reached it: 145 ms is the longest way in the table.
        for (const owner of owners) {
          expect(us(owner)).toBeLessThanOrEqual(us(stimulus));
          expect(us(stimulus) - us(owner)).toBeLessThan(145_000);
        }
      }
    });
  });

  it('has a marker for every stimulus, and a stimulus for every pace unless it fails to pace (invariants 6 and 7)', () => {
    forEveryRhythm((strip, events) => {
      const { pacing } = strip;
      const mode = actingMode(pacing);
      const fails = (...chambers: string[]): boolean =>
        pacing.faults.some((fault) => fault.kind === 'failureToPace' && chambers.includes(fault.chamber));
      const atrial = stimuli(events).filter((stimulus) => stimulus.chamber === 'atrium');
      const atrialPaces = markers(events, 'atrialPace').map(us);
      if (fails('atrium')) for (const one of atrial) expect(atrialPaces).toContain(us(one));
      else expect(atrial.map(us)).toEqual(atrialPaces);
      const ventricular = stimuli(events).filter((stimulus) => stimulus.chamber !== 'atrium');
      const paces = markers(events, 'ventricularPace', 'safetyPace').map(us);
      if (!fails('rightVentricle', 'leftVentricle')) {
        for (const pace of paces) expect(ventricular.map(us)).toContain(pace);
      }
      for (const stimulus of ventricular.filter((one) => one.timeS > 0.1)) {
        const near = paces.some((pace) => us(stimulus) >= pace && us(stimulus) - pace <= 100_000);
        expect(near).toBe(true);
      }
      if (mode.startsWith('A')) expect(ventricular).toHaveLength(0);
      if (mode.startsWith('V')) expect(atrial).toHaveLength(0);
      if (pacing.source === 'none') expect(events.filter((event) => event.type === 'marker')).toHaveLength(0);
    });
  });

  it('conducts upwards only where that is set, and never from a beat within 300 ms after a P wave (invariant 9)', () => {
    let seen = 0;
    forEveryRhythm((strip, events) => {
      const { retrogradeConductionMs } = strip.patient;
      const atrial = events.filter((event) => event.type === 'depolarization' && event.chamber === 'atrium');
      const up = atrial.filter((event) => event.type === 'depolarization' && event.origin === 'retrograde');
      if (retrogradeConductionMs === null) expect(up).toHaveLength(0);
      const delay = retrogradeConductionMs ?? 0;
      for (const wave of up) {
        seen += 1;
        const fromUs = us(wave) - (delay - atrialDelayMs('retrograde', strip.pacing.atrialLead.site)) * 1000;
        if (fromUs < 300_000) continue;
        expect(onsets(events).map(us)).toContain(fromUs);
        const close = atrial.filter((p) => !up.includes(p) && us(p) <= fromUs && us(p) > fromUs - 300_000);
        expect(close).toHaveLength(0);
      }
    });
    expect(seen).toBeGreaterThan(0);
  });

  it('keeps time order and stays inside the strip (invariant 10)', () => {
    forEveryRhythm((strip, events) => {
      events.forEach((event, i) => {
        expect(event.timeS).toBeGreaterThanOrEqual(i === 0 ? 0 : events[i - 1].timeS);
        expect(event.timeS).toBeLessThan(strip.durationS);
      });
    });
  });

  it('repeats with its seed, and the size of the steps changes nothing', () => {
    fc.assert(
      fc.property(
        arbitraryRhythm,
        fc.array(fc.integer({ min: 1, max: 4_000_000 }), { maxLength: 12 }),
        (input, steps) => {
          const strip = buildStrip(input);
          const rhythm = createRhythm(strip);
          let until = -30_000_000;
          const stepped = steps.flatMap((step) => rhythm.advance((until += step)));
          stepped.push(...rhythm.advance(20_000_000));
          expect(stepped).toEqual(createRhythm(strip).advance(20_000_000));
        },
      ),
      { numRuns: 60, seed: 7 },
    );
  });
});

/** The same patient with a dual-chamber device that never switches its mode. */
function forEveryTrackedRhythm(check: (strip: StripParameters, events: StripEvent[]) => void): void {
  forEveryRhythm((strip) => {
    const tracked: StripParametersInput = {
      ...strip,
      pacing: {
        ...strip.pacing,
        source: 'implanted',
        mode: strip.pacing.mode.charAt(3) === 'R' ? 'DDDR' : 'DDD',
        ventricularChambers: 'right',
        modeSwitching: false,
        magnetApplied: false,
      },
    };
    const built = buildStrip(tracked);
    check(built, eventsOf(built));
  });
}

describe('DDD', () => {
  it('has one ventricular event between alert atrial ones, and keeps its AV delays (invariant 3)', () => {
    forEveryTrackedRhythm((strip, events) => {
      const { pav, safety } = timing(strip);
      let atrial: MarkerEvent | null = null;
      for (const event of events) {
        if (event.type !== 'marker' || event.window === 'crosstalk') continue;
        const { code } = event;
        if (code === 'atrialPace' || code === 'atrialSense') {
          expect(atrial).toBeNull();
          atrial = event;
        }
        if (code !== 'ventricularPace' && code !== 'safetyPace' && code !== 'ventricularSense') continue;
        if (atrial) {
          const av = us(event) - us(atrial);
          const paced = atrial.code === 'atrialPace';
          if (code === 'ventricularPace' && paced) expect(Math.abs(av - pav)).toBeLessThanOrEqual(slack);
          if (code === 'safetyPace') expect(Math.abs(av - safety)).toBeLessThanOrEqual(slack);
          if (code === 'ventricularPace' && !paced) {
            expect(av).toBeGreaterThanOrEqual(strip.pacing.sensedAvDelayMs * 1000 - slack);
          }
        }
        atrial = null;
      }
    });
  });

  it('starts no loop while PVARP outlasts retrograde conduction (invariant 9)', () => {
    forEveryTrackedRhythm((strip) => {
      const closed = buildStrip({
        ...strip,
        patient: { ...strip.patient, retrogradeConductionMs: 240 },
        pacing: {
          ...strip.pacing,
          // Every ventricular beat is heard, so that each starts its PVARP.
          rightVentricularLead: { ...strip.pacing.rightVentricularLead, signalMv: 30 },
          ventricularRefractoryMs: 150,
          ventricularBlankingMs: 10,
          faults: [],
          // A beat in the refractory period after a lost pace restarts nothing, and is late by at most that.
          pvarpMs: 391,
        },
      });
      const events = eventsOf(closed);
      const delayUs = atrialDelayMs('retrograde', closed.pacing.atrialLead.site) * 1000;
      const heard = new Set(markers(events, 'atrialSense').map(us));
      for (const event of events) {
        if (event.type !== 'depolarization' || event.chamber !== 'atrium' || event.origin !== 'retrograde')
          continue;
        expect(heard.has(us(event) + delayUs)).toBe(false);
      }
    });
  });
});

describe('a quiet pacemaker', () => {
  it('gives no stimulus while intact sinus rhythm stays above the lower rate (invariant 8)', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 70, max: 130 }),
        fc.integer({ min: 0, max: 4294967295 }),
        (rate, seed) => {
          const events = eventsOf(
            steadyStrip({
              seed,
              durationS: 20,
              patient: { atrialRateBpm: rate, prIntervalMs: 140 },
              pacing: { source: 'implanted', mode: 'DDD', sensedAvDelayMs: 180 },
            }),
          );
          expect(stimuli(events)).toEqual([]);
        },
      ),
      { numRuns: 60, seed: 3 },
    );
  });
});

describe('mode switch', () => {
  const fast = (atrialRateBpm: number) =>
    eventsOf(
      steadyStrip({
        durationS: 20,
        patient: { atrialRateBpm, avConduction: 'complete' },
        pacing: { source: 'implanted', mode: 'DDD', pvarpMs: 200, sensedAvDelayMs: 120 },
      }),
    );

  it('stops tracking above 170 /min and paces at the lower rate', () => {
    const paces = markers(fast(190), 'ventricularPace').map(us);
    paces.slice(1).forEach((time, i) => expect(time - paces[i]).toBe(1_000_000));
  });

  it('tracks below it', () => {
    const paces = markers(fast(110), 'ventricularPace').map(us);
    expect(paces.length).toBeGreaterThan(34);
  });
});

describe('surface spike', () => {
  it('follows output and polarity, or is as set', () => {
    const { pacing } = buildStrip({
      pacing: { rightVentricularLead: { polarity: 'unipolar' }, atrialLead: { surfaceSpikeMv: 4 } },
    });
    expect(surfaceSpikeMv('rightVentricle', pacing.rightVentricularLead)).toBeCloseTo(2.5 * 0.7 * 8, 12);
    expect(surfaceSpikeMv('leftVentricle', pacing.leftVentricularLead)).toBeCloseTo(3 * 0.7, 12);
    expect(surfaceSpikeMv('atrium', pacing.atrialLead)).toBe(4);
  });
});
