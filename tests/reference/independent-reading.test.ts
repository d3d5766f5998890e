import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { DepolarizationEvent, VentricularDepolarization } from '../../shared/engine/events';
import type { BeatReading } from '../../shared/engine/reading/beat-reading';
import type { ComplexMeasures } from '../../shared/engine/reading/complex';
import { createStripStream, renderStrip, stripLength, type StripRecording } from '../../shared/engine/render';
import { gallery, presetParameters } from '../../shared/gallery/gallery';
import type { StripParameters, StripParametersInput } from '../../shared/parameters/strip-parameters';
import { arbitraryRhythm } from '../support/arbitrary-strips';
import {
  findQrs,
  findSpikes,
  likeness,
  netDeflection,
  shapesOf,
  type FoundQrs,
  type FoundSpike,
} from '../support/independent-reader';
import { buildStrip } from '../support/strips';

// The reading against a reader of traces that knows only samples (tests/support/independent-reader.ts).

/** Beats this near the ends of a strip are half outside it, s. */
const edgeS = { from: 0.25, to: 0.45 };
/** A paced QRS begins this soon after its spike, or, from the His bundle alone, after its isoelectric moment, ms. */
const answersMs = { atOnce: [-4, 24], afterGap: [30, 52] } as const;
/** A QRS that starts in muscle is at least this wide, ms. */
const leastPacedMs = 90;
/** Two complexes are of one shape from this correlation on. */
const sameShape = 0.93;
/** Under a T wave that has not ended no polarity is judged: RR of at least, ms. */
const clearRrMs = 450;
/** Deflections smaller than this have no polarity worth comparing, mV. */
const leastNetMv = 0.15;
/** Nor have complexes that go as far up as down: the net is at least this share of the span. */
const leastNetShare = 0.25;
/** P waves, f waves and artefacts this near a QRS blur its limits, s. */
const nearS = 0.04;
const chambers = ['rightVentricle', 'leftVentricle', 'chest'];

interface Tally {
  beats: number;
  disagreements: string[];
  durations: number[];
}

interface Seen {
  spikes: FoundSpike[];
  complexes: FoundQrs[];
  /** Which of them look like beats that no ventricular spike leads. */
  looksOwn: boolean[];
}

function see(trace: StripRecording): Seen {
  const spikes = findSpikes(trace);
  const complexes = findQrs(trace, spikes);
  const shapes = shapesOf(trace, complexes, spikes);
  const stimulated = complexes.map(({ onsetS }) =>
    spikes.some(
      ({ chamber, timeS }) => chamber !== 'atrium' && onsetS - timeS > -0.03 && onsetS - timeS < 0.06,
    ),
  );
  // Of a complex at the very start nobody knows what led it.
  const own = shapes.filter((_, i) => !stimulated[i] && complexes[i].onsetS > 0.1);
  const looksOwn = shapes.map((shape) => own.some((one) => likeness(one, shape) > sameShape));
  return { spikes, complexes, looksOwn };
}

/** What the reader would say of ventricular stimuli: captured, not, or no verdict inside a QRS. */
function verdict(times: readonly number[], { complexes, looksOwn }: Seen, hisLead: boolean): boolean | null {
  const [first] = times;
  if (complexes.some((qrs) => qrs.onsetS < first - 0.004 && qrs.offsetS > first)) return null;
  return times.some((timeS) =>
    complexes.some(({ onsetS, offsetS }, i) => {
      const afterMs = 1000 * (onsetS - timeS);
      const atOnce = afterMs >= answersMs.atOnce[0] && afterMs <= answersMs.atOnce[1];
      // Only a lead at the His bundle answers after a gap; where the lead lies, a reader knows.
      const afterGap = afterMs >= answersMs.afterGap[0] && afterMs <= answersMs.afterGap[1];
      if (hisLead) return atOnce || afterGap;
      // Narrow, or of the shape of beats that no spike leads: it came through the bundles, not from the lead.
      return atOnce && 1000 * (offsetS - onsetS) >= leastPacedMs && !looksOwn[i];
    }),
  );
}

