import type { StripEvent } from '../engine/events';
import type { StripParameters } from '../parameters/strip-parameters';
import { beatSorter } from './beat-kind';
import { annotatedEvents, eventWords, type AnnotatedEvent } from './event-words';
import { beatTerms, pWaveTerm, spikeTerms, type MdcTerm } from './mdc-codes';

/** An event as formats with coded annotations write it. */
export interface CodedEvent {
  timeS: number;
  kind: 'stimulus' | 'ventricles' | 'atria';
  term: MdcTerm;
  words: string;
}

/** Stimuli and depolarizations in time order, each with its term and its words. */
export function codedEvents(events: readonly StripEvent[], parameters: StripParameters): CodedEvent[] {
  const kindOf = beatSorter(events, parameters);
  const coded = (event: AnnotatedEvent): Pick<CodedEvent, 'kind' | 'term'> => {
    if (event.type === 'stimulus') return { kind: 'stimulus', term: spikeTerms[event.chamber] };
    if (event.chamber === 'atrium') return { kind: 'atria', term: pWaveTerm };
    return { kind: 'ventricles', term: beatTerms[kindOf(event)] };
  };
  return annotatedEvents(events).map((event) => ({
    timeS: event.timeS,
    ...coded(event),
    words: eventWords(event),
  }));
}
