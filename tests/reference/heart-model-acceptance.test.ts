import { describe, expect, it } from 'vitest';
import { computeVentricularLoop, type VentricularLoop } from '../../shared/engine/heart/compute-loop';
import { fittedNodeCounts } from '../../shared/engine/heart/heart-model-data';
import { nativeShape } from '../../shared/engine/heart/ventricular-shape';
import { buildVentricles } from '../../shared/engine/heart/ventricles';
import { leadNames, type LeadName } from '../../shared/parameters/sheet';
import {
  biventricular,
  configurations,
  fixture,
  fusedWithApex,
  highFrequencyDb,
  lateQrsOf,
  loopOf,
  pacedFraction,
  qrsOf,
  relativeDifference,
  toHundredths,
  type ConfigurationName,
} from './heart-model-support';

/** Every acceptance range of the fixture, computed from this model. Sources stand in each test's name. */
type Predicate = () => void;
type Value = 'rMv' | 'sMv' | 'netMv' | 'jMv' | 'tMv';

const inferior: LeadName[] = ['II', 'III', 'aVF'];

function measures(name: ConfigurationName): VentricularLoop['measures'] {
  return loopOf(name).measures;
}
function values(name: ConfigurationName, value: Value, leads: readonly LeadName[]): number[] {
  return leads.map((lead) => measures(name).leads[lead][value]);
}
function within(actual: number, min: number, max: number): void {
  expect(actual).toBeGreaterThanOrEqual(min);
  expect(actual).toBeLessThanOrEqual(max);
}
function allAbove(list: number[], limit: number): void {
  expect(Math.min(...list)).toBeGreaterThan(limit);
}
function allBelow(list: number[], limit: number): void {
  expect(Math.max(...list)).toBeLessThan(limit);
}

/** Leads whose T points the way of the net QRS, both large enough to say (0.1 and 0.05 mV). */
function concordantLeads(name: ConfigurationName): LeadName[] {
  return leadNames.filter((lead) => {
    const { netMv, tMv } = measures(name).leads[lead];
    return Math.abs(netMv) >= 0.1 && Math.abs(tMv) >= 0.05 && netMv * tMv > 0;
  });
}

const sweep = fixture.biventricularSweep.map(({ lvMinusRv }) => ({
  lvMinusRv,
  measures: computeVentricularLoop(biventricular(lvMinusRv), nativeShape).measures,
}));
const endAt = (lvMinusRv: number): number =>
  sweep.find((entry) => entry.lvMinusRv === lvMinusRv)!.measures.stimulusToQrsEndMs;
const fusions = fixture.fusionSweep.map(({ intrinsicOnset }) =>
  computeVentricularLoop(fusedWithApex(intrinsicOnset), nativeShape),
);

function rToS(name: ConfigurationName, lead: LeadName): number {
  const { rMv, sMv } = measures(name).leads[lead];
  return rMv / -sMv;
}

/** First positive wave, trough and second positive wave of V1. */
function rsrPrime(name: ConfigurationName): { r: number; trough: number; rPrime: number } {
  const qrs = qrsOf(loopOf(name), 'V1');
  const rPrime = Math.max(...lateQrsOf(loopOf(name), 'V1'));
  const before = qrs.slice(0, qrs.indexOf(rPrime));
  const trough = Math.min(...before);
  return { r: Math.max(...before.slice(0, before.indexOf(trough))), trough, rPrime };
}

const paced = (name: ConfigurationName): number => measures(name).stimulusToQrsEndMs;

