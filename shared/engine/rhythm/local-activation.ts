import type {
  AtrialLead,
  LeftVentricularLead,
  PatientParameters,
  RightVentricularLead,
} from '../../parameters/strip-parameters';
import type { AtrialSource, VentricularSourceSite } from '../events';

/**
 * When a lead is reached after a source's onset, ms: rounded from the heart model (timing-cycles rules, section 4).
 * This gap between surface onset and sensing makes fusion and pseudofusion possible.
 */
const conductedMs = {
  none: {
    apex: 15,
    septum: 40,
    outflow: 40,
    his: 45,
    leftBundle: 35,
    lateral: 50,
    posterolateral: 55,
    anterolateral: 45,
  },
  left: {
    apex: 10,
    septum: 35,
    outflow: 55,
    his: 60,
    leftBundle: 65,
    lateral: 130,
    posterolateral: 135,
    anterolateral: 95,
  },
  right: {
    apex: 75,
    septum: 50,
    outflow: 40,
    his: 45,
    leftBundle: 35,
    lateral: 50,
    posterolateral: 55,
    anterolateral: 45,
  },
} as const;

/** From the other ventricle's lead, by the left lead's site. */
const acrossMs = { lateral: 135, posterolateral: 145, anterolateral: 110 } as const;
/** From a ventricular escape or another ectopic focus, at any lead. */
const ectopicMs = 60;
/** From the chest pads, at the right lead. */
const chestMs = 10;
/** From a sinus-like P wave, and from one that comes up from the ventricles. */
const atrialMs = { appendage: 30, septum: 40, lateral: 15 } as const;
const retrogradeMs = { appendage: 45, septum: 15, lateral: 60 } as const;

export interface VentricularLeadSites {
  right: RightVentricularLead['site'];
  left: LeftVentricularLead['site'];
}

/** Delay from a ventricular source to the right or left lead, ms; 0 at the lead that captured. */
export function ventricularDelayMs(
  source: VentricularSourceSite,
  lead: 'right' | 'left',
  sites: VentricularLeadSites,
  bundleBranchBlock: PatientParameters['bundleBranchBlock'],
): number {
  switch (source) {
    case 'conducted':
    case 'junctionalEscape':
      return conductedMs[bundleBranchBlock][sites[lead]];
    case 'ventricularEscape':
    case 'premature':
      return ectopicMs;
    case 'chest':
      return lead === 'right' ? chestMs : acrossMs[sites.left];
    case 'rightVentricle':
      return lead === 'right' ? 0 : acrossMs[sites.left];
    case 'leftVentricle':
      return lead === 'left' ? 0 : acrossMs[sites.left];
  }
}

/** Delay from the onset of a P wave to the atrial lead, ms; 0 when the lead itself captured. */
export function atrialDelayMs(source: AtrialSource, site: AtrialLead['site']): number {
  if (source === 'atrium') return 0;
  return source === 'retrograde' ? retrogradeMs[site] : atrialMs[site];
}
