import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { lowPass } from '../../shared/engine/recorder/low-pass';
import { createStripStream } from '../../shared/engine/render';
import { addStimulusArtefact } from '../../shared/engine/stimulus/stimulus-artefact';
import { dowerMatrix } from '../../shared/engine/leads';
import { bandLimits, type Bandwidth } from '../../shared/parameters/recorder';
import { designRecorder } from '../../shared/engine/recorder/recorder-design';
import { recorderSettings } from '../support/recorder-bench';
import { steadyStrip } from '../support/strips';
import { spikeToleranceMv } from '../support/tolerances';

interface PulseCase {
  id: string;
  inputs: { width_ms: number; cutoff_hz: number; order: number };
  value: { peak_ratio_continuous: number };
}

// Closed-form heights of a low-passed rectangular pulse: worked examples B05 to B20.
const { cases } = JSON.parse(
  readFileSync(new URL('../fixtures/worked-examples.json', import.meta.url), 'utf8'),
) as { cases: PulseCase[] };
const pulses = cases.filter((one) => /^B(0[5-9]|1\d|20)$/.test(one.id) && one.inputs.order === 4);

/** One step after another through second-order sections, the plainest way there is. */
function runSections(sections: ReturnType<typeof lowPass>, input: Float64Array): Float64Array {
  return sections.reduce((samples, { a, b, k }) => {
    let [x1, x2, y1, y2] = [0, 0, 0, 0];
    return samples.map((x) => {
      const y = k * (b[0] * x + b[1] * x1 + b[2] * x2) - a[0] * y1 - a[1] * y2;
      [x2, x1, y2, y1] = [x1, x, y1, y];
      return y;
    });
  }, input);
}

/** x component of a right ventricular stimulus on a clock, mV, from −10 ms on. */
function artefact(rateHz: number, shiftS: number, widthMs: number, samples: number): Float64Array {
  const out = {
    x: new Float64Array(samples),
    y: new Float64Array(samples),
    z: new Float64Array(samples),
  };
  addStimulusArtefact(out, { rateHz, firstTimeS: -0.01 + shiftS }, 0, samples, {
    timeS: 0,
    chamber: 'rightVentricle',
    amplitudeMv: -Math.sqrt(3),
    widthMs,
  });
  return out.x;
}

const peak = (samples: Float64Array): number => samples.reduce((most, value) => Math.max(most, value), 0);

describe('height of a band-limited stimulus against the closed form', () => {
  it('has every width and cutoff', () => {
    expect(pulses.length).toBe(8);
  });

  it.each(pulses)('$id: $inputs.width_ms ms at $inputs.cutoff_hz Hz', ({ inputs, value }) => {
    // The recharge takes at most 2 % at 150 Hz and 6 % at 40 Hz, always downwards.
    const share = inputs.cutoff_hz === 150 ? 0.025 : 0.075;
    for (const phase of [0, 0.25, 0.6]) {
      const input = artefact(8000, phase / 8000, inputs.width_ms, 800);
      const height = peak(runSections(lowPass(inputs.cutoff_hz, 8000, 2), input));
      expect(height).toBeLessThanOrEqual(value.peak_ratio_continuous * 1.003);
      expect(height).toBeGreaterThanOrEqual(value.peak_ratio_continuous * (1 - share));
    }
  });
});

describe('fidelity: the internal rate against brute force at 64 kHz with the same analogue prototype', () => {
  for (const cutoff of [40, 150, 200, 250, 400, 500]) {
    const settings = recorderSettings({ bandwidth: { lowHz: 0.05, highHz: cutoff }, sampleRateHz: 2000 });
    if (!settings) throw new Error('refused');
    const rate = designRecorder(settings).internalRateHz;
    for (const phase of [0, 0.3, 0.5, 0.9]) {
      it(`${cutoff} Hz, stimulus ${phase} of a sample late`, () => {
        const samples = 800;
        const shiftS = -phase / 8000;
        const ours = runSections(lowPass(cutoff, rate, 2), artefact(rate, shiftS, 0.4, samples));
        const brute = runSections(
          lowPass(cutoff, 64000, 2),
          artefact(64000, shiftS, 0.4, (samples * 64000) / rate),
        );
        const tolerance = spikeToleranceMv(peak(brute));
        let worst = 0;
        ours.forEach((value, i) => (worst = Math.max(worst, Math.abs(value - brute[(i * 64000) / rate]))));
        expect(worst).toBeLessThan(tolerance);
      });
    }
  }
});

describe('a spike on the strip', () => {
  /** Height of the first ventricular spike in lead II, against the baseline just before, mV. */
  function heightInII(bandwidth: Bandwidth): number {
    const strip = steadyStrip({
      patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
      pacing: {
        source: 'implanted',
        mode: 'VOO',
        rightVentricularLead: { amplitudeV: 2.5, captureThresholdV: 9, surfaceSpikeMv: 10 },
      },
      recorder: { bandwidth, sampleRateHz: 2000 },
    });
    const { measured, events } = createStripStream(strip).next(4000);
    const stimulus = events.find((event) => event.type === 'stimulus' && event.timeS > 0.1);
    if (!stimulus) throw new Error('no stimulus');
    const at = Math.round(stimulus.timeS * 2000);
    const around = measured.II.subarray(at - 40, at + 40).map((value) =>
      Math.abs(value - measured.II[at - 60]),
    );
    return peak(around);
  }

  const [x, y, z] = dowerMatrix.II;
  const inII = (10 * Math.abs(-x - y + z)) / Math.sqrt(3);

  // Worked examples B06 and B08: 0.4 ms through fourth order.
  it.each([
    ['diagnostic', 0.143356792, 0.03],
    ['slowWave', 0.0383500165, 0.08],
    ['monitor', 0.0383500165, 0.12],
  ] as const)('%s leaves its closed-form share', (bandwidth, ratio, tolerance) => {
    const height = heightInII(bandwidth) / inII;
    expect(height).toBeLessThan(ratio * 1.01);
    expect(height).toBeGreaterThan(ratio * (1 - tolerance));
    expect(bandLimits(bandwidth)).not.toBeNull();
  });
});
