import type { StripEvent } from '../../shared/engine/events';
import { createRhythm } from '../../shared/engine/rhythm/rhythm';
import { parseStripParameters } from '../../shared/parameters/parse';
import type { StripParameters, StripParametersInput } from '../../shared/parameters/strip-parameters';
import { usPerS } from '../../shared/units';

/** Full parameters from a few. */
export function buildStrip(overrides: StripParametersInput = {}): StripParameters {
  return parseStripParameters(overrides);
}

/** A strip without chance: no variability. */
export function steadyStrip(overrides: StripParametersInput = {}): StripParameters {
  return buildStrip({ ...overrides, patient: { rateVariabilityPercent: 0, ...overrides.patient } });
}

/** The events of a strip, without its pre-roll and without a sample. */
export function eventsOf(parameters: StripParameters): StripEvent[] {
  const events = createRhythm(parameters).advance(Math.round(parameters.durationS * usPerS));
  return events.filter((event) => event.timeS >= 0);
}
