/** Every address of the product in one place; links are made here and nowhere else. */
export const paths = {
  /** Sends everyone to where their role starts. */
  start: () => '/',
  signIn: (from?: string) => (from ? `/sign-in?from=${encodeURIComponent(from)}` : '/sign-in'),
  strips: () => '/strips',
  /** The strips changed last, first. */
  latestStrips: () => '/strips?sort=updated',
  newStrip: () => '/strips/new',
  strip: (stripId: string) => `/strips/${encodeURIComponent(stripId)}`,
  exports: () => '/exports',
  /** The printed sheet of a strip; `search` as the sheet page writes it. */
  sheet: (stripId: string, search?: URLSearchParams) => {
    const query = search?.toString();
    return `/strips/${encodeURIComponent(stripId)}/sheet${query ? `?${query}` : ''}`;
  },
  recorder: (search?: URLSearchParams) => `/recorder${search ? `?${search.toString()}` : ''}`,
  help: () => '/help',
} as const;
