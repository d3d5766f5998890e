import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import type { StripRecording } from '../../shared/engine/render';
import { annotatedEvents, eventWords } from '../../shared/formats/event-words';
import { educationCaution, syntheticCaution } from '../../shared/paper/cautions';
import { leadNames } from '../../shared/parameters/sheet';
import { readCsvColumns, readDoubles, worstDifferenceUv, writtenCases } from '../support/exports';
import { hasProgram, hasPythonModule, runPython, runReader } from '../support/python';
import { exactFileUv } from '../support/tolerances';

interface Found {
  names: string[];
  rateHz: number;
  units: string[];
  start: string;
  annotations: [onsetS: number, durationS: number, text: string][];
}

/** MNE-Python's reader (mne.io.read_raw_edf); it gives volts. */
const mneProgram = `
import json, sys
import mne, numpy as np
raw = mne.io.read_raw_edf(sys.argv[1], preload=True, verbose='error')
(raw.get_data() * 1e6).astype('<f8').tofile(sys.argv[2])
print(json.dumps({
  'names': raw.ch_names, 'rateHz': raw.info['sfreq'], 'start': raw.info['meas_date'].isoformat(),
  'units': [raw._orig_units[name] for name in raw.ch_names],
  'annotations': [[float(a['onset']), float(a['duration']), str(a['description'])] for a in raw.annotations],
}))
`;

/**
 * libedf (EDFlib 1.23), which refuses whatever breaks EDF+: file type 1 is EDF+. Times in 100 ns. Its structures are read
 * by offset: an annotation is onset, duration (both 64 bits), 16 or 20 bytes of text, then the description.
 */
const libedfProgram = `
import ctypes, json, struct, sys
library = ctypes.CDLL('libedf.so.1')
header = ctypes.create_string_buffer(1 << 20)
opened = library.edfopen_file_readonly(sys.argv[1].encode(), header, 2)
handle, kind, signals, duration = struct.unpack_from('iiixxxxq', header, 0)
length = int(sys.argv[2])
samples = []
for signal in range(signals if opened == 0 else 0):
    digits = (ctypes.c_int * length)()
    read = library.edfread_digital_samples(handle, signal, length, digits)
    samples.append(list(digits)[:read])
annotations = []
one = ctypes.create_string_buffer(4096)
while opened == 0 and library.edf_get_annotation(handle, len(annotations), one) == 0:
    text = one.raw[16:].lstrip(b'\\0').split(b'\\0')[0]
    annotations.append([struct.unpack_from('q', one, 0)[0] / 1e7, text.decode('utf8')])
print(json.dumps({'opened': opened, 'kind': kind, 'signals': signals, 'durationS': duration / 1e7,
                  'samples': samples, 'annotations': annotations}))
`;

const { cases, folder, pathOf, warnings } = writtenCases('edf', 'strip.edf');

/** Annotations that every file starts with, then the strip's events. */
function expectedTexts(recording: StripRecording): [number, string][] {
  const { title } = recording.parameters;
  return [
    [0, `${syntheticCaution}. ${educationCaution}`],
    ...(title === '' ? [] : [[0, title] as [number, string]]),
    ...annotatedEvents(recording.events).map((event): [number, string] => [event.timeS, eventWords(event)]),
  ];
}

const bySecondThenText = (a: readonly [number, string], b: readonly [number, string]): number =>
  a[0] - b[0] || a[1].localeCompare(b[1]);

