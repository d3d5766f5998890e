import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';

const stamp = 'node_modules/.installed-from';

/** Runs `npm ci` unless node_modules was installed from exactly this lockfile. Exits when npm fails. */
export function ensureNodeModules() {
  const wanted = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  console.log('Installing npm packages (npm ci) …');
  const { status } = spawnSync('npm', ['ci', '--no-fund', '--no-audit'], { stdio: 'inherit' });
  if (status !== 0) {
    console.error('npm ci failed');
    process.exit(status ?? 1);
  }
  writeFileSync(stamp, wanted);
}
