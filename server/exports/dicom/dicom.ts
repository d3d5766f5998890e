import { data, type NaturalDataset } from 'dcmjs';
import type { StripRecording } from '../../../shared/engine/render';
import type { SampledLeads } from '../../../shared/formats/csv';
import type { ExportOptions, ExportResult } from '../../../shared/formats/export-format';
import { halveRate } from '../../../shared/formats/halve-rate';
import { leadTerms } from '../../../shared/formats/mdc-codes';
import { sixteenBitLeads, sixteenBitWarnings, type LeadCounts } from '../../../shared/formats/sixteen-bit';
import { utcText } from '../../../shared/formats/utc';
import { syntheticCaution } from '../../../shared/paper/cautions';
import { bandLimits } from '../../../shared/parameters/recorder';
import type { RecorderParameters } from '../../../shared/parameters/strip-parameters';
import { stripUid } from '../deterministic-id';
import { dicomAnnotations, mdcCode } from './dicom-annotations';
import { dicomText, longStringBytes } from './dicom-text';

/** SOP classes (FM-40). */
const twelveLeadClass = '1.2.840.10008.5.1.4.1.1.9.1.1';
const generalClass = '1.2.840.10008.5.1.4.1.1.9.1.2';
/** Most samples a channel of a 12-lead ECG has, and the highest rate of both (FM-41, FM-43). */
export const twelveLeadSamples = 16_384;
const highestRateHz = 1000;
const explicitLittleEndian = '1.2.840.10008.1.2.1';
/** What stands where a sample has no value; counts never reach it. */
const paddingCount = -32768;
const sampleBits = 16;
/** Characters of a decimal string (DS). */
const significantDigits = 10;

function decimal(value: number): string {
  return String(Number(value.toPrecision(significantDigits)));
}

/** Filters of a channel; none are written when there are none. */
function filters({ bandwidth, mainsNotchHz }: RecorderParameters): NaturalDataset {
  const limits = bandLimits(bandwidth);
  return {
    ...(limits
      ? { FilterLowFrequency: decimal(limits.lowHz), FilterHighFrequency: decimal(limits.highHz) }
      : {}),
    ...(mainsNotchHz === 0 ? {} : { NotchFilterFrequency: decimal(mainsNotchHz) }),
  };
}

function channel({ lead, stepUv }: LeadCounts, recorder: RecorderParameters): NaturalDataset {
  return {
    ChannelLabel: lead,
    ChannelSourceSequence: mdcCode(leadTerms[lead]),
    ChannelSensitivity: decimal(stepUv),
    ChannelSensitivityUnitsSequence: [
      {
        CodeValue: 'uV',
        CodingSchemeDesignator: 'UCUM',
        CodingSchemeVersion: '1.4',
        CodeMeaning: 'microvolt',
      },
    ],
    ChannelSensitivityCorrectionFactor: '1',
    ChannelBaseline: '0',
    ChannelSampleSkew: '0',
    WaveformBitsStored: sampleBits,
    ...filters(recorder),
  };
}

/** Samples frame by frame, low byte first. */
function multiplexed(leads: readonly LeadCounts[]): ArrayBuffer {
  const { length } = leads[0].counts;
  const view = new DataView(new ArrayBuffer(length * leads.length * 2));
  leads.forEach(({ counts }, channelIndex) => {
    for (let i = 0; i < length; i++) view.setInt16(2 * (i * leads.length + channelIndex), counts[i], true);
  });
  return view.buffer;
}

/** One multiplex group of twelve channels. */
function waveform(
  leads: readonly LeadCounts[],
  sampleRateHz: number,
  recorder: RecorderParameters,
  originality: 'ORIGINAL' | 'DERIVED',
): NaturalDataset {
  return {
    WaveformOriginality: originality,
    NumberOfWaveformChannels: leads.length,
    NumberOfWaveformSamples: leads[0].counts.length,
    SamplingFrequency: decimal(sampleRateHz),
    MultiplexGroupLabel: 'RHYTHM',
    ChannelDefinitionSequence: leads.map((lead) => channel(lead, recorder)),
    WaveformBitsAllocated: sampleBits,
    WaveformSampleInterpretation: 'SS',
    WaveformPaddingValue: Int16Array.of(paddingCount).buffer,
    WaveformData: multiplexed(leads),
    _vrMap: { WaveformData: 'OW', WaveformPaddingValue: 'OW' },
  };
}

