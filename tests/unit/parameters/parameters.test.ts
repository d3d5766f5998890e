import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { InvalidInputError, problemLine } from '../../../shared/errors';
import { assignPath } from '../../../shared/parameters/assign-path';
import { parseStripParameters, readStripParameters } from '../../../shared/parameters/parse';

function problemOf(input: unknown): string {
  const result = readStripParameters(input);
  if (result.ok) throw new Error('accepted');
  return result.problems.map(problemLine).join('\n');
}

describe('strip parameters', () => {
  it('fills every default from {}', () => {
    const strip = parseStripParameters({});
    expect(strip).toMatchObject({
      schemaVersion: 1,
      seed: 1,
      durationS: 10,
      patient: { atrialRhythm: 'sinus', atrialRateBpm: 70, prIntervalMs: 160 },
      pacing: { source: 'none', mode: 'DDD', ventricularChambers: 'right', pvarpMs: 275 },
      recorder: { bandwidth: 'diagnostic', sampleRateHz: 500, resolutionUv: 5 },
    });
  });

  it.each([
    [{ pacing: { source: 'transvenous' } }, { pacing: { mode: 'VVI' } }],
    [{ pacing: { source: 'transcutaneous' } }, { pacing: { mode: 'VVI' } }],
    [{ pacing: { mode: 'VVIRV' } }, { pacing: { ventricularChambers: 'both' } }],
    [{ patient: { atrialRhythm: 'tachycardia' } }, { patient: { atrialRateBpm: 160 } }],
    [{ patient: { atrialRhythm: 'flutter' } }, { patient: { atrialRateBpm: 300 } }],
    [{ patient: { atrialRhythm: 'fibrillation' } }, { patient: { atrialRateBpm: 400 } }],
    [
      { pacing: { faults: [{}] } },
      { pacing: { faults: [{ proportion: 1, fromS: 0, toS: null, intervalMs: 200 }] } },
    ],
  ])('fills what follows from %j', (input, expected) => {
    expect(parseStripParameters(input)).toMatchObject(expected);
  });

  it('reads its own output again, unchanged', () => {
    const strip = parseStripParameters({ pacing: { source: 'implanted', mode: 'DDDOV' } });
    expect(strip.pacing.ventricularChambers).toBe('both');
    expect(parseStripParameters(JSON.parse(JSON.stringify(strip)))).toEqual(strip);
  });

  it.each([
    [
      { patient: { atrialRateBpm: 500 } },
      'patient.atrialRateBpm: 500 is not allowed; allowed: 20 to 400 /min',
    ],
    [{ seed: 1.5 }, 'seed: 1.5 is not allowed; allowed: whole number 0 to 4294967295'],
    [
      { pacing: { rightVentricularLead: { amplitudeV: '5' } } },
      'pacing.rightVentricularLead.amplitudeV: "5" is not allowed; allowed: 0 to 10 V',
    ],
    [
      { waveform: { qrsDurationMs: 20 } },
      'waveform.qrsDurationMs: 20 is not allowed; allowed: null or 70 to 240 ms',
    ],
    [
      { recorder: { bandwidth: { lowHz: 0.001, highHz: 40 } } },
      'recorder.bandwidth.lowHz: 0.001 is not allowed; allowed: 0.01 to 10 Hz',
    ],
    [{ durationS: Number.NaN }, 'durationS: NaN is not allowed; allowed: 1 to 86400 s'],
  ])('refuses %j with path, value and range', (input, line) => {
    expect(problemOf(input)).toBe(line);
  });

  it.each([
    [{ nonsense: 1 }, 'nonsense'],
    [{ patient: { retrogradeMs: 200 } }, 'patient.retrogradeMs'],
    [{ pacing: { magnet: true } }, 'pacing.magnet'],
    [{ pacing: { faults: [{ sort: 'oversensing' }] } }, 'pacing.faults.0.sort'],
    [{ pacing: { atrialLead: { impedance: 5 } } }, 'pacing.atrialLead.impedance'],
  ])('refuses the unknown key in %j and lists the known ones', (input, path) => {
    expect(problemOf(input)).toMatch(new RegExp(`^${path}: the key .* allowed: an object with the keys `));
  });

  it.each([
    [{ pacing: { mode: 'DDD', ventricularChambers: 'both' } }, 'pacing.ventricularChambers'],
    [{ pacing: { mode: 'DDDOV', ventricularChambers: 'right' } }, 'pacing.ventricularChambers'],
    [{ pacing: { lowerRateBpm: 130 } }, 'pacing.upperTrackingRateBpm'],
    [{ recorder: { sampleRateHz: 250 } }, 'recorder.sampleRateHz'],
    [{ recorder: { bandwidth: { lowHz: 0.05, highHz: 300 } } }, 'recorder.bandwidth.highHz'],
    [{ sheet: { leads: ['II', 'II'] } }, 'sheet.leads'],
    [{ pacing: { hysteresisRateBpm: 60 } }, 'pacing.hysteresisRateBpm'],
    [{ pacing: { source: 'transvenous', mode: 'DDD' } }, 'pacing.mode'],
    [{ pacing: { source: 'transcutaneous', mode: 'VVIR' } }, 'pacing.mode'],
    [{ pacing: { faults: [{ kind: 'undersensing', chamber: 'leftVentricle' }] } }, 'pacing.faults.0.chamber'],
    [{ pacing: { faults: [{ kind: 'oversensing', chamber: 'leftVentricle' }] } }, 'pacing.faults.0.chamber'],
    [{ pacing: { faults: [{ fromS: 4, toS: 4 }] } }, 'pacing.faults.0.toS'],
  ])('refuses what does not fit together: %j', (input, path) => {
    expect(problemOf(input).startsWith(`${path}: `)).toBe(true);
  });

  it('names every problem, not only the first', () => {
    expect(problemOf({ seed: -1, patient: { x: 1, escapeRateBpm: 3 } }).split('\n')).toHaveLength(3);
  });

  it('refuses anything that is not an object, and never throws anything else', () => {
    fc.assert(
      fc.property(fc.anything(), (input) => {
        const result = readStripParameters(input);
        if (result.ok) return;
        expect(result.problems.length).toBeGreaterThan(0);
        for (const problem of result.problems) expect(problem.allowed.length).toBeGreaterThan(0);
      }),
      { numRuns: 300, seed: 1 },
    );
  });

  it('refuses any number out of range, naming path and range', () => {
    const numbers: [string, number, number][] = [
      ['patient.prIntervalMs', 80, 500],
      ['pacing.pvarpMs', 150, 500],
      ['pacing.leftVentricularLead.pulseWidthMs', 0.05, 2],
      ['disturbance.muscleMv', 0, 1],
      ['recorder.resolutionUv', 1, 10],
    ];
    for (const [path, min, max] of numbers) {
      for (const value of [min - 0.01, max + 0.01, -1e9, 1e9]) {
        expect(problemOf(assignPath({}, `${path}=${value}`))).toContain(
          `${path}: ${value} is not allowed; allowed: ${min} to ${max}`,
        );
      }
    }
  });
});

