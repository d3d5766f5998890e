import { fork, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { demoPeople } from '../../server/services/demo/demo-people';

export interface EventLoopDelay {
  p50Ms: number;
  p99Ms: number;
  maxMs: number;
}

export interface ServerProcess {
  url: string;
  /** Headers of a request by a signed-in educator. */
  headers: Record<string, string>;
  resetDelay(): void;
  readDelay(): Promise<EventLoopDelay>;
  stop(): Promise<void>;
}

function addressOf(child: ChildProcess): Promise<string> {
  let output = '';
  child.stderr?.pipe(process.stderr);
  return new Promise((resolve, reject) => {
    child.stdout?.on('data', (chunk: Buffer) => {
      output += chunk.toString();
      const port = /localhost:(\d+)/.exec(output)?.[1];
      if (port) resolve(`http://127.0.0.1:${port}`);
    });
    child.once('exit', () => reject(new Error(`the server stopped: ${output}`)));
  });
}

async function signIn(url: string): Promise<Record<string, string>> {
  const person = demoPeople.find((one) => one.role === 'educator');
  const json = { 'content-type': 'application/json' };
  const body = JSON.stringify({ email: person?.email, password: person?.password });
  const response = await fetch(`${url}/api/session`, { method: 'POST', headers: json, body });
  const [cookie] = response.headers.getSetCookie();
  return { ...json, cookie: cookie.split(';')[0] };
}

/** The server with a fresh demonstration database, as a process of its own on a free loopback port. */
export async function startServerProcess(): Promise<ServerProcess> {
  const dataDirectory = mkdtempSync(join(tmpdir(), 'paceloom-bench-'));
  const child = fork('scripts/bench/server-child.ts', {
    execArgv: ['--import', 'tsx'],
    env: { ...process.env, NODE_ENV: 'production', PORT: '0', HOST: '127.0.0.1', DATA_DIR: dataDirectory },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  });
  const url = await addressOf(child);
  return {
    url,
    headers: await signIn(url),
    resetDelay: () => void child.send('reset'),
    async readDelay() {
      child.send('read');
      const [delay] = (await once(child, 'message')) as [EventLoopDelay];
      return delay;
    },
    async stop() {
      child.kill('SIGTERM');
      await once(child, 'exit');
      rmSync(dataDirectory, { recursive: true, force: true });
    },
  };
}
