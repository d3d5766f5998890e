import type { ActivationPattern } from './activation';
import { fascicles, type Fascicle, type MuscleSite } from './heart-model-data';

export type { ActivationPattern } from './activation';

/** Something that starts ventricular activation, `timeMs` on the event's clock (surface onset or stimulus). */
export type VentricularSource =
  | { kind: 'conducted' | 'junctionalEscape'; timeMs: number }
  | { kind: 'ventricularEscape' | 'premature' | 'chest'; timeMs: number }
  | {
      kind: 'rightVentricle';
      site: 'apex' | 'septum' | 'outflow' | 'his' | 'leftBundle';
      timeMs: number;
      /** Only for the site `his`. */
      hisCapture: 'selective' | 'nonselective';
    }
  | { kind: 'leftVentricle'; site: 'lateral' | 'posterolateral' | 'anterolateral'; timeMs: number };

export type BundleBranchBlock = 'none' | 'left' | 'right';

const leftFascicles = ['LAF', 'LSF', 'LPF'] as const satisfies readonly Fascicle[];
const allFascicles = [...leftFascicles, 'RBB'] as const satisfies readonly Fascicle[];

const rightSites = {
  apex: 'rvApex',
  septum: 'rvSept',
  outflow: 'rvOt',
} as const satisfies Record<string, MuscleSite>;
const leftSites = {
  lateral: 'lvLat',
  posterolateral: 'lvPostlat',
  anterolateral: 'lvAntlat',
} as const satisfies Record<string, MuscleSite>;
const escapeSite = 'lvInf' satisfies MuscleSite;
const prematureSite = 'rvOt' satisfies MuscleSite;
const chestSite = 'rvFree' satisfies MuscleSite;

/** Spike to conducted onset when the bundle alone is captured, ms: the middle of 35–45 (from memory). */
const selectiveHisDelayMs = 40;
/** Extra time of the fascicles after the stimulus when septal muscle is captured too, ms (tuned). */
const nonselectiveHisDelayMs = 35;
/** Left fascicles, and right bundle by the long way round, after a left bundle area stimulus, ms (tuned). */
const leftBundleDelayMs = 16;
const rightAfterLeftBundleMs = 33.01;

type FascicleStart = ActivationPattern['fascicles'][number];

function startFascicles(names: readonly Fascicle[], timeMs: number): FascicleStart[] {
  return names.map((fascicle) => ({ fascicle, timeMs: timeMs + fascicles[fascicle].delayMs }));
}

function patternOf(source: VentricularSource): ActivationPattern {
  const { timeMs } = source;
  const fromMuscle = (site: MuscleSite): ActivationPattern => ({ muscle: [{ site, timeMs }], fascicles: [] });
  switch (source.kind) {
    case 'conducted':
    case 'junctionalEscape':
      return { muscle: [], fascicles: startFascicles(allFascicles, timeMs) };
    case 'ventricularEscape':
      return fromMuscle(escapeSite);
    case 'premature':
      return fromMuscle(prematureSite);
    case 'chest':
      return fromMuscle(chestSite);
    case 'leftVentricle':
      return fromMuscle(leftSites[source.site]);
    case 'rightVentricle':
      break;
  }
  if (source.site === 'leftBundle') {
    const left = startFascicles(leftFascicles, timeMs + leftBundleDelayMs);
    const right = startFascicles(['RBB'], timeMs + rightAfterLeftBundleMs);
    return { ...fromMuscle('lbb'), fascicles: [...left, ...right] };
  }
  if (source.site !== 'his') return fromMuscle(rightSites[source.site]);
  if (source.hisCapture === 'selective') {
    return { muscle: [], fascicles: startFascicles(allFascicles, timeMs + selectiveHisDelayMs) };
  }
  return {
    ...fromMuscle('hisSept'),
    fascicles: startFascicles(allFascicles, timeMs + nonselectiveHisDelayMs),
  };
}

function isBlocked(fascicle: Fascicle, block: BundleBranchBlock): boolean {
  return block === 'left' ? fascicle !== 'RBB' : block === 'right' && fascicle === 'RBB';
}

/**
 * Model sources of a beat's abstract ones. A blocked bundle branch excites nothing, whether the impulse comes from
 * above or from a stimulus at the His bundle or the left bundle area: the block is taken as lying beyond the lead.
 * Several sources make one pattern; whichever front comes first decides.
 */
export function activationPattern(
  sources: readonly VentricularSource[],
  bundleBranchBlock: BundleBranchBlock,
): ActivationPattern {
  const patterns = sources.map(patternOf);
  return {
    muscle: patterns.flatMap(({ muscle }) => muscle),
    fascicles: patterns
      .flatMap((pattern) => pattern.fascicles)
      .filter(({ fascicle }) => !isBlocked(fascicle, bundleBranchBlock)),
  };
}
