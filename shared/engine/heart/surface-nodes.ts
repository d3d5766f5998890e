import { ellipsoidLevel, ellipsoidNormal, forEachFibonacciPoint } from './geometry';
import {
  ellipsoids,
  lvBaseU,
  rvBaseTilt,
  shellNames,
  type NodeCounts,
  type Shell,
  type Wall,
} from './heart-model-data';

/** The nodes of the ventricles, shell after shell, the base ring last. */
export interface SurfaceNodes {
  count: number;
  /** (u, l, p) of node i at 3 i, mm. */
  positions: Float64Array;
  /** Unit transmural direction (u, l, p) of node i at 3 i: outward from the chamber. */
  normals: Float64Array;
  walls: Wall[];
  /** Range [first, end) of the nodes of each shell. */
  shellRange: Record<Shell, readonly [number, number]>;
  /** 1 for nodes of the left ventricular wall that face the right ventricular cavity, the base excepted. */
  septal: Uint8Array;
}

/** Wall class of a point drawn on a shell, or null where the surface is cut away. */
export function classifyPoint(shell: Shell, u: number, l: number, p: number): Wall | null {
  if (shell === 'rvEndo' || shell === 'rvEpi') {
    const kept = u > lvBaseU + rvBaseTilt * Math.min(p, 0) && ellipsoidLevel(ellipsoids.lvEpi, u, l, p) > 1;
    return kept ? shell : null;
  }
  if (!(u > lvBaseU)) return null;
  if (shell !== 'lvEpi') return shell;
  if (ellipsoidLevel(ellipsoids.rvEndo, u, l, p) < 1) return 'rvSeptalEndo';
  return ellipsoidLevel(ellipsoids.rvEpi, u, l, p) < 1 ? 'insertion' : 'lvEpi';
}

/** Radii of the left ventricular endocardium and epicardium in the base plane, mm. */
export function baseRingRadii(): { inner: number; outer: number } {
  const radiusAtBase = (shell: 'lvEndo' | 'lvEpi'): number => {
    const [su, sl] = ellipsoids[shell].semiAxes;
    return sl * Math.sqrt(1 - (lvBaseU / su) ** 2);
  };
  return { inner: radiusAtBase('lvEndo'), outer: radiusAtBase('lvEpi') };
}

function isSeptal(wall: Wall, u: number, l: number, p: number): boolean {
  if (wall === 'rvEndo' || wall === 'rvEpi' || wall === 'lvBase') return false;
  const stretch = 1 / Math.sqrt(ellipsoidLevel(ellipsoids.lvEpi, u, l, p));
  return ellipsoidLevel(ellipsoids.rvEndo, u * stretch, l * stretch, p * stretch) < 1;
}

/** Lays the nodes: Fibonacci points of each shell that are not cut away, then the base ring. */
export function buildSurfaceNodes(counts: NodeCounts): SurfaceNodes {
  const points: number[] = [];
  const walls: Wall[] = [];
  const shellRange = {} as Record<Shell, readonly [number, number]>;
  for (const shell of shellNames) {
    const first = walls.length;
    forEachFibonacciPoint(ellipsoids[shell], counts[shell], (u, l, p) => {
      const wall = classifyPoint(shell, u, l, p);
      if (!wall) return;
      points.push(u, l, p);
      walls.push(wall);
    });
    shellRange[shell] = [first, walls.length];
  }
  const { inner, outer } = baseRingRadii();
  const meanRadius = (inner + outer) / 2;
  for (let j = 0; j < counts.base; j++) {
    const angle = (2 * Math.PI * j) / counts.base;
    points.push(lvBaseU, meanRadius * Math.cos(angle), meanRadius * Math.sin(angle));
    walls.push('lvBase');
  }
  return { ...orient(Float64Array.from(points), walls), walls, shellRange };
}

function orient(
  positions: Float64Array,
  walls: readonly Wall[],
): Pick<SurfaceNodes, 'count' | 'positions' | 'normals' | 'septal'> {
  const count = walls.length;
  const normals = new Float64Array(3 * count);
  const septal = new Uint8Array(count);
  for (let i = 0; i < count; i++) {
    const [u, l, p] = positions.subarray(3 * i, 3 * i + 3);
    const wall = walls[i];
    const ofRv = wall === 'rvEndo' || wall === 'rvEpi';
    normals.set(ellipsoidNormal(ofRv ? ellipsoids.rvEpi : ellipsoids.lvEpi, u, l, p), 3 * i);
    septal[i] = isSeptal(wall, u, l, p) ? 1 : 0;
  }
  return { count, positions, normals, septal };
}
