import { parseStripParameters } from '../../../shared/parameters/parse';
import type { StripParameters } from '../../../shared/parameters/strip-parameters';
import type { StripRecord } from '../../models/strip-records';

/**
 * Parameters of a saved strip, through the schema, so that rows saved under an older one come complete. A row
 * that the schema no longer takes is a migration that was forgotten: an error of ours, which says which strip.
 */
export function readKeptParameters(strip: StripRecord): StripParameters {
  try {
    return parseStripParameters(JSON.parse(strip.parameters));
  } catch (error) {
    throw new Error(`the saved parameters of strip ${strip.id} cannot be read`, { cause: error });
  }
}
