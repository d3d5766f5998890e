import { describe, expect, it } from 'vitest';
import type { StripEvent, VentricularDepolarization } from '../../../shared/engine/events';
import type { ComplexMeasures } from '../../../shared/engine/reading/complex';
import { framinghamQtcMs } from '../../../shared/engine/reading/intervals';
import { qrsTRelations } from '../../../shared/engine/reading/qrs-t-relation';
import { readStrip } from '../../../shared/engine/reading/read-strip';
import { renderStrip } from '../../../shared/engine/render';
import { leadNames } from '../../../shared/parameters/sheet';
import { buildStrip, steadyStrip } from '../../support/strips';

const complex: ComplexMeasures = {
  qrsOnsetMs: 2,
  qrsOffsetMs: 162,
  tEndMs: 462,
  frontalAxisDeg: -70,
  leads: Object.fromEntries(
    leadNames.map((lead) => [lead, { netMv: 1, rMv: 1.2, sMv: -0.2, stMv: 0, tMv: -0.4 }]),
  ) as ComplexMeasures['leads'],
};

const paced = (
  timeS: number,
  site: 'rightVentricle' | 'leftVentricle' = 'rightVentricle',
): VentricularDepolarization => ({
  type: 'depolarization',
  timeS,
  chamber: 'ventricle',
  origin: 'paced',
  sources: [{ site, timeS }],
  fusion: false,
});
const stimulus = (
  timeS: number,
  captured: boolean,
  chamber: 'atrium' | 'rightVentricle' | 'leftVentricle' = 'rightVentricle',
): StripEvent => ({
  type: 'stimulus',
  timeS,
  chamber,
  amplitudeMv: 1.75,
  widthMs: 0.4,
  captured,
  ...(captured ? {} : { reason: 'belowThreshold' as const }),
});
const read = (events: StripEvent[]) => readStrip(events, () => complex);

describe('beats', () => {
  it('numbers depolarizations and uncaptured stimuli together, in time order', () => {
    const { beats } = read([stimulus(1, true), paced(1), stimulus(2, false), stimulus(3, true), paced(3)]);
    expect(beats.map(({ number, timeS, origin, captured }) => [number, timeS, origin, captured])).toEqual([
      [1, 1, 'paced', true],
      [2, 2, 'none', false],
      [3, 3, 'paced', true],
    ]);
    expect(beats[2].rrMs).toBe(2000);
  });

  it('takes two sites of one pace as one beat, also when only one captures or none', () => {
    const oneLost = read([
      stimulus(1, false),
      stimulus(1.04, true, 'leftVentricle'),
      paced(1.04, 'leftVentricle'),
    ]);
    expect(oneLost.beats).toHaveLength(1);
    expect(oneLost.beats[0]).toMatchObject({
      captured: true,
      interventricularIntervalMs: 40,
      reasons: ['belowThreshold'],
    });
    const noneCaptured = read([stimulus(1, false), stimulus(1.04, false, 'leftVentricle')]);
    expect(noneCaptured.beats).toHaveLength(1);
    expect(noneCaptured.capture).toMatchObject({ rightVentricle: 'none', leftVentricle: 'none' });
  });

  it('gives a stimulus inside a QRS to that beat', () => {
    const conducted: VentricularDepolarization = {
      ...paced(1),
      origin: 'conducted',
      sources: [{ site: 'conducted', timeS: 1 }],
    };
    const late = { ...stimulus(1.08, false), reason: 'refractoryTissue', pseudofusion: true } as StripEvent;
    const reading = read([conducted, late]);
    expect(reading.beats).toHaveLength(1);
    expect(reading.beats[0]).toMatchObject({ pseudofusion: true, captured: false, origin: 'conducted' });
    // A stimulus in refractory muscle says nothing about the threshold.
    expect(reading.capture.rightVentricle).toBeNull();
  });
});

describe('figures', () => {
  it('measures complexes from the heart vector', () => {
    const reading = read([stimulus(1, true), paced(1), stimulus(1.8, true), paced(1.8)]);
    expect(reading).toMatchObject({
      qrsDurationMs: 160,
      stimulusToQrsEndMs: 162,
      qtMs: 460,
      ventricularRateBpm: 75,
      frontalAxisDeg: -70,
      pacedSharePercent: 100,
    });
    expect(reading.qtcMs).toBeCloseTo(framinghamQtcMs(460, 800), 1);
  });

  // Worked examples H01 and H02: QT 400 at RR 1000, QT 440 at RR 857.14 (Framingham).
  it.each([
    [400, 1000, 400],
    [440, 857.142857, 462],
  ])('corrects QT %d at RR %d to %d', (qt, rr, qtc) => {
    expect(framinghamQtcMs(qt, rr)).toBeCloseTo(qtc, 6);
  });

  it('calls T concordant, discordant, or says nothing where either is small', () => {
    const lead = complex.leads.V6;
    const leads = {
      ...complex.leads,
      I: { ...lead, netMv: 1, tMv: 0.3 },
      II: { ...lead, netMv: 0.05, tMv: 0.3 },
      V1: { ...lead, netMv: -1, tMv: 0.02 },
    };
    const relations = qrsTRelations({ ...complex, leads });
    expect([relations.I, relations.II, relations.V1, relations.V6]).toEqual([
      'concordant',
      null,
      null,
      'discordant',
    ]);
  });

  it('says null for what is not there', () => {
    const reading = readStrip([], () => null);
    expect(reading).toMatchObject({
      pacedChambers: [],
      atrialRateBpm: null,
      ventricularRateBpm: null,
      qrsDurationMs: null,
      prIntervalMs: null,
      qrsTRelation: null,
      beats: [],
    });
  });
});

describe('readings of rendered strips', () => {
  it('reads PR, rates and QTc of sinus rhythm as they were set', () => {
    const { reading } = renderStrip(steadyStrip({ patient: { atrialRateBpm: 75, prIntervalMs: 180 } }));
    expect(reading).toMatchObject({ prIntervalMs: 180, dominantOrigin: 'conducted', pacedSharePercent: 0 });
    expect(reading.atrialRateBpm).toBeCloseTo(75, 1);
    expect(Math.abs((reading.qtcMs ?? 0) - 420)).toBeLessThan(6);
  });

  it('loses capture when the output drops below the threshold, and says so', () => {
    const at = (amplitudeV: number) =>
      renderStrip(
        buildStrip({
          patient: { avConduction: 'complete', escapeSite: 'ventricular', escapeRateBpm: 32 },
          pacing: { source: 'implanted', mode: 'VVI', rightVentricularLead: { amplitudeV } },
        }),
      ).reading;
    expect(at(2.5).capture.rightVentricle).toBe('all');
    const lost = at(0.5);
    expect(lost.capture.rightVentricle).toBe('none');
    expect(lost.findings.map((finding) => finding.text).join(' ')).toContain(
      'the output is below the threshold',
    );
  });

  it.each([100, 140, 200])('finds a wanted QRS duration of %d ms', (qrsDurationMs) => {
    const strip = buildStrip({
      patient: { avConduction: 'complete' },
      pacing: { source: 'implanted' },
      waveform: { qrsDurationMs },
    });
    expect(Math.abs((renderStrip(strip).reading.qrsDurationMs ?? 0) - qrsDurationMs)).toBeLessThanOrEqual(1);
  });
});