/** Everything but the waveform: patient, study, series, equipment, identification. */
function identification(recording: StripRecording, madeAt: Date): NaturalDataset {
  const { year, month, day, hours, minutes, seconds } = utcText(madeAt);
  const date = `${year}${month}${day}`;
  const time = `${hours}${minutes}${seconds}`;
  const title = dicomText(recording.parameters.title, longStringBytes);
  return {
    SpecificCharacterSet: 'ISO_IR 192',
    SOPInstanceUID: stripUid(recording, madeAt, 'instance'),
    StudyInstanceUID: stripUid(recording, madeAt, 'study'),
    SeriesInstanceUID: stripUid(recording, madeAt, 'series'),
    StudyDate: date,
    StudyTime: time,
    ContentDate: date,
    ContentTime: time,
    AcquisitionDateTime: `${date}${time}+0000`,
    TimezoneOffsetFromUTC: '+0000',
    AccessionNumber: '',
    Modality: 'ECG',
    Manufacturer: 'Paceloom',
    ManufacturerModelName: 'Paceloom synthetic strip',
    SoftwareVersions: dicomText(recording.engineVersion, longStringBytes),
    ReferringPhysicianName: '',
    StudyDescription: title === '' ? syntheticCaution : title,
    SeriesDescription: syntheticCaution,
    PatientName: 'Synthetic^Strip',
    PatientID: 'SYNTHETIC',
    PatientBirthDate: '',
    PatientSex: '',
    PatientComments: `${syntheticCaution}. Seed ${recording.parameters.seed}.`,
    StudyID: '1',
    SeriesNumber: '1',
    InstanceNumber: '1',
    AcquisitionContextSequence: [],
  };
}

function fileBytes(dataset: NaturalDataset, sopClass: string, instance: string): Uint8Array {
  const { DicomDict, DicomMetaDictionary } = data;
  const meta = DicomMetaDictionary.denaturalizeDataset({
    FileMetaInformationVersion: Uint8Array.of(0, 1).buffer,
    MediaStorageSOPClassUID: sopClass,
    MediaStorageSOPInstanceUID: instance,
    TransferSyntaxUID: explicitLittleEndian,
    // A UID of our own for the writer, made once from a random UUID.
    ImplementationClassUID: '2.25.45652886896853415636873677268987804353',
    ImplementationVersionName: 'PACELOOM',
  });
  const dict = new DicomDict(meta);
  dict.dict = DicomMetaDictionary.denaturalizeDataset(dataset);
  return new Uint8Array(dict.write());
}

function dicomWarnings({ parameters }: StripRecording, resampled: boolean, general: boolean): string[] {
  const warnings: string[] = [];
  if (resampled) {
    warnings.push(
      'resampled from 2000 to 1000 samples/s, the most the format takes: content above 400 Hz is reduced',
    );
  }
  if (general) {
    warnings.push(
      `written as General ECG, because a 12-lead ECG has at most ${twelveLeadSamples} samples a lead`,
    );
  }
  const title = parameters.title.trim();
  if (dicomText(title, longStringBytes) !== title) {
    warnings.push('the study description holds the title shortened; an annotation holds all of it');
  }
  return warnings;
}

/**
 * A strip as a DICOM file: 12-lead ECG Waveform Storage, or General ECG above 16,384 samples a lead (PS3.3 A.34.3,
 * A.34.4), with annotations. 2000 samples/s become 1000. UIDs follow from parameters, engine and `madeAt`, so that
 * the same strip gives the same bytes.
 */
export function encodeDicom(recording: StripRecording, { madeAt }: ExportOptions): ExportResult {
  const resampled = recording.sampleRateHz > highestRateHz;
  const sampled: SampledLeads = resampled ? halveRate(recording) : recording;
  const leads = sixteenBitLeads(sampled);
  const { length } = leads[0].counts;
  const general = length > twelveLeadSamples;
  const sopClass = general ? generalClass : twelveLeadClass;
  const identified = identification(recording, madeAt);
  const { recorder } = recording.parameters;
  const dataset: NaturalDataset = {
    SOPClassUID: sopClass,
    ...identified,
    WaveformSequence: [waveform(leads, sampled.sampleRateHz, recorder, resampled ? 'DERIVED' : 'ORIGINAL')],
    WaveformAnnotationSequence: dicomAnnotations(recording, sampled.sampleRateHz, length),
  };
  const bytes = fileBytes(dataset, sopClass, stripUid(recording, madeAt, 'instance'));
  return {
    files: [{ name: 'strip.dcm', mediaType: 'application/dicom', parts: [bytes] }],
    warnings: [...sixteenBitWarnings(leads), ...dicomWarnings(recording, resampled, general)],
  };
}
