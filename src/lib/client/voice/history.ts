/** What can be taken back and done again. */
export interface History<T> {
  past: readonly T[];
  now: T;
  future: readonly T[];
}

const longest = 200;

export const begin = <T>(now: T): History<T> => ({ past: [], now, future: [] });

/** A step that says the same as what is there is none. */
export function step<T>(history: History<T>, next: T): History<T> {
  if (next === history.now) return history;
  return { past: [...history.past, history.now].slice(-longest), now: next, future: [] };
}

export function undo<T>({ past, now, future }: History<T>): History<T> {
  const before = past.at(-1);
  return before === undefined
    ? { past, now, future }
    : { past: past.slice(0, -1), now: before, future: [now, ...future] };
}

export function redo<T>({ past, now, future }: History<T>): History<T> {
  const [next, ...rest] = future;
  return next === undefined ? { past, now, future } : { past: [...past, now], now: next, future: rest };
}
