import type { StripRecording } from '../../engine/render';
import { educationCaution, syntheticCaution } from '../../paper/cautions';
import { usPerS } from '../../units';
import type { ExportOptions, ExportResult } from '../export-format';
import { shortNumber, sixteenBitLeads, sixteenBitWarnings, type LeadCounts } from '../sixteen-bit';
import { eventAnnotations, recordLists, type EdfAnnotation } from './edf-annotations';
import { edfHeader, patientField, prefiltering, recordingField, type EdfSignal } from './edf-header';
import { edfRange } from './edf-range';
import { edfRecords, type EdfRecords } from './edf-records';

/** Bytes of a sample (FM-04). */
const sampleBytes = 2;
/** Records made at a time. */
const recordsAtOnce = 60;
/** Years that the two digits of the start date can name (FM-10). */
const years = { first: 1985, last: 2084 };

/** The signal that holds the annotations (FM-12); its physical extremes must differ and mean nothing. */
function annotationSignal(samplesPerRecord: number): EdfSignal {
  return {
    label: 'EDF Annotations',
    transducer: '',
    dimension: '',
    physicalMin: '-1',
    physicalMax: '1',
    digitalMin: -32768,
    digitalMax: 32767,
    prefiltering: '',
    samplesPerRecord,
  };
}

/** A lead's signal, and what its header fields cannot say exactly. */
function leadSignal(
  counts: LeadCounts,
  { parameters }: StripRecording,
  samplesPerRecord: number,
): { signal: EdfSignal; warnings: string[] } {
  const range = edfRange(counts);
  const signal: EdfSignal = {
    label: `ECG ${counts.lead}`,
    transducer: 'none, synthetic',
    dimension: 'uV',
    physicalMin: `-${range.physicalMaxUv}`,
    physicalMax: range.physicalMaxUv,
    digitalMin: -range.digitalMax,
    digitalMax: range.digitalMax,
    prefiltering: prefiltering(parameters.recorder),
    samplesPerRecord,
  };
  const warnings = range.exact
    ? []
    : [`${counts.lead}: the header gives the step of ${counts.stepUv} µV as ${range.stepUv} µV`];
  return { signal, warnings };
}

/** What stands at the start of a strip, and at its end when the last record is padded. */
function stripAnnotations(recording: StripRecording, { padding }: EdfRecords): EdfAnnotation[] {
  const { parameters, leads, sampleRateHz, events } = recording;
  const start = [`${syntheticCaution}. ${educationCaution}`, parameters.title.trim()];
  const annotations = start
    .filter((text) => text !== '')
    .map((text): EdfAnnotation => ({ onsetUs: 0, text }));
  annotations.push(...eventAnnotations(events));
  if (padding > 0) {
    annotations.push({
      onsetUs: Math.round((leads.I.length / sampleRateHz) * usPerS),
      durationUs: Math.round((padding / sampleRateHz) * usPerS),
      text: 'Padding after the end of the strip',
    });
  }
  return annotations;
}

/** Records [from, to) as bytes: each lead's samples, the last one held where the strip has ended, then the lists. */
function recordBytes(
  leads: readonly LeadCounts[],
  lists: readonly Uint8Array[][],
  { samples }: EdfRecords,
  annotationBytes: number,
  [from, to]: readonly [number, number],
): Uint8Array {
  const perRecord = leads.length * samples * sampleBytes + annotationBytes;
  const bytes = new Uint8Array((to - from) * perRecord);
  const view = new DataView(bytes.buffer);
  for (let record = from; record < to; record++) {
    let at = (record - from) * perRecord;
    for (const { counts } of leads) {
      for (let i = record * samples; i < (record + 1) * samples; i++, at += sampleBytes) {
        view.setInt16(at, counts[Math.min(i, counts.length - 1)], true);
      }
    }
    for (const list of lists[record]) {
      bytes.set(list, at);
      at += list.length;
    }
  }
  return bytes;
}

function* edfParts(
  header: Uint8Array,
  { count }: EdfRecords,
  block: (span: readonly [number, number]) => Uint8Array,
): Generator<Uint8Array> {
  yield header;
  for (let from = 0; from < count; from += recordsAtOnce) {
    yield block([from, Math.min(count, from + recordsAtOnce)]);
  }
}

function metadataWarnings({ parameters }: StripRecording, recordingText: string, madeAt: Date): string[] {
  const warnings: string[] = [];
  const title = parameters.title.trim().replace(/\s+/gu, '_');
  if (title !== '' && !recordingText.endsWith(` ${title}`)) {
    warnings.push(
      'the title stands in the header cut or without accents; the first annotations hold all of it',
    );
  }
  const year = madeAt.getUTCFullYear();
  if (year < years.first || year > years.last) {
    warnings.push(`the start date's two digits name years from ${years.first} to ${years.last}, not ${year}`);
  }
  return warnings;
}

/**
 * A strip as one continuous EDF+ file (Kemp and Olivan 2003): twelve signals in µV with 16 bits, whose steps are the
 * quantiser's (half of it for aVR, aVL and aVF), and an annotation signal with the cautions, the title and every
 * stimulus and depolarization in words. Warnings: wider steps, clipping, padding, what the header cannot hold.
 */
export function encodeEdf(recording: StripRecording, { madeAt }: ExportOptions): ExportResult {
  const { sampleRateHz } = recording;
  const records = edfRecords(recording.leads.I.length, sampleRateHz);
  const leads = sixteenBitLeads(recording);
  const described = leads.map((lead) => leadSignal(lead, recording, records.samples));
  const recordUs = Math.round((records.samples / sampleRateHz) * usPerS);
  const lists = recordLists(stripAnnotations(recording, records), recordUs, records.count);
  const longest = Math.max(...lists.map((list) => list.reduce((sum, one) => sum + one.length, 0)));
  const annotationSamples = Math.ceil(longest / sampleBytes);
  const recordingText = recordingField(recording, madeAt);
  const header = edfHeader({
    patient: patientField(),
    recording: recordingText,
    madeAt,
    recordCount: records.count,
    recordS: records.samples / sampleRateHz,
    signals: [...described.map(({ signal }) => signal), annotationSignal(annotationSamples)],
  });
  const block = (span: readonly [number, number]): Uint8Array =>
    recordBytes(leads, lists, records, annotationSamples * sampleBytes, span);
  const padded = records.padding / sampleRateHz;
  return {
    files: [
      {
        name: 'strip.edf',
        mediaType: 'application/octet-stream',
        parts: edfParts(header, records, block),
        partCount: 1 + Math.ceil(records.count / recordsAtOnce),
      },
    ],
    warnings: [
      ...sixteenBitWarnings(leads),
      ...described.flatMap(({ warnings }) => warnings),
      ...(records.padding > 0
        ? [
            `the last record is filled with ${shortNumber(padded)} s of the last value, marked by an annotation`,
          ]
        : []),
      ...metadataWarnings(recording, recordingText, madeAt),
    ],
  };
}
