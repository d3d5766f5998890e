import { execFileSync, spawnSync } from 'node:child_process';

/** Debian's Python, which Debian's packages belong to. */
const python = '/usr/bin/python3';

/** Whether Debian's Python has a module. In CI a missing one is an error, because nothing may be skipped there. */
export function hasPythonModule(name: string): boolean {
  const found = spawnSync(python, ['-W', 'ignore', '-c', `import ${name}`], { stdio: 'ignore' }).status === 0;
  if (!found && process.env.CI)
    throw new Error(`${name} is missing in ${python}, and in CI nothing may be skipped`);
  return found;
}

/** Runs a Python program and returns what it prints. */
export function runPython(program: string, args: string[] = []): string {
  return execFileSync(python, ['-W', 'ignore', '-c', program, ...args], {
    encoding: 'utf8',
    maxBuffer: 1 << 28,
  });
}
