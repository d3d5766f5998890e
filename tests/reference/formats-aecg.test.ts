import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { codedEvents } from '../../shared/formats/coded-events';
import { educationCaution, syntheticCaution } from '../../shared/paper/cautions';
import { leadNames } from '../../shared/parameters/sheet';
import { readCsvColumns, readDoubles, worstDifferenceUv, writtenCases } from '../support/exports';
import { hasProgram, hasPythonModule, runPython, runReader } from '../support/python';
import { exactFileUv } from '../support/tolerances';

/**
 * A reader on Python's own XML parser, by the structure that public readers expect: value = origin + scale × digit, times
 * as HL7 time stamps (YYYYMMDDHHMMSS.UUUU).
 */
const program = `
import json, sys
from datetime import datetime
import numpy as np
import xml.etree.ElementTree as tree
v3 = '{urn:hl7-org:v3}'
xsi = '{http://www.w3.org/2001/XMLSchema-instance}type'
root = tree.parse(sys.argv[1]).getroot()
path = lambda *names: '/'.join(v3 + name for name in names)
seconds = lambda stamp: (datetime.strptime(stamp, '%Y%m%d%H%M%S.%f') - datetime(2000, 1, 1)).total_seconds()
series = root.find(path('component', 'series'))
sequences = series.findall(path('component', 'sequenceSet', 'component', 'sequence'))
clock, leads = sequences[0].find(v3 + 'value'), sequences[1:]
rows, units = [], []
for lead in leads:
    value = lead.find(v3 + 'value')
    origin, scale = value.find(v3 + 'origin'), value.find(v3 + 'scale')
    units.append([value.get(xsi), origin.get('unit'), scale.get('unit')])
    digits = np.array([int(digit) for digit in value.find(v3 + 'digits').text.split()])
    rows.append(float(origin.get('value')) + float(scale.get('value')) * digits)
np.asarray(rows).astype('<f8').tofile(sys.argv[2])
annotations = []
for one in series.findall(path('subjectOf', 'annotationSet', 'component', 'annotation')):
    value = one.find(v3 + 'value')
    low = one.find(path('support', 'supportingROI', 'component', 'boundary', 'value', 'low'))
    annotations.append([seconds(low.get('value')), one.find(v3 + 'code').get('code'), value.get('code'),
                        value.find(v3 + 'originalText').text])
print(json.dumps({
  'root': root.tag, 'text': root.find(v3 + 'text').text, 'code': root.find(v3 + 'code').get('code'),
  'length': len(rows[0]), 'units': units, 'clock': clock.get(xsi),
  'leads': [lead.find(v3 + 'code').get('code') for lead in leads],
  'start': seconds(clock.find(v3 + 'head').get('value')),
  'end': seconds(series.find(path('effectiveTime', 'high')).get('value')),
  'incrementS': float(clock.find(v3 + 'increment').get('value')), 'annotations': annotations,
  'filters': [one.get('value') for one in series.findall('.//' + path('controlVariable', 'value'))],
}))
`;

interface Found {
  root: string;
  text: string;
  code: string;
  length: number;
  units: string[][];
  clock: string;
  leads: string[];
  start: number;
  end: number;
  incrementS: number;
  annotations: [timeS: number, kind: string, code: string, words: string][];
  filters: string[];
}

const { cases, folder, pathOf, warnings } = writtenCases('aecg', 'strip.xml');

// FM-60 to FM-62.
const leadCodes = leadNames.map((lead) => `MDC_ECG_LEAD_${lead.toUpperCase()}`);

it('loses nothing in HL7 aECG', () => {
  expect(warnings.flat()).toEqual([]);
});

