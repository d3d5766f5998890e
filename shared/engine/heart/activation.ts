import { conduction, muscleSites, type Fascicle, type MuscleSite } from './heart-model-data';
import { muscleTimeMs } from './muscle-edges';
import { earliestArrival, type Seed } from './shortest-path';
import type { SurfaceNodes } from './surface-nodes';
import type { Ventricles } from './ventricles';

/** Where and when activation starts: places in muscle and exits of the conduction system, ms on one clock. */
export interface ActivationPattern {
  muscle: { site: MuscleSite; timeMs: number }[];
  fascicles: { fascicle: Fascicle; timeMs: number }[];
}

/** Activation of every muscle node by one pattern. */
export interface Activation {
  /** ms, by node. */
  timesMs: Float64Array;
  earliestMs: number;
  latestMs: number;
}

/** Nodes that a muscle site excites directly: all within the seed radius of the exact place, or else the nearest. */
function muscleSeeds({ count, positions, normals }: SurfaceNodes, site: MuscleSite): Seed[] {
  const [su, sl, sp] = muscleSites[site];
  const distances = Float64Array.from({ length: count }, (_, i) =>
    Math.hypot(positions[3 * i] - su, positions[3 * i + 1] - sl, positions[3 * i + 2] - sp),
  );
  const reach = Math.max(Math.min(...distances), conduction.muscleSeedRadiusMm);
  const seeds: Seed[] = [];
  for (let i = 0; i < count; i++) {
    if (distances[i] > reach) continue;
    const at = 3 * i;
    const timeMs = muscleTimeMs(
      positions[at] - su,
      positions[at + 1] - sl,
      positions[at + 2] - sp,
      normals[at],
      normals[at + 1],
      normals[at + 2],
      conduction.transmuralSpeed,
    );
    seeds.push({ vertex: i, timeMs });
  }
  return seeds;
}

/**
 * Activation times of the muscle nodes.
 *
 * @param speedFactor divides conduction times in muscle and Purkinje network and on the way back into it; source
 *   times and the 3 ms from network to muscle stay
 * @throws when the pattern has no source
 */
export function activate(ventricles: Ventricles, pattern: ActivationPattern, speedFactor = 1): Activation {
  if (pattern.muscle.length + pattern.fascicles.length === 0) {
    throw new Error('an activation pattern needs at least one source');
  }
  const seeds: Seed[] = [];
  const add = (places: readonly Seed[], timeMs: number): void => {
    for (const place of places) {
      seeds.push({ vertex: place.vertex, timeMs: timeMs + place.timeMs / speedFactor });
    }
  };
  for (const { site, timeMs } of pattern.muscle) add(muscleSeeds(ventricles.nodes, site), timeMs);
  for (const { fascicle, timeMs } of pattern.fascicles) add(ventricles.fascicleSeeds[fascicle], timeMs);
  const timesMs = earliestArrival(ventricles.graph, seeds, speedFactor).slice(0, ventricles.nodes.count);
  let earliestMs = Infinity;
  let latestMs = -Infinity;
  for (const time of timesMs) {
    if (time < earliestMs) earliestMs = time;
    if (time > latestMs) latestMs = time;
  }
  return { timesMs, earliestMs, latestMs };
}
