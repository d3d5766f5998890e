import type { StripEvent } from '../../events';
import type { Finding, ReadingFigures } from '../reading';
import { beatFindings } from './beats';
import { captureFindings } from './capture';
import { complexFindings } from './complexes';
import { injuryFindings } from './injury';
import { pacingFindings } from './pacing';
import { sensingFindings } from './sensing';

/** Sentences in the order in which a strip is read: stimuli, capture, sensing, beats, complexes, injury. */
export function findingsOf(events: readonly StripEvent[], reading: ReadingFigures): Finding[] {
  return [
    ...pacingFindings(reading),
    ...captureFindings(events, reading),
    ...sensingFindings(events, reading),
    ...beatFindings(events, reading),
    ...complexFindings(reading),
    ...injuryFindings(reading),
  ];
}
