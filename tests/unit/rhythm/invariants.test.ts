import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { MarkerEvent, StimulusEvent, StripEvent } from '../../../shared/engine/events';
import { createRhythm } from '../../../shared/engine/rhythm/rhythm';
import { surfaceSpikeMv } from '../../../shared/engine/rhythm/device/output';
import type { StripParameters } from '../../../shared/parameters/strip-parameters';
import { arbitraryRhythm } from '../../support/arbitrary-strips';
import { buildStrip, eventsOf, steadyStrip } from '../../support/strips';

// Invariants of the timing-cycles rules, section 11, as far as the parameters reach.

const runs = { numRuns: 150, seed: 42 };
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

describe('every rhythm', () => {
  it('has ventricular onsets at least 250 ms apart', () => {
    forEveryRhythm((_, events) => {
      const times = onsets(events).map(us);
      times.slice(1).forEach((time, i) => expect(time - times[i]).toBeGreaterThanOrEqual(250_000));
    });
  });

  it('keeps time order and stays inside the strip', () => {
    forEveryRhythm((strip, events) => {
      events.forEach((event, i) => {
        expect(event.timeS).toBeGreaterThanOrEqual(i === 0 ? 0 : events[i - 1].timeS);
        expect(event.timeS).toBeLessThan(strip.durationS);
      });
    });
  });

  it('names a reason exactly when a stimulus does not capture, and makes each capture a source once', () => {
    forEveryRhythm((strip, events) => {
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
      }
      expect(strip.durationS).toBe(20);
    });
  });

  it('has a marker for every stimulus and a stimulus for every pace, in chambers that the mode paces', () => {
    forEveryRhythm((strip, events) => {
      const atrial = stimuli(events).filter((stimulus) => stimulus.chamber === 'atrium');
      expect(atrial.map(us)).toEqual(markers(events, 'atrialPace').map(us));
      const ventricular = stimuli(events).filter((stimulus) => stimulus.chamber !== 'atrium');
      const paces = markers(events, 'ventricularPace', 'safetyPace').map(us);
      for (const pace of paces) expect(ventricular.map(us)).toContain(pace);
      for (const stimulus of ventricular.filter((one) => one.timeS > 0.1)) {
        const nearest = paces.some((pace) => us(stimulus) >= pace && us(stimulus) - pace <= 100_000);
        expect(nearest).toBe(true);
      }
      const paced = strip.pacing.mode.charAt(0);
      if (paced === 'A') expect(ventricular).toHaveLength(0);
      if (paced === 'V') expect(atrial).toHaveLength(0);
      if (strip.pacing.source === 'none') expect(stimuli(events)).toHaveLength(0);
    });
  });

  it('paces no sooner after a ventricular event than its timers allow, and senses nothing when asynchronous', () => {
    forEveryRhythm((strip, events) => {
      const { mode, lowerRateBpm, upperTrackingRateBpm, pacedAvDelayMs } = strip.pacing;
      if (mode.slice(1, 3) === 'OO') {
        expect(events.filter((event) => event.type === 'marker' && event.code.endsWith('Sense'))).toEqual([]);
      }
      const lri = 60_000_000 / lowerRateBpm;
      const uri = 60_000_000 / upperTrackingRateBpm;
      const pav = Math.min(pacedAvDelayMs * 1000, lri - 100_000);
      const least = mode.startsWith('DDD') ? Math.min(uri, lri) : lri;
      const ventricular = markers(events, 'ventricularPace', 'safetyPace', 'ventricularSense').filter(
        (marker) => marker.window !== 'crosstalk',
      );
      ventricular.slice(1).forEach((marker, i) => {
        const gap = us(marker) - us(ventricular[i]);
        if (marker.code === 'ventricularPace') expect(gap).toBeGreaterThanOrEqual(least - 2);
        if (marker.code === 'safetyPace') {
          expect(gap).toBeGreaterThanOrEqual(lri - pav + Math.min(110_000, pav) - 2);
        }
      });
    });
  });

  it('in DDD has one ventricular event between alert atrial ones, and keeps its AV delays', () => {
    forEveryRhythm((strip, events) => {
      const { mode, source, pacedAvDelayMs, lowerRateBpm, sensedAvDelayMs, pvarpMs } = strip.pacing;
      if (!mode.startsWith('DDD') || source === 'none') return;
      if (markers(events, 'modeSwitchOn', 'modeSwitchOff').length > 0) return;
      const pav = Math.min(pacedAvDelayMs * 1000, 60_000_000 / lowerRateBpm - 100_000);
      let atrial: MarkerEvent | null = null;
      let lastVentricular: number | null = null;
      for (const event of events) {
        if (event.type !== 'marker' || event.window === 'crosstalk') continue;
        const { code } = event;
        if (code === 'atrialPace' || code === 'atrialSense') {
          expect(atrial).toBeNull();
          if (code === 'atrialSense' && lastVentricular !== null) {
            expect(us(event) - lastVentricular).toBeGreaterThanOrEqual(pvarpMs * 1000 - 1);
          }
          atrial = event;
        }
        if (code === 'ventricularPace' || code === 'safetyPace' || code === 'ventricularSense') {
          if (atrial) {
            const av = us(event) - us(atrial);
            const paced = atrial.code === 'atrialPace';
            if (code === 'ventricularPace' && paced) expect(Math.abs(av - pav)).toBeLessThanOrEqual(2);
            if (code === 'safetyPace') expect(Math.abs(av - Math.min(110_000, pav))).toBeLessThanOrEqual(2);
            if (code === 'ventricularPace' && !paced)
              expect(av).toBeGreaterThanOrEqual(sensedAvDelayMs * 1000);
          }
          atrial = null;
          lastVentricular = us(event);
        }
      }
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
