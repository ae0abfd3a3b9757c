import { buildRuntime } from './run/build.ts';
import type { Runtime } from './run/runtime.ts';
import type { Stationery } from './ledger/recorder.ts';
import { Standings } from './ledger/standing.ts';
import type { Plan } from './types.ts';

/** What is made of a plan once and used for all its members. */
export interface Prepared {
  runtime: Runtime;
  stationery: Stationery;
}

const prepared = new WeakMap<Plan, Prepared>();

/** The plan made ready to run, on first use. */
export function preparedOf(plan: Plan): Prepared {
  const known = prepared.get(plan);
  if (known) return known;
  const stationery = { templates: new Map(), standings: new Standings(plan.edition) };
  const made = { runtime: buildRuntime(plan), stationery };
  prepared.set(plan, made);
  return made;
}
