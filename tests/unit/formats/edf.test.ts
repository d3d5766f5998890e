import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { StripRecording } from '../../../shared/engine/render';
import { renderStrip } from '../../../shared/engine/render';
import { decimalField } from '../../../shared/formats/edf/decimal-field';
import { encodeEdf } from '../../../shared/formats/edf/edf';
import { annotationList } from '../../../shared/formats/edf/edf-annotations';
import { edfHeader } from '../../../shared/formats/edf/edf-header';
import { edfRange } from '../../../shared/formats/edf/edf-range';
import { edfRecords } from '../../../shared/formats/edf/edf-records';
import { nominalStart } from '../../../shared/formats/export-format';
import { leadCounts } from '../../../shared/formats/sixteen-bit';
import { fileBytes, longTitle, recordingOf } from '../../support/exports';
import { buildStrip } from '../../support/strips';
import { formatFact, workedExample } from '../../support/worked-examples';

const encode = (recording: StripRecording, madeAt = nominalStart) => {
  const { files, warnings } = encodeEdf(recording, { madeAt });
  return { bytes: fileBytes(files[0]), warnings, name: files[0].name };
};
const plain = renderStrip(buildStrip({ durationS: 4, title: 'A plain title' }));
const text = (bytes: Buffer, [at, length]: readonly [number, number]): string =>
  bytes.toString('latin1', at, at + length);

describe('EDF+ header', () => {
  const { bytes, warnings, name } = encode(plain);

  it('has every fixed field at its offset (FM-01, FM-03, FM-07 to FM-09)', () => {
    const at = formatFact<Record<string, [number, number]>>('FM-01');
    expect(name).toBe('strip.edf');
    expect(text(bytes, at.version)).toBe('0       ');
    expect(text(bytes, at.patient).trimEnd()).toBe('X X X Synthetic_teaching_strip,_not_a_patient_recording');
    expect(text(bytes, at.recording).trimEnd()).toBe(
      'Startdate 01-JAN-2000 X X Paceloom_2.0.0 seed_1 A_plain_title',
    );
    expect(text(bytes, at.start_date)).toBe('01.01.00');
    expect(text(bytes, at.start_time)).toBe('00.00.00');
    expect(Number(text(bytes, at.header_bytes))).toBe(256 + 256 * 13);
    expect(text(bytes, at.reserved).trimEnd()).toBe('EDF+C');
    expect(Number(text(bytes, at.number_of_records))).toBe(4);
    expect(Number(text(bytes, at.record_duration_s))).toBe(1);
    expect(Number(text(bytes, at.number_of_signals))).toBe(13);
    expect(warnings).toEqual([]);
  });

  it('has the signals’ blocks where worked example I05 has them', () => {
    const { value } = workedExample<unknown, { block_offsets: Record<string, number>; end: number }>('I05');
    const { block_offsets: at, end } = value;
    const field = (block: string, signal: number, width: number): string =>
      text(bytes, [at[block] + signal * width, width]).trimEnd();
    expect(field('label', 1, 16)).toBe('ECG II');
    expect(field('label', 12, 16)).toBe('EDF Annotations');
    expect(field('transducer', 0, 80)).toBe('none, synthetic');
    expect(field('physical_dimension', 4, 8)).toBe('uV');
    expect(field('physical_min', 0, 8)).toBe('-163835');
    expect(field('physical_max', 3, 8)).toBe('81917.5');
    expect(field('digital_min', 0, 8)).toBe('-32767');
    expect(field('digital_max', 12, 8)).toBe('32767');
    expect(field('prefiltering', 0, 80)).toBe('HP:0.05Hz LP:150Hz');
    expect(field('samples_per_record', 0, 8)).toBe('500');
    expect(bytes.subarray(0, end).every((byte) => byte >= 32 && byte <= 126)).toBe(true);
    const samples = Number(field('samples_per_record', 12, 8));
    expect(bytes.length).toBe(end + 4 * 2 * (12 * 500 + samples));
    // FM-06: the greatest record that the format advises.
    expect(2 * (12 * 500 + samples)).toBeLessThan(61_440);
  });

  it('refuses text that would be cut unnoticed', () => {
    const header = {
      patient: 'X'.repeat(81),
      recording: '',
      madeAt: nominalStart,
      recordCount: 1,
      recordS: 1,
      signals: [],
    };
    expect(() => edfHeader(header)).toThrow('does not fit into 80 characters');
  });

  it('names the start it is given and warns about years that two digits cannot name (FM-10)', () => {
    const { bytes: later, warnings: none } = encode(plain, new Date(Date.UTC(2031, 4, 9, 13, 4, 5)));
    expect(text(later, [168, 16])).toBe('09.05.3113.04.05');
    expect(text(later, [88, 80])).toContain('Startdate 09-MAY-2031');
    expect(none).toEqual([]);
    expect(encode(plain, new Date(Date.UTC(2085, 0, 1))).warnings).toEqual([
      expect.stringMatching(/1985 to 2084, not 2085/),
    ]);
  });

  it('warns about a title that the header cannot hold, and keeps it in the annotations', () => {
    const { bytes: long, warnings: said } = encode(
      renderStrip(buildStrip({ durationS: 2, title: longTitle })),
    );
    expect(said).toEqual([expect.stringContaining('the title stands in the header cut')]);
    expect(long.includes(Buffer.from(longTitle, 'utf8'))).toBe(true);
    expect(text(long, [88, 80])).toMatch(/ Schrittmacher_uber_Nacht_-_/);
  });
});

