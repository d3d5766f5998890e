import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ComplexMeasures } from '../../../shared/engine/reading/complex';
import { readStrip } from '../../../shared/engine/reading/read-strip';
import type { Reading } from '../../../shared/engine/reading/reading';
import { renderStrip } from '../../../shared/engine/render';
import { actingMode } from '../../../shared/parameters/applies';
import { leadNames } from '../../../shared/parameters/sheet';
import type { StripParametersInput } from '../../../shared/parameters/strip-parameters';
import { arbitraryRhythm } from '../../support/arbitrary-strips';
import { buildStrip, eventsOf, steadyStrip } from '../../support/strips';

/** Some complex: these tests ask only which stimuli lie within it. */
const complex: ComplexMeasures = {
  qrsOnsetMs: 2,
  qrsOffsetMs: 122,
  tEndMs: 420,
  frontalAxisDeg: 60,
  leads: Object.fromEntries(
    leadNames.map((lead) => [lead, { netMv: 1, rMv: 1.2, sMv: -0.2, stMv: 0, tMv: 0.3 }]),
  ) as ComplexMeasures['leads'],
};
const read = (input: StripParametersInput): Reading => renderStrip(steadyStrip(input)).reading;
const finding = (reading: Reading, id: string) => reading.findings.find((one) => one.id === id);
const timesOf = (reading: Reading, id: string): number[] =>
  (finding(reading, id)?.beats ?? []).map((number) => reading.beats[number - 1].timeS);
const texts = (reading: Reading): string => reading.findings.map((one) => one.text).join(' ');

describe('a strip on which several things go wrong', () => {
  const reading = read({
    durationS: 10,
    patient: { atrialRateBpm: 50, prIntervalMs: 160 },
    pacing: {
      source: 'implanted',
      mode: 'VVI',
      lowerRateBpm: 60,
      faults: [
        { kind: 'failureToCapture', fromS: 4, toS: 7 },
        { kind: 'undersensing', fromS: 7 },
      ],
    },
  });

  it('has capture lost from second 4 to 7 only, and says why', () => {
    expect(reading.capture.rightVentricle).toBe('intermittent');
    const times = timesOf(reading, 'captureFault.rightVentricle');
    expect(times.length).toBeGreaterThan(0);
    for (const time of times) expect(time >= 4 && time < 7).toBe(true);
    expect(finding(reading, 'captureFault.rightVentricle')?.text).toContain('a fault, with output enough');
    // Every stimulus that captured nothing for that reason is named.
    const lost = reading.beats.filter((beat) => beat.reasons.includes('fault')).map((beat) => beat.number);
    expect(finding(reading, 'captureFault.rightVentricle')?.beats).toEqual(lost);
  });

  it('has QRS complexes unheard from second 7 only', () => {
    expect(reading.sensing.rightVentricle).toBe('undersensing');
    const times = timesOf(reading, 'undersensing.ventricle');
    expect(times.length).toBeGreaterThan(0);
    for (const time of times) expect(time).toBeGreaterThanOrEqual(6.95);
  });
});

describe('what cannot be assessed', () => {
  it('is not spoken of: an atrial lead that never had to sense', () => {
    const reading = read({
      patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
      pacing: { source: 'implanted' },
    });
    expect(reading.sensing).toEqual({
      atrium: 'notAssessable',
      rightVentricle: 'notAssessable',
      leftVentricle: 'notAssessable',
    });
    expect(texts(reading)).not.toMatch(/sens/i);
  });

  it('is said where it looks like more: stimuli that all fall into refractory muscle', () => {
    const reading = read({
      patient: { atrialRateBpm: 75 },
      pacing: { source: 'implanted', mode: 'VVI', lowerRateBpm: 70, rightVentricularLead: { signalMv: 1 } },
      durationS: 3,
    });
    const refractory = reading.beats.filter((beat) => beat.reasons.includes('refractoryTissue'));
    if (refractory.length > 0) {
      expect(finding(reading, 'refractory.rightVentricle')?.text).toContain(
        'Capture cannot be judged there.',
      );
    }
    expect(finding(reading, 'captureLost.rightVentricle')).toBeUndefined();
  });

  it('says nothing of capture without stimuli', () => {
    const reading = read({ patient: { atrialRateBpm: 80 }, pacing: { source: 'implanted' } });
    expect(reading.capture).toEqual({
      atrium: 'notPaced',
      rightVentricle: 'notPaced',
      leftVentricle: 'notPaced',
    });
    expect(texts(reading)).not.toMatch(/captur/);
  });
});

