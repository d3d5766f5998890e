import { describe, expect, it } from 'vitest';
import { createDisturbance, isDisturbed } from '../../../shared/engine/disturbance/disturbance';
import { addToLeads, electrodePotentials } from '../../../shared/engine/disturbance/electrodes';
import { measuredLeads } from '../../../shared/engine/leads';
import { twelveLeads } from '../../../shared/engine/recorder/quantiser';
import { doubleRoundingMv } from '../../support/tolerances';
import { clock, disturbanceLeads, disturbed, emptyLeads, type DisturbedStrip } from './disturbance-bench';

const everything: DisturbedStrip = {
  disturbance: { baselineWanderMv: 0.5, mainsMv: 0.1, mainsHz: 50, muscleMv: 0.05, motionPerMinute: 30 },
};
const secondS = clock.rateHz;

describe('electrodes to leads', () => {
  it('forms the leads from electrodes: I = LA − RA, II = LL − RA, V against Wilson’s terminal (LD-01 to LD-07)', () => {
    const potentials = electrodePotentials(1);
    potentials.RA[0] = 1;
    potentials.LA[0] = 4;
    potentials.LL[0] = 10;
    potentials.V2[0] = 20;
    const leads = emptyLeads(1);
    addToLeads(leads, potentials, 1);
    expect([leads.I[0], leads.II[0], leads.V1[0], leads.V2[0]]).toEqual([3, 9, -5, 15]);
  });

  it('a potential common to all electrodes shows in no lead', () => {
    const potentials = electrodePotentials(1);
    for (const values of Object.values(potentials)) values[0] = 7;
    const leads = emptyLeads(1);
    addToLeads(leads, potentials, 1);
    for (const lead of measuredLeads) expect(Math.abs(leads[lead][0])).toBeLessThan(doubleRoundingMv);
  });

  it('one limb electrode reaches the limb leads and, by a third, every chest lead', () => {
    const potentials = electrodePotentials(1);
    potentials.LL[0] = 3;
    const leads = emptyLeads(1);
    addToLeads(leads, potentials, 1);
    const all = twelveLeads(leads);
    expect([all.I[0], all.II[0], all.III[0], all.aVF[0], all.V1[0], all.V6[0]]).toEqual([0, 3, 3, 3, -1, -1]);
  });
});

describe('a disturbed strip', () => {
  it('is the same to the bit whatever the windows', () => {
    const whole = disturbanceLeads(everything, [2 * secondS]);
    const cut = disturbanceLeads(everything, [1, 7, 4096, 1023, 3873, 2 * secondS - 9000]);
    for (const lead of measuredLeads) expect(cut[lead]).toEqual(whole[lead]);
  });

  it('is the same for the same seed and another for another', () => {
    const one = disturbanceLeads(everything, [secondS]);
    expect(disturbanceLeads(everything, [secondS])).toEqual(one);
    const other = disturbanceLeads({ ...everything, seed: 2 }, [secondS]);
    for (const lead of measuredLeads) expect(other[lead]).not.toEqual(one[lead]);
  });

  const changes: [string, DisturbedStrip][] = [
    ['baselineWanderMv', { disturbance: { ...everything.disturbance, baselineWanderMv: 0.6 } }],
    ['mainsMv', { disturbance: { ...everything.disturbance, mainsMv: 0.2 } }],
    ['mainsHz', { disturbance: { ...everything.disturbance, mainsHz: 60 } }],
    ['muscleMv', { disturbance: { ...everything.disturbance, muscleMv: 0.06 } }],
    ['motionPerMinute', { disturbance: { ...everything.disturbance, motionPerMinute: 0 } }],
    ['respiratoryRateBpm', { ...everything, respiratoryRateBpm: 20 }],
  ];

  it.each(changes)('%s changes every lead by more than a quantiser step', (_, changed) => {
    // A minute, coarsely: movements are rare.
    const windows = Array.from({ length: 20 }, () => secondS);
    const before = disturbanceLeads(everything, windows);
    const after = disturbanceLeads(changed, windows);
    for (const lead of measuredLeads) {
      const most = before[lead].reduce(
        (worst, value, i) => Math.max(worst, Math.abs(value - after[lead][i])),
        0,
      );
      expect(most).toBeGreaterThan(0.005);
    }
  });

  it('switching one source on leaves the draws of another alone', () => {
    const muscle = disturbanceLeads({ disturbance: { muscleMv: 0.05 } }, [4000]);
    const mains = disturbanceLeads({ disturbance: { mainsMv: 0.1 } }, [4000]);
    const both = disturbanceLeads({ disturbance: { muscleMv: 0.05, mainsMv: 0.1 } }, [4000]);
    both.V4.forEach((value, i) => expect(value).toBeCloseTo(muscle.V4[i] + mains.V4[i], 12));
  });

  it('adds to what is there', () => {
    const leads = emptyLeads(100);
    leads.V1.fill(5);
    createDisturbance(disturbed(everything), clock, 0).add(leads, 100);
    const alone = disturbanceLeads(everything, [100]);
    leads.V1.forEach((value, i) => expect(value).toBeCloseTo(5 + alone.V1[i], 12));
  });

  it('knows whether there is anything to add', () => {
    expect(isDisturbed(disturbed({ disturbance: {} }))).toBe(false);
    for (const key of ['baselineWanderMv', 'mainsMv', 'muscleMv', 'motionPerMinute'] as const) {
      expect(isDisturbed(disturbed({ disturbance: { [key]: 0.1 } }))).toBe(true);
    }
    const leads = emptyLeads(100);
    createDisturbance(disturbed({ disturbance: {} }), clock, 0).add(leads, 100);
    for (const lead of measuredLeads) expect(leads[lead].every((value) => value === 0)).toBe(true);
  });

  it('a settling high-pass gets the slow part only, the same at any rate', () => {
    const slow = createDisturbance(disturbed(everything), { rateHz: 250, firstTimeS: 0 }, -250, {
      slowOnly: true,
    });
    const leads = emptyLeads(500);
    slow.add(leads, 500);
    const wanderAndMotion = { ...everything.disturbance, mainsMv: 0, muscleMv: 0 };
    const full = createDisturbance(disturbed({ disturbance: wanderAndMotion }), clock, -8000);
    const fine = emptyLeads(16000);
    full.add(fine, 16000);
    for (const lead of measuredLeads) {
      leads[lead].forEach((value, i) =>
        expect(Math.abs(value - fine[lead][32 * i])).toBeLessThan(doubleRoundingMv),
      );
    }
  });
});
