import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { reverseElectrodes } from '../../shared/engine/disturbance/electrode-reversal';
import { measuredLeads, type MeasuredLead } from '../../shared/engine/leads';
import { renderStrip } from '../../shared/engine/render';
import type { ElectrodeReversal } from '../../shared/parameters/disturbance';
import { buildStrip } from '../support/strips';

// Electrode exchanges: identities LD-40 to LD-46 (fixture leads.json) and worked example J02, whose numbers follow from
// the lead definitions.
interface ExchangeCase {
  id: string;
  value: Record<string, Record<'I' | 'II' | 'III' | 'aVR' | 'aVL' | 'aVF', number>>;
}
const { cases } = JSON.parse(
  readFileSync(new URL('../fixtures/worked-examples.json', import.meta.url), 'utf8'),
) as { cases: ExchangeCase[] };
const j02 = cases.find((one) => one.id === 'J02')!.value;

const limbPairs: [ElectrodeReversal, string][] = [
  ['RA-LA', 'RA<->LA'],
  ['LA-LL', 'LA<->LL'],
  ['RA-LL', 'RA<->LL'],
  ['RA-RL', 'RA<->RL'],
  ['LA-RL', 'LA<->RL'],
];

describe('limb electrodes exchanged (J02)', () => {
  it.each(limbPairs)('%s', (reversal, key) => {
    const measured = Object.fromEntries(
      measuredLeads.map((lead) => [lead, Float64Array.of(j02.correct[lead as 'I'] ?? 0)]),
    ) as Record<MeasuredLead, Float64Array>;
    const exchanged = reverseElectrodes(measured, reversal);
    expect(exchanged.I[0]).toBeCloseTo(j02[key].I, 9);
    expect(exchanged.II[0]).toBeCloseTo(j02[key].II, 9);
  });
});

describe('exchanges on a rendered strip', () => {
  const render = (electrodeReversal: ElectrodeReversal) =>
    renderStrip(buildStrip({ durationS: 3, disturbance: { electrodeReversal } })).leads;
  const plain = render('none');
  // Half a quantiser step on either side, and the same again in derived leads.
  const within = (a: Float32Array, b: Float32Array, sign = 1) => {
    a.forEach((value, i) => expect(Math.abs(value - sign * b[i])).toBeLessThanOrEqual(0.0151));
  };

  it('RA and LA: I turns over, II and III change places, V leads keep (LD-40)', () => {
    const leads = render('RA-LA');
    within(leads.I, plain.I, -1);
    within(leads.II, plain.III);
    within(leads.III, plain.II);
    within(leads.aVR, plain.aVL);
    within(leads.V1, plain.V1);
    within(leads.V6, plain.V6);
  });

  it('LA and LL: I and II change places, III turns over (LD-41)', () => {
    const leads = render('LA-LL');
    within(leads.I, plain.II);
    within(leads.II, plain.I);
    within(leads.III, plain.III, -1);
    within(leads.aVR, plain.aVR);
  });

  it('RA and LL: II turns over, I and III change places and turn over (LD-42)', () => {
    const leads = render('RA-LL');
    within(leads.II, plain.II, -1);
    within(leads.I, plain.III, -1);
    within(leads.III, plain.I, -1);
  });

  it('RA and RL: II is nearly flat; LA and RL: III is (LD-43, LD-44)', () => {
    for (const value of render('RA-RL').II) expect(Math.abs(value)).toBeLessThanOrEqual(0.0151);
    for (const value of render('LA-RL').III) expect(Math.abs(value)).toBeLessThanOrEqual(0.0151);
  });

  it('V1 and V2: the pair changes places, everything else keeps (LD-46)', () => {
    const leads = render('V1-V2');
    expect([...leads.V1]).toEqual([...plain.V2]);
    expect([...leads.V2]).toEqual([...plain.V1]);
    for (const lead of ['I', 'II', 'V3', 'V6'] as const) expect([...leads[lead]]).toEqual([...plain[lead]]);
  });
});
