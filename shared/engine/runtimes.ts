import { buildRuntime } from './run/build.ts';
import type { Runtime } from './run/runtime.ts';
import type { Template } from './ledger/substitute.ts';
import type { Plan } from './types.ts';

/** What is made of a plan once and used for all its members. */
export interface Prepared {
  runtime: Runtime;
  /** Formulas cut at their symbols, for the ledger. */
  templates: Map<string, Template>;
}

const prepared = new WeakMap<Plan, Prepared>();

/** The plan made ready to run, on first use. */
export function preparedOf(plan: Plan): Prepared {
  const known = prepared.get(plan);
  if (known) return known;
  const made = { runtime: buildRuntime(plan), templates: new Map<string, Template>() };
  prepared.set(plan, made);
  return made;
}
