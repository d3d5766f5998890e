import { z } from 'zod';
import { recorderSchema } from '../parameters/recorder';
import { zeroPhaseLimitsHz } from '../recorder-bench/bench-setting';

const { min, max } = zeroPhaseLimitsHz;

const settingSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('recorder'), recorder: recorderSchema }),
  z.strictObject({
    kind: z.literal('zeroPhase'),
    lowHz: z
      .number()
      .min(min)
      .max(max)
      .meta({
        field: { kind: 'number', label: 'Low limit, both ways', unit: 'Hz', min, max, help: 'Offline only.' },
      }),
    recorder: recorderSchema,
  }),
  z.strictObject({ kind: z.literal('pointSampled'), recorder: recorderSchema }),
]);

/** Settings in one report, at most. */
export const mostReportSettings = 4;

/** POST /api/recorder-report: settings to measure. Answers the dated conformance report as PDF. */
export const recorderReportRequestSchema = z.strictObject({
  settings: z.array(settingSchema).min(1).max(mostReportSettings),
});
export type RecorderReportRequest = z.output<typeof recorderReportRequestSchema>;
export type RecorderReportRequestInput = z.input<typeof recorderReportRequestSchema>;
