import { createStimulusDetector, markerToleranceMs } from '../../engine/recorder/stimulus-detector';
import { benchDesign, type BenchSetting } from '../bench-setting';
import { fitSine, largest, lineSlope } from '../fit';
import { recordSignal, type Signal } from '../record-signal';
import { msPerS } from '../../units';
import {
  areaExact,
  besidePulse,
  lowFrequencyPulse,
  pacingPulse,
  pacingPulseTest,
  rectangle,
  repeated,
  trapezoid,
  triangle,
} from '../test-signals';
import { claimedBy, iec25, signed, type Measured, type Requirement } from './requirement';

/** After the falling edge the low-pass itself rings; displacement is read from here on, s. */
const quietS = lowFrequencyPulse.widthS + 0.1;
const pulse = rectangle(lowFrequencyPulse.widthS);

function afterPulse(setting: BenchSetting): Float64Array {
  const signal: Signal = (timeS) => lowFrequencyPulse.amplitudeMv * pulse(timeS);
  const rateHz = setting.recorder.sampleRateHz;
  return recordSignal(setting, signal, -1, 11).subarray(Math.ceil(quietS * rateHz));
}

function displacement(setting: BenchSetting): Measured {
  const value = largest(afterPulse(setting));
  return { text: `${value.toFixed(3)} mV`, value, margin: 1 - value / 0.1 };
}

function slope(setting: BenchSetting): Measured {
  const rateHz = setting.recorder.sampleRateHz;
  const after = afterPulse(setting);
  let value = 0;
  for (let from = 0; from + rateHz <= after.length; from += rateHz) {
    value = Math.max(value, Math.abs(lineSlope(after.subarray(from, from + rateHz), rateHz)));
  }
  return { text: `${value.toFixed(3)} mV/s`, value, margin: 1 - value / 0.3 };
}

/** Peak that is left of a triangle, as a deviation in %, the lowest of eight positions between samples. */
function trianglePeak(setting: BenchSetting, baseS: number): Measured {
  const rateHz = setting.recorder.sampleRateHz;
  const shape = triangle(baseS);
  const peaks = Array.from({ length: 8 }, (_, i) =>
    largest(recordSignal(setting, (timeS) => 1.5 * shape(timeS - 0.1 - i / (8 * rateHz)), -0.1, 0.5)),
  );
  const value = 100 * (Math.min(...peaks) / 1.5 - 1);
  return { text: `${signed(value, 1)} %`, value, margin: null };
}

/** Lowest height that a stimulus of 2 mV and 0.5 ms leaves at 16 positions between samples, mV. */
function smallestMark(setting: BenchSetting): Measured {
  const rateHz = setting.recorder.sampleRateHz;
  const shape = rectangle(0.0005);
  const heights = Array.from({ length: 16 }, (_, i) =>
    largest(recordSignal(setting, (timeS) => 2 * shape(timeS - 0.05 - i / (16 * rateHz)), -0.1, 0.15)),
  );
  const value = Math.min(...heights);
  return { text: `${value.toFixed(3)} mV`, value, margin: value / 0.2 - 1 };
}

const widthsMs = [0.1, 0.2, 0.5, 1, 2];
const amplitudesMv = [2, 5, 20, 100, 250, 700];

/** Whether the detector marks one stimulus in one lead, beside a 40 Hz sine, once and in its place. */
function isMarked(rateHz: number, widthS: number, amplitudeMv: number, atS: number): boolean {
  // IEC 60601-2-27: edges of 10 % of the width, and 10 to 100 µs.
  const riseS = Math.min(0.0001, Math.max(0.00001, widthS / 10));
  const stimulus = areaExact(trapezoid(widthS, riseS), rateHz);
  const near = (timeS: number): boolean => timeS > atS - 0.001 && timeS < atS + 0.005;
  const detector = createStimulusDetector(1, rateHz, 0);
  const samples = Float64Array.from({ length: rateHz * 0.3 }, (_, i) => {
    const timeS = i / rateHz;
    const sine = besidePulse.amplitudeMv * Math.sin(2 * Math.PI * besidePulse.frequencyHz * timeS);
    return sine + (near(timeS) ? amplitudeMv * stimulus(timeS - atS) : 0);
  });
  const found = detector.process([samples], samples.length);
  return found.length === 1 && Math.abs(found[0] - atS) * msPerS <= markerToleranceMs;
}

