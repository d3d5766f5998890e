import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sansAdvances, tabledCharacters } from '../../../shared/paper/font-advances';
import { textWidthMm, wrapText } from '../../../shared/paper/text';
import { textStyles } from '../../../shared/paper/text-styles';
import { capHeightEm } from '../../../shared/paper/tokens';
import { openFont } from './open-font';

const fonts = createRequire(import.meta.url);
const cuts = { 400: '400Regular', 500: '500Medium', 600: '600SemiBold' } as const;
const readCut = (weight: keyof typeof cuts) => {
  const file = cuts[weight].slice(3);
  const path = `@expo-google-fonts/ibm-plex-sans/${cuts[weight]}/IBMPlexSans_${weight}${file}.ttf`;
  return openFont(readFileSync(fonts.resolve(path)));
};

describe('font measures', () => {
  it.each([400, 500, 600] as const)('agree with the font file at weight %i', (weight) => {
    const font = readCut(weight);
    const read = [...tabledCharacters].map((character) => font.advanceEm(character) * 1000);
    expect(sansAdvances[weight]).toEqual(read);
    expect(capHeightEm).toBeCloseTo(font.capHeightEm, 9);
  });

  it('add up, tracking included', () => {
    const style = { ...textStyles.title, trackingEm: -0.01 };
    expect(textWidthMm('II', style)).toBeCloseTo(2 * (0.423 - 0.01) * style.size.sizeMm, 9);
    expect(textWidthMm('12 s', textStyles.settings)).toBeCloseTo(
      4 * 0.6 * textStyles.settings.size.sizeMm,
      9,
    );
  });
});

describe('breaking lines', () => {
  it('keeps every line within the width and every character in order', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme-ascii' }), fc.integer({ min: 10, max: 80 }), (text, width) => {
        const broken = wrapText(text, textStyles.subtitle, width);
        for (const line of broken) expect(textWidthMm(line, textStyles.subtitle)).toBeLessThanOrEqual(width);
        expect(broken.join('').replace(/\s/gu, '')).toBe(text.replace(/\s/gu, ''));
      }),
    );
  });

  it('gets on where not even one character fits', () => {
    expect(wrapText('QRS', textStyles.title, 0.1)).toEqual(['Q', 'R', 'S']);
  });
});
