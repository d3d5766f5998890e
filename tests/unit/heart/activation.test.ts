import { describe, expect, it } from 'vitest';
import { activate } from '../../../shared/engine/heart/activation';
import type { ConductionGraph } from '../../../shared/engine/heart/conduction-graph';
import { conduction } from '../../../shared/engine/heart/heart-model-data';
import { muscleTimeMs } from '../../../shared/engine/heart/muscle-edges';
import { earliestArrival } from '../../../shared/engine/heart/shortest-path';
import { fittedVentricles } from '../../../shared/engine/heart/ventricles';
import { randomStream } from '../../../shared/engine/random';

/** Ring 0–1–2–3–0 with unequal times and one fixed edge 3→4. */
const ring: ConductionGraph = {
  vertexCount: 6,
  firstEdge: Int32Array.from([0, 2, 4, 6, 9, 9, 9]),
  target: Int32Array.from([1, 3, 0, 2, 1, 3, 2, 0, 4]),
  scalableMs: Float64Array.from([2, 10, 2, 3, 3, 4, 4, 10, 0]),
  fixedMs: Float64Array.from([0, 0, 0, 0, 0, 0, 0, 0, 3]),
};

describe('earliest arrival', () => {
  it('takes the shortest way round', () => {
    expect([...earliestArrival(ring, [{ vertex: 0, timeMs: 0 }], 1)]).toEqual([0, 2, 5, 9, 12, Infinity]);
  });

  it('lets the earlier front win at each vertex', () => {
    const seeds = [
      { vertex: 0, timeMs: 0 },
      { vertex: 3, timeMs: 1 },
    ];
    expect([...earliestArrival(ring, seeds, 1)]).toEqual([0, 2, 5, 1, 4, Infinity]);
  });

  it('scales all but the fixed part', () => {
    expect([...earliestArrival(ring, [{ vertex: 0, timeMs: 0 }], 2)]).toEqual([
      0,
      1,
      2.5,
      4.5,
      7.5,
      Infinity,
    ]);
  });

  it('equals exhaustive relaxation on the ventricles', () => {
    const { graph } = fittedVentricles();
    const random = randomStream(7, 'test seeds');
    const seeds = Array.from({ length: 5 }, () => ({
      vertex: Math.floor(random.uniform() * graph.vertexCount),
      timeMs: 40 * random.uniform(),
    }));
    const relaxed = new Float64Array(graph.vertexCount).fill(Infinity);
    for (const { vertex, timeMs } of seeds) relaxed[vertex] = Math.min(relaxed[vertex], timeMs);
    for (let changed = true; changed;) {
      changed = false;
      for (let v = 0; v < graph.vertexCount; v++) {
        for (let e = graph.firstEdge[v]; e < graph.firstEdge[v + 1]; e++) {
          const time = relaxed[v] + graph.scalableMs[e] + graph.fixedMs[e];
          if (time < relaxed[graph.target[e]]) {
            relaxed[graph.target[e]] = time;
            changed = true;
          }
        }
      }
    }
    expect(earliestArrival(graph, seeds, 1)).toEqual(relaxed);
  });
});

describe('muscle conduction', () => {
  it('is faster along the wall than across it', () => {
    expect(muscleTimeMs(10, 0, 0, 0, 0, 1, 0.421)).toBeCloseTo(10 / conduction.tangentialSpeed, 12);
    expect(muscleTimeMs(0, 0, 10, 0, 0, 1, 0.421)).toBeCloseTo(10 / 0.421, 12);
  });
});

describe('activation of the ventricles', () => {
  const ventricles = fittedVentricles();
  const apex = { muscle: [{ site: 'rvApex' as const, timeMs: 0 }], fascicles: [] };
  const lateral = { muscle: [{ site: 'lvLat' as const, timeMs: 20 }], fascicles: [] };

  it('by two sources is the earlier of the two at every node', () => {
    const both = activate(ventricles, { muscle: [...apex.muscle, ...lateral.muscle], fascicles: [] });
    const a = activate(ventricles, apex).timesMs;
    const b = activate(ventricles, lateral).timesMs;
    both.timesMs.forEach((time, i) => expect(time).toBe(Math.min(a[i], b[i])));
  });

  it('reaches every node, and shifts with its source', () => {
    const early = activate(ventricles, apex);
    const late = activate(ventricles, { muscle: [{ site: 'rvApex', timeMs: 50 }], fascicles: [] });
    expect(early.latestMs).toBeLessThan(400);
    early.timesMs.forEach((time, i) => expect(late.timesMs[i]).toBeCloseTo(time + 50, 9));
  });

  it('of pure muscle sources shrinks no faster than the speed grows', () => {
    const slow = activate(ventricles, apex);
    const fast = activate(ventricles, apex, 2);
    fast.timesMs.forEach((time, i) => {
      expect(time).toBeGreaterThanOrEqual(slow.timesMs[i] / 2 - 1e-9);
      expect(time).toBeLessThan(slow.timesMs[i]);
    });
  });

  it('refuses a pattern without a source', () => {
    expect(() => activate(ventricles, { muscle: [], fascicles: [] })).toThrow('at least one source');
  });
});