function chambersAgree(beat: BeatReading, { spikes }: Seen): boolean {
  return beat.stimuli.every((chamber, i) => {
    // Two stimuli within 7 ms are one spike, which cannot belong to both.
    const timeS = beat.stimulusTimesS[i];
    const together = beat.stimulusTimesS.filter((other) => Math.abs(other - timeS) < 0.007).length > 1;
    const near = spikes.filter((spike) => Math.abs(spike.timeS - timeS) < (together ? 0.008 : 0.002));
    return near.some((spike) => (together ? chambers.includes(spike.chamber) : spike.chamber === chamber));
  });
}

function polarityAgrees(
  trace: StripRecording,
  qrs: FoundQrs,
  complex: ComplexMeasures,
  spikes: FoundSpike[],
): boolean {
  return (['II', 'V1'] as const).every((lead) => {
    const { netMv, spanMv } = netDeflection(trace, lead, qrs, spikes);
    const told = complex.leads[lead].netMv;
    const least = Math.max(leastNetMv, leastNetShare * spanMv);
    if (Math.abs(netMv) < least || Math.abs(told) < least) return true;
    return Math.sign(netMv) === Math.sign(told);
  });
}

/** Whether something else than the QRS lies near its limits. */
function isBlurred(
  strip: StripParameters,
  trace: StripRecording,
  event: VentricularDepolarization,
  endS: number,
): boolean {
  if (event.fusion || strip.pacing.source === 'transcutaneous') return true;
  if (strip.patient.atrialRhythm === 'fibrillation' || strip.patient.atrialRhythm === 'flutter') return true;
  const pS = strip.waveform.pDurationMs / 1000;
  const from = event.timeS - nearS;
  const to = endS + nearS;
  return trace.events.some((other) => {
    if (other.type === 'stimulus') {
      const own = event.sources.some((source) => source.timeS === other.timeS);
      return !own && other.timeS > from - 0.02 && other.timeS < to;
    }
    if (other.type !== 'depolarization') return false;
    if (other.chamber === 'atrium') return other.timeS < to && other.timeS + pS > from;
    // T of the beat before, or the next QRS.
    const apartS = Math.abs(other.timeS - event.timeS);
    return apartS > 0 && apartS < 0.68;
  });
}

/**
 * Width of a QRS against the reading. A paced one is measured from its spike, as published paced widths are: its first
 * muscle is slow, and where it begins on the trace is a matter of taste.
 */
function widthDifferenceMs(beat: BeatReading, qrs: FoundQrs, { spikes }: Seen): number {
  const spike = spikes.find(
    ({ chamber, timeS }) => chamber !== 'atrium' && qrs.peakS > timeS && qrs.peakS - timeS < 0.2,
  );
  if (beat.captured && beat.stimulusToQrsEndMs !== null && spike) {
    return 1000 * (qrs.offsetS - spike.timeS) - beat.stimulusToQrsEndMs;
  }
  return 1000 * (qrs.offsetS - qrs.onsetS) - (beat.qrsDurationMs ?? 0);
}

function compare(input: StripParameters, name: string, tally: Tally): void {
  const strip: StripParameters = {
    ...input,
    recorder: { ...input.recorder, bandwidth: 'unfiltered', sampleRateHz: 2000, mainsNotchHz: 0 },
  };
  const trace = renderStrip(strip);
  const diagnostic = renderStrip({
    ...strip,
    recorder: { ...strip.recorder, bandwidth: 'diagnostic', sampleRateHz: 500 },
  });
  const stream = createStripStream(strip);
  const { events, complexes } = stream.next(stripLength(strip));
  const seen = see(trace);
  const taken = new Set<FoundQrs>();
  const wrong = (beat: BeatReading, what: string): void =>
    void tally.disagreements.push(
      `${name} beat ${beat.number} at ${beat.timeS.toFixed(3)} s (${beat.origin}): ${what}`,
    );

  for (const beat of trace.reading.beats) {
    const qrs = seen.complexes.find(
      (one) => !taken.has(one) && one.peakS > beat.timeS - 0.01 && one.peakS < beat.timeS + 0.25,
    );
    if (beat.origin !== 'none' && qrs) taken.add(qrs);
    if (beat.timeS < edgeS.from || beat.timeS > strip.durationS - edgeS.to) continue;
    tally.beats += 1;
    if (beat.origin !== 'none' && !qrs) {
      wrong(beat, 'no QRS is seen');
      continue;
    }
    if (!chambersAgree(beat, seen)) wrong(beat, `spikes are not those of ${beat.stimuli.join(', ')}`);
    const judged =
      beat.stimuli.length === 0 || beat.fusion
        ? null
        : verdict(beat.stimulusTimesS, seen, strip.pacing.rightVentricularLead.site === 'his');
    const told = beat.captured;
    if (judged !== null && told !== null && judged !== told && !beat.pseudofusion) {
      wrong(beat, judged ? 'looks captured' : 'looks not captured');
    }
    const event = events.find(
      (one): one is DepolarizationEvent & VentricularDepolarization =>
        one.type === 'depolarization' && one.chamber === 'ventricle' && one.timeS === beat.timeS,
    );
    const complex = event && complexes.get(event);
    if (!event || !complex || !qrs) continue;
    const clear = beat.rrMs === null || beat.rrMs >= clearRrMs;
    if (clear && !polarityAgrees(diagnostic, qrs, complex, seen.spikes))
      wrong(beat, 'polarity in II or V1 differs');
    const endS = event.timeS + complex.qrsOffsetMs / 1000;
    if (isBlurred(strip, trace, event, endS)) continue;
    tally.durations.push(widthDifferenceMs(beat, qrs, seen));
  }
  for (const qrs of seen.complexes) {
    if (taken.has(qrs) || qrs.onsetS < edgeS.from || qrs.onsetS > strip.durationS - edgeS.to) continue;
    tally.beats += 1;
    tally.disagreements.push(
      `${name}: a QRS is seen at ${qrs.onsetS.toFixed(3)} s that the reading does not have`,
    );
  }
}

