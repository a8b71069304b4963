/** What was, what is and what was taken back. */
export interface History<State> {
  readonly past: readonly State[];
  readonly present: State;
  readonly future: readonly State[];
  /** Changes with the same tag one after another are one step back: a drag, the typing in one field. */
  readonly tag: string | null;
}

const MOST_STEPS = 200;

export function startHistory<State>(present: State): History<State> {
  return { past: [], present, future: [], tag: null };
}

export function commit<State>(
  history: History<State>,
  next: State,
  tag: string | null = null,
): History<State> {
  if (next === history.present) return history;
  if (tag !== null && tag === history.tag) return { ...history, present: next, future: [] };
  const past = [...history.past, history.present].slice(-MOST_STEPS);
  return { past, present: next, future: [], tag };
}

export function undo<State>(history: History<State>): History<State> {
  const before = history.past.at(-1);
  if (before === undefined) return history;
  return {
    past: history.past.slice(0, -1),
    present: before,
    future: [history.present, ...history.future],
    tag: null,
  };
}

export function redo<State>(history: History<State>): History<State> {
  const [after, ...future] = history.future;
  if (after === undefined) return history;
  return { past: [...history.past, history.present], present: after, future, tag: null };
}

/** Ends a run of changes with one tag. */
export function settle<State>(history: History<State>): History<State> {
  return history.tag === null ? history : { ...history, tag: null };
}
