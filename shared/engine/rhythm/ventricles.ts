import type { PacingParameters, PatientParameters } from '../../parameters/strip-parameters';
import { msToUs, usToS } from '../../units';
import type {
  ActivationSource,
  VentricularDepolarization,
  VentricularOrigin,
  VentricularSourceSite,
} from '../events';
import { ventricularDelayMs } from './local-activation';
import { refractoryMs } from './capture';

const refractoryUs = msToUs(refractoryMs.ventricle);
/** QRS within which a stimulus that changes nothing is pseudofusion, ms: narrow and wide. */
const narrowQrsUs = msToUs(100);
const wideQrsUs = msToUs(150);

/** The ventricles: when they were last activated, and when the wave reaches each lead. Times in µs. */
export interface Ventricles {
  /** Whether an impulse from the node or a focus can start a beat. */
  isExcitable(timeUs: number): boolean;
  /** When the last wave reaches a lead; −∞ before the first. */
  localUs(lead: 'right' | 'left'): number;
  /** Starts a new depolarization from one or two sources. */
  depolarize(
    origin: VentricularOrigin,
    sources: readonly { site: VentricularSourceSite; timeUs: number }[],
  ): VentricularDepolarization;
  /** A stimulus joins the wave that is under way: fusion unless that beat was paced. */
  join(site: VentricularSourceSite, timeUs: number): void;
  /** Whether a stimulus that captured nothing lies in the QRS of an intrinsic beat. */
  isPseudofusion(timeUs: number): boolean;
}

export function createVentricles(patient: PatientParameters, pacing: PacingParameters): Ventricles {
  const sites = { right: pacing.rightVentricularLead.site, left: pacing.leftVentricularLead.site };
  let onsetUs = -Infinity;
  let last: VentricularDepolarization | null = null;
  const local = { right: -Infinity, left: -Infinity };

  const arrival = (lead: 'right' | 'left', source: { site: VentricularSourceSite; timeUs: number }): number =>
    source.timeUs + msToUs(ventricularDelayMs(source.site, lead, sites, patient.bundleBranchBlock));
  const asSource = ({
    site,
    timeUs,
  }: {
    site: VentricularSourceSite;
    timeUs: number;
  }): ActivationSource<VentricularSourceSite> => ({
    site,
    timeS: usToS(timeUs),
  });
  const isNarrow = (event: VentricularDepolarization): boolean =>
    patient.bundleBranchBlock === 'none' &&
    (event.origin === 'conducted' || event.origin === 'junctionalEscape');

  return {
    isExcitable: (timeUs) => timeUs >= onsetUs + refractoryUs,
    localUs: (lead) => local[lead],
    depolarize(origin, sources) {
      onsetUs = Math.min(...sources.map((source) => source.timeUs));
      for (const lead of ['right', 'left'] as const) {
        local[lead] = Math.min(...sources.map((source) => arrival(lead, source)));
      }
      last = {
        type: 'depolarization',
        timeS: usToS(onsetUs),
        chamber: 'ventricle',
        origin,
        sources: sources.map(asSource),
        fusion: sources.length > 1,
      };
      return last;
    },
    join(site, timeUs) {
      if (!last) throw new Error('no depolarization to join');
      last.sources.push(asSource({ site, timeUs }));
      last.sources.sort((a, b) => a.timeS - b.timeS);
      if (last.origin !== 'paced') last.fusion = true;
      for (const lead of ['right', 'left'] as const) {
        local[lead] = Math.min(local[lead], arrival(lead, { site, timeUs }));
      }
    },
    isPseudofusion(timeUs) {
      if (!last || last.origin === 'paced') return false;
      return timeUs < onsetUs + (isNarrow(last) ? narrowQrsUs : wideQrsUs);
    },
  };
}
