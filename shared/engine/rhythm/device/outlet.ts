import type { PacingLead, PacingParameters } from '../../../parameters/strip-parameters';
import type { StimulusChamber } from '../../events';
import { chestThresholdMa, thresholdV } from '../capture';

/** Where a device stimulates: how strongly, and what of it is seen on the surface. */
export interface Outlet {
  chamber: StimulusChamber;
  output: number;
  threshold: number;
  amplitudeMv: number;
  widthMs: number;
}

/** Surface spike per volt, mV, by chamber and polarity (engine contract; chosen). */
const surfaceMvPerV = { atrium: 0.3, ventricle: 0.7 } as const;
const unipolarFactor = 8;
/** Volts a mA on a temporary lead: 500 Ω (within PP-31). */
const voltsPerMa = 0.5;

/** Size of a stimulus at the body surface, mV: as set, or from output and polarity. */
export function surfaceSpikeMv(chamber: StimulusChamber, lead: PacingLead, volts = lead.amplitudeV): number {
  if (lead.surfaceSpikeMv !== null) return lead.surfaceSpikeMv;
  const perVolt = chamber === 'atrium' ? surfaceMvPerV.atrium : surfaceMvPerV.ventricle;
  return volts * perVolt * (lead.polarity === 'unipolar' ? unipolarFactor : 1);
}

/** A permanent lead. */
export function leadOutlet(chamber: Exclude<StimulusChamber, 'chest'>, lead: PacingLead): Outlet {
  return {
    chamber,
    output: lead.amplitudeV,
    threshold: thresholdV(lead.captureThresholdV, lead.pulseWidthMs),
    amplitudeMv: surfaceSpikeMv(chamber, lead),
    widthMs: lead.pulseWidthMs,
  };
}

/** A temporary lead at the right lead's place, set in mA. */
export function transvenousOutlet({ rightVentricularLead: lead, transvenous }: PacingParameters): Outlet {
  return {
    chamber: 'rightVentricle',
    output: transvenous.outputMa,
    threshold: transvenous.captureThresholdMa,
    amplitudeMv: surfaceSpikeMv('rightVentricle', lead, voltsPerMa * transvenous.outputMa),
    widthMs: lead.pulseWidthMs,
  };
}

/** Pads on the chest. */
export function chestOutlet({ transcutaneous }: PacingParameters): Outlet {
  return {
    chamber: 'chest',
    output: transcutaneous.currentMa,
    threshold: chestThresholdMa(transcutaneous.captureThresholdMa, transcutaneous.pulseWidthMs),
    amplitudeMv: transcutaneous.artefactMv,
    widthMs: transcutaneous.pulseWidthMs,
  };
}

/** Outlets of the device: one for the atrium, and for the ventricles the first and, when both are paced, the second. */
export interface Outlets {
  atrium: Outlet;
  first: Outlet;
  second: Outlet | null;
}

export function outletsOf(pacing: PacingParameters): Outlets {
  const atrium = leadOutlet('atrium', pacing.atrialLead);
  if (pacing.source === 'transvenous') return { atrium, first: transvenousOutlet(pacing), second: null };
  if (pacing.source === 'transcutaneous') return { atrium, first: chestOutlet(pacing), second: null };
  const right = leadOutlet('rightVentricle', pacing.rightVentricularLead);
  const left = leadOutlet('leftVentricle', pacing.leftVentricularLead);
  if (pacing.ventricularChambers !== 'both') {
    return { atrium, first: pacing.ventricularChambers === 'left' ? left : right, second: null };
  }
  return pacing.interventricularDelayMs < 0
    ? { atrium, first: left, second: right }
    : { atrium, first: right, second: left };
}
