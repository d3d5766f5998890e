import { describe, expect, it } from 'vitest';
import { activate } from '../../shared/engine/heart/activation';
import { computeVentricularLoop, loopFromActivation } from '../../shared/engine/heart/compute-loop';
import { heartModelVersion } from '../../shared/engine/heart/heart-model-data';
import { activationSpread } from '../../shared/engine/heart/repolarization';
import { nativeShape } from '../../shared/engine/heart/ventricular-shape';
import { fittedVentricles } from '../../shared/engine/heart/ventricles';
import { leadNames } from '../../shared/parameters/sheet';
import {
  biventricular,
  configurations,
  fixture,
  fusedWithApex,
  loopOf,
  pacedFraction,
  vectorAt,
  type ConfigurationName,
} from './heart-model-support';

/** All figures: tests/fixtures/heart-model-figures.json, made by this model; they show a drift, they validate nothing. */
const goldenNames = Object.keys(fixture.golden.values) as ConfigurationName[];
const prototypeNames = Object.keys(fixture.prototypeValues) as ConfigurationName[];

describe('golden heart vectors', () => {
  it('are those of this version', () => expect(fixture.version).toBe(heartModelVersion));

  it.each(goldenNames)('%s lies within 3 % of the peak at every time', (name) => {
    const { H, peak } = fixture.golden.values[name];
    for (const [timeMs, expected] of Object.entries(H)) {
      const actual = vectorAt(loopOf(name), Number(timeMs));
      expected.forEach((value, axis) => {
        expect(Math.abs(actual[axis] - value) / peak, `${timeMs} ms`).toBeLessThan(0.03);
      });
    }
  });

  // Tighter than asked (3 %), about the rounding of the fixture: a small drift shows here.
  it.each(goldenNames)('%s lies within 0.1 %, its activation within 0.05 ms', (name) => {
    const golden = fixture.golden.values[name];
    const worst = Object.entries(golden.H).flatMap(([timeMs, expected]) =>
      vectorAt(loopOf(name), Number(timeMs)).map((value, axis) => Math.abs(value - expected[axis])),
    );
    expect(Math.max(...worst) / golden.peak).toBeLessThan(0.001);
    const activation = activate(fittedVentricles(), configurations[name]);
    const close = (actual: number, expected: number): void =>
      expect(Math.abs(actual - expected)).toBeLessThan(0.05);
    close(activation.earliestMs, golden.actMin);
    close(activation.latestMs, golden.actMax);
    close(activationSpread(fittedVentricles(), activation).meanMs, golden.actMeanAreaWeighted);
  });
});

describe('figures of every configuration', () => {
  it.each(prototypeNames)('%s: widths within 1 ms, axis within 1.5°, amplitudes within 0.01 mV', (name) => {
    const expected = fixture.prototypeValues[name];
    const { leads, ...measures } = loopOf(name).measures;
    expect(Math.abs(measures.qrsDurationMs - expected.qrs)).toBeLessThanOrEqual(1);
    expect(Math.abs(measures.stimulusToQrsEndMs - expected.qrsFromStim)).toBeLessThanOrEqual(1);
    expect(Math.abs(measures.frontalAxisDeg - expected.axis)).toBeLessThan(1.5);
    for (const lead of leadNames) {
      const { rMv, sMv, jMv, tMv } = leads[lead];
      const pairs = [
        [rMv, expected.R[lead]],
        [sMv, expected.S[lead]],
        [jMv, expected.J[lead]],
        [tMv, expected.T[lead]],
      ];
      for (const [actual, value] of pairs) expect(Math.abs(actual - value), lead).toBeLessThan(0.01);
    }
  });
});

describe('sweeps', () => {
  it.each(fixture.biventricularSweep)('biventricular, left $lvMinusRv ms after right', (expected) => {
    const { leads, ...measures } = computeVentricularLoop(
      biventricular(expected.lvMinusRv),
      nativeShape,
    ).measures;
    expect(Math.abs(measures.stimulusToQrsEndMs - expected.qrsFromStim)).toBeLessThanOrEqual(1);
    expect(Math.abs(measures.qrsDurationMs - expected.qrs)).toBeLessThanOrEqual(1);
    expect(Math.abs(measures.frontalAxisDeg - expected.axis)).toBeLessThan(1.5);
    expect(Math.abs(leads.V1.netMv - expected.V1net)).toBeLessThan(0.015);
    expect(Math.abs(leads.I.netMv - expected.Inet)).toBeLessThan(0.015);
    expect(Math.abs((leads.I.qMv ?? 0) - expected.Iq)).toBeLessThan(0.01);
    // A ratio over a tiny S magnifies its last digit.
    const ratio = leads.V1.rMv / -leads.V1.sMv;
    expect(Math.abs(ratio - expected.V1RS) / Math.max(1, expected.V1RS)).toBeLessThan(0.08);
  });

  it.each(fixture.fusionSweep)('fusion with conduction at $intrinsicOnset ms', (expected) => {
    const loop = computeVentricularLoop(fusedWithApex(expected.intrinsicOnset), nativeShape);
    expect(Math.abs(loop.measures.qrsDurationMs - expected.qrs)).toBeLessThanOrEqual(1);
    expect(Math.abs(pacedFraction(loop) - expected.pacedFraction)).toBeLessThan(0.01);
  });

  it.each(fixture.qtScaling)('rate factor $rateFactor gives QT $qt', ({ rateFactor, qt, qrs }) => {
    const { measures } = computeVentricularLoop(configurations.normal, { ...nativeShape, rateFactor });
    expect(Math.abs(measures.qtMs - qt)).toBeLessThan(1.5);
    expect(measures.qrsDurationMs).toBe(qrs);
  });

  it.each(Object.entries(fixture.qrsVersusSpeedScale))(
    'speed factor %s: apical QRS ends %i ms after the stimulus',
    (factor, expectedMs) => {
      const activation = activate(fittedVentricles(), configurations.rvApex, Number(factor));
      const { measures } = loopFromActivation(activation, nativeShape);
      expect(Math.abs(measures.stimulusToQrsEndMs - expectedMs)).toBeLessThanOrEqual(1);
    },
  );
});
