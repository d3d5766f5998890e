import { describe, expect, it } from 'vitest';
import { writeBundle } from '../../../server/exports/bundle';
import { exporters } from '../../../server/exports/exporters';
import { renderStrip } from '../../../shared/engine/render';
import { exportFormats, nominalStart } from '../../../shared/formats/export-format';
import { buildStrip } from '../../support/strips';

const options = { madeAt: nominalStart };
const recording = renderStrip(buildStrip({ durationS: 150, pacing: { source: 'implanted', mode: 'VVI' } }));

describe('how far a file is', () => {
  it.each(exportFormats)('%s has as many parts as it says', async (format) => {
    const { files } = await exporters[format](recording, options);
    for (const { parts, partCount } of files) {
      if (partCount !== undefined) expect([...parts]).toHaveLength(partCount);
    }
  });

  it('is told for the long files of an archive part by part, from nothing to all', async () => {
    const shares: number[] = [];
    const sink = { write: () => undefined, onShare: (share: number) => shares.push(share) };
    await writeBundle(recording, ['csv', 'edf', 'events'], options, sink);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    // CSV: a head and 75,000 rows in two blocks. EDF+: a header and 150 records in three blocks.
    expect(shares.filter((share) => share < 1 / 3)).toHaveLength(2);
    expect(shares.filter((share) => share > 1 / 3 && share < 2 / 3)).toHaveLength(3);
    expect(shares.at(-1)).toBe(1);
  });
});