const predicates: Record<string, [expected: string, predicate: Predicate]> = {
  'normal | QRS ms': ['80..100', () => within(measures('normal').qrsDurationMs, 80, 100)],
  'normal | axis deg': ['0..75', () => within(measures('normal').frontalAxisDeg, 0, 75)],
  'normal | II R mV': ['1.0..1.3', () => within(measures('normal').leads.II.rMv, 1, 1.3)],
  'normal | V1 r, S': [
    'r 0.05..0.4, S < -0.5',
    () => {
      within(measures('normal').leads.V1.rMv, 0.05, 0.4);
      expect(measures('normal').leads.V1.sMv).toBeLessThan(-0.5);
    },
  ],
  'normal | R/S V1..V6': [
    'monotone (0.05); V2 < 1, V4 > 1',
    () => {
      const ratios = (['V1', 'V2', 'V3', 'V4', 'V5', 'V6'] as const).map((lead) => rToS('normal', lead));
      ratios.slice(1).forEach((ratio, i) => expect(ratio).toBeGreaterThan(ratios[i] - 0.05));
      expect(ratios[1]).toBeLessThan(1);
      expect(ratios[3]).toBeGreaterThan(1);
    },
  ],
  'normal | terminal positive bump V1': [
    '<= 0.05',
    () => expect(Math.max(...lateQrsOf(loopOf('normal'), 'V1'))).toBeLessThanOrEqual(0.05),
  ],
  'normal | terminal s in II, III': [
    '> -0.15',
    () =>
      allAbove(
        (['II', 'III'] as const).flatMap((lead) => lateQrsOf(loopOf('normal'), lead, 0.45)),
        -0.15,
      ),
  ],
  'normal | T I,II,V3-V6': [
    '> 0.1',
    () => allAbove(values('normal', 'tMv', ['I', 'II', 'V3', 'V4', 'V5', 'V6']), 0.1),
  ],
  'normal | |J| all leads': ['< 0.1', () => allBelow(values('normal', 'jMv', leadNames).map(Math.abs), 0.1)],
  'normal | QT ms': ['360..440', () => within(measures('normal').qtMs, 360, 440)],
  'rvApex | QRS from stimulus': ['150..190', () => within(paced('rvApex'), 150, 190)],
  'rvApex | axis': ['-90..-60', () => within(measures('rvApex').frontalAxisDeg, -90, -60)],
  'rvApex | net V1': ['< -0.5', () => allBelow(values('rvApex', 'netMv', ['V1']), -0.5)],
  'rvApex | net II,III,aVF': ['< -0.3', () => allBelow(values('rvApex', 'netMv', inferior), -0.3)],
  'rvApex | net I, aVL': ['> 0', () => allAbove(values('rvApex', 'netMv', ['I', 'aVL']), 0)],
  'rvApex | late transition: net V3,V4 < -0.3; V5 <= 0.1; V6 either': [
    'as said',
    () => {
      allBelow(values('rvApex', 'netMv', ['V3', 'V4']), -0.3);
      expect(measures('rvApex').leads.V5.netMv).toBeLessThanOrEqual(0.1);
    },
  ],
  'rvApex | T concordant leads': ['none', () => expect(concordantLeads('rvApex')).toEqual([])],
  'rvApex | ST/S discordant': [
    '< 0.25',
    () => {
      const ratios = leadNames
        .map((lead) => measures('rvApex').leads[lead])
        .filter(({ netMv, jMv }) => netMv < 0 && jMv > 0)
        .map(({ jMv, sMv }) => jMv / -sMv);
      expect(ratios.length).toBeGreaterThan(4);
      allBelow(ratios, 0.25);
    },
  ],
  'rvSept | QRS': ['< rvApex', () => expect(paced('rvSept')).toBeLessThan(paced('rvApex'))],
  'rvSept | axis': ['-60..60', () => within(measures('rvSept').frontalAxisDeg, -60, 60)],
  'rvSept | net V1': ['< -0.4', () => allBelow(values('rvSept', 'netMv', ['V1']), -0.4)],
  'rvSept | T concordant leads': ['none', () => expect(concordantLeads('rvSept')).toEqual([])],
  'rvOt | QRS': ['125..170', () => within(paced('rvOt'), 125, 170)],
  'rvOt | net V1': ['< -0.3', () => allBelow(values('rvOt', 'netMv', ['V1']), -0.3)],
  'rvOt | net II,III,aVF': ['> 0.5', () => allAbove(values('rvOt', 'netMv', inferior), 0.5)],
  'lvLat | QRS': ['160..185', () => within(paced('lvLat'), 160, 185)],
  'lvLat | net V1': ['> 0.4', () => allAbove(values('lvLat', 'netMv', ['V1']), 0.4)],
  'lvLat | net I, aVL': [
    '< 0 (I < -0.3)',
    () => {
      allBelow(values('lvLat', 'netMv', ['aVL']), 0);
      allBelow(values('lvLat', 'netMv', ['I']), -0.3);
    },
  ],
  'lvPostlat | QRS': ['160..185', () => within(paced('lvPostlat'), 160, 185)],
  'lvPostlat | net V1': ['> 0.4', () => allAbove(values('lvPostlat', 'netMv', ['V1']), 0.4)],
  'lvPostlat | net I, aVL': [
    '< 0 (I < -0.3)',
    () => {
      allBelow(values('lvPostlat', 'netMv', ['aVL']), 0);
      allBelow(values('lvPostlat', 'netMv', ['I']), -0.3);
    },
  ],
  'biv | QRS simultaneous': ['125..145', () => within(paced('biv0'), 125, 145)],
  'biv | QRS rises on both sides by 70 (>= +10)': [
    'at -70 and +70',
    () => {
      expect(endAt(-70)).toBeGreaterThanOrEqual(endAt(0) + 10);
      expect(endAt(70)).toBeGreaterThanOrEqual(endAt(0) + 10);
    },
  ],
  'biv | V1 R/S >= 1 at simultaneous and LV-first': [
    '>= 1',
    () => {
      const ratios = sweep
        .filter(({ lvMinusRv }) => lvMinusRv <= 0)
        .map(({ measures: { leads } }) => leads.V1.rMv / -leads.V1.sMv);
      allAbove(ratios, 1);
    },
  ],
  'biv | q in I at simultaneous': [
    '<= -0.1 and net < 0',
    () => {
      expect(measures('biv0').leads.I.qMv).toBeLessThanOrEqual(-0.1);
      expect(measures('biv0').leads.I.netMv).toBeLessThan(0);
    },
  ],
  'biv | V1 net falls LV-first to RV-first (0.05)': [
    'monotone',
    () =>
      sweep
        .slice(1)
        .forEach((entry, i) =>
          expect(entry.measures.leads.V1.netMv).toBeLessThan(sweep[i].measures.leads.V1.netMv + 0.05),
        ),
  ],
  'biv | largest QRS change per 10 ms': [
    '<= 10',
    () =>
      sweep
        .slice(1)
        .forEach((entry, i) =>
          within(entry.measures.stimulusToQrsEndMs - sweep[i].measures.stimulusToQrsEndMs, -10, 10),
        ),
  ],
  'hisNonsel | QRS from stimulus': ['105..130', () => within(paced('hisNonsel'), 105, 130)],
  'lbap | QRS': ['105..130', () => within(paced('lbap'), 105, 130)],
  "lbap | r' V1": ['0.1..0.4', () => within(Math.max(...lateQrsOf(loopOf('lbap'), 'V1')), 0.1, 0.4)],
  'lbap | S V6': ['> -0.3', () => allAbove(values('lbap', 'sMv', ['V6']), -0.3)],
  'lbap | T I,II,V4-V6': ['> 0', () => allAbove(values('lbap', 'tMv', ['I', 'II', 'V4', 'V5', 'V6']), 0)],
  'lbbb | QRS': ['130..152', () => within(measures('lbbb').qrsDurationMs, 130, 152)],
  'lbbb | V1 r, S': [
    '< 0.2, < -0.8',
    () => {
      expect(measures('lbbb').leads.V1.rMv).toBeLessThan(0.2);
      expect(measures('lbbb').leads.V1.sMv).toBeLessThan(-0.8);
    },
  ],
  'lbbb | no q/S I,V5,V6': ['> -0.08', () => allAbove(values('lbbb', 'sMv', ['I', 'V5', 'V6']), -0.08)],
  'lbbb | V6 R-peak time; or plateau: V6 after 60 ms / R': [
    '> 60 or >= 0.9',
    () => {
      const v6 = qrsOf(loopOf('lbbb'), 'V6');
      const peak = Math.max(...v6);
      expect(v6.indexOf(peak) > 60 || Math.max(...v6.slice(60)) / peak >= 0.9).toBe(true);
    },
  ],
  'lbbb | T opposite I,V5,V6,V1,V2': [
    'all',
    () => {
      for (const { netMv, tMv } of (['I', 'V5', 'V6', 'V1', 'V2'] as const).map(
        (lead) => measures('lbbb').leads[lead],
      )) {
        expect(netMv * tMv).toBeLessThan(0);
      }
    },
  ],
  'rbbb | QRS': ['120..152', () => within(measures('rbbb').qrsDurationMs, 120, 152)],
  "rbbb | V1 r, R'": [
    "R' > r, R' > 0.3",
    () => {
      const { r, rPrime } = rsrPrime('rbbb');
      expect(r).toBeGreaterThan(0.05);
      expect(rPrime).toBeGreaterThan(Math.max(r, 0.3));
    },
  ],
  'rbbb | V1 trough between': ['< 0.1', () => expect(rsrPrime('rbbb').trough).toBeLessThan(0.1)],
  'rbbb | late S I, V6': [
    '<= -0.25',
    () => {
      for (const lead of ['I', 'V6'] as const) {
        expect(toHundredths(Math.min(...lateQrsOf(loopOf('rbbb'), lead)))).toBeLessThanOrEqual(-0.25);
      }
    },
  ],
  'rbbb | axis': ['-30..90', () => within(measures('rbbb').frontalAxisDeg, -30, 90)],
  'lafb | axis': ['-90..-45', () => within(measures('lafb').frontalAxisDeg, -90, -45)],
  'lpfb | axis': [
    '> 100 (own aim); 90..180 (S09)',
    () => expect(measures('lpfb').frontalAxisDeg).toBeGreaterThan(90),
  ],
  'fusion | paced fraction rises (0.06)': [
    '0 -> 1',
    () => {
      const fractions = fusions.map(pacedFraction);
      expect(fractions[0]).toBeCloseTo(0, 2);
      expect(fractions.at(-1)).toBeCloseTo(1, 2);
      fractions.slice(1).forEach((fraction, i) => expect(fraction).toBeGreaterThan(fractions[i] - 0.06));
    },
  ],
  'fusion | QRS rises from intrinsic to paced (3)': [
    'non-decreasing',
    () =>
      fusions
        .slice(1)
        .forEach((loop, i) =>
          expect(loop.measures.qrsDurationMs).toBeGreaterThanOrEqual(fusions[i].measures.qrsDurationMs - 3),
        ),
  ],
  'lvSummit | net II,III,aVF > 0.5; I < 0': [
    'as said',
    () => {
      allAbove(values('lvSummit', 'netMv', inferior), 0.5);
      allBelow(values('lvSummit', 'netMv', ['I']), 0);
    },
  ],
  'lvInf | net II,III,aVF': ['< -0.3', () => allBelow(values('lvInf', 'netMv', inferior), -0.3)],
  'lvBasalPost | net V1-V4': [
    '> 0.4',
    () => allAbove(values('lvBasalPost', 'netMv', ['V1', 'V2', 'V3', 'V4']), 0.4),
  ],
  'lvApex | net V4-V6': ['< -0.3', () => allBelow(values('lvApex', 'netMv', ['V4', 'V5', 'V6']), -0.3)],
  'rvFree | wider than rvSept': ['wider', () => expect(paced('rvFree')).toBeGreaterThan(paced('rvSept'))],
  'all | spectrum >= 145 Hz, dB': [
    '<= -40',
    () => {
      for (const name of Object.keys(configurations) as ConfigurationName[]) {
        expect(highFrequencyDb(loopOf(name)), name).toBeLessThanOrEqual(-40);
      }
    },
  ],
  'all | doubling nodes: relative RMS change': ['< 0.08', () => allBelow(nodeDoublingChanges(), 0.08)],
};

