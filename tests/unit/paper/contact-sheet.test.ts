import { describe, expect, it } from 'vitest';
import { layoutContactSheet, type ContactCard } from '../../../shared/paper/contact-sheet';
import { parseStripParameters } from '../../../shared/parameters/parse';
import { coordinates, polylines, texts } from './items';
import { pacedShape, stripOf } from './synthetic-strip';

const { sheet } = parseStripParameters({ sheet: { layout: '3x4+1' } });
const cards: ContactCard[] = ['One', 'Two', 'Three'].map((title, i) => ({
  strip: stripOf(pacedShape(), i === 1 ? { recorder: { bandwidth: 'monitor' } } : {}),
  title,
  caption: `Teaching point of ${title}.`,
}));

describe('contact sheet', () => {
  const drawing = layoutContactSheet(cards, { title: 'Gallery', subtitle: 'All strips', sheet, columns: 2 });

  it('shows every title, caption and settings once, in reading order, and the cautions', () => {
    expect(texts(drawing, 'title').map((item) => item.text)).toEqual(['Gallery', 'One', 'Two', 'Three']);
    expect(texts(drawing, 'caption').map((item) => item.text)).toEqual([
      'All strips',
      ...cards.map((card) => card.caption),
    ]);
    expect(texts(drawing, 'settings').map((item) => item.text.slice(-11))).toEqual([
      '0.05–150 Hz',
      'V 0.5–40 Hz',
      '0.05–150 Hz',
    ]);
    expect(texts(drawing, 'caution')).toHaveLength(2);
  });

  it('has cards side by side with level tops, then below', () => {
    const [, one, two, three] = texts(drawing, 'title');
    expect(two.yMm).toBe(one.yMm);
    expect(two.xMm).toBe(one.xMm + 270 + 18);
    expect(three.xMm).toBe(one.xMm);
    expect(three.yMm).toBeGreaterThan(one.yMm + 100);
    expect(drawing.widthMm).toBe(20 + 270 + 18 + 270 + 20);
  });

  it('keeps every strip at true scale and on the page', () => {
    for (const { pointsMm } of polylines(drawing, 'calibration')) {
      const { x, y } = coordinates(pointsMm);
      expect(x[3] - x[1]).toBe(5);
      expect(y[0] - y[2]).toBe(10);
      expect(Math.max(...x)).toBeLessThan(drawing.widthMm);
      expect(Math.max(...y)).toBeLessThan(drawing.heightMm);
    }
  });

  it('is no wider than its cards need', () => {
    expect(layoutContactSheet(cards.slice(0, 1), { title: 'G', sheet, columns: 3 }).widthMm).toBe(310);
  });

  it('refuses to be empty', () => {
    expect(() => layoutContactSheet([], { title: 'G', sheet })).toThrow(RangeError);
    expect(() => layoutContactSheet(cards, { title: 'G', sheet, columns: 0 })).toThrow(RangeError);
  });
});
