import { closeSync, openSync, writeSync } from 'node:fs';
import type { MessagePort } from 'node:worker_threads';
import { renderLongStrip, type StripRecording } from '../../shared/engine/render';
import {
  nominalStart,
  type ExportFile,
  type ExportFormat,
  type ExportOptions,
} from '../../shared/formats/export-format';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import { partCounter, writeBundle } from '../exports/bundle';
import { exporters } from '../exports/exporters';

export interface ExportTask {
  parameters: StripParameters;
  formats: ExportFormat[];
  /** A ZIP archive even for a single file. */
  bundle: boolean;
  /** Path of the file to write; one that is there is written anew. */
  path: string;
  /** Bytes it may have. */
  mostBytes: number;
  /** Is told the share that is done, 0 to 1. */
  progress: MessagePort;
}

export type ExportOutcome =
  | {
      kind: 'made';
      bytes: number;
      /** Of the file's name: `zip`, `csv`, … */
      ending: string;
      mediaType: string;
      warnings: { format: ExportFormat; text: string }[];
    }
  | { kind: 'tooLarge' };

const options: ExportOptions = { madeAt: nominalStart };

/** Share of a job that rendering is shown as; an hour in one format takes a tenth to a third of its time for it. */
const renderingShare = 0.3;

class TooLarge extends Error {}

/** A file that is written as bytes come, up to a size. */
function createFile(path: string, mostBytes: number) {
  const descriptor = openSync(path, 'w');
  let bytes = 0;
  return {
    write(part: string | Uint8Array): void {
      const data = typeof part === 'string' ? Buffer.from(part, 'utf8') : part;
      bytes += data.length;
      if (bytes > mostBytes) throw new TooLarge();
      for (let at = 0; at < data.length;) at += writeSync(descriptor, data, at);
    },
    written: () => bytes,
    close: () => closeSync(descriptor),
  };
}

type OutputFile = ReturnType<typeof createFile>;
type Made = Extract<ExportOutcome, { kind: 'made' }>;

function endingOf({ name }: ExportFile): string {
  return name.slice(name.lastIndexOf('.') + 1);
}

/** The one file of one format as it is; null when the format makes several. */
async function writeSingle(
  recording: StripRecording,
  format: ExportFormat,
  output: OutputFile,
  onShare: (share: number) => void,
): Promise<Omit<Made, 'bytes'> | null> {
  const { files, warnings } = await exporters[format](recording, options);
  if (files.length !== 1) return null;
  const [file] = files;
  const onPart = partCounter(file, onShare);
  for (const part of file.parts) {
    output.write(part);
    onPart();
  }
  return {
    kind: 'made',
    ending: endingOf(file),
    mediaType: file.mediaType,
    warnings: warnings.map((text) => ({ format, text })),
  };
}

async function writeArchive(
  recording: StripRecording,
  formats: readonly ExportFormat[],
  output: OutputFile,
  onShare: (share: number) => void,
): Promise<Omit<Made, 'bytes'>> {
  const { warnings } = await writeBundle(recording, formats, options, {
    write: (chunk) => output.write(chunk),
    onShare,
  });
  return { kind: 'made', ending: 'zip', mediaType: 'application/zip', warnings };
}

/** Renders a strip and writes it in its formats to a file. */
export default async function exportStrip(task: ExportTask): Promise<ExportOutcome> {
  const { parameters, formats, bundle, progress } = task;
  const output = createFile(task.path, task.mostBytes);
  try {
    const recording = renderLongStrip(parameters, (share) => progress.postMessage(renderingShare * share));
    const onShare = (share: number): void =>
      progress.postMessage(renderingShare + (1 - renderingShare) * share);
    const alone = !bundle && formats.length === 1;
    const single = alone ? await writeSingle(recording, formats[0], output, onShare) : null;
    const made = single ?? (await writeArchive(recording, formats, output, onShare));
    return { ...made, bytes: output.written() };
  } catch (error) {
    if (error instanceof TooLarge) return { kind: 'tooLarge' };
    throw error;
  } finally {
    output.close();
    progress.close();
  }
}
