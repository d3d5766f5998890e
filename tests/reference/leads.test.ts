import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { frontalAxisDeg } from '../../shared/engine/heart/loop-measures';
import { dowerMatrix, measuredLeads, projectVector, twelveLeadRows } from '../../shared/engine/leads';
import { leadNames, type LeadName } from '../../shared/parameters/sheet';
import { loopOf, vectorAt } from './heart-model-support';

interface Matrix {
  column_order: LeadName[];
  rows: Record<'X' | 'Y' | 'Z', number[]>;
}

function load(name: string): unknown {
  return JSON.parse(readFileSync(new URL(`../fixtures/${name}`, import.meta.url), 'utf8'));
}
const entries = (load('leads.json') as { entries: { id: string; value: unknown }[] }).entries;
const cases = (load('worked-examples.json') as { cases: { id: string; inputs: unknown; value: unknown }[] })
  .cases;
const entry = <T>(id: string): T => entries.find((candidate) => candidate.id === id)!.value as T;
const example = <I, V>(id: string): { inputs: I; value: V } =>
  cases.find((candidate) => candidate.id === id)! as { inputs: I; value: V };

const axes = ['X', 'Y', 'Z'] as const;
const order: readonly LeadName[] = ['V1', 'V2', 'V3', 'V4', 'V5', 'V6', 'I', 'II'];

function determinant(m: number[][]): number {
  return (
    m[0][0] * (m[1][1] * m[2][2] - m[1][2] * m[2][1]) -
    m[0][1] * (m[1][0] * m[2][2] - m[1][2] * m[2][0]) +
    m[0][2] * (m[1][0] * m[2][1] - m[1][1] * m[2][0])
  );
}

/** Moore–Penrose inverse (DᵀD)⁻¹Dᵀ of the projection onto `order`, one row an axis, by Cramer's rule. */
function pseudoInverse(): number[][] {
  const d = order.map((lead) => twelveLeadRows[lead]);
  const normal = [0, 1, 2].map((r) => [0, 1, 2].map((c) => d.reduce((sum, row) => sum + row[r] * row[c], 0)));
  const whole = determinant(normal);
  return [0, 1, 2].map((axis) =>
    d.map((row) => {
      const replaced = normal.map((line, r) => line.map((value, c) => (c === axis ? row[r] : value)));
      return determinant(replaced) / whole;
    }),
  );
}

function reconstruct(matrix: Matrix, x: number, y: number, z: number): number[] {
  return axes.map((axis) =>
    matrix.column_order.reduce(
      (sum, lead, i) => sum + matrix.rows[axis][i] * projectVector(lead, x, y, z),
      0,
    ),
  );
}

