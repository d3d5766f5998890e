import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { MarkerEvent } from '../../../shared/engine/events';
import { sensingWindows, type SensingWindow } from '../../../shared/ladder/sensing-windows';
import { arbitraryRhythm } from '../../support/arbitrary-strips';
import { buildStrip, eventsOf, steadyStrip } from '../../support/strips';

const windowAt = (windows: readonly SensingWindow[], channel: SensingWindow['channel'], timeS: number) =>
  windows.find((one) => one.channel === channel && timeS >= one.fromS - 1e-9 && timeS < one.toS - 1e-9);

/** What a sense tells of the window it fell into. */
function expectedKind({ code, window, cause }: MarkerEvent): SensingWindow['kind'] | null {
  // Crosstalk comes at the very start of its window, and closes it.
  if (window === 'crosstalk') return cause === 'crosstalk' ? null : 'crosstalk';
  if (code === 'atrialSense' || code === 'ventricularSense') return 'alert';
  if (code.endsWith('RefractorySense')) return 'refractory';
  return null;
}

describe('sensing windows', () => {
  it('agree with every sense that the device logged', () => {
    let checked = 0;
    fc.assert(
      fc.property(arbitraryRhythm, (input) => {
        const strip = buildStrip(input);
        const events = eventsOf(strip);
        const windows = sensingWindows(events, strip.pacing, strip.durationS);
        for (const event of events) {
          const kind = event.type === 'marker' ? expectedKind(event) : null;
          if (event.type !== 'marker' || kind === null) continue;
          const channel = event.code.startsWith('atrial') ? 'atrium' : 'ventricle';
          // The window that ended with this sense began before it.
          const before = windows.filter((one) => one.channel === channel && one.fromS < event.timeS - 1e-9);
          const covering = before.find((one) => event.timeS <= one.toS + 1e-9);
          if (!covering) continue;
          const ends = Math.abs(covering.toS - event.timeS) < 1e-9 && covering.kind !== kind;
          const at = ends ? windowAt(windows, channel, event.timeS) : covering;
          expect(at?.kind).toBe(kind);
          checked += 1;
        }
      }),
      { numRuns: 150, seed: 5 },
    );
    expect(checked).toBeGreaterThan(500);
  });

  it('lie side by side on each channel', () => {
    fc.assert(
      fc.property(arbitraryRhythm, (input) => {
        const strip = buildStrip(input);
        const windows = sensingWindows(eventsOf(strip), strip.pacing, strip.durationS);
        for (const channel of ['atrium', 'ventricle'] as const) {
          const own = windows.filter((one) => one.channel === channel);
          own.slice(1).forEach((one, i) => expect(one.fromS).toBeCloseTo(own[i].toS, 9));
          for (const one of own) expect(one.toS).toBeGreaterThan(one.fromS);
        }
      }),
      { numRuns: 100, seed: 6 },
    );
  });

  it('show PVARP, refractory period and blanking as they are set', () => {
    const strip = steadyStrip({
      patient: { avConduction: 'complete', atrialRateBpm: 75 },
      pacing: { source: 'implanted', pvarpMs: 300, ventricularRefractoryMs: 240 },
    });
    const windows = sensingWindows(eventsOf(strip), strip.pacing, 10);
    const lengths = (label: string) =>
      windows
        .filter((one) => one.label === label && one.toS < 10)
        .map((one) => Math.round((one.toS - one.fromS) * 1000));
    expect(new Set(lengths('PVARP'))).toEqual(new Set([200]));
    expect(new Set(lengths('VRP'))).toEqual(new Set([140]));
  });

  it('are none for a device that senses nothing', () => {
    for (const mode of ['VOO', 'DOO', 'AOO'] as const) {
      const strip = buildStrip({ pacing: { source: 'implanted', mode } });
      expect(sensingWindows(eventsOf(strip), strip.pacing, 10)).toEqual([]);
    }
    expect(sensingWindows([], buildStrip({}).pacing, 10)).toEqual([]);
  });
});
