import { fork } from 'node:child_process';
import { once } from 'node:events';
import { exportFormats, type ExportFormat } from '../../shared/formats/export-format';
import { longestDrawnS } from '../../shared/paper/layout';

/** Length of the strips, s; pictures are made of the longest strip that is drawn. */
const benchedS = 600;
const pictures: readonly ExportFormat[] = ['svg', 'png', 'pdf'];

export type BenchedExport = ExportFormat | 'bundle';

/** What a child is told. */
export interface ExportTask {
  benched: BenchedExport;
  /** Formats of the bundle. */
  bundled: ExportFormat[];
  durationS: number;
}

/** One format, made from a rendered strip of twelve leads at 500/s, warm; rendering is not counted. */
export interface ExportMeasure {
  megabytes: number;
  megabytesPerS: number;
  timesRealTime: number;
  /** Greatest resident memory of the process at the first export, with engine and recording, MB. */
  peakMb: number;
  /** How much of it came on top of rendering. */
  peakAddedMb: number;
}

export type ExportFigures = Record<BenchedExport, ExportMeasure & { durationS: number }>;

async function measureOne(task: ExportTask): Promise<ExportMeasure> {
  const child = fork('scripts/bench/export-child.ts', [JSON.stringify(task)], {
    execArgv: ['--import', 'tsx'],
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  const failed = once(child, 'exit').then(([code]) => {
    throw new Error(`the benchmark of ${task.benched} ended with ${String(code)} and no figure`);
  });
  const [measure] = (await Promise.race([once(child, 'message'), failed])) as [ExportMeasure];
  failed.catch(() => undefined);
  return measure;
}

/** Every format, and a bundle of all that hold ten minutes: size, speed, memory. One after another. */
export async function measureExports(): Promise<ExportFigures> {
  const bundled = exportFormats.filter((format) => !pictures.includes(format));
  const figures: [BenchedExport, ExportMeasure & { durationS: number }][] = [];
  for (const benched of [...exportFormats, 'bundle'] as const) {
    const durationS = pictures.some((one) => one === benched) ? longestDrawnS : benchedS;
    figures.push([benched, { durationS, ...(await measureOne({ benched, bundled, durationS })) }]);
  }
  return Object.fromEntries(figures) as ExportFigures;
}

/** The figures in lines, for people. */
export function exportLines(figures: ExportFigures): string[] {
  return Object.entries(figures).map(([name, measure]) => {
    const { durationS, megabytes, megabytesPerS, timesRealTime, peakMb, peakAddedMb } = measure;
    return `export ${name} of ${durationS} s: ${megabytes.toFixed(1)} MB at ${megabytesPerS.toFixed(0)} MB/s, ${timesRealTime.toFixed(0)} × real time; at most ${peakMb.toFixed(0)} MB resident, ${peakAddedMb.toFixed(0)} MB of it on top of rendering`;
  });
}
