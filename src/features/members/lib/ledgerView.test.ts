import { describe, expect, it } from 'vitest';
import type { LedgerEntry, Result } from '#shared/engine/types.ts';
import { changesNothing, checkOf, entriesOf } from './ledgerView.ts';

const entry = (n: number, uses: Record<string, number>, more: Partial<LedgerEntry> = {}): LedgerEntry => ({
  n,
  kind: 'factor',
  symbol: `s${n}`,
  title: `Entry ${n}`,
  value: 2,
  unit: '1',
  uses,
  in: 'edition',
  pointer: '',
  ...more,
});
const ledger = [
  entry(0, {}),
  entry(1, { a: 0 }),
  entry(2, {}),
  entry(3, { b: 1 }, { kind: 'check' }),
  entry(4, { c: 2 }, { kind: 'check' }),
];
const result = {
  ledger,
  checks: [
    { id: 'bending', entry: 3 },
    { id: 'shear', entry: 4 },
  ],
} as Partial<Result> as Result;

describe('reading a ledger', () => {
  it('goes from a check down to raw inputs, each once', () => {
    expect(entriesOf(ledger, 3).map(({ n }) => n)).toEqual([3, 1, 0]);
  });

  it('finds the check that an entry belongs to', () => {
    expect(checkOf(result, 0)).toBe('bending');
    expect(checkOf(result, 2)).toBe('shear');
  });

  it('folds factors of 1 only', () => {
    expect(changesNothing(entry(0, {}, { value: 1 }))).toBe(true);
    expect(changesNothing(entry(0, {}, { value: 1, kind: 'quantity' }))).toBe(false);
  });
});
