import { useCallback, useSyncExternalStore } from 'react';

/** From here on fields stand beside each other (the `tablet` breakpoint of the styles). */
export const tabletQuery = '(min-width: 48rem)';

/** Whether a media query holds now, and again whenever that changes. */
export function useMediaQuery(query: string): boolean {
  const subscribe = useCallback(
    (changed: () => void) => {
      const list = window.matchMedia(query);
      list.addEventListener('change', changed);
      return () => list.removeEventListener('change', changed);
    },
    [query],
  );
  return useSyncExternalStore(subscribe, () => window.matchMedia(query).matches);
}
