import { buildAreaWeights, type AreaWeights } from './area-weights';
import { buildConductionGraph, twinOffsets, type ConductionGraph } from './conduction-graph';
import { fascicles, fittedNodeCounts, type Fascicle, type NodeCounts } from './heart-model-data';
import { buildMuscleEdges } from './muscle-edges';
import { buildPurkinjeNetwork, fascicleSeeds, type PurkinjeNetwork } from './purkinje';
import type { Seed } from './shortest-path';
import { buildSurfaceNodes, type SurfaceNodes } from './surface-nodes';

/** Everything about the ventricles that no beat changes. */
export interface Ventricles {
  nodes: SurfaceNodes;
  weights: AreaWeights;
  graph: ConductionGraph;
  muscleEdgeCount: number;
  networks: Record<'lv' | 'rv', PurkinjeNetwork>;
  /** Vertices that each fascicle excites, times from the fascicle's own at unit speed factor. */
  fascicleSeeds: Record<Fascicle, Seed[]>;
}

/** Builds the ventricles. Counts other than the fitted ones are for convergence tests only. */
export function buildVentricles(counts: NodeCounts = fittedNodeCounts): Ventricles {
  const nodes = buildSurfaceNodes(counts);
  const networks = { lv: buildPurkinjeNetwork(nodes, 'lv'), rv: buildPurkinjeNetwork(nodes, 'rv') };
  const muscleEdges = buildMuscleEdges(nodes);
  const ordered = [networks.lv, networks.rv];
  const [lvOffset, rvOffset] = twinOffsets(nodes.count, ordered);
  const seedsOf = (fascicle: Fascicle): Seed[] => {
    const { network } = fascicles[fascicle];
    const offset = network === 'lv' ? lvOffset : rvOffset;
    return fascicleSeeds(networks[network], fascicle).map(({ twin, timeMs }) => ({
      vertex: offset + twin,
      timeMs,
    }));
  };
  return {
    nodes,
    weights: buildAreaWeights(nodes, counts),
    graph: buildConductionGraph(nodes.count, muscleEdges, ordered),
    muscleEdgeCount: muscleEdges.length,
    networks,
    fascicleSeeds: { LAF: seedsOf('LAF'), LSF: seedsOf('LSF'), LPF: seedsOf('LPF'), RBB: seedsOf('RBB') },
  };
}

let fitted: Ventricles | null = null;

/** The fitted ventricles, built at the first call in a process or worker and kept. */
export function fittedVentricles(): Ventricles {
  fitted ??= buildVentricles();
  return fitted;
}
