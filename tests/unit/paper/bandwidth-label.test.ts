import { expect, it } from 'vitest';
import { bandwidthLabel } from '../../../shared/paper/bandwidth-label';
import { parseStripParameters } from '../../../shared/parameters/parse';
import type { StripParametersInput } from '../../../shared/parameters/strip-parameters';

it.each([
  [{}, '0.05–150 Hz'],
  [{ bandwidth: 'monitor' }, '0.5–40 Hz'],
  [{ bandwidth: 'slowWave', mainsNotchHz: 60 }, '0.05–40 Hz, 60 Hz notch'],
  [{ bandwidth: 'unfiltered' }, 'unfiltered'],
  [{ bandwidth: 'unfiltered', mainsNotchHz: 50 }, 'unfiltered, 50 Hz notch'],
  [{ bandwidth: { lowHz: 0.67, highHz: 100 } }, '0.67–100 Hz'],
] as [StripParametersInput['recorder'], string][])('%j is written %s', (recorder, label) => {
  expect(bandwidthLabel(parseStripParameters({ recorder }).recorder)).toBe(label);
});
