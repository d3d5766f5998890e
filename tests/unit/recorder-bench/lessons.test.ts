import { describe, expect, it } from 'vitest';
import { renderStrip, type StripRecording } from '../../../shared/engine/render';
import { lessons, measureLesson, type Lesson } from '../../../shared/recorder-bench/lessons';
import { builtInSettings } from '../../../shared/recorder-bench/built-in-settings';

/*
 * The figures of the lessons measured once more, by code that shares nothing with the bench: whole strips rendered as a
 * user would get them, spikes as the difference to the same strip whose stimuli leave no mark on the surface.
 */

const lesson = (id: string): Lesson => {
  const found = lessons.find((one) => one.id === id);
  if (!found) throw new Error(`no lesson ${id}`);
  return found;
};

/** A setting of a lesson as a strip of its own. */
function recorded(one: Lesson, setting: number, surfaceSpikeMv?: number): StripRecording {
  const { parameters, settings } = one;
  const rightVentricularLead = { ...parameters.pacing.rightVentricularLead };
  if (surfaceSpikeMv !== undefined) rightVentricularLead.surfaceSpikeMv = surfaceSpikeMv;
  return renderStrip({
    ...parameters,
    pacing: { ...parameters.pacing, rightVentricularLead },
    recorder: settings[setting].recorder,
  });
}

/** What the stimuli alone leave in a lesson's lead, mV. */
function spikesAlone(one: Lesson, setting: number): { spikes: Float64Array; strip: StripRecording } {
  const strip = recorded(one, setting);
  const without = recorded(one, setting, 0).leads[one.lead];
  return { spikes: Float64Array.from(strip.leads[one.lead], (value, i) => value - without[i]), strip };
}

/** Greatest share of each stimulus that lies well inside the strip, mV. */
function heights(one: Lesson, setting: number): number[] {
  const { spikes, strip } = spikesAlone(one, setting);
  return strip.events.flatMap((event) => {
    if (event.type !== 'stimulus' || event.timeS > strip.parameters.durationS - 0.1) return [];
    const at = Math.round(event.timeS * strip.sampleRateHz);
    return [Math.max(...spikes.subarray(Math.max(0, at - 10), at + 15).map(Math.abs))];
  });
}

const mean = (values: ArrayLike<number>): number =>
  Array.from(values).reduce((sum, value) => sum + value, 0) / values.length;

/** Level of a lead over a time, mV. */
function level(strip: StripRecording, lead: Lesson['lead'], fromS: number, toS: number): number {
  const { sampleRateHz, leads } = strip;
  return mean(leads[lead].subarray(Math.round(fromS * sampleRateHz), Math.round(toS * sampleRateHz)));
}

/** Stimulus and end of QRS of the beats that lie whole in a strip, s. */
function paced(strip: StripRecording): { startS: number; endS: number }[] {
  return strip.reading.beats.flatMap(({ timeS, stimulusTimesS, stimulusToQrsEndMs, qrsDurationMs }) => {
    const startS = stimulusTimesS[0] ?? timeS;
    const endS = startS + (stimulusToQrsEndMs ?? qrsDurationMs ?? NaN) / 1000;
    return startS > 0.1 && endS < strip.parameters.durationS - 0.3 ? [{ startS, endS }] : [];
  });
}

const figures = (text: string): number[] =>
  [...text.replaceAll('−', '-').matchAll(/[+-]?\d+(?:\.\d+)?/gu)].map(([one]) => Number(one));
const said = (id: string): number[] => figures(measureLesson(lesson(id)).figure);

