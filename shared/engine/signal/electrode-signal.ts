import type { StripParameters } from '../../parameters/strip-parameters';
import { usPerS } from '../../units';
import type { StimulusEvent, StripEvent, VentricularDepolarization } from '../events';
import type { ComplexMeasures } from '../reading/complex';
import type { Rhythm } from '../rhythm/rhythm';
import { addStimulusArtefact, stimulusEndS } from '../stimulus/stimulus-artefact';
import { createHeartWaves, type HeartWave } from './heart-waves';
import { addWave, waveEndS, type SampleClock, type VectorWindow } from './wave-painter';

/** A loop may begin, and a pulse is averaged, this long before its event, s; events are fetched so far ahead. */
const lookAheadS = 0.05;

/**
 * The heart vector at the electrodes, without disturbance: waves of every depolarization and the artefact of
 * every stimulus, sampled on any clock, window after window.
 */
export interface ElectrodeSignal {
  /**
   * Fills `out` (cleared first) with samples [first, first + length) of a clock. Windows of one clock follow
   * each other; a new clock may start where an earlier one ended or later.
   *
   * @returns the events fetched for this window, in time order, each given out once
   */
  render(out: VectorWindow, clock: SampleClock, first: number, length: number): RenderedEvents;
}

export interface RenderedEvents {
  events: StripEvent[];
  /** Measured complex of each ventricular depolarization among `events`. */
  complexes: Map<VentricularDepolarization, ComplexMeasures>;
}

export function createElectrodeSignal(
  parameters: Pick<StripParameters, 'seed' | 'patient' | 'pacing' | 'waveform'>,
  rhythm: Rhythm,
): ElectrodeSignal {
  const heart = createHeartWaves(parameters);
  let waves: HeartWave[] = [];
  let stimuli: StimulusEvent[] = [];

  const take = (events: readonly StripEvent[]): RenderedEvents['complexes'] => {
    const complexes: RenderedEvents['complexes'] = new Map();
    for (const event of events) {
      if (event.type === 'stimulus') stimuli.push(event);
      if (event.type !== 'depolarization') continue;
      const heartWave = heart.waveOf(event);
      waves.push(heartWave);
      if (heartWave.chamber === 'ventricle') complexes.set(heartWave.event, heartWave.wave.measures);
    }
    return complexes;
  };

  return {
    render(out, clock, first, length) {
      const startS = clock.firstTimeS + first / clock.rateHz;
      const endS = clock.firstTimeS + (first + length) / clock.rateHz;
      const events = rhythm.advance(Math.ceil((endS + lookAheadS) * usPerS));
      const complexes = take(events);
      waves = waves.filter(({ wave, event }) => waveEndS(wave, event.timeS) >= startS);
      stimuli = stimuli.filter((stimulus) => stimulusEndS(stimulus) >= startS - lookAheadS);
      for (const axis of ['x', 'y', 'z'] as const) out[axis].fill(0, 0, length);
      for (const { wave, event } of waves) addWave(out, clock, first, length, wave, event.timeS);
      for (const stimulus of stimuli) addStimulusArtefact(out, clock, first, length, stimulus);
      return { events, complexes };
    },
  };
}
