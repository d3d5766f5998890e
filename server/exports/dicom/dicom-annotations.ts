import type { NaturalDataset } from 'dcmjs';
import type { StripRecording } from '../../../shared/engine/render';
import { codedEvents, type CodedEvent } from '../../../shared/formats/coded-events';
import type { MdcTerm } from '../../../shared/formats/mdc-codes';
import { educationCaution, syntheticCaution } from '../../../shared/paper/cautions';
import { dicomText, shortTextBytes } from './dicom-text';

/** All channels of the first multiplex group. */
const wholeGroup = [1, 0];
const remarkGroup = 0;
const groups: Record<CodedEvent['kind'], number> = { stimulus: 1, ventricles: 2, atria: 3 };

/** A code sequence of one item in the scheme MDC. */
export function mdcCode({ code, meaning }: MdcTerm): NaturalDataset[] {
  return [{ CodeValue: code, CodingSchemeDesignator: 'MDC', CodeMeaning: meaning }];
}

function textItem(text: string, place: NaturalDataset): NaturalDataset {
  return { UnformattedTextValue: dicomText(text, shortTextBytes), ...place };
}

/**
 * The Waveform Annotation Sequence (PS3.3 C.10.10): cautions and title for the whole strip, then every event twice at
 * its sample, once coded (CID 3335) and once in words, in one annotation group a kind. Positions count from 1.
 */
export function dicomAnnotations(
  { events, parameters }: StripRecording,
  sampleRateHz: number,
  length: number,
): NaturalDataset[] {
  const remarks = [`${syntheticCaution}. ${educationCaution}`, parameters.title]
    .filter((text) => dicomText(text, shortTextBytes) !== '')
    .map((text) =>
      textItem(text, { ReferencedWaveformChannels: wholeGroup, AnnotationGroupNumber: remarkGroup }),
    );
  const items = codedEvents(events, parameters).flatMap(({ timeS, kind, term, words }) => {
    const place: NaturalDataset = {
      ReferencedWaveformChannels: wholeGroup,
      TemporalRangeType: 'POINT',
      ReferencedSamplePositions: Math.min(length, Math.round(timeS * sampleRateHz) + 1),
      AnnotationGroupNumber: groups[kind],
    };
    return [{ ConceptNameCodeSequence: mdcCode(term), ...place }, textItem(words, place)];
  });
  return [...remarks, ...items];
}
