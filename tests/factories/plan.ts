import type { Edition } from '#shared/basis/schema/index.ts';
import { compile, type Plan } from '#shared/engine/index.ts';
import { testEdition } from './edition.ts';

/** A plan of the test edition, or of a variant of it; its findings as an error where it has no plan. */
export function testPlan(change: Partial<Edition> = {}): Plan {
  return planOf(testEdition(change));
}

/** A plan, or an error that says what is wrong with the edition. */
export function planOf(edition: Edition): Plan {
  const outcome = compile(edition);
  if (outcome.ok) return outcome.plan;
  const errors = outcome.findings.filter(({ severity }) => severity === 'error');
  throw new Error(errors.map(({ pointer, message }) => `${pointer}: ${message}`).join('\n'));
}
