/**
 * Events are the truth of a strip: what the patient's heart did, what the pacemaker did, and why.
 * They are plain data, in time order, and can be tested without a single sample.
 *
 * Times are seconds from the start of the strip; the rhythm keeps whole microseconds inside, so every
 * `timeS` is a multiple of 1e-6.
 */

/** A chamber that a stimulus is delivered to. `chest` is transcutaneous pacing. */
export type StimulusChamber = 'atrium' | 'rightVentricle' | 'leftVentricle';

/** Why a stimulus did not start a depolarization. */
export type CaptureFailure = 'refractoryTissue' | 'belowThreshold';

export interface StimulusEvent {
  type: 'stimulus';
  timeS: number;
  chamber: StimulusChamber;
  /** Size of the artefact at the body surface (magnitude of its heart vector), mV. */
  amplitudeMv: number;
  /** Programmed pulse width, ms. */
  widthMs: number;
  captured: boolean;
  /** Present exactly when `captured` is false. */
  reason?: CaptureFailure;
  /** The stimulus fell within the QRS of an intrinsic beat that it did not change. */
  pseudofusion?: true;
}

export type AtrialOrigin = 'sinus' | 'paced';
export type VentricularOrigin = 'conducted' | 'paced' | 'junctionalEscape' | 'ventricularEscape';

/** Where activation starts: a stimulated chamber, the conduction system, or a focus. */
export type SourceSite =
  | 'sinus'
  | 'atrium'
  | 'conducted'
  | 'rightVentricle'
  | 'leftVentricle'
  | 'junctionalEscape'
  | 'ventricularEscape';

export interface ActivationSource {
  site: SourceSite;
  timeS: number;
}

interface DepolarizationBase {
  type: 'depolarization';
  /** Surface onset: the earliest source's time. */
  timeS: number;
  /** In time order; at least one. */
  sources: ActivationSource[];
  /** The chamber was activated from an intrinsic and a paced source at once. */
  fusion: boolean;
}

export interface AtrialDepolarization extends DepolarizationBase {
  chamber: 'atrium';
  origin: AtrialOrigin;
}

export interface VentricularDepolarization extends DepolarizationBase {
  chamber: 'ventricle';
  origin: VentricularOrigin;
}

export type DepolarizationEvent = AtrialDepolarization | VentricularDepolarization;

/** What the pacemaker did or thought, in the words of timing cycles. */
export type MarkerCode =
  | 'atrialPace'
  | 'atrialSense'
  | 'atrialRefractorySense'
  | 'ventricularPace'
  | 'ventricularSense'
  | 'ventricularRefractorySense'
  | 'safetyPace'
  | 'modeSwitchOn'
  | 'modeSwitchOff';

export interface MarkerEvent {
  type: 'marker';
  /** The time of the sense (not the surface onset) or of the pace. */
  timeS: number;
  code: MarkerCode;
  /** What was sensed; only on senses. */
  cause?: 'depolarization' | 'crosstalk';
  /** A ventricular sense inside the crosstalk window. */
  window?: 'crosstalk';
  /** The mode now in force; only on mode switches. */
  mode?: string;
}

export type StripEvent = StimulusEvent | DepolarizationEvent | MarkerEvent;