describe('rhythms under the pacing', () => {
  it.each<[string, StripParametersInput['patient'], string]>([
    ['intact', {}, 'Sinus rhythm, conducted one to one'],
    ['long PR', { prIntervalMs: 260 }, 'Sinus rhythm, first degree AV block'],
    ['Wenckebach', { avConduction: 'wenckebach' }, 'with growing PR intervals'],
    ['Mobitz II', { avConduction: 'mobitzTwo' }, 'with a constant PR interval'],
    [
      'complete block',
      { avConduction: 'complete', escapeSite: 'ventricular' },
      'no AV conduction, ventricular escape',
    ],
    ['fibrillation', { atrialRhythm: 'fibrillation' }, 'Atrial fibrillation, irregularly conducted'],
    ['flutter', { atrialRhythm: 'flutter' }, 'Atrial flutter, second degree AV block'],
    ['arrest', { atrialRhythm: 'arrest', escapeSite: 'junctional' }, 'No atrial activity, junctional escape'],
  ])('%s', (_, patient, words) => {
    expect(read({ durationS: 20, patient }).underlyingRhythm).toContain(words);
  });

  it('has no PR interval in fibrillation or flutter', () => {
    for (const atrialRhythm of ['fibrillation', 'flutter'] as const) {
      expect(read({ patient: { atrialRhythm } }).prIntervalMs).toBeNull();
    }
  });
});

describe('what the device does', () => {
  const block = { avConduction: 'complete', atrialRhythm: 'arrest' } as const;
  const loud = { atrialLead: { amplitudeV: 8 }, rightVentricularLead: { sensitivityMv: 1 } } as const;

  it('names safety pacing, and crosstalk inhibition where it is off; neither with a modest output', () => {
    const safe = read({ patient: block, pacing: { source: 'implanted', ...loud } });
    expect(finding(safe, 'safetyPace')?.text).toContain('short AV interval');
    const unsafe = read({ patient: block, pacing: { source: 'implanted', safetyPacing: false, ...loud } });
    expect(finding(unsafe, 'crosstalk')).toBeDefined();
    expect(texts(unsafe)).toContain('asystole');
    const modest = read({ patient: block, pacing: { source: 'implanted' } });
    expect(finding(modest, 'safetyPace') ?? finding(modest, 'crosstalk')).toBeUndefined();
  });

  it('names pacemaker-mediated tachycardia while its cause is there', () => {
    const loop = (pvarpMs: number): Reading =>
      read({
        durationS: 20,
        patient: { avConduction: 'complete', atrialRateBpm: 45, retrogradeConductionMs: 280 },
        pacing: {
          source: 'implanted',
          pvarpMs,
          faults: [{ kind: 'failureToCapture', chamber: 'atrium', fromS: 2, toS: 4 }],
        },
      });
    expect(finding(loop(250), 'pacemakerMediatedTachycardia')).toBeDefined();
    expect(finding(loop(350), 'pacemakerMediatedTachycardia')).toBeUndefined();
  });

  it('names a mode switch', () => {
    const reading = read({
      durationS: 20,
      patient: { atrialRhythm: 'tachycardia', atrialRateBpm: 190, avConduction: 'complete' },
      pacing: {
        source: 'implanted',
        pvarpMs: 200,
        faults: [{ kind: 'undersensing', chamber: 'atrium', toS: 5 }],
      },
    });
    expect(finding(reading, 'modeSwitch')).toBeDefined();
  });

  it('reads chest pads as such', () => {
    const reading = read({
      patient: { avConduction: 'complete' },
      pacing: { source: 'transcutaneous', transcutaneous: { currentMa: 50 } },
    });
    expect(reading.pacedChambers).toEqual(['chest']);
    expect(reading.capture.chest).toBe('none');
    expect(texts(reading)).toContain('Stimuli are given through chest pads.');
    expect(texts(reading)).toContain('No stimulus through the chest pads captures');
  });
});

