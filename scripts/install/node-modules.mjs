import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';

const lockfile = 'package-lock.json';
const stamp = 'node_modules/.installed-from';
/** npm's own note of what lies in node_modules. */
const installedLockfile = 'node_modules/.package-lock.json';

const packagesOf = (file) => JSON.parse(readFileSync(file, 'utf8')).packages;

/** Whether every package of the lockfile lies there in its version; optional ones are for other machines. */
function isInstalledByHand() {
  if (!existsSync(installedLockfile)) return false;
  const installed = packagesOf(installedLockfile);
  return Object.entries(packagesOf(lockfile)).every(
    ([path, wanted]) =>
      path === '' || installed[path]?.version === wanted.version || (wanted.optional && !installed[path]),
  );
}

/** Runs `npm ci` unless node_modules was installed from exactly this lockfile. Exits when npm fails. */
export function ensureNodeModules() {
  const wanted = createHash('sha256').update(readFileSync(lockfile)).digest('hex');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  if (!isInstalledByHand()) {
    console.log('Installing npm packages (npm ci); the database is compiled, which takes a minute or two …');
    const { status } = spawnSync('npm', ['ci', '--no-fund', '--no-audit'], { stdio: 'inherit' });
    if (status !== 0) {
      console.error('npm ci failed');
      process.exit(status ?? 1);
    }
  }
  writeFileSync(stamp, wanted);
}
