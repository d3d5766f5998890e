import { useCallback, useState } from 'react';
import type { CaliperMarks } from '../canvas/calipers';

/** Marks set one after another: first, second, march-out, then from the start again. */
export interface Calipers {
  marks: CaliperMarks | null;
  mark(timeS: number): void;
  /** Moves the last mark. */
  move(byS: number): void;
  clear(): void;
}

function next(marks: CaliperMarks | null, timeS: number): CaliperMarks {
  if (marks === null || marks.marching) return { firstS: timeS, secondS: null, marching: false };
  if (marks.secondS === null) return { ...marks, secondS: timeS };
  return { ...marks, marching: true };
}

export function useCalipers(durationS: number): Calipers {
  const [marks, setMarks] = useState<CaliperMarks | null>(null);
  const inside = useCallback((timeS: number) => Math.max(0, Math.min(durationS, timeS)), [durationS]);
  return {
    marks,
    mark: (timeS) => setMarks((current) => next(current, inside(timeS))),
    move: (byS) =>
      setMarks((current) => {
        if (current === null) return { firstS: inside(durationS / 2), secondS: null, marching: false };
        return current.secondS === null
          ? { ...current, firstS: inside(current.firstS + byS) }
          : { ...current, secondS: inside(current.secondS + byS) };
      }),
    clear: () => setMarks(null),
  };
}
