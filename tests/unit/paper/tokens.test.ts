import { describe, expect, it } from 'vitest';
import { textStyles } from '../../../shared/paper/text-styles';
import { colourValue, gridColours, type GridTint, type PaperColour } from '../../../shared/paper/tokens';

/** Relative luminance and contrast: WCAG 2.2, definitions of the same names. */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5]
    .map((at) => parseInt(hex.slice(at, at + 2), 16) / 255)
    .map((value) => (value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(one: PaperColour, other: PaperColour): number {
  const [light, dark] = [one, other].map((colour) => luminance(colourValue(colour))).sort((a, b) => b - a);
  return (light + 0.05) / (dark + 0.05);
}

const tints = Object.keys(gridColours) as GridTint[];

describe('contrast of text', () => {
  it('on the page is at least 4.5', () => {
    for (const { colour } of Object.values(textStyles)) expect(contrast(colour, 'page')).toBeGreaterThan(4.5);
  });

  it.each(tints)('on a %s grid is at least 4.5 even where it crosses a heavy line', (tint) => {
    for (const style of [textStyles.leadName, textStyles.lineTime]) {
      expect(contrast(style.colour, `${tint}.major`)).toBeGreaterThan(4.5);
    }
  });
});
