import { ellipsoidLevel } from './geometry';
import { conduction, ellipsoids, graphRules, lvBaseU } from './heart-model-data';
import { nearestNeighbours, symmetricPairs } from './nearest-neighbours';
import type { SurfaceNodes } from './surface-nodes';

/** An undirected connection of two graph vertices. */
export interface TimedEdge {
  a: number;
  b: number;
  /** Conduction time at unit speed factor, ms. */
  timeMs: number;
}

/** Conduction time (ms) along d = (du, dl, dp) mm where n is the unit transmural direction: slower across the wall. */
export function muscleTimeMs(
  du: number,
  dl: number,
  dp: number,
  nu: number,
  nl: number,
  np: number,
  transmuralSpeed: number,
): number {
  const across = du * nu + dl * nl + dp * np;
  const alongSquare = Math.max(0, du * du + dl * dl + dp * dp - across * across);
  return Math.sqrt(alongSquare / conduction.tangentialSpeed ** 2 + (across / transmuralSpeed) ** 2);
}

function isInMuscle(u: number, l: number, p: number): boolean {
  const outside = 1 + graphRules.insideTolerance;
  const inside = 1 - graphRules.insideTolerance;
  const lvEpi = ellipsoidLevel(ellipsoids.lvEpi, u, l, p);
  if (
    lvEpi < outside &&
    u > lvBaseU - graphRules.basePlaneSlackMm &&
    ellipsoidLevel(ellipsoids.lvEndo, u, l, p) > inside
  ) {
    return true;
  }
  return (
    lvEpi > inside &&
    ellipsoidLevel(ellipsoids.rvEpi, u, l, p) < outside &&
    ellipsoidLevel(ellipsoids.rvEndo, u, l, p) > inside
  );
}

function runsInMuscle(positions: Float64Array, a: number, b: number): boolean {
  for (const share of [0.25, 0.5, 0.75]) {
    const at = (axis: number): number =>
      positions[3 * a + axis] + share * (positions[3 * b + axis] - positions[3 * a + axis]);
    if (!isInMuscle(at(0), at(1), at(2))) return false;
  }
  return true;
}

/** Connections between near nodes whose straight line stays in muscle, with their conduction times. */
export function buildMuscleEdges(nodes: SurfaceNodes): TimedEdge[] {
  const { positions } = nodes;
  return symmetricPairs(nearestNeighbours(positions, graphRules.nearestNodes))
    .filter(([a, b]) => runsInMuscle(positions, a, b))
    .map(([a, b]) => ({ a, b, timeMs: edgeTimeMs(nodes, a, b) }));
}

function edgeTimeMs({ positions, normals, walls, septal }: SurfaceNodes, a: number, b: number): number {
  const delta = [0, 1, 2].map((axis) => positions[3 * b + axis] - positions[3 * a + axis]);
  const normal = [0, 1, 2].map((axis) => normals[3 * a + axis] + normals[3 * b + axis]);
  const length = Math.hypot(...normal);
  const transmuralSpeed =
    septal[a] && septal[b] ? conduction.septalTransmuralSpeed : conduction.transmuralSpeed;
  const isRvFree = (node: number): boolean => walls[node] === 'rvEndo' || walls[node] === 'rvEpi';
  const factor = isRvFree(a) && isRvFree(b) ? conduction.rvFreeWallSpeedFactor : 1;
  const time = muscleTimeMs(
    delta[0],
    delta[1],
    delta[2],
    normal[0] / length,
    normal[1] / length,
    normal[2] / length,
    transmuralSpeed,
  );
  return time / factor;
}
