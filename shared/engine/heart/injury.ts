import { leadNames } from '../../parameters/sheet';
import { twelveLeadRows } from '../leads';
import { activate, type ActivationPattern } from './activation';
import { sumDipole } from './dipole';
import { sumDepolarization } from './depolarization';
import { fascicles, injuryModel, type Fascicle, type InjuredTerritory } from './heart-model-data';
import { measureQrs, stDelayMs } from './loop-measures';
import { actionPotentialDurations } from './repolarization';
import type { VectorLoop } from './vector-loop';
import { fittedVentricles, type Ventricles } from './ventricles';

/** Injury of a territory by what a normally conducted beat would show of it. */
export interface Injury {
  territory: InjuredTerritory;
  /** Greatest native ST deviation 20 ms after J, mV. */
  stElevationMv: number;
}

/** Below this multiple of the healthy ST deviation, injury grows in proportion instead of meeting the figure. */
const exactFrom = 2;

/** Share of the plateau that each node would lose at full strength: a bell around the centre. */
function injuryShape({ nodes }: Ventricles, territory: InjuredTerritory): Float64Array {
  const [u, l, p] = injuryModel.centres[territory];
  const { positions, count } = nodes;
  return Float64Array.from({ length: count }, (_, i) => {
    const distance = Math.hypot(positions[3 * i] - u, positions[3 * i + 1] - l, positions[3 * i + 2] - p);
    return Math.exp(-0.5 * (distance / injuryModel.radiusMm) ** 2);
  });
}

/** The ventricles with area vectors scaled by `share` of each node; nothing else changes. */
function withShares(ventricles: Ventricles, share: (node: number) => number): Ventricles {
  const { weights } = ventricles;
  return {
    ...ventricles,
    weights: { ...weights, body: weights.body.map((value, k) => value * share(Math.floor(k / 3))) },
  };
}

/** Lead values of a heart vector at one sample. */
function leadsAt(values: Float64Array, sample: number): number[] {
  const [x, y, z] = values.subarray(3 * sample, 3 * sample + 3);
  return leadNames.map((lead) => {
    const [cx, cy, cz] = twelveLeadRows[lead];
    return cx * x + cy * y + cz * z;
  });
}

/** ST of a normally conducted beat in all leads, healthy, and what full injury adds. */
function nativeSt(ventricles: Ventricles, shape: Float64Array): { healthy: number[]; added: number[] } {
  const pattern: ActivationPattern = {
    muscle: [],
    fascicles: (Object.keys(fascicles) as Fascicle[]).map((fascicle) => ({
      fascicle,
      timeMs: fascicles[fascicle].delayMs,
    })),
  };
  const activation = activate(ventricles, pattern);
  const durations = actionPotentialDurations(ventricles, activation, 1);
  const depolarization = sumDepolarization(ventricles, activation);
  const axis = (offset: number): Float64Array => depolarization.values.filter((_, k) => k % 3 === offset);
  const loop: Pick<VectorLoop, 'startMs' | 'x' | 'y' | 'z'> = {
    startMs: depolarization.startMs,
    x: axis(0),
    y: axis(1),
    z: axis(2),
  };
  const { offsetMs } = measureQrs(loop, activation);
  const trace = sumDipole(ventricles, activation, durations, 1);
  const lost = sumDipole(
    withShares(ventricles, (node) => -shape[node]),
    activation,
    durations,
    1,
  );
  const at = offsetMs + stDelayMs - trace.startMs;
  return { healthy: leadsAt(trace.values, at), added: leadsAt(lost.values, at) };
}

/** Greatest magnitude over the leads at a strength of injury. */
function greatest({ healthy, added }: { healthy: number[]; added: number[] }, strength: number): number {
  return Math.max(...healthy.map((value, i) => Math.abs(value + strength * added[i])));
}

/** Strength at which the greatest native ST is as wanted; the greatest of convex functions is solved by halving. */
function strengthFor(st: { healthy: number[]; added: number[] }, wantedMv: number): number {
  const least = exactFrom * greatest(st, 0);
  const target = Math.max(wantedMv, least);
  let low = 0;
  let high = 1;
  while (greatest(st, high) < target) high *= 2;
  for (let i = 0; i < 50; i++) {
    const middle = (low + high) / 2;
    if (greatest(st, middle) < target) low = middle;
    else high = middle;
  }
  return (high * wantedMv) / target;
}

const injured = new Map<string, Ventricles>();
/** Injured ventricles kept at most; each takes as much as the area vectors. */
const keptInjuries = 8;

/**
 * Ventricles of which a territory contributes less: each injured node's action potential is lowered by its share, so
 * that ST of every activation follows from the same lost plateau.
 */
export function injuredVentricles({ territory, stElevationMv }: Injury): Ventricles {
  const key = `${territory}:${stElevationMv}`;
  const known = injured.get(key);
  if (known) return known;
  const ventricles = fittedVentricles();
  const shape = injuryShape(ventricles, territory);
  const strength = strengthFor(nativeSt(ventricles, shape), stElevationMv);
  const made = withShares(ventricles, (node) => 1 - strength * shape[node]);
  if (injured.size >= keptInjuries) injured.delete([...injured.keys()][0]);
  injured.set(key, made);
  return made;
}
