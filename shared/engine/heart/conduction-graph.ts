import { conduction } from './heart-model-data';
import type { TimedEdge } from './muscle-edges';
import type { PurkinjeNetwork } from './purkinje';

/** Directed graph in compressed rows: edges of vertex v are firstEdge[v] .. firstEdge[v + 1] − 1. */
export interface ConductionGraph {
  vertexCount: number;
  firstEdge: Int32Array;
  target: Int32Array;
  /** Part of the edge's time that a speed factor divides, ms. */
  scalableMs: Float64Array;
  /** Part that no speed factor changes (Purkinje to muscle), ms. */
  fixedMs: Float64Array;
}

interface DirectedEdge {
  from: number;
  to: number;
  scalableMs: number;
  fixedMs: number;
}

/** First vertex of each network's twins: muscle nodes come first, then the networks in the order given. */
export function twinOffsets(nodeCount: number, networks: readonly PurkinjeNetwork[]): number[] {
  let next = nodeCount;
  return networks.map((network) => {
    const offset = next;
    next += network.muscleNode.length;
    return offset;
  });
}

/** Joins muscle and Purkinje networks into one directed graph. */
export function buildConductionGraph(
  nodeCount: number,
  muscleEdges: readonly TimedEdge[],
  networks: readonly PurkinjeNetwork[],
): ConductionGraph {
  const directed: DirectedEdge[] = [];
  const addBothWays = ({ a, b, timeMs }: TimedEdge, offset: number): void => {
    directed.push({ from: offset + a, to: offset + b, scalableMs: timeMs, fixedMs: 0 });
    directed.push({ from: offset + b, to: offset + a, scalableMs: timeMs, fixedMs: 0 });
  };
  for (const edge of muscleEdges) addBothWays(edge, 0);
  const offsets = twinOffsets(nodeCount, networks);
  networks.forEach((network, n) => {
    for (const edge of network.edges) addBothWays(edge, offsets[n]);
    network.muscleNode.forEach((node, k) => {
      const twin = offsets[n] + k;
      directed.push({ from: twin, to: node, scalableMs: 0, fixedMs: conduction.anterogradeMs });
      directed.push({ from: node, to: twin, scalableMs: network.retrogradeMs, fixedMs: 0 });
    });
  });
  const twins = networks.reduce((sum, network) => sum + network.muscleNode.length, 0);
  return compress(nodeCount + twins, directed);
}

function compress(vertexCount: number, directed: readonly DirectedEdge[]): ConductionGraph {
  const firstEdge = new Int32Array(vertexCount + 1);
  for (const { from } of directed) firstEdge[from + 1]++;
  for (let v = 0; v < vertexCount; v++) firstEdge[v + 1] += firstEdge[v];
  const next = firstEdge.slice();
  const target = new Int32Array(directed.length);
  const scalableMs = new Float64Array(directed.length);
  const fixedMs = new Float64Array(directed.length);
  for (const edge of directed) {
    const place = next[edge.from]++;
    target[place] = edge.to;
    scalableMs[place] = edge.scalableMs;
    fixedMs[place] = edge.fixedMs;
  }
  return { vertexCount, firstEdge, target, scalableMs, fixedMs };
}
