import { quantise } from '../../engine/recorder/quantiser';
import { layoutStripSheet } from '../../paper/sheet';
import { leadNames, type LeadName } from '../../parameters/sheet';
import { parseStripParameters } from '../../parameters/parse';
import { uvPerMv } from '../../units';
import { benchDesign, type BenchSetting } from '../bench-setting';
import { fitSine, largest } from '../fit';
import { recordSignal, type Signal } from '../record-signal';
import { gainAt } from '../sine-response';
import { rectangle } from '../test-signals';
import { notchRinging } from './pulses';
import { claimedBy, claimedByAnyUse, iec25, signed, type Measured, type Requirement } from './requirement';

/** Amplitude error of 1 mV at 10 Hz, %. */
function amplitudeError(setting: BenchSetting): Measured {
  const output = recordSignal(setting, (timeS) => Math.sin(2 * Math.PI * 10 * timeS), -20, 2);
  const quantised = output.map((value) => quantise(value, setting.recorder.resolutionUv));
  const value = 100 * (fitSine(quantised, 10, setting.recorder.sampleRateHz).amplitude - 1);
  return { text: `${signed(value, 2)} %`, value, margin: 1 - Math.abs(value) / 5 };
}

/** ±5 mV at 10 Hz on an offset of 300 mV: error of the amplitude, %. */
function onOffset(setting: BenchSetting): Measured {
  const signal: Signal = (timeS) => 300 + 5 * Math.sin(2 * Math.PI * 10 * timeS);
  // A low-cut of 0.05 Hz forgets the offset in a minute; what is left of it is fitted as a constant.
  const output = recordSignal(setting, signal, -60, 2);
  const value = 100 * (fitSine(output, 10, setting.recorder.sampleRateHz).amplitude / 5 - 1);
  return { text: `${signed(value, 2)} %`, value, margin: 1 - Math.abs(value) / 10 };
}

/** A triangle of ±5 mV that rises and falls by 125 mV/s; the largest error as a share of 5 mV, %. */
function reproduction(setting: BenchSetting): Measured {
  const rateHz = setting.recorder.sampleRateHz;
  const periodS = (4 * 5) / 125;
  const signal: Signal = (timeS) => {
    const phase = timeS / periodS - Math.floor(timeS / periodS);
    return 5 * (phase < 0.5 ? 4 * phase - 1 : 3 - 4 * phase);
  };
  const output = recordSignal(setting, signal, -20, 1.6);
  const value = (100 * largest(output.map((one, k) => one - signal(k / rateHz)))) / 5;
  return { text: `${value.toFixed(1)} %`, value, margin: 1 - value / 20 };
}

/** Difference between the lowest and the highest sample of a silent input over 10 s, µV. */
function silence(setting: BenchSetting): Measured {
  const output = recordSignal(setting, () => 0, -1, 10).map((value) =>
    quantise(value, setting.recorder.resolutionUv),
  );
  const value = uvPerMv * (Math.max(...output) - Math.min(...output));
  return { text: `${value.toFixed(1)} µV`, value, margin: 1 - value / 30 };
}

function sampleRate(setting: BenchSetting): Measured {
  // Counted on the running recorder, not read from the setting.
  const value = recordSignal(setting, () => 0, 0, 1).length;
  return { text: `${value} /s`, value, margin: value / 500 - 1 };
}

/** The smallest step between samples of a slow ramp, µV. */
function quantiserStep(setting: BenchSetting): Measured | null {
  const { resolutionUv, sampleRateHz } = setting.recorder;
  const output = recordSignal(setting, (timeS) => 0.2 * timeS, -0.5, 1).map((value) =>
    quantise(value, resolutionUv),
  );
  let value = Infinity;
  for (let k = 1; k < sampleRateHz; k++) {
    const step = uvPerMv * Math.abs(output[k] - output[k - 1]);
    if (step > 1e-6) value = Math.min(value, step);
  }
  // A low-cut that runs both ways turns a ramp into nothing.
  if (!Number.isFinite(value)) return null;
  return { text: `${Number(value.toFixed(2))} µV`, value, margin: 1 - value / 5 };
}

