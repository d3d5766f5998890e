import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { syntheticCaution } from '../../shared/paper/cautions';
import { readDoubles, worstDifferenceUv, writtenCases } from '../support/exports';
import { hasProgram, hasPythonModule, runPython, runReader } from '../support/python';

const caution = 'For isolated, attenuated simulator inputs only; never connect to a person.';

/** SciPy's reader for the samples, and the chunks of the RIFF file one by one for its metadata. */
const program = `
import json, struct, sys
import numpy as np
from scipy.io import wavfile
rate, samples = wavfile.read(sys.argv[1])
samples.astype('<f8').tofile(sys.argv[2])
data = open(sys.argv[1], 'rb').read()
texts = {}
def chunks(start, end):
    while start < end:
        name, size = struct.unpack_from('<4sI', data, start)
        yield name.decode(), start + 8, size
        start += 8 + size + size % 2
order = []
for name, start, size in chunks(12, len(data)):
    order.append(name)
    if name == 'LIST':
        for tag, at, length in chunks(start + 4, start + size):
            texts[tag] = data[at:at + length].rstrip(b'\\0').decode('ascii')
print(json.dumps({'rate': rate, 'shape': list(samples.shape), 'type': str(samples.dtype), 'texts': texts,
                  'order': order, 'riffHolds': struct.unpack_from('<I', data, 4)[0] == len(data) - 8}))
`;

interface Found {
  rate: number;
  shape: number[];
  type: string;
  texts: Record<string, string>;
  order: string[];
  riffHolds: boolean;
}

const { cases, folder, pathOf, warnings } = writtenCases('wav', 'strip.wav');

it('warns first of what a WAV file can drive', () => {
  expect(warnings.map(([first]) => first)).toEqual(cases.map(() => caution));
});

describe.skipIf(!hasPythonModule('scipy.io'))('WAV read by SciPy (skipped without python3-scipy)', () => {
  it.each(cases)('samples by the stated scale, rate, cautions: $name', ({ recording, k }) => {
    const found = JSON.parse(runPython(program, [pathOf(k), join(folder, `${k}.f64`)])) as Found;
    const { leads } = recording.parameters.sheet;
    const { length } = recording.leads.I;
    expect(found).toMatchObject({ rate: recording.sampleRateHz, type: 'int16', riffHolds: true });
    expect(found.shape).toEqual([length, leads.length]);
    expect(found.order).toEqual(['fmt ', 'LIST', 'data']);
    expect(found.texts.ICMT).toContain(caution);
    expect(found.texts.ICMT).toContain(syntheticCaution);
    expect(found.texts.ISFT).toContain(`seed ${recording.parameters.seed}`);
    // The scale is the one that the comment states, such as "Leads II, V1; 5 mV = 32767 counts".
    const [, named, fullScaleMv] = /Leads (.+); (\d+) mV = 32767 counts/.exec(found.texts.ICMT)!;
    expect(named.split(', ')).toEqual(leads);
    const counts = readDoubles(join(folder, `${k}.f64`));
    leads.forEach((lead, channel) => {
      const microvolts = recording.leads[lead].map(
        (_, i) => (counts[i * leads.length + channel] * Number(fullScaleMv) * 1000) / 32767,
      );
      expect(worstDifferenceUv(recording.leads[lead], microvolts)).toBeLessThan(recording.resolutionUv / 2);
    });
  });
});

describe.skipIf(!hasProgram('/usr/bin/sox'))('WAV under SoX (skipped without sox)', () => {
  it.each(cases)('rate, channels, bits, length: $name', ({ recording, k }) => {
    const info = (flag: string): string => runReader('/usr/bin/sox', ['--info', flag, pathOf(k)]).trim();
    expect(Number(info('-r'))).toBe(recording.sampleRateHz);
    expect(Number(info('-c'))).toBe(recording.parameters.sheet.leads.length);
    expect(info('-b')).toBe('16');
    expect(info('-e')).toBe('Signed Integer PCM');
    expect(Number(info('-s'))).toBe(recording.leads.I.length);
  });
});
