import type { Clause } from '#shared/basis/schema/index.ts';
import { type ConditionTest, HOLDS, UNKNOWN } from '../decide/compileCondition.ts';
import type { Env, Problem } from './env.ts';
import { NUMBER } from './env.ts';
import { evaluate, type FormulaRun, whyNot } from './formula.ts';

/** A key handed to a table. */
export type RunKey =
  | { kind: 'formula'; formula: FormulaRun }
  | { kind: 'fact'; symbol: string; slot: number }
  | { kind: 'word'; value: string };

/** A value from a table, or why there is none. */
export type TableValue = { ok: true; value: number | string } | { ok: false; message: string };

export type RunOutcome =
  | { kind: 'constant'; value: number }
  | { kind: 'word'; value: string }
  | { kind: 'formula'; formula: FormulaRun }
  | {
      kind: 'table';
      table: string;
      keys: readonly RunKey[];
      lookUp: (keys: readonly (number | string)[]) => TableValue;
      /** How the value was found, in words, and the cell where it is one cell's. */
      explain: (keys: readonly (number | string)[]) => { found: string; cell?: number };
      /** The keys of the look-up at work, used again and again. */
      at: (number | string)[];
    }
  | { kind: 'spanLimit'; length: number; formula: string; of: (length: number) => number }
  | { kind: 'refuse'; reason: string };

export interface RunCase {
  test: ConditionTest | null;
  /** Facts that the condition names. */
  symbols: readonly string[];
  slots: readonly number[];
  gives: RunOutcome;
}

/** A clause ready to run. */
export interface RunClause {
  index: number;
  clause: Clause;
  slot: number;
  cases: readonly RunCase[];
}

/** The case that applies, or the problem that keeps it open. */
export function choose({ clause, cases }: RunClause, env: Env): number | Problem {
  for (let i = 0; i < cases.length; i += 1) {
    const { test, slots } = cases[i] as RunCase;
    if (!test) return i;
    const trial = test(env);
    if (trial === HOLDS) return i;
    if (trial === UNKNOWN) return openBy(slots, env, clause);
  }
  return {
    kind: 'failed',
    symbol: clause.symbol,
    message: `${clause.title} (${clause.symbol}): none of its cases applies here.`,
  };
}

function openBy(slots: readonly number[], env: Env, clause: Clause): Problem {
  for (const slot of slots) {
    const problem = env.problem(slot);
    if (problem) return problem;
  }
  return {
    kind: 'failed',
    symbol: clause.symbol,
    message: `${clause.title} (${clause.symbol}): its case could not be decided.`,
  };
}

/** Works a clause out into its slot. */
export function fillClause(run: RunClause, env: Env): void {
  const chosen = choose(run, env);
  if (typeof chosen !== 'number') {
    env.setProblem(run.slot, chosen);
    return;
  }
  fillOutcome(run, (run.cases[chosen] as RunCase).gives, env);
}

function fillOutcome({ clause, slot }: RunClause, gives: RunOutcome, env: Env): void {
  const what = `${clause.title} (${clause.symbol})`;
  switch (gives.kind) {
    case 'constant':
      env.setNumber(slot, gives.value);
      return;
    case 'word':
      env.setWord(slot, gives.value);
      return;
    case 'refuse':
      env.setProblem(slot, { kind: 'refused', symbol: clause.symbol, message: gives.reason });
      return;
    case 'formula': {
      const value = evaluate(gives.formula, env);
      if (Number.isNaN(value)) env.setProblem(slot, whyNot(gives.formula, env, clause.symbol, what));
      else env.setNumber(slot, value);
      return;
    }
    case 'spanLimit': {
      if (env.fill(gives.length) === NUMBER) {
        env.setNumber(slot, gives.of(env.numbers[gives.length] as number));
      } else env.setProblem(slot, env.problem(gives.length) as Problem);
      return;
    }
    default: {
      const problem = readKeys(gives.keys, gives.at, env, clause.symbol, what);
      if (problem) {
        env.setProblem(slot, problem);
        return;
      }
      const looked = gives.lookUp(gives.at);
      if (!looked.ok) {
        env.setProblem(slot, {
          kind: 'refused',
          symbol: clause.symbol,
          message: `${what}: ${looked.message}`,
        });
      } else if (typeof looked.value === 'number') env.setNumber(slot, looked.value);
      else env.setWord(slot, looked.value);
    }
  }
}

/** Puts the keys of a look-up into `at`; gives the problem of the first key that has none. */
export function readKeys(
  keys: readonly RunKey[],
  at: (number | string)[],
  env: Env,
  symbol: string,
  what: string,
): Problem | null {
  for (let i = 0; i < keys.length; i += 1) {
    const key = keys[i] as RunKey;
    if (key.kind === 'word') at[i] = key.value;
    else if (key.kind === 'fact') {
      const value = env.value(key.slot);
      if (value === null) return env.problem(key.slot);
      at[i] = value;
    } else {
      const value = evaluate(key.formula, env);
      if (Number.isNaN(value)) return whyNot(key.formula, env, symbol, what);
      at[i] = value;
    }
  }
  return null;
}
