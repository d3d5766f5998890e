import type { ConductionGraph } from './conduction-graph';

/** A vertex that starts by itself at a time. */
export interface Seed {
  vertex: number;
  timeMs: number;
}

/**
 * Earliest arrival (ms) at every vertex from any of the seeds (Dijkstra 1959, many sources): a vertex is excited
 * by whichever front comes first, so collision and fusion need no rule. Infinity where nothing arrives.
 *
 * @param speedFactor divides the scalable part of every edge's time; seeds are taken as they are
 */
export function earliestArrival(
  graph: ConductionGraph,
  seeds: readonly Seed[],
  speedFactor: number,
): Float64Array {
  const { firstEdge, target, scalableMs, fixedMs } = graph;
  const slowness = 1 / speedFactor;
  const arrival = new Float64Array(graph.vertexCount).fill(Infinity);
  const queue = createTimeQueue(seeds.length + target.length);
  for (const { vertex, timeMs } of seeds) {
    if (timeMs >= arrival[vertex]) continue;
    arrival[vertex] = timeMs;
    queue.push(timeMs, vertex);
  }
  for (;;) {
    const vertex = queue.pop();
    if (vertex < 0) return arrival;
    const time = queue.poppedTime();
    if (time > arrival[vertex]) continue;
    for (let e = firstEdge[vertex]; e < firstEdge[vertex + 1]; e++) {
      const reached = time + scalableMs[e] * slowness + fixedMs[e];
      const to = target[e];
      if (reached < arrival[to]) {
        arrival[to] = reached;
        queue.push(reached, to);
      }
    }
  }
}

interface TimeQueue {
  push(time: number, vertex: number): void;
  /** The vertex with the earliest time, or −1 when empty. */
  pop(): number;
  /** Time of the vertex popped last. */
  poppedTime(): number;
}

/** Binary heap of (time, vertex) with room for `capacity` entries. */
function createTimeQueue(capacity: number): TimeQueue {
  const times = new Float64Array(capacity);
  const vertices = new Int32Array(capacity);
  let size = 0;
  let lastTime = 0;

  const siftDown = (time: number, vertex: number): void => {
    let place = 0;
    for (;;) {
      let child = 2 * place + 1;
      if (child >= size) break;
      if (child + 1 < size && times[child + 1] < times[child]) child++;
      if (times[child] >= time) break;
      times[place] = times[child];
      vertices[place] = vertices[child];
      place = child;
    }
    times[place] = time;
    vertices[place] = vertex;
  };

  return {
    push(time, vertex) {
      let place = size++;
      while (place > 0) {
        const parent = (place - 1) >> 1;
        if (times[parent] <= time) break;
        times[place] = times[parent];
        vertices[place] = vertices[parent];
        place = parent;
      }
      times[place] = time;
      vertices[place] = vertex;
    },
    pop() {
      if (size === 0) return -1;
      const vertex = vertices[0];
      lastTime = times[0];
      size--;
      if (size > 0) siftDown(times[size], vertices[size]);
      return vertex;
    },
    poppedTime: () => lastTime,
  };
}
