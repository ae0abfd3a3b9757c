import { useEffect, useState } from 'react';

/** Longest stretch of work between two frames, ms. */
const slice = 10;

/**
 * Runs a piece of work in slices between frames and gives its share done and, at the end, what it returned.
 * Started anew whenever `start` changes; null: nothing to do.
 */
export function useSliced<T>(start: (() => Generator<number, T>) | null): {
  share: number;
  result: T | null;
} {
  const [state, setState] = useState<{ of: typeof start; share: number; result: T | null }>({
    of: null,
    share: 0,
    result: null,
  });
  useEffect(() => {
    if (!start) return undefined;
    const work = start();
    let handle = 0;
    const run = () => {
      const until = performance.now() + slice;
      let share = 0;
      while (performance.now() < until) {
        const step = work.next();
        if (step.done) {
          setState({ of: start, share: 1, result: step.value });
          return;
        }
        share = step.value;
      }
      setState((before) => ({ of: start, share, result: before.of === start ? before.result : null }));
      handle = requestAnimationFrame(run);
    };
    handle = requestAnimationFrame(run);
    return () => cancelAnimationFrame(handle);
  }, [start]);
  return state.of === start ? state : { share: 0, result: null };
}
