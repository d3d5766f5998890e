import { spawnSync } from 'node:child_process';
import { hasBrowser } from './browser';

/** Builds pages and server once, before the tests that start them. */
export default function setup(): void {
  if (!hasBrowser()) return;
  const { status, stderr } = spawnSync('node', ['scripts/start.mjs', '--build-only'], { encoding: 'utf8' });
  if (status !== 0) throw new Error(`the product could not be built: ${stderr}`);
}
