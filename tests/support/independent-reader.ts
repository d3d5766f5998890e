import { measuredLeads } from '../../shared/engine/leads';
import type { LeadName } from '../../shared/parameters/sheet';

/**
 * A reader of traces that knows nothing of events, of the heart model or of the engine's own measures: it gets samples
 * and gives back spikes, QRS complexes and what follows what.
 *
 * Method. Spikes: a step in the unfiltered leads that is undone within a few milliseconds. QRS: the absolute spatial
 * velocity, that is the root of the summed squared slopes of all measured leads (Sörnmo 1987, IEEE Trans Biomed Eng
 * 34:595, from memory), smoothed over 8 ms; a complex is where it passes a threshold, its limits are where it last was
 * below a share of its own peak (shares chosen).
 */
export interface Trace {
  sampleRateHz: number;
  leads: Readonly<Record<LeadName, Float32Array>>;
}

export interface FoundSpike {
  timeS: number;
  /** Which chamber, by the direction in I and II; chest by its width. */
  chamber: 'atrium' | 'rightVentricle' | 'leftVentricle' | 'chest';
}

export interface FoundQrs {
  onsetS: number;
  offsetS: number;
  peakS: number;
}

/** A step of at least this between samples in some lead may be the edge of a spike, mV … */
const edgeMv = 0.09;
/** … if it is undone within this, ms. */
const spikeMs = 2.6;
/** Chest pulses last at least this and at most that, ms. */
const chestMs = [4, 45] as const;
/** Velocity that only a QRS reaches, mV/ms over the eight leads, and the share of its peak that bounds it. */
const qrsVelocity = 0.055;
const boundShare = 0.04;
const boundVelocity = 0.01;
const quietMs = 12;
const pacedQuietMs = 30;
/** A fast stretch begins at most this long after the spike that starts it, ms. */
const pacedReachMs = 70;
/** After a spike nothing but the QRS moves, so that a smaller velocity counts. */
const pacedShare = 0.8;
/** Complexes that begin closer than this are one, ms: no ventricle answers sooner. */
const refractoryMs = 235;

const steps = (trace: Trace, i: number): number[] =>
  measuredLeads.map((lead) => trace.leads[lead][i] - trace.leads[lead][i - 1]);
const largest = (values: readonly number[]): number => Math.max(...values.map(Math.abs));

/** Samples at which some lead jumps. */
function edgesOf(trace: Trace): number[] {
  const edges: number[] = [];
  for (let i = 1; i < trace.leads.I.length; i++) if (largest(steps(trace, i)) >= edgeMv) edges.push(i);
  return edges;
}

/** Change of a lead from just before to the extreme within a few samples. */
function excursion(samples: Float32Array, i: number, reach: number): number {
  let most = 0;
  for (let k = i; k < i + reach && k < samples.length; k++) {
    const change = samples[k] - samples[i - 1];
    if (Math.abs(change) > Math.abs(most)) most = change;
  }
  return most;
}

/** How far a sample near `i` stands off the line between its neighbours 1.5 ms away on either side. */
function kink(samples: Float32Array, i: number, perMs: number): number {
  const arm = Math.round(1.5 * perMs);
  let most = 0;
  for (let k = i; k <= i + 1 && k + arm < samples.length; k++) {
    if (k < arm) continue;
    const off = samples[k] - (samples[k - arm] + samples[k + arm]) / 2;
    if (Math.abs(off) > Math.abs(most)) most = off;
  }
  return most;
}

