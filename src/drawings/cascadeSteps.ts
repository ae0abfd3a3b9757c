import { symbolsOf, type Ast } from '#shared/basis/formula/ast.ts';
import { compileFormula } from '#shared/basis/formula/evaluate.ts';
import { flattenProduct } from '#shared/basis/formula/product.ts';
import { parseFormula } from '#shared/basis/formula/parse.ts';
import { printFormula } from '#shared/basis/formula/print.ts';
import type { CheckResult, LedgerEntry, Result } from '#shared/engine/types.ts';

/** One step of a cascade: a factor, and the value after it. */
export interface CascadeStep {
  symbol: string;
  title: string;
  /** What the value is multiplied by; a divisor is given turned. */
  by: number;
  over: boolean;
  after: number;
  /** Ledger entry of the factor, −1 for a number or an expression in the formula itself. */
  entry: number;
}

/** A grade stress on its way to the limit, and the demand against it. */
export interface CascadeData {
  check: string;
  title: string;
  unit: string;
  base: { symbol: string; title: string; value: number; entry: number };
  steps: readonly CascadeStep[];
  limit: { title: string; value: number; entry: number };
  demand: { title: string; value: number; entry: number };
}

const numberOf = (entry: LedgerEntry | undefined): number | null =>
  typeof entry?.value === 'number' ? entry.value : null;

/** Follows entries that only hand on another one, such as a limit that is a clause's value. */
function productEntry(entry: LedgerEntry, ledger: readonly LedgerEntry[]): LedgerEntry {
  const only = Object.values(entry.uses);
  const next =
    entry.formula !== undefined && Object.hasOwn(entry.uses, entry.formula)
      ? ledger[only[0] ?? -1]
      : undefined;
  return next?.formula === undefined ? entry : productEntry(next, ledger);
}

/** A part that is an expression over entries, such as min(k_1, k_2). */
function runPart(part: Ast, product: LedgerEntry, ledger: readonly LedgerEntry[]): number | null {
  const symbols = symbolsOf(part);
  const values = symbols.map((symbol) => numberOf(ledger[product.uses[symbol] ?? -1]) ?? NaN);
  const value = compileFormula(part, (symbol) => symbols.indexOf(symbol))(Float64Array.from(values));
  return Number.isFinite(value) ? value : null;
}

/**
 * The cascade of a check, read from the ledger alone: the limit's formula is a product that begins with a
 * grade value. Null for checks whose limit is no such product.
 */
export function cascadeOf(result: Result, check: CheckResult): CascadeData | null {
  const { ledger } = result;
  const own = ledger[check.entry];
  const limit = ledger[own?.uses['limit'] ?? -1];
  const demand = ledger[own?.uses['demand'] ?? -1];
  const limitValue = numberOf(limit);
  const demandValue = numberOf(demand);
  if (!limit || !demand || limitValue === null || demandValue === null) return null;
  const product = productEntry(limit, ledger);
  const read = product.formula === undefined ? null : parseFormula(product.formula);
  if (!read?.ok) return null;
  const parts = flattenProduct(read.ast);
  const entryOf = (part: Ast) => (part.kind === 'symbol' ? ledger[product.uses[part.name] ?? -1] : undefined);
  const start = parts.findIndex(({ part, role }) => role === 'times' && entryOf(part)?.kind === 'grade');
  const first = parts[start];
  const base = first && entryOf(first.part);
  const baseValue = numberOf(base);
  if (!base || baseValue === null || parts.length < 2) return null;

  let value = baseValue;
  const steps = parts.flatMap(({ part, role }, index): CascadeStep[] => {
    if (index === start) return [];
    const entry = entryOf(part);
    const factor = numberOf(entry) ?? runPart(part, product, ledger);
    if (factor === null) return [];
    const by = role === 'times' ? factor : 1 / factor;
    value *= by;
    const text = printFormula(part);
    return [
      {
        symbol: entry?.symbol ?? text,
        title: entry?.title ?? text,
        by,
        over: role === 'over',
        after: value,
        entry: entry?.n ?? -1,
      },
    ];
  });
  return {
    check: check.id,
    title: check.title,
    unit: limit.unit,
    base: { symbol: base.symbol, title: base.title, value: baseValue, entry: base.n },
    steps,
    limit: { title: limit.title, value: limitValue, entry: limit.n },
    demand: { title: demand.title, value: demandValue, entry: demand.n },
  };
}
