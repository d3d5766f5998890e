/** Every address of the product in one place; links are made here and nowhere else. */
export const paths = {
  signIn: (from?: string) => (from ? `/sign-in?from=${encodeURIComponent(from)}` : '/sign-in'),
  strips: () => '/strips',
  /** The strips changed last, first. */
  latestStrips: () => '/strips?sort=updated',
  newStrip: () => '/strips/new',
  strip: (stripId: string) => `/strips/${encodeURIComponent(stripId)}`,
  exports: () => '/exports',
  recorder: (search?: URLSearchParams) => `/recorder${search ? `?${search.toString()}` : ''}`,
  help: () => '/help',
} as const;
