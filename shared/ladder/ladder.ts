import type {
  ActivationSource,
  AtrialDepolarization,
  StimulusEvent,
  StripEvent,
  VentricularDepolarization,
  VentricularSourceSite,
} from '../engine/events';

/**
 * A ladder diagram tells where each beat starts and how far it gets. Its lanes are atria, AV junction and ventricles;
 * a place in them is a time and a level: 0 at the top of the atria, 1 and 2 at the edges of the junction, 3 at the
 * bottom of the ventricles. Onsets, arrivals and stimuli stand at their true times. How long a line takes to cross a
 * chamber, and where in the junction an impulse dies, are signs (chosen), not measurements.
 */
export type LadderMark =
  | {
      kind: 'stimulus';
      timeS: number;
      edge: 'atria' | 'ventricles';
      captured: boolean;
      /** Which ventricle, where both are paced. */
      label: string | null;
    }
  /** A beat of the heart's own. */
  | { kind: 'intrinsic' | 'escape'; timeS: number; level: number }
  | { kind: 'conduction'; fromS: number; fromLevel: number; toS: number; toLevel: number }
  | { kind: 'block' | 'fusion' | 'collision'; timeS: number; level: number };

/** Levels of the lanes' edges. */
export const ladderLevels = { top: 0, nodeIn: 1, nodeOut: 2, bottom: 3 } as const;

/** Signs: time a line takes to cross a chamber, s. */
const acrossAtriaS = 0.04;
const acrossVentriclesS = { conducted: 0.06, slow: 0.1 } as const;
/** Where an impulse dies in the junction, and how long it takes there, s. */
const deaths = {
  inNode: { level: 1.5, afterS: 0.05 },
  belowNode: { level: 1.88, afterS: 0.11 },
} as const;
/** A junctional focus lies here, and fires this long before the ventricles begin. */
const junctionalLevel = 1.6;
const junctionalLeadS = 0.03;
const ventricularFocusLevel = 2.5;
/** Two impulses stop short of each other by this much. */
const collisionGap = 0.14;

type Place = [timeS: number, level: number];

function line([fromS, fromLevel]: Place, [toS, toLevel]: Place): LadderMark {
  return { kind: 'conduction', fromS, fromLevel, toS, toLevel };
}

/** Events by chamber, and who was conducted from whom. */
interface Rhythm {
  atrial: AtrialDepolarization[];
  ventricular: VentricularDepolarization[];
  stimuli: StimulusEvent[];
  /** Ventricular beats by the onset of the P wave that reached them. */
  beatOf: Map<number, VentricularDepolarization>;
  /** Retrograde P waves by the onset of the beat they come from. */
  retrogradeOf: Map<number, AtrialDepolarization>;
}

function sortOut(events: readonly StripEvent[]): Rhythm {
  const rhythm: Rhythm = {
    atrial: [],
    ventricular: [],
    stimuli: [],
    beatOf: new Map(),
    retrogradeOf: new Map(),
  };
  for (const event of events) {
    if (event.type === 'stimulus') rhythm.stimuli.push(event);
    if (event.type !== 'depolarization') continue;
    if (event.chamber === 'atrium') {
      rhythm.atrial.push(event);
      if (event.conductedFromS !== undefined) rhythm.retrogradeOf.set(event.conductedFromS, event);
    } else {
      rhythm.ventricular.push(event);
      if (event.conductedFromS !== undefined) rhythm.beatOf.set(event.conductedFromS, event);
    }
  }
  return rhythm;
}

/** Strokes from outside, with the ventricle's letter where both are paced. */
function stimulusMarks(stimuli: readonly StimulusEvent[]): LadderMark[] {
  const chambers = new Set(stimuli.map((stimulus) => stimulus.chamber));
  const both = chambers.has('rightVentricle') && chambers.has('leftVentricle');
  return stimuli.map(({ timeS, chamber, captured }): LadderMark => {
    if (chamber === 'atrium') return { kind: 'stimulus', timeS, edge: 'atria', captured, label: null };
    const letter = chamber === 'leftVentricle' ? 'L' : 'R';
    const together = stimuli.some(
      (other) =>
        other.timeS === timeS &&
        other.chamber === (chamber === 'leftVentricle' ? 'rightVentricle' : 'leftVentricle'),
    );
    const label = !both ? null : together ? (letter === 'R' ? 'R L' : null) : letter;
    return { kind: 'stimulus', timeS, edge: 'ventricles', captured, label };
  });
}

/** The two impulses end before each other at a place in the junction. */
function collisionMarks(down: Place, up: Place, atS: number): LadderMark[] {
  const level = 1.5;
  return [
    line(down, [atS, level - collisionGap / 2]),
    line(up, [atS, level + collisionGap / 2]),
    { kind: 'collision', timeS: atS, level },
  ];
}

