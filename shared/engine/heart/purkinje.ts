import {
  conduction,
  fascicles,
  graphRules,
  type Fascicle,
  type Network,
  type Vector3,
} from './heart-model-data';
import type { TimedEdge } from './muscle-edges';
import { nearestNeighbours, symmetricPairs } from './nearest-neighbours';
import type { SurfaceNodes } from './surface-nodes';

/** The fast endocardial layer of one ventricle: twins of endocardial nodes with connections of their own. */
export interface PurkinjeNetwork {
  network: Network;
  /** Muscle node of twin k. */
  muscleNode: Int32Array;
  /** Three coordinates of each twin, mm. */
  positions: Float64Array;
  /** Between twins (numbers within this network). */
  edges: TimedEdge[];
  /** From muscle back into the network, ms. */
  retrogradeMs: number;
}

const leftFascicles = ['LAF', 'LSF', 'LPF'] as const satisfies readonly Fascicle[];

function squareDistance(positions: Float64Array, k: number, to: Vector3): number {
  return (
    (positions[3 * k] - to[0]) ** 2 +
    (positions[3 * k + 1] - to[1]) ** 2 +
    (positions[3 * k + 2] - to[2]) ** 2
  );
}

/** Number of the left fascicle whose exit is nearest: the twin's territory, also when that fascicle is blocked. */
function territory(positions: Float64Array, k: number): number {
  const squares = leftFascicles.map((name) => squareDistance(positions, k, fascicles[name].exit));
  return squares.indexOf(Math.min(...squares));
}

/** Builds the network of one ventricle. The two are joined only through muscle, or by explicit sources. */
export function buildPurkinjeNetwork(nodes: SurfaceNodes, network: Network): PurkinjeNetwork {
  const walls = network === 'lv' ? ['lvEndo'] : ['rvSeptalEndo', 'rvEndo'];
  const members: number[] = [];
  for (let i = 0; i < nodes.count; i++) {
    if (walls.includes(nodes.walls[i]) && nodes.positions[3 * i] > graphRules.purkinjeMinU) members.push(i);
  }
  const positions = Float64Array.from(
    members.flatMap((node) => Array.from(nodes.positions.subarray(3 * node, 3 * node + 3))),
  );
  const neighbours = nearestNeighbours(
    positions,
    graphRules.purkinjeNearestTwins,
    graphRules.purkinjeMaxEdgeMm,
  );
  const edges = symmetricPairs(neighbours).map(([a, b]) => {
    const distance = Math.sqrt(
      squareDistance(positions, a, [positions[3 * b], positions[3 * b + 1], positions[3 * b + 2]]),
    );
    const crosses = network === 'lv' && territory(positions, a) !== territory(positions, b);
    const slowing = crosses ? conduction.purkinjeCrossTerritoryFactor : 1;
    return { a, b, timeMs: distance / conduction.purkinjeSpeed / slowing };
  });
  const retrogradeMs = network === 'lv' ? conduction.retrogradeLvMs : conduction.retrogradeRvMs;
  return { network, muscleNode: Int32Array.from(members), positions, edges, retrogradeMs };
}

/**
 * Twins that a fascicle excites first and how long after its own time (ms at unit speed factor): all within the
 * seed radius of its exit, or else the nearest.
 */
export function fascicleSeeds(
  { positions }: PurkinjeNetwork,
  fascicle: Fascicle,
): { twin: number; timeMs: number }[] {
  const { exit } = fascicles[fascicle];
  const distances = Array.from({ length: positions.length / 3 }, (_, k) =>
    Math.sqrt(squareDistance(positions, k, exit)),
  );
  const nearest = Math.min(...distances);
  const reach = Math.max(nearest, conduction.purkinjeSeedRadiusMm);
  return distances.flatMap((distance, twin) =>
    distance <= reach ? [{ twin, timeMs: distance / conduction.purkinjeSpeed }] : [],
  );
}
