import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { activationPattern, type VentricularSource } from '../../shared/engine/heart/activation-pattern';
import { computeVentricularLoop } from '../../shared/engine/heart/compute-loop';
import type { InjuredTerritory } from '../../shared/engine/heart/heart-model-data';
import { nativeShape } from '../../shared/engine/heart/ventricular-shape';
import { injuryCriteria, type CriteriaBeat } from '../../shared/engine/reading/criteria';
import type { LeadMeasures } from '../../shared/engine/reading/complex';
import { renderStrip } from '../../shared/engine/render';
import { leadNames, type LeadName } from '../../shared/parameters/sheet';
import { steadyStrip } from '../support/strips';

const fixture = (name: string): unknown =>
  JSON.parse(readFileSync(new URL(`../fixtures/${name}`, import.meta.url), 'utf8'));

interface RuleCase {
  id: string;
  name: string;
  inputs: Partial<Record<LeadName, { qrs: number; st: number; s: number; r: number }>>;
  value: {
    points: number;
    original_positive: boolean;
    most_negative_ST_S: number;
    modified_positive: boolean;
    barcelona_positive: boolean;
  };
}
const ruleCases = (fixture('worked-examples.json') as { cases: RuleCase[] }).cases.filter((one) =>
  /^G\d\d$/.test(one.id),
);

// Worked examples G01 to G08: Sgarbossa 1996 (points), Smith 2012 (ratio), Di Marco 2020 (Barcelona); MO-60, MO-61, MO-65.
describe('criteria in a wide QRS', () => {
  const flat: LeadMeasures = { netMv: 0, rMv: 0, sMv: 0, stMv: 0, tMv: 0 };
  const beatOf = (inputs: RuleCase['inputs']): CriteriaBeat => ({
    number: 1,
    wide: true,
    complex: {
      qrsOnsetMs: 0,
      qrsOffsetMs: 160,
      tEndMs: 400,
      frontalAxisDeg: 0,
      leads: Object.fromEntries(
        leadNames.map((lead) => {
          const given = inputs[lead];
          return [
            lead,
            given ? { netMv: given.qrs, rMv: given.r, sMv: -given.s, stMv: given.st, tMv: 0 } : flat,
          ];
        }),
      ) as Record<LeadName, LeadMeasures>,
    },
  });

  it.each(ruleCases)('$id: $name', ({ inputs, value }) => {
    const criteria = injuryCriteria([beatOf(inputs)]);
    const of = (id: string) => criteria.find((one) => one.id === id)!;
    expect(of('sgarbossa.points').value).toBe(value.points);
    expect(of('sgarbossa.points').met).toBe(value.original_positive);
    expect(of('modified.ratio').value ?? 0).toBeCloseTo(value.most_negative_ST_S, 3);
    expect(of('modified.rule').met).toBe(value.modified_positive);
    expect(of('barcelona.rule').met).toBe(value.barcelona_positive);
    for (const one of criteria) {
      expect(one.source.length).toBeGreaterThan(10);
      if (one.met) expect([one.beats, one.leads.length > 0]).toEqual([[1], true]);
    }
  });
});

type Territory = InjuredTerritory;
const figures = (fixture('heart-model-figures.json') as { injury: Record<string, Record<LeadName, number>> })
  .injury;
const territories: Territory[] = ['anterior', 'inferior', 'lateral', 'posterior'];
const source = (name: string): VentricularSource =>
  name === 'normal'
    ? { kind: 'conducted', timeMs: 0 }
    : { kind: 'rightVentricle', site: 'apex', hisCapture: 'nonselective', timeMs: 0 };
const st = (name: string, territory: InjuredTerritory, stElevationMv: number): Record<LeadName, number> => {
  const { measures } = computeVentricularLoop(activationPattern([source(name)], 'none'), {
    ...nativeShape,
    injury: { territory, stElevationMv },
  });
  return Object.fromEntries(leadNames.map((lead) => [lead, measures.leads[lead].stMv])) as Record<
    LeadName,
    number
  >;
};
const greatest = (values: Record<LeadName, number>): number =>
  Math.max(...Object.values(values).map(Math.abs));

describe('injury through the heart model', () => {
  // A guard against drift: figures of this version.
  it.each(Object.keys(figures))('%s', (key) => {
    const [name, territory] = key.split('+') as [string, Territory];
    const values = st(name, territory, 0.3);
    for (const lead of leadNames) expect(Math.abs(values[lead] - figures[key][lead])).toBeLessThan(0.002);
  });

  it.each(territories)('meets the wanted native ST deviation: %s', (territory) => {
    for (const wanted of [0.15, 0.3, 0.5]) {
      expect(greatest(st('normal', territory, wanted))).toBeCloseTo(wanted, 3);
    }
    // Very small figures grow in proportion.
    expect(greatest(st('normal', territory, 0.001))).toBeLessThan(0.07);
  });

  it('shows where it should: leads over the territory rise, or V1 to V3 sink (common practice, no source)', () => {
    expect(st('normal', 'anterior', 0.3).V3).toBeGreaterThan(0.25);
    const inferior = st('normal', 'inferior', 0.3);
    expect(Math.min(inferior.II, inferior.III, inferior.aVF)).toBeGreaterThan(0.2);
    expect(st('normal', 'lateral', 0.3).aVL).toBeGreaterThan(0.15);
    expect(
      Math.max(...['V1', 'V2', 'V3'].map((lead) => st('normal', 'posterior', 0.3)[lead as 'V1'])),
    ).toBeLessThan(-0.15);
  });
});

describe('criteria on rendered strips', () => {
  const paced = (territory: 'none' | InjuredTerritory, stElevationMv = 0.35) =>
    renderStrip(
      steadyStrip({
        patient: { avConduction: 'complete', injury: { territory, stElevationMv } },
        pacing: { source: 'implanted', mode: 'VVI' },
      }),
    ).reading;
  const met = (reading: ReturnType<typeof paced>, id: string) =>
    reading.criteria?.find((one) => one.id === id)?.met;

  it('are silent in paced rhythm without injury, and for an outflow site too', () => {
    for (const site of ['apex', 'septum', 'outflow'] as const) {
      const { criteria, findings } = renderStrip(
        steadyStrip({
          patient: { avConduction: 'complete' },
          pacing: { source: 'implanted', mode: 'VVI', rightVentricularLead: { site } },
        }),
      ).reading;
      expect(
        criteria?.filter((one) => one.met && one.id.startsWith('modified')).map((one) => one.id),
      ).toEqual([]);
      expect(findings.some((one) => one.id.startsWith('injury'))).toBe(false);
    }
  });

  it('find a large injury under right ventricular pacing, and say that they rule nothing out', () => {
    for (const territory of ['anterior', 'inferior', 'posterior'] as const) {
      const reading = paced(territory, 0.45);
      expect(met(reading, 'modified.rule'), territory).toBe(true);
      expect(reading.findings.find((one) => one.id === 'injury.modifiedRule')?.text).toContain(
        'rules nothing out',
      );
    }
  });

  it('miss a small one: the strip has its injury, and the criteria are not met', () => {
    expect(met(paced('anterior', 0.1), 'modified.rule')).toBe(false);
  });

  it('use the native criterion in narrow beats', () => {
    const native = (stElevationMv: number) =>
      renderStrip(steadyStrip({ patient: { injury: { territory: 'inferior', stElevationMv } } })).reading;
    expect(met(native(0.3), 'native.stElevation')).toBe(true);
    expect(met(native(0), 'native.stElevation')).toBe(false);
    expect(native(0.3).criteria?.map((one) => one.id)).toEqual(['native.stElevation']);
  });
});
