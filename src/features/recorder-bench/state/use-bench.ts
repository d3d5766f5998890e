import { keepPreviousData, useQueries, useQuery, type UseQueryResult } from '@tanstack/react-query';
import { useEffect, useRef, type RefObject } from 'react';
import type { StripParameters } from '../../../../shared/parameters/strip-parameters';
import type { BenchResult } from '../../../../shared/recorder-bench/bench-result';
import type { BenchSetting } from '../../../../shared/recorder-bench/bench-setting';
import type { Conformance } from '../../../../shared/recorder-bench/conformance';
import { markerNoiseMv, type MarkerRow } from '../../../../shared/recorder-bench/marker-figures';
import type { Responses } from '../../../../shared/recorder-bench/responses';
import { createBench, type Bench } from '../../../workers/bench';
import type { BenchState } from './bench-address';
import { settingCode } from './setting-code';

/** Measurements never age: the same settings give the same figures. */
const forever = { staleTime: Infinity, retry: 1, refetchOnWindowFocus: false } as const;

/** Two benches: traces follow the hand at once, while tables are measured on the other. */
export interface Benches {
  quick: Bench;
  slow: Bench;
}

/** The page's workers, started with it. */
export type BenchesRef = RefObject<Benches | null>;

export function useBenches(): BenchesRef {
  const benches = useRef<Benches | null>(null);
  useEffect(() => {
    const made = { quick: createBench(), slow: createBench() };
    benches.current = made;
    return () => {
      benches.current = null;
      made.quick.close();
      made.slow.close();
    };
  }, []);
  return benches;
}

/** Effects run in order, so the workers are there before the first question is asked. */
function started(benches: BenchesRef): Benches {
  if (!benches.current) throw new Error('The engine could not be started.');
  return benches.current;
}

/** What stands on the bench, through every setting; the last one stays while the next is measured. */
export function useTraces(
  benches: BenchesRef,
  state: BenchState,
  parameters: StripParameters | null,
): UseQueryResult<BenchResult> {
  const { source, settings, lead } = state;
  const codes = settings.map(settingCode);
  return useQuery({
    queryKey: ['bench', 'traces', source, codes, lead, parameters],
    enabled: source.kind === 'signal' || parameters !== null,
    placeholderData: keepPreviousData,
    ...forever,
    gcTime: 60_000,
    queryFn: ({ signal }) => {
      if (source.kind === 'signal')
        return started(benches).quick.ask('signal', { id: source.id, settings }, signal);
      if (!parameters) throw new Error('no strip');
      return started(benches).quick.ask('strip', { parameters, settings, lead }, signal);
    },
  });
}

/** The responses of every setting; null for those still being measured. */
export function useResponses(benches: BenchesRef, settings: readonly BenchSetting[]): (Responses | null)[] {
  const results = useQueries({
    queries: settings.map((setting) => ({
      queryKey: ['bench', 'responses', settingCode(setting)],
      ...forever,
      queryFn: ({ signal }: { signal: AbortSignal }) => {
        return started(benches).slow.ask('responses', setting, signal);
      },
    })),
  });
  return results.map(({ data }) => data ?? null);
}

/** The standards table. */
export function useConformance(
  benches: BenchesRef,
  settings: readonly BenchSetting[],
): UseQueryResult<Conformance> {
  return useQuery({
    queryKey: ['bench', 'conformance', settings.map(settingCode)],
    placeholderData: keepPreviousData,
    ...forever,
    queryFn: ({ signal }) => {
      return started(benches).slow.ask('conformance', [...settings], signal);
    },
  });
}

/** A few characters for each lesson, by id. */
export function useLessonFigures(benches: BenchesRef): Record<string, string> {
  const { data } = useQuery({
    queryKey: ['bench', 'lessons'],
    ...forever,
    queryFn: ({ signal }) => {
      return started(benches).slow.ask('lessons', null, signal);
    },
  });
  return data ?? {};
}

/** The marker over the gallery, level of noise by level of noise; measured only when `wanted`. */
export function useMarkerRows(benches: BenchesRef, wanted: boolean): (MarkerRow | null)[] {
  const results = useQueries({
    queries: markerNoiseMv.map((muscleMv) => ({
      queryKey: ['bench', 'marker', muscleMv],
      enabled: wanted,
      ...forever,
      queryFn: ({ signal }: { signal: AbortSignal }) => {
        return started(benches).slow.ask('marker', muscleMv, signal);
      },
    })),
  });
  return results.map(({ data }) => data ?? null);
}
