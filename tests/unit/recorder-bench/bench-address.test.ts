import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { leadNames } from '../../../shared/parameters/sheet';
import { builtInSettings } from '../../../shared/recorder-bench/built-in-settings';
import { zeroPhaseLimitsHz, type BenchSetting } from '../../../shared/recorder-bench/bench-setting';
import { lessons } from '../../../shared/recorder-bench/lessons';
import { testSignalIds } from '../../../shared/recorder-bench/test-signals';
import { readStripParameters } from '../../../shared/parameters/parse';
import {
  chosenGains,
  lessonState,
  readBenchState,
  writeBenchState,
  type BenchState,
} from '../../../src/features/recorder-bench/state/bench-address';
import { readSettingCode, settingCode } from '../../../src/features/recorder-bench/state/setting-code';

/** Settings that the recorder takes, of every kind. */
const settings: fc.Arbitrary<BenchSetting> = fc
  .record({
    kind: fc.constantFrom('recorder', 'zeroPhase', 'pointSampled'),
    bandwidth: fc.constantFrom('monitor', 'slowWave', 'diagnostic', 'unfiltered', {
      lowHz: 0.67,
      highHz: 40.5,
    }),
    lowHz: fc.constantFrom(zeroPhaseLimitsHz.min, 0.67, zeroPhaseLimitsHz.max),
    mainsNotchHz: fc.constantFrom(0, 50, 60),
    sampleRateHz: fc.constantFrom(250, 500, 1000, 2000),
    resolutionUv: fc.constantFrom(1, 2.5, 5, 10),
  })
  .map(({ kind, lowHz, bandwidth, ...others }): BenchSetting | null => {
    const band = kind === 'pointSampled' ? 'diagnostic' : bandwidth;
    const read = readStripParameters({ recorder: { bandwidth: band, ...others } });
    if (!read.ok || (kind === 'zeroPhase' && band === 'unfiltered')) return null;
    const { recorder } = read.parameters;
    return kind === 'zeroPhase'
      ? { kind, lowHz, recorder }
      : { kind: kind as 'recorder' | 'pointSampled', recorder };
  })
  .filter((setting) => setting !== null);

const source: fc.Arbitrary<BenchState['source']> = fc.oneof(
  fc.constantFrom(...testSignalIds).map((id) => ({ kind: 'signal' as const, id })),
  fc.constantFrom(...lessons).map(({ id }) => ({ kind: 'lesson' as const, id })),
  fc.uuid().map((id) => ({ kind: 'strip' as const, id })),
  fc.constant({ kind: 'preset' as const, id: 'av-sequential-pacing' }),
);

const states: fc.Arbitrary<BenchState> = fc.record({
  source,
  settings: fc.array(settings, { minLength: 2, maxLength: 4 }),
  lead: fc.constantFrom(...leadNames),
  view: fc.constantFrom('traces', 'difference'),
  beat: fc.option(fc.integer({ min: 1, max: 99 })),
  marker: fc.boolean(),
  gain: fc.option(fc.constantFrom(...chosenGains)),
});

describe('the address of the recorder bench', () => {
  it('reads back every setting it can write', () => {
    fc.assert(
      fc.property(settings, (setting) => {
        expect(readSettingCode(settingCode(setting))).toEqual(setting);
      }),
    );
  });

  it('reads back the whole bench, through the address bar', () => {
    fc.assert(
      fc.property(states, (state) => {
        const search = new URLSearchParams(writeBenchState(state).toString());
        expect(readBenchState(search)).toEqual(state);
      }),
    );
  });

  it('opens every lesson as its link says', () => {
    for (const lesson of lessons) {
      expect(readBenchState(new URLSearchParams(`source=lesson.${lesson.id}`))).toEqual(lessonState(lesson));
    }
  });

  it.each([
    ['an unknown band', 'loud'],
    ['a low limit above the high one', '50to40'],
    ['a rate that does not exist', 'monitor-rate300'],
    ['a notch that does not exist', 'monitor-notch55'],
    ['a zero-phase limit out of range', 'zero99withdiagnostic'],
    ['zero-phase without a band', 'zero0.67withunfiltered'],
    ['nothing', ''],
  ])('takes %s for no setting', (_, code) => {
    expect(readSettingCode(code)).toBeNull();
  });

  it('falls back to the usual bench when the address makes no sense', () => {
    const usual = readBenchState(new URLSearchParams());
    expect(usual.settings).toEqual([
      builtInSettings.monitor,
      builtInSettings.slowWave,
      builtInSettings.diagnostic,
    ]);
    const nonsense = 'source=signal.loud&setting=monitor&lead=V9&view=x&beat=-3&marker=maybe&gain=7';
    expect(readBenchState(new URLSearchParams(nonsense))).toEqual(usual);
  });
});
