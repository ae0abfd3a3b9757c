import type { LedgerEntry, Result } from '#shared/engine/types.ts';

/** Entries behind one, itself included, as the ledger reads: from the check down to raw inputs. */
export function entriesOf(ledger: readonly LedgerEntry[], from: number): LedgerEntry[] {
  const found = new Set<number>();
  const visit = (n: number): void => {
    const entry = ledger[n];
    if (!entry || found.has(n)) return;
    found.add(n);
    Object.values(entry.uses).forEach(visit);
  };
  visit(from);
  return [...found].sort((a, b) => b - a).flatMap((n) => ledger[n] ?? []);
}

/** Factors equal to 1 change nothing and can be folded away. */
export const changesNothing = (entry: LedgerEntry): boolean =>
  (entry.kind === 'factor' || entry.kind === 'combination') && entry.value === 1;

/** Clauses, grade values and results: what an engineer reads first. Inputs and parts are a click away. */
export const isMain = (entry: LedgerEntry): boolean =>
  ['check', 'limit', 'grade', 'factor', 'quantity'].includes(entry.kind) ||
  (entry.kind === 'effect' && entry.formula !== undefined);

/** Utilisation with each factor at 1, by entry; from the drivers of the governing check. */
export function effectOf(
  drivers: readonly { entry: number; kind: string; effect: number }[],
  entry: number,
): number | undefined {
  return drivers.find((driver) => driver.entry === entry && driver.kind === 'factor')?.effect;
}

/** The check an entry belongs to, for opening it: the first whose entries hold it. */
export function checkOf(result: Result, entry: number): string | null {
  return (
    result.checks.find((check) => entriesOf(result.ledger, check.entry).some(({ n }) => n === entry))?.id ??
    null
  );
}
