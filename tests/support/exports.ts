import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll } from 'vitest';
import { exporters } from '../../server/exports/exporters';
import type { StripEvent } from '../../shared/engine/events';
import { renderStrip, type StripRecording } from '../../shared/engine/render';
import { nominalStart, type ExportFile, type ExportFormat } from '../../shared/formats/export-format';
import { leadNames, type LeadName } from '../../shared/parameters/sheet';
import type { StripParametersInput } from '../../shared/parameters/strip-parameters';
import { uvPerMv } from '../../shared/units';
import { buildStrip } from './strips';

/** A title that ASCII headers cannot hold and that is longer than most fields. */
export const longTitle =
  'Schrittmacher über Nacht – «été à Zürich», ωβ: ein Titel, der in kein Feld eines alten Kopfes hineinpasst & <mehr>';

const faulty: StripParametersInput = {
  title: longTitle,
  seed: 41,
  durationS: 12.5,
  patient: {
    avConduction: 'complete',
    escapeSite: 'ventricular',
    prematureVentricularPerMinute: 10,
    prematureAtrialPerMinute: 10,
  },
  pacing: {
    source: 'implanted',
    mode: 'DDDOV',
    interventricularDelayMs: 40,
    faults: [
      { kind: 'failureToCapture', chamber: 'rightVentricle', proportion: 0.4 },
      { kind: 'failureToCapture', chamber: 'leftVentricle', proportion: 0.4 },
      { kind: 'failureToCapture', chamber: 'atrium', proportion: 0.3 },
      { kind: 'undersensing', chamber: 'rightVentricle', proportion: 0.3 },
    ],
  },
};

/** Strips that between them meet every rate, the finest and coarsest steps, faults, fusion, odd lengths and titles. */
export const exportCases: Readonly<Record<string, StripParametersInput>> = {
  'biventricular pacing with faults, 500/s, 5 µV, long title': faulty,
  'one sample more than whole seconds, 250/s, 10 µV': {
    durationS: 10.004,
    title: 'Fusion',
    patient: { atrialRateBpm: 80, prIntervalMs: 160 },
    pacing: { source: 'implanted', mode: 'DDD', sensedAvDelayMs: 90 },
    recorder: { bandwidth: 'monitor', sampleRateHz: 250, resolutionUv: 10 },
  },
  'chest pacing with its great artefact, 1000/s, 1 µV': {
    durationS: 10,
    patient: { avConduction: 'complete', escapeSite: 'none', bundleBranchBlock: 'left' },
    pacing: {
      source: 'transcutaneous',
      mode: 'VVI',
      transcutaneous: { currentMa: 90, captureThresholdMa: 70, artefactMv: 20 },
    },
    recorder: { sampleRateHz: 1000, resolutionUv: 1, bandwidth: { lowHz: 0.05, highHz: 250 } },
  },
  'unipolar pacing, unfiltered, 2000/s, a step of a third of 10 µV': {
    ...faulty,
    title: '',
    durationS: 6,
    pacing: { ...faulty.pacing, rightVentricularLead: { polarity: 'unipolar' } },
    recorder: { bandwidth: 'unfiltered', sampleRateHz: 2000, resolutionUv: 10 / 3, mainsNotchHz: 50 },
  },
  'stimuli below the threshold over a junctional escape rhythm': {
    durationS: 9,
    patient: { avConduction: 'complete', escapeSite: 'junctional' },
    pacing: {
      source: 'implanted',
      mode: 'VVI',
      rightVentricularLead: { amplitudeV: 0.5, captureThresholdV: 2 },
    },
  },
  'stimuli below the threshold over a ventricular escape rhythm': {
    durationS: 9,
    patient: { avConduction: 'complete', escapeSite: 'ventricular' },
    pacing: {
      source: 'implanted',
      mode: 'VVI',
      rightVentricularLead: { amplitudeV: 0.5, captureThresholdV: 2 },
    },
  },
  'the shortest strip, without pacing, right bundle branch block': {
    durationS: 1,
    patient: { bundleBranchBlock: 'right', prematureAtrialPerMinute: 60, prematureCouplingMs: 500 },
  },
};

/** Every case rendered. */
export function renderedCases(): [string, StripRecording][] {
  return Object.entries(exportCases).map(([name, input]) => [name, renderStrip(buildStrip(input))]);
}

/** All bytes of a file. */
export function fileBytes({ parts }: ExportFile): Buffer {
  return Buffer.concat([...parts].map((part) => (typeof part === 'string' ? Buffer.from(part) : part)));
}

/** Writes the files of a format into a folder; returns the warnings. */
export async function writeExport(
  recording: StripRecording,
  format: ExportFormat,
  folder: string,
): Promise<readonly string[]> {
  const { files, warnings } = await exporters[format](recording, { madeAt: nominalStart });
  for (const file of files) writeFileSync(join(folder, file.name), fileBytes(file));
  return warnings;
}

/** A new folder that is gone after the tests of the file. */
export function temporaryFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), 'paceloom-export-'));
  afterAll(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

/** The cases of a test file, written in one format before its tests run. */
export interface WrittenCases {
  cases: { name: string; recording: StripRecording; k: number }[];
  /** For what readers leave behind. */
  folder: string;
  /** Where the files of case `k` lie. */
  folderOf(k: number): string;
  /** The format's file of case `k`. */
  pathOf(k: number): string;
  /** Of each case. */
  warnings: (readonly string[])[];
}

/** Every case, and `more`, as files named `fileName`, each case in a folder of its own. */
export function writtenCases(
  format: ExportFormat,
  fileName: string,
  more: readonly [string, StripRecording][] = [],
): WrittenCases {
  const folder = temporaryFolder();
  const cases = [...renderedCases(), ...more].map(([name, recording], k) => ({ name, recording, k }));
  const folderOf = (k: number): string => join(folder, String(k));
  const warnings: (readonly string[])[] = [];
  beforeAll(async () => {
    for (const { recording, k } of cases) {
      mkdirSync(folderOf(k));
      warnings.push(await writeExport(recording, format, folderOf(k)));
    }
  });
  return { cases, folder, folderOf, pathOf: (k) => join(folderOf(k), fileName), warnings };
}

/** Doubles, little-endian, as NumPy's `tofile` writes them. */
export function readDoubles(path: string): Float64Array {
  return new Float64Array(Uint8Array.from(readFileSync(path)).buffer);
}

/** Columns of a CSV file with one line of names. */
export function readCsvColumns(path: string): number[][] {
  const [names, ...rows] = readFileSync(path, 'utf8').trim().split('\n');
  const values = rows.map((row) => row.split(',').map(Number));
  return names.split(',').map((_, column) => values.map((row) => row[column]));
}

/** Greatest difference between a lead and what a reader found in µV, and in how many samples. */
export function worstDifferenceUv(samplesMv: Float32Array, foundUv: ArrayLike<number>): number {
  if (foundUv.length < samplesMv.length) return Infinity;
  return samplesMv.reduce((worst, value, i) => Math.max(worst, Math.abs(value * uvPerMv - foundUv[i])), 0);
}

/** A recording made of given samples (mV), the same in every lead, for limits that rendering does not reach. */
export function recordingOf(
  samplesMv: ArrayLike<number>,
  overrides: Partial<StripRecording> = {},
): StripRecording {
  const rendered = renderStrip(buildStrip({ durationS: 1 }));
  const leads = Object.fromEntries(leadNames.map((lead) => [lead, Float32Array.from(samplesMv)]));
  const events: StripEvent[] = [];
  return { ...rendered, events, leads: leads as Record<LeadName, Float32Array>, ...overrides };
}
