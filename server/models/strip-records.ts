import type { Transaction } from 'sequelize';
import { engineVersion } from '../../shared/engine/engine-version';
import type { Visibility } from '../../shared/api/strips';
import { foldText } from '../../shared/api/text';
import type { Database } from './database';
import type { StripRow } from './models';
import { searchTextOf } from './search-text';

/** A saved strip with what belongs to it from other tables. */
export interface StripRecord {
  id: string;
  owner: { id: string; name: string } | null;
  departmentId: string | null;
  visibility: Visibility;
  title: string;
  teachingPoint: string;
  tags: string[];
  groupId: string | null;
  /** JSON as stored. */
  parameters: string;
  version: number;
  /** The engine that it was last saved with. */
  engineVersion: string;
  /** The id it had in the preset file that it came with; null when it was made here. */
  presetId: string | null;
  createdAt: string;
  updatedAt: string;
  deletedAt: string | null;
}

/** The part of a strip that a save writes. */
export interface StripContent {
  title: string;
  teachingPoint: string;
  tags: readonly string[];
  groupId: string | null;
  visibility: Visibility;
  /** Complete parameters; `notes` is searched. */
  parameters: { notes: string };
  /** The engine that it was last saved with; this one unless it comes from elsewhere. */
  engineVersion?: string;
}

/** Columns that follow from a strip's content. */
export function contentColumns(content: StripContent) {
  return {
    title: content.title,
    titleKey: foldText(content.title),
    teachingPoint: content.teachingPoint,
    groupId: content.groupId,
    visibility: content.visibility,
    parameters: JSON.stringify(content.parameters),
    engineVersion: content.engineVersion ?? engineVersion,
    searchText: searchTextOf([
      content.title,
      content.teachingPoint,
      ...content.tags,
      content.parameters.notes,
    ]),
  };
}

/** Replaces a strip's tags. */
export async function writeTags(
  database: Database,
  stripId: string,
  tags: readonly string[],
  transaction: Transaction,
): Promise<void> {
  await database.stripTags.destroy({ where: { stripId }, transaction });
  const rows = tags.map((tag, position) => ({ stripId, position, tag, tagKey: foldText(tag) }));
  await database.stripTags.bulkCreate(rows, { transaction });
}

function toRecord(row: StripRow, ownerNames: Map<string, string>, tags: string[]): StripRecord {
  const { id, departmentId, visibility, title, teachingPoint, groupId, parameters } = row;
  const { version, engineVersion: savedWith, presetId, createdAt, updatedAt, deletedAt } = row;
  return {
    id,
    owner: row.ownerId === null ? null : { id: row.ownerId, name: ownerNames.get(row.ownerId) ?? '' },
    departmentId,
    visibility,
    title,
    teachingPoint,
    tags,
    groupId,
    parameters,
    version,
    engineVersion: savedWith,
    presetId,
    createdAt,
    updatedAt,
    deletedAt,
  };
}

/** Strips by id, in the order of the ids; ids without a row are left out. Deleted ones are included. */
export async function readStrips(
  database: Database,
  ids: readonly string[],
  transaction?: Transaction,
): Promise<StripRecord[]> {
  const rows = await database.strips.findAll({ where: { id: [...ids] }, transaction });
  const tags = await database.stripTags.findAll({
    where: { stripId: [...ids] },
    order: ['stripId', 'position'],
    transaction,
  });
  const ownerIds = [...new Set(rows.flatMap((row) => row.ownerId ?? []))];
  const owners = await database.users.findAll({ where: { id: ownerIds }, transaction });
  const ownerNames = new Map(owners.map((owner) => [owner.id, owner.name]));
  const byId = new Map(rows.map((row) => [row.id, row]));
  return ids.flatMap((id) => {
    const row = byId.get(id);
    const own = tags.filter((tag) => tag.stripId === id).map((tag) => tag.tag);
    return row ? [toRecord(row, ownerNames, own)] : [];
  });
}
