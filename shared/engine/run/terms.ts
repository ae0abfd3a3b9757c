import type { Context } from './context.ts';
import type { Env } from './env.ts';
import type { Runtime } from './runtime.ts';

/** Puts the evaluation at one action of a combination, where its own values can be read. */
export function atTerm({ atTerm: slots }: Runtime, env: Env, context: Context, action: number): void {
  context.action = action;
  env.clear(slots);
}

export function leaveTerm({ atTerm: slots }: Runtime, env: Env, context: Context): void {
  context.action = -1;
  env.clear(slots);
}
