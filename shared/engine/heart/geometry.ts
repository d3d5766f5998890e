import { degToRad } from '../../units';
import type { Ellipsoid, Vector3 } from './heart-model-data';

const goldenAngle = Math.PI * (3 - Math.sqrt(5));

/** Level function of an ellipsoid at (u, l, p) mm: below 1 inside, 1 on the surface, above 1 outside. */
export function ellipsoidLevel({ centre, semiAxes }: Ellipsoid, u: number, l: number, p: number): number {
  const a = (u - centre[0]) / semiAxes[0];
  const b = (l - centre[1]) / semiAxes[1];
  const c = (p - centre[2]) / semiAxes[2];
  return a * a + b * b + c * c;
}

/** Unit outward normal of the ellipsoid's level surface through (u, l, p). Undefined at the centre. */
export function ellipsoidNormal({ centre, semiAxes }: Ellipsoid, u: number, l: number, p: number): Vector3 {
  const a = (u - centre[0]) / semiAxes[0] ** 2;
  const b = (l - centre[1]) / semiAxes[1] ** 2;
  const c = (p - centre[2]) / semiAxes[2] ** 2;
  const length = Math.hypot(a, b, c);
  return [a / length, b / length, c / length];
}

/**
 * Visits `count` points spread evenly by the Fibonacci lattice over the unit sphere and stretched onto an
 * ellipsoid, each with its outward area vector (mm²). The area vectors sum to zero up to the lattice's error.
 */
export function forEachFibonacciPoint(
  { centre, semiAxes }: Ellipsoid,
  count: number,
  visit: (u: number, l: number, p: number, areaU: number, areaL: number, areaP: number) => void,
): void {
  const [su, sl, sp] = semiAxes;
  const area = (su * sl * sp * 4 * Math.PI) / count;
  for (let i = 0; i < count; i++) {
    const z = 1 - (2 * (i + 0.5)) / count;
    const r = Math.sqrt(1 - z * z);
    const phi = (i + 0.5) * goldenAngle;
    const dl = r * Math.cos(phi);
    const dp = r * Math.sin(phi);
    visit(
      centre[0] + z * su,
      centre[1] + dl * sl,
      centre[2] + dp * sp,
      (z / su) * area,
      (dl / sl) * area,
      (dp / sp) * area,
    );
  }
}

/**
 * Body (Frank) directions of the heart axes u, l and p, as three orthonormal rows: body = u·row0 + l·row1 + p·row2.
 * Azimuth turns the long axis in the horizontal plane, elevation tips it down, roll turns the heart about it.
 */
export function heartToBodyRows(
  azimuthDeg: number,
  elevationDeg: number,
  rollDeg: number,
): readonly [Vector3, Vector3, Vector3] {
  const a = degToRad(azimuthDeg);
  const e = degToRad(elevationDeg);
  const g = degToRad(rollDeg);
  const u: Vector3 = [Math.cos(e) * Math.cos(a), Math.sin(e), -Math.cos(e) * Math.sin(a)];
  const l0: Vector3 = [Math.sin(a), 0, Math.cos(a)];
  const cross = crossProduct(u, l0);
  const sign = cross[1] > 0 ? 1 : -1;
  const mix = (cosL: number, cosP: number): Vector3 => [
    cosL * l0[0] + cosP * sign * cross[0],
    cosL * l0[1] + cosP * sign * cross[1],
    cosL * l0[2] + cosP * sign * cross[2],
  ];
  return [u, mix(Math.cos(g), Math.sin(g)), mix(-Math.sin(g), Math.cos(g))];
}

function crossProduct(a: Vector3, b: Vector3): Vector3 {
  return [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];
}
