import { describe, expect, it } from 'vitest';
import { drawingToSvg, escapeXml } from '../../../shared/formats/svg';
import type { Drawing } from '../../../shared/paper/drawing';
import { layoutStripSheet } from '../../../shared/paper/sheet';
import { parseStripParameters } from '../../../shared/parameters/parse';
import { pacedShape, stripOf } from '../paper/synthetic-strip';

const input = { title: 'Spikes & "capture" <none>', sheet: { layout: '3x4+1' } } as const;
const sheet = layoutStripSheet(stripOf(pacedShape(), input), parseStripParameters(input).sheet);
const svg = drawingToSvg(sheet);

/** x of the full-height vertical strokes of a path with this stroke. */
function verticals(stroke: string): number[] {
  const path = new RegExp(`<path fill="none" stroke="${stroke}"[^>]* d="([^"]+)"`, 'u').exec(svg)?.[1] ?? '';
  return [...path.matchAll(/M([\d.]+) [\d.]+V/gu)].map((match) => Number(match[1]));
}

describe('SVG of a sheet', () => {
  it('has its size in mm and one unit to the millimetre', () => {
    const size = `width="${sheet.widthMm}mm" height="${sheet.heightMm}mm"`;
    expect(svg).toContain(`${size} viewBox="0 0 ${sheet.widthMm} ${sheet.heightMm}"`);
  });

  it('has grid lines exactly 1 mm apart, every fifth of them heavy', () => {
    const major = verticals('#efc9bf');
    const all = [...major, ...verticals('#f8e8e2')].sort((a, b) => a - b);
    expect(all).toEqual(Array.from({ length: 271 }, (_, i) => 12 + i));
    expect(major).toEqual(Array.from({ length: 55 }, (_, i) => 12 + 5 * i));
  });

  it('says in title and description what it is, with special characters escaped', () => {
    expect(svg).toContain('<title>Spikes &amp; &quot;capture&quot; &lt;none&gt;</title>');
    expect(svg).toContain('<desc>Synthetic teaching strip, not a patient recording.');
    expect(svg).not.toContain('<none>');
  });

  it('draws each trace as one path that keeps within 0.02 mm of its points to the very end', () => {
    const paths = [...svg.matchAll(/stroke-width="0.34"[^>]* d="M([^l]+)l([^"]+)"/gu)];
    expect(paths).toHaveLength(13);
    paths.forEach(([, start, steps], i) => {
      const trace = sheet.items.filter((item) => item.kind === 'polyline' && item.role === 'trace')[i];
      const points = trace.kind === 'polyline' ? trace.pointsMm : new Float64Array();
      const end = start.split(' ').map(Number);
      (steps.match(/-?[\d.]+/gu) ?? []).forEach((step, k) => (end[k % 2] += Number(step)));
      expect(Math.abs(end[0] - points[points.length - 2])).toBeLessThan(0.02);
      expect(Math.abs(end[1] - points[points.length - 1])).toBeLessThan(0.02);
    });
  });

  it('is the same text every time and small', () => {
    expect(drawingToSvg(sheet)).toBe(svg);
    expect(svg.length).toBeLessThan(150_000);
  });
});

describe('details', () => {
  const empty: Drawing = { widthMm: 10, heightMm: 10, title: '', description: '', items: [] };

  it('leaves out characters that XML cannot hold', () => {
    expect(escapeXml('a\u0000b\u001fc\ud800d\u{1fac0}')).toBe('abcd\u{1fac0}');
  });

  it('joins neighbouring lines of one stroke, and only those', () => {
    const line = (x1Mm: number, dashMm?: [number, number]) => ({
      kind: 'line' as const,
      role: 'leadChange' as const,
      x1Mm,
      y1Mm: 0,
      x2Mm: x1Mm,
      y2Mm: 5,
      colour: 'ink' as const,
      weightMm: 0.3,
      dashMm,
    });
    const out = drawingToSvg({ ...empty, items: [line(1), line(2), line(3, [1, 0.75]), line(4)] });
    expect([...out.matchAll(/ d="([^"]+)"/gu)].map((match) => match[1])).toEqual([
      'M1 0V5M2 0V5',
      'M3 0V5',
      'M4 0V5',
    ]);
    expect(out).toContain('stroke-dasharray="1 0.75"');
  });

  it('writes slanted and level lines', () => {
    const line = {
      kind: 'line',
      role: 'trace',
      x1Mm: 1,
      y1Mm: 2,
      x2Mm: 3,
      colour: 'ink',
      weightMm: 1,
    } as const;
    const out = drawingToSvg({
      ...empty,
      items: [
        { ...line, y2Mm: 2 },
        { ...line, y2Mm: 4.5 },
      ],
    });
    expect(out).toContain('d="M1 2H3M1 2L3 4.5"');
  });
});
