import { quantise } from '../engine/recorder/quantiser';
import type { LeadName } from '../parameters/sheet';
import type { StripParameters } from '../parameters/strip-parameters';
import { measureBeats, type MeasuredBeat } from './beat-measures';
import type { BenchSetting } from './bench-setting';
import { recordSignal } from './record-signal';
import { spectrumOf, type Spectrum } from './spectrum';
import { stripOnBench, type BenchTrace, type StripOnBench } from './strip-traces';
import { testSignals, type TestSignalId } from './test-signals';

/** Longest stretch of a strip that stands on the bench, s. */
export const longestOnBenchS = 30;

/** What stands on the bench, through every setting. */
export interface BenchResult {
  durationS: number;
  traces: BenchTrace[];
  spectra: Spectrum[];
  beats: MeasuredBeat[];
  /** null for a test signal. */
  strip: StripOnBench | null;
}

/** A strip, or its first half minute. */
export function benchStrip(
  parameters: StripParameters,
  settings: readonly BenchSetting[],
  lead: LeadName,
): BenchResult {
  const durationS = Math.min(longestOnBenchS, parameters.durationS);
  const strip = stripOnBench({ ...parameters, durationS }, settings, lead);
  return {
    durationS,
    traces: strip.traces,
    spectra: strip.traces.map(({ exactMv, sampleRateHz }) => spectrumOf(exactMv, sampleRateHz)),
    beats: measureBeats(strip),
    strip,
  };
}

/** A standard test signal, recorded from rest. */
export function benchSignal(id: TestSignalId, settings: readonly BenchSetting[]): BenchResult {
  const { signal, durationS } = testSignals[id];
  const traces = settings.map((setting): BenchTrace => {
    const { sampleRateHz, resolutionUv } = setting.recorder;
    const exactMv = recordSignal(setting, signal, -1, durationS).slice();
    return { sampleRateHz, exactMv, samplesMv: exactMv.map((value) => quantise(value, resolutionUv)) };
  });
  return {
    durationS,
    traces,
    spectra: traces.map(({ exactMv, sampleRateHz }) => spectrumOf(exactMv, sampleRateHz)),
    beats: [],
    strip: null,
  };
}

/**
 * A trace less another one, mV, at the other's samples; where the rates differ the first is read between its samples
 * along straight lines.
 */
export function difference(trace: BenchTrace, from: BenchTrace): Float64Array {
  const ratio = trace.sampleRateHz / from.sampleRateHz;
  return from.exactMv.map((value, k) => {
    const at = Math.min(k * ratio, trace.exactMv.length - 1);
    const before = Math.floor(at);
    const after = Math.min(before + 1, trace.exactMv.length - 1);
    const share = at - before;
    return (1 - share) * trace.exactMv[before] + share * trace.exactMv[after] - value;
  });
}
