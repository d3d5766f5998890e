import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { StripListQuery } from '../../shared/api/strip-list';
import { courseGroups, type CourseGroupId } from '../../shared/gallery/course';
import { keeperSql, type Where } from './strip-filter';

/** Tags a facet lists at most. */
const mostTagFacets = 40;

async function select<Result extends object>(
  sequelize: Sequelize,
  sql: string,
  bind: Record<string, string | number>,
  transaction?: Transaction,
): Promise<Result[]> {
  return sequelize.query<Result>(sql, { bind, type: QueryTypes.SELECT, transaction });
}

/** Place of a strip's group in the course; those without one come last. */
const courseOrderSql = `CASE s.group_id ${courseGroups
  .map((group, place) => `WHEN '${group.id}' THEN ${place}`)
  .join(' ')} ELSE ${courseGroups.length} END`;

function orderSql(sort: StripListQuery['sort'], descending: boolean): string {
  const way = descending ? 'DESC' : 'ASC';
  if (sort === 'title') return `s.title_key ${way}, s.id ${way}`;
  if (sort === 'updated') return `s.updated_at ${way}, s.title_key, s.id`;
  return `${courseOrderSql} ${way}, s.course_position IS NULL ${way}, s.course_position ${way}, s.title_key ${way}, s.id ${way}`;
}

export interface StripPage {
  sort: StripListQuery['sort'];
  direction?: StripListQuery['direction'];
  page: number;
  pageSize: number;
}

/** Ids of one page, in order. */
export async function selectStripIds(
  sequelize: Sequelize,
  where: Where,
  wanted: StripPage,
): Promise<string[]> {
  const natural = wanted.sort === 'updated' ? 'descending' : 'ascending';
  const order = orderSql(wanted.sort, (wanted.direction ?? natural) === 'descending');
  const rows = await select<{ id: string }>(
    sequelize,
    `SELECT s.id FROM strips s WHERE ${where.sql} ORDER BY ${order} LIMIT $limit OFFSET $offset`,
    { ...where.bind, limit: wanted.pageSize, offset: (wanted.page - 1) * wanted.pageSize },
  );
  return rows.map((row) => row.id);
}

export interface KeeperCounts {
  everyone: number;
  me: number;
  department: number;
  gallery: number;
}

/** How many strips there are, and kept by whom. */
export async function countByKeeper(sequelize: Sequelize, where: Where): Promise<KeeperCounts> {
  const [counts] = await select<KeeperCounts>(
    sequelize,
    `SELECT count(*) AS everyone, total(${keeperSql.me}) AS me, total(${keeperSql.department}) AS department,
       total(${keeperSql.gallery}) AS gallery FROM strips s WHERE ${where.sql}`,
    where.bind,
  );
  return counts;
}

/** How many strips each course group holds; groups without one are left out. */
export async function countByGroup(sequelize: Sequelize, where: Where): Promise<Map<CourseGroupId, number>> {
  const rows = await select<{ id: CourseGroupId; count: number }>(
    sequelize,
    `SELECT s.group_id AS id, count(*) AS count FROM strips s
     WHERE ${where.sql} AND s.group_id IS NOT NULL GROUP BY s.group_id`,
    where.bind,
  );
  return new Map(rows.map((row) => [row.id, row.count]));
}

/** The commonest tags, spelt as most recently saved. */
export async function countByTag(
  sequelize: Sequelize,
  where: Where,
): Promise<{ tag: string; count: number }[]> {
  const rows = await select<{ tag: string; count: number; latest: string }>(
    sequelize,
    `SELECT t.tag, count(*) AS count, max(s.updated_at) AS latest FROM strips s
     JOIN strip_tags t ON t.strip_id = s.id WHERE ${where.sql}
     GROUP BY t.tag_key ORDER BY count DESC, t.tag_key LIMIT ${mostTagFacets}`,
    where.bind,
  );
  return rows.map(({ tag, count }) => ({ tag, count }));
}

/** How many strips the filters leave. */
export async function countStrips(sequelize: Sequelize, where: Where): Promise<number> {
  const [{ count }] = await select<{ count: number }>(
    sequelize,
    `SELECT count(*) AS count FROM strips s WHERE ${where.sql}`,
    where.bind,
  );
  return count;
}

/** Ids of the strips that one of these presets may be: by its id here or where it came from, or by its title. */
export async function selectPresetCandidates(
  sequelize: Sequelize,
  where: Where,
  presets: readonly { presetId: string | null; title: string }[],
  transaction?: Transaction,
): Promise<string[]> {
  const presetIds = JSON.stringify(presets.flatMap(({ presetId }) => presetId ?? []));
  const titles = JSON.stringify(presets.map(({ title }) => title));
  const rows = await select<{ id: string }>(
    sequelize,
    `SELECT s.id FROM strips s WHERE ${where.sql} AND (s.id IN (SELECT value FROM json_each($presetIds))
       OR s.preset_id IN (SELECT value FROM json_each($presetIds)) OR s.title IN (SELECT value FROM json_each($titles)))`,
    { ...where.bind, presetIds, titles },
    transaction,
  );
  return rows.map((row) => row.id);
}
