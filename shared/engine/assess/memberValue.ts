import type { Env, Problem } from '../run/env.ts';
import type { Runtime } from '../run/runtime.ts';

export type NumberOutcome = { ok: true; value: number } | { ok: false; problem: Problem };

/** Value of a clause that the analysis needs before there is any combination or place. */
export function memberValue(runtime: Runtime, env: Env, symbol: string): NumberOutcome {
  const slot = runtime.slotOf.get(symbol);
  if (slot === undefined) {
    return {
      ok: false,
      problem: { kind: 'missing', symbol, message: `This edition has no clause ${symbol}.` },
    };
  }
  const value = env.value(slot);
  if (typeof value === 'number') return { ok: true, value };
  const problem = env.problem(slot) ?? {
    kind: 'failed',
    symbol,
    message: `${symbol} gives a word where the analysis needs a number.`,
  };
  return { ok: false, problem };
}
