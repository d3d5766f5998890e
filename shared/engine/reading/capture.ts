import type { StimulusChamber, StimulusEvent, StripEvent } from '../events';

const leadChambers = ['atrium', 'rightVentricle', 'leftVentricle'] as const satisfies StimulusChamber[];
const stimulusChambers = [...leadChambers, 'chest'] as const satisfies StimulusChamber[];

export type CaptureState = 'all' | 'intermittent' | 'none' | 'notPaced';
/**
 * null: every stimulus met refractory tissue, so capture cannot be assessed. The chest is there only where it is
 * stimulated.
 */
export type CaptureByChamber = Record<(typeof leadChambers)[number], CaptureState | null> & {
  chest?: CaptureState | null;
};

export function stimuliOf(events: readonly StripEvent[], chamber: StimulusChamber): StimulusEvent[] {
  return events.filter(
    (event): event is StimulusEvent => event.type === 'stimulus' && event.chamber === chamber,
  );
}

/** Stimuli that could have captured: one in refractory tissue says nothing about the threshold. */
export function assessable(stimuli: readonly StimulusEvent[]): StimulusEvent[] {
  return stimuli.filter((stimulus) => stimulus.reason !== 'refractoryTissue');
}

function captureState(stimuli: readonly StimulusEvent[]): CaptureState | null {
  if (stimuli.length === 0) return 'notPaced';
  const judged = assessable(stimuli);
  if (judged.length === 0) return null;
  const captured = judged.filter((stimulus) => stimulus.captured).length;
  if (captured === judged.length) return 'all';
  return captured === 0 ? 'none' : 'intermittent';
}

/** Whether the stimuli of each chamber capture. */
export function captureByChamber(events: readonly StripEvent[]): CaptureByChamber {
  const state = (chamber: StimulusChamber): CaptureState | null => captureState(stimuliOf(events, chamber));
  const byLead = Object.fromEntries(
    leadChambers.map((chamber) => [chamber, state(chamber)]),
  ) as CaptureByChamber;
  return stimuliOf(events, 'chest').length > 0 ? { ...byLead, chest: state('chest') } : byLead;
}

/** Chambers that are stimulated, captured or not. */
export function pacedChambers(events: readonly StripEvent[]): StimulusChamber[] {
  return stimulusChambers.filter((chamber) => stimuliOf(events, chamber).length > 0);
}