function expectAgreement({ beats, disagreements, durations }: Tally): void {
  const share = 1 - disagreements.length / beats;
  expect(share, disagreements.slice(0, 40).join('\n')).toBeGreaterThanOrEqual(0.99);
  const far = durations.filter((difference) => Math.abs(difference) > 10);
  expect(far.length / durations.length, far.map((one) => one.toFixed(0)).join(' ')).toBeLessThanOrEqual(0.01);
  console.info(
    `independent reader: ${beats} beats, ${disagreements.length} disagree (${(100 * share).toFixed(2)} %); QRS duration of ${durations.length}, ${far.length} beyond 10 ms`,
  );
}

const quiet = ({ disturbance }: StripParameters): boolean =>
  disturbance.electrodeReversal === 'none' &&
  disturbance.muscleMv + disturbance.mainsMv + disturbance.baselineWanderMv + disturbance.motionPerMinute ===
    0;

describe('the reading agrees with a reader of traces', () => {
  it('over the whole gallery', () => {
    const tally: Tally = { beats: 0, disagreements: [], durations: [] };
    const strips = gallery.filter((preset) => quiet(presetParameters(preset)));
    expect(strips.length).toBeGreaterThan(75);
    for (const preset of strips) compare(presetParameters(preset), preset.id, tally);
    expect(tally.beats).toBeGreaterThan(800);
    expect(tally.durations.length).toBeGreaterThan(300);
    expectAgreement(tally);
  });

  it('over 200 random strips', { timeout: 120_000 }, () => {
    const tally: Tally = { beats: 0, disagreements: [], durations: [] };
    const volts = fc.double({ min: 2.5, max: 5, noNaN: true });
    const random = fc
      .tuple(arbitraryRhythm, volts, volts, volts)
      .map(([strip, a, r, l]): StripParametersInput => {
        const lead = (given: object | undefined, amplitudeV: number) => ({
          ...given,
          polarity: 'bipolar' as const,
          amplitudeV,
          pulseWidthMs: 0.5,
        });
        return {
          ...strip,
          durationS: 10,
          patient: { ...strip.patient, injury: { territory: 'none' } },
          pacing: {
            ...strip.pacing,
            atrialLead: lead(strip.pacing?.atrialLead, a),
            rightVentricularLead: lead(strip.pacing?.rightVentricularLead, r),
            leftVentricularLead: lead(strip.pacing?.leftVentricularLead, l),
            transvenous: { ...strip.pacing?.transvenous, outputMa: 4 },
            transcutaneous: { ...strip.pacing?.transcutaneous, artefactMv: 3, pulseWidthMs: 20 },
          },
        };
      });
    const strips = fc.sample(random, { numRuns: 200, seed: 2026 });
    strips.forEach((input, i) => compare(buildStrip(input), `random ${i}`, tally));
    expect(tally.beats).toBeGreaterThan(1500);
    expectAgreement(tally);
  });
});
