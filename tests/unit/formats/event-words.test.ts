import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { StripEvent } from '../../../shared/engine/events';
import { codedEvents } from '../../../shared/formats/coded-events';
import { annotatedEvents, eventWords } from '../../../shared/formats/event-words';
import { arbitraryRhythm } from '../../support/arbitrary-strips';
import { buildStrip, eventsOf } from '../../support/strips';

const beat = { type: 'depolarization' as const, timeS: 1, sources: [], fusion: false };

describe('events in words', () => {
  it.each<[Exclude<StripEvent, { type: 'marker' }>, string]>([
    [
      { type: 'stimulus', timeS: 0, chamber: 'rightVentricle', amplitudeMv: 1, widthMs: 0.4, captured: true },
      'Stimulus, right ventricle, captured',
    ],
    [
      {
        type: 'stimulus',
        timeS: 0,
        chamber: 'chest',
        amplitudeMv: 1,
        widthMs: 20,
        captured: false,
        reason: 'belowThreshold',
      },
      'Stimulus, chest pads, no capture, output below the threshold',
    ],
    [
      {
        type: 'stimulus',
        timeS: 0,
        chamber: 'leftVentricle',
        amplitudeMv: 1,
        widthMs: 0.4,
        captured: false,
        reason: 'refractoryTissue',
        pseudofusion: true,
      },
      'Stimulus, left ventricle, no capture, muscle refractory, pseudofusion',
    ],
    [{ ...beat, chamber: 'ventricle', origin: 'paced', fusion: true }, 'QRS, paced, fusion'],
    [{ ...beat, chamber: 'ventricle', origin: 'conducted', sensed: false }, 'QRS, conducted, not sensed'],
    [{ ...beat, chamber: 'ventricle', origin: 'junctionalEscape', sensed: true }, 'QRS, junctional escape'],
    [
      { ...beat, chamber: 'atrium', origin: 'sinus', blocked: 'inNode' },
      'P wave, sinus, blocked in the AV node',
    ],
    [{ ...beat, chamber: 'atrium', origin: 'retrograde', conductedFromS: 0.7 }, 'P wave, retrograde'],
  ])('%o', (event, words) => expect(eventWords(event)).toBe(words));

  it('name every stimulus and depolarization of any strip once, in order, in ASCII, with a term', () => {
    fc.assert(
      fc.property(arbitraryRhythm, (input) => {
        const parameters = buildStrip(input);
        const events = eventsOf(parameters);
        const coded = codedEvents(events, parameters);
        expect(coded.length).toBe(events.filter(({ type }) => type !== 'marker').length);
        annotatedEvents(events).forEach((event, i) => {
          const { timeS, term, words, kind } = coded[i];
          expect(timeS).toBe(event.timeS);
          expect(words).toMatch(/^[ -~]{3,255}$/);
          expect(term.name).toMatch(
            { stimulus: /^MDC_ECG_WAVP_PACE_/, ventricles: /^MDC_ECG_BEAT_/, atria: /^MDC_ECG_WAVC_PWAVE$/ }[
              kind
            ],
          );
          expect(words.includes('captured')).toBe(event.type === 'stimulus' && event.captured);
        });
      }),
      { numRuns: 60 },
    );
  });

  it('tell a beat after a premature P wave, and bundle branch block, from a normal one', () => {
    const parameters = buildStrip({ patient: { bundleBranchBlock: 'left' } });
    const p = { ...beat, chamber: 'atrium', origin: 'premature', timeS: 0.8 } as const;
    const conducted = { ...beat, chamber: 'ventricle', origin: 'conducted', conductedFromS: 0.8 } as const;
    const code = (events: StripEvent[], strip = parameters): string =>
      codedEvents(events, strip).at(-1)!.term.name;
    expect(code([p, conducted])).toBe('MDC_ECG_BEAT_ATR_P_C');
    expect(code([{ ...p, origin: 'sinus' }, conducted])).toBe('MDC_ECG_BEAT_LBB_BLK_COMP');
    expect(code([conducted], buildStrip())).toBe('MDC_ECG_BEAT_NORMAL');
    expect(code([{ ...conducted, fusion: true }])).toBe('MDC_ECG_BEAT_PACED_FUS');
  });
});
