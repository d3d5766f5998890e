import {
  designRecorder,
  withoutBandLimit,
  withoutLowCut,
  type RecorderDesign,
} from '../engine/recorder/recorder-design';
import { bandwidthLabel } from '../paper/bandwidth-label';
import type { RecorderParameters } from '../parameters/strip-parameters';
import { filterBothWays } from './zero-phase';

/** What stands on the bench: a recorder, or one of two things that no running recorder can or should do. */
export type BenchSetting =
  | { kind: 'recorder'; recorder: RecorderParameters }
  /**
   * A low-cut that runs forwards and backwards over the finished recording, so that it shifts no phase; offline
   * only. Of `recorder` everything but the low limit acts.
   */
  | { kind: 'zeroPhase'; lowHz: number; recorder: RecorderParameters }
  /** Samples taken without a band-limit before them. Of `recorder` rate, notch and resolution act. */
  | { kind: 'pointSampled'; recorder: RecorderParameters };

/** Lowest and highest limit of the offline low-cut, Hz. */
export const zeroPhaseLimitsHz = { min: 0.05, max: 2 } as const;
/** AHA/ACC/HRS 2007 allows a zero-phase low-cut up to here (BW-02, read in a public text), Hz. */
export const usualZeroPhaseHz = 0.67;

/** The recorder that runs for a setting; a zero-phase low-cut comes after it, in `finish`. */
export function benchDesign(setting: BenchSetting): RecorderDesign {
  const design = designRecorder(setting.recorder);
  if (setting.kind === 'zeroPhase') return withoutLowCut(design);
  return setting.kind === 'pointSampled' ? withoutBandLimit(design) : design;
}

/** Samples that must follow the wanted ones, for what works backwards: eight time constants of the low-cut. */
export function samplesAhead(setting: BenchSetting): number {
  if (setting.kind !== 'zeroPhase') return 0;
  return Math.ceil((8 / (2 * Math.PI * setting.lowHz)) * setting.recorder.sampleRateHz);
}

/** What is done to a finished recording, mV before the quantiser; the samples themselves when nothing is. */
export function finish(setting: BenchSetting, samples: Float64Array): Float64Array {
  if (setting.kind !== 'zeroPhase') return samples;
  return filterBothWays(samples, setting.lowHz, setting.recorder.sampleRateHz);
}

const bandwidthNames = {
  monitor: 'Monitor',
  diagnostic: 'Diagnostic',
  slowWave: 'Slow-wave',
  unfiltered: 'Unfiltered',
} as const;

/** Name and band of a setting: `Monitor`, `0.5–40 Hz`. */
export function settingWords(setting: BenchSetting): { name: string; band: string } {
  const { recorder } = setting;
  const notch = recorder.mainsNotchHz === 0 ? '' : `, ${recorder.mainsNotchHz} Hz notch`;
  switch (setting.kind) {
    case 'pointSampled':
      return { name: 'Sampled without a band-limit', band: `${recorder.sampleRateHz} samples/s${notch}` };
    case 'zeroPhase': {
      const high =
        bandwidthLabel({ ...recorder, mainsNotchHz: 0 })
          .split('–')
          .at(-1) ?? '';
      return { name: 'Zero-phase low-cut, offline', band: `${setting.lowHz}–${high}${notch}` };
    }
    case 'recorder': {
      const { bandwidth } = recorder;
      const name = typeof bandwidth === 'string' ? bandwidthNames[bandwidth] : 'Own limits';
      const band = bandwidthLabel(recorder);
      return { name, band: bandwidth === 'unfiltered' ? `mean of each sample${notch}` : band };
    }
  }
}
