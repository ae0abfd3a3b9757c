import fc from 'fast-check';
import { evaluate } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { attest } from '#shared/engine/attest.ts';
import { check, type LedgerEntry, type Result, verdict } from '#shared/engine/index.ts';
import { testEdition, testMember } from '#tests/factories/edition.ts';
import { members } from '#tests/factories/members.ts';
import { testPlan } from '#tests/factories/plan.ts';

const plan = testPlan();

/** The value of an entry worked out by mathjs from the entries it uses, by nothing else. */
function reproduced(ledger: readonly LedgerEntry[], { formula, uses }: LedgerEntry): unknown {
  const scope = Object.fromEntries(
    Object.entries(uses).flatMap(([symbol, n]) => {
      const value = ledger[n]?.value;
      return typeof value === 'number' ? [[symbol, value] as const] : [];
    }),
  );
  return evaluate(formula ?? '', scope) as unknown;
}

function expectReproducible({ ledger, checks }: Result): void {
  ledger.forEach((entry, i) => {
    expect(entry.n).toBe(i);
    for (const used of Object.values(entry.uses)) expect(used).toBeLessThan(entry.n);
    if (entry.formula === undefined || entry.value === null) return;
    const again = reproduced(ledger, entry);
    expectClose(again, entry.value, entry);
    expectClose(evaluate(entry.substituted ?? ''), entry.value, entry);
  });
  for (const { entry, utilisation, demand, limit } of checks) {
    const own = ledger[entry];
    expect(own?.value).toBe(utilisation);
    if (demand && limit && utilisation !== null) {
      expectClose(demand.value / limit.value, utilisation, own);
    }
  }
}

function expectClose(again: unknown, value: unknown, entry: unknown): void {
  if (typeof again !== 'number' || typeof value !== 'number') throw new Error(JSON.stringify(entry));
  const difference = Math.abs(again - value);
  if (!(difference <= 1e-12 * Math.max(1e-9, Math.abs(value)))) {
    throw new Error(`${String(again)} is not ${String(value)}: ${JSON.stringify(entry)}`);
  }
}

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
