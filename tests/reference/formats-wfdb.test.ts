import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import type { StripRecording } from '../../shared/engine/render';
import { annotatedEvents, eventWords, type AnnotatedEvent } from '../../shared/formats/event-words';
import { syntheticCaution } from '../../shared/paper/cautions';
import { leadNames } from '../../shared/parameters/sheet';
import { readDoubles, worstDifferenceUv, writtenCases } from '../support/exports';
import { hasProgram, hasPythonModule, runPython, runReader } from '../support/python';
import { exactFileUv } from '../support/tolerances';

/**
 * A reader written for this test from header(5), signal(5) and annot(5) of WFDB 10.7.0, which gives millivolts by
 * (count − baseline) / gain. The reader below, BioSig's, is
 * Debian's only one; it takes interleaved signals for sequential ones, so it is asked for header and annotations alone.
 */
const program = `
import json, re, sys
import numpy as np
folder, out = sys.argv[1:]
lines = [line for line in open(folder + '/strip.hea', encoding='ascii').read().split('\\n') if line]
comments = [line[1:].strip() for line in lines if line.startswith('#')]
lines = [line for line in lines if not line.startswith('#')]
record, signals, rate, length, time, date = lines[0].split(' ')
signals, length = int(signals), int(length)
counts = np.fromfile(folder + '/strip.dat', dtype='<i2').reshape(length, signals)
found = []
millivolts = np.empty((signals, length))
for k, line in enumerate(lines[1:1 + signals]):
    name, form, gain, bits, zero, first, checksum, block, lead = line.split(' ', 8)
    gain, baseline, units = re.fullmatch(r'([0-9.e+-]+)\\((-?\\d+)\\)/(\\S+)', gain).groups()
    total = int(np.sum(counts[:, k], dtype=np.int64)) & 0xffff
    millivolts[k] = (counts[:, k] - int(baseline)) / float(gain)
    found.append({'file': name, 'format': form, 'bits': bits, 'units': units, 'lead': lead,
                  'firstHolds': int(first) == int(counts[0, k]),
                  'checksumHolds': (int(checksum) & 0xffff) == total})
millivolts.astype('<f8').tofile(out)
words = np.fromfile(folder + '/strip.atr', dtype='<u2')
annotations, sample, channel, number, k = [], 0, 0, 0, 0
while words[k] != 0:
    code, interval = int(words[k]) >> 10, int(words[k]) & 0x3ff
    k += 1
    if code == 59:
        sample += (int(words[k]) << 16 | int(words[k + 1])) - (1 << 32 if words[k] & 0x8000 else 0)
        k += 2
    elif code == 60: annotations[-1][3] = number = interval
    elif code == 61: pass
    elif code == 62: annotations[-1][2] = channel = interval
    elif code == 63:
        annotations[-1][4] = words[k:k + (interval + 1) // 2].tobytes()[:interval].decode('ascii')
        k += (interval + 1) // 2
    else:
        sample += interval
        annotations.append([sample, code, channel, number, ''])
print(json.dumps({'record': record, 'rate': float(rate), 'length': length, 'time': time, 'date': date,
                  'ended': k == len(words) - 1, 'signals': found, 'comments': comments, 'annotations': annotations}))
`;

interface Found {
  record: string;
  rate: number;
  length: number;
  time: string;
  date: string;
  ended: boolean;
  signals: Record<string, string | boolean>[];
  comments: string[];
  annotations: [sample: number, code: number, channel: number, number: number, text: string][];
}

// FM-29: codes of the published table (ecgcodes.h, annot.c of WFDB 10.7.0).
const formats = JSON.parse(readFileSync(new URL('../fixtures/formats.json', import.meta.url), 'utf8')) as {
  entries: { id: string; value: Record<string, number> }[];
};
const table = formats.entries.find(({ id }) => id === 'FM-29')!.value;

/** The mnemonic that a cardiologist of the table would choose for an event, written down apart from the encoder. */
function mnemonic(event: AnnotatedEvent, { events, parameters }: StripRecording): string {
  if (event.type === 'stimulus') return event.captured ? '"' : '^';
  if (event.chamber === 'atrium') return '(';
  if (event.fusion) return 'f';
  const afterEctopic = events.some(
    (one) =>
      one.type === 'depolarization' &&
      one.chamber === 'atrium' &&
      one.origin === 'premature' &&
      one.timeS === event.conductedFromS,
  );
  const block = { none: 'N', left: 'L', right: 'R' }[parameters.patient.bundleBranchBlock];
  const byOrigin = { paced: '/', premature: 'V', junctionalEscape: 'j', ventricularEscape: 'E' };
  return event.origin === 'conducted' ? (afterEctopic ? 'A' : block) : byOrigin[event.origin];
}

const { cases, folder, folderOf, pathOf } = writtenCases('wfdb', 'strip.hea');

