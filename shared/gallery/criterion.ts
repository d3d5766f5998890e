import type { LeadName } from '../parameters/sheet';
import type { SourceText } from './sources';

type Chamber = 'atrium' | 'rightVentricle' | 'leftVentricle' | 'chest';
type Origin = 'paced' | 'conducted' | 'premature' | 'junctionalEscape' | 'ventricularEscape';

/** Something that can be measured on a rendered strip: its samples, its events or the reading made from them. */
export type Measure =
  /** Stimuli on the strip, and the share of those in rested muscle that capture. */
  | `stimuli.${Chamber}`
  | `captured.${Chamber}`
  /** Stimuli that fail for a reason. */
  | 'lost.belowThreshold'
  | 'lost.fault'
  | 'lost.refractoryTissue'
  /** Beats of an origin; fused ones count apart. */
  | `beats.${Origin}`
  | 'beats.fusion'
  | 'beats.pseudofusion'
  | 'beats.unsensed'
  /** Stimuli that capture between 200 and 480 ms after the onset of a beat of the heart's own. */
  | 'beats.onT'
  /** P waves: all of them, those from below. */
  | 'pWaves'
  | 'pWaves.retrograde'
  | 'pWaves.perQrs'
  /** Markers of the device. */
  | 'markers.safetyPace'
  | 'markers.modeSwitchOn'
  | 'markers.crosstalk'
  | 'markers.oversensing'
  /** Intervals in ms: medians, and the spread and extremes of RR. */
  | 'ms.av'
  | 'ms.pToStimulus'
  | 'ms.interventricular'
  | 'ms.qrs'
  | 'ms.stimulusToQrs'
  | 'ms.pr'
  | 'ms.prGrowth'
  | 'ms.rrSpread'
  | 'ms.rrLongest'
  | 'ms.rrShortest'
  | 'rate.ventricular'
  | 'rate.atrial'
  | 'deg.axis'
  /** On the samples of the commonest kind of beat: net QRS, its R and S, ST 20 ms after it, T; spike peak to peak. */
  | `net.${LeadName}`
  | `r.${LeadName}`
  | `s.${LeadName}`
  | `st.${LeadName}`
  | `t.${LeadName}`
  | `spike.${LeadName}`
  /** Largest step of the baseline between beats, and root mean square between 45 and 55 Hz, mV. */
  | 'mv.wander'
  | 'mv.mains'
  /** Share of leads whose T opposes the QRS, of those in which both are large enough. */
  | 'share.discordant'
  /** 1 when the criterion is met, 0 when not. */
  | 'criteria.modified'
  | 'criteria.native';

/** What defines a preset: a measure within limits, and where the limits come from. */
export interface PresetCriterion {
  measure: Measure;
  min?: number;
  max?: number;
  source: SourceText;
}

/** A measure of at least this. */
export const atLeast = (measure: Measure, min: number, source: SourceText): PresetCriterion => ({
  measure,
  min,
  source,
});
/** A measure of at most this. */
export const atMost = (measure: Measure, max: number, source: SourceText): PresetCriterion => ({
  measure,
  max,
  source,
});
/** A measure within limits. */
export const within = (measure: Measure, min: number, max: number, source: SourceText): PresetCriterion => ({
  measure,
  min,
  max,
  source,
});
/** A measure that is exactly this. */
export const exactly = (measure: Measure, value: number, source: SourceText): PresetCriterion =>
  within(measure, value, value, source);
