import { msPerS } from '../../units';

/**
 * Finds stimuli in the wide-band signal, before the band-limit, by how fast it changes. It knows samples only, not
 * what was given: it can miss a stimulus and take something else for one.
 */
export interface StimulusDetector {
  /**
   * Takes the next `length` samples of every channel, mV.
   *
   * @returns times of the stimuli found, s on the clock that the detector was given, in order; how the input is cut
   * changes none of them
   */
  process(channels: readonly Float64Array[], length: number): number[];
}

/**
 * Change over this long is judged, s: a sample at 8 kHz. The steepest QRS of the gallery changes by 0.02 mV in it, a
 * stimulus of 0.1 mV by up to 0.1 mV.
 */
const stepS = 1 / 8000;
/**
 * Least change over `stepS` that counts, mV, over all channels together (root of the sum of squares); 0.12 mV are
 * 1 V/s. Detectors of monitors disclose 2.5 to 20 V/s in one lead (PP-10), and miss small bipolar spikes by it.
 */
export const leastChangeMv = 0.12;
/** A change must also be this many times the usual one, so that muscle noise is not taken for stimuli. */
const aboveUsual = 5;
/** The usual change is followed with this time constant, s, … */
const usualTimeConstantS = 0.25;
/** … and one sample may count in it for no more than this many times its size: a stimulus is not the usual. */
const usualMost = 3;
/**
 * The other edge of the same pulse comes within this time, s: chest pulses last up to 40 ms (PP-43), and its tail
 * follows them.
 */
const otherEdgeS = 0.0425;
/** An edge falls between two samples and its halves belong together within this time, s. */
const sameEdgeS = 0.0004;
/** What follows the end of a pulse so soon is still its edge, s. */
const blindS = 0.0006;
/** A pulse is over when less than this share of its first edge is left. */
const leftShare = 0.5;
/** Edges of one pulse lie on one line through the body, within 25°. */
const sameLine = Math.cos((25 * Math.PI) / 180);

/** A pulse that has begun and not ended. */
interface OpenPulse {
  timeS: number;
  /** Its first edge, and what of it has not been taken back, mV. */
  edge: Float64Array;
  left: Float64Array;
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i];
  return sum;
}

function add(to: Float64Array, change: Float64Array): void {
  for (let i = 0; i < to.length; i++) to[i] += change[i];
}

/** Cosine of the angle between two changes. */
function along(a: Float64Array, b: Float64Array): number {
  return dot(a, b) / Math.sqrt(dot(a, a) * dot(b, b));
}

/**
 * @param rateHz a multiple of 8000
 * @param firstTimeS time of the first sample
 */
export function createStimulusDetector(
  channelCount: number,
  rateHz: number,
  firstTimeS: number,
): StimulusDetector {
  const step = Math.max(1, Math.round(rateHz * stepS));
  const history = Array.from({ length: channelCount }, () => new Float64Array(step));
  const follow = 1 / (usualTimeConstantS * rateHz);
  const change = new Float64Array(channelCount);
  let taken = 0;
  let usual = 0;
  let open: OpenPulse | null = null;
  let blindUntilS = -Infinity;

  /** Whether a change belongs to the pulse that is open; ends the pulse when little is left of it. */
  const belongs = (pulse: OpenPulse, timeS: number): boolean => {
    if (timeS - pulse.timeS > otherEdgeS) return false;
    const cosine = along(pulse.edge, change);
    if (cosine > 0 && timeS - pulse.timeS <= sameEdgeS) {
      add(pulse.edge, change);
      add(pulse.left, change);
      return true;
    }
    if (cosine > -sameLine) return false;
    add(pulse.left, change);
    if (dot(pulse.left, pulse.edge) < leftShare * dot(pulse.edge, pulse.edge)) {
      open = null;
      blindUntilS = timeS + blindS;
    }
    return true;
  };
  const judge = (timeS: number, size: number): number | null => {
    if (size < Math.max(leastChangeMv, aboveUsual * usual) || timeS < blindUntilS) return null;
    if (open && belongs(open, timeS)) return null;
    open = { timeS, edge: change.slice(), left: change.slice() };
    return timeS;
  };

  return {
    process(channels, length) {
      const found: number[] = [];
      for (let i = 0; i < length; i++, taken++) {
        const slot = taken % step;
        let sum = 0;
        for (let c = 0; c < channelCount; c++) {
          const value = channels[c][i];
          const difference = taken < step ? 0 : value - history[c][slot];
          history[c][slot] = value;
          change[c] = difference;
          sum += difference * difference;
        }
        const size = Math.sqrt(sum);
        const timeS = judge(firstTimeS + (taken - step / 2) / rateHz, size);
        if (timeS !== null) found.push(timeS);
        usual +=
          follow * (Math.min(size, usualMost * Math.max(usual, leastChangeMv / usualMost / 4)) - usual);
      }
      return found;
    },
  };
}

/** How far a marker may lie from its stimulus and still be its own, ms. */
export const markerToleranceMs = 2;

export interface MarkerFigures {
  /** Stimuli that were given. */
  given: number;
  /** Those of them that have a marker of their own. */
  hits: number;
  /** Markers without a stimulus. */
  falseMarkers: number;
}

/** Compares markers with the stimuli that truly were; both in order, s. A marker belongs to one stimulus at most. */
export function compareMarkers(foundS: readonly number[], givenS: readonly number[]): MarkerFigures {
  const free = [...foundS];
  let hits = 0;
  for (const timeS of givenS) {
    const at = free.findIndex((one) => Math.abs(one - timeS) * msPerS <= markerToleranceMs);
    if (at === -1) continue;
    free.splice(at, 1);
    hits++;
  }
  return { given: givenS.length, hits, falseMarkers: foundS.length - hits };
}
