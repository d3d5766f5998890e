import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { ApiClient } from '../support/server/api-client';

let dataDirectory: string;
let running: ChildProcess | null = null;
beforeEach(() => {
  dataDirectory = mkdtempSync(join(tmpdir(), 'paceloom-main-'));
});
afterEach(() => {
  running?.kill('SIGKILL');
  rmSync(dataDirectory, { recursive: true, force: true });
});

interface Started {
  child: ChildProcess;
  url: string;
  output: () => string;
}

/** The server as a process, on a free port; resolves when it says it is open. */
async function startMain(variables: Record<string, string> = {}): Promise<Started> {
  const env = { ...process.env, PORT: '0', DATA_DIR: dataDirectory, ...variables };
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], { env });
  running = child;
  let output = '';
  child.stdout.on('data', (chunk: Buffer) => (output += chunk.toString()));
  child.stderr.on('data', (chunk: Buffer) => (output += chunk.toString()));
  for (;;) {
    const port = /localhost:(\d+)/.exec(output)?.[1];
    if (port && output.includes('r.marsh-ellery')) {
      return { child, url: `http://127.0.0.1:${port}`, output: () => output };
    }
    if (child.exitCode !== null) throw new Error(`the server stopped: ${output}`);
    await new Promise((done) => setTimeout(done, 20));
  }
}

async function stop(child: ChildProcess, signal: NodeJS.Signals): Promise<number | null> {
  child.kill(signal);
  const [code] = (await once(child, 'exit')) as [number | null];
  return code;
}

describe('the server as a process', () => {
  it('prints its address and sign-ins, stops on request, and knows its people again', async () => {
    const first = await startMain();
    expect(first.output()).toContain('heron-lantern-42');
    const client = await new ApiClient(first.url).signIn('educator');
    const kept = await client.keep({ title: 'Kept over a restart', parameters: { seed: 5 } });
    expect(await stop(first.child, 'SIGTERM')).toBe(0);

    const second = await startMain();
    const later = new ApiClient(second.url);
    later.cookie = client.cookie;
    expect(await later.read(kept.id)).toEqual(kept);
    expect(await stop(second.child, 'SIGINT')).toBe(0);
  });

  it('keeps its key from others', async () => {
    const { child } = await startMain();
    expect(statSync(join(dataDirectory, 'session-secret')).mode & 0o777).toBe(0o600);
    await stop(child, 'SIGTERM');
  });

  it('says so when its port is taken', async () => {
    const taken = createServer().listen(0, '127.0.0.1');
    await once(taken, 'listening');
    const PORT = String((taken.address() as AddressInfo).port);
    await expect(startMain({ PORT })).rejects.toThrow(`Port ${PORT} is taken`);
    taken.close();
  });

  it('says which setting it cannot use', async () => {
    await expect(startMain({ PORT: 'eighty' })).rejects.toThrow(/PORT/);
  });
});