describe('Dower matrix and its inverse', () => {
  it('equals LD-20 (Dower et al. 1980)', () => {
    const published = entry<Record<string, number[]>>('LD-20');
    expect(Object.keys(published).sort()).toEqual([...measuredLeads].sort());
    for (const lead of measuredLeads) expect([...dowerMatrix[lead]]).toEqual(published[lead]);
  });

  it('gives the augmented rows that the same source lists, within 0.001', () => {
    // LD-20, note.
    const listed: Partial<Record<LeadName, number[]>> = {
      III: [-0.397, 1.301, -0.191],
      aVR: [-0.434, -0.415, 0.037],
      aVL: [0.515, -0.768, 0.125],
      aVF: [-0.081, 1.184, -0.162],
    };
    for (const [lead, row] of Object.entries(listed)) {
      row.forEach((value, axis) =>
        expect(Math.abs(twelveLeadRows[lead as LeadName][axis] - value), lead).toBeLessThan(0.00101),
      );
    }
  });

  it('has LD-21 (Edenbrandt and Pahlm 1988) as its pseudo-inverse to three decimals (LD-22, J03)', () => {
    expect(entry<boolean>('LD-22')).toBe(true);
    const published = entry<Matrix>('LD-21');
    expect(published.column_order).toEqual(order);
    const computed = pseudoInverse();
    const j03 = example<unknown, { pinv: number[][]; largest_abs_difference: number }>('J03').value;
    let largest = 0;
    axes.forEach((axis, r) =>
      published.rows[axis].forEach((value, c) => {
        largest = Math.max(largest, Math.abs(computed[r][c] - value));
        expect(computed[r][c]).toBeCloseTo(j03.pinv[r][c], 8);
      }),
    );
    expect(largest).toBeLessThan(5e-4);
    expect(largest).toBeCloseTo(j03.largest_abs_difference, 9);
  });

  it('projects and returns the vectors of J04', () => {
    const { inputs, value } = example<{ xyz: [number, number, number][] }, { leads: number[][] }>('J04');
    const inverse = pseudoInverse();
    inputs.xyz.forEach((vector, i) => {
      const leads = order.map((lead) => projectVector(lead, ...vector));
      leads.forEach((lead, k) => expect(lead).toBeCloseTo(value.leads[i][k], 9));
      inverse.forEach((row, axis) =>
        expect(row.reduce((sum, weight, k) => sum + weight * leads[k], 0)).toBeCloseTo(vector[axis], 9),
      );
    });
  });

  it('is undone by the inverse Dower matrix within 0.2 % of the vector, for a whole beat', () => {
    const loop = loopOf('rvApex');
    for (let t = 0; t < 450; t += 5) {
      const vector = vectorAt(loop, t);
      const back = reconstruct(entry<Matrix>('LD-21'), ...vector);
      const size = Math.hypot(...vector);
      back.forEach((value, axis) => expect(Math.abs(value - vector[axis])).toBeLessThan(0.002 * size + 1e-9));
    }
  });

  // LD-23 (Kors et al. 1990) is a regression on measured leads, another model of the torso: it must agree roughly.
  it('agrees with the Kors matrix on the direction of the peak QRS vector within 30°', () => {
    for (const name of ['normal', 'rvApex', 'lvLat', 'rvOt'] as const) {
      const loop = loopOf(name);
      let peak: [number, number, number] = [0, 0, 0];
      for (let t = loop.measures.qrsOnsetMs; t <= loop.measures.qrsOffsetMs; t++) {
        const vector = vectorAt(loop, t);
        if (Math.hypot(...vector) > Math.hypot(...peak)) peak = vector;
      }
      const kors = reconstruct(entry<Matrix>('LD-23'), ...peak);
      const cosine =
        kors.reduce((sum, value, axis) => sum + value * peak[axis], 0) /
        (Math.hypot(...kors) * Math.hypot(...peak));
      expect(cosine, name).toBeGreaterThan(Math.cos(Math.PI / 6));
    }
  });
});

describe('lead identities', () => {
  it('gives the limb leads of J01', () => {
    const { inputs, value } = example<{ I: number; II: number }, Record<string, number>>('J01');
    // A vector in the frontal plane with these I and II.
    const [a, b] = [twelveLeadRows.I, twelveLeadRows.II];
    const det = a[0] * b[1] - a[1] * b[0];
    const x = (inputs.I * b[1] - inputs.II * a[1]) / det;
    const y = (a[0] * inputs.II - b[0] * inputs.I) / det;
    for (const lead of ['III', 'aVR', 'aVL', 'aVF'] as const) {
      expect(projectVector(lead, x, y, 0)).toBeCloseTo(value[lead], 12);
    }
  });

  // LD-01 to LD-06, on a whole paced beat.
  it('keeps Einthoven and Goldberger to 1e-12 mV', () => {
    const loop = loopOf('biv0');
    for (let t = -10; t < 500; t += 3) {
      const vector = vectorAt(loop, t);
      const of = Object.fromEntries(
        leadNames.map((lead) => [lead, projectVector(lead, ...vector)]),
      ) as Record<LeadName, number>;
      expect(of.I + of.III).toBeCloseTo(of.II, 12);
      expect(of.aVR + of.aVL + of.aVF).toBeCloseTo(0, 12);
      expect(of.aVR).toBeCloseTo(-(of.I + of.II) / 2, 12);
      expect(of.aVL).toBeCloseTo((of.I - of.III) / 2, 12);
      expect(of.aVF).toBeCloseTo((of.II + of.III) / 2, 12);
    }
  });

  it('takes the frontal axis of J05', () => {
    const { inputs, value } = example<{ I: number[]; aVF: number[] }, { axis_deg: number[] }>('J05');
    inputs.I.forEach((lead, i) =>
      expect(frontalAxisDeg(lead, inputs.aVF[i])).toBeCloseTo(value.axis_deg[i], 6),
    );
  });
});
