import { bandLimits } from '../parameters/recorder';
import type { RecorderParameters } from '../parameters/strip-parameters';

/** The recorder's −3 dB limits and notch in words: `0.05–150 Hz`, `unfiltered`, `0.5–40 Hz, 50 Hz notch`. */
export function bandwidthLabel(recorder: Pick<RecorderParameters, 'bandwidth' | 'mainsNotchHz'>): string {
  const limits = bandLimits(recorder.bandwidth);
  const band = limits ? `${limits.lowHz}–${limits.highHz} Hz` : 'unfiltered';
  return recorder.mainsNotchHz === 0 ? band : `${band}, ${recorder.mainsNotchHz} Hz notch`;
}
