import type { StripListQuery } from '../../shared/api/strip-list';
import { foldText } from '../../shared/api/text';
import { containsPattern } from './search-text';

/** Who asks. */
export interface Viewer {
  userId: string;
  departmentId: string;
}

export interface StripFilter {
  search: string;
  tags: readonly string[];
  keptBy: StripListQuery['keptBy'];
  group?: string;
}

/** A WHERE clause over `strips AS s`, with the values bound to its parameters. */
export interface Where {
  sql: string;
  bind: Record<string, string>;
}

/** Words beyond these are not searched for. */
const mostWords = 12;

export const visibleSql = `s.deleted_at IS NULL AND (s.owner_id IS NULL OR s.owner_id = $userId
  OR (s.visibility = 'department' AND s.department_id = $departmentId))`;

/** When a strip is kept by whom; exactly one holds for each visible strip. */
export const keeperSql = {
  me: 's.owner_id = $userId',
  department: '(s.owner_id IS NOT NULL AND s.owner_id <> $userId)',
  gallery: 's.owner_id IS NULL',
} as const;

/** All filters that are set, joined by AND, over what the viewer may see. */
export function whereOf(viewer: Viewer, filter: StripFilter): Where {
  const bind: Record<string, string> = { userId: viewer.userId, departmentId: viewer.departmentId };
  const conditions = [visibleSql];
  if (filter.keptBy !== 'everyone') conditions.push(keeperSql[filter.keptBy]);
  if (filter.group !== undefined) {
    conditions.push('s.group_id = $groupId');
    bind.groupId = filter.group;
  }
  const words = filter.search.split(/\s+/).filter((word) => word !== '');
  words.slice(0, mostWords).forEach((word, i) => {
    conditions.push(`s.search_text LIKE $word${i} ESCAPE '\\'`);
    bind[`word${i}`] = containsPattern(word);
  });
  filter.tags.forEach((tag, i) => {
    conditions.push(`EXISTS (SELECT 1 FROM strip_tags f WHERE f.strip_id = s.id AND f.tag_key = $tag${i})`);
    bind[`tag${i}`] = foldText(tag);
  });
  return { sql: conditions.map((one) => `(${one})`).join(' AND '), bind };
}
