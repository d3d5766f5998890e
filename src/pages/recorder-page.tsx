import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { gallery, presetParameters } from '../../shared/gallery/gallery';
import type { StripParameters } from '../../shared/parameters/strip-parameters';
import { testSignals } from '../../shared/recorder-bench/test-signals';
import { sessionQuery } from '../api/session';
import { stripListQuery, stripQuery } from '../api/strips';
import { RecorderBench } from '../features/recorder-bench/recorder-bench';
import {
  lessonOf,
  readBenchState,
  sameBench,
  writeBenchState,
  type BenchSource,
} from '../features/recorder-bench/state/bench-address';

interface OnBench {
  parameters: StripParameters | null;
  title: string;
}

/** What ships with the product needs no request. */
function shipped(source: BenchSource): OnBench | null {
  if (source.kind === 'signal') return { parameters: null, title: testSignals[source.id].label };
  if (source.kind === 'lesson') {
    const lesson = lessonOf({ source });
    return lesson && { parameters: lesson.parameters, title: lesson.title };
  }
  const preset = source.kind === 'preset' ? gallery.find(({ id }) => id === source.id) : undefined;
  return preset ? { parameters: presetParameters(preset), title: preset.title } : null;
}

/** Strips in the chooser; more than a department is likely to keep. */
const mostStrips = 100;

/** The recorder bench; everything that stands on it is kept in the address. */
export function Component() {
  const [search, setSearch] = useSearchParams();
  const state = useMemo(() => readBenchState(search), [search]);
  const { source } = state;
  const { data: user } = useQuery(sessionQuery);
  const isAuthor = user !== null && user !== undefined && user.role !== 'learner';
  const listed = { keptBy: 'department', sort: 'title', pageSize: mostStrips } as const;
  const list = useQuery({ ...stripListQuery(listed), enabled: isAuthor });
  const own = useQuery({ ...stripListQuery({ ...listed, keptBy: 'me' }), enabled: isAuthor });
  const kept = useQuery({
    ...stripQuery(source.id),
    enabled: source.kind === 'strip',
    throwOnError: true,
  });
  const onBench = useMemo(() => shipped(source), [source]);
  const saved = source.kind === 'strip' ? kept.data : undefined;
  return (
    <RecorderBench
      state={state}
      onChange={(next) => setSearch(writeBenchState(next), { replace: sameBench(state, next) })}
      parameters={onBench ? onBench.parameters : (saved?.parameters ?? null)}
      title={onBench?.title ?? saved?.title ?? 'Opening …'}
      strips={[...(own.data?.strips ?? []), ...(list.data?.strips ?? [])]}
    />
  );
}
