import type { StripEvent } from '../../engine/events';
import { usPerS } from '../../units';
import { annotatedEvents, eventWords } from '../event-words';
import { utf8Bytes } from '../utf8';

/** Marks of a time-stamped annotation list (FM-13): end of a time or text, start of a duration, end of the list. */
const endOfPart = 0x14;
const startOfDuration = 0x15;
const endOfList = 0x00;

export interface EdfAnnotation {
  /** From the start of the file. */
  onsetUs: number;
  durationUs?: number;
  text: string;
}

/** Stimuli and depolarizations in words, each at its time to the microsecond. */
export function eventAnnotations(events: readonly StripEvent[]): EdfAnnotation[] {
  return annotatedEvents(events).map((event) => ({
    onsetUs: Math.round(event.timeS * usPerS),
    text: eventWords(event),
  }));
}

/** Whole microseconds as seconds, as short as they can be written. */
function secondsText(us: number): string {
  const whole = Math.floor(us / usPerS);
  const rest = String(us % usPerS)
    .padStart(6, '0')
    .replace(/0+$/u, '');
  return rest === '' ? String(whole) : `${whole}.${rest}`;
}

/** Text without the control characters that end lists and parts. */
function printable(text: string): string {
  return text.replace(/[\p{Cc}\s]+/gu, ' ');
}

/** One time-stamped annotation list. An annotation without text keeps the time of a record (FM-14). */
export function annotationList({ onsetUs, durationUs, text }: EdfAnnotation): Uint8Array {
  const onset = utf8Bytes(`+${secondsText(onsetUs)}`);
  const duration = durationUs === undefined ? [] : [startOfDuration, ...utf8Bytes(secondsText(durationUs))];
  return Uint8Array.from([
    ...onset,
    ...duration,
    endOfPart,
    ...utf8Bytes(printable(text)),
    endOfPart,
    endOfList,
  ]);
}

/** The lists of every record: its time first, then the annotations that begin in it, in time order. */
export function recordLists(
  annotations: readonly EdfAnnotation[],
  recordUs: number,
  recordCount: number,
): Uint8Array[][] {
  const lists = Array.from({ length: recordCount }, (_, k) => [
    annotationList({ onsetUs: k * recordUs, text: '' }),
  ]);
  for (const annotation of [...annotations].sort((a, b) => a.onsetUs - b.onsetUs)) {
    const record = Math.min(recordCount - 1, Math.floor(annotation.onsetUs / recordUs));
    lists[record].push(annotationList(annotation));
  }
  return lists;
}
