import { createHash } from 'node:crypto';
import { Zip, ZipDeflate, ZipPassThrough } from 'fflate';
import type { StripRecording } from '../../shared/engine/render';
import type { ExportFile, ExportFormat, ExportOptions } from '../../shared/formats/export-format';
import { educationCaution, syntheticCaution } from '../../shared/paper/cautions';
import { checkExport } from './check-export';
import { exporters } from './exporters';

/** Version of the manifest; it changes whenever a reader of the old one would go wrong. */
export const manifestVersion = 1;

export interface ManifestFile {
  name: string;
  format: ExportFormat;
  mediaType: string;
  bytes: number;
  /** SHA-256 of the file, hexadecimal. */
  sha256: string;
}

/** What a bundle says of itself, in its `manifest.json`. */
export interface BundleManifest {
  format: 'paceloom-bundle';
  formatVersion: number;
  synthetic: string;
  use: string;
  engineVersion: string;
  title: string;
  seed: number;
  durationS: number;
  sampleRateHz: number;
  files: ManifestFile[];
  warnings: { format: ExportFormat; text: string }[];
}

/** A ZIP archive and its manifest. */
export interface Bundle {
  bytes: Uint8Array;
  manifest: BundleManifest;
}

/** Media types whose bytes are packed already. */
const packed: readonly string[] = ['image/png', 'application/pdf'];

/** The archive's clock has no zone and is read as local time: the local moment whose fields are those of UTC. */
function archiveTime(madeAt: Date): Date {
  return new Date(
    madeAt.getUTCFullYear(),
    madeAt.getUTCMonth(),
    madeAt.getUTCDate(),
    madeAt.getUTCHours(),
    madeAt.getUTCMinutes(),
    madeAt.getUTCSeconds(),
  );
}

/** Tells the share of a file that is written, after each part; nothing when it is not known how many there are. */
export function partCounter({ partCount }: ExportFile, onShare: (share: number) => void): () => void {
  let parts = 0;
  return () => {
    parts++;
    if (partCount !== undefined) onShare(Math.min(1, parts / partCount));
  };
}

/** An archive that is put out as it grows, so that no file is held beside its packed form. */
function createArchive(madeAt: Date, sink: (chunk: Uint8Array) => void) {
  const zip = new Zip((error, chunk) => {
    if (error) throw error;
    sink(chunk);
  });
  return {
    /** Adds a file from its parts; returns its length and checksum. */
    add({ name, mediaType, parts }: ExportFile, onPart?: () => void): { bytes: number; sha256: string } {
      const entry = packed.includes(mediaType) ? new ZipPassThrough(name) : new ZipDeflate(name);
      entry.mtime = archiveTime(madeAt);
      zip.add(entry);
      const hash = createHash('sha256');
      let bytes = 0;
      for (const part of parts) {
        const data = typeof part === 'string' ? Buffer.from(part, 'utf8') : part;
        hash.update(data);
        bytes += data.length;
        entry.push(data);
        onPart?.();
      }
      entry.push(new Uint8Array(0), true);
      return { bytes, sha256: hash.digest('hex') };
    },
    end: () => zip.end(),
  };
}

function emptyManifest({ parameters, engineVersion, sampleRateHz }: StripRecording): BundleManifest {
  return {
    format: 'paceloom-bundle',
    formatVersion: manifestVersion,
    synthetic: syntheticCaution,
    use: educationCaution,
    engineVersion,
    title: parameters.title,
    seed: parameters.seed,
    durationS: parameters.durationS,
    sampleRateHz,
    files: [],
    warnings: [],
  };
}

/** Where an archive goes, and who is told how far it is. */
export interface BundleSink {
  /** The archive's next bytes. */
  write(chunk: Uint8Array): void;
  /** The share that is written, 0 to 1; every format counts the same. */
  onShare?(share: number): void;
}

/**
 * Writes the files of any choice of formats, each once, as one ZIP archive with a `manifest.json` that names them with
 * length, SHA-256 and warnings; returns the manifest. Same recording, formats and `madeAt`, same bytes. Throws
 * `InvalidInputError` when a format cannot hold the strip. `madeAt` must lie in 1980 to 2099, the years of ZIP.
 */
export async function writeBundle(
  recording: StripRecording,
  formats: readonly ExportFormat[],
  options: ExportOptions,
  sink: BundleSink,
): Promise<BundleManifest> {
  checkExport(recording.parameters, formats);
  const archive = createArchive(options.madeAt, (chunk) => sink.write(chunk));
  const manifest = emptyManifest(recording);
  const chosen = [...new Set(formats)];
  for (const [index, format] of chosen.entries()) {
    const { files, warnings } = await exporters[format](recording, options);
    for (const file of files) {
      const { name, mediaType } = file;
      const onPart = partCounter(file, (share) => sink.onShare?.((index + share) / chosen.length));
      manifest.files.push({ name, format, mediaType, ...archive.add(file, onPart) });
    }
    manifest.warnings.push(...warnings.map((text) => ({ format, text })));
    sink.onShare?.((index + 1) / chosen.length);
  }
  const parts = [`${JSON.stringify(manifest, null, 2)}\n`];
  archive.add({ name: 'manifest.json', mediaType: 'application/json', parts });
  archive.end();
  return manifest;
}

/** As `writeBundle`, but the archive as one piece in memory. */
export async function bundleExports(
  recording: StripRecording,
  formats: readonly ExportFormat[],
  options: ExportOptions,
): Promise<Bundle> {
  const chunks: Uint8Array[] = [];
  const manifest = await writeBundle(recording, formats, options, { write: (chunk) => chunks.push(chunk) });
  return { bytes: Buffer.concat(chunks), manifest };
}