/** Share of stimuli over the whole range that are marked once each, at four positions between samples. */
function marked(setting: BenchSetting): Measured {
  const rateHz = benchDesign(setting).internalRateHz;
  const trials = widthsMs.flatMap((widthMs) =>
    amplitudesMv.flatMap((size) =>
      [0, 0.25, 0.5, 0.75].flatMap((phase) =>
        [size, -size].map((amplitudeMv) => ({ widthMs, amplitudeMv, atS: 0.2 + phase / rateHz })),
      ),
    ),
  );
  const hits = trials.filter(({ widthMs, amplitudeMv, atS }) =>
    isMarked(rateHz, widthMs / msPerS, amplitudeMv, atS),
  );
  const value = (100 * hits.length) / trials.length;
  return { text: `${hits.length} of ${trials.length}`, value, margin: value / 100 - 1 };
}

/** Output beside the pulses, from the end of the first one that has settled in. */
function besideLargePulses(setting: BenchSetting): { withPulses: Float64Array; without: Float64Array } {
  const everyS = pacingPulse.everyS;
  const signal = pacingPulseTest();
  const calm = pacingPulseTest(0);
  // Ten pulses before what is judged: the low-cut has met the train.
  const at =
    (one: Signal): Signal =>
    (timeS) =>
      one(timeS + 10 * everyS);
  const run = (one: Signal): Float64Array => recordSignal(setting, at(one), -10 * everyS, 10.2);
  return { withPulses: run(signal), without: run(calm) };
}

/** Amplitude of the sine from 50 ms after each pulse to the next one, lowest and highest, as a share of 1. */
function sineBesidePulses(setting: BenchSetting): { least: number; most: number } {
  const rateHz = setting.recorder.sampleRateHz;
  const { withPulses, without } = besideLargePulses(setting);
  const usual = fitSine(without, besidePulse.frequencyHz, rateHz).amplitude;
  const shares: number[] = [];
  for (let pulseS = 0.3; pulseS < 9; pulseS += pacingPulse.everyS) {
    const from = Math.round((pulseS + 0.05) * rateHz);
    const stretch = withPulses.subarray(from, from + Math.round(0.1 * rateHz));
    shares.push(fitSine(stretch, besidePulse.frequencyHz, rateHz, 0.05).amplitude / usual);
  }
  return { least: Math.min(...shares), most: Math.max(...shares) };
}

function recovery(setting: BenchSetting): Measured {
  const { least } = sineBesidePulses(setting);
  return { text: `${(100 * least).toFixed(0)} %`, value: 100 * least, margin: least / 0.7 - 1 };
}

/** Wander of the line just before each pulse over 10 s, mm at 10 mm/mV. */
function drift(setting: BenchSetting): Measured {
  const rateHz = setting.recorder.sampleRateHz;
  const { withPulses, without } = besideLargePulses(setting);
  const before: number[] = [];
  for (let pulseS = 0.3; pulseS < 10; pulseS += pacingPulse.everyS) {
    const at = Math.round((pulseS - 0.03) * rateHz);
    before.push(withPulses[at] - without[at]);
  }
  const value = 10 * (Math.max(...before) - Math.min(...before));
  return { text: `${value.toFixed(2)} mm`, value, margin: 1 - value / 10 };
}

const besideSource = {
  text: 'IEC diagnostic standard, use with pacemakers (extract without its clause)',
  provenance: 'read in a public text',
} as const;

