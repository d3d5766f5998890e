import { execFileSync, spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';

/** Debian's Python, which Debian's packages belong to. */
const python = '/usr/bin/python3';

/** Whether Debian's Python has a module. In CI a missing one is an error, because nothing may be skipped there. */
export function hasPythonModule(name: string): boolean {
  const found = spawnSync(python, ['-W', 'ignore', '-c', `import ${name}`], { stdio: 'ignore' }).status === 0;
  if (!found && process.env.CI)
    throw new Error(`${name} is missing in ${python}, and in CI nothing may be skipped`);
  return found;
}

/** Whether a program of Debian's is there. In CI a missing one is an error, because nothing may be skipped there. */
export function hasProgram(path: string): boolean {
  const found = existsSync(path);
  if (!found && process.env.CI) throw new Error(`${path} is missing, and in CI nothing may be skipped`);
  return found;
}

/** Runs a Python program and returns what it prints. */
export function runPython(program: string, args: string[] = []): string {
  return execFileSync(python, ['-W', 'ignore', '-c', program, ...args], {
    encoding: 'utf8',
    maxBuffer: 1 << 28,
  });
}

/** Runs a program of Debian's and returns its standard output; throws when it fails. */
export function runReader(path: string, args: string[]): string {
  return execFileSync(path, args, {
    encoding: 'utf8',
    maxBuffer: 1 << 28,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
}