describe.skipIf(!hasPythonModule('numpy'))('HL7 aECG read back (skipped without python3-numpy)', () => {
  const read = (k: number): { found: Found; rows: Float64Array[] } => {
    const found = JSON.parse(runPython(program, [pathOf(k), join(folder, `${k}.f64`)])) as Found;
    const samples = readDoubles(join(folder, `${k}.f64`));
    return {
      found,
      rows: leadNames.map((_, i) => samples.subarray(i * found.length, (i + 1) * found.length)),
    };
  };

  it.each(cases)('samples, leads, rate, units, cautions: $name', ({ recording, k }) => {
    const { found, rows } = read(k);
    const { length } = recording.leads.I;
    expect(found).toMatchObject({
      root: '{urn:hl7-org:v3}AnnotatedECG',
      code: '93000',
      clock: 'GLIST_TS',
      leads: leadCodes,
      length,
      start: 0,
    });
    expect(found.incrementS).toBe(1 / recording.sampleRateHz);
    expect(found.end).toBeCloseTo(length / recording.sampleRateHz, 4);
    expect(found.units).toEqual(leadNames.map(() => ['SLIST_PQ', 'uV', 'uV']));
    expect(found.text).toBe(`${syntheticCaution}. ${educationCaution} ${recording.parameters.title}`.trim());
    leadNames.forEach((lead, i) => {
      expect(rows[i].length).toBe(length);
      expect(worstDifferenceUv(recording.leads[lead], rows[i])).toBeLessThan(exactFileUv);
    });
  });

  it.each(cases)('every event at a tenth of a millisecond with its term: $name', ({ recording, k }) => {
    const { found } = read(k);
    const events = codedEvents(recording.events, recording.parameters);
    expect(found.annotations.map(([, , code, words]) => [code, words])).toEqual(
      events.map(({ term, words }) => [term.name, words]),
    );
    const tenthOfMs = 1e-4;
    found.annotations.forEach(([timeS, kind], i) => {
      expect(Math.abs(timeS - events[i].timeS)).toBeLessThanOrEqual(tenthOfMs / 2 + 1e-9);
      expect(events[i].term.name.startsWith(kind)).toBe(true);
    });
  });

  it('states the recorder’s filters', () => {
    expect(read(0).found.filters).toEqual(['150', '0.05']);
    const unfiltered = cases.find(({ recording }) => recording.parameters.recorder.mainsNotchHz === 50)!;
    expect(read(unfiltered.k).found.filters).toEqual(['50']);
  });
});

describe.skipIf(!hasProgram('/usr/bin/xmllint'))(
  'HL7 aECG under xmllint (skipped without libxml2-utils)',
  () => {
    it.each(cases)('is well-formed: $name', ({ k }) => {
      expect(runReader('/usr/bin/xmllint', ['--noout', '--huge', pathOf(k)])).toBe('');
    });
  },
);

describe.skipIf(!hasProgram('/usr/bin/save2gdf'))(
  'HL7 aECG under BioSig (skipped without biosig-tools)',
  () => {
    it.each(cases)('samples, leads, rate: $name', ({ recording, k }) => {
      const header = JSON.parse(runReader('/usr/bin/save2gdf', ['-JSON', pathOf(k)])) as {
        TYPE: string;
        Samplingrate: number;
        NumberOfSamples: number;
        StartOfRecording: string;
        CHANNEL: { Label: string; PhysicalUnit: string }[];
      };
      expect(header).toMatchObject({
        TYPE: 'HL7aECG',
        NumberOfSamples: recording.leads.I.length,
        StartOfRecording: '2000-01-01 00:00:00',
      });
      expect(header.Samplingrate).toBeCloseTo(recording.sampleRateHz, 6);
      expect(header.CHANNEL.map(({ Label }) => Label.toUpperCase())).toEqual(
        leadNames.map((lead) => lead.toUpperCase()),
      );
      expect(header.CHANNEL.every(({ PhysicalUnit }) => PhysicalUnit === 'uV')).toBe(true);
      runReader('/usr/bin/save2gdf', ['-CSV', pathOf(k), join(folder, `${k}.csv`)]);
      const columns = readCsvColumns(join(folder, `${k}.csv`));
      leadNames.forEach((lead, i) => {
        expect(worstDifferenceUv(recording.leads[lead], columns[i])).toBeLessThan(recording.resolutionUv / 2);
      });
    });
  },
);