describe('the figures of the lessons', () => {
  it('stand in their texts as they stand in the list', () => {
    for (const one of lessons) {
      const { figure, text } = measureLesson(one);
      for (const value of figure.match(/[\d.]+/gu) ?? []) expect(text, one.id).toContain(value);
    }
  });

  it('spike: what the diagnostic and the monitor band leave of it', () => {
    const [wide, narrow] = [0, 1].map((setting) => mean(heights(lesson('spike-vanishes'), setting)));
    const [saidWide, saidNarrow] = said('spike-vanishes');
    // Two samples 2 ms apart may lie either side of the peak: a fifth, as the lesson on sampling says.
    expect(Math.abs(saidWide - wide)).toBeLessThan(0.2 * wide);
    expect(Math.abs(saidNarrow - narrow)).toBeLessThan(0.01);
    expect(saidWide).toBeGreaterThan(3 * saidNarrow);
  });

  it('sampling: with the band-limit all spikes are within a fifth of each other, without it they are not', () => {
    const limited = heights(lesson('aliasing'), 0);
    const spread = 1 - Math.min(...limited) / Math.max(...limited);
    expect(spread).toBeLessThan(0.25);
    const [least, most] = said('aliasing');
    expect(1 - least / most).toBeGreaterThan(0.9);
  });

  it('ST: moved by the low-cut as two strips of the same patient show', () => {
    const one = lesson('st-displaced');
    const [flat, cut] = [0, 1].map((setting) => recorded(one, setting));
    const at = (strip: StripRecording): number =>
      mean(
        paced(strip).map(
          ({ startS, endS }) =>
            level(strip, one.lead, endS + 0.08, endS + 0.083) -
            level(strip, one.lead, startS - 0.036, startS - 0.016),
        ),
      );
    expect(said('st-displaced')[0]).toBeCloseTo(at(cut) - at(flat), 1);
    expect(Math.abs(said('st-displaced')[0] - (at(cut) - at(flat)))).toBeLessThan(0.02);
  });

  it('notch: rings after the QRS by what two strips differ', () => {
    const one = lesson('notch-ringing');
    const [plain, notched] = [0, 1].map((setting) => recorded(one, setting));
    const rings = paced(plain).map(({ endS }) => {
      const [from, to] = [endS + 0.01, endS + 0.11].map((timeS) => Math.round(timeS * plain.sampleRateHz));
      const difference = plain.leads[one.lead].map((value, i) => value - notched.leads[one.lead][i]);
      return Math.max(...difference.subarray(from, to).map(Math.abs));
    });
    // µV; the strips here are quantised in steps of 5.
    expect(Math.abs(said('notch-ringing')[0] - 1000 * mean(rings))).toBeLessThan(6);
  });

  it('wander: how far the line before the beats moves, before and after', () => {
    const one = lesson('wander-removed');
    const [wide, cut] = [0, 1].map((setting) => {
      const strip = recorded(one, setting);
      const levels = strip.reading.beats
        .map(({ timeS, stimulusTimesS }) => stimulusTimesS[0] ?? timeS)
        .filter((startS) => startS > 0.05)
        .map((startS) => level(strip, one.lead, startS - 0.036, startS - 0.016));
      return Math.max(...levels) - Math.min(...levels);
    });
    const [saidWide, saidCut] = said('wander-removed');
    expect(Math.abs(saidWide - wide)).toBeLessThan(0.02);
    expect(Math.abs(saidCut - cut)).toBeLessThan(0.02);
  });

  it('blanking: how long a unipolar spike stands above a tenth of a millivolt', () => {
    const one = lesson('spike-blanks');
    const widths = [0, 1].map((setting) => {
      const { spikes, strip } = spikesAlone(one, setting);
      const stimuli = strip.events.filter((event) => event.type === 'stimulus');
      const { timeS } = stimuli[1];
      const at = (afterS: number): number => Math.round((timeS + afterS) * strip.sampleRateHz);
      const line = mean(spikes.subarray(at(-0.03), at(-0.02)));
      const high = spikes.subarray(at(-0.02), at(0.08)).filter((value) => Math.abs(value - line) > 0.1);
      return (1000 * high.length) / strip.sampleRateHz;
    });
    const [saidWide, saidNarrow] = said('spike-blanks');
    // One sample either way at each end.
    expect(Math.abs(saidWide - widths[0])).toBeLessThanOrEqual(4);
    expect(Math.abs(saidNarrow - widths[1])).toBeLessThanOrEqual(4);
  });

  it('follow the settings that stand on the bench', () => {
    for (const one of lessons) {
      const changed = { ...one, settings: one.settings.map(() => builtInSettings.custom) };
      expect(measureLesson(changed).figure, one.id).not.toBe(measureLesson(one).figure);
    }
  });
});
