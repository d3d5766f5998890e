import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** Every file under a path, in a stable order; a path that is not there has none. */
function filesUnder(path) {
  if (!existsSync(path)) return [];
  if (!statSync(path).isDirectory()) return [path];
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesUnder(join(path, name)));
}

/** One hash over names and contents. */
function hashOf(paths) {
  const hash = createHash('sha256');
  for (const file of paths.flatMap(filesUnder))
    hash.update(`${file}\0`).update(readFileSync(file)).update('\0');
  return hash.digest('hex');
}

/**
 * Builds with a Vite configuration unless its last build was made from exactly these sources. The stamp is
 * written last, so that a build that was broken off is made again.
 */
export async function buildWhenChanged({ name, configFile, sources, output }) {
  const stamp = join(output, '.built-from');
  const wanted = hashOf([...sources, configFile, 'package-lock.json']);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  console.log(`Building the ${name} …`);
  rmSync(stamp, { force: true });
  const { build } = await import('vite');
  await build({ configFile, logLevel: 'warn' });
  writeFileSync(stamp, wanted);
}