describe.skipIf(!hasPythonModule('numpy'))(
  'WFDB read from the published format (skipped without python3-numpy)',
  () => {
    const found: Found[] = [];
    beforeAll(() => {
      for (const { k } of cases) {
        const own = folderOf(k);
        found.push(JSON.parse(runPython(program, [own, `${own}.f64`])) as Found);
      }
    });

    it.each(cases)('header and samples: $name', ({ recording, k }) => {
      const { length } = recording.leads.I;
      expect(found[k]).toMatchObject({
        record: 'strip',
        rate: recording.sampleRateHz,
        length,
        time: '00:00:00',
        date: '01/01/2000',
        ended: true,
      });
      expect(found[k].signals).toEqual(
        leadNames.map((lead) => ({
          file: 'strip.dat',
          format: '16',
          bits: '16',
          units: 'mV',
          lead,
          firstHolds: true,
          checksumHolds: true,
        })),
      );
      expect(found[k].comments[0]).toBe(`${syntheticCaution}.`);
      const samples = readDoubles(join(folder, `${k}.f64`));
      leadNames.forEach((lead, i) => {
        const microvolts = samples.subarray(i * length, (i + 1) * length).map((mv) => mv * 1000);
        expect(worstDifferenceUv(recording.leads[lead], microvolts)).toBeLessThan(exactFileUv);
      });
    });

    it.each(cases)('annotations by the published codes: $name', ({ recording, k }) => {
      const [remark, ...annotations] = [...found[k].annotations].sort(
        (a, b) => Number(b[4] === syntheticCaution) - Number(a[4] === syntheticCaution),
      );
      expect(remark).toEqual([0, table['"'], 5, 0, syntheticCaution]);
      const expected = annotatedEvents(recording.events).map((event) => ({
        at: event.timeS * recording.sampleRateHz,
        code: table[mnemonic(event, recording)],
        text: eventWords(event),
      }));
      expect(annotations).toHaveLength(expected.length);
      for (const { at, code, text } of expected) {
        const match = annotations.find(
          ([sample, found, , , words]) =>
            found === code && words === text && Math.abs(sample - at) <= 0.5 + 1e-6,
        );
        expect(match, `${text} at sample ${at}`).toBeDefined();
      }
      const keys = found[k].annotations.map(([sample, , channel]) => sample * 10 + channel);
      expect(keys).toEqual([...keys].sort((a, b) => a - b));
      expect(new Set(keys).size).toBe(keys.length);
    });

    it('meets paced, fused, premature, escape, block and lost-capture codes in these strips', () => {
      const codes = new Set(found.flatMap(({ annotations }) => annotations.map(([, code]) => code)));
      for (const sign of ['/', 'f', 'V', 'A', 'E', 'j', 'R', '^', '"', '('])
        expect(codes, sign).toContain(table[sign]);
    });
  },
);

interface BiosigHeader {
  TYPE: string;
  Samplingrate: number;
  NumberOfSamples: number;
  CHANNEL: { Label: string; PhysicalUnit: string }[];
  EVENT: { TYP: string; POS: number }[];
}

describe.skipIf(!hasProgram('/usr/bin/save2gdf'))('WFDB under BioSig (skipped without biosig-tools)', () => {
  it.each(cases)('header, and every annotation at its time: $name', ({ recording, k }) => {
    const { sampleRateHz, events } = recording;
    const header = JSON.parse(runReader('/usr/bin/save2gdf', ['-JSON', pathOf(k)])) as BiosigHeader;
    expect(header).toMatchObject({
      TYPE: 'MIT',
      Samplingrate: sampleRateHz,
      NumberOfSamples: recording.leads.I.length,
    });
    expect(header.CHANNEL.map(({ Label }) => Label)).toEqual([...leadNames]);
    expect(header.CHANNEL.every(({ PhysicalUnit }) => PhysicalUnit === 'mV')).toBe(true);
    // BioSig counts samples from 1 where annot(5) counts from 0, so what it says is one sample early everywhere, and
    // wraps round at sample 0.
    const sample = (seconds: number): number => (Math.round(seconds * sampleRateHz) + 1) % 2 ** 32;
    const read = header.EVENT.map(({ TYP, POS }) => ({ code: Number(TYP), at: sample(POS) }));
    const caution = { code: table['"'], at: 0 };
    const expected = annotatedEvents(events).map((event) => ({
      code: table[mnemonic(event, recording)],
      at: Math.min(recording.leads.I.length - 1, Math.round(event.timeS * sampleRateHz)),
    }));
    expect(read).toHaveLength(expected.length + 1);
    for (const { code, at } of [caution, ...expected]) {
      const match = read.find((one) => one.code === code && one.at === at);
      expect(match, `code ${code} at sample ${at}`).toBeDefined();
    }
  });
});
