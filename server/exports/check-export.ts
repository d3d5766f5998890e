import { InvalidInputError } from '../../shared/errors';
import type { ExportFormat } from '../../shared/formats/export-format';
import { longestDrawnS } from '../../shared/paper/layout';
import type { StripParameters } from '../../shared/parameters/strip-parameters';

/** Formats that hold pictures; one of more than five minutes would be metres long. */
const pictures: readonly ExportFormat[] = ['svg', 'png', 'pdf'];

/** Throws `InvalidInputError` when a format cannot hold such a strip; asked before anything is rendered. */
export function checkExport({ durationS }: StripParameters, formats: readonly ExportFormat[]): void {
  const picture = formats.find((format) => pictures.includes(format));
  if (!picture || durationS <= longestDrawnS) return;
  throw new InvalidInputError([
    { path: 'durationS', value: String(durationS), allowed: `at most ${longestDrawnS} s for ${picture}` },
  ]);
}
