import { useEffect } from 'react';
import { useBlocker, type Blocker } from 'react-router-dom';

/** Asks before unsaved work is left: by a link (the returned blocker) or by closing the tab (the browser asks). */
export function useUnsavedGuard(unsaved: boolean): Blocker {
  useEffect(() => {
    if (!unsaved) return;
    const ask = (event: BeforeUnloadEvent): void => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [unsaved]);
  return useBlocker(
    ({ currentLocation, nextLocation }) => unsaved && currentLocation.pathname !== nextLocation.pathname,
  );
}
