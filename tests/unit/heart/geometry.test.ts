import { describe, expect, it } from 'vitest';
import {
  ellipsoidLevel,
  ellipsoidNormal,
  forEachFibonacciPoint,
  heartToBodyRows,
} from '../../../shared/engine/heart/geometry';
import { ellipsoids, orientation, shellNames } from '../../../shared/engine/heart/heart-model-data';

describe('ellipsoids', () => {
  it.each(shellNames)(
    '%s: Fibonacci points lie on the surface, area vectors close and point outward',
    (shell) => {
      const ellipsoid = ellipsoids[shell];
      const sum = [0, 0, 0];
      let area = 0;
      forEachFibonacciPoint(ellipsoid, 2000, (u, l, p, au, al, ap) => {
        expect(ellipsoidLevel(ellipsoid, u, l, p)).toBeCloseTo(1, 9);
        const normal = ellipsoidNormal(ellipsoid, u, l, p);
        const size = Math.hypot(au, al, ap);
        expect((normal[0] * au + normal[1] * al + normal[2] * ap) / size).toBeCloseTo(1, 9);
        [au, al, ap].forEach((value, axis) => (sum[axis] += value));
        area += size;
      });
      expect(Math.hypot(...sum) / area).toBeLessThan(1e-4);
    },
  );

  it('gives a sphere its area', () => {
    let area = 0;
    forEachFibonacciPoint({ centre: [1, 2, 3], semiAxes: [10, 10, 10] }, 500, (_u, _l, _p, a, b, c) => {
      area += Math.hypot(a, b, c);
    });
    expect(area).toBeCloseTo(400 * Math.PI, 6);
  });
});

describe('heart axes in the body', () => {
  const rows = heartToBodyRows(orientation.azimuthDeg, orientation.elevationDeg, orientation.rollDeg);

  it('are the rows that the recipe prints for its angles', () => {
    const recipe = heartToBodyRows(47.809, 43, 1.98);
    const printed = [
      [0.49118, 0.682, -0.54187],
      [0.72464, 0.02527, 0.68866],
      [-0.48336, 0.73092, 0.48179],
    ];
    printed.forEach((row, i) => row.forEach((value, axis) => expect(recipe[i][axis]).toBeCloseTo(value, 4)));
  });

  it('are orthonormal', () => {
    for (let i = 0; i < 3; i++) {
      for (let j = 0; j < 3; j++) {
        const dot = rows[i].reduce((sum, value, axis) => sum + value * rows[j][axis], 0);
        expect(dot).toBeCloseTo(i === j ? 1 : 0, 12);
      }
    }
  });
});
