import { z } from 'zod';
import { flagField, numberField } from './fields';

/** Named recorder bandwidths, −3 dB limits in Hz (BW-60 to BW-62: common practice, no source). */
export const namedBandwidths = {
  monitor: { lowHz: 0.5, highHz: 40 },
  diagnostic: { lowHz: 0.05, highHz: 150 },
  slowWave: { lowHz: 0.05, highHz: 40 },
} as const;

export const bandwidthNames = ['monitor', 'diagnostic', 'slowWave', 'unfiltered'] as const;

/** `highHz` may be at most this fraction of the output rate, so that the low-pass also keeps aliases out. */
export const highHzPerSampleRate = 0.4;

export interface BandLimits {
  lowHz: number;
  highHz: number;
}

const customBandwidthSchema = z.strictObject({
  lowHz: z
    .number()
    .min(0.01)
    .max(10)
    .meta({
      field: {
        kind: 'number',
        label: 'Low limit',
        unit: 'Hz',
        min: 0.01,
        max: 10,
        usual: [0.05, 0.67],
        help: 'First-order high-pass, −3 dB here.',
      },
    }),
  highHz: z
    .number()
    .min(10)
    .max(500)
    .meta({
      field: {
        kind: 'number',
        label: 'High limit',
        unit: 'Hz',
        min: 10,
        max: 500,
        usual: [40, 150],
        help: 'Fourth-order Butterworth low-pass, −3 dB here.',
      },
    }),
});

const bandwidthSchema = z.union([z.enum(bandwidthNames), customBandwidthSchema]);
export type Bandwidth = z.infer<typeof bandwidthSchema>;

/** −3 dB limits of a bandwidth in Hz; null for `unfiltered`. */
export function bandLimits(bandwidth: Bandwidth): BandLimits | null {
  if (bandwidth === 'unfiltered') return null;
  return typeof bandwidth === 'string' ? namedBandwidths[bandwidth] : bandwidth;
}

/** The recorder. */
export const recorderSchema = z
  .strictObject({
    bandwidth: bandwidthSchema.default('diagnostic'),
    mainsNotchHz: z.literal([0, 50, 60]).default(0),
    sampleRateHz: z.literal([250, 500, 1000, 2000]).default(500),
    resolutionUv: numberField(5, {
      label: 'Resolution',
      unit: 'µV',
      min: 1,
      max: 10,
      usual: [1, 5],
      help: 'Quantiser step; diagnostic recorders have at most 5 µV (IEC 60601-2-25:2011, 201.12.4.107.3).',
    }),
    stimulusMarker: flagField(false, {
      label: 'Stimulus marker',
      help: 'Marks, on a line of its own, where a stimulus is found in the signal before the band-limit; it can err.',
    }),
  })
  .superRefine((recorder, context) => {
    const limits = bandLimits(recorder.bandwidth);
    const highest = highHzPerSampleRate * recorder.sampleRateHz;
    if (!limits || limits.highHz <= highest) return;
    const named = typeof recorder.bandwidth === 'string';
    context.addIssue({
      code: 'custom',
      path: named ? ['sampleRateHz'] : ['bandwidth', 'highHz'],
      params: named
        ? {
            value: recorder.sampleRateHz,
            allowed: `at least ${limits.highHz / highHzPerSampleRate} samples/s with the bandwidth ${String(recorder.bandwidth)}, of 250, 500, 1000 or 2000`,
          }
        : {
            value: limits.highHz,
            allowed: `10 to ${highest} Hz at ${recorder.sampleRateHz} samples/s (0.4 × the rate)`,
          },
      message: 'lets aliases through',
    });
  })
  .prefault({});
