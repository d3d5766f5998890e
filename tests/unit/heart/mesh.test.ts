import { describe, expect, it } from 'vitest';
import type { Wall } from '../../../shared/engine/heart/heart-model-data';
import { nearestNeighbours, symmetricPairs } from '../../../shared/engine/heart/nearest-neighbours';
import { classifyPoint } from '../../../shared/engine/heart/surface-nodes';
import { fittedVentricles } from '../../../shared/engine/heart/ventricles';

const { nodes, weights, graph, networks, muscleEdgeCount } = fittedVentricles();

describe('mesh of model version 2', () => {
  // Counts of the recipe; they settle the reading of every geometric rule.
  it('has 1332 nodes, by wall', () => {
    const counts: Partial<Record<Wall, number>> = {};
    for (const wall of nodes.walls) counts[wall] = (counts[wall] ?? 0) + 1;
    expect(nodes.count).toBe(1332);
    expect(counts).toEqual({
      lvEndo: 263,
      lvMid: 255,
      lvEpi: 246,
      rvSeptalEndo: 93,
      rvEndo: 193,
      insertion: 20,
      rvEpi: 222,
      lvBase: 40,
    });
    expect(nodes.septal.reduce((sum, flag) => sum + flag, 0)).toBe(220);
  });

  it('has 16164 muscle edges, 255 and 257 twins, 38972 directed edges on 1844 vertices', () => {
    expect(muscleEdgeCount).toBe(16164);
    expect(networks.lv.muscleNode).toHaveLength(255);
    expect(networks.rv.muscleNode).toHaveLength(257);
    expect(graph.vertexCount).toBe(1844);
    expect(graph.target).toHaveLength(38972);
  });

  it('is closed, after removing 2.14 % of the area', () => {
    expect(weights.closureResidual).toBeCloseTo(0.0214, 4);
    for (let axis = 0; axis < 3; axis++) {
      let sum = 0;
      for (let i = axis; i < weights.body.length; i += 3) sum += weights.body[i];
      expect(Math.abs(sum)).toBeLessThan(1e-9 * weights.areaSum);
    }
  });

  it('gives every fine point the nearest node: each weighted shell carries area on every node', () => {
    nodes.walls.forEach((wall, i) => {
      if (wall === 'lvMid') expect(weights.area[i]).toBe(0);
      else if (wall !== 'insertion') expect(weights.area[i], `${wall} ${i}`).toBeGreaterThan(1);
    });
  });

  it('has unit normals', () => {
    for (let i = 0; i < nodes.count; i++) {
      expect(Math.hypot(...nodes.normals.subarray(3 * i, 3 * i + 3))).toBeCloseTo(1, 12);
    }
  });

  it('leaves a conus anteriorly and cuts the left ventricle at its base', () => {
    expect(classifyPoint('lvEndo', -22, 0, 0)).toBeNull();
    expect(classifyPoint('lvEndo', -21.9, 0, 0)).toBe('lvEndo');
    expect(classifyPoint('rvEpi', -35, -30, -40)).toBe('rvEpi');
    expect(classifyPoint('rvEpi', -35, -30, 30)).toBeNull();
  });

  it('joins the two Purkinje networks only through muscle', () => {
    const lvEnd = nodes.count + networks.lv.muscleNode.length;
    for (let v = nodes.count; v < lvEnd; v++) {
      for (let e = graph.firstEdge[v]; e < graph.firstEdge[v + 1]; e++) {
        expect(graph.target[e]).toBeLessThan(lvEnd);
      }
    }
  });
});

describe('nearest neighbours', () => {
  it('finds the nearest within the distance, nearest first', () => {
    const positions = Float64Array.from([0, 0, 0, 1, 0, 0, 3, 0, 0, 100, 0, 0]);
    expect(nearestNeighbours(positions, 2)).toEqual([
      [1, 2],
      [0, 2],
      [1, 0],
      [2, 1],
    ]);
    expect(nearestNeighbours(positions, 2, 2)).toEqual([[1], [0, 2], [1], []]);
  });

  it('keeps a pair once, whichever point names the other', () => {
    expect(symmetricPairs([[1], [0, 2], [], [2]])).toEqual([
      [0, 1],
      [1, 2],
      [2, 3],
    ]);
  });
});
