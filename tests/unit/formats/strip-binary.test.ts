import { describe, expect, it } from 'vitest';
import {
  decodeStripBinary,
  encodeStripBinary,
  StripBinaryError,
  type RenderedStrip,
} from '../../../shared/formats/strip-binary';
import { readStrip } from '../../../shared/engine/reading/read-strip';
import type { StripEvent } from '../../../shared/engine/events';
import { parseStripParameters } from '../../../shared/parameters/parse';
import { leadNames, type LeadName } from '../../../shared/parameters/sheet';

const events: StripEvent[] = [
  { type: 'stimulus', timeS: 0.1, chamber: 'rightVentricle', amplitudeMv: 2, widthMs: 0.4, captured: true },
  { type: 'marker', timeS: 0.1, code: 'ventricularPace' },
];

function stripOf<Samples extends Float32Array | Float64Array>(
  samplesOf: (lead: LeadName, i: number) => Samples,
): RenderedStrip<Samples> {
  return {
    sampleRateHz: 500,
    resolutionUv: 5,
    delayRemovedMs: 2.7731,
    leads: Object.fromEntries(leadNames.map((lead, i) => [lead, samplesOf(lead, i)])) as Record<
      LeadName,
      Samples
    >,
    events,
    stimulusMarkersS: [0.0502],
    reading: readStrip(events, () => null),
    parameters: parseStripParameters({ title: 'Überleitung − 40 ms 💓', notes: '"quoted"\n\u2028' }),
    engineVersion: '1.0.0',
  };
}

const singles = stripOf((_, i) => Float32Array.from({ length: 7 }, (_sample, k) => i - k / 3));
const doubles = stripOf((_, i) => Float64Array.from({ length: 5 }, (_sample, k) => i * Math.PI - k / 3));

describe('a strip as bytes', () => {
  it('comes back as it was, recorded or before the quantiser', () => {
    expect(decodeStripBinary(encodeStripBinary(singles))).toEqual({ sampleType: 'float32', ...singles });
    expect(decodeStripBinary(encodeStripBinary(doubles))).toEqual({ sampleType: 'float64', ...doubles });
  });

  it('keeps every value that is not a number of the usual kind', () => {
    const odd = stripOf(() => Float64Array.of(NaN, -0, Infinity, 5e-324, -Number.MAX_VALUE));
    const { leads } = decodeStripBinary(encodeStripBinary(odd));
    expect(leads.V6).toEqual(odd.leads.V6);
    expect(Object.is(leads.V6[1], -0)).toBe(true);
  });

  it('may hold no sample at all', () => {
    const empty = stripOf(() => new Float32Array(0));
    expect(decodeStripBinary(encodeStripBinary(empty)).leads.I).toHaveLength(0);
  });

  it('is laid out as described, so that others can read it', () => {
    const bytes = encodeStripBinary(singles);
    const view = new DataView(bytes.buffer);
    const headerEnd = 4 + view.getUint32(0, true);
    expect(headerEnd % 8).toBe(0);
    expect(bytes.subarray(4, headerEnd).every((byte) => byte >= 32 && byte < 127)).toBe(true);
    const header = JSON.parse(Buffer.from(bytes.subarray(4, headerEnd)).toString('ascii')) as Record<
      string,
      unknown
    >;
    expect(header).toMatchObject({
      format: 'paceloom-strip',
      formatVersion: 1,
      samples: 7,
      leads: [...leadNames],
    });
    const place = headerEnd + (leadNames.indexOf('V2') * 7 + 3) * 4;
    expect(view.getFloat32(place, true)).toBe(singles.leads.V2[3]);
    expect(bytes.length).toBe(headerEnd + 12 * 7 * 4);
  });

  it('is read from anywhere inside a larger buffer', () => {
    const bytes = encodeStripBinary(doubles);
    const larger = new Uint8Array(bytes.length + 3);
    larger.set(bytes, 3);
    expect(decodeStripBinary(larger.subarray(3)).leads).toEqual(doubles.leads);
  });

  it('is refused when it is cut short, lengthened, or something else', () => {
    const bytes = encodeStripBinary(singles);
    for (const length of [0, 3, 4, 100, bytes.length - 1]) {
      expect(() => decodeStripBinary(bytes.slice(0, length))).toThrow(StripBinaryError);
    }
    const longer = new Uint8Array(bytes.length + 4);
    longer.set(bytes);
    expect(() => decodeStripBinary(longer)).toThrow(/bytes of samples/);
    const other = new TextEncoder().encode('\u0010\u0000\u0000\u0000{"format":"wav"}');
    expect(() => decodeStripBinary(other)).toThrow(/not a strip/);
    const newer = bytes.slice();
    const at = Buffer.from(bytes).indexOf('"formatVersion":1') + '"formatVersion":'.length;
    newer[at] = '9'.charCodeAt(0);
    expect(() => decodeStripBinary(newer)).toThrow(/version 9/);
  });

  it('cannot be made of leads that differ in length', () => {
    const uneven = { ...singles, leads: { ...singles.leads, V3: new Float32Array(6) } };
    expect(() => encodeStripBinary(uneven)).toThrow(/V3/);
  });
});
