import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compareMarkers, createStimulusDetector } from '../../../shared/engine/recorder/stimulus-detector';
import { createStripStream, renderStrip } from '../../../shared/engine/render';
import { buildStrip } from '../../support/strips';

const rateHz = 8000;

/** Steps of a value at sample numbers, in one channel. */
function signal(length: number, pulses: readonly { at: number; width: number; mv: number }[]): Float64Array {
  const samples = new Float64Array(length);
  for (const { at, width, mv } of pulses) for (let i = at; i < at + width; i++) samples[i] += mv;
  return samples;
}

function detect(samples: Float64Array): number[] {
  return createStimulusDetector(1, rateHz, 0).process([samples], samples.length);
}

describe('stimulus detector', () => {
  it('marks a pulse once, at its first edge', () => {
    const found = detect(signal(4000, [{ at: 800, width: 4, mv: 1 }]));
    expect(found).toHaveLength(1);
    expect(Math.abs(found[0] - 0.1)).toBeLessThan(1 / rateHz);
  });

  it('takes the end of a long chest pulse as its own, not as a second stimulus', () => {
    expect(detect(signal(4000, [{ at: 800, width: 320, mv: 5 }]))).toHaveLength(1);
  });

  it('tells two pulses 4 ms apart', () => {
    const pulses = [
      { at: 800, width: 4, mv: 1 },
      { at: 832, width: 4, mv: 1 },
    ];
    expect(detect(signal(4000, pulses))).toHaveLength(2);
  });

  it('finds nothing in silence, in a slow wave, or in a step smaller than its threshold', () => {
    expect(detect(new Float64Array(4000))).toEqual([]);
    expect(detect(Float64Array.from({ length: 8000 }, (_, i) => 2 * Math.sin(i / 100)))).toEqual([]);
    expect(detect(signal(4000, [{ at: 800, width: 4, mv: 0.1 }]))).toEqual([]);
  });

  it('does not depend on how the input is cut', () => {
    const samples = signal(3000, [
      { at: 700, width: 4, mv: 1 },
      { at: 1201, width: 3, mv: -0.6 },
    ]);
    const whole = detect(samples);
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 900 }), { minLength: 1, maxLength: 8 }), (lengths) => {
        const detector = createStimulusDetector(1, rateHz, 0);
        const found: number[] = [];
        for (let from = 0, i = 0; from < samples.length; i++) {
          const length = Math.min(lengths[i % lengths.length], samples.length - from);
          found.push(...detector.process([samples.subarray(from, from + length)], length));
          from += length;
        }
        expect(found).toEqual(whole);
      }),
      { numRuns: 40 },
    );
  });
});

describe('comparing markers with stimuli', () => {
  it('counts each marker for one stimulus at most, within 2 ms', () => {
    expect(compareMarkers([1, 2.0015, 3.5], [1, 2, 3])).toEqual({ given: 3, hits: 2, falseMarkers: 1 });
    expect(compareMarkers([1], [1, 1])).toEqual({ given: 2, hits: 1, falseMarkers: 0 });
    expect(compareMarkers([], [])).toEqual({ given: 0, hits: 0, falseMarkers: 0 });
  });
});

describe('the marker of a strip', () => {
  const strip = buildStrip({
    patient: { avConduction: 'complete' },
    pacing: { source: 'implanted' },
    recorder: { stimulusMarker: true },
  });
  const stimuli = (events: ReturnType<typeof renderStrip>['events']): number[] =>
    events.flatMap((event) => (event.type === 'stimulus' ? [event.timeS] : []));

  it('is off unless asked for, and changes no sample', () => {
    const off = renderStrip({ ...strip, recorder: { ...strip.recorder, stimulusMarker: false } });
    const on = renderStrip(strip);
    expect(off.stimulusMarkersS).toBeNull();
    expect(on.leads).toEqual(off.leads);
    expect(compareMarkers(on.stimulusMarkersS ?? [], stimuli(on.events))).toMatchObject({
      hits: stimuli(on.events).length,
      falseMarkers: 0,
    });
    expect(stimuli(on.events).length).toBeGreaterThan(10);
  });

  it('is looked for before the band-limit: the monitor band loses none', () => {
    const monitor = renderStrip({ ...strip, recorder: { ...strip.recorder, bandwidth: 'monitor' } });
    expect(monitor.stimulusMarkersS).toHaveLength(stimuli(monitor.events).length);
  });

  it('streams: chunks give the same markers, each once', () => {
    const stream = createStripStream(strip);
    const chunks = [700, 1, 1299, 3000].map((length) => stream.next(length).stimulusMarkersS ?? []);
    expect(chunks.flat()).toEqual(renderStrip(strip).stimulusMarkersS);
  });
});
