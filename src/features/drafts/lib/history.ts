/** A document with its past and future: one step back is one thing a person did. */
export interface History<T> {
  now: T;
  past: readonly T[];
  future: readonly T[];
}

const depth = 100;

export const begin = <T>(now: T): History<T> => ({ now, past: [], future: [] });

export function stepTo<T>(history: History<T>, next: T): History<T> {
  if (next === history.now) return history;
  return { now: next, past: [...history.past, history.now].slice(-depth), future: [] };
}

export function undone<T>(history: History<T>): History<T> {
  const before = history.past.at(-1);
  if (before === undefined) return history;
  return { now: before, past: history.past.slice(0, -1), future: [history.now, ...history.future] };
}

export function redone<T>(history: History<T>): History<T> {
  const [next, ...future] = history.future;
  if (next === undefined) return history;
  return { now: next, past: [...history.past, history.now], future };
}
