/** States with undo and redo. While something is dragged, `preview` replaces the present without a new step. */
export interface History<State> {
  past: readonly State[];
  present: State;
  future: readonly State[];
  /** The state to go back to when the change under way is undone; null when none is under way. */
  before: State | null;
}

/** Steps that are remembered. */
const mostSteps = 200;

export function startHistory<State>(present: State): History<State> {
  return { past: [], present, future: [], before: null };
}

/** Shows a state without making a step yet. */
export function preview<State>(history: History<State>, present: State): History<State> {
  return { ...history, present, before: history.before ?? history.present };
}

/** Ends the change under way, if there is one, as one step. */
export function settle<State>(history: History<State>): History<State> {
  const { past, present, before } = history;
  if (before === null) return history;
  if (before === present) return { ...history, before: null };
  return { past: [...past, before].slice(-mostSteps), present, future: [], before: null };
}

/** One step at once. */
export function change<State>(history: History<State>, present: State): History<State> {
  return settle(preview(history, present));
}

export function undo<State>(history: History<State>): History<State> {
  const { past, present, future } = settle(history);
  if (past.length === 0) return settle(history);
  return {
    past: past.slice(0, -1),
    present: past[past.length - 1],
    future: [present, ...future],
    before: null,
  };
}

export function redo<State>(history: History<State>): History<State> {
  const { past, present, future } = settle(history);
  if (future.length === 0) return settle(history);
  return { past: [...past, present], present: future[0], future: future.slice(1), before: null };
}
