import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { toAscii } from '../../../shared/formats/ascii';
import { asciiBytes, utf8Bytes } from '../../../shared/formats/utf8';

describe('ASCII for old headers', () => {
  it.each([
    ['Überprüfung à Zürich', 'Uberprufung a Zurich'],
    ['5 µV – “quoted” … ±', '5 uV - "quoted" ... ?'],
    ['Smørrebrød, Straße, Łódź', 'Smorrebrod, Strasse, Lodz'],
    ['tab\tand\nline', 'tab and line'],
    ['ωβ 心', '?? ?'],
  ])('%s', (text, ascii) => expect(toAscii(text)).toBe(ascii));

  it('is printable ASCII whatever comes in, and leaves ASCII alone', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary' }), (text) => /^[ -~]*$/u.test(toAscii(text))));
    fc.assert(fc.property(fc.string({ unit: 'grapheme-ascii' }), (text) => toAscii(text) === text));
  });
});

describe('UTF-8', () => {
  it('is what the platform’s own encoder makes (WHATWG Encoding), lone surrogates included', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: 'binary' }), fc.string({ unit: 'grapheme' })), (text) => {
        expect(utf8Bytes(text)).toEqual(new TextEncoder().encode(text));
      }),
    );
    expect(utf8Bytes('a\uD800b')).toEqual(new TextEncoder().encode('a\uD800b'));
  });

  it('refuses to cut characters for ASCII', () => {
    expect(() => asciiBytes('é')).toThrow('not ASCII');
    expect([...asciiBytes('A~')]).toEqual([65, 126]);
  });
});
