import type { StimulusChamber } from '../engine/events';
import type { LeadName } from '../parameters/sheet';
import type { BeatKind } from './beat-kind';

/**
 * A term of the medical device nomenclature (ISO/IEEE 11073-10101, -10102): DICOM writes its code, HL7 aECG its name.
 */
export interface MdcTerm {
  code: string;
  name: string;
  meaning: string;
}

const term = (code: string, name: string, meaning: string): MdcTerm => ({ code, name, meaning });

/** Leads: DICOM PS3.16 CID 3001 (FM-47), HL7 aECG (FM-62). */
export const leadTerms: Readonly<Record<LeadName, MdcTerm>> = {
  I: term('2:1', 'MDC_ECG_LEAD_I', 'Lead I'),
  II: term('2:2', 'MDC_ECG_LEAD_II', 'Lead II'),
  III: term('2:61', 'MDC_ECG_LEAD_III', 'Lead III'),
  aVR: term('2:62', 'MDC_ECG_LEAD_AVR', 'aVR, augmented voltage, right'),
  aVL: term('2:63', 'MDC_ECG_LEAD_AVL', 'aVL, augmented voltage, left'),
  aVF: term('2:64', 'MDC_ECG_LEAD_AVF', 'aVF, augmented voltage, foot'),
  V1: term('2:3', 'MDC_ECG_LEAD_V1', 'Lead V1'),
  V2: term('2:4', 'MDC_ECG_LEAD_V2', 'Lead V2'),
  V3: term('2:5', 'MDC_ECG_LEAD_V3', 'Lead V3'),
  V4: term('2:6', 'MDC_ECG_LEAD_V4', 'Lead V4'),
  V5: term('2:7', 'MDC_ECG_LEAD_V5', 'Lead V5'),
  V6: term('2:8', 'MDC_ECG_LEAD_V6', 'Lead V6'),
};

/**
 * Beats: DICOM PS3.16 CID 3335, whose table names both. It gives 10:8704 to a defibrillation spike as well; the meaning
 * written beside the code tells which.
 */
export const beatTerms: Readonly<Record<BeatKind, MdcTerm>> = {
  normal: term('10:8208', 'MDC_ECG_BEAT_NORMAL', 'Normal beat (sinus beat, normal conduction)'),
  leftBundleBranchBlock: term('10:8464', 'MDC_ECG_BEAT_LBB_BLK_COMP', 'Left bundle branch block beat'),
  rightBundleBranchBlock: term('10:8496', 'MDC_ECG_BEAT_RBB_BLK_COMP', 'Right bundle branch block beat'),
  afterPrematureAtrial: term('10:8272', 'MDC_ECG_BEAT_ATR_P_C', 'Atrial premature contraction (beat)'),
  premature: term('10:8336', 'MDC_ECG_BEAT_V_P_C', 'Ventricular premature contraction beat'),
  junctionalEscape: term('10:8416', 'MDC_ECG_BEAT_JUNC_ESC', 'Junctional (nodal) escape beat'),
  ventricularEscape: term('10:8432', 'MDC_ECG_BEAT_V_ESC', 'Ventricular escape beat'),
  paced: term('10:8704', 'MDC_ECG_BEAT_PACED', 'Paced beat'),
  pacedFusion: term('10:8720', 'MDC_ECG_BEAT_PACED_FUS', 'Pacemaker Fusion beat'),
};

/** Pacing spikes by chamber: the same table. */
export const spikeTerms: Readonly<Record<StimulusChamber, MdcTerm>> = {
  atrium: term('10:4352', 'MDC_ECG_WAVP_PACE_ATR', 'atrium Antibradycardia pace spike'),
  rightVentricle: term('10:5376', 'MDC_ECG_WAVP_PACE_V_R', 'right ventricle Antibradycardia pace spike'),
  leftVentricle: term('10:5632', 'MDC_ECG_WAVP_PACE_V_L', 'left ventricle Antibradycardia pace spike'),
  chest: term('10:5888', 'MDC_ECG_WAVP_PACE_EXT', 'transthoracic Antibradycardia pace spike'),
};

/** The P wave: the same table. */
export const pWaveTerm: MdcTerm = term('10:256', 'MDC_ECG_WAVC_PWAVE', 'P wave');