function nodeDoublingChanges(): number[] {
  const doubled = buildVentricles({
    lvEndo: 2 * fittedNodeCounts.lvEndo,
    lvMid: 2 * fittedNodeCounts.lvMid,
    lvEpi: 2 * fittedNodeCounts.lvEpi,
    rvEndo: 2 * fittedNodeCounts.rvEndo,
    rvEpi: 2 * fittedNodeCounts.rvEpi,
    base: 2 * fittedNodeCounts.base,
  });
  return (Object.keys(fixture.nodeDoubling) as ConfigurationName[]).map((name) =>
    relativeDifference(loopOf(name), computeVentricularLoop(configurations[name], nativeShape, doubled)),
  );
}

/** Not met yet; a pass here is news. Left posterior block is no parameter. */
const knownGaps = new Set(['lpfb | axis', 'all | doubling nodes: relative RMS change']);

/** Injury has tests of its own. */
const injuryChecks = fixture.checks.filter(({ configuration }) => configuration.includes('+'));

describe('acceptance ranges of the heart model', () => {
  it('has one test for every check of the fixture but those on injury', () => {
    expect(injuryChecks).toHaveLength(9);
    const wanted = fixture.checks.filter((check) => !injuryChecks.includes(check));
    expect(wanted.map(({ configuration, check }) => `${configuration} | ${check}`).sort()).toEqual(
      Object.keys(predicates).sort(),
    );
  });

  for (const { configuration, check, expected, source, fitted } of fixture.checks) {
    const key = `${configuration} | ${check}`;
    const entry = predicates[key];
    if (!entry) continue;
    const [expectedHere, predicate] = entry;
    const title = `${key} ${expected} [${source}; fitted: ${fitted}]`;
    if (knownGaps.has(key)) {
      it.fails(`known gap: ${title}`, predicate);
      continue;
    }
    it(title, () => {
      expect(expectedHere).toBe(expected);
      predicate();
    });
  }
});