/** Spikes of the unfiltered trace, in time order, each once. */
export function findSpikes(trace: Trace): FoundSpike[] {
  const perMs = trace.sampleRateHz / 1000;
  const reach = Math.ceil(spikeMs * perMs);
  const spikes: FoundSpike[] = [];
  const edges = edgesOf(trace);
  let blockedUntil = 0;
  for (const i of edges) {
    if (i < blockedUntil) continue;
    const jump = measuredLeads.map((lead) => excursion(trace.leads[lead], i, reach));
    const after = Math.min(trace.leads.I.length - 1, i + reach);
    const left = measuredLeads.map((lead) => trace.leads[lead][after] - trace.leads[lead][i - 1]);
    if (largest(left) < 0.45 * largest(jump)) {
      const [inI, inII] = jump;
      const chamber = inII > 0 ? 'leftVentricle' : inI > 0 ? 'atrium' : 'rightVentricle';
      spikes.push({ timeS: (i - 0.5) / trace.sampleRateHz, chamber });
      blockedUntil = i + reach;
      continue;
    }
    const end = edges.find((k) => {
      const ms = (k - i) / perMs;
      return ms >= chestMs[0] && ms <= chestMs[1] && steps(trace, k)[0] * jump[0] < 0;
    });
    if (end !== undefined) {
      spikes.push({ timeS: (i - 0.5) / trace.sampleRateHz, chamber: 'chest' });
      blockedUntil = end + reach;
      continue;
    }
    // On the steep part of a QRS the jump is not undone, but it is still a kink that no muscle makes.
    const bend = measuredLeads.map((lead) => kink(trace.leads[lead], i, perMs));
    if (largest(bend) < edgeMv) continue;
    const chamber = bend[1] > 0 ? 'leftVentricle' : bend[0] > 0 ? 'atrium' : 'rightVentricle';
    spikes.push({ timeS: (i - 0.5) / trace.sampleRateHz, chamber });
    blockedUntil = i + reach;
  }
  return spikes;
}

/** The trace with every spike bridged by a straight line. */
function withoutSpikes(trace: Trace, spikes: readonly FoundSpike[]): Trace {
  const leads = Object.fromEntries(
    measuredLeads.map((lead) => {
      const samples = Float32Array.from(trace.leads[lead]);
      for (const { timeS, chamber } of spikes) {
        const from = Math.max(0, Math.floor((timeS - 0.001) * trace.sampleRateHz));
        const length = chamber === 'chest' ? 0.042 : 0.004;
        const to = Math.min(samples.length - 1, Math.ceil((timeS + length) * trace.sampleRateHz));
        for (let k = from; k <= to; k++) {
          samples[k] = samples[from] + ((samples[to] - samples[from]) * (k - from)) / (to - from);
        }
      }
      return [lead, samples];
    }),
  );
  return { sampleRateHz: trace.sampleRateHz, leads: leads as Trace['leads'] };
}

/** Spatial velocity at each millisecond, mV/ms: slopes over 8 ms, roots of sums over the leads. */
function spatialVelocity({ leads, sampleRateHz }: Trace): Float64Array {
  const perMs = sampleRateHz / 1000;
  const length = Math.floor(leads.I.length / perMs);
  const velocity = new Float64Array(length);
  for (let ms = 4; ms < length - 4; ms++) {
    let sum = 0;
    for (const lead of measuredLeads) {
      const slope =
        (leads[lead][Math.round((ms + 4) * perMs)] - leads[lead][Math.round((ms - 4) * perMs)]) / 8;
      sum += slope * slope;
    }
    velocity[ms] = Math.sqrt(sum);
  }
  return velocity;
}

/** Last millisecond from a start on, in one direction, before the velocity stays below a bound for a while. */
function lastAbove(
  velocity: Float64Array,
  start: number,
  direction: -1 | 1,
  bound: number,
  quiet: number,
  stop = -Infinity,
): number {
  let last = start;
  for (
    let k = start;
    k >= Math.max(0, stop) && k < velocity.length && Math.abs(k - last) <= quiet;
    k += direction
  ) {
    if (velocity[k] >= bound) last = k;
  }
  return last;
}

/** Stretches of velocity that only a QRS reaches, those of one complex put together. */
function fastStretches(velocity: Float64Array): { from: number; to: number }[] {
  const stretches: { from: number; to: number }[] = [];
  for (let ms = 0; ms < velocity.length; ms++) {
    if (velocity[ms] < qrsVelocity) continue;
    const last = stretches.at(-1);
    if (last && ms - last.from < refractoryMs) last.to = ms;
    else stretches.push({ from: ms, to: ms });
  }
  return stretches;
}

