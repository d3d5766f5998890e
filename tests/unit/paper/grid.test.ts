import { describe, expect, it } from 'vitest';
import type { LineItem } from '../../../shared/paper/drawing';
import { gridItems } from '../../../shared/paper/grid';

const area = { xMm: 12, yMm: 29, widthMm: 270, heightMm: 120 };

function places(role: 'gridMinor' | 'gridMajor', vertical: boolean): number[] {
  return gridItems(area, 'rose')
    .filter((item): item is LineItem => item.kind === 'line' && item.role === role)
    .filter((line) => (line.x1Mm === line.x2Mm) === vertical)
    .map((line) => (vertical ? line.x1Mm - area.xMm : line.y1Mm - area.yMm));
}

describe('grid', () => {
  it.each([
    [true, 270],
    [false, 120],
  ])(
    'has a heavy line every 5 mm and a fine one on every millimetre between (vertical: %s)',
    (vertical, length) => {
      const all = Array.from({ length: length + 1 }, (_, i) => i);
      expect(places('gridMajor', vertical)).toEqual(all.filter((mm) => mm % 5 === 0));
      expect(places('gridMinor', vertical)).toEqual(all.filter((mm) => mm % 5 !== 0));
    },
  );

  it('is painted ground first, heavy lines last', () => {
    const roles = [...new Set(gridItems(area, 'slate').map((item) => item.role))];
    expect(roles).toEqual(['ground', 'gridMinor', 'gridMajor']);
  });

  it('refuses paper that is not whole large boxes', () => {
    expect(() => gridItems({ ...area, widthMm: 272 }, 'rose')).toThrow(RangeError);
  });
});
