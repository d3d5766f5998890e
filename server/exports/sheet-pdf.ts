import PDFDocument from 'pdfkit';
import { educationCaution, syntheticCaution } from '../../shared/paper/cautions';
import type { DrawingItem, PolygonItem, PolylineItem, TextItem } from '../../shared/paper/drawing';
import type { SheetDocument, SheetPage } from '../../shared/paper/pages/sheet-document';
import { mmPerInch } from '../../shared/paper/paper-scale';
import { colourValue, type PaperColour } from '../../shared/paper/tokens';
import { registerFonts, type fontFiles } from './fonts';

/** Points a millimetre: a PDF point is 1/72 inch (ISO 32000-1, 8.3.2.3). */
const ptPerMm = 72 / mmPerInch;

type Doc = InstanceType<typeof PDFDocument>;

const fontNames = {
  sans: { 400: 'sans400', 500: 'sans500', 600: 'sans600' },
  mono: { 400: 'mono400', 500: 'mono500', 600: 'mono500' },
} as const satisfies Record<TextItem['family'], Record<TextItem['weight'], keyof typeof fontFiles>>;

function tracePath(doc: Doc, { pointsMm }: PolylineItem | PolygonItem): void {
  doc.moveTo(pointsMm[0], pointsMm[1]);
  for (let i = 2; i < pointsMm.length; i += 2) doc.lineTo(pointsMm[i], pointsMm[i + 1]);
}

/** Paints the path as it stands: filled, stroked or both. */
function paint(doc: Doc, fill: PaperColour | null, stroke: PaperColour | null, weightMm: number): void {
  if (stroke) doc.lineWidth(weightMm);
  if (fill && stroke) doc.fillAndStroke(colourValue(fill), colourValue(stroke));
  else if (fill) doc.fill(colourValue(fill));
  else if (stroke) doc.stroke(colourValue(stroke));
}

function paintText(doc: Doc, item: TextItem): void {
  doc.font(fontNames[item.family][item.weight]).fontSize(item.sizeMm).fillColor(colourValue(item.colour));
  const characterSpacing = (item.trackingEm ?? 0) * item.sizeMm;
  const widthMm = doc.widthOfString(item.text, { characterSpacing });
  const share = { start: 0, middle: 0.5, end: 1 }[item.anchor];
  doc.text(item.text, item.xMm - share * widthMm, item.yMm, {
    lineBreak: false,
    baseline: 'alphabetic',
    characterSpacing,
  });
}

function paintItem(doc: Doc, item: DrawingItem): void {
  switch (item.kind) {
    case 'polyline':
      tracePath(doc, item);
      doc.lineJoin('round').lineCap('round');
      return paint(doc, null, item.colour, item.weightMm);
    case 'polygon':
      tracePath(doc, item);
      doc.closePath().lineJoin('miter');
      return paint(doc, item.fill, item.stroke, item.weightMm);
    case 'line':
      doc.moveTo(item.x1Mm, item.y1Mm).lineTo(item.x2Mm, item.y2Mm).lineCap('butt');
      if (item.dashMm) doc.dash(item.dashMm[0], { space: item.dashMm[1] });
      paint(doc, null, item.colour, item.weightMm);
      if (item.dashMm) doc.undash();
      return;
    case 'circle':
      doc.circle(item.cxMm, item.cyMm, item.radiusMm);
      return paint(doc, item.fill, item.stroke, item.weightMm);
    case 'rect':
      doc.rect(item.xMm, item.yMm, item.widthMm, item.heightMm);
      return paint(doc, item.fill, null, 0);
    case 'text':
      return paintText(doc, item);
  }
}

function paintPage(doc: Doc, page: SheetPage): void {
  doc.addPage({ size: [page.widthMm * ptPerMm, page.heightMm * ptPerMm], margin: 0 });
  doc.save().scale(ptPerMm);
  for (const item of page.items) paintItem(doc, item);
  doc.restore();
}

/**
 * A document of sheets as a PDF 1.7 of vectors with embedded fonts: page boxes are the paper to the hundredth of a point,
 * 1 mm is 1 mm. Title, subject and keywords tell no more than the document's own title and that it is synthetic. Same
 * document and `madeAt`, same bytes.
 */
export function sheetPdf(document: SheetDocument, { madeAt }: { madeAt: Date }): Promise<Uint8Array> {
  const doc = new PDFDocument({
    autoFirstPage: false,
    pdfVersion: '1.7',
    lang: 'en',
    displayTitle: true,
    info: {
      Title: document.title,
      Author: 'Paceloom',
      Creator: 'Paceloom',
      Subject: `${syntheticCaution}. ${educationCaution}`,
      Keywords: 'synthetic, teaching strip, not a patient recording, ECG',
      CreationDate: madeAt,
    },
  });
  registerFonts(doc);
  const parts: Uint8Array[] = [];
  doc.on('data', (part: Uint8Array) => parts.push(part));
  const ended = new Promise<Uint8Array>((done) => doc.on('end', () => done(Buffer.concat(parts))));
  for (const page of document.pages) paintPage(doc, page);
  doc.end();
  return ended;
}
