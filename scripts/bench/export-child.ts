// One format of the exports benchmark, as a process of its own, so that its peak of memory is its own too.
import { exporters } from '../../server/exports/exporters';
import { bundleExports } from '../../server/exports/bundle';
import { renderStrip, type StripRecording } from '../../shared/engine/render';
import { nominalStart, type ExportFormat } from '../../shared/formats/export-format';
import { parseStripParameters } from '../../shared/parameters/parse';
import type { BenchedExport, ExportMeasure, ExportTask } from './exports';
import { median } from './timing';

const runs = 5;
const options = { madeAt: nominalStart };
const bytesPerMb = 1e6;
/** resourceUsage gives KiB. */
const kibPerMib = 1024;

/** Makes a format's files part by part, as a writer to disk or network would; returns their bytes. */
async function consume(recording: StripRecording, format: ExportFormat): Promise<number> {
  const { files } = await exporters[format](recording, options);
  let bytes = 0;
  for (const { parts } of files) {
    for (const part of parts) bytes += Buffer.byteLength(part);
  }
  return bytes;
}

async function make(
  recording: StripRecording,
  benched: BenchedExport,
  bundled: ExportFormat[],
): Promise<number> {
  if (benched !== 'bundle') return consume(recording, benched);
  return (await bundleExports(recording, bundled, options)).bytes.length;
}

const peakMb = (): number => process.resourceUsage().maxRSS / kibPerMib;

async function measure({ benched, bundled, durationS }: ExportTask): Promise<ExportMeasure> {
  const recording = renderStrip(
    parseStripParameters({
      durationS,
      patient: { avConduction: 'wenckebach', atrialRateBpm: 84, prematureVentricularPerMinute: 8 },
      pacing: { source: 'implanted', mode: 'DDD' },
    }),
  );
  const peakBeforeMb = peakMb();
  const bytes = await make(recording, benched, bundled);
  const peakAfterMb = peakMb();
  const times: number[] = [];
  for (let run = 0; run < runs; run++) {
    const started = process.hrtime.bigint();
    await make(recording, benched, bundled);
    times.push(Number(process.hrtime.bigint() - started) / 1e9);
  }
  const spentS = median(times);
  return {
    megabytes: bytes / bytesPerMb,
    megabytesPerS: bytes / bytesPerMb / spentS,
    timesRealTime: durationS / spentS,
    peakMb: peakAfterMb,
    peakAddedMb: peakAfterMb - peakBeforeMb,
  };
}

process.send?.(await measure(JSON.parse(process.argv[2]) as ExportTask));
