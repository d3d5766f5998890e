import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { measuredLeads } from '../../shared/engine/leads';
import { createBandLimiter } from '../../shared/engine/recorder/band-limiter';
import { designRecorder } from '../../shared/engine/recorder/recorder-design';
import { createRhythm } from '../../shared/engine/rhythm/rhythm';
import { createChannelSource } from '../../shared/engine/signal/channel-source';
import { createElectrodeSignal } from '../../shared/engine/signal/electrode-signal';
import { galleryPreset, presetParameters } from '../../shared/gallery/gallery';
import type { BenchSetting } from '../../shared/recorder-bench/bench-setting';
import { builtInSettings } from '../../shared/recorder-bench/built-in-settings';
import { measureResponses } from '../../shared/recorder-bench/responses';
import { welch } from '../../shared/recorder-bench/spectrum';
import { filterBothWays, onePassHz } from '../../shared/recorder-bench/zero-phase';
import { hasPythonModule, runPython } from '../support/python';
import { designRatio, scipyRoundingMv, sineFit } from '../support/tolerances';

/**
 * SciPy's side (python3-scipy of Debian): sosfreqz and group_delay of filters that SciPy designs itself, sosfilt over a
 * strip as it lies at the electrodes, filtfilt and welch over the ECG record that SciPy ships (scipy.misc.
 * electrocardiogram: MIT-BIH Arrhythmia Database record 208, lead MLII, 360 Hz, in mV).
 */
const program = `
import json, sys
import numpy as np
from scipy.misc import electrocardiogram
from scipy.signal import butter, filtfilt, sosfilt, sosfreqz, welch
folder = sys.argv[1]
plan = json.load(open(folder + '/plan.json'))
ecg = electrocardiogram()[: 360 * 60].astype('<f8')
ecg.tofile(folder + '/ecg.f64')

def bandpass(run):
    return np.vstack([butter(1, run['lowHz'], 'highpass', fs=run['rateHz'], output='sos'),
                      butter(4, run['highHz'], fs=run['rateHz'], output='sos')])

out = {'responses': []}
for run in plan['responses']:
    sos = bandpass(run)
    w = 2 * np.pi * np.array(run['hz']) / run['rateHz']
    step = 1e-4
    _, h = sosfreqz(sos, w)
    _, lower = sosfreqz(sos, w * (1 - step))
    _, upper = sosfreqz(sos, w * (1 + step))
    delay = -np.angle(upper / lower) / (2 * step * 2 * np.pi * np.array(run['hz']))
    out['responses'].append({'gain': np.abs(h).tolist(), 'delayS': delay.tolist()})
for run in plan['strips']:
    x = np.fromfile(folder + '/' + run['name'] + '-in.f64', '<f8')
    sosfilt(bandpass(run), x).astype('<f8').tofile(folder + '/' + run['name'] + '-out.f64')
for run in plan['bothWays']:
    b, a = butter(1, run['onePassHz'], 'highpass', fs=360)
    filtfilt(b, a, ecg, padtype='odd', padlen=run['padLength']).astype('<f8').tofile(folder + '/both-%s.f64' % run['lowHz'])
f, power = welch(ecg, fs=360, window='hann', nperseg=1024, noverlap=512, detrend='constant', scaling='density')
power.astype('<f8').tofile(folder + '/welch.f64')
json.dump(out, open(folder + '/out.json', 'w'))
`;

const bandLimited = ['diagnostic', 'monitor', 'slowWave', 'custom'] as const;
const strips = ['av-sequential-pacing', 'unipolar-spike', 'transcutaneous-capture'] as const;
const bothWays = [0.05, 0.67, 2];

/** Samples that a zero-phase filter adds at each end: three time constants. */
const padLength = (lowHz: number): number => Math.ceil((3 * 360) / (2 * Math.PI * lowHz));

function limitsOf(setting: BenchSetting): { rateHz: number; lowHz: number; highHz: number } {
  const { limits, internalRateHz } = designRecorder(setting.recorder);
  if (!limits) throw new Error('no limits');
  return { rateHz: internalRateHz, ...limits };
}

/** Lead V2 of a preset at the electrodes, 4 s at the diagnostic recorder's internal rate, mV. */
function electrodeSamples(preset: string): Float64Array {
  const parameters = presetParameters(galleryPreset(preset));
  const { internalRateHz } = designRecorder(builtInSettings.diagnostic.recorder);
  const signal = createElectrodeSignal(parameters, createRhythm(parameters));
  const source = createChannelSource(parameters, signal, internalRateHz);
  const clock = { rateHz: internalRateHz, firstTimeS: 0 };
  const { channels } = source.render(clock, 0, 4 * internalRateHz);
  expect(measuredLeads).toContain('V2');
  return source.toMeasured(channels).V2.slice();
}

// In CI a missing SciPy throws here and so fails the file; elsewhere the comparison is skipped, and the title says why.
const scipyIsHere = hasPythonModule('scipy.misc');

