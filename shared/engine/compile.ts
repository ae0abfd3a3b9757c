import { compileEdition } from '#shared/basis/compile/compile.ts';
import type { CompileOutcome, Edition } from './types.ts';

/**
 * Compiles an edition: the plan that members are checked with, and findings with their places. An edition
 * with errors has no plan. The document's shape is to be checked against its JSON Schema first. Never throws.
 */
export function compile(edition: Edition): CompileOutcome {
  const outcome = compileEdition(edition);
  return outcome.ok ? { ok: true, plan: outcome.compiled, findings: outcome.findings } : outcome;
}
