import type { StripRecording } from '../engine/render';

/** The formats a strip leaves in, in the order in which lists show them; names are those of the command line. */
export const exportFormats = [
  'csv',
  'events',
  'reading',
  'json',
  'svg',
  'png',
  'pdf',
  'edf',
  'wfdb',
  'dicom',
  'aecg',
  'wav',
] as const;
export type ExportFormat = (typeof exportFormats)[number];

/** What people are told of a format: its name, and in a few words what it holds. */
export const exportFormatWords: Readonly<Record<ExportFormat, { label: string; holds: string }>> = {
  csv: { label: 'CSV', holds: 'Time and twelve leads in mV, one row a sample' },
  events: { label: 'Events', holds: 'Stimuli, depolarizations and markers as JSON' },
  reading: { label: 'Reading', holds: 'What is true of the strip, as JSON' },
  json: { label: 'JSON', holds: 'Parameters, events and reading in one versioned file' },
  svg: { label: 'SVG', holds: 'The sheet as vectors at true size' },
  png: { label: 'PNG', holds: 'The sheet as a picture' },
  pdf: { label: 'PDF', holds: 'The sheet on A4 pages at true size, ready to print' },
  edf: { label: 'EDF+', holds: 'Twelve leads in 16 bits, stimuli and beats as annotations' },
  wfdb: { label: 'WFDB', holds: 'Header, 16-bit signals, beats and stimuli with standard codes' },
  dicom: { label: 'DICOM', holds: '12-lead ECG waveform, or General ECG when it is longer, annotated' },
  aecg: { label: 'HL7 aECG', holds: 'Twelve leads and annotations as XML' },
  wav: { label: 'WAV', holds: 'One or two leads for isolated, attenuated simulator inputs only' },
};

/** One file of an export. */
export interface ExportFile {
  /** `strip.<ending>`, or `events.json` and `reading.json`. */
  name: string;
  mediaType: string;
  /** Contents in order; made as they are asked for, so that a long strip is never one string. */
  parts: Iterable<string | Uint8Array>;
  /** How many parts there will be, where that is known; only progress goes by it. */
  partCount?: number;
}

/** The files of one format, and in sentences what was lost or changed on the way. */
export interface ExportResult {
  files: readonly ExportFile[];
  warnings: readonly string[];
}

/** What an exporter is told besides the recording. */
export interface ExportOptions {
  /**
   * Start of the recording as files name it, in UTC. A strip was recorded at no time, and the engine has no clock, so
   * that the same parameters and the same `madeAt` give the same bytes.
   */
  madeAt: Date;
}

/** The start that files name unless another is given: midnight of 1 January 2000, which reads as made up. */
export const nominalStart = new Date(Date.UTC(2000, 0, 1));

/** Makes the files of one format. */
export type Exporter = (
  recording: StripRecording,
  options: ExportOptions,
) => ExportResult | Promise<ExportResult>;
