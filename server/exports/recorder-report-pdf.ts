import PDFDocument from 'pdfkit';
import type { Conformance, ConformanceRow, Finding } from '../../shared/recorder-bench/conformance';
import {
  marginWords,
  originWords,
  reportCaution,
  reportTitle,
  summary,
  type ReportOrigin,
} from '../../shared/recorder-bench/report';
import { registerFonts, type fontFiles } from './fonts';

/** Points a millimetre. */
const mm = 72 / 25.4;
const margin = 14 * mm;
const ink = '#1f2a37';
const faint = '#5d6672';
const rule = '#cbc0ac';
const colours = { met: '#0a524e', failed: '#a12a1f', notClaimed: faint } as const;
const words = { met: 'met', failed: 'FAILED', notClaimed: 'not claimed' } as const;

type Doc = InstanceType<typeof PDFDocument>;

interface Column {
  x: number;
  width: number;
}

/** Requirement and limit take what the settings leave. */
function columnsOf(doc: Doc, settings: number): Column[] {
  const width = doc.page.width - 2 * margin;
  const shares = [0.34, 0.14, ...new Array<number>(settings).fill(0.52 / settings)];
  let x = margin;
  return shares.map((share) => {
    const column = { x, width: share * width - 3 * mm };
    x += share * width;
    return column;
  });
}

interface Line {
  text: string;
  font: keyof typeof fontFiles;
  size: number;
  colour: string;
}

function heightOf(doc: Doc, lines: readonly Line[], width: number): number {
  return lines.reduce(
    (height, { text, font, size }) => height + doc.font(font).fontSize(size).heightOfString(text, { width }),
    0,
  );
}

/** Writes cells side by side and a rule under them, on a new page when they do not fit. */
function writeRow(doc: Doc, columns: readonly Column[], cells: readonly (readonly Line[])[]): void {
  const height = Math.max(...cells.map((lines, i) => heightOf(doc, lines, columns[i].width)));
  if (doc.y + height + 3 * mm > doc.page.height - margin - 8 * mm) doc.addPage();
  const top = doc.y;
  cells.forEach((lines, i) => {
    let y = top;
    for (const { text, font, size, colour } of lines) {
      doc.font(font).fontSize(size).fillColor(colour);
      doc.text(text, columns[i].x, y, { width: columns[i].width });
      y = doc.y;
    }
  });
  const bottom = top + height + 1.2 * mm;
  doc
    .moveTo(margin, bottom)
    .lineTo(doc.page.width - margin, bottom)
    .lineWidth(0.4)
    .stroke(rule);
  doc.y = bottom + 1.2 * mm;
}

const small = (text: string): Line => ({ text, font: 'sans400', size: 7, colour: faint });

function findingLines(finding: Finding): Line[] {
  const { verdict, measured, reason } = finding;
  const lines: Line[] = [
    { text: words[verdict], font: 'sans600', size: 8, colour: colours[verdict] },
    { text: measured ?? 'cannot be applied', font: 'mono400', size: 7.5, colour: ink },
  ];
  if (reason) lines.push(small(reason));
  const left = verdict === 'notClaimed' ? '' : marginWords(finding.margin);
  if (left) lines.push(small(left));
  return lines;
}

function requirementLines(row: ConformanceRow): Line[] {
  return [
    { text: row.applied, font: 'sans400', size: 8, colour: ink },
    small(`${row.source.text}; ${row.source.provenance}`),
  ];
}

function writeHeading(doc: Doc, conformance: Conformance, origin: ReportOrigin): void {
  doc.font('sans600').fontSize(16).fillColor(ink).text(reportTitle, margin, margin);
  doc.font('sans400').fontSize(9).fillColor(faint).text(originWords(origin));
  doc.text(reportCaution);
  doc.moveDown(0.6);
  doc.font('sans400').fontSize(9).fillColor(ink).text(summary(conformance));
  doc.moveDown(0.8);
}

/** Page numbers and the versions at the foot of every page. */
function writeFeet(doc: Doc, origin: ReportOrigin): void {
  const { start, count } = doc.bufferedPageRange();
  for (let page = 0; page < count; page++) {
    doc.switchToPage(start + page);
    const y = doc.page.height - margin - 3 * mm;
    const width = doc.page.width - 2 * margin;
    doc.font('sans400').fontSize(7).fillColor(faint);
    doc.text(`${originWords(origin)}. ${reportCaution}`, margin, y, {
      width: width - 30 * mm,
      lineBreak: false,
    });
    doc.text(`${page + 1} of ${count}`, margin, y, { width, align: 'right', lineBreak: false });
  }
}

/** The conformance report on A4 landscape; the same table and date give the same bytes. */
export function recorderReportPdf(conformance: Conformance, origin: ReportOrigin): Promise<Uint8Array> {
  const doc = new PDFDocument({
    size: 'A4',
    layout: 'landscape',
    margins: { top: margin, left: margin, right: margin, bottom: 0 },
    bufferPages: true,
    lang: 'en',
    info: {
      Title: reportTitle,
      Author: 'Paceloom',
      Subject: reportCaution,
      CreationDate: new Date(`${origin.madeOn}T00:00:00Z`),
    },
  });
  registerFonts(doc);
  const parts: Uint8Array[] = [];
  doc.on('data', (part: Uint8Array) => parts.push(part));
  const ended = new Promise<Uint8Array>((done) => doc.on('end', () => done(Buffer.concat(parts))));

  writeHeading(doc, conformance, origin);
  const columns = columnsOf(doc, conformance.settings.length);
  const head = (text: string): Line => ({ text, font: 'sans600', size: 8, colour: ink });
  writeRow(doc, columns, [
    [head('What is applied')],
    [head('Limit')],
    ...conformance.settings.map(({ name, band, sampleRateHz, resolutionUv }) => [
      head(name),
      small(`${band}; ${sampleRateHz} samples/s; ${resolutionUv} µV`),
    ]),
  ]);
  for (const row of conformance.rows) {
    const limit: Line = { text: row.limit, font: 'sans400', size: 8, colour: ink };
    writeRow(doc, columns, [requirementLines(row), [limit], ...row.findings.map(findingLines)]);
  }
  writeFeet(doc, origin);
  doc.end();
  return ended;
}