/** From the end of the atria downwards: to the ventricles, to a block, or against a beat from below. */
function junctionMarks(wave: AtrialDepolarization, rhythm: Rhythm): LadderMark[] {
  const entry: Place = [wave.timeS + acrossAtriaS, ladderLevels.nodeIn];
  const beat = rhythm.beatOf.get(wave.timeS);
  const conducted = beat?.sources.find((source) => source.site === 'conducted');
  if (conducted) return [line(entry, [conducted.timeS, ladderLevels.nodeOut])];
  if (wave.blocked === 'collision') {
    const from = rhythm.ventricular.findLast((other) => other.timeS <= wave.timeS);
    const atS = entry[0] + 0.03;
    if (!from) return [];
    return collisionMarks(entry, [from.timeS + acrossVentriclesS.slow, ladderLevels.nodeOut], atS);
  }
  if (wave.blocked) {
    // Of fibrillation waves only those that get through are followed into the junction.
    if (wave.origin === 'fibrillation') return [];
    const { level, afterS } = deaths[wave.blocked];
    const end: Place = [entry[0] + afterS, level];
    return [line(entry, end), { kind: 'block', timeS: end[0], level }];
  }
  const meets = rhythm.ventricular.find((other) => other.timeS > wave.timeS);
  // Still on its way when the strip ends.
  if (!meets) return [line(entry, [entry[0] + 0.04, 1.4])];
  const up: Place = [meets.timeS + acrossVentriclesS.slow, ladderLevels.nodeOut];
  return collisionMarks(entry, up, Math.max(up[0], entry[0]) + 0.02);
}

function atrialMarks(wave: AtrialDepolarization, rhythm: Rhythm): LadderMark[] {
  const { timeS, origin } = wave;
  const { top, nodeIn } = ladderLevels;
  if (origin === 'retrograde') return [line([timeS, nodeIn], [timeS + acrossAtriaS, top])];
  const down = junctionMarks(wave, rhythm);
  if (origin === 'premature') {
    const focus: Place = [timeS, 0.5];
    const end = timeS + acrossAtriaS;
    return [
      { kind: 'intrinsic', timeS, level: 0.5 },
      line(focus, [end, top]),
      line(focus, [end, nodeIn]),
      ...down,
    ];
  }
  const through = line([timeS, top], [timeS + acrossAtriaS, nodeIn]);
  if (origin === 'fibrillation' && down.length === 0) return [line([timeS, top], [timeS + 0.03, 0.75])];
  const own: LadderMark[] = origin === 'paced' ? [] : [{ kind: 'intrinsic', timeS, level: top }];
  const fusion: LadderMark[] = wave.fusion
    ? [{ kind: 'fusion', timeS: timeS + acrossAtriaS / 2, level: 0.5 }]
    : [];
  return [...own, through, ...fusion, ...down];
}

/** Where a source's line in the ventricles begins, and its sign. */
function startOf({ site, timeS }: ActivationSource<VentricularSourceSite>): {
  place: Place;
  signs: LadderMark[];
} {
  const { nodeOut, bottom } = ladderLevels;
  switch (site) {
    case 'conducted':
      return { place: [timeS, nodeOut], signs: [] };
    case 'junctionalEscape': {
      const focus: Place = [timeS - junctionalLeadS, junctionalLevel];
      return {
        place: [timeS, nodeOut],
        signs: [{ kind: 'escape', timeS: focus[0], level: focus[1] }, line(focus, [timeS, nodeOut])],
      };
    }
    case 'ventricularEscape':
      return {
        place: [timeS, ventricularFocusLevel],
        signs: [{ kind: 'escape', timeS, level: ventricularFocusLevel }],
      };
    case 'premature':
      return {
        place: [timeS, ventricularFocusLevel],
        signs: [{ kind: 'intrinsic', timeS, level: ventricularFocusLevel }],
      };
    default:
      return { place: [timeS, bottom], signs: [] };
  }
}

/** How a source spreads when it has the ventricles to itself. */
function spread([timeS, level]: Place, upS: number): LadderMark[] {
  const { nodeOut, bottom } = ladderLevels;
  if (level === nodeOut) return [line([timeS, level], [timeS + acrossVentriclesS.conducted, bottom])];
  const up = line([timeS, level], [upS, nodeOut]);
  if (level === bottom) return [up];
  return [up, line([timeS, level], [timeS + acrossVentriclesS.slow / 2, bottom])];
}

function ventricularMarks(beat: VentricularDepolarization, rhythm: Rhythm): LadderMark[] {
  const { nodeIn, nodeOut } = ladderLevels;
  const starts = beat.sources.map(startOf);
  const signs = starts.flatMap((start) => start.signs);
  const retrograde = rhythm.retrogradeOf.get(beat.timeS);
  const slowUpS = beat.timeS + acrossVentriclesS.slow;
  const upS = retrograde ? Math.min(slowUpS, beat.timeS + 0.4 * (retrograde.timeS - beat.timeS)) : slowUpS;
  const up: LadderMark[] = [];
  if (retrograde) {
    const junctional = beat.origin === 'junctionalEscape';
    const from: Place = junctional ? [beat.timeS - junctionalLeadS, junctionalLevel] : [upS, nodeOut];
    up.push(line(from, [retrograde.timeS, nodeIn]));
  }
  if (beat.fusion && starts.length > 1) {
    const meet: Place = [Math.max(...starts.map((start) => start.place[0])) + 0.04, ventricularFocusLevel];
    return [
      ...signs,
      ...starts.map((start) => line(start.place, meet)),
      { kind: 'fusion', timeS: meet[0], level: meet[1] },
      ...up,
    ];
  }
  const lines = starts.flatMap(({ place }) => spread(place, upS + (place[0] - beat.timeS)));
  return [...signs, ...lines, ...up];
}

/** The ladder of a strip's events, every mark at its time from the start of the strip. */
export function ladderOf(events: readonly StripEvent[]): LadderMark[] {
  const rhythm = sortOut(events);
  return [
    ...rhythm.atrial.flatMap((wave) => atrialMarks(wave, rhythm)),
    ...rhythm.ventricular.flatMap((beat) => ventricularMarks(beat, rhythm)),
    ...stimulusMarks(rhythm.stimuli),
  ];
}
