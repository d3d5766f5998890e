import type { StripRecording } from '../engine/render';

/** The formats a strip leaves in, in the order in which lists show them; names are those of the command line. */
export const exportFormats = ['csv', 'events', 'reading', 'svg', 'png'] as const;
export type ExportFormat = (typeof exportFormats)[number];

/** What people are told of a format: its name, and in a few words what it holds. */
export const exportFormatWords: Readonly<Record<ExportFormat, { label: string; holds: string }>> = {
  csv: { label: 'CSV', holds: 'Time and twelve leads in mV, one row a sample' },
  events: { label: 'Events', holds: 'Stimuli, depolarizations and markers as JSON' },
  reading: { label: 'Reading', holds: 'What is true of the strip, as JSON' },
  svg: { label: 'SVG', holds: 'The sheet as vectors at true size' },
  png: { label: 'PNG', holds: 'The sheet as a picture' },
};

/** One file of an export. */
export interface ExportFile {
  /** `strip.<ending>`, or `events.json` and `reading.json`. */
  name: string;
  mediaType: string;
  /** Contents in order; made as they are asked for, so that a long strip is never one string. */
  parts: Iterable<string | Uint8Array>;
}

/** The files of one format, and in sentences what was lost or changed on the way. */
export interface ExportResult {
  files: readonly ExportFile[];
  warnings: readonly string[];
}

/** Makes the files of one format. */
export type Exporter = (recording: StripRecording) => ExportResult | Promise<ExportResult>;
