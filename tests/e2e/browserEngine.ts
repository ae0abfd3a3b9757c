import { withProjectChoices } from '#shared/basis/inherit.ts';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import { check, compile, resultHash } from '#shared/engine/index.ts';

/** Hashes of the results of members on an edition: what the test compares between Node and Chromium. */
export function hashesOf(
  edition: Edition,
  members: readonly Member[],
  projectChoices: Readonly<Record<string, string>> = {},
): string[] {
  const outcome = compile(edition);
  if (!outcome.ok) throw new Error(outcome.findings[0]?.message ?? 'The edition does not compile.');
  return members.map((member) =>
    resultHash(check(outcome.plan, withProjectChoices(edition, projectChoices, member))),
  );
}
