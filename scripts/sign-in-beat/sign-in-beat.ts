import { renderStrip } from '../../shared/engine/render';
import { stimulusLeadMv } from '../../shared/engine/stimulus/stimulus-artefact';
import { parseStripParameters } from '../../shared/parameters/parse';

/** AV sequential pacing from the apex, where lead III is plainest. */
const lead = 'III';
const strip = parseStripParameters({
  durationS: 3,
  patient: { atrialRhythm: 'arrest', avConduction: 'complete', rateVariabilityPercent: 0 },
  pacing: { source: 'implanted', mode: 'DDD', lowerRateBpm: 60 },
  recorder: { sampleRateHz: 250, bandwidth: { lowHz: 0.05, highHz: 100 } },
});

/** Samples in steps of the quantiser, stimuli with their height at the electrodes, and what the reading says. */
export function signInBeat() {
  const { leads, events, reading, sampleRateHz, resolutionUv } = renderStrip(strip);
  return {
    lead,
    sampleRateHz,
    stepMv: resolutionUv / 2000,
    samples: [...leads[lead]].map((value) => Math.round((2000 * value) / resolutionUv)),
    stimuli: events.flatMap((event) =>
      event.type === 'stimulus'
        ? [
            {
              timeS: event.timeS,
              chamber: event.chamber,
              heightMv: Number(stimulusLeadMv(event, lead).toFixed(3)),
            },
          ]
        : [],
    ),
    avMs: Math.round(reading.avIntervalMs ?? 0),
    qrsMs: Math.round(reading.qrsDurationMs ?? 0),
  };
}
