import type { StimulusChamber, StripEvent, VentricularDepolarization } from '../events';
import { readBeat, type BeatReading } from './beat-reading';
import { atrialPartners, findBeats, type BeatOrigin, type RawBeat } from './beats';
import { injuryCriteria, wideQrsMs, type Criterion } from './criteria';
import { captureByChamber, pacedChambers } from './capture';
import type { ComplexMeasures } from './complex';
import { consistentModes } from './consistent-modes';
import { findingsOf } from './findings/findings';
import { onsetsS, rateBpm } from './intervals';
import { qrsTRelations } from './qrs-t-relation';
import type { Reading, ReadingFigures } from './reading';
import { sensingByChamber } from './sensing';
import { underlyingRhythm } from './underlying-rhythm';
import { mean, meanAngleDeg, median, rounded } from './statistics';

type Depolarized = Exclude<BeatOrigin, 'none'>;

/** The commonest origin; a tie goes to pacing, then to the order in which they appear. */
function dominantOrigin(beats: readonly BeatReading[]): Depolarized | null {
  const counts = new Map<Depolarized, number>();
  for (const { origin } of beats) {
    if (origin !== 'none') counts.set(origin, (counts.get(origin) ?? 0) + 1);
  }
  const ranked = [...counts].sort(
    (a, b) => b[1] - a[1] || Number(b[0] === 'paced') - Number(a[0] === 'paced'),
  );
  return ranked[0]?.[0] ?? null;
}

function pacedShare(events: readonly StripEvent[], chambers: readonly StimulusChamber[]): number {
  if (chambers.length === 0) return 0;
  const chamber = chambers.some((one) => one !== 'atrium') ? 'ventricle' : 'atrium';
  const depolarizations = events.filter(
    (event) => event.type === 'depolarization' && event.chamber === chamber,
  );
  if (depolarizations.length === 0) return 0;
  const paced = depolarizations.filter(
    (event) =>
      event.type === 'depolarization' &&
      event.sources.some((source) => (chambers as readonly string[]).includes(source.site)),
  );
  return (100 * paced.length) / depolarizations.length;
}

function readBeats(events: readonly StripEvent[], raw: readonly RawBeat[]): BeatReading[] {
  const partners = atrialPartners(events, raw);
  let previousOnsetS: number | null = null;
  return raw.map((beat, i) => {
    const reading = readBeat(beat, partners[i], i + 1, previousOnsetS);
    if (beat.depolarization) previousOnsetS = beat.depolarization.timeS;
    return reading;
  });
}

/** Injury criteria over the beats that have a complex; fused ones are neither paced nor native, and are left out. */
function criteriaOf(raw: readonly RawBeat[], beats: readonly BeatReading[]): Criterion[] | null {
  const judged = raw.flatMap(({ complex }, i) => {
    const { number, fusion, qrsDurationMs } = beats[i];
    return complex && !fusion ? [{ number, wide: (qrsDurationMs ?? 0) >= wideQrsMs, complex }] : [];
  });
  return judged.length > 0 ? injuryCriteria(judged) : null;
}

/**
 * Reads a strip.
 *
 * @param events of the strip, in time order, times from its start
 * @param complexOf measured complex of a ventricular depolarization among them
 */
export function readStrip(
  events: readonly StripEvent[],
  complexOf: (event: VentricularDepolarization) => ComplexMeasures | null,
): Reading {
  const raw = findBeats(events, complexOf);
  const beats = readBeats(events, raw);
  const chambers = pacedChambers(events);
  const dominant = dominantOrigin(beats);
  const typical = beats.filter((beat) => beat.origin === dominant && !beat.fusion);
  const spoken = typical.length > 0 ? typical : beats.filter((beat) => beat.origin === dominant);
  const middle = (pick: (beat: BeatReading) => number | null, of = spoken): number | null =>
    rounded(median(of.flatMap((beat) => pick(beat) ?? [])), 1);
  const example = dominant === null ? undefined : raw[spoken[0].number - 1];
  const figures: ReadingFigures = {
    pacedChambers: chambers,
    capture: captureByChamber(events),
    sensing: sensingByChamber(events),
    atrialRateBpm: rounded(rateBpm(onsetsS(events, 'atrium')), 1),
    ventricularRateBpm: rounded(rateBpm(onsetsS(events, 'ventricle')), 1),
    pacedSharePercent: rounded(pacedShare(events, chambers), 1),
    prIntervalMs: middle((beat) => beat.prIntervalMs, beats),
    avIntervalMs: middle((beat) => beat.avIntervalMs, beats),
    dominantOrigin: dominant,
    qrsDurationMs: middle((beat) => beat.qrsDurationMs),
    stimulusToQrsEndMs: middle((beat) => beat.stimulusToQrsEndMs),
    qtMs: middle((beat) => beat.qtMs),
    qtcMs: middle((beat) => beat.qtcMs),
    interventricularIntervalMs: rounded(
      mean(beats.flatMap((beat) => beat.interventricularIntervalMs ?? [])),
      1,
    ),
    frontalAxisDeg: rounded(meanAngleDeg(spoken.flatMap((beat) => beat.frontalAxisDeg ?? [])), 1),
    qrsTRelation: example?.complex ? qrsTRelations(example.complex) : null,
    underlyingRhythm: underlyingRhythm(events, beats),
    consistentModes: consistentModes(events, beats),
    criteria: criteriaOf(raw, beats),
    beats,
  };
  return { ...figures, findings: findingsOf(events, figures) };
}