describe('consistent modes', () => {
  it.each<[string, StripParametersInput, string[], string[]]>([
    [
      'AV sequence at the lower rate',
      { patient: { atrialRhythm: 'arrest', avConduction: 'complete' }, pacing: { source: 'implanted' } },
      ['DOO', 'DDI', 'DDD'],
      ['AAI', 'VVI', 'VDD'],
    ],
    [
      'ventricular pacing behind irregular P waves',
      {
        patient: { atrialRateBpm: 85, rateVariabilityPercent: 8, avConduction: 'complete' },
        pacing: { source: 'implanted' },
      },
      ['DDD', 'VDD'],
      ['VVI', 'VOO', 'DDI', 'AAI'],
    ],
    [
      'ventricular pacing that ignores P waves',
      {
        patient: { atrialRateBpm: 77, avConduction: 'complete' },
        pacing: { source: 'implanted', mode: 'VVI' },
      },
      ['VVI', 'VOO'],
      ['DDD', 'VDD', 'AAI', 'AOO'],
    ],
    [
      'atrial pacing alone',
      { patient: { atrialRateBpm: 40 }, pacing: { source: 'implanted', mode: 'AAI' } },
      ['AAI', 'AOO'],
      ['VVI', 'VDD', 'VOO'],
    ],
  ])('%s', (_, input, among, notAmong) => {
    const { consistentModes } = renderStrip(buildStrip(input)).reading;
    for (const mode of among) expect(consistentModes).toContain(mode);
    for (const mode of notAmong) expect(consistentModes).not.toContain(mode);
  });

  it('hold the mode that made the strip, when sensing and output work', () => {
    fc.assert(
      fc.property(arbitraryRhythm, (input) => {
        const strip = buildStrip({
          ...input,
          durationS: 20,
          pacing: {
            ...input.pacing,
            faults: [],
            modeSwitching: false,
            hysteresisRateBpm: null,
            atrialLead: {},
            rightVentricularLead: {},
            leftVentricularLead: {},
            transvenous: {},
            // A refractory period so long that P waves or QRS complexes are never heard hides what the mode does.
            pvarpMs: 275,
            ventricularRefractoryMs: 250,
            ventricularBlankingMs: 60,
          },
        });
        if (strip.pacing.source === 'none') return;
        const { consistentModes } = readStrip(eventsOf(strip), () => complex);
        if (consistentModes.length > 0) expect(consistentModes).toContain(actingMode(strip.pacing));
      }),
      { numRuns: 300, seed: 21 },
    );
  });
});

describe('any rhythm', () => {
  it('is read without an error, every sentence tied to beats that exist', () => {
    fc.assert(
      fc.property(arbitraryRhythm, (input) => {
        const reading = readStrip(eventsOf(buildStrip(input)), () => complex);
        expect(new Set(reading.findings.map((one) => one.id)).size).toBe(reading.findings.length);
        for (const { text, beats } of reading.findings) {
          expect(text).toMatch(/^[A-Z0-9].*\.$/s);
          expect(text).not.toMatch(/NaN|undefined|null|Infinity/);
          for (const beat of beats) expect(reading.beats[beat - 1].number).toBe(beat);
        }
      }),
      { numRuns: 200, seed: 22 },
    );
  });
});
