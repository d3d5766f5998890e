import { stripListQuerySchema, type StripListQuery } from '../../../shared/api/strip-list';

export type LibraryView = 'cards' | 'table';

/** The list's filters, kept in the address bar so that a reload or a link shows the same. */
export interface LibraryState {
  query: StripListQuery;
  view: LibraryView;
}

const cardsAPage = 24;

/** Reads the address; what cannot be read counts as not given. */
export function readLibraryState(search: URLSearchParams): LibraryState {
  const given = {
    search: search.get('search') ?? undefined,
    tag: search.getAll('tag'),
    keptBy: search.get('keptBy') ?? undefined,
    group: search.get('group') ?? undefined,
    sort: search.get('sort') ?? undefined,
    direction: search.get('direction') ?? undefined,
    page: search.get('page') ?? undefined,
    pageSize: cardsAPage,
  };
  const parsed = stripListQuerySchema.safeParse(given);
  return {
    query: parsed.success ? parsed.data : stripListQuerySchema.parse({ pageSize: cardsAPage }),
    view: search.get('view') === 'table' ? 'table' : 'cards',
  };
}

/** The address for filters; defaults are left out. A change of any filter goes back to the first page. */
export function writeLibraryState(
  search: URLSearchParams,
  change: Record<string, string | string[] | null>,
): URLSearchParams {
  const next = new URLSearchParams(search);
  if (!('page' in change)) next.delete('page');
  for (const [key, value] of Object.entries(change)) {
    next.delete(key);
    for (const one of value === null ? [] : [value].flat()) next.append(key, one);
  }
  return next;
}