describe.skipIf(!scipyIsHere)('the recorder bench against SciPy (skipped without python3-scipy)', () => {
  let folder = '';
  const doubles = (name: string): Float64Array =>
    new Float64Array(Uint8Array.from(readFileSync(join(folder, `${name}.f64`))).buffer);
  const write = (name: string, samples: Float64Array): void =>
    writeFileSync(join(folder, `${name}.f64`), new Uint8Array(samples.buffer));
  const responses = bandLimited.map((name) => measureResponses(builtInSettings[name]));
  let expected: { responses: { gain: number[]; delayS: number[] }[] };

  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'paceloom-bench-'));
    for (const preset of strips) write(`${preset}-in`, electrodeSamples(preset));
    const plan = {
      responses: bandLimited.map((name, i) => ({
        ...limitsOf(builtInSettings[name]),
        hz: responses[i].magnitude.map(({ frequencyHz }) => frequencyHz),
      })),
      strips: strips.map((name) => ({ name, ...limitsOf(builtInSettings.diagnostic) })),
      bothWays: bothWays.map((lowHz) => ({
        lowHz,
        onePassHz: onePassHz(lowHz),
        padLength: padLength(lowHz),
      })),
    };
    writeFileSync(join(folder, 'plan.json'), JSON.stringify(plan));
    runPython(program, [folder]);
    expected = JSON.parse(readFileSync(join(folder, 'out.json'), 'utf8')) as typeof expected;
  });
  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  it.each(bandLimited.map((name, i) => [name, i] as const))(
    'sines through the running recorder give sosfreqz’s magnitude from 0.01 to 500 Hz: %s',
    (_, i) => {
      responses[i].magnitude.forEach(({ gain }, k) => {
        expect(Math.abs(gain - expected.responses[i].gain[k])).toBeLessThan(sineFit);
      });
      expect(responses[i].magnitude.length).toBeGreaterThan(100);
    },
  );

  it.each(bandLimited.map((name, i) => [name, i] as const))(
    'the group delay is that of the filter less what was removed: %s',
    (name, i) => {
      const removedMs = designRecorder(builtInSettings[name].recorder).delayRemovedMs;
      let compared = 0;
      responses[i].magnitude.forEach(({ frequencyHz, groupDelayMs, gain }, k) => {
        // Between neighbours a tenth of a decade apart the delay bends; within its band it is read to 3 % or 0.3 ms.
        if (groupDelayMs === null || gain < 0.5 || frequencyHz < 0.05) return;
        const wantedMs = 1000 * expected.responses[i].delayS[k] - removedMs;
        expect(Math.abs(groupDelayMs - wantedMs)).toBeLessThan(Math.max(0.3, 0.03 * Math.abs(wantedMs)));
        compared++;
      });
      expect(compared).toBeGreaterThan(30);
    },
  );

  it.each(strips)('every output on a strip is sosfilt’s: %s', (preset) => {
    const design = designRecorder(builtInSettings.diagnostic.recorder);
    const input = doubles(`${preset}-in`);
    const wanted = doubles(`${preset}-out`);
    const [output] = createBandLimiter(design, 1).process([input], input.length);
    const worst = output.reduce(
      (most, value, k) => Math.max(most, Math.abs(value - wanted[k * design.decimation])),
      0,
    );
    expect(worst).toBeLessThan(scipyRoundingMv);
    expect(Math.max(...output.map(Math.abs))).toBeGreaterThan(0.2);
  });

  it.each(bothWays)('the zero-phase low-cut is filtfilt’s on the real ECG record: %d Hz', (lowHz) => {
    const output = filterBothWays(doubles('ecg'), lowHz, 360);
    const wanted = doubles(`both-${lowHz}`);
    const worst = output.reduce((most, value, k) => Math.max(most, Math.abs(value - wanted[k])), 0);
    expect(output.length).toBe(wanted.length);
    expect(worst).toBeLessThan(scipyRoundingMv);
  });

  it('the zero-phase low-cut is 3.01 dB down at the limit that it names', () => {
    const lowHz = 0.67;
    const rateHz = 360;
    const sine = Float64Array.from({ length: 120 * rateHz }, (_, i) =>
      Math.sin((2 * Math.PI * lowHz * i) / rateHz),
    );
    const middle = filterBothWays(sine, lowHz, rateHz).subarray(50 * rateHz, 70 * rateHz);
    expect(Math.abs(Math.max(...middle) - Math.SQRT1_2)).toBeLessThan(designRatio);
  });

  it('the spectrum is welch’s on the real ECG record', () => {
    const power = welch(doubles('ecg'), 360, 1024);
    doubles('welch').forEach((wanted, k) => {
      expect(Math.abs(power[k] - wanted)).toBeLessThan(1e-9 + 1e-6 * wanted);
    });
    expect(power.length).toBe(513);
  });
});
