import { describe, expect, it } from 'vitest';
import { solveSpeedFactor, speedFactorLimits } from '../../../shared/engine/heart/speed-factor';

describe('speed factor', () => {
  it('solves a duration with a floor that no speed removes', () => {
    const duration = (factor: number): number => Math.round(15 + 120 / factor);
    for (const target of [70, 100, 135, 200, 240]) {
      expect(Math.abs(duration(solveSpeedFactor(duration, target)) - target)).toBeLessThanOrEqual(0.5);
    }
  });

  it('leaves the speed alone when the duration fits already', () => {
    expect(solveSpeedFactor(() => 82, 82)).toBe(1);
  });

  it('jumps over a gap to the nearer side', () => {
    const duration = (factor: number): number => (factor > 1.5 ? 60 : 100);
    const solved = duration(solveSpeedFactor(duration, 75));
    expect(solved).toBe(60);
  });

  it('stays within its limits and gives the nearest where the target cannot be met', () => {
    const floor = (factor: number): number => 90 + 10 / factor;
    expect(solveSpeedFactor(floor, 70)).toBeCloseTo(speedFactorLimits.max, 9);
    expect(solveSpeedFactor(floor, 400)).toBeCloseTo(speedFactorLimits.min, 9);
  });
});
