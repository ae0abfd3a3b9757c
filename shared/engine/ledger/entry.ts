import type { EntryKind, LedgerEntry } from '../types.ts';

/** Symbol to entry. */
export type Uses = Record<string, number>;

/**
 * A new entry with what every entry says; what only some say is set on it afterwards. Written out rather
 * than spread together, because a ledger has a hundred of them and a search reads thousands of ledgers.
 */
export function entryOf(
  kind: EntryKind,
  symbol: string,
  title: string,
  value: number | string | null,
  unit: string,
  uses: Uses,
  where: LedgerEntry['in'],
  pointer: string,
): LedgerEntry {
  return { n: -1, kind, symbol, title, value, unit, uses, in: where, pointer };
}
