import { describe, expect, it } from 'vitest';
import { encodeWav, playbackCaution, playedLeads } from '../../../shared/formats/wav';
import { fileBytes, longTitle, recordingOf } from '../../support/exports';

const encode = (samples: number[], sheet: object = {}, title = '') => {
  const recording = recordingOf(samples);
  const { parameters } = recording;
  const { files, warnings } = encodeWav({
    ...recording,
    parameters: { ...parameters, title, sheet: { ...parameters.sheet, ...sheet } },
  });
  return { bytes: fileBytes(files[0]), warnings };
};

describe('WAV', () => {
  it('plays the one lead of a single-lead sheet, otherwise at most the first two', () => {
    expect(playedLeads({ layout: 'single', leads: ['V5', 'II'] })).toEqual(['V5']);
    expect(playedLeads({ layout: 'stacked', leads: ['V5', 'II', 'I'] })).toEqual(['V5', 'II']);
    expect(playedLeads({ layout: '3x4', leads: ['aVF'] })).toEqual(['aVF']);
  });

  it('has the header of the format (RIFF, PCM, 16 bits) at its offsets', () => {
    const { bytes } = encode([0, 1, -1], { leads: ['I', 'V1'] });
    expect(bytes.toString('latin1', 0, 4)).toBe('RIFF');
    expect(bytes.readUInt32LE(4)).toBe(bytes.length - 8);
    expect(bytes.toString('latin1', 8, 16)).toBe('WAVEfmt ');
    expect(bytes.readUInt32LE(16)).toBe(16);
    expect([20, 22, 32, 34].map((at) => bytes.readUInt16LE(at))).toEqual([1, 2, 4, 16]);
    expect([24, 28].map((at) => bytes.readUInt32LE(at))).toEqual([500, 2000]);
    const data = bytes.indexOf('data');
    expect(bytes.readUInt32LE(data + 4)).toBe(12);
    const samples = Array.from({ length: 6 }, (_, i) => bytes.readInt16LE(data + 8 + 2 * i));
    expect(samples).toEqual([0, 0, 6553, 6553, -6553, -6553]);
  });

  it('keeps a single sample of one channel, in chunks of even length', () => {
    const { bytes } = encode([2.5], { layout: 'single', leads: ['II'] }, 'x');
    expect(bytes.length % 2).toBe(0);
    expect(bytes.readInt16LE(bytes.length - 2)).toBe(16_384);
    expect(bytes.includes('INAM\u0002\0\0\0x\0')).toBe(true);
  });

  it.each([
    [4.9, 5],
    [5.1, 10],
    [20.1, 50],
    [51, 100],
  ])('takes the smallest full scale that holds %d mV: %d mV', (peakMv, fullScaleMv) => {
    const { bytes, warnings } = encode([peakMv, 0]);
    expect(bytes.toString('latin1')).toContain(`; ${fullScaleMv} mV = 32767 counts`);
    expect(warnings).toHaveLength(2);
  });

  it('warns of people first, then of scale, clipping and gaps', () => {
    const { warnings } = encode([150, -150, NaN, 1], { layout: 'single' });
    expect(warnings).toEqual([
      playbackCaution,
      'Leads II; 100 mV = 32767 counts, a step of 3.05185 µV',
      '2 samples beyond ±100 mV clipped',
      '1 sample without a value written as 0',
    ]);
  });

  it('carries the caution and a plain title in its metadata', () => {
    const content = encode([0], {}, longTitle).bytes.toString('latin1');
    expect(content).toContain(
      'Synthetic teaching strip, not a patient recording. For isolated, attenuated simulator inputs only; never connect to a person.',
    );
    expect(content).toContain('Schrittmacher uber Nacht - ');
  });
});
