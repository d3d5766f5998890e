// The server of a benchmark, which also tells over IPC how late its event loop runs.
import { monitorEventLoopDelay } from 'node:perf_hooks';

const nsPerMs = 1e6;
const delay = monitorEventLoopDelay({ resolution: 1 });
delay.enable();

process.on('message', (message) => {
  if (message === 'reset') delay.reset();
  if (message !== 'read') return;
  process.send?.({
    p50Ms: delay.percentile(50) / nsPerMs,
    p99Ms: delay.percentile(99) / nsPerMs,
    maxMs: delay.max / nsPerMs,
  });
});

await import('../../server/main');
