import { describe, expect, it } from 'vitest';
import { exporters } from '../../../server/exports/exporters';
import { renderStrip } from '../../../shared/engine/render';
import { nominalStart } from '../../../shared/formats/export-format';
import type { stripJson } from '../../../shared/formats/strip-json';
import { parseStripParameters } from '../../../shared/parameters/parse';
import { exportCases, fileBytes, longTitle } from '../../support/exports';
import { buildStrip } from '../../support/strips';

const recording = renderStrip(buildStrip(Object.values(exportCases)[0]));

describe('strip JSON', () => {
  it('is versioned, synthetic by its own word, and makes the same strip again', async () => {
    const { files, warnings } = await exporters.json(recording, { madeAt: nominalStart });
    expect(files.map(({ name }) => name)).toEqual(['strip.json']);
    expect(warnings).toEqual([]);
    const read = JSON.parse(fileBytes(files[0]).toString('utf8')) as ReturnType<typeof stripJson>;
    expect(read).toMatchObject({
      format: 'paceloom-strip-json',
      formatVersion: 1,
      synthetic: 'Synthetic teaching strip, not a patient recording',
      samplesPerLead: 6250,
      sampleRateHz: 500,
      resolutionUv: 5,
    });
    expect(read.parameters.title).toBe(longTitle);
    expect(read.events).toEqual(recording.events);
    expect(read.reading).toEqual(recording.reading);
    const again = renderStrip(parseStripParameters(read.parameters));
    expect(again.leads).toEqual(recording.leads);
  });
});