describe.skipIf(!hasPythonModule('mne'))('EDF+ read by MNE-Python (skipped without python3-mne)', () => {
  it.each(cases)('samples, names, rate, units, annotations: $name', ({ recording, k }) => {
    const doubles = join(folder, `${k}.f64`);
    const found = JSON.parse(runPython(mneProgram, [pathOf(k), doubles])) as Found;
    expect(found.names).toEqual(leadNames.map((lead) => `ECG ${lead}`));
    expect(found.rateHz).toBe(recording.sampleRateHz);
    expect(new Set(found.units)).toEqual(new Set(['µV']));
    expect(found.start).toBe('2000-01-01T00:00:00+00:00');
    const samples = readDoubles(doubles);
    const length = samples.length / leadNames.length;
    leadNames.forEach((lead, i) => {
      const row = samples.subarray(i * length, (i + 1) * length);
      expect(worstDifferenceUv(recording.leads[lead], row)).toBeLessThan(exactFileUv);
    });
    const texts = found.annotations
      .filter(([, , text]) => !text.startsWith('Padding'))
      .map(([onsetS, , text]): [number, string] => [onsetS, text]);
    const expected = expectedTexts(recording).sort(bySecondThenText);
    texts.sort(bySecondThenText);
    expect(texts.map(([, text]) => text)).toEqual(expected.map(([, text]) => text));
    texts.forEach(([onsetS], i) => expect(onsetS).toBeCloseTo(expected[i][0], 6));
  });

  it('marks padding where the strip ends, and nowhere else', () => {
    const padded = cases.filter(({ recording }) => recording.parameters.durationS === 10.004);
    expect(padded).toHaveLength(1);
    for (const { recording, k } of cases) {
      const found = JSON.parse(runPython(mneProgram, [pathOf(k), join(folder, 'unused')])) as Found;
      const padding = found.annotations.filter(([, , text]) => text.startsWith('Padding'));
      expect(padding).toHaveLength(padded.some((one) => one.k === k) ? 1 : 0);
      expect(warnings[k].some((text) => text.startsWith('the last record is filled'))).toBe(
        padding.length > 0,
      );
      for (const [onsetS, durationS] of padding) {
        expect(onsetS).toBeCloseTo(recording.leads.I.length / recording.sampleRateHz, 6);
        expect(durationS).toBeCloseTo(0.996, 6);
      }
    }
  });
});

const libedfIsHere = hasProgram('/usr/lib/x86_64-linux-gnu/libedf.so.1');

describe.skipIf(!libedfIsHere)('EDF+ under libedf, the strictest reader (skipped without libedf1)', () => {
  it.each(cases)('opens as EDF+ with every sample and annotation: $name', ({ recording, k }) => {
    const { length } = recording.leads.I;
    const found = JSON.parse(runPython(libedfProgram, [pathOf(k), String(length)])) as {
      opened: number;
      kind: number;
      signals: number;
      durationS: number;
      samples: number[][];
      annotations: [number, string][];
    };
    expect(found).toMatchObject({ opened: 0, kind: 1, signals: 12 });
    const fileS = recording.parameters.durationS === 10.004 ? 11 : length / recording.sampleRateHz;
    expect(found.durationS).toBeCloseTo(fileS, 6);
    found.samples.forEach((digits, i) => {
      const lead = leadNames[i];
      const stepUv = lead.startsWith('aV') ? recording.resolutionUv / 2 : recording.resolutionUv;
      expect(digits).toEqual(Array.from(recording.leads[lead], (mv) => Math.round((mv * 1000) / stepUv) + 0));
    });
    expect(found.annotations.length).toBeGreaterThanOrEqual(expectedTexts(recording).length);
    for (const [onsetS, text] of expectedTexts(recording)) {
      expect(found.annotations.some(([atS, words]) => words === text && Math.abs(atS - onsetS) < 1e-6)).toBe(
        true,
      );
    }
  });
});

describe.skipIf(!hasProgram('/usr/bin/save2gdf'))('EDF+ under BioSig (skipped without biosig-tools)', () => {
  it.each(cases)('samples and rate: $name', ({ recording, k }) => {
    const header = JSON.parse(runReader('/usr/bin/save2gdf', ['-JSON', pathOf(k)])) as {
      TYPE: string;
      Samplingrate: number;
      CHANNEL: { Label: string; PhysicalUnit: string; scaling: number }[];
    };
    expect(header).toMatchObject({ TYPE: 'EDF', Samplingrate: recording.sampleRateHz });
    const leads = header.CHANNEL.filter(({ Label }) => Label !== 'EDF Annotations');
    expect(leads.map(({ Label }) => Label)).toEqual(leadNames.map((lead) => `ECG ${lead}`));
    leads.forEach(({ PhysicalUnit, scaling }, i) => {
      const exact = leadNames[i].startsWith('aV') ? recording.resolutionUv / 2 : recording.resolutionUv;
      expect(PhysicalUnit).toBe('uV');
      // Six digits are printed.
      expect(scaling / exact).toBeCloseTo(1, 5);
    });
    runReader('/usr/bin/save2gdf', ['-CSV', pathOf(k), join(folder, `${k}.csv`)]);
    const columns = readCsvColumns(join(folder, `${k}.csv`));
    leadNames.forEach((lead, i) => {
      expect(worstDifferenceUv(recording.leads[lead], columns[i])).toBeLessThan(recording.resolutionUv / 2);
    });
  });
});
