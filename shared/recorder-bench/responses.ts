import type { BenchSetting } from './bench-setting';
import { recordSignal, type Signal } from './record-signal';
import { answerToSine, measurableHz } from './sine-response';

/** One point of the measured frequency response. */
export interface ResponsePoint {
  frequencyHz: number;
  /** Output over input. */
  gain: number;
  /** Group delay that is left after the low-pass's own was removed, ms; null at the ends and beyond half the rate. */
  groupDelayMs: number | null;
}

/** Samples of an answer over time. */
export interface TimeResponse {
  timesS: Float64Array;
  valuesMv: Float64Array;
}

export interface Responses {
  magnitude: ResponsePoint[];
  /** Answer to 1 mV for 0.25 ms (0.25 mV·ms), −20 to 80 ms, between the output samples as well. */
  impulse: TimeResponse;
  /** Answer to a step of 1 mV, −0.2 to 4 s. */
  step: TimeResponse;
}

/** Frequencies of the measured response: 24 to a decade from 0.01 to 500 Hz. */
const lowestHz = 0.01;
const highestHz = 500;
const perDecade = 24;

function frequencies(rateHz: number): number[] {
  const count = Math.floor(Math.log10(highestHz / lowestHz) * perDecade) + 1;
  return Array.from({ length: count }, (_, i) => measurableHz(lowestHz * 10 ** (i / perDecade), rateHz));
}

/** Phase difference in (−π, π]. */
function wrapped(differenceRad: number): number {
  return differenceRad - 2 * Math.PI * Math.round(differenceRad / (2 * Math.PI));
}

/** The frequency response, measured with sines run through the recorder one after another. */
function measureMagnitude(setting: BenchSetting): ResponsePoint[] {
  const answers = frequencies(setting.recorder.sampleRateHz).map((hz) => answerToSine(setting, hz));
  return answers.map(({ frequencyHz, gain }, i): ResponsePoint => {
    const before = answers[i - 1];
    const after = answers[i + 1];
    if (!before || !after || before.phaseRad === null || after.phaseRad === null) {
      return { frequencyHz, gain, groupDelayMs: null };
    }
    const turn = 2 * Math.PI * (after.frequencyHz - before.frequencyHz);
    return { frequencyHz, gain, groupDelayMs: (-1000 * wrapped(after.phaseRad - before.phaseRad)) / turn };
  });
}

/**
 * The answer to a signal between the output samples as well: the signal is run through the recorder several times,
 * each time a fraction of an output sample later.
 */
function denseResponse(
  setting: BenchSetting,
  signal: Signal,
  fromS: number,
  toS: number,
  perSample: number,
): TimeResponse {
  const rateHz = setting.recorder.sampleRateHz;
  const length = Math.round((toS - fromS) * rateHz);
  const timesS = new Float64Array(length * perSample);
  const valuesMv = new Float64Array(length * perSample);
  for (let phase = 0; phase < perSample; phase++) {
    const shiftS = fromS + phase / (perSample * rateHz);
    const output = recordSignal(setting, (timeS) => signal(timeS + shiftS), -0.1, toS - fromS);
    for (let k = 0; k < length; k++) {
      timesS[k * perSample + phase] = shiftS + k / rateHz;
      valuesMv[k * perSample + phase] = output[k];
    }
  }
  return { timesS, valuesMv };
}

/** Width of the impulse, s: two internal samples, so that its area is exact wherever it falls. */
const impulseS = 0.00025;

/** Everything that describes a setting by itself, measured from the running recorder. */
export function measureResponses(setting: BenchSetting): Responses {
  const between = Math.max(1, 2000 / setting.recorder.sampleRateHz);
  const impulse = (timeS: number): number => (timeS >= 0 && timeS < impulseS ? 1 : 0);
  const step = (timeS: number): number => (timeS >= 0 ? 1 : 0);
  return {
    magnitude: measureMagnitude(setting),
    impulse: denseResponse(setting, impulse, -0.02, 0.08, between),
    step: denseResponse(setting, step, -0.2, 4, 1),
  };
}
