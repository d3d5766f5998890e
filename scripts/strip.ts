// The command line: parameters in, strip files out. `npm run --silent strip -- --help` says how.
import { InvalidInputError } from '../shared/errors';
import { help, readCommand } from './strip/command';
import { readParameters } from './strip/read-parameters';
import { writeStrip } from './strip/write-strip';

/** Exit code for input that was refused. */
const refused = 2;

async function run(args: string[]): Promise<void> {
  const command = readCommand(args);
  if (command === 'help') {
    process.stdout.write(help);
    return;
  }
  const warnings = await writeStrip(readParameters(command), command);
  for (const warning of warnings) process.stderr.write(`warning, ${warning}\n`);
}

try {
  await run(process.argv.slice(2));
} catch (error) {
  if (!(error instanceof InvalidInputError)) throw error;
  process.stderr.write(`${error.message}\n`);
  process.exitCode = refused;
}