describe('EDF+ annotation lists', () => {
  it('are the bytes of worked example I06', () => {
    const { inputs, value } = workedExample<
      { event_onset_s: number; event_duration_s: number; text: string },
      { hex: string }
    >('I06');
    const lists = [
      annotationList({ onsetUs: 0, text: '' }),
      annotationList({
        onsetUs: inputs.event_onset_s * 1e6,
        durationUs: inputs.event_duration_s * 1e6,
        text: inputs.text,
      }),
    ];
    expect(Buffer.concat(lists).toString('hex')).toBe(value.hex);
  });

  it('keep microseconds and drop what would end a list', () => {
    const list = Buffer.from(annotationList({ onsetUs: 3_600_000_001, text: 'a\u0014b\u0000c\nd' }));
    expect(list.toString('latin1')).toBe('+3600.000001\u0014a b c d\u0014\u0000');
  });
});

describe('EDF+ ranges', () => {
  const range = (stepUv: number) => edfRange(leadCounts('I', Float32Array.of(0.5), stepUv));

  it.each([1, 2.5, 5, 10, 3.337, 4.88])('give a step of %d µV exactly, and 0 at 0', (stepUv) => {
    const { physicalMaxUv, digitalMax, exact } = range(stepUv);
    expect(exact).toBe(true);
    expect(physicalMaxUv.length).toBeLessThanOrEqual(7);
    expect(Number(physicalMaxUv) / digitalMax).toBeCloseTo(stepUv, 12);
  });

  it('come within a part in a million of any step, and hold every count', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 10, noNaN: true }), (stepUv) => {
        const found = range(stepUv);
        expect(Math.abs(found.stepUv / stepUv - 1)).toBeLessThan(1e-6);
        expect(found.digitalMax).toBeLessThanOrEqual(32_767);
      }),
    );
    const full = edfRange(leadCounts('I', Float32Array.of(32.767), 1));
    expect(full.digitalMax).toBe(32_767);
  });

  it('warn when a step cannot be written', () => {
    const odd = renderStrip(buildStrip({ durationS: 1, recorder: { resolutionUv: Math.PI } }));
    const said = encode(odd).warnings;
    expect(said).toHaveLength(12);
    expect(said[0]).toMatch(/^I: the header gives the step of 3\.14159\d* µV as 3\.14159\d* µV$/);
  });

  it.each([
    [163_835, '163835'],
    [0.1 + 0.2, '0.3'],
    [-0.25, '-0.25'],
    [81_917.5, '81917.5'],
    [1 / 3, '0.33333'],
    [0, '0'],
  ])('write %d in seven characters as %s', (value, written) => expect(decimalField(value, 7)).toBe(written));

  it('refuse a number that no field holds', () => {
    expect(() => decimalField(12_345_678, 7)).toThrow('does not fit into 7 characters');
  });
});

describe('EDF+ records', () => {
  it.each([
    [5000, 500, { samples: 500, count: 10, padding: 0 }],
    [6250, 500, { samples: 250, count: 25, padding: 0 }],
    [2501, 250, { samples: 250, count: 11, padding: 249 }],
    [2499, 250, { samples: 250, count: 10, padding: 1 }],
    [250, 250, { samples: 250, count: 1, padding: 0 }],
  ])('%d samples at %d/s', (length, rateHz, records) => {
    expect(edfRecords(length, rateHz)).toEqual(records);
  });

  it('hold every sample, pad by less than a record, and last 0.1 to 1 s', () => {
    const lengths = fc.integer({ min: 250, max: 2_000_000 });
    fc.assert(
      fc.property(lengths, fc.constantFrom(250, 500, 1000, 2000), (length, rateHz) => {
        const { samples, count, padding } = edfRecords(length, rateHz);
        expect(samples * count - padding).toBe(length);
        expect(padding).toBeGreaterThanOrEqual(0);
        expect(padding).toBeLessThan(samples);
        expect(samples / rateHz).toBeGreaterThanOrEqual(0.1);
        expect(samples / rateHz).toBeLessThanOrEqual(1);
      }),
    );
  });

  it('fill the last record with the last value and say how much', () => {
    const recording = recordingOf(Array.from({ length: 501 }, (_, i) => (i === 500 ? 0.2 : 0)));
    const { bytes, warnings } = encode(recording);
    expect(warnings).toEqual([
      'the last record is filled with 0.998 s of the last value, marked by an annotation',
    ]);
    const record = (bytes.length - 3584) / 2;
    const first = 3584 + record;
    const lead = Array.from({ length: 500 }, (_, i) => bytes.readInt16LE(first + 2 * i));
    expect(new Set(lead)).toEqual(new Set([40]));
    expect(bytes.toString('latin1')).toContain(
      '+1.002\u00150.998\u0014Padding after the end of the strip\u0014',
    );
  });
});

describe('EDF+ limits', () => {
  it('clips what 16 bits cannot hold, lead by lead, and counts it', () => {
    const { warnings } = encode(recordingOf([170, 0, -171, ...new Array<number>(497).fill(0)]));
    expect(warnings).toContain('V1: 2 samples beyond ±163.835 mV clipped');
    // Half steps may widen to the whole step.
    expect(warnings).toContain(
      'aVR: written in steps of 5 µV instead of 2.5, because 16 bits do not hold its range otherwise',
    );
  });

  it('holds an hour', () => {
    const hour = recordingOf(new Float32Array(3600 * 250), { sampleRateHz: 250 });
    const { bytes, warnings } = encode(hour);
    expect(warnings).toEqual([]);
    expect(Number(text(bytes, [236, 8]))).toBe(3600);
  });

  it('makes the same bytes of the same strip', () => {
    expect(encode(renderStrip(plain.parameters)).bytes.equals(encode(plain).bytes)).toBe(true);
  });
});
