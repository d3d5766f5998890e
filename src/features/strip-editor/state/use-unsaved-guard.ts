import { useEffect, useRef } from 'react';
import { useBlocker, type Blocker } from 'react-router-dom';

export interface UnsavedGuard {
  /** Blocked while the person is asked. */
  blocker: Blocker;
  /** The next way out needs no asking: the work was just saved under a new address. */
  letGo(): void;
}

/** Asks before unsaved work is left: by a link (the blocker) or by closing the tab (the browser asks). */
export function useUnsavedGuard(unsaved: boolean): UnsavedGuard {
  const free = useRef(false);
  useEffect(() => {
    if (!unsaved) return;
    const ask = (event: BeforeUnloadEvent): void => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [unsaved]);
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      unsaved && !free.current && currentLocation.pathname !== nextLocation.pathname,
  );
  return {
    blocker,
    letGo: () => {
      free.current = true;
    },
  };
}
