import { execFileSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { sheetPdf } from '../../server/exports/sheet-pdf';
import { renderStrip, type StripRecording } from '../../shared/engine/render';
import type { SheetDocument } from '../../shared/paper/pages/sheet-document';
import { lineWeightsMm } from '../../shared/paper/tokens';
import { recordingOf, temporaryFolder } from '../support/exports';
import { paintPage } from '../support/painted-page';
import { hasProgram, runReader } from '../support/python';
import { sheetsOf, subjectOf, type PageSetupInput } from '../support/sheets';
import { buildStrip } from '../support/strips';

const folder = temporaryFolder();
const madeAt = new Date(Date.UTC(2026, 11, 1, 9, 30));
let written = 0;

async function pdfOf(document: SheetDocument): Promise<string> {
  const path = join(folder, `${written++}.pdf`);
  writeFileSync(path, await sheetPdf(document, { madeAt }));
  return path;
}

const paced = renderStrip(
  buildStrip({
    title: 'Atrium and ventricle paced in sequence',
    patient: { atrialRhythm: 'arrest', avConduction: 'complete' },
    pacing: { source: 'implanted', mode: 'DDD' },
  }),
);

/** 1.5 mV for 40 ms once a second in every lead, and nothing else. */
function pulses(): StripRecording {
  const samples = Array.from({ length: 5000 }, (_, i) => (i % 500 >= 250 && i % 500 < 270 ? 1.5 : 0));
  return recordingOf(samples);
}

const info = (path: string, ...options: string[]): string =>
  runReader('/usr/bin/pdfinfo', [...options, path]);
const words = (path: string): string =>
  runReader('/usr/bin/pdftotext', ['-layout', path, '-']).replace(/\s+/gu, ' ');

const hasPoppler = hasProgram('/usr/bin/pdftoppm') && hasProgram('/usr/bin/pdftotext');

/** ISO 32000-1, 8.3.2.3: a unit is 1/72 inch. Sizes: ISO 216 A4, ANSI/ASME Y14.1 A. */
const boxesPt = {
  'a4 landscape': [841.89, 595.276],
  'a4 portrait': [595.276, 841.89],
  'letter landscape': [792, 612],
  'letter portrait': [612, 792],
} as const;

describe.skipIf(!hasPoppler)('PDF sheets under poppler (skipped without poppler-utils)', () => {
  it.each(Object.entries(boxesPt))(
    'page boxes of %s are the paper to 0.01 pt',
    async (name, [wide, high]) => {
      const [paper, orientation] = name.split(' ') as ['a4', 'portrait'];
      const path = await pdfOf(sheetsOf([subjectOf(paced)], { paper, orientation, layout: '3x4+1' }));
      for (const box of ['MediaBox', 'CropBox']) {
        const found = new RegExp(`${box}:\\s+0.00\\s+0.00\\s+([\\d.]+)\\s+([\\d.]+)`, 'u').exec(
          info(path, '-box'),
        );
        expect(Math.abs(Number(found?.[1]) - wide)).toBeLessThan(0.01);
        expect(Math.abs(Number(found?.[2]) - high)).toBeLessThan(0.01);
      }
    },
  );

  it('every font is embedded, and the version is 1.7', async () => {
    const path = await pdfOf(sheetsOf([subjectOf(paced)], { layout: '3x4+1' }));
    const [, , ...fonts] = runReader('/usr/bin/pdffonts', [path]).trim().split('\n');
    expect(fonts.length).toBeGreaterThanOrEqual(3);
    for (const font of fonts) expect(font).toMatch(/IBMPlex.*\byes yes yes\b/u);
    expect(info(path)).toMatch(/PDF version:\s+1\.7/u);
  });

  it('metadata name the document, say that it is synthetic, and carry the time it was made', async () => {
    const path = await pdfOf(sheetsOf([subjectOf(paced, 1, { title: 'Tilt' })], { sheets: 'answer' }));
    const text = info(path, '-isodates');
    expect(text).toMatch(/Title:\s+Tilt\n/u);
    expect(text).toMatch(/Subject:\s+Synthetic teaching strip, not a patient recording/u);
    expect(text).toMatch(/Keywords:\s+synthetic/u);
    expect(text).toMatch(/CreationDate:\s+2026-12-01T09:30:00Z/u);
  });

  it('same document and time, same bytes', async () => {
    const make = () => sheetPdf(sheetsOf([subjectOf(paced)], { layout: '6x2' }), { madeAt });
    expect(Buffer.compare(Buffer.from(await make()), Buffer.from(await make()))).toBe(0);
  });

  it('answer sheets hold title, teaching point, sentences, names of stimuli and intervals as text', async () => {
    const subject = subjectOf(paced);
    const text = words(await pdfOf(sheetsOf([subject], { sheets: 'answer', orientation: 'portrait' })));
    const sentences = paced.reading.findings.map((finding) => finding.text);
    for (const told of [subject.title, subject.teachingPoint, 'atrial stimulus', 'AV 180 ms', 'VV 1000 ms']) {
      expect(text).toContain(told);
    }
    for (const sentence of sentences) expect(text).toContain(sentence);
    expect(text).toContain('25 mm/s 10 mm/mV 0.05–150 Hz');
  });

  it('question sheets hold nothing of that, neither as text nor in any metadata', async () => {
    const subject = subjectOf(paced);
    const path = await pdfOf(sheetsOf([subject], { sheets: 'question', layout: '3x4+1' }));
    const all = [
      words(path),
      info(path),
      info(path, '-meta'),
      runReader('/usr/bin/pdfinfo', ['-struct', path]),
    ];
    const secrets = [
      subject.title,
      paced.parameters.title,
      subject.teachingPoint,
      'stimulus',
      ' ms',
      'capture',
    ];
    for (const secret of [...secrets, ...paced.reading.findings.map(({ text }) => text)]) {
      for (const text of all) expect(text).not.toContain(secret);
    }
    expect(all[0]).toContain('Strip 1');
    expect(all[0]).toContain('Question sheet');
  });
});

describe.skipIf(!hasProgram('/usr/bin/qpdf'))('PDF sheets under qpdf (skipped without qpdf)', () => {
  it.each<PageSetupInput>([
    { layout: '3x4+1' },
    { layout: '12x1', orientation: 'portrait', paper: 'letter', leadOrder: 'cabrera' },
    { layout: 'stacked', speedMmPerS: 50, gainMmPerMv: 20 },
  ])('are sound: %j', async (setup) => {
    const path = await pdfOf(sheetsOf([subjectOf(paced)], setup));
    expect(execFileSync('/usr/bin/qpdf', ['--check', path], { encoding: 'utf8' })).toContain(
      'No syntax or stream',
    );
  });
});

/** Half a pixel at 254 dpi: what a line's middle can be measured to, mm. */
const halfPixelMm = 0.05;
/** A place is read to half a pixel at either end of a length, mm. */
const lengthMm = 2 * halfPixelMm;

const scales = [
  { speedMmPerS: 25, gainMmPerMv: 10 },
  { speedMmPerS: 50, gainMmPerMv: 20 },
  { speedMmPerS: 25, gainMmPerMv: 5 },
] as const;

describe.skipIf(!hasPoppler)('paper as painted at 10 px/mm (skipped without poppler-utils)', () => {
  it.each([
    { paper: 'a4', orientation: 'landscape' },
    { paper: 'a4', orientation: 'portrait' },
    { paper: 'letter', orientation: 'landscape' },
    { paper: 'letter', orientation: 'portrait' },
  ] as const)('large boxes are 5 mm within 0.1 %% over the grid: $paper $orientation', async (place) => {
    // Grid of 1 and 5 mm lines: chart paper convention (BW-74).
    const document = sheetsOf([subjectOf(paced)], {
      ...place,
      layout: 'single',
      leads: ['II'],
      sheets: 'plain',
    });
    const painted = paintPage(await pdfOf(document), 1, folder);
    const { grid } = document.pages[0].systems[0];
    // The lowest large box holds no ink.
    const bottomMm = grid.yMm + grid.heightMm - 0.5;
    const lines = painted.heavyLinesMm({
      ...{ topMm: bottomMm - 2, bottomMm },
      leftMm: grid.xMm - 1,
      rightMm: grid.xMm + grid.widthMm + 1,
    });
    expect(lines).toHaveLength(grid.widthMm / 5 + 1);
    const boxes = lines.length - 1;
    const pitchMm = (lines[boxes] - lines[0]) / boxes;
    expect(Math.abs(pitchMm / 5 - 1)).toBeLessThan(0.001);
    // 100 mm of paper anywhere on it.
    for (let i = 0; i + 20 < lines.length; i++) {
      expect(Math.abs(lines[i + 20] - lines[i] - 100)).toBeLessThan(lengthMm);
    }
    expect(Math.abs(lines[0] - grid.xMm)).toBeLessThan(lengthMm);
  });

  it.each(scales)(
    '1 mV and 200 ms of calibration at $speedMmPerS mm/s and $gainMmPerMv mm/mV',
    async (scale) => {
      // BW-70 to BW-75: speed, gain, calibration mark.
      const document = sheetsOf([subjectOf(paced)], { ...scale, layout: 'single', sheets: 'plain' });
      const painted = paintPage(await pdfOf(document), 1, folder);
      const { grid, segments } = document.pages[0].systems[0];
      const [top, bottom] = [grid.yMm + 0.5, segments[0].baselineMm + 2];
      const middleMm = (grid.xMm + segments[0].xMm) / 2;
      const upperMm = painted.inkFromTopMm(middleMm, top, bottom);
      const halfway = segments[0].baselineMm - scale.gainMmPerMv / 2;
      const leftMm = painted.inkFromLeftMm(halfway, grid.xMm, segments[0].xMm);
      const rightMm = painted.inkFromLeftMm(halfway, middleMm, segments[0].xMm);
      const footMm = painted.inkFromTopMm(leftMm - 0.6, top, bottom);
      expect(Math.abs(footMm - upperMm - scale.gainMmPerMv)).toBeLessThan(lengthMm);
      expect(Math.abs(rightMm - leftMm - 0.2 * scale.speedMmPerS)).toBeLessThan(lengthMm);
    },
  );

  it('a row of two gains has a step for each', async () => {
    const setup: PageSetupInput = { layout: '3x4', chestGainMmPerMv: 5, sheets: 'plain' };
    const document = sheetsOf([subjectOf(paced)], setup);
    const painted = paintPage(await pdfOf(document), 1, folder);
    const { grid, segments } = document.pages[0].systems[0];
    const { baselineMm } = segments[0];
    const heightAt = (xMm: number): number =>
      baselineMm - painted.inkFromTopMm(grid.xMm + xMm, baselineMm - 12, baselineMm + 1);
    expect(Math.abs(heightAt(6.2) - 10)).toBeLessThan(lengthMm);
    expect(Math.abs(heightAt(8.8) - 5)).toBeLessThan(lengthMm);
  });

  it.each(scales)(
    'pulses of 1.5 mV one second apart at $speedMmPerS mm/s and $gainMmPerMv mm/mV',
    async (scale) => {
      const document = sheetsOf([subjectOf(pulses())], { ...scale, layout: 'single', sheets: 'plain' });
      const painted = paintPage(await pdfOf(document), 1, folder);
      const { grid, segments } = document.pages[0].systems[0];
      const { xMm, baselineMm } = segments[0];
      const riseMm = (second: number): number =>
        painted.inkFromLeftMm(
          baselineMm - 0.75 * scale.gainMmPerMv,
          xMm + (second + 0.4) * scale.speedMmPerS,
          xMm + (second + 0.53) * scale.speedMmPerS,
        );
      // The pulse lasts 40 ms from 0.5 s.
      const top = xMm + 1.52 * scale.speedMmPerS;
      const heightMm = baselineMm - painted.inkFromTopMm(top, grid.yMm + 0.5, baselineMm + 1);
      expect(Math.abs(heightMm - 1.5 * scale.gainMmPerMv)).toBeLessThan(lengthMm);
      expect(Math.abs(riseMm(2) - riseMm(1) - scale.speedMmPerS)).toBeLessThan(lengthMm);
    },
  );

  it('the deepest sample of a paced complex is where its voltage and time say', async () => {
    const document = sheetsOf([subjectOf(paced)], { layout: 'single', leads: ['V2'], sheets: 'plain' });
    const painted = paintPage(await pdfOf(document), 1, folder);
    const { grid, segments } = document.pages[0].systems[0];
    const { xMm, baselineMm } = segments[0];
    const samples = paced.leads.V2.subarray(1000, 1500);
    const deepest = samples.reduce((best, value, i) => (value < samples[best] ? i : best), 0);
    const atMm = xMm + ((1000 + deepest) / 500) * 25;
    const bottomMm = painted.lowestInkMm({
      ...{ leftMm: atMm - 1, rightMm: atMm + 1 },
      ...{ topMm: baselineMm, bottomMm: grid.yMm + grid.heightMm - 0.6 },
    });
    // The round end of a turn lies half the weight of the line further out.
    const expectedMm = baselineMm - samples[deepest] * 10 + lineWeightsMm.trace / 2;
    expect(Math.abs(bottomMm - expectedMm)).toBeLessThan(lengthMm);
  });
});
