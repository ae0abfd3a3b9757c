import { evaluate } from 'mathjs';
import { expect } from 'vitest';
import type { LedgerEntry, Result } from '#shared/engine/index.ts';

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

/** Expects every entry and utilisation of a result to follow from its ledger alone, to 1e-12. */
export function expectReproducible({ ledger, checks }: Result): void {
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
