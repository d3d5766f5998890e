import type { ParseArgsConfig } from 'node:util';
import { exportFormats, type ExportFormat } from '../../shared/formats/export-format';
import { readArguments, refuse } from '../arguments';

export interface StripCommand {
  /** A file, `-` for standard input, or a preset of the gallery. */
  source: { kind: 'file'; path: string } | { kind: 'preset'; id: string };
  /** `path=value` assignments, in the order given. */
  assignments: string[];
  outDirectory: string;
  formats: ExportFormat[];
  /** One strip.zip with a manifest instead of loose files. */
  bundle: boolean;
}

const defaultFormats = 'csv,events,reading';

const options = {
  in: { type: 'string' },
  preset: { type: 'string' },
  out: { type: 'string' },
  formats: { type: 'string', default: defaultFormats },
  set: { type: 'string', multiple: true, default: [] },
  bundle: { type: 'boolean', default: false },
  help: { type: 'boolean', default: false },
} satisfies ParseArgsConfig['options'];

export const help = `Makes a paced ECG teaching strip from parameters.

npm run --silent strip -- --in FILE --out DIR [--formats LIST] [--bundle] [--set path=value …]
npm run --silent strip -- --preset NAME --out DIR [--formats LIST] [--bundle] [--set path=value …]

  --in FILE       parameters as JSON; - reads standard input
  --preset NAME   a preset of the shipped gallery
  --out DIR       folder for the files; made when it is not there
  --formats LIST  of ${exportFormats.join(',')} (default ${defaultFormats})
  --bundle        one strip.zip with a manifest and checksums instead of loose files
  --set path=value  changes one parameter, such as pacing.lowerRateBpm=70; may be repeated

Exit code 0, or 2 with one line per problem (path, value, allowed range) on standard error.
Synthetic teaching strips, not patient recordings.
`;

function readFormats(list: string): ExportFormat[] {
  const names = list.split(',').map((name) => name.trim());
  const unknown = names.filter((name) => !exportFormats.some((format) => format === name));
  if (unknown.length > 0) refuse('--formats', unknown.join(','), `a list of ${exportFormats.join(',')}`);
  return exportFormats.filter((format) => names.includes(format));
}

function readSource(file: string | undefined, preset: string | undefined): StripCommand['source'] {
  if (file !== undefined && preset !== undefined) {
    refuse('--in', file, 'either --in or --preset, not both');
  }
  if (file !== undefined) return { kind: 'file', path: file };
  if (preset !== undefined) return { kind: 'preset', id: preset };
  return refuse('--in', undefined, 'a file, - for standard input, or --preset NAME instead');
}

/** Reads the arguments after `--`; `help` instead of a command when asked. Throws `InvalidInputError`. */
export function readCommand(args: string[]): StripCommand | 'help' {
  const values = readArguments(args, options);
  if (values.help) return 'help';
  return {
    source: readSource(values.in, values.preset),
    assignments: values.set,
    outDirectory: values.out ?? refuse('--out', undefined, 'a folder for the files'),
    formats: readFormats(values.formats),
    bundle: values.bundle,
  };
}
