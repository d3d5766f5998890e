import type { StripFacets, StripListQuery } from '../../../shared/api/strip-list';
import { courseGroups } from '../../../shared/gallery/course';
import type { Database } from '../../models/database';
import { whereOf, type StripFilter } from '../../models/strip-filter';
import {
  countByGroup,
  countByKeeper,
  countByTag,
  countStrips,
  selectStripIds,
} from '../../models/strip-queries';
import { readStrips, type StripRecord } from '../../models/strip-records';
import type { Account } from '../session/account';

export interface StripList {
  strips: StripRecord[];
  total: number;
  facets: StripFacets;
}

/** One page of what the account may see, with counts for the filters (see `stripFacetsSchema`). */
export async function listStrips(
  database: Database,
  account: Account,
  query: StripListQuery,
): Promise<StripList> {
  const { sequelize } = database;
  const filter: StripFilter = {
    search: query.search,
    tags: query.tag,
    keptBy: query.keptBy,
    group: query.group,
  };
  const where = whereOf(account, filter);
  const ids = await selectStripIds(sequelize, where, query);
  const groups = await countByGroup(sequelize, whereOf(account, { ...filter, group: undefined }));
  return {
    strips: await readStrips(database, ids),
    total: await countStrips(sequelize, where),
    facets: {
      keptBy: await countByKeeper(sequelize, whereOf(account, { ...filter, keptBy: 'everyone' })),
      groups: courseGroups.map(({ id, title }) => ({ id, title, count: groups.get(id) ?? 0 })),
      tags: await countByTag(sequelize, where),
    },
  };
}
