import { describe, expect, it } from 'vitest';
import { activate, type ActivationPattern } from '../../shared/engine/heart/activation';
import { muscleSites, type MuscleSite } from '../../shared/engine/heart/heart-model-data';
import { fittedVentricles } from '../../shared/engine/heart/ventricles';
import { configurations, loopOf } from './heart-model-support';

/**
 * The local activation table of the timing-cycle rules decides what a lead senses; it was rounded from this model.
 * Copied here, because heart and rhythm know nothing of each other. The difference is written into the test's
 * annotations.
 */
const leads: readonly MuscleSite[] = [
  'rvApex',
  'rvSept',
  'rvOt',
  'hisSept',
  'lbb',
  'lvLat',
  'lvPostlat',
  'lvAntlat',
];
const table = {
  normal: [15, 40, 40, 45, 35, 50, 55, 45],
  lbbb: [10, 35, 55, 60, 65, 130, 135, 95],
  rbbb: [75, 50, 40, 45, 35, 50, 55, 45],
} as const;
/** From the apex to a left ventricular lead, and back. */
const otherVentricle = { lvLat: 135, lvPostlat: 145, lvAntlat: 110 } as const;

/**
 * The table was rounded from version 2 and decides sensing as it stands; version 3 differs from it by up to 16.3 ms
 * (left bundle branch block, lateral lead) and 14.8 ms (across), which is below what a sense adds to any interval that is read.
 */
const conductedBoundMs = 17;
const acrossBoundMs = 15;

function nearestNode(site: MuscleSite): number {
  const { count, positions } = fittedVentricles().nodes;
  const distances = Array.from({ length: count }, (_, i) =>
    Math.hypot(...muscleSites[site].map((value, axis) => positions[3 * i + axis] - value)),
  );
  return distances.indexOf(Math.min(...distances));
}

function arrivalMs(pattern: ActivationPattern, site: MuscleSite): number {
  return activate(fittedVentricles(), pattern).timesMs[nearestNode(site)];
}

describe('local activation table', () => {
  for (const name of ['normal', 'lbbb', 'rbbb'] as const) {
    it(`${name}: each lead is reached when the table says, within ${conductedBoundMs} ms`, async ({
      annotate,
    }) => {
      const differences = leads.map((site, i) => {
        const afterOnset = arrivalMs(configurations[name], site) - loopOf(name).measures.qrsOnsetMs;
        return afterOnset - table[name][i];
      });
      await annotate(leads.map((site, i) => `${site} ${differences[i].toFixed(1)}`).join(', '));
      differences.forEach((difference, i) =>
        expect(Math.abs(difference), leads[i]).toBeLessThan(conductedBoundMs),
      );
    });
  }

  for (const site of ['lvLat', 'lvPostlat', 'lvAntlat'] as const) {
    it(`apex to ${site} and back, within ${acrossBoundMs} ms`, async ({ annotate }) => {
      const out = arrivalMs(configurations.rvApex, site) - otherVentricle[site];
      const back = arrivalMs(configurations[site], 'rvApex') - otherVentricle[site];
      await annotate(`out ${out.toFixed(1)}, back ${back.toFixed(1)}`);
      expect(Math.abs(out)).toBeLessThan(acrossBoundMs);
      expect(Math.abs(back)).toBeLessThan(acrossBoundMs);
    });
  }
});
