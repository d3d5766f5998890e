import { describe, expect, it } from 'vitest';
import {
  addStimulusArtefact,
  rechargeTimeConstantMs,
  stimulusEndS,
} from '../../../shared/engine/stimulus/stimulus-artefact';

const stimulus = { timeS: 0.0201237, chamber: 'leftVentricle', amplitudeMv: 3, widthMs: 0.5 } as const;

function paint(rateHz: number, first: number, length: number, one: typeof stimulus = stimulus) {
  const out = { x: new Float64Array(length), y: new Float64Array(length), z: new Float64Array(length) };
  addStimulusArtefact(out, { rateHz, firstTimeS: 0 }, first, length, one);
  return out;
}

const sum = (values: Float64Array): number => values.reduce((total, value) => total + value, 0);

describe('stimulus artefact', () => {
  it.each([250, 500, 8000, 64000])('has the exact pulse area at any position (%d/s)', (rateHz) => {
    const pulseEnd = Math.ceil((stimulus.timeS + 0.01) * rateHz);
    const { y } = paint(rateHz, 0, pulseEnd);
    const area = (1000 * sum(y)) / rateHz;
    const elapsedMs = 1000 * ((pulseEnd - 0.5) / rateHz - stimulus.timeS);
    const expected = (3 / Math.sqrt(3)) * 0.5 * Math.exp((0.5 - elapsedMs) / rechargeTimeConstantMs);
    expect(area).toBeCloseTo(expected, 9);
  });

  it('is balanced by its recharge (PP-09)', () => {
    const length = Math.ceil((stimulusEndS(stimulus) + 0.01) * 8000);
    const { x } = paint(8000, 0, length);
    const pulse = (3 / Math.sqrt(3)) * 0.5 * 8;
    expect(Math.abs(sum(x))).toBeLessThan(1e-6 * pulse);
  });

  it('points to posterior, inferior, right for the left ventricle (PP-22)', () => {
    const { x, y, z } = paint(8000, 160, 8);
    const at = x.findIndex((value) => Math.abs(value) > 1);
    expect([Math.sign(x[at]), Math.sign(y[at]), Math.sign(z[at])]).toEqual([-1, 1, 1]);
    expect(Math.hypot(x[at], y[at], z[at])).toBeLessThanOrEqual(3.0000001);
  });

  it('does not depend on the window', () => {
    const whole = paint(8000, 0, 2000);
    const parts = [0, 161, 163, 900].flatMap((from, i, all) => [
      ...paint(8000, from, (all[i + 1] ?? 2000) - from).z,
    ]);
    const worst = parts.reduce((most, value, i) => Math.max(most, Math.abs(value - whole.z[i])), 0);
    expect(worst).toBeLessThan(1e-12);
  });
});
