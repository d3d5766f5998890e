import { randomBytes } from 'node:crypto';
import { mkdir, open, readFile } from 'node:fs/promises';
import { dirname } from 'node:path';

const secretBytes = 48;

/**
 * The key that signs sessions: made at first, kept in a file only its owner can read, so that a restart ends no
 * session. Two servers starting at once agree on the file that was there first.
 */
export async function loadSessionSecret(file: string): Promise<string> {
  await mkdir(dirname(file), { recursive: true });
  try {
    const handle = await open(file, 'wx', 0o600);
    await handle.writeFile(randomBytes(secretBytes).toString('base64url'));
    await handle.close();
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  }
  const secret = (await readFile(file, 'utf8')).trim();
  if (secret.length < secretBytes)
    throw new Error(`${file} holds no usable key; delete it to have a new one made`);
  return secret;
}
