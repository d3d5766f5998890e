import { describe, expect, it } from 'vitest';
import { stripUid, stripUuid } from '../../../server/exports/deterministic-id';
import { dicomText } from '../../../server/exports/dicom/dicom-text';
import { nominalStart } from '../../../shared/formats/export-format';
import { renderStrip } from '../../../shared/engine/render';
import { buildStrip } from '../../support/strips';

const strip = renderStrip(buildStrip({ durationS: 1 }));
const other = renderStrip(buildStrip({ durationS: 1, seed: 2 }));

describe('identifiers of exports', () => {
  it('are UIDs of DICOM PS3.5 annex B.2: 2.25, a UUID as a number, at most 64 characters', () => {
    const uid = stripUid(strip, nominalStart, 'instance');
    expect(uid).toMatch(/^2\.25\.[1-9]\d{0,38}$/);
    expect(uid.length).toBeLessThanOrEqual(64);
    const hex = stripUuid(strip, nominalStart, 'instance').replaceAll('-', '');
    expect(BigInt(`0x${hex}`).toString()).toBe(uid.slice(5));
  });

  it('are UUIDs of version 8 and variant 10 (RFC 9562)', () => {
    expect(stripUuid(strip, nominalStart, 'document')).toMatch(
      /^[0-9a-f]{8}-[0-9a-f]{4}-8[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/,
    );
  });

  it('repeat for the same strip and differ by seed, start and purpose', () => {
    const uid = stripUid(strip, nominalStart, 'instance');
    expect(stripUid(renderStrip(strip.parameters), nominalStart, 'instance')).toBe(uid);
    const different = [
      stripUid(other, nominalStart, 'instance'),
      stripUid(strip, new Date(0), 'instance'),
      stripUid(strip, nominalStart, 'series'),
    ];
    expect(new Set([uid, ...different]).size).toBe(4);
  });
});

describe('DICOM text', () => {
  it.each([
    ['plain', 64, 'plain'],
    ['back\\slash', 64, 'back/slash'],
    ['line\nand\ttab\u0007', 64, 'line and tab'],
    ['äöü', 5, 'äö'],
    ['four words and blanks', 5, 'four'],
    ['😀😀', 7, '😀'],
  ])('%j in %d bytes is %j', (text, bytes, expected) => expect(dicomText(text, bytes)).toBe(expected));
});
