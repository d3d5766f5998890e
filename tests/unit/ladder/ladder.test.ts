import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { DepolarizationEvent, StripEvent } from '../../../shared/engine/events';
import { ladderLevels, ladderOf, type LadderMark } from '../../../shared/ladder/ladder';
import type { StripParametersInput } from '../../../shared/parameters/strip-parameters';
import { arbitraryRhythm } from '../../support/arbitrary-strips';
import { buildStrip, eventsOf, steadyStrip } from '../../support/strips';

type Conduction = Extract<LadderMark, { kind: 'conduction' }>;
type Place = Extract<LadderMark, { level: number }>;
const isKind =
  <K extends LadderMark['kind']>(kind: K) =>
  (mark: LadderMark): mark is Extract<LadderMark, { kind: K }> =>
    mark.kind === kind;
const ofKind = <K extends 'stimulus' | 'conduction'>(marks: readonly LadderMark[], kind: K) =>
  marks.filter(isKind(kind));
const placesOf = (marks: readonly LadderMark[], kind: Place['kind']): Place[] =>
  marks.filter((mark): mark is Place => mark.kind === kind);
const depolarizations = (events: readonly StripEvent[], chamber: DepolarizationEvent['chamber']) =>
  events.filter(
    (event): event is DepolarizationEvent => event.type === 'depolarization' && event.chamber === chamber,
  );
const ladder = (input: StripParametersInput) => {
  const events = eventsOf(steadyStrip(input));
  return { events, marks: ladderOf(events) };
};
const ends = (line: Conduction) => [
  [line.fromS, line.fromLevel],
  [line.toS, line.toLevel],
];
const touches = (line: Conduction, timeS: number, level: number): boolean =>
  ends(line).some(([time, at]) => Math.abs(time - timeS) < 1e-9 && at === level);

describe('ladder of any rhythm', () => {
  it('shows every stimulus once, at its time, with its capture, and starts or ends a line at every onset', () => {
    fc.assert(
      fc.property(arbitraryRhythm, (input) => {
        const events = eventsOf(buildStrip(input));
        const marks = ladderOf(events);
        const stimuli = events.filter((event) => event.type === 'stimulus');
        const strokes = ofKind(marks, 'stimulus');
        expect(strokes.map(({ timeS, captured, edge }) => [timeS, captured, edge])).toEqual(
          stimuli.map(({ timeS, captured, chamber }) => [
            timeS,
            captured,
            chamber === 'atrium' ? 'atria' : 'ventricles',
          ]),
        );
        const lines = ofKind(marks, 'conduction');
        for (const event of events) {
          if (event.type !== 'depolarization') continue;
          expect(lines.some((line) => ends(line).some(([time]) => Math.abs(time - event.timeS) < 1e-9))).toBe(
            true,
          );
        }
        for (const mark of marks) {
          const levels =
            mark.kind === 'conduction' ? [mark.fromLevel, mark.toLevel] : 'level' in mark ? [mark.level] : [];
          for (const level of levels)
            expect(level >= ladderLevels.top && level <= ladderLevels.bottom).toBe(true);
        }
      }),
      { numRuns: 120, seed: 8 },
    );
  });
});

describe('ladder', () => {
  it('draws conduction from the P wave to the QRS that it became, to the microsecond', () => {
    const { events, marks } = ladder({ patient: { prIntervalMs: 220 } });
    for (const beat of depolarizations(events, 'ventricle')) {
      const down = ofKind(marks, 'conduction').find(
        (line) => line.fromLevel === ladderLevels.nodeIn && touches(line, beat.timeS, ladderLevels.nodeOut),
      );
      if (beat.timeS > 0.3) expect(down).toBeDefined();
    }
  });

  it('puts bars in the node for Wenckebach, below it for Mobitz II, one for each dropped beat', () => {
    for (const [avConduction, above] of [
      ['wenckebach', true],
      ['mobitzTwo', false],
    ] as const) {
      const { events, marks } = ladder({ durationS: 20, patient: { avConduction, atrialRateBpm: 80 } });
      const blocks = placesOf(marks, 'block');
      const waves = depolarizations(events, 'atrium').filter((wave) => wave.timeS < 19.5).length;
      const conducted = depolarizations(events, 'ventricle').length;
      expect(Math.abs(blocks.length - (waves - conducted))).toBeLessThanOrEqual(1);
      expect(blocks.length).toBeGreaterThan(3);
      for (const block of blocks) expect(block.level < 1.7).toBe(above);
    }
  });

  it('starts escapes at diamonds: in the junction, or in the ventricles', () => {
    for (const [escapeSite, least, most] of [
      ['junctional', 1, 2],
      ['ventricular', 2, 3],
    ] as const) {
      const { events, marks } = ladder({ patient: { avConduction: 'complete', escapeSite } });
      const diamonds = placesOf(marks, 'escape');
      expect(diamonds).toHaveLength(depolarizations(events, 'ventricle').length);
      for (const one of diamonds) expect(one.level > least && one.level < most).toBe(true);
    }
  });

  it('slants upwards from a ventricular beat to its retrograde P wave', () => {
    const { events, marks } = ladder({
      patient: { atrialRhythm: 'arrest', retrogradeConductionMs: 240 },
      pacing: { source: 'implanted', mode: 'VVI' },
    });
    const up = depolarizations(events, 'atrium').filter((wave) => wave.timeS > 0.5);
    expect(up.length).toBeGreaterThan(5);
    for (const wave of up) {
      const line = ofKind(marks, 'conduction').find(
        (one) => one.toLevel === ladderLevels.nodeIn && Math.abs(one.toS - wave.timeS) < 1e-9,
      );
      expect(line?.fromLevel).toBe(ladderLevels.nodeOut);
    }
  });

  it('meets in a hollow diamond where beats fuse, and faces bars where they only collide', () => {
    const fused = ladder({
      patient: { atrialRateBpm: 80, prIntervalMs: 160 },
      pacing: { source: 'implanted', sensedAvDelayMs: 125 },
    });
    const fusions = depolarizations(fused.events, 'ventricle').filter((beat) => beat.fusion);
    expect(fusions.length).toBeGreaterThan(3);
    expect(placesOf(fused.marks, 'fusion')).toHaveLength(fusions.length);
    const collided = ladder({
      patient: { atrialRateBpm: 80, prIntervalMs: 300 },
      pacing: { source: 'implanted', sensedAvDelayMs: 120 },
    });
    expect(placesOf(collided.marks, 'fusion')).toHaveLength(0);
    expect(placesOf(collided.marks, 'collision').length).toBeGreaterThan(5);
  });

  it('letters the strokes where both ventricles are paced', () => {
    const apart = ladder({
      patient: { avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDDOV', interventricularDelayMs: 40 },
    });
    const labels = ofKind(apart.marks, 'stimulus').flatMap((one) => one.label ?? []);
    expect(new Set(labels)).toEqual(new Set(['R', 'L']));
    const together = ladder({
      patient: { avConduction: 'complete' },
      pacing: { source: 'implanted', mode: 'DDDOV' },
    });
    expect(new Set(ofKind(together.marks, 'stimulus').flatMap((one) => one.label ?? []))).toEqual(
      new Set(['R L']),
    );
  });
});
