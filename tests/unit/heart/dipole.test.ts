import { describe, expect, it } from 'vitest';
import { activate } from '../../../shared/engine/heart/activation';
import {
  tabulateRecovery,
  upstrokeReachMs,
  upstrokeStepsPerMs,
  upstrokeTable,
} from '../../../shared/engine/heart/action-potential';
import { sumDepolarization } from '../../../shared/engine/heart/depolarization';
import { sumDipole } from '../../../shared/engine/heart/dipole';
import { actionPotential, dipoleScale } from '../../../shared/engine/heart/heart-model-data';
import { actionPotentialDurations } from '../../../shared/engine/heart/repolarization';
import { fittedVentricles } from '../../../shared/engine/heart/ventricles';

/** Normal distribution function by its Taylor series: independent of the table. */
function normalDistribution(x: number): number {
  if (x < -6) return 0;
  if (x > 6) return 1;
  let term = x;
  let sum = x;
  for (let n = 1; n < 200; n++) {
    term *= (-x * x) / (2 * n);
    sum += term / (2 * n + 1);
  }
  return 0.5 + sum / Math.sqrt(2 * Math.PI);
}

const { upstrokeSigmaMs, plateauSlopePerMs, recoveryTau1Ms, recoveryTau2Ms } = actionPotential;

function voltage(sMs: number, durationMs: number, rateFactor: number): number {
  const q = sMs - durationMs;
  const stretch = Math.sqrt(rateFactor);
  return (
    (normalDistribution(sMs / upstrokeSigmaMs) * (1 - plateauSlopePerMs * Math.max(sMs, 0))) /
    ((1 + Math.exp(q / (recoveryTau1Ms * stretch))) * (1 + Math.exp(q / (recoveryTau2Ms * stretch))))
  );
}

describe('action potential tables', () => {
  it('hold the normal distribution within 1e-5', () => {
    const between = (s: number): number => {
      const place = (s + upstrokeReachMs) * upstrokeStepsPerMs;
      const k = Math.floor(place);
      return upstrokeTable[k] + (place - k) * (upstrokeTable[k + 1] - upstrokeTable[k]);
    };
    for (let s = -upstrokeReachMs; s <= upstrokeReachMs; s += 0.37) {
      expect(Math.abs(between(s) - normalDistribution(s / upstrokeSigmaMs))).toBeLessThan(1e-5);
    }
    expect(between(0)).toBe(0.5);
    expect(between(-upstrokeReachMs)).toBeLessThan(1e-8);
    expect(between(upstrokeReachMs)).toBeGreaterThan(1 - 1e-8);
  });

  it.each([0.4, 1, 2])('hold the recovery at rate factor %f', (rateFactor) => {
    const { firstMs, lastMs, values } = tabulateRecovery(rateFactor, 300);
    expect(firstMs).toBe(-300);
    for (let k = 0; k < values.length; k += 17) {
      const q = firstMs + k / 4;
      const stretch = Math.sqrt(rateFactor);
      const exact =
        1 / ((1 + Math.exp(q / (recoveryTau1Ms * stretch))) * (1 + Math.exp(q / (recoveryTau2Ms * stretch))));
      expect(values[k]).toBeCloseTo(exact, 10);
    }
    expect(values[(lastMs - firstMs) * 4]).toBeLessThan(2e-7);
  });
});

describe('dipole sum', () => {
  const ventricles = fittedVentricles();
  const pattern = {
    muscle: [{ site: 'lvPostlat' as const, timeMs: 0 }],
    fascicles: [{ fascicle: 'RBB' as const, timeMs: 21.37 }],
  };
  const activation = activate(ventricles, pattern);

  it.each([0.4, 1, 1.9])('equals the written-out sum over nodes at rate factor %f', (rateFactor) => {
    const durations = actionPotentialDurations(ventricles, activation, rateFactor);
    const trace = sumDipole(ventricles, activation, durations, rateFactor);
    for (let j = 5; j < trace.sampleCount; j += 23) {
      const expected = [0, 0, 0];
      activation.timesMs.forEach((time, i) => {
        const v = voltage(trace.startMs + j - time, durations[i], rateFactor);
        for (let axis = 0; axis < 3; axis++) {
          expected[axis] -= dipoleScale * 1e-3 * v * ventricles.weights.body[3 * i + axis];
        }
      });
      for (let axis = 0; axis < 3; axis++) {
        expect(Math.abs(trace.values[3 * j + axis] - expected[axis])).toBeLessThan(5e-6);
      }
    }
  });

  it('starts and ends at exact zero, smoothly', () => {
    const durations = actionPotentialDurations(ventricles, activation, 1);
    const { values, sampleCount } = sumDipole(ventricles, activation, durations, 1);
    for (let axis = 0; axis < 3; axis++) {
      expect(values[axis]).toBe(0);
      expect(Math.abs(values[3 + axis])).toBeLessThan(1e-7);
      expect(values[3 * (sampleCount - 1) + axis]).toBe(0);
      expect(Math.abs(values[3 * (sampleCount - 3) + axis])).toBeLessThan(1e-6);
    }
  });
});

describe('depolarization alone', () => {
  const ventricles = fittedVentricles();
  const activation = activate(ventricles, { muscle: [{ site: 'rvOt', timeMs: 0 }], fascicles: [] });
  const { values, startMs, sampleCount } = sumDepolarization(ventricles, activation);

  it('equals the written-out sum of upstrokes', () => {
    for (let j = 0; j < sampleCount; j += 7) {
      const expected = [0, 0, 0];
      activation.timesMs.forEach((time, i) => {
        const v = normalDistribution((startMs + j - time) / upstrokeSigmaMs);
        for (let axis = 0; axis < 3; axis++) {
          expected[axis] -= dipoleScale * 1e-3 * v * ventricles.weights.body[3 * i + axis];
        }
      });
      expected.forEach((value, axis) => expect(Math.abs(values[3 * j + axis] - value)).toBeLessThan(1e-5));
    }
  });

  it('runs from rest to the last upstroke, and starts with the whole vector', () => {
    const whole = sumDipole(ventricles, activation, actionPotentialDurations(ventricles, activation, 1), 1);
    expect(whole.startMs).toBe(startMs);
    expect(startMs + sampleCount - 1).toBeGreaterThan(activation.latestMs + upstrokeReachMs);
    expect([...values.slice(0, 3), ...values.slice(-3)].every((value) => value === 0)).toBe(true);
    expect(Math.max(...values.slice(-6, -3).map(Math.abs))).toBeLessThan(1e-6);
  });
});
