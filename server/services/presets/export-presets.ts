import type { ExportPresets } from '../../../shared/api/preset-files';
import { mostPresetsInFile, writePresetFile, type FiledPreset } from '../../../shared/formats/preset-file';
import { invalidInput, notFound } from '../../errors';
import type { Database } from '../../models/database';
import { whereOf } from '../../models/strip-filter';
import { selectStripIds } from '../../models/strip-queries';
import { readStrips, type StripRecord } from '../../models/strip-records';
import type { Account } from '../session/account';
import { seen } from '../strips/access';
import { contentOfStrip } from './preset-content';

/** Ids of what filters leave, in the order of the course; refuses none and more than a file holds. */
async function filteredIds(
  { sequelize }: Database,
  account: Account,
  filter: NonNullable<ExportPresets['filter']>,
): Promise<string[]> {
  const where = whereOf(account, { ...filter, tags: filter.tag });
  const page = { sort: 'course', page: 1, pageSize: mostPresetsInFile + 1 } as const;
  const ids = await selectStripIds(sequelize, where, page);
  if (ids.length >= 1 && ids.length <= mostPresetsInFile) return ids;
  const value = ids.length === 0 ? 'no strip' : `more than ${mostPresetsInFile} strips`;
  throw invalidInput([
    { path: 'filter', value, allowed: `filters that leave 1 to ${mostPresetsInFile} strips` },
  ]);
}

/**
 * Under which id each strip travels: the one it came with, so that it is recognised where it came from; its own where
 * another strip of the file has that one.
 */
function travelIds(strips: readonly StripRecord[]): string[] {
  const taken = new Set(strips.map(({ id }) => id));
  return strips.map(({ id, presetId }) => {
    if (presetId === null || taken.has(presetId)) return id;
    taken.add(presetId);
    return presetId;
  });
}

function filedPreset(strip: StripRecord, presetId: string): FiledPreset {
  return { presetId, engineVersion: strip.engineVersion, ...contentOfStrip(strip) };
}

/** Strips the account may see as the text of a preset file. Throws `notFound`, `invalidInput`. */
export async function exportPresets(
  database: Database,
  account: Account,
  { ids, filter }: ExportPresets,
): Promise<string> {
  const wanted = filter ? await filteredIds(database, account, filter) : [...new Set(ids)];
  const found = new Map((await readStrips(database, wanted)).map((strip) => [strip.id, strip]));
  const strips = wanted.map((id) => seen(account, found.get(id)));
  if (strips.length === 0) throw notFound('strip');
  const travelling = travelIds(strips);
  return writePresetFile(strips.map((strip, index) => filedPreset(strip, travelling[index])));
}