/** Responses to pulses: the low-frequency test, narrow pulses, and pacing pulses. */
export const pulseRequirements: readonly Requirement[] = [
  {
    id: 'pulse-displacement',
    applied: '3 mV for 100 ms: displacement afterwards',
    source: iec25('201.12.4.107'),
    limit: 'at most 0.1 mV',
    unit: 'mV',
    notClaimed: claimedBy(['diagnostic', 'slowWave'], 'its low-cut displaces what follows'),
    measure: displacement,
  },
  {
    id: 'pulse-slope',
    applied: '3 mV for 100 ms: slope afterwards',
    source: iec25('201.12.4.107; ANSI/AAMI EC11, 3.2'),
    limit: 'at most 0.3 mV/s',
    unit: 'mV/s',
    notClaimed: claimedBy(['diagnostic', 'slowWave'], 'its low-cut displaces what follows'),
    measure: slope,
  },
  {
    id: 'triangle-20',
    applied: 'Triangle of 1.5 mV, 20 ms base: peak that is left',
    source: { text: 'ANSI/AAMI EC11, high-frequency response', provenance: 'from memory' },
    limit: 'not judged',
    unit: '%',
    notClaimed: () => 'the clause was not read, so nothing is claimed',
    measure: (setting) => trianglePeak(setting, 0.02),
  },
  {
    id: 'triangle-200',
    applied: 'Triangle of 1.5 mV, 200 ms base: peak that is left',
    source: { text: 'IEC 60601-2-25:2011, table 201.107, test E', provenance: 'from memory' },
    limit: 'not judged',
    unit: '%',
    notClaimed: () => 'the clause was not read, so nothing is claimed',
    measure: (setting) => trianglePeak(setting, 0.2),
  },
  {
    id: 'stimulus-visible',
    applied: 'Stimulus of 2 mV for 0.5 ms: least mark in the trace itself',
    source: { text: 'ANSI/AAMI EC13, visible mark', provenance: 'from memory' },
    limit: 'at least 0.2 mV',
    unit: 'mV',
    notClaimed: claimedBy(['diagnostic'], 'its band takes the spike away; use the stimulus marker'),
    measure: smallestMark,
  },
  {
    id: 'stimulus-marked',
    applied: 'Stimuli of 2–700 mV, 0.1–2 ms, both polarities: found by the stimulus marker',
    source: { text: 'IEC 60601-2-27:2011, 201.12.1.101.13 (range)', provenance: 'read in a public text' },
    limit: 'every one, once',
    unit: '%',
    notClaimed: () => null,
    measure: marked,
  },
  {
    id: 'pulse-recovery',
    applied: '200 mV for 1 ms on a 40 Hz sine: the sine 50 ms later',
    source: besideSource,
    limit: 'at least 70 %',
    unit: '%',
    notClaimed: claimedBy(['diagnostic'], 'declares no diagnostic band'),
    measure: recovery,
  },
  {
    id: 'pulse-drift',
    applied: '200 mV for 1 ms, 100 a minute: drift of the line in 10 s',
    source: besideSource,
    limit: 'at most 10 mm',
    unit: 'mm',
    notClaimed: claimedBy(['diagnostic'], 'declares no diagnostic band'),
    measure: drift,
  },
];

/**
 * Ringing that the notch leaves after a steep QRS (a triangle of 1 mV over 24 ms, which has much at 50 and 60 Hz), 20 to
 * 200 ms later, µV.
 */
export function notchRinging(setting: BenchSetting): number {
  const rateHz = setting.recorder.sampleRateHz;
  const shape = triangle(0.024);
  const qrs = repeated(shape, 10, 0.1);
  const plain: BenchSetting = { ...setting, recorder: { ...setting.recorder, mainsNotchHz: 0 } };
  const [notched, without] = [setting, plain].map((one) => recordSignal(one, qrs, -1, 0.4));
  const from = Math.round(0.144 * rateHz);
  return (
    1000 * largest(notched.map((value, i) => value - without[i]).subarray(from, Math.round(0.324 * rateHz)))
  );
}
