import { readFileSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { highPass } from '../../shared/engine/recorder/high-pass';
import { lowPass } from '../../shared/engine/recorder/low-pass';
import { magnitudeAt, type Section } from '../../shared/engine/recorder/section';
import { createBandLimiter } from '../../shared/engine/recorder/band-limiter';
import { designRecorder } from '../../shared/engine/recorder/recorder-design';
import { hasPythonModule, runPython } from '../support/python';
import { recorderSettings } from '../support/recorder-bench';
import { doubleRoundingMv } from '../support/tolerances';

interface MagnitudeCase {
  id: string;
  topic: string;
  name: string;
  inputs: { order: number; cutoff_hz: number; type: string; fs_hz: number; freqs_hz: number[] };
  value: { digital_magnitude: number[] };
}

// Values computed with SciPy (scipy.signal.butter, sosfreqz); script: tests/fixtures/tools/make_worked_examples.py.
const examples = JSON.parse(
  readFileSync(new URL('../fixtures/worked-examples.json', import.meta.url), 'utf8'),
) as { cases: MagnitudeCase[] };

function sectionsFor({ order, cutoff_hz, type, fs_hz }: MagnitudeCase['inputs']): Section[] | null {
  if (type === 'lowpass') return lowPass(cutoff_hz, fs_hz, order / 2);
  if (type === 'highpass' && order === 1) return [highPass(cutoff_hz, fs_hz)];
  return null;
}

const magnitudeCases = examples.cases.filter(
  (one) => one.topic === 'butterworth magnitude' && one.inputs.type && sectionsFor(one.inputs) !== null,
);

describe('filters against SciPy values (worked examples A)', () => {
  it('finds low-pass and high-pass cases', () => {
    expect(magnitudeCases.length).toBeGreaterThanOrEqual(12);
  });

  it.each(magnitudeCases)('$id: $name', ({ inputs, value }) => {
    const sections = sectionsFor(inputs) ?? [];
    inputs.freqs_hz.forEach((frequency, i) => {
      expect(magnitudeAt(sections, frequency, inputs.fs_hz)).toBeCloseTo(value.digital_magnitude[i], 5);
    });
  });
});

// The ECG record that SciPy ships: scipy.misc.electrocardiogram, MIT-BIH Arrhythmia Database record 208,
// lead MLII, 360 Hz. Stretched to 8 kHz by straight lines; SciPy designs its own low-pass.
const program = `
import sys, json, numpy as np
from scipy.misc import electrocardiogram
from scipy.signal import butter, sosfilt
folder, low, high = sys.argv[1], float(sys.argv[2]), float(sys.argv[3])
ecg = electrocardiogram()[: 360 * 12]
t = np.arange(8000 * 10) / 8000
x = np.interp(t, np.arange(len(ecg)) / 360, ecg)
sos = np.vstack([butter(1, low, 'highpass', fs=8000, output='sos'), butter(4, high, fs=8000, output='sos')])
x.astype('<f8').tofile(folder + '/in.f64')
sosfilt(sos, x).astype('<f8').tofile(folder + '/out.f64')
`;

function readDoubles(file: string): Float64Array {
  const bytes = readFileSync(file);
  return new Float64Array(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength));
}

describe('recorder against SciPy on a real ECG record', () => {
  it.skipIf(!hasPythonModule('scipy.misc'))(
    'agrees with sosfilt at every sample (needs python3-scipy)',
    () => {
      const folder = mkdtempSync(join(tmpdir(), 'paceloom-scipy-'));
      try {
        for (const [bandwidth, low, high] of [
          ['diagnostic', 0.05, 150],
          ['monitor', 0.5, 40],
        ] as const) {
          const settings = recorderSettings({ bandwidth, sampleRateHz: 500 });
          if (!settings) throw new Error('refused');
          writeFileSync(join(folder, 'in.f64'), '');
          runPython(program, [folder, String(low), String(high)]);
          const input = readDoubles(join(folder, 'in.f64'));
          const expected = readDoubles(join(folder, 'out.f64'));
          const design = designRecorder(settings);
          const [output] = createBandLimiter(design, 1).process([input], input.length);
          let worst = 0;
          output.forEach((value, k) => {
            worst = Math.max(worst, Math.abs(value - expected[k * design.decimation]));
          });
          expect(output.length).toBe(5000);
          expect(worst).toBeLessThan(10 * doubleRoundingMv);
        }
      } finally {
        rmSync(folder, { recursive: true, force: true });
      }
    },
  );
});
