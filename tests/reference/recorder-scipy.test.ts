import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createBandLimiter } from '../../shared/engine/recorder/band-limiter';
import { highPass } from '../../shared/engine/recorder/high-pass';
import { lowPass } from '../../shared/engine/recorder/low-pass';
import { designRecorder } from '../../shared/engine/recorder/recorder-design';
import { magnitudeAt, type Section } from '../../shared/engine/recorder/section';
import { hasPythonModule, runPython } from '../support/python';
import { allowedPairs, recorderSettings } from '../support/recorder-bench';
import { notchWidthMv, scipyRoundingMv } from '../support/tolerances';

interface MagnitudeCase {
  id: string;
  topic: string;
  name: string;
  tolerance: string;
  inputs: { order: number; cutoff_hz: number; type: string; fs_hz: number; freqs_hz: number[] };
  value: { digital_magnitude: number[] };
}

// Values computed with SciPy (scipy.signal.butter, sosfreqz); script: tests/fixtures/tools/make_worked_examples.py.
const examples = JSON.parse(
  readFileSync(new URL('../fixtures/worked-examples.json', import.meta.url), 'utf8'),
) as { cases: MagnitudeCase[] };

/** Our design for a worked example; null for the second-order high-passes, which no recorder here has. */
function sectionsFor({ order, cutoff_hz, type, fs_hz }: MagnitudeCase['inputs']): Section[] | null {
  if (type === 'lowpass') return lowPass(cutoff_hz, fs_hz, order / 2);
  return type === 'highpass' && order === 1 ? [highPass(cutoff_hz, fs_hz)] : null;
}

const magnitudeCases = examples.cases.filter(
  (one) => one.topic === 'butterworth magnitude' && one.inputs.type && sectionsFor(one.inputs) !== null,
);

describe('filters against SciPy values (worked examples A01 to A30)', () => {
  it('finds the twelve low-passes and the nine first-order high-passes', () => {
    expect(magnitudeCases.filter((one) => one.inputs.type === 'lowpass').length).toBe(12);
    expect(magnitudeCases.filter((one) => one.inputs.type === 'highpass').length).toBe(9);
  });

  it.each(magnitudeCases)('$id: $name', ({ inputs, value, tolerance }) => {
    const allowed = Number(tolerance.replace('abs ', ''));
    inputs.freqs_hz.forEach((frequency, i) => {
      const magnitude = magnitudeAt(sectionsFor(inputs)!, frequency, inputs.fs_hz);
      expect(Math.abs(magnitude - value.digital_magnitude[i])).toBeLessThan(allowed);
    });
  });
});

/**
 * SciPy's side: a stretch of the ECG record that SciPy ships (scipy.misc.electrocardiogram: MIT-BIH Arrhythmia
 * Database record 208, lead MLII, 360 Hz, in mV), stretched to the internal rate by straight lines, through filters
 * that SciPy designs itself.
 */
const program = `
import json, sys
import numpy as np
from scipy.misc import electrocardiogram
from scipy.signal import butter, iirnotch, sosfilt, tf2sos
folder = sys.argv[1]
seconds = 20
ecg = electrocardiogram()[: 360 * (seconds + 1)]
for run in json.load(open(folder + '/runs.json')):
    rate = run['rateHz']
    x = np.interp(np.arange(rate * seconds) / rate, np.arange(len(ecg)) / 360, ecg)
    sections = [butter(1, run['lowHz'], 'highpass', fs=rate, output='sos'),
                butter(4, run['highHz'], fs=rate, output='sos')]
    if run['notchHz']:
        octaves = 0.1
        width = run['notchHz'] * (2 ** (octaves / 2) - 2 ** (-octaves / 2))
        sections.append(tf2sos(*iirnotch(run['notchHz'], run['notchHz'] / width, fs=rate)))
    x.astype('<f8').tofile(folder + '/in-%d.f64' % rate)
    sosfilt(np.vstack(sections), x).astype('<f8').tofile(folder + '/' + run['name'] + '.f64')
`;

/** One filter that SciPy runs. */
interface Run {
  name: string;
  rateHz: number;
  lowHz: number;
  highHz: number;
  notchHz: number;
}

type Settings = NonNullable<ReturnType<typeof recorderSettings>>;

function runOf(settings: Settings): Run {
  const { limits, internalRateHz } = designRecorder(settings);
  if (!limits) throw new Error('nothing to filter');
  const { lowHz, highHz } = limits;
  const notchHz = settings.mainsNotchHz;
  return { name: `${lowHz}-${highHz}-${notchHz}`, rateHz: internalRateHz, lowHz, highHz, notchHz };
}

const notched = ([50, 60] as const).map((mainsNotchHz) => recorderSettings({ mainsNotchHz }));
const custom = [
  recorderSettings({ bandwidth: { lowHz: 0.01, highHz: 10 }, sampleRateHz: 250 }),
  recorderSettings({ bandwidth: { lowHz: 0.67, highHz: 250 }, sampleRateHz: 1000 }),
  recorderSettings({ bandwidth: { lowHz: 10, highHz: 500 }, sampleRateHz: 2000 }),
];
const compared = [...allowedPairs(['diagnostic', 'monitor', 'slowWave']), ...custom, ...notched].filter(
  (settings) => settings !== null,
);

const label = ({ bandwidth, sampleRateHz, mainsNotchHz }: Settings): string =>
  `${JSON.stringify(bandwidth)} at ${sampleRateHz}/s, ${mainsNotchHz === 0 ? 'no notch' : `${mainsNotchHz} Hz notch`}`;

// In CI a missing SciPy throws here and so fails the file; elsewhere the comparison is skipped, and the title says why.
const scipyIsHere = hasPythonModule('scipy.misc');

describe.skipIf(!scipyIsHere)(
  'recorder against SciPy on a real ECG record (skipped without python3-scipy)',
  () => {
    let folder = '';
    const doubles = (name: string): Float64Array =>
      new Float64Array(Uint8Array.from(readFileSync(join(folder, `${name}.f64`))).buffer);

    beforeAll(() => {
      folder = mkdtempSync(join(tmpdir(), 'paceloom-scipy-'));
      const runs = new Map(compared.map((settings) => [runOf(settings).name, runOf(settings)]));
      writeFileSync(join(folder, 'runs.json'), JSON.stringify([...runs.values()]));
      runPython(program, [folder]);
    });
    afterAll(() => rmSync(folder, { recursive: true, force: true }));

    it.each(compared.map((settings) => [label(settings), settings] as const))(
      'every output is sosfilt’s: %s',
      (_, settings) => {
        const run = runOf(settings);
        const input = doubles(`in-${run.rateHz}`);
        const expected = doubles(run.name);
        const { decimation } = designRecorder(settings);
        const [output] = createBandLimiter(designRecorder(settings), 1).process([input], input.length);
        expect(output.length).toBe(20 * settings.sampleRateHz);
        const worst = output.reduce(
          (most, value, k) => Math.max(most, Math.abs(value - expected[k * decimation])),
          0,
        );
        expect(worst).toBeLessThan(settings.mainsNotchHz === 0 ? scipyRoundingMv : notchWidthMv);
        // The record is a real one and not silence.
        expect(Math.max(...output)).toBeGreaterThan(0.3);
      },
    );
  },
);
