import autocannon from 'autocannon';
import { usualQueueLength, usualThreads } from '../../server/services/rendering/render-pool';
import { startServerProcess, type EventLoopDelay, type ServerProcess } from './server-process';

export interface ServerFigures {
  threads: number;
  queueLength: number;
  /** 10 s strips of default parameters, the pool never idle. */
  rendersPerSecond: number;
  renderLatencyMs: { p50: number; p97_5: number };
  eventLoopDelay: { idle: EventLoopDelay; saturated: EventLoopDelay };
  /** GET /api/session meanwhile. */
  otherRequestsMs: { idle: { p50: number; max: number }; saturated: { p50: number; max: number } };
  /** Answer to one render more than the queue holds. */
  queueFull: { status: number; errorId: string; retryAfterS: number; p50Ms: number; maxMs: number };
}

const loadS = 5;
const probes = 20;
const probeEveryMs = 100;

const wait = (ms: number): Promise<void> => new Promise((done) => setTimeout(done, ms));

function spread(timesMs: number[]): { p50: number; max: number } {
  const sorted = [...timesMs].sort((a, b) => a - b);
  return { p50: sorted[sorted.length >> 1], max: sorted[sorted.length - 1] };
}

async function timed<Result>(work: () => Promise<Result>): Promise<{ result: Result; ms: number }> {
  const started = performance.now();
  const result = await work();
  return { result, ms: performance.now() - started };
}

async function probeSession({ url, headers }: ServerProcess): Promise<{ p50: number; max: number }> {
  const times: number[] = [];
  for (let i = 0; i < probes; i++) {
    const { ms } = await timed(async () => (await fetch(`${url}/api/session`, { headers })).text());
    times.push(ms);
    await wait(probeEveryMs);
  }
  return spread(times);
}

function render(server: ServerProcess, parameters: object, signal?: AbortSignal): Promise<Response> {
  return fetch(`${server.url}/api/strips/render`, {
    method: 'POST',
    headers: server.headers,
    body: JSON.stringify({ parameters }),
    signal,
  });
}

/** Keeps the pool and half its queue busy for a few seconds. */
function load({ url, headers }: ServerProcess): Promise<autocannon.Result> {
  return autocannon({
    url: `${url}/api/strips/render`,
    method: 'POST',
    headers,
    body: JSON.stringify({ parameters: {} }),
    connections: usualThreads + usualQueueLength / 2,
    duration: loadS,
  });
}

async function measureSaturated(server: ServerProcess) {
  server.resetDelay();
  const loaded = load(server);
  await wait(1000);
  const others = await probeSession(server);
  const result = await loaded;
  if (result.non2xx > 0 || result.errors > 0)
    throw new Error(`${result.non2xx + result.errors} renders failed`);
  return { result, others, delay: await server.readDelay() };
}

/** Fills threads and queue with long renders, then asks for more. */
async function measureQueueFull(server: ServerProcess): Promise<ServerFigures['queueFull']> {
  const leaving = new AbortController();
  const long = { durationS: 300, recorder: { sampleRateHz: 2000 }, disturbance: { muscleMv: 0.05 } };
  const waiting = Array.from({ length: usualThreads + usualQueueLength }, () =>
    render(server, long, leaving.signal).catch(() => null),
  );
  await wait(300);
  const times: number[] = [];
  let last: { status: number; errorId: string; retryAfterS: number } | null = null;
  for (let i = 0; i < probes; i++) {
    const { result, ms } = await timed(() => render(server, {}));
    const { error } = (await result.json()) as { error: { id: string } };
    last = {
      status: result.status,
      errorId: error.id,
      retryAfterS: Number(result.headers.get('retry-after')),
    };
    times.push(ms);
  }
  leaving.abort();
  await Promise.all(waiting);
  if (!last) throw new Error('nothing was asked');
  const { p50, max } = spread(times);
  return { ...last, p50Ms: p50, maxMs: max };
}

/** Measures the server over HTTP on the loopback address, under about eight seconds of load. */
export async function measureServer(): Promise<ServerFigures> {
  const server = await startServerProcess();
  try {
    for (let i = 0; i < 3 * usualThreads; i++) await (await render(server, {})).arrayBuffer();
    server.resetDelay();
    const idleOthers = await probeSession(server);
    const idle = await server.readDelay();
    const { result, others, delay } = await measureSaturated(server);
    return {
      threads: usualThreads,
      queueLength: usualQueueLength,
      rendersPerSecond: result.requests.average,
      renderLatencyMs: { p50: result.latency.p50, p97_5: result.latency.p97_5 },
      eventLoopDelay: { idle, saturated: delay },
      otherRequestsMs: { idle: idleOthers, saturated: others },
      queueFull: await measureQueueFull(server),
    };
  } finally {
    await server.stop();
  }
}
