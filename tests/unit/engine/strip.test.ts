import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { measuredLeads } from '../../../shared/engine/leads';
import { readStrip } from '../../../shared/engine/reading/read-strip';
import { quantiseLeads } from '../../../shared/engine/recorder/quantiser';
import { createStripStream, renderLongStrip, renderStrip } from '../../../shared/engine/render';
import { leadNames } from '../../../shared/parameters/sheet';
import { arbitraryStrip } from '../../support/arbitrary-strips';
import { buildStrip } from '../../support/strips';

const runs = { numRuns: 25, seed: 11 };
/** Many strips are rendered twice; a slow machine may take its time. */
const patienceMs = 120_000;

describe('every legal strip', () => {
  it(
    'renders finite samples of the right number, with its identities, and repeats with its seed',
    () => {
      fc.assert(
        fc.property(arbitraryStrip, (input) => {
          const strip = buildStrip(input);
          const recording = renderStrip(strip);
          const { leads, sampleRateHz, resolutionUv } = recording;
          for (const lead of leadNames) {
            expect(leads[lead]).toHaveLength(2 * sampleRateHz);
            expect(leads[lead].every(Number.isFinite)).toBe(true);
          }
          const tolerance = resolutionUv / 2000 + 1e-5;
          leads.I.forEach((one, i) => {
            expect(Math.abs(one + leads.III[i] - leads.II[i])).toBeLessThan(tolerance);
            expect(Math.abs(leads.aVR[i] + leads.aVL[i] + leads.aVF[i])).toBeLessThan(tolerance);
          });
          expect(renderStrip(strip)).toEqual(recording);
        }),
        runs,
      );
    },
    patienceMs,
  );

  it(
    'is the same stream whatever the chunks',
    () => {
      fc.assert(
        fc.property(
          arbitraryStrip,
          fc.array(fc.integer({ min: 1, max: 400 }), { minLength: 1, maxLength: 5 }),
          (input, sizes) => {
            const strip = buildStrip(input);
            const total = sizes.reduce((sum, size) => sum + size, 0);
            const whole = createStripStream(strip).next(total);
            const stream = createStripStream(strip);
            const chunks = sizes.map((size) => stream.next(size));
            for (const lead of measuredLeads) {
              const joined = chunks.flatMap((chunk) => [...chunk.measured[lead]]);
              joined.forEach((value, i) =>
                expect(Math.abs(value - whole.measured[lead][i])).toBeLessThan(1e-12),
              );
            }
            expect(chunks.flatMap((chunk) => chunk.events)).toEqual(whole.events);
          },
        ),
        { numRuns: 20, seed: 5 },
      );
    },
    patienceMs,
  );
});

describe('a long strip', () => {
  it('is rendered minute by minute as it would be in one, and tells how far it is', () => {
    const strip = buildStrip({
      durationS: 150,
      patient: { avConduction: 'wenckebach', prematureVentricularPerMinute: 8 },
      pacing: { source: 'implanted', mode: 'DDD' },
      disturbance: { muscleMv: 0.03, baselineWanderMv: 0.1 },
      recorder: { stimulusMarker: true },
    });
    const shares: number[] = [];
    const recording = renderLongStrip(strip, (share) => shares.push(share));
    expect(shares).toEqual([60 / 150, 120 / 150, 1]);
    const whole = createStripStream(strip).next(150 * 500);
    expect(recording.leads).toEqual(quantiseLeads(whole.measured, recording.resolutionUv));
    expect(recording.events).toEqual(whole.events);
    expect(recording.stimulusMarkersS).toEqual(whole.stimulusMarkersS);
    expect(recording.stimulusMarkersS?.length).toBeGreaterThan(50);
    const reading = readStrip(whole.events, (event) => whole.complexes.get(event) ?? null);
    expect(recording.reading).toEqual(reading);
  });
});

describe('the electrodes and the recorder', () => {
  const paced = {
    patient: { rateVariabilityPercent: 0, avConduction: 'complete' },
    pacing: { source: 'implanted' },
  } as const;

  it('an unfiltered and a diagnostic strip hold the same rhythm at the same times', () => {
    const unfiltered = renderStrip(buildStrip({ ...paced, recorder: { bandwidth: 'unfiltered' } }));
    const diagnostic = renderStrip(buildStrip(paced));
    expect(unfiltered.events).toEqual(diagnostic.events);
    expect(unfiltered.reading).toEqual(diagnostic.reading);
    expect(unfiltered.leads.II).not.toEqual(diagnostic.leads.II);
  });

  it('disturbance changes samples, never events', () => {
    const clean = renderStrip(buildStrip(paced));
    for (const disturbance of [
      { baselineWanderMv: 0.5 },
      { mainsMv: 0.2 },
      { muscleMv: 0.1 },
      { motionPerMinute: 30 },
    ]) {
      const disturbed = renderStrip(buildStrip({ ...paced, disturbance }));
      expect(disturbed.events).toEqual(clean.events);
      expect(disturbed.leads.V4).not.toEqual(clean.leads.V4);
    }
  });

  it('asystole with stimuli only is flat between the stimuli', () => {
    const strip = renderStrip(
      buildStrip({
        patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
        pacing: { source: 'implanted', mode: 'VOO', rightVentricularLead: { captureThresholdV: 9 } },
      }),
    );
    expect(strip.reading.capture.rightVentricle).toBe('none');
    const stimulus = strip.events.find((event) => event.type === 'stimulus');
    const from = Math.round(((stimulus?.timeS ?? 0) + 0.4) * 500);
    const quiet = strip.leads.II.subarray(from, from + 200);
    expect(Math.max(...quiet) - Math.min(...quiet)).toBeLessThanOrEqual(0.0151);
  });
});