/** Two pulses of 1 mV and 200 ms, 2 s apart, recorded and laid on a sheet; places of the trace in mm. */
function onSheet(setting: BenchSetting): { heightMm: number; apartMm: number; speedMmPerS: number } {
  const pulse = rectangle(0.2);
  const samples = recordSignal(setting, (timeS) => pulse(timeS - 0.5) + pulse(timeS - 2.5), -20, 4);
  const leads = Object.fromEntries(leadNames.map((lead) => [lead, new Float32Array(samples)]));
  const { sheet } = parseStripParameters({ sheet: { layout: 'single', leads: ['II'] } });
  const strip = {
    sampleRateHz: setting.recorder.sampleRateHz,
    leads: leads as Record<LeadName, Float32Array>,
    engineVersion: '',
    parameters: { title: 'Test', seed: 1, recorder: setting.recorder },
  };
  const points = layoutStripSheet(strip, sheet).items.flatMap((item) =>
    item.kind === 'polyline' && item.role === 'trace' ? [item.pointsMm] : [],
  );
  const at = (i: number): number[] => points.flatMap((one) => [...one].filter((_, k) => k % 2 === i));
  const [x, y] = [at(0), at(1)];
  const crossings = risingCrossings(x, y);
  return {
    heightMm: plateau(x, y, crossings[0], sheet.speedMmPerS),
    apartMm: crossings[1] - crossings[0],
    speedMmPerS: sheet.speedMmPerS,
  };
}

/** Where the pen crosses half of the pulse on its way up, mm from the left. */
function risingCrossings(x: readonly number[], y: readonly number[]): number[] {
  const half = (Math.min(...y) + y[0]) / 2;
  const found: number[] = [];
  for (let i = 1; i < y.length; i++) {
    if (!(y[i - 1] > half && y[i] <= half)) continue;
    found.push(x[i - 1] + ((y[i - 1] - half) / (y[i - 1] - y[i])) * (x[i] - x[i - 1]));
  }
  return found;
}

/** Height of the jump at the first pulse: the pen 60 ms after it against 60 ms before it, mm. */
function plateau(x: readonly number[], y: readonly number[], atMm: number, speedMmPerS: number): number {
  const near = (mm: number): number => {
    const after = x.findIndex((one) => one >= mm);
    const share = (mm - x[after - 1]) / (x[after] - x[after - 1]);
    return y[after - 1] + share * (y[after] - y[after - 1]);
  };
  const away = 0.06 * speedMmPerS;
  return near(atMm - away) - near(atMm + away);
}

function gainOnSheet(setting: BenchSetting): Measured {
  const { heightMm } = onSheet(setting);
  return {
    text: `${heightMm.toFixed(2)} mm/mV`,
    value: heightMm,
    margin: 1 - Math.abs(heightMm / 10 - 1) / 0.05,
  };
}

function timeBaseOnSheet(setting: BenchSetting): Measured {
  const { apartMm, speedMmPerS } = onSheet(setting);
  const value = apartMm / 2;
  return {
    text: `${value.toFixed(3)} mm/s`,
    value,
    margin: 1 - Math.abs(value / speedMmPerS - 1) / 0.05,
  };
}

function noNotch(setting: BenchSetting): string | null {
  return setting.recorder.mainsNotchHz === 0 ? 'no notch is on' : 'no published limit was read';
}

function notchDepth(setting: BenchSetting): Measured | null {
  const { mainsNotchHz } = setting.recorder;
  if (mainsNotchHz === 0) return null;
  const value = 20 * Math.log10(Math.max(1e-6, gainAt(setting, mainsNotchHz) / gainAt(setting, 10)));
  return { text: `${signed(value, 0)} dB`, value, margin: null };
}

/** A sine that folds onto the upper limit: how far it is down, dB. */
function alias(setting: BenchSetting): Measured | null {
  const { limits, settings } = benchDesign(setting);
  if (!limits) return null;
  const aliasHz = settings.sampleRateHz - limits.highHz;
  const value = 20 * Math.log10(Math.max(1e-6, gainAt(setting, aliasHz) / gainAt(setting, 10)));
  return { text: `${signed(value, 1)} dB at ${aliasHz} Hz`, value, margin: value / -aliasLimitDb - 1 };
}

