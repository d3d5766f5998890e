import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { renderStrip } from '../../../shared/engine/render';
import { nominalStart } from '../../../shared/formats/export-format';
import { encodeWfdb, wfdbChecksum } from '../../../shared/formats/wfdb/wfdb';
import {
  encodeWfdbAnnotations,
  wfdbBeatCodes,
  wfdbCodes,
} from '../../../shared/formats/wfdb/wfdb-annotations';
import { fileBytes, longTitle, recordingOf } from '../../support/exports';
import { buildStrip } from '../../support/strips';
import { formatFact, workedExample } from '../../support/worked-examples';

const options = { madeAt: nominalStart };

describe('WFDB annotations', () => {
  it('are the bytes of worked example I09: rhythm, paced beats, a long interval, spike and fusion', () => {
    const { inputs, value } = workedExample<
      { annotations: [number, number, string | null][] },
      { hex: string }
    >('I09');
    const annotations = inputs.annotations.map(([sample, code, text]) => ({
      sample,
      code,
      channel: 0,
      text: text ?? '',
    }));
    expect(Buffer.from(encodeWfdbAnnotations(annotations)).toString('hex')).toBe(value.hex);
  });

  it('use the codes of the published table (FM-29)', () => {
    const table = formatFact<Record<string, number>>('FM-29');
    expect(wfdbBeatCodes).toEqual({
      normal: table.N,
      leftBundleBranchBlock: table.L,
      rightBundleBranchBlock: table.R,
      premature: table.V,
      afterPrematureAtrial: table.A,
      ventricularEscape: table.E,
      junctionalEscape: table.j,
      paced: table['/'],
      pacedFusion: table.f,
    });
    expect(wfdbCodes).toEqual({
      note: table['"'],
      spikeWithoutCapture: table['^'],
      waveOnset: table['('],
    });
  });

  it('reach samples beyond 16 bits, in order of sample, by SKIP words', () => {
    const bytes = Buffer.from(encodeWfdbAnnotations([{ sample: 7_200_000, code: 1, channel: 0, text: '' }]));
    // 7,200,000 = 0x006D DD00: high half first, each half low byte first (FM-28).
    expect(bytes.toString('hex')).toBe('00ec6d0000dd00040000');
  });

  it('write a channel only where it changes, and pad odd texts', () => {
    const annotations = [
      { sample: 1, code: 1, channel: 2, text: 'abc' },
      { sample: 2, code: 1, channel: 2, text: '' },
      { sample: 2, code: 1, channel: 0, text: '' },
    ];
    expect(Buffer.from(encodeWfdbAnnotations(annotations)).toString('hex')).toBe(
      '0104' + '02f8' + '03fc' + '61626300' + '0104' + '0004' + '00f8' + '0000',
    );
  });
});

describe('WFDB signals', () => {
  it('have the checksum of worked example I10', () => {
    const { inputs, value } = workedExample<{ samples: number[] }, { checksum: number }>('I10');
    expect(wfdbChecksum(Int16Array.from(inputs.samples))).toBe(value.checksum);
  });

  it('have the checksum that adding in 64 bits gives', () => {
    fc.assert(
      fc.property(fc.int16Array({ maxLength: 200 }), (counts) => {
        const sum = [...counts].reduce((total, count) => total + BigInt(count), 0n);
        expect(wfdbChecksum(counts)).toBe(Number(BigInt.asIntN(16, sum)));
      }),
    );
  });

  it('are interleaved, low byte first, as in worked example I08', () => {
    const { inputs, value } = workedExample<{ frames: number[][] }, { hex: string }>('I08');
    const recording = recordingOf(inputs.frames.map(([first]) => (Math.max(first, -32_767) * 5) / 1000));
    recording.leads.II = Float32Array.from(
      inputs.frames.map(([, second]) => (Math.max(second, -32_767) * 5) / 1000),
    );
    const bytes = fileBytes(encodeWfdb(recording, options).files[1]);
    const firstTwo = inputs.frames.map((_, i) => bytes.subarray(24 * i, 24 * i + 4).toString('hex'));
    // −32768 means "no sample" and is never written; the example's last count ends at −32767.
    expect(firstTwo.join('')).toBe(value.hex.replace(/0080$/u, '0180'));
  });

  it('give counts per millivolt: 200 at 5 µV, 400 for half steps, as in worked example I11', () => {
    const { value } = workedExample<unknown, { mV: number[] }>('I11');
    const recording = recordingOf(value.mV);
    const { files } = encodeWfdb(recording, options);
    const header = fileBytes(files[0]).toString('ascii').split('\n');
    expect(header[0]).toBe('strip 12 500 3 00:00:00 01/01/2000');
    expect(header[1]).toBe('strip.dat 16 200(0)/mV 16 0 -29 171 0 I');
    expect(header[4]).toBe('strip.dat 16 400(0)/mV 16 0 -58 342 0 aVR');
  });

  it('clips at ±32767 and says how many samples', () => {
    const { warnings } = encodeWfdb(recordingOf([200, 0, 0]), options);
    expect(warnings).toContain('V6: 1 sample beyond ±163.835 mV clipped');
  });
});

describe('WFDB header', () => {
  it('is ASCII, says that it is synthetic, and that the title lost its accents', () => {
    const recording = renderStrip(buildStrip({ durationS: 1, title: longTitle }));
    const { files, warnings } = encodeWfdb(recording, options);
    const bytes = fileBytes(files[0]);
    expect(bytes.every((byte) => byte < 128)).toBe(true);
    expect(bytes.toString()).toContain('# Synthetic teaching strip, not a patient recording.\n');
    expect(bytes.toString()).toContain('# Title: Schrittmacher uber Nacht - ');
    expect(warnings).toEqual(['the title stands in the header without accents']);
    expect(files.map(({ name }) => name)).toEqual(['strip.hea', 'strip.dat', 'strip.atr']);
  });
});