describe('path assignments', () => {
  it('sets numbers, words, null and objects without touching what was given', () => {
    const given = { pacing: { mode: 'VVI' } };
    expect(assignPath(given, 'pacing.lowerRateBpm=72')).toEqual({
      pacing: { mode: 'VVI', lowerRateBpm: 72 },
    });
    expect(assignPath({}, 'patient.atrialRhythm=arrest')).toEqual({ patient: { atrialRhythm: 'arrest' } });
    expect(assignPath({}, 'waveform.qrsDurationMs=null')).toEqual({ waveform: { qrsDurationMs: null } });
    expect(assignPath({}, 'recorder.bandwidth={"lowHz":1,"highHz":20}')).toEqual({
      recorder: { bandwidth: { lowHz: 1, highHz: 20 } },
    });
    expect(given).toEqual({ pacing: { mode: 'VVI' } });
  });

  it('sets and adds an item of a list', () => {
    const given = { pacing: { faults: [{ kind: 'oversensing' }] } };
    expect(assignPath(given, 'pacing.faults.0.fromS=4')).toEqual({
      pacing: { faults: [{ kind: 'oversensing', fromS: 4 }] },
    });
    expect(assignPath({ pacing: { faults: [] } }, 'pacing.faults.0.kind=undersensing')).toEqual({
      pacing: { faults: [{ kind: 'undersensing' }] },
    });
    expect(given).toEqual({ pacing: { faults: [{ kind: 'oversensing' }] } });
    expect(problemOf(assignPath(given, 'pacing.faults.x=1'))).toContain('pacing.faults');
  });

  it.each(['novalue', '=5', 'a..b=1', '__proto__.x=1'])('refuses %s', (assignment) => {
    expect(() => assignPath({}, assignment)).toThrow(InvalidInputError);
  });
});
