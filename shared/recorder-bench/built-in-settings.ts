import { parseStripParameters } from '../parameters/parse';
import type { RecorderParameters } from '../parameters/strip-parameters';
import { usualZeroPhaseHz, type BenchSetting } from './bench-setting';

/** A recorder with these settings and the usual rest. */
export function recorderWith(settings: Partial<RecorderParameters>): RecorderParameters {
  return parseStripParameters({ recorder: settings }).recorder;
}

const running = (settings: Partial<RecorderParameters>): BenchSetting => ({
  kind: 'recorder',
  recorder: recorderWith(settings),
});

/** What one can put on the bench with one click. */
export const builtInSettings = {
  diagnostic: running({ bandwidth: 'diagnostic' }),
  slowWave: running({ bandwidth: 'slowWave' }),
  monitor: running({ bandwidth: 'monitor' }),
  unfiltered: running({ bandwidth: 'unfiltered' }),
  custom: running({ bandwidth: { lowHz: 0.67, highHz: 100 } }),
  zeroPhase: { kind: 'zeroPhase', lowHz: usualZeroPhaseHz, recorder: recorderWith({}) },
  pointSampled: { kind: 'pointSampled', recorder: recorderWith({}) },
  notched: running({ mainsNotchHz: 50 }),
} as const satisfies Record<string, BenchSetting>;