describe('what the second round mended, with what is left', () => {
  it('node doubling stays below 9.5 % (version 2: 10.3)', () => {
    allBelow(nodeDoublingChanges(), 0.095);
  });

  it('left posterior block turns the axis to 85° at least (version 2: 80)', () => {
    expect(measures('lpfb').frontalAxisDeg).toBeGreaterThan(85);
  });

  // Broad notched R in I, aVL, V5, V6: Surawicz et al. 2009 (AHA/ACCF/HRS Part III, read in summary).
  it.each(['I', 'aVL', 'V5', 'V6'] as const)('left bundle branch block has a notched R in %s', (lead) => {
    const qrs = qrsOf(loopOf('lbbb'), lead);
    const top = Math.max(...qrs);
    const notches = qrs.map((value, i) =>
      value > 0.2 * top ? Math.min(Math.max(...qrs.slice(0, i + 1)), Math.max(...qrs.slice(i))) - value : 0,
    );
    expect(Math.max(...notches)).toBeGreaterThan(0.03);
  });
});

describe('discordance', () => {
  // Secondary T waves after paced activation: Surawicz et al. 2009 (AHA/ACCF/HRS Part III, read in summary).
  const singleSites = [
    'rvApex',
    'rvSept',
    'rvOt',
    'rvFree',
    'lvLat',
    'lvPostlat',
    'lvAntlat',
    'lvInf',
  ] as const;
  it.each([...singleSites, 'lbbb'] as const)('%s has no lead with concordant T', (name) => {
    expect(concordantLeads(name)).toEqual([]);
  });
  it('left bundle area pacing, by contrast, keeps a concordant T in most leads', () => {
    expect(concordantLeads('lbap').length).toBeGreaterThan(6);
  });
});
