import { useCallback, useMemo, useReducer, useState } from 'react';
import type { StripParameters } from '../../../../shared/parameters/strip-parameters';
import { change, preview, redo, settle, startHistory, undo, type History } from './history';
import { changeParameter, type ParameterPath } from './parameter-paths';

/** A change that was refused: which field, and why in words. */
export interface Refusal {
  path: ParameterPath;
  words: string;
}

/** Parameters under work: changes, their history, and the last refusal. */
export interface ParametersEditor {
  parameters: StripParameters;
  refusal: Refusal | null;
  canUndo: boolean;
  canRedo: boolean;
  /** Changes one parameter; `live` while something is dragged, then `settle` makes it one step. */
  set(path: ParameterPath, value: unknown, live?: boolean): void;
  settle(): void;
  /** Replaces all parameters as one step. */
  replace(parameters: StripParameters): void;
  /** Starts again from parameters, without a past. */
  restart(parameters: StripParameters): void;
  undo(): void;
  redo(): void;
}

type Step = (history: History<StripParameters>) => History<StripParameters>;

export function useParameters(initial: StripParameters): ParametersEditor {
  const [history, apply] = useReducer(
    (state: History<StripParameters>, step: Step) => step(state),
    initial,
    startHistory<StripParameters>,
  );
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  const { present, past, future, before } = history;

  const set = useCallback(
    (path: ParameterPath, value: unknown, live = false) => {
      const result = changeParameter(present, path, value);
      setRefusal(result.ok ? null : { path: result.path, words: result.words });
      if (result.ok) apply((state) => (live ? preview : change)(state, result.parameters));
    },
    [present],
  );
  const actions = useMemo(() => {
    const step = (make: Step) => () => {
      setRefusal(null);
      apply(make);
    };
    return {
      settle: () => apply(settle),
      replace: (parameters: StripParameters) => step((state) => change(state, parameters))(),
      restart: (parameters: StripParameters) => step(() => startHistory(parameters))(),
      undo: step(undo),
      redo: step(redo),
    };
  }, []);

  return {
    parameters: present,
    refusal,
    canUndo: past.length > 0 || (before !== null && before !== present),
    canRedo: future.length > 0,
    set,
    ...actions,
  };
}
