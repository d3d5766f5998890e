import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** The built product, running as a user starts it, on a free port with a database of its own. */
export interface Product {
  url: string;
  /** Stops the server and starts it again on the same data and port. */
  restart(): Promise<void>;
  stop(): Promise<void>;
}

async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const address = server.address();
  server.close();
  await once(server, 'close');
  return typeof address === 'object' && address ? address.port : 0;
}

async function startServer(port: number, dataDirectory: string): Promise<ChildProcess> {
  const child = spawn('node', ['scripts/start.mjs'], {
    env: { ...process.env, PORT: String(port), DATA_DIR: dataDirectory, LOG_LEVEL: 'error' },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  let output = '';
  for await (const chunk of child.stdout) {
    output += String(chunk);
    if (output.includes(`localhost:${port}`)) break;
  }
  if (!output.includes(`localhost:${port}`)) throw new Error(`the server did not start: ${output}`);
  return child;
}

async function stopServer(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null) return;
  child.kill('SIGTERM');
  await once(child, 'exit');
}

export async function startProduct(): Promise<Product> {
  const dataDirectory = mkdtempSync(join(tmpdir(), 'paceloom-e2e-'));
  const port = await freePort();
  let child = await startServer(port, dataDirectory);
  return {
    url: `http://localhost:${port}`,
    async restart() {
      await stopServer(child);
      child = await startServer(port, dataDirectory);
    },
    async stop() {
      await stopServer(child);
      rmSync(dataDirectory, { recursive: true, force: true });
    },
  };
}
