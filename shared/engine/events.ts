/**
 * Events are the truth of a strip: what the patient's heart did, what the pacemaker did, and why.
 * They are plain data, in time order, and can be tested without a single sample.
 *
 * Times are seconds from the start of the strip; the rhythm keeps whole microseconds inside, so every
 * `timeS` is a multiple of 1e-6.
 */

/** A chamber that a stimulus is delivered to. `chest` is transcutaneous pacing. */
export type StimulusChamber = 'atrium' | 'rightVentricle' | 'leftVentricle' | 'chest';

/** Why a stimulus did not start a depolarization. */
export type CaptureFailure = 'refractoryTissue' | 'belowThreshold' | 'fault';

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

export type AtrialOrigin =
  'sinus' | 'tachycardia' | 'flutter' | 'fibrillation' | 'paced' | 'premature' | 'retrograde';
export type VentricularOrigin =
  'conducted' | 'paced' | 'premature' | 'junctionalEscape' | 'ventricularEscape';

/** Where activation starts: a stimulated chamber, the conduction system, or a focus. */
export type AtrialSource = Exclude<AtrialOrigin, 'paced'> | 'atrium';
export type VentricularSourceSite =
  | 'conducted'
  | 'rightVentricle'
  | 'leftVentricle'
  | 'chest'
  | 'premature'
  | 'junctionalEscape'
  | 'ventricularEscape';
export type SourceSite = AtrialSource | VentricularSourceSite;

export interface ActivationSource<Site extends SourceSite = SourceSite> {
  site: Site;
  timeS: number;
}

interface DepolarizationBase<Site extends SourceSite> {
  type: 'depolarization';
  /** Surface onset: the earliest source's time. */
  timeS: number;
  /** In time order; at least one. */
  sources: ActivationSource<Site>[];
  /** The chamber was activated from an intrinsic and a paced source at once. */
  fusion: boolean;
  /**
   * Whether the device heard it: true or false when it reached the sensing lead in an alert window, absent when it did
   * not have to be sensed (its own pace, blanking, refractory period, a mode that does not sense the chamber).
   */
  sensed?: boolean;
}

/** Where an atrial impulse ended that never reached the ventricles: in the AV node, below it, or on an impulse from below. */
export type AvBlock = 'inNode' | 'belowNode' | 'collision';

export interface AtrialDepolarization extends DepolarizationBase<AtrialSource> {
  chamber: 'atrium';
  origin: AtrialOrigin;
  /** Onset of the ventricular beat that was conducted up; present exactly on retrograde P waves. */
  conductedFromS?: number;
  /** Present when the node stopped this impulse as it came; one that meets a later beat from below has none. */
  blocked?: AvBlock;
}

export interface VentricularDepolarization extends DepolarizationBase<VentricularSourceSite> {
  chamber: 'ventricle';
  origin: VentricularOrigin;
  /** Onset of the P wave that was conducted; present exactly with a `conducted` source. */
  conductedFromS?: number;
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

export type SenseCause = 'depolarization' | 'crosstalk' | 'oversensing';

export interface MarkerEvent {
  type: 'marker';
  /** The time of the sense (not the surface onset) or of the pace. */
  timeS: number;
  code: MarkerCode;
  /** What was sensed; only on senses. */
  cause?: SenseCause;
  /** A ventricular sense inside the crosstalk window. */
  window?: 'crosstalk';
  /** The mode now in force; only on mode switches. */
  mode?: string;
}

export type StripEvent = StimulusEvent | DepolarizationEvent | MarkerEvent;
