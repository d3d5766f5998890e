import { describe, expect, it } from 'vitest';
import * as sections from '../../../src/features/strip-editor/groups/sections';
import { parameterMeta } from '../../../src/features/strip-editor/state/parameter-paths';
import { buildStrip } from '../../support/strips';

const leaves = (value: object, prefix = ''): string[] =>
  Object.entries(value).flatMap(([key, inner]) =>
    typeof inner === 'object' && inner !== null && !Array.isArray(inner)
      ? leaves(inner as object, `${prefix}${key}.`)
      : [`${prefix}${key}`],
  );

const shown = [
  ...sections.patientSections,
  ...sections.pacingSections,
  ...sections.waveformSections,
  ...sections.disturbanceSections,
  sections.sheetSection,
].flatMap((section) => section.paths);
const leads = (['atrialLead', 'rightVentricularLead', 'leftVentricularLead'] as const).flatMap(
  sections.leadPaths,
);
const all = new Set([
  ...shown,
  ...leads,
  ...sections.temporaryLeadPaths,
  ...sections.chestPaths,
  ...sections.recorderPaths,
]);

// These have a place of their own: title dialog, tool row, the tab of faults.
const elsewhere = [
  'schemaVersion',
  'title',
  'notes',
  'durationS',
  'sheet.layout',
  'sheet.leads',
  'sheet.speedMmPerS',
  'sheet.gainMmPerMv',
  'pacing.faults',
];

describe('fields of the editor', () => {
  it('are there for every parameter of the schema', () => {
    const missing = leaves(buildStrip({})).filter((path) => !all.has(path) && !elsewhere.includes(path));
    expect(missing).toEqual([]);
  });

  it('stand in one group each', () => {
    const once = [...shown, ...leads];
    expect(once.length).toBe(new Set(once).size);
  });

  it('have help, and numbers a usual range or a reason to have none', () => {
    const free = ['seed', 'surfaceSpikeMv', 'resolutionUv', 'axisRotationDeg', 'qrsScale', 'tScale'];
    for (const path of all) {
      if (path.startsWith('recorder.')) continue;
      const meta = parameterMeta(path);
      expect(meta.help.length, path).toBeGreaterThan(10);
      if (meta.kind !== 'number' || free.some((end) => path.endsWith(end))) continue;
      expect(meta.usual, path).toBeDefined();
      const [from, to] = meta.usual ?? [0, 0];
      expect(from >= meta.min && to <= meta.max && from < to, path).toBe(true);
    }
  });
});
