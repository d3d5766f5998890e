import PDFDocument from 'pdfkit';
import { describe, expect, it } from 'vitest';
import { fontFiles, registerFonts } from '../../../server/exports/fonts';
import { sansAdvances, tabledCharacters } from '../../../shared/paper/font-advances';

const sizePt = 10;

describe('fonts of PDF files', () => {
  it.each(Object.keys(fontFiles))('%s sets every character of the trade, blanks among them', (name) => {
    const doc = new PDFDocument();
    registerFonts(doc);
    doc.font(name).fontSize(sizePt);
    for (const character of tabledCharacters) expect(doc.widthOfString(character)).toBeGreaterThan(0);
    // The fixed pitch of IBM Plex Mono is 600 of 1000; the blank of the sans is the first of the table.
    const blank = name.startsWith('mono') ? 600 : sansAdvances[400][0];
    expect(doc.widthOfString(' ')).toBeCloseTo((blank / 1000) * sizePt, 6);
  });
});
