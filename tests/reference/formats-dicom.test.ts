import { spawnSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { measuredLeads } from '../../shared/engine/leads';
import { renderStrip, type StripRecording } from '../../shared/engine/render';
import { codedEvents } from '../../shared/formats/coded-events';
import { beatTerms, leadTerms, pWaveTerm, spikeTerms } from '../../shared/formats/mdc-codes';
import { educationCaution, syntheticCaution } from '../../shared/paper/cautions';
import { leadNames } from '../../shared/parameters/sheet';
import { longTitle, readDoubles, worstDifferenceUv, writtenCases } from '../support/exports';
import { hasProgram, hasPythonModule, runPython, runReader } from '../support/python';
import { buildStrip } from '../support/strips';
import { exactFileUv } from '../support/tolerances';

/** pydicom's reader: the waveform in its units (PS3.3 C.10.9), and what identifies it. */
const pydicomProgram = `
import json, sys
import pydicom
file = pydicom.dcmread(sys.argv[1])
group = file.WaveformSequence[0]
file.waveform_array(0).T.astype('<f8').tofile(sys.argv[2])
def annotation(item):
    code = item.ConceptNameCodeSequence[0] if 'ConceptNameCodeSequence' in item else None
    return {'text': str(item.get('UnformattedTextValue', '')), 'group': item.AnnotationGroupNumber,
            'code': code and [str(code.CodeValue), str(code.CodingSchemeDesignator), str(code.CodeMeaning)],
            'channels': list(item.ReferencedWaveformChannels),
            'position': item.get('ReferencedSamplePositions', None), 'type': item.get('TemporalRangeType', '')}
print(json.dumps({
  'sopClass': str(file.SOPClassUID), 'sameInstance': file.SOPInstanceUID == file.file_meta.MediaStorageSOPInstanceUID,
  'uids': [str(file.SOPInstanceUID), str(file.StudyInstanceUID), str(file.SeriesInstanceUID)],
  'patient': str(file.PatientName), 'comments': str(file.PatientComments), 'series': str(file.SeriesDescription),
  'study': str(file.StudyDescription), 'rate': float(group.SamplingFrequency),
  'originality': group.WaveformOriginality, 'length': group.NumberOfWaveformSamples,
  'channels': [{'label': str(c.ChannelLabel), 'source': str(c.ChannelSourceSequence[0].CodeValue),
                'scheme': str(c.ChannelSourceSequence[0].CodingSchemeDesignator),
                'unit': str(c.ChannelSensitivityUnitsSequence[0].CodeValue),
                'low': float(c.get('FilterLowFrequency', 0)), 'high': float(c.get('FilterHighFrequency', 0)),
                'notch': float(c.get('NotchFilterFrequency', 0))}
               for c in group.ChannelDefinitionSequence],
  'annotations': [annotation(item) for item in file.WaveformAnnotationSequence],
}))
`;

interface Found {
  sopClass: string;
  sameInstance: boolean;
  uids: string[];
  patient: string;
  comments: string;
  series: string;
  study: string;
  rate: number;
  originality: string;
  length: number;
  channels: Record<string, string | number>[];
  annotations: {
    text: string;
    code: [string, string, string] | null;
    group: number;
    channels: number[];
    position: number | null;
    type: string;
  }[];
}

const twelveLead = '1.2.840.10008.5.1.4.1.1.9.1.1';
const general = '1.2.840.10008.5.1.4.1.1.9.1.2';

const pacedVvi = { pacing: { source: 'implanted' as const, mode: 'VVI' as const, lowerRateBpm: 80 } };
/** Lengths on both sides of the limit of 16,384 samples, and ten minutes. */
const lengths: [string, StripRecording][] = [
  ['16,384 samples', { durationS: 16.384, recorder: { sampleRateHz: 1000 } }],
  ['16,385 samples', { durationS: 16.385, recorder: { sampleRateHz: 1000 } }],
  ['ten minutes', { durationS: 600 }],
].map(([name, input]) => [name as string, renderStrip(buildStrip({ ...pacedVvi, ...(input as object) }))]);

const { cases, folder, pathOf, warnings } = writtenCases('dicom', 'strip.dcm', lengths);

const isFast = ({ sampleRateHz }: StripRecording): boolean => sampleRateHz === 2000;
const lengthOf = (recording: StripRecording): number =>
  recording.leads.I.length / (isFast(recording) ? 2 : 1);
const isLong = (recording: StripRecording): boolean => lengthOf(recording) > 16_384;

function read(k: number): { found: Found; rows: Float64Array[] } {
  const doubles = join(folder, `${k}.f64`);
  const found = JSON.parse(runPython(pydicomProgram, [pathOf(k), doubles])) as Found;
  const samples = readDoubles(doubles);
  const rows = leadNames.map((_, i) => samples.subarray(i * found.length, (i + 1) * found.length));
  return { found, rows };
}

describe.skipIf(!hasPythonModule('pydicom'))(
  'DICOM read by pydicom (skipped without python3-pydicom)',
  () => {
    it.each(cases)('class, channels and samples: $name', ({ recording, k }) => {
      const { found, rows } = read(k);
      const fast = isFast(recording);
      expect(found).toMatchObject({
        sopClass: isLong(recording) ? general : twelveLead,
        sameInstance: true,
        patient: 'Synthetic^Strip',
        series: syntheticCaution,
        rate: fast ? 1000 : recording.sampleRateHz,
        originality: fast ? 'DERIVED' : 'ORIGINAL',
        length: lengthOf(recording),
      });
      expect(found.comments).toContain(syntheticCaution);
      expect(new Set(found.uids).size).toBe(3);
      expect(found.channels.map(({ label }) => label)).toEqual([...leadNames]);
      expect(found.channels.every(({ unit, scheme }) => unit === 'uV' && scheme === 'MDC')).toBe(true);
      if (fast) return;
      leadNames.forEach((lead, i) => {
        expect(worstDifferenceUv(recording.leads[lead], rows[i])).toBeLessThan(exactFileUv);
      });
    });

    it('states the recorder’s filters', () => {
      const { found } = read(0);
      expect(found.channels[0]).toMatchObject({ low: 0.05, high: 150, notch: 0 });
      const unfiltered = cases.find(({ recording }) => isFast(recording))!;
      expect(read(unfiltered.k).found.channels[0]).toMatchObject({ low: 0, high: 0, notch: 50 });
    });

    it.each(cases)('annotations at their samples, coded and in words: $name', ({ recording, k }) => {
      const { found } = read(k);
      const { title } = recording.parameters;
      const remarks = found.annotations.filter(({ group }) => group === 0).map(({ text }) => text);
      expect(remarks).toEqual([`${syntheticCaution}. ${educationCaution}`, ...(title === '' ? [] : [title])]);
      const placed = found.annotations.filter(({ group }) => group !== 0);
      const events = codedEvents(recording.events, recording.parameters);
      expect(placed).toHaveLength(2 * events.length);
      expect(placed.every(({ type, channels }) => type === 'POINT' && channels.join() === '1,0')).toBe(true);
      events.forEach(({ timeS, term, words }, i) => {
        const [code, text] = placed.slice(2 * i, 2 * i + 2);
        expect(code.code?.slice(0, 2)).toEqual([term.code, 'MDC']);
        expect(text.text).toBe(words);
        // Positions count from 1; the last sample takes what rounds beyond it.
        const samples = timeS * found.rate;
        for (const { position } of [code, text]) {
          expect(Math.abs(position! - 1 - samples)).toBeLessThanOrEqual(
            samples > found.length - 1 ? 1 : 0.5 + 1e-6,
          );
          expect(position).toBeLessThanOrEqual(found.length);
        }
      });
    });

    it('shortens only what the standard’s lengths ask for, and says so', () => {
      const { found } = read(0);
      expect(longTitle.startsWith(found.study)).toBe(true);
      expect(Buffer.byteLength(found.study)).toBeGreaterThan(60);
      expect(warnings[0].some((text) => text.includes('title shortened'))).toBe(true);
      expect(warnings[1]).toEqual([]);
    });

    // PS3.16 CID 3001 and CID 3335 as pydicom holds them (generated from the standard).
    it('codes of leads, beats, spikes and P waves are those of the standard', () => {
      const program = `
import json
from pydicom.sr import _concepts_dict
terms = {}
for concept in _concepts_dict.concepts['MDC'].values():
    for code, (meaning, groups) in concept.items():
        for group in groups:
            terms.setdefault('%d %s' % (group, code), []).append(meaning)
print(json.dumps(terms))`;
      const terms = JSON.parse(runPython(program)) as Record<string, string>;
      const { paced, ...beats } = beatTerms;
      for (const { code, meaning } of [...Object.values(beats), ...Object.values(spikeTerms), pWaveTerm]) {
        expect(terms[`3335 ${code}`]).toContain(meaning);
      }
      // The table of the standard gives 10:8704 twice, and pydicom keeps the other meaning; ours is in the text of the CID.
      expect(terms[`3335 ${paced.code}`]).toEqual(['ventricle Defibrillation spike']);
      for (const { code, meaning } of Object.values(leadTerms)) {
        expect(terms[`3001 ${code}`]).toContain(meaning);
      }
    });
  },
);

/** SciPy's window method (firwin) with the same length and limit, every second sample, edges held. */
const firwinProgram = `
import sys
import numpy as np
from scipy.signal import firwin
samples = np.fromfile(sys.argv[1], dtype='<f8').reshape(int(sys.argv[2]), -1)
filtered = [np.convolve(np.pad(row, 50, 'edge'), firwin(101, 450, fs=2000), 'valid')[::2] for row in samples]
np.asarray(filtered).astype('<f8').tofile(sys.argv[1])
`;

describe.skipIf(!hasPythonModule('scipy.signal') || !hasPythonModule('pydicom'))(
  'DICOM of 2000 samples/s against SciPy’s resampling (skipped without python3-scipy, python3-pydicom)',
  () => {
    it('holds every second sample of the same low-pass to half a step, and warns', () => {
      const { recording, k } = cases.find((one) => isFast(one.recording))!;
      const { found, rows } = read(k);
      const input = measuredLeads.flatMap((lead) => Array.from(recording.leads[lead], (mv) => mv * 1000));
      const path = join(folder, 'fast.f64');
      writeFileSync(path, Buffer.from(Float64Array.from(input).buffer));
      runPython(firwinProgram, [path, String(measuredLeads.length)]);
      const expected = readDoubles(path);
      measuredLeads.forEach((lead, i) => {
        const row = rows[leadNames.indexOf(lead)];
        const worst = row.reduce(
          (most, value, n) => Math.max(most, Math.abs(value - expected[i * found.length + n])),
          0,
        );
        expect(worst).toBeLessThanOrEqual(recording.resolutionUv / 2 + exactFileUv);
      });
      // Einthoven and Goldberger (LD-01 to LD-06) still hold exactly.
      const [I, II, III, aVR] = rows;
      I.forEach((value, n) => {
        expect(Math.abs(II[n] - value - III[n])).toBeLessThan(exactFileUv);
        expect(Math.abs(-(value + II[n]) / 2 - aVR[n])).toBeLessThan(exactFileUv);
      });
      expect(warnings[k]).toEqual([expect.stringMatching(/^resampled from 2000 to 1000 samples\/s/)]);
    });
  },
);

describe.skipIf(!hasProgram('/usr/bin/dciodvfy'))(
  'DICOM under the dciodvfy validator (skipped without dicom3tools)',
  () => {
    it.each(cases)('no error and no warning: $name', ({ recording, k }) => {
      const { status, stdout, stderr } = spawnSync('/usr/bin/dciodvfy', [pathOf(k)], { encoding: 'utf8' });
      // The name of the object it checked against is all it prints.
      expect((stdout + stderr).trim()).toBe(isLong(recording) ? 'GeneralECG' : 'TwelveLeadECG');
      expect(status).toBe(0);
    });
  },
);

describe.skipIf(!hasProgram('/usr/bin/dcm2json'))('DICOM under DCMTK (skipped without dcmtk)', () => {
  it.each(cases)('is a DICOM file with the class and title meant: $name', ({ recording, k }) => {
    expect(runReader('/usr/bin/dcmftest', [pathOf(k)])).toMatch(/^yes: /);
    const json = JSON.parse(runReader('/usr/bin/dcm2json', [pathOf(k)])) as Record<
      string,
      { Value?: string[] }
    >;
    expect(json['00080016'].Value).toEqual([isLong(recording) ? general : twelveLead]);
    const { title } = recording.parameters;
    const [study] = json['00081030'].Value!;
    expect(title === '' ? study === syntheticCaution : title.startsWith(study)).toBe(true);
    expect(json['0008103E'].Value).toEqual([syntheticCaution]);
  });
});
