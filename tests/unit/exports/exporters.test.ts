import { describe, expect, it } from 'vitest';
import { checkExport } from '../../../server/exports/check-export';
import { exporters } from '../../../server/exports/exporters';
import { renderStrip } from '../../../shared/engine/render';
import { exportFormats, exportFormatWords, nominalStart } from '../../../shared/formats/export-format';
import { fileBytes, longTitle } from '../../support/exports';
import { buildStrip } from '../../support/strips';

const input = { durationS: 2, title: longTitle, pacing: { source: 'implanted', mode: 'VVI' } } as const;
const recording = renderStrip(buildStrip(input));
const options = { madeAt: nominalStart };

/** Formats without a place for a remark: columns of numbers, and lists whose shape is agreed. */
const withoutRemarks: readonly string[] = ['csv', 'events', 'reading'];

describe('exporters', () => {
  it('write no name twice, so that all formats fit into one folder', async () => {
    const names: string[] = [];
    for (const format of exportFormats) {
      const { files } = await exporters[format](recording, options);
      names.push(...files.map(({ name }) => name));
    }
    expect(new Set(names).size).toBe(names.length);
    expect(names).toContain('strip.dcm');
    expect(Object.keys(exportFormatWords).sort()).toEqual([...exportFormats].sort());
  });

  it.each(exportFormats)('make the same bytes of the same strip: %s', async (format) => {
    const first = await exporters[format](recording, options);
    const second = await exporters[format](renderStrip(buildStrip(input)), options);
    const bytes = ({ files }: typeof first): string[] =>
      files.map((file) => fileBytes(file).toString('base64'));
    expect(bytes(first)).toEqual(bytes(second));
  });

  it.each(exportFormats.filter((format) => !withoutRemarks.includes(format)))(
    'say in their own metadata that the strip is synthetic: %s',
    async (format) => {
      const { files } = await exporters[format](recording, options);
      const texts = files.map((file) => fileBytes(file).toString('latin1').replaceAll('_', ' '));
      expect(texts.some((text) => text.includes('Synthetic teaching strip, not a patient recording'))).toBe(
        true,
      );
    },
  );

  it.each(['edf', 'wfdb', 'dicom', 'aecg'] as const)(
    'name another start when given one: %s',
    async (format) => {
      const later = { madeAt: new Date(Date.UTC(2031, 10, 12, 13, 14, 15)) };
      const { files } = await exporters[format](recording, later);
      const text = files.map((file) => fileBytes(file).toString('latin1')).join();
      const expected = {
        edf: '12.11.3113.14.15',
        wfdb: ' 13:14:15 12/11/2031',
        dicom: '20311112131415+0000',
        aecg: 'value="20311112131415.0000"',
      };
      expect(text).toContain(expected[format]);
    },
  );

  it('refuse pictures of more than five minutes, and nothing else', () => {
    const long = buildStrip({ durationS: 301 });
    expect(() => checkExport(long, ['csv', 'png'])).toThrow('at most 300 s for png');
    expect(() => checkExport(long, ['edf', 'wfdb', 'dicom', 'aecg', 'wav', 'json'])).not.toThrow();
  });
});