/** QRS complexes of a trace, spikes bridged. */
export function findQrs(trace: Trace, spikes: readonly FoundSpike[]): FoundQrs[] {
  const velocity = spatialVelocity(withoutSpikes(trace, spikes));
  const stretches = fastStretches(velocity);
  return stretches.map(({ from, to }, i): FoundQrs => {
    let peak = from;
    for (let ms = from; ms <= to; ms++) if (velocity[ms] > velocity[peak]) peak = ms;
    const bound = Math.max(boundVelocity, boundShare * velocity[peak]);
    const edge = lastAbove(velocity, from, -1, bound, quietMs);
    // After a stimulus the first slow stretch of muscle may be hardly seen: its start is looked for back to the spike,
    // and not beyond it, where a P wave may run.
    const spike = spikes.find(
      ({ chamber, timeS }) =>
        chamber !== 'atrium' && 1000 * timeS < from && from - 1000 * timeS < pacedReachMs,
    );
    const spikeMs = spike ? 1000 * spike.timeS : -Infinity;
    const slow =
      edge > spikeMs ? lastAbove(velocity, edge, -1, pacedShare * bound, pacedQuietMs, spikeMs) : spikeMs;
    const onset = spike ? slow : edge;
    const next = stretches.at(i + 1)?.from ?? Infinity;
    const offset = Math.min(lastAbove(velocity, to, 1, bound, quietMs), next - quietMs);
    return { onsetS: onset / 1000, offsetS: offset / 1000, peakS: peak / 1000 };
  });
}

/** Leads and time in which shapes are compared: 110 ms from the onset in steps of 2 ms. */
const shapeLeads = ['I', 'II', 'V1', 'V5'] as const;
const shapeS = 0.11;

/** Shape of each complex: slopes of a few leads over 4 ms, which a T wave beneath hardly moves; spikes bridged. */
export function shapesOf(
  trace: Trace,
  complexes: readonly FoundQrs[],
  spikes: readonly FoundSpike[],
): number[][] {
  const bridged = withoutSpikes(trace, spikes);
  const at = (timeS: number): number => Math.round(timeS * trace.sampleRateHz);
  return complexes.map(({ onsetS }) =>
    shapeLeads.flatMap((lead) => {
      const samples = bridged.leads[lead];
      const values: number[] = [];
      for (let t = 0.004; t < shapeS; t += 0.002) {
        values.push((samples[at(onsetS + t + 0.004)] ?? 0) - (samples[at(onsetS + t)] ?? 0));
      }
      return values;
    }),
  );
}

/** Steps of 2 ms by which two onsets may have been found apart. */
const mostLag = 4;

/** Best correlation of two shapes, about zero, when one is moved a little against the other. */
export function likeness(a: readonly number[], b: readonly number[]): number {
  const size = a.length / shapeLeads.length;
  let best = -1;
  for (let lag = -mostLag; lag <= mostLag; lag++) {
    let ab = 0;
    let aa = 0;
    let bb = 0;
    for (let i = 0; i < a.length; i++) {
      const inLead = (i % size) + lag;
      if (inLead < 0 || inLead >= size) continue;
      ab += a[i] * b[i + lag];
      aa += a[i] * a[i];
      bb += b[i + lag] * b[i + lag];
    }
    best = Math.max(best, ab / Math.sqrt(aa * bb));
  }
  return best;
}

/** Net deflection of one lead over a complex, against the line just before it, and its whole span, mV. */
export function netDeflection(
  trace: Trace,
  lead: LeadName,
  qrs: FoundQrs,
  spikes: readonly FoundSpike[],
): { netMv: number; spanMv: number } {
  const bridged = withoutSpikes(trace, spikes);
  const at = (timeS: number): number => Math.round(timeS * trace.sampleRateHz);
  const samples = lead in bridged.leads ? bridged.leads[lead] : trace.leads[lead];
  const zero = samples[Math.max(0, at(qrs.onsetS - 0.012))];
  const values = [...samples.subarray(at(qrs.onsetS), at(qrs.offsetS))].map((value) => value - zero);
  const [r, s] = [Math.max(0, ...values), Math.min(0, ...values)];
  return { netMv: r + s, spanMv: r - s };
}
