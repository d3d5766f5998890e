// `npm test`: installs what the tests need, then runs every check. Plain JavaScript, because it must run
// before anything is installed.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensureNodeModules } from './install/node-modules.mjs';
import { ensureSystemPackages } from './test/system-packages.mjs';

const inCi = Boolean(process.env.CI);
const failures = [];

function step(title, command, args, env = {}) {
  console.log(`\n== ${title}`);
  const started = process.hrtime.bigint();
  const { status } = spawnSync(command, args, { stdio: 'inherit', env: { ...process.env, ...env } });
  const seconds = Number(process.hrtime.bigint() - started) / 1e9;
  console.log(`== ${title}: ${status === 0 ? 'ok' : 'FAILED'} in ${seconds.toFixed(1)} s`);
  if (status !== 0) failures.push(title);
}

function readCounts(file) {
  if (!existsSync(file)) return { passed: 0, failed: 1, skipped: 0 };
  const report = JSON.parse(readFileSync(file, 'utf8'));
  return {
    passed: report.numPassedTests,
    failed: report.numFailedTests,
    skipped: report.numPendingTests + report.numTodoTests,
  };
}

ensureNodeModules();
const missing = ensureSystemPackages();
for (const { name, checks } of missing) {
  console.log(`Skipped, because ${name} is not here and apt cannot install it: ${checks}`);
  if (inCi) failures.push(`${name} is missing, and in CI nothing may be skipped`);
}

const reportDirectory = mkdtempSync(join(tmpdir(), 'paceloom-test-'));
const report = join(reportDirectory, 'report.json');
step('types', 'npm', ['run', '--silent', 'types']);
step('lint', 'npm', ['run', '--silent', 'lint']);
step('tests', 'npx', [
  'vitest',
  'run',
  '--reporter=default',
  '--reporter=json',
  `--outputFile.json=${report}`,
]);

const counts = readCounts(report);
rmSync(reportDirectory, { recursive: true, force: true });
if (inCi && counts.skipped > 0) failures.push(`${counts.skipped} tests were skipped, and in CI none may be`);
if (counts.passed === 0) failures.push('no test passed');
if (failures.length > 0) console.log(`\nFailed: ${failures.join('; ')}`);
console.log(`\n${counts.passed} passed, ${counts.failed} failed, ${counts.skipped} skipped`);
process.exit(failures.length === 0 ? 0 : 1);
