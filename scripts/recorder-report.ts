// The recorder against published standards, as a table. `npm run --silent recorder-report -- --help` says how.
import { readFileSync } from 'node:fs';
import { engineVersion } from '../shared/engine/engine-version';
import { InvalidInputError } from '../shared/errors';
import { fails, measureConformance, type Conformance } from '../shared/recorder-bench/conformance';
import { conformanceCsv, conformanceText, type ReportOrigin } from '../shared/recorder-bench/report';
import { help, readCommand, type ReportFormat } from './recorder-report/command';

/** Exit codes: a claimed requirement is not met; input was refused. */
const notMet = 1;
const refused = 2;

function origin(): ReportOrigin {
  const { version } = JSON.parse(readFileSync(new URL('../package.json', import.meta.url), 'utf8')) as {
    version: string;
  };
  return { madeOn: new Date().toISOString().slice(0, 10), productVersion: version, engineVersion };
}

const writers: Record<ReportFormat, (conformance: Conformance, origin: ReportOrigin) => string> = {
  text: conformanceText,
  csv: conformanceCsv,
  json: (conformance, from) => `${JSON.stringify({ ...from, ...conformance }, null, 2)}\n`,
};

function run(args: string[]): void {
  const command = readCommand(args);
  if (command === 'help') {
    process.stdout.write(help);
    return;
  }
  const conformance = measureConformance(command.settings);
  process.stdout.write(writers[command.format](conformance, origin()));
  if (conformance.settings.some((_, setting) => fails(conformance, setting))) process.exitCode = notMet;
}

try {
  run(process.argv.slice(2));
} catch (error) {
  if (!(error instanceof InvalidInputError)) throw error;
  process.stderr.write(`${error.message}\n`);
  process.exitCode = refused;
}
