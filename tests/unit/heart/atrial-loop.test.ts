import { describe, expect, it } from 'vitest';
import { atrialLoop, type AtrialSite } from '../../../shared/engine/heart/atrial-loop';
import { projectVector } from '../../../shared/engine/leads';
import type { LeadName } from '../../../shared/parameters/sheet';

const usual = { pAmplitudeMv: 0.12, pDurationMs: 118 };

/** Largest positive and negative value in a lead, mV. */
function extremes(site: AtrialSite, lead: LeadName, shape = usual): { up: number; down: number } {
  const { x, y, z } = atrialLoop(site, shape);
  const values = Array.from(x, (value, i) => projectVector(lead, value, y[i], z[i]));
  return { up: Math.max(0, ...values), down: Math.min(0, ...values) };
}

describe('P wave', () => {
  it.each([0.05, 0.12, 0.3])('of the sinus is %f mV high in lead II when that is asked', (pAmplitudeMv) => {
    const { up, down } = extremes('sinus', 'II', { ...usual, pAmplitudeMv });
    expect(up).toBeCloseTo(pAmplitudeMv, 3);
    expect(down).toBe(0);
  });

  it.each([60, 118, 180])('of the sinus lasts %i ms when that is asked', (pDurationMs) => {
    const loop = atrialLoop('sinus', { ...usual, pDurationMs });
    expect(loop.offsetMs - loop.onsetMs).toBeCloseTo(pDurationMs, 9);
    const active = Array.from(loop.x.keys()).filter((i) => loop.x[i] !== 0);
    expect(loop.startMs + active[0]).toBeLessThanOrEqual(1);
    expect(Math.abs(loop.startMs + active.at(-1)! - pDurationMs)).toBeLessThanOrEqual(1);
    expect(extremes('sinus', 'II', { ...usual, pDurationMs }).up).toBeCloseTo(0.12, 3);
  });

  it.each(['sinus', 'raa', 'bachmann', 'raLateral', 'lowAtrial', 'retrograde', 'leftLateral'] as const)(
    'from %s starts and ends with zeros and scales with the sinus P',
    (site) => {
      const loop = atrialLoop(site, usual);
      for (const axis of [loop.x, loop.y, loop.z]) {
        expect([...axis.slice(0, 2), ...axis.slice(-2)].every((value) => value === 0)).toBe(true);
      }
      const double = atrialLoop(site, { ...usual, pAmplitudeMv: 0.24 });
      loop.y.forEach((value, i) => expect(double.y[i]).toBeCloseTo(2 * value, 12));
      const shorter = atrialLoop(site, { ...usual, pDurationMs: 59 });
      expect(shorter.offsetMs).toBeCloseTo(loop.offsetMs / 2, 9);
    },
  );

  // Polarities below: the model's stated aims (from memory), not acceptance ranges with a source.
  it('of the sinus is upright in I, II and aVF, negative in aVR, biphasic in V1', () => {
    for (const lead of ['I', 'II', 'aVF'] as const) expect(extremes('sinus', lead).down).toBe(0);
    expect(extremes('sinus', 'I').up).toBeGreaterThan(0.04);
    expect(extremes('sinus', 'aVR').up).toBe(0);
    expect(extremes('sinus', 'V1').up).toBeGreaterThan(0.01);
    expect(extremes('sinus', 'V1').down).toBeLessThan(-0.04);
  });

  it('from the appendage is nearly flat in I and negative in V1', () => {
    expect(extremes('raa', 'I').up).toBeLessThan(0.04);
    expect(extremes('raa', 'V1').up).toBe(0);
    expect(extremes('raa', 'V1').down).toBeLessThan(-0.04);
  });

  it.each(['lowAtrial', 'retrograde'] as const)('from %s is negative in II, III and aVF', (site) => {
    for (const lead of ['II', 'III', 'aVF'] as const) {
      expect(extremes(site, lead).up).toBe(0);
      expect(extremes(site, lead).down).toBeLessThan(-0.08);
    }
  });

  it('from the left atrium is negative in I', () => {
    expect(extremes('leftLateral', 'I').up).toBe(0);
    expect(extremes('leftLateral', 'I').down).toBeLessThan(-0.04);
  });

  it('from Bachmann’s bundle is shorter than the sinus P, from the lateral wall longer', () => {
    const duration = (site: AtrialSite): number => atrialLoop(site, usual).offsetMs;
    expect(duration('bachmann')).toBeLessThan(duration('sinus'));
    expect(duration('raLateral')).toBeGreaterThan(duration('sinus'));
  });
});
