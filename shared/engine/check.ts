import { hashOf } from '#shared/basis/hash.ts';
import { stand } from './assess/stand.ts';
import { resultOf, withoutVerdict } from './result/result.ts';
import { preparedOf } from './runtimes.ts';
import type { Member, Plan, Result } from './types.ts';

/**
 * Checks a member against an edition: verdict, checks, and the ledger of everything behind them. Pure and
 * synchronous. What is wrong with the member comes back as findings, with the verdict `none`.
 *
 * Numbers of the result are in the edition's coherent units (mm, N, N/mm2; in, lbf, psi).
 */
export function check(plan: Plan, member: Member): Result {
  const { runtime, stationery } = preparedOf(plan);
  const memberHash = hashOfMember(member);
  const outcome = stand(runtime, member, null, null, 'places');
  return outcome.ok
    ? resultOf(outcome.standing, plan.hash, memberHash, stationery)
    : withoutVerdict(plan.edition, plan.hash, member, memberHash, outcome.findings);
}

/** A member with a number that no JSON can hold is hashed as JSON would write it, and then refused. */
function hashOfMember(member: Member): string {
  try {
    return hashOf(member);
  } catch {
    return hashOf(JSON.parse(JSON.stringify(member)));
  }
}
