import { forEachFibonacciPoint, heartToBodyRows } from './geometry';
import {
  ellipsoids,
  finePointFactor,
  lvBaseU,
  orientation,
  surfaceWeights,
  type NodeCounts,
  type Shell,
  type Wall,
} from './heart-model-data';
import { baseRingRadii, classifyPoint, type SurfaceNodes } from './surface-nodes';

/** Area vectors of the nodes, out of the muscle, summing to zero. */
export interface AreaWeights {
  /** Body components of node i at 3 i, mm². */
  body: Float64Array;
  /** Their magnitudes, mm²: the weight in every mean over the heart. */
  area: Float64Array;
  areaSum: number;
  /** |sum| / sum of magnitudes before closing: how far the cut surfaces were from closed. */
  closureResidual: number;
}

/** Shells whose points carry area; the middle of the left ventricular wall carries none. */
const weightedShells = ['lvEndo', 'lvEpi', 'rvEndo', 'rvEpi'] as const satisfies readonly Shell[];

/** Sign (out of the muscle) times the tuned share of the drawn area. */
const signedShare: Readonly<Partial<Record<Wall, number>>> = {
  lvEndo: -surfaceWeights.others,
  lvEpi: surfaceWeights.others,
  rvSeptalEndo: surfaceWeights.rvSeptalSurface,
  insertion: 0,
  rvEndo: -surfaceWeights.rvFreeWall,
  rvEpi: surfaceWeights.rvFreeWall,
};

/**
 * Area vector of every node. Each shell is drawn again with many more points, and each fine point's area goes to
 * the nearest node of its shell: averaged areas are much smoother than the areas of the nodes themselves. The
 * surface is then closed, because only then does a uniform plateau give exactly no dipole.
 */
export function buildAreaWeights(nodes: SurfaceNodes, counts: NodeCounts): AreaWeights {
  const heart = new Float64Array(3 * nodes.count);
  for (const shell of weightedShells) addShellAreas(heart, nodes, shell, counts[shell]);
  addBaseAreas(heart, nodes, counts.base);
  const closureResidual = closeSurface(heart);
  const body = toBody(heart);
  const area = magnitudes(body);
  return { body, area, areaSum: area.reduce((sum, value) => sum + value, 0), closureResidual };
}

function addShellAreas(heart: Float64Array, nodes: SurfaceNodes, shell: Shell, count: number): void {
  const nearest = nearestNodeFinder(nodes, shell);
  forEachFibonacciPoint(ellipsoids[shell], count * finePointFactor, (u, l, p, areaU, areaL, areaP) => {
    const wall = classifyPoint(shell, u, l, p);
    const share = wall ? (signedShare[wall] ?? 0) : 0;
    if (share === 0) return;
    const node = nearest(u, l, p);
    heart[3 * node] += share * areaU;
    heart[3 * node + 1] += share * areaL;
    heart[3 * node + 2] += share * areaP;
  });
}

/**
 * Fibonacci points fall in order of u, so the nodes of a shell are sorted by descending u: the search walks outward
 * from the point's own u and stops when u alone is farther than the best.
 */
function nearestNodeFinder(
  { positions, shellRange }: SurfaceNodes,
  shell: Shell,
): (u: number, l: number, p: number) => number {
  const [first, end] = shellRange[shell];
  let start = first;
  return (u, l, p) => {
    while (start + 1 < end && positions[3 * start] > u) start++;
    let best = start;
    let bestSquare = Infinity;
    const consider = (node: number): boolean => {
      const du = positions[3 * node] - u;
      if (du * du >= bestSquare) return false;
      const dl = positions[3 * node + 1] - l;
      const dp = positions[3 * node + 2] - p;
      const square = du * du + dl * dl + dp * dp;
      if (square < bestSquare) {
        bestSquare = square;
        best = node;
      }
      return true;
    };
    for (let node = start; node < end && consider(node); node++);
    for (let node = start - 1; node >= first && consider(node); node--);
    return best;
  };
}

function addBaseAreas(heart: Float64Array, nodes: SurfaceNodes, baseCount: number): void {
  const { inner, outer } = baseRingRadii();
  const areaPerNode = (Math.PI * (outer ** 2 - inner ** 2)) / baseCount;
  for (let node = nodes.count - baseCount; node < nodes.count; node++) {
    // The base faces away from the apex.
    heart[3 * node] = Math.sign(lvBaseU) * areaPerNode;
  }
}

/** Takes the residual sum off all nodes in proportion to their area; returns its share of the whole area. */
function closeSurface(vectors: Float64Array): number {
  const area = magnitudes(vectors);
  const areaSum = area.reduce((sum, value) => sum + value, 0);
  const residual = [0, 0, 0];
  vectors.forEach((value, k) => (residual[k % 3] += value));
  for (let k = 0; k < vectors.length; k++) {
    vectors[k] -= (area[Math.floor(k / 3)] / areaSum) * residual[k % 3];
  }
  return Math.hypot(...residual) / areaSum;
}

function toBody(heart: Float64Array): Float64Array {
  const rows = heartToBodyRows(orientation.azimuthDeg, orientation.elevationDeg, orientation.rollDeg);
  const body = new Float64Array(heart.length);
  for (let i = 0; i < heart.length; i += 3) {
    for (let axis = 0; axis < 3; axis++) {
      body[i + axis] = heart[i] * rows[0][axis] + heart[i + 1] * rows[1][axis] + heart[i + 2] * rows[2][axis];
    }
  }
  return body;
}

function magnitudes(vectors: Float64Array): Float64Array {
  return Float64Array.from({ length: vectors.length / 3 }, (_, i) =>
    Math.hypot(vectors[3 * i], vectors[3 * i + 1], vectors[3 * i + 2]),
  );
}
