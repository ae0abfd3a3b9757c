import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { attest } from '#shared/engine/attest.ts';
import { check, verdict } from '#shared/engine/index.ts';
import { testEdition, testMember } from '#tests/factories/edition.ts';
import { members } from '#tests/factories/members.ts';
import { testPlan } from '#tests/factories/plan.ts';
import { expectReproducible } from '#tests/factories/reproduce.ts';

const plan = testPlan();

describe('the ledger', () => {
  it('alone reproduces every entry and every utilisation', () => {
    expectReproducible(check(plan, testMember()));
    fc.assert(
      fc.property(members(plan.edition), (member) => {
        expectReproducible(check(plan, member));
      }),
      { numRuns: 300 },
    );
  });

  it('holds decisions that json-rules-engine makes too', async () => {
    await fc.assert(
      fc.asyncProperty(members(plan.edition), async (member) => {
        expect(await attest(plan, check(plan, member))).toEqual([]);
      }),
      { numRuns: 60 },
    );
  });

  it('shows a decision that was changed', async () => {
    const result = check(plan, testMember());
    const ledger = result.ledger.map((entry) => (entry.symbol === 'h' ? { ...entry, value: 60 } : entry));
    const findings = await attest(plan, { ...result, ledger });
    expect(findings.map(({ code, clause }) => [code, clause])).toContainEqual(['decision-differs', 'depth']);
  });

  it('agrees with the verdict that is given without it', () => {
    fc.assert(
      fc.property(members(plan.edition), (member) => {
        const full = check(plan, member);
        const quick = verdict(plan, member);
        expect(quick.word).toBe(full.verdict.word);
        expect(quick.utilisation).toBe(full.verdict.utilisation);
        expect(quick.checks.map(({ id, utilisation }) => [id, utilisation])).toEqual(
          full.checks.map(({ id, utilisation }) => [id, utilisation]),
        );
      }),
      { numRuns: 200 },
    );
  });

  it('gives the same bytes each time', () => {
    const other = testPlan(testEdition());
    fc.assert(
      fc.property(members(plan.edition), (member) => {
        const first = JSON.stringify(check(plan, member));
        expect(JSON.stringify(check(other, structuredClone(member)))).toBe(first);
      }),
      { numRuns: 50 },
    );
  });
});
