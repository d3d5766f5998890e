import fc from 'fast-check';
import { pacesBothVentricles, pacingModeCodes } from '../../shared/parameters/pacing-mode';
import type { StripParametersInput } from '../../shared/parameters/strip-parameters';

type PacingInput = NonNullable<StripParametersInput['pacing']>;

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
  atrialRhythm: some(
    fc.constantFrom(...(['sinus', 'sinus', 'arrest', 'tachycardia', 'flutter', 'fibrillation'] as const)),
  ),
  atrialRateBpm: some(between(20, 400)),
  rateVariabilityPercent: some(between(0, 30)),
  respiratoryRateBpm: some(between(0, 60)),
  avConduction: some(
    fc.constantFrom(...(['intact', 'wenckebach', 'mobitzTwo', 'twoToOne', 'complete'] as const)),
  ),
  conductedPerGroup: some(between(2, 8)),
  prIntervalMs: some(between(80, 500)),
  retrogradeConductionMs: some(fc.option(between(80, 450))),
  escapeSite: some(fc.constantFrom(...(['none', 'junctional', 'ventricular'] as const))),
  escapeRateBpm: some(between(10, 80)),
  bundleBranchBlock: some(fc.constantFrom(...(['none', 'left', 'right'] as const))),
  prematureVentricularPerMinute: some(fc.oneof(fc.constant(0), between(1, 60))),
  prematureAtrialPerMinute: some(fc.oneof(fc.constant(0), between(1, 60))),
  prematureCouplingMs: some(between(250, 800)),
  injury: some(
    fc.record({
      territory: fc.constantFrom(...(['none', 'anterior', 'inferior', 'lateral', 'posterior'] as const)),
      stElevationMv: real(0, 0.5),
    }),
  ),
});

const fault = fc
  .record({
    kind: fc.constantFrom(...(['failureToCapture', 'failureToPace', 'undersensing', 'oversensing'] as const)),
    chamber: fc.constantFrom(...(['atrium', 'rightVentricle', 'leftVentricle'] as const)),
    proportion: some(real(0, 1)),
    fromS: between(0, 12),
    forS: fc.option(between(1, 12)),
    intervalMs: some(between(100, 2000)),
  })
  .map(({ forS, chamber, ...rest }) => ({
    ...rest,
    chamber:
      rest.kind.endsWith('sensing') && chamber === 'leftVentricle' ? ('rightVentricle' as const) : chamber,
    toS: forS === null ? null : rest.fromS + forS,
  }));

const pacing = fc
  .record({
    source: fc.constantFrom(
      ...(['implanted', 'implanted', 'implanted', 'transvenous', 'transcutaneous', 'none'] as const),
    ),
    mode: fc.constantFrom(...pacingModeCodes),
    lowerRateBpm: between(20, 120),
    upperTrackingRateBpm: between(120, 200),
    sensorRateBpm: some(fc.option(between(30, 200))),
    hysteresisRateBpm: fc.option(between(20, 119)),
    pacedAvDelayMs: some(between(30, 350)),
    sensedAvDelayMs: some(between(30, 350)),
    pvarpMs: some(between(150, 500)),
    pvarpAfterEctopic: some(fc.constantFrom('unchanged' as const, 'lengthened' as const)),
    ventricularRefractoryMs: some(between(150, 500)),
    ventricularBlankingMs: some(between(10, 100)),
    safetyPacing: some(fc.boolean()),
    modeSwitching: some(fc.boolean()),
    modeSwitchRateBpm: some(between(120, 200)),
    magnetApplied: some(fc.constantFrom(false, false, false, true)),
    magnetRateBpm: some(between(50, 120)),
    interventricularDelayMs: some(between(-100, 100)),
    hisCapture: some(fc.constantFrom('selective' as const, 'nonselective' as const)),
    atrialLead: fc.record({
      ...electrical,
      site: some(fc.constantFrom(...(['appendage', 'septum', 'lateral'] as const))),
    }),
    rightVentricularLead: fc.record({
      ...electrical,
      site: some(fc.constantFrom(...(['apex', 'septum', 'outflow', 'his', 'leftBundle'] as const))),
    }),
    leftVentricularLead: fc.record({
      ...electrical,
      site: some(fc.constantFrom(...(['lateral', 'posterolateral', 'anterolateral'] as const))),
    }),
    transvenous: fc.record({
      outputMa: some(real(0, 25)),
      captureThresholdMa: some(real(0.1, 25)),
      sensitivityMv: some(real(0.1, 20)),
    }),
    transcutaneous: fc.record({
      currentMa: some(between(0, 200)),
      captureThresholdMa: some(between(10, 200)),
      pulseWidthMs: some(between(5, 40)),
      artefactMv: some(real(0, 20)),
    }),
    faults: fc.array(fault, { maxLength: 3 }),
    left: fc.boolean(),
  })
  .map(({ left, hysteresisRateBpm, ...rest }): PacingInput => {
    const temporary = rest.source === 'transvenous' || rest.source === 'transcutaneous';
    const mode = temporary ? (left ? 'VOO' : 'VVI') : rest.mode;
    const hysteresis =
      hysteresisRateBpm !== null && hysteresisRateBpm < rest.lowerRateBpm ? hysteresisRateBpm : null;
    const chambers = pacesBothVentricles(mode) ? 'both' : left ? 'left' : 'right';
    return { ...rest, mode, hysteresisRateBpm: hysteresis, ventricularChambers: chambers };
  });

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
    electrodeReversal: some(fc.constantFrom(...(['none', 'RA-LA', 'LA-RL', 'V1-V2', 'V5-V6'] as const))),
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
