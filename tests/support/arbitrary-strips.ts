import fc from 'fast-check';
import type { StripParametersInput } from '../../shared/parameters/strip-parameters';

const between = (min: number, max: number) => fc.integer({ min, max });
const real = (min: number, max: number) => fc.double({ min, max, noNaN: true, noDefaultInfinity: true });
const some = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: undefined });

const electrical = {
  polarity: some(fc.constantFrom('bipolar' as const, 'unipolar' as const)),
  amplitudeV: some(real(0, 10)),
  pulseWidthMs: some(real(0.05, 2)),
  captureThresholdV: some(real(0.1, 10)),
  sensitivityMv: some(real(0.1, 20)),
  signalMv: some(real(0, 30)),
};

const patient = fc.record({
  atrialRhythm: some(fc.constantFrom('sinus' as const, 'arrest' as const)),
  atrialRateBpm: some(between(20, 400)),
  rateVariabilityPercent: some(between(0, 30)),
  respiratoryRateBpm: some(between(0, 60)),
  avConduction: some(fc.constantFrom('intact' as const, 'complete' as const)),
  prIntervalMs: some(between(80, 500)),
  escapeSite: some(fc.constantFrom('none' as const, 'junctional' as const, 'ventricular' as const)),
  escapeRateBpm: some(between(10, 80)),
  bundleBranchBlock: some(fc.constantFrom('none' as const, 'left' as const, 'right' as const)),
});

const pacing = fc
  .record({
    source: fc.constantFrom('implanted' as const, 'none' as const),
    mode: fc.constantFrom(
      'AOO',
      'AAI',
      'VOO',
      'VVI',
      'DOO',
      'DDD',
      'VVIOV',
      'DOOOV',
      'DDDOV',
    ) as fc.Arbitrary<'AOO' | 'AAI' | 'VOO' | 'VVI' | 'DOO' | 'DDD' | 'VVIOV' | 'DOOOV' | 'DDDOV'>,
    lowerRateBpm: between(20, 120),
    upperTrackingRateBpm: between(120, 200),
    pacedAvDelayMs: some(between(30, 350)),
    sensedAvDelayMs: some(between(30, 350)),
    pvarpMs: some(between(150, 500)),
    ventricularRefractoryMs: some(between(150, 500)),
    ventricularBlankingMs: some(between(10, 100)),
    interventricularDelayMs: some(between(-100, 100)),
    hisCapture: some(fc.constantFrom('selective' as const, 'nonselective' as const)),
    atrialLead: fc.record({
      ...electrical,
      site: some(fc.constantFrom('appendage' as const, 'septum' as const, 'lateral' as const)),
    }),
    rightVentricularLead: fc.record({
      ...electrical,
      site: some(
        fc.constantFrom('apex', 'septum', 'outflow', 'his', 'leftBundle') as fc.Arbitrary<
          'apex' | 'septum' | 'outflow' | 'his' | 'leftBundle'
        >,
      ),
    }),
    leftVentricularLead: fc.record({
      ...electrical,
      site: some(fc.constantFrom('lateral' as const, 'posterolateral' as const, 'anterolateral' as const)),
    }),
    left: fc.boolean(),
  })
  .map(({ left, ...rest }) =>
    left && rest.mode.length === 3 ? { ...rest, ventricularChambers: 'left' as const } : rest,
  );

/** Legal patients and pacemakers, without signals. */
export const arbitraryRhythm: fc.Arbitrary<StripParametersInput> = fc.record({
  seed: between(0, 4294967295),
  durationS: fc.constant(20),
  patient,
  pacing,
});

/** Legal strips of every kind, two seconds long. */
export const arbitraryStrip: fc.Arbitrary<StripParametersInput> = fc.record({
  seed: between(0, 4294967295),
  durationS: fc.constant(2),
  patient,
  pacing,
  waveform: fc.record({
    pAmplitudeMv: some(real(0, 0.5)),
    pDurationMs: some(real(60, 180)),
    qrsDurationMs: some(fc.option(real(70, 240))),
    qrsScale: some(real(0.2, 3)),
    axisRotationDeg: some(real(-180, 180)),
    tScale: some(real(0, 3)),
    qtcMs: some(real(300, 600)),
  }),
  disturbance: fc.record({
    baselineWanderMv: some(real(0, 2)),
    mainsMv: some(real(0, 1)),
    mainsHz: some(fc.constantFrom(50 as const, 60 as const)),
    muscleMv: some(real(0, 1)),
    motionPerMinute: some(real(0, 30)),
  }),
  recorder: fc.record({
    bandwidth: fc.oneof(
      fc.constantFrom('monitor' as const, 'diagnostic' as const, 'slowWave' as const, 'unfiltered' as const),
      fc.record({ lowHz: real(0.01, 10), highHz: real(10, 200) }),
    ),
    mainsNotchHz: some(fc.constantFrom(0 as const, 50 as const, 60 as const)),
    sampleRateHz: fc.constantFrom(500 as const, 1000 as const, 2000 as const),
    resolutionUv: some(real(1, 10)),
  }),
});
