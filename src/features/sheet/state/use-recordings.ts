import { useEffect, useMemo, useRef, useState } from 'react';
import type { Strip } from '../../../../shared/api/strips';
import type { StripRecording } from '../../../../shared/engine/render';
import { createQueuedRenderer } from '../../../workers/strip-renderer';

/** What became of a strip: its samples, or why there are none; nothing while it is rendered. */
export type Rendered = { recording: StripRecording } | { failed: string } | undefined;

const keyOf = ({ id, version, updatedAt }: Strip): string => `${id} ${version} ${updatedAt}`;

/** The strips as saved, rendered in a worker; each saved version once. Results in the order of the strips. */
export function useRecordings(strips: readonly Strip[]): Rendered[] {
  const renderer = useRef<ReturnType<typeof createQueuedRenderer> | null>(null);
  const asked = useRef(new Set<string>());
  const [rendered, setRendered] = useState<ReadonlyMap<string, NonNullable<Rendered>>>(new Map());

  useEffect(() => {
    const made = createQueuedRenderer();
    const keys = asked.current;
    renderer.current = made;
    return () => {
      renderer.current = null;
      keys.clear();
      made.close();
    };
  }, []);

  useEffect(() => {
    for (const strip of strips) {
      const key = keyOf(strip);
      if (!renderer.current || asked.current.has(key)) continue;
      asked.current.add(key);
      const put = (what: NonNullable<Rendered>): void => setRendered((last) => new Map(last).set(key, what));
      renderer.current.render(strip.parameters).then(
        (recording) => put({ recording }),
        (error: Error) => put({ failed: error.message }),
      );
    }
  }, [strips]);

  return useMemo(() => strips.map((strip) => rendered.get(keyOf(strip))), [strips, rendered]);
}
