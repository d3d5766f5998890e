/**
 * The `k` nearest other points of every point, within `maxDistance` (mm), by exhaustive search with insertion into
 * a short sorted list; a point with fewer neighbours has a shorter list.
 *
 * @param positions three coordinates for each point
 * @returns neighbours[i]: point numbers, nearest first
 */
export function nearestNeighbours(positions: Float64Array, k: number, maxDistance = Infinity): number[][] {
  const count = positions.length / 3;
  const limit = maxDistance * maxDistance;
  const squares = new Float64Array(k);
  const ids = new Int32Array(k);
  const neighbours: number[][] = [];
  for (let i = 0; i < count; i++) {
    let held = 0;
    const [x, y, z] = positions.subarray(3 * i, 3 * i + 3);
    let worst = limit;
    for (let j = 0; j < count; j++) {
      if (j === i) continue;
      const dx = positions[3 * j] - x;
      const dy = positions[3 * j + 1] - y;
      const dz = positions[3 * j + 2] - z;
      const square = dx * dx + dy * dy + dz * dz;
      if (square > worst || (held === k && square === worst)) continue;
      let place = held < k ? held++ : k - 1;
      while (place > 0 && squares[place - 1] > square) {
        squares[place] = squares[place - 1];
        ids[place] = ids[place - 1];
        place--;
      }
      squares[place] = square;
      ids[place] = j;
      if (held === k) worst = squares[k - 1];
    }
    neighbours.push(Array.from(ids.subarray(0, held)));
  }
  return neighbours;
}

/** Undirected pairs (a < b) in which at least one is among the other's neighbours. */
export function symmetricPairs(neighbours: readonly number[][]): [number, number][] {
  const count = neighbours.length;
  const seen = new Set<number>();
  const pairs: [number, number][] = [];
  neighbours.forEach((list, i) => {
    for (const j of list) {
      const a = Math.min(i, j);
      const b = Math.max(i, j);
      const key = a * count + b;
      if (seen.has(key)) continue;
      seen.add(key);
      pairs.push([a, b]);
    }
  });
  return pairs;
}
