import type { ParseArgsConfig } from 'node:util';
import { bandwidthNames } from '../../shared/parameters/recorder';
import { parseStripParameters } from '../../shared/parameters/parse';
import type { BenchSetting } from '../../shared/recorder-bench/bench-setting';
import { readArguments, refuse } from '../arguments';

const formats = ['text', 'json', 'csv'] as const;
export type ReportFormat = (typeof formats)[number];

export interface ReportCommand {
  settings: BenchSetting[];
  format: ReportFormat;
}

const options = {
  bandwidth: { type: 'string', multiple: true, default: [] },
  notch: { type: 'string', default: '0' },
  rate: { type: 'string', default: '500' },
  resolution: { type: 'string', default: '5' },
  format: { type: 'string', default: 'text' },
  help: { type: 'boolean', default: false },
} satisfies ParseArgsConfig['options'];

export const help = `Measures the recorder against published bandwidth standards.

npm run --silent recorder-report -- [--bandwidth NAME|LOW-HIGH …] [--notch 0|50|60] [--rate N] [--resolution N]
                                    [--format text|json|csv]

  --bandwidth   ${bandwidthNames.join(', ')}, or own limits in Hz such as 0.67-100; may be repeated
                (default: every built-in setting)
  --notch       mains notch, Hz (default 0, off)
  --rate        samples a second: 250, 500, 1000 or 2000 (default 500)
  --resolution  quantiser step, 1 to 10 µV (default 5)
  --format      text, json or csv (default text)

Exit code 0; 1 when a setting fails a requirement that it claims; 2 with one line per problem on standard error.
`;

function number(path: string, text: string, allowed: string): number {
  const value = Number(text);
  if (text.trim() === '' || !Number.isFinite(value)) refuse(path, text, allowed);
  return value;
}

function bandwidth(text: string): unknown {
  if (bandwidthNames.some((name) => name === text)) return text;
  const limits = /^(\d*\.?\d+)-(\d*\.?\d+)$/u.exec(text);
  if (!limits) {
    return refuse('--bandwidth', text, `${bandwidthNames.join(', ')}, or limits in Hz such as 0.67-100`);
  }
  return { lowHz: Number(limits[1]), highHz: Number(limits[2]) };
}

function isFormat(text: string): text is ReportFormat {
  return formats.some((format) => format === text);
}

/** Reads the arguments after `--`; `help` instead of a command when asked. Throws `InvalidInputError`. */
export function readCommand(args: string[]): ReportCommand | 'help' {
  const values = readArguments(args, options);
  if (values.help) return 'help';
  if (!isFormat(values.format)) return refuse('--format', values.format, formats.join(', '));
  const wanted = values.bandwidth.length > 0 ? values.bandwidth : [...bandwidthNames];
  const settings = wanted.map((text): BenchSetting => {
    const recorder = {
      bandwidth: bandwidth(text),
      mainsNotchHz: number('--notch', values.notch, '0, 50 or 60 Hz'),
      sampleRateHz: number('--rate', values.rate, '250, 500, 1000 or 2000 samples/s'),
      resolutionUv: number('--resolution', values.resolution, '1 to 10 µV'),
    };
    return { kind: 'recorder', recorder: parseStripParameters({ recorder }).recorder };
  });
  return { settings, format: values.format };
}
