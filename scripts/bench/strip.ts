import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { createStripStream, renderStrip, stripLength } from '../../shared/engine/render';
import { designRecorder } from '../../shared/engine/recorder/recorder-design';
import { measuredLeads } from '../../shared/engine/leads';
import { parseStripParameters } from '../../shared/parameters/parse';
import { median, timeMs } from './timing';

const python = '/usr/bin/python3';
const repeats = 31;

/** A 10 s, twelve-lead, diagnostic strip with both chambers paced. */
const strip = parseStripParameters({
  durationS: 10,
  patient: { avConduction: 'complete', atrialRateBpm: 50 },
  pacing: { source: 'implanted', mode: 'DDD' },
});

export interface StripFigures {
  /** Parameters to quantised samples and reading, pre-roll left out (see `preRollMs`). */
  medianMs: number;
  /** SciPy's sosfilt with the same sections on 10 s of eight leads at the internal rate; null without SciPy. */
  scipyMedianMs: number | null;
  /** medianMs / scipyMedianMs. */
  ratio: number | null;
  /** What the 30 s pre-roll costs on top, per strip. */
  preRollMs: number;
}

/** Ten seconds of eight internal-rate leads, as SciPy gets them. */
function internalSamples(): Float64Array {
  const design = designRecorder(strip.recorder);
  const length = strip.durationS * design.internalRateHz;
  const samples = new Float64Array(measuredLeads.length * length);
  const unfiltered = {
    ...strip,
    recorder: { ...strip.recorder, bandwidth: 'unfiltered', sampleRateHz: 2000 } as const,
  };
  const { measured } = createStripStream(unfiltered).next(stripLength(unfiltered));
  measuredLeads.forEach((lead, channel) => {
    for (let i = 0; i < length; i++) {
      samples[channel * length + i] = measured[lead][Math.floor((i * measured[lead].length) / length)];
    }
  });
  return samples;
}

function scipyMedianMs(): number | null {
  if (spawnSync(python, ['-W', 'ignore', '-c', 'import scipy.signal']).status !== 0) return null;
  const folder = mkdtempSync(join(tmpdir(), 'paceloom-bench-'));
  try {
    const file = join(folder, 'samples.f64');
    writeFileSync(file, Buffer.from(internalSamples().buffer));
    const sections = designRecorder(strip.recorder).sections.map(({ a, b }) => [...b, 1, ...a]);
    const program = fileURLToPath(new URL('scipy_band_limit.py', import.meta.url));
    const args = [program, file, String(measuredLeads.length), JSON.stringify(sections), String(repeats)];
    return (JSON.parse(execFileSync(python, args, { encoding: 'utf8' })) as { medianMs: number }).medianMs;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** One 10 s strip beside SciPy, in the same run; both without pre-roll, warm, medians of 31. */
export function measureStrip(): StripFigures {
  for (let i = 0; i < 30; i++) renderStrip(strip);
  const whole: number[] = [];
  const preRoll: number[] = [];
  for (let i = 0; i < repeats; i++) {
    whole.push(timeMs(() => renderStrip(strip)));
    preRoll.push(timeMs(() => createStripStream(strip)));
  }
  const preRollMs = median(preRoll);
  const medianMs = median(whole) - preRollMs;
  const scipy = scipyMedianMs();
  return { medianMs, scipyMedianMs: scipy, ratio: scipy === null ? null : medianMs / scipy, preRollMs };
}

/** A difficult dual-chamber patient: fusion, ectopy, retrograde conduction, capture and sensing that come and go. */
const difficult = parseStripParameters({
  durationS: 3600,
  patient: {
    avConduction: 'wenckebach',
    atrialRateBpm: 84,
    rateVariabilityPercent: 8,
    retrogradeConductionMs: 260,
    prematureVentricularPerMinute: 8,
    prematureAtrialPerMinute: 6,
  },
  pacing: {
    source: 'implanted',
    mode: 'DDDOV',
    interventricularDelayMs: 40,
    pvarpMs: 240,
    faults: [
      { kind: 'failureToCapture', chamber: 'rightVentricle', proportion: 0.2 },
      { kind: 'undersensing', chamber: 'atrium', proportion: 0.2 },
      { kind: 'oversensing', chamber: 'rightVentricle', proportion: 0.1, intervalMs: 700 },
    ],
  },
  disturbance: { baselineWanderMv: 0.2, muscleMv: 0.02, mainsMv: 0.02, motionPerMinute: 2 },
});

export interface HourFigures {
  timesRealTime: number;
  /** Largest resident memory while it streams, MB: over the first quarter of an hour, and over the last. */
  peakFirstQuarterMb: number;
  peakLastQuarterMb: number;
}

/** One hour of the difficult patient, twelve leads, diagnostic, in chunks of a second, with events. */
export function measureHour(): HourFigures {
  const hourS = difficult.durationS;
  const stream = createStripStream(difficult);
  const peaks = { first: 0, last: 0 };
  const spentMs = timeMs(() => {
    for (let second = 0; second < hourS; second++) {
      stream.next(stream.sampleRateHz);
      if (second % 10 !== 0) continue;
      const { rss } = process.memoryUsage();
      if (second < hourS / 4) peaks.first = Math.max(peaks.first, rss);
      if (second >= (3 * hourS) / 4) peaks.last = Math.max(peaks.last, rss);
    }
  });
  return {
    timesRealTime: (1000 * hourS) / spentMs,
    peakFirstQuarterMb: peaks.first / 2 ** 20,
    peakLastQuarterMb: peaks.last / 2 ** 20,
  };
}
