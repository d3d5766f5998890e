import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { bundleExports, type BundleManifest } from '../../server/exports/bundle';
import { exporters } from '../../server/exports/exporters';
import { renderStrip } from '../../shared/engine/render';
import { exportFormats, nominalStart } from '../../shared/formats/export-format';
import { fileBytes, longTitle, temporaryFolder } from '../support/exports';
import { hasPythonModule, runPython } from '../support/python';
import { buildStrip } from '../support/strips';

const options = { madeAt: nominalStart };
const recording = renderStrip(
  buildStrip({ durationS: 2, seed: 9, title: longTitle, pacing: { source: 'implanted', mode: 'DDD' } }),
);

/** Python's zipfile and hashlib: names in order, CRCs tested, checksums and lengths of what comes out. */
const program = `
import hashlib, json, sys, zipfile
archive = zipfile.ZipFile(sys.argv[1])
print(json.dumps({
  'broken': archive.testzip(),
  'manifest': json.loads(archive.read('manifest.json').decode('utf8')),
  'files': [{'name': one.filename, 'bytes': one.file_size, 'date': list(one.date_time),
             'sha256': hashlib.sha256(archive.read(one)).hexdigest()} for one in archive.infolist()],
}))
`;

interface Found {
  broken: string | null;
  manifest: BundleManifest;
  files: { name: string; bytes: number; date: number[]; sha256: string }[];
}

const folder = temporaryFolder();

describe.skipIf(!hasPythonModule('zipfile'))('bundles read by Python (skipped without python3)', () => {
  it('hold every format with a manifest whose lengths and checksums are those of the files', async () => {
    const { bytes, manifest } = await bundleExports(recording, exportFormats, options);
    const path = join(folder, 'strip.zip');
    writeFileSync(path, bytes);
    const found = JSON.parse(runPython(program, [path])) as Found;
    expect(found.broken).toBeNull();
    expect(found.manifest).toEqual(manifest);
    expect(found.files.every(({ date }) => date.join() === '2000,1,1,0,0,0')).toBe(true);
    const inside = found.files.filter(({ name }) => name !== 'manifest.json');
    expect(inside.map(({ name, bytes: length, sha256 }) => [name, length, sha256])).toEqual(
      manifest.files.map(({ name, bytes: length, sha256 }) => [name, length, sha256]),
    );
    expect(manifest).toMatchObject({
      format: 'paceloom-bundle',
      formatVersion: 1,
      synthetic: 'Synthetic teaching strip, not a patient recording',
      engineVersion: recording.engineVersion,
      title: longTitle,
      seed: 9,
      durationS: 2,
      sampleRateHz: 500,
    });
    expect([...new Set(manifest.files.map(({ format }) => format))]).toEqual([...exportFormats]);
  });

  it('carry every warning with its format', async () => {
    const { manifest } = await bundleExports(recording, ['wav', 'edf', 'wav'], options);
    expect(manifest.files.map(({ name }) => name)).toEqual(['strip.wav', 'strip.edf']);
    const expected = [];
    for (const format of ['wav', 'edf'] as const) {
      const { warnings } = await exporters[format](recording, options);
      expected.push(...warnings.map((text) => ({ format, text })));
    }
    expect(manifest.warnings).toEqual(expected);
    expect(expected[0].text).toContain('never connect to a person');
  });

  it('are the same bytes for the same strip, and hold what the loose files hold', async () => {
    const first = await bundleExports(recording, ['csv', 'dicom'], options);
    const second = await bundleExports(renderStrip(recording.parameters), ['csv', 'dicom'], options);
    expect(Buffer.compare(first.bytes, second.bytes)).toBe(0);
    const { files } = await exporters.csv(recording, options);
    expect(first.manifest.files[0].bytes).toBe(fileBytes(files[0]).length);
  });

  it('refuse what a format cannot hold before anything is made', async () => {
    const long = { ...recording, parameters: buildStrip({ durationS: 400 }) };
    await expect(bundleExports(long, ['edf', 'svg'], options)).rejects.toThrow('at most 300 s for svg');
  });
});