/** What a fourth-order 150 Hz limit leaves of 350 Hz at 500 samples/s, dB down. */
const aliasLimitDb = 29;

const chart = { text: 'Chart paper convention; ANSI/AAMI EC11', provenance: 'common practice' } as const;

/** Amplitude, time base, range, noise, samples, notch. */
export const accuracyRequirements: readonly Requirement[] = [
  {
    id: 'amplitude',
    applied: 'Sine of 1 mV at 10 Hz: error of the recorded amplitude',
    source: iec25('amplitude error'),
    limit: 'within 5 %',
    unit: '%',
    notClaimed: claimedByAnyUse,
    measure: amplitudeError,
  },
  {
    id: 'offset',
    applied: '±5 mV at 10 Hz on an offset of 300 mV: change of the amplitude',
    source: {
      text: 'IEC 60601-2-25:2011, 201.12.4.107.2; IEC 60601-2-27:2011, offset',
      provenance: 'read in a public text',
    },
    limit: 'within 10 %',
    unit: '%',
    notClaimed: claimedByAnyUse,
    measure: onOffset,
  },
  {
    id: 'reproduction',
    applied: 'Triangle of ±5 mV at 125 mV/s: largest error',
    source: { text: 'IEC 60601-2-27:2011, signal reproduction', provenance: 'read in a public text' },
    limit: 'at most 20 %',
    unit: '%',
    notClaimed: claimedByAnyUse,
    measure: reproduction,
  },
  {
    id: 'sheet-gain',
    applied: '1 mV for 200 ms, recorded and laid on a sheet: gain',
    source: chart,
    limit: '10 mm/mV within 5 %',
    unit: 'mm/mV',
    notClaimed: claimedBy(['diagnostic', 'slowWave'], 'its low-cut makes the pulse sag'),
    measure: gainOnSheet,
  },
  {
    id: 'sheet-time',
    applied: 'Two pulses 2 s apart, recorded and laid on a sheet: time base',
    source: chart,
    limit: '25 mm/s within 5 %',
    unit: 'mm/s',
    notClaimed: () => null,
    measure: timeBaseOnSheet,
  },
  {
    id: 'noise',
    applied: 'Silent input for 10 s: peak to valley',
    source: iec25('noise'),
    limit: 'at most 30 µV',
    unit: 'µV',
    notClaimed: () => null,
    measure: silence,
  },
  {
    id: 'sampling-rate',
    applied: 'Samples counted in one second',
    source: iec25('201.12.4.107.3'),
    limit: 'at least 500 /s',
    unit: '/s',
    notClaimed: claimedBy(['diagnostic'], 'declares no diagnostic use'),
    measure: sampleRate,
  },
  {
    id: 'quantiser',
    applied: 'Ramp of 0.2 mV/s: smallest step between samples',
    source: iec25('201.12.4.107.3'),
    limit: 'at most 5 µV',
    unit: 'µV',
    notClaimed: claimedBy(['diagnostic'], 'declares no diagnostic use'),
    measure: quantiserStep,
  },
  {
    id: 'alias',
    applied: 'Sine that folds onto the upper limit',
    source: { text: 'Why the low-pass has the fourth order', provenance: 'own contract' },
    limit: `at least ${aliasLimitDb} dB down`,
    unit: 'dB',
    notClaimed: claimedByAnyUse,
    measure: alias,
  },
  {
    id: 'notch-depth',
    applied: 'Sine at the notch',
    source: { text: 'Mains filter practice', provenance: 'common practice' },
    limit: 'not judged',
    unit: 'dB',
    notClaimed: noNotch,
    measure: notchDepth,
  },
  {
    id: 'notch-ringing',
    applied: 'Triangle of 1 mV over 24 ms for a QRS: ringing of the notch 20 to 200 ms later',
    source: { text: 'Mains filter practice', provenance: 'common practice' },
    limit: 'not judged',
    unit: 'µV',
    notClaimed: noNotch,
    measure: (setting) => {
      if (setting.recorder.mainsNotchHz === 0) return null;
      const value = notchRinging(setting);
      return { text: `${value.toFixed(0)} µV`, value, margin: null };
    },
  },
];
