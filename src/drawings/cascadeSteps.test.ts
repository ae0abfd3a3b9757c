import { describe, expect, it } from 'vitest';
import type { CheckResult, LedgerEntry, Result } from '#shared/engine/types.ts';
import { cascadeOf } from './cascadeSteps.ts';

const entry = (n: number, more: Partial<LedgerEntry>): LedgerEntry => ({
  n,
  kind: 'factor',
  symbol: `s${n}`,
  title: `Entry ${n}`,
  value: 1,
  unit: '1',
  uses: {},
  in: 'edition',
  pointer: '',
  ...more,
});
const check = { id: 'bending', title: 'Bending', entry: 7 } as CheckResult;
const result = (limitFormula: string) =>
  ({
    ledger: [
      entry(0, { kind: 'grade', symbol: 'f_m', value: 8, unit: 'N/mm2' }),
      entry(1, { symbol: 'K_3', value: 1.25 }),
      entry(2, { symbol: 'gamma', value: 2 }),
      entry(3, { symbol: 'k_a', value: 0.5 }),
      entry(4, {
        kind: 'limit',
        symbol: 'f_adm',
        value: 2.5,
        unit: 'N/mm2',
        formula: limitFormula,
        uses: { f_m: 0, K_3: 1, gamma: 2, k_a: 3 },
      }),
      entry(5, { kind: 'quantity', symbol: 'demand', value: 2 }),
      entry(6, {
        kind: 'limit',
        symbol: 'limit',
        value: 2.5,
        unit: 'N/mm2',
        formula: 'f_adm',
        uses: { f_adm: 4 },
      }),
      entry(7, { kind: 'check', symbol: 'U', value: 0.8, uses: { demand: 5, limit: 6 } }),
    ],
  }) as Partial<Result> as Result;

describe('the cascade of a check', () => {
  it('starts at the grade value, turns divisors and ends at the limit', () => {
    const cascade = cascadeOf(result('f_m * K_3 / gamma * min(k_a, 1)'), check);
    expect(cascade?.base).toMatchObject({ symbol: 'f_m', value: 8 });
    expect(cascade?.steps.map(({ symbol, by, after, over }) => [symbol, by, after, over])).toEqual([
      ['K_3', 1.25, 10, false],
      ['gamma', 0.5, 5, true],
      ['min(k_a, 1)', 0.5, 2.5, false],
    ]);
    expect(cascade?.limit.value).toBe(2.5);
  });

  it('finds the grade value wherever it stands in the product', () => {
    expect(cascadeOf(result('K_3 * f_m / gamma'), check)?.base.symbol).toBe('f_m');
  });

  it('draws nothing where the limit is no product of a grade value', () => {
    expect(cascadeOf(result('K_3 + gamma'), check)).toBeNull();
    expect(cascadeOf(result('K_3 * gamma'), check)).toBeNull();
  });
});
