import type { StripEvent } from '../../engine/events';
import type { StripParameters } from '../../parameters/strip-parameters';
import { syntheticCaution } from '../../paper/cautions';
import { beatSorter, type BeatKind } from '../beat-kind';
import { annotatedEvents, eventWords, type AnnotatedEvent } from '../event-words';
import { asciiBytes } from '../utf8';

/** Codes of the published table (FM-29; annot(5), ecgcodes.h). */
export const wfdbCodes = {
  /** `"`: a comment; here a stimulus that captured, for which the table has no code. */
  note: 22,
  /** `^`: a pacer spike that is not conducted. */
  spikeWithoutCapture: 26,
  /** `(`: the onset of a wave; here of a P wave. */
  waveOnset: 39,
} as const;

/** Beat codes of the same table. */
export const wfdbBeatCodes: Readonly<Record<BeatKind, number>> = {
  normal: 1,
  leftBundleBranchBlock: 2,
  rightBundleBranchBlock: 3,
  premature: 5,
  afterPrematureAtrial: 8,
  ventricularEscape: 10,
  junctionalEscape: 11,
  paced: 12,
  pacedFusion: 38,
};

/** Words of the format that are no annotations (FM-28). */
const skip = 59;
const channelWord = 62;
const auxiliary = 63;
/** Longest interval of an annotation word: ten bits (FM-27). */
const longestInterval = 1023;

/** Annotations of one sample must differ in channel; these tell besides what they speak of. */
export const wfdbChannels = { ventricles: 0, atria: 1, stimulus: 2 } as const;
/** Stimuli of a sample follow each other from here: atrium, right ventricle or chest, left ventricle. */
const stimulusChannel = { atrium: 0, rightVentricle: 1, chest: 1, leftVentricle: 2 } as const;
const remarkChannel = 5;

export interface WfdbAnnotation {
  sample: number;
  code: number;
  channel: number;
  text: string;
}

function channelOf(event: AnnotatedEvent): number {
  if (event.type === 'stimulus') return wfdbChannels.stimulus + stimulusChannel[event.chamber];
  return event.chamber === 'atrium' ? wfdbChannels.atria : wfdbChannels.ventricles;
}

/**
 * The annotations of a strip in order of sample and channel: the caution, every QRS with its beat code, every P wave as
 * a wave's onset, stimuli without capture as `^` and with capture as comments. Each carries its words. Times are
 * rounded to the nearest sample of the strip.
 */
export function wfdbAnnotations(
  events: readonly StripEvent[],
  parameters: StripParameters,
  sampleRateHz: number,
  length: number,
): WfdbAnnotation[] {
  const kindOf = beatSorter(events, parameters);
  const codeOf = (event: AnnotatedEvent): number => {
    if (event.type === 'stimulus') return event.captured ? wfdbCodes.note : wfdbCodes.spikeWithoutCapture;
    return event.chamber === 'atrium' ? wfdbCodes.waveOnset : wfdbBeatCodes[kindOf(event)];
  };
  const annotations = annotatedEvents(events).map((event) => ({
    sample: Math.min(length - 1, Math.round(event.timeS * sampleRateHz)),
    code: codeOf(event),
    channel: channelOf(event),
    text: eventWords(event),
  }));
  const remark = { sample: 0, code: wfdbCodes.note, channel: remarkChannel, text: syntheticCaution };
  return [remark, ...annotations].sort((a, b) => a.sample - b.sample || a.channel - b.channel);
}

/** A 16-bit word: six bits of code, ten of interval, low byte first (FM-27). */
function word(code: number, interval: number): [number, number] {
  return [interval & 0xff, (code << 2) | (interval >> 8)];
}

/** An interval too long for a word: 32 bits, high half first, each half low byte first (FM-28). */
function skipBytes(interval: number): number[] {
  const high = interval >>> 16;
  return [...word(skip, 0), high & 0xff, high >>> 8, interval & 0xff, (interval >>> 8) & 0xff];
}

/** Text after an annotation: its length, its bytes, one more when they are odd in number. */
function auxiliaryBytes(text: string): number[] {
  const bytes = asciiBytes(text);
  return [...word(auxiliary, bytes.length), ...bytes, ...(bytes.length % 2 === 1 ? [0] : [])];
}

/** Annotations, which must be in order, in MIT format (annot(5)). Texts are ASCII of at most 255 bytes. */
export function encodeWfdbAnnotations(annotations: readonly WfdbAnnotation[]): Uint8Array {
  const bytes: number[] = [];
  let sample = 0;
  let channel = 0;
  for (const annotation of annotations) {
    const interval = annotation.sample - sample;
    if (interval > longestInterval) bytes.push(...skipBytes(interval));
    bytes.push(...word(annotation.code, interval > longestInterval ? 0 : interval));
    // The channel holds until the next word that changes it.
    if (annotation.channel !== channel) bytes.push(...word(channelWord, annotation.channel));
    if (annotation.text !== '') bytes.push(...auxiliaryBytes(annotation.text));
    ({ sample, channel } = annotation);
  }
  bytes.push(0, 0);
  return Uint8Array.from(bytes);
}
