import type { Level, PlaceKind } from '../facts.ts';
import { levels } from '../facts.ts';
import type { Findings } from './findings.ts';
import type { ReadClause, SymbolInfo } from './plan.ts';
import type { Edition } from '../schema/index.ts';

/** Sizes that grade values depend on, by the symbol of the column. */
export function bandSizes({ grades }: Edition): Map<string, string[]> {
  const found = new Map<string, string[]>();
  for (const { values } of grades.rows) {
    for (const [symbol, value] of Object.entries(values)) {
      if (typeof value !== 'object') continue;
      const known = found.get(symbol) ?? [];
      if (!known.includes(value.by)) found.set(symbol, [...known, value.by]);
    }
  }
  return found;
}

/**
 * Clauses in an order in which each only looks at earlier ones, also through grade values that depend on a
 * size; a circle is an error that names its clauses.
 */
export function ordered(
  clauses: readonly ReadClause[],
  bands: ReadonlyMap<string, readonly string[]>,
  findings: Findings,
): ReadClause[] {
  const bySymbol = new Map(clauses.map((clause) => [clause.clause.symbol, clause]));
  const done = new Set<ReadClause>();
  const order: ReadClause[] = [];
  const path: ReadClause[] = [];
  const visit = (clause: ReadClause): void => {
    if (done.has(clause)) return;
    const start = path.indexOf(clause);
    if (start >= 0) {
      const circle = [...path.slice(start), clause].map((each) => each.clause.symbol).join(' → ');
      const message = `These clauses need each other in a circle: ${circle}. One of them has to do without.`;
      findings.error('cycle', `/clauses/${clause.index}`, message, { clause: clause.clause.id });
      return;
    }
    path.push(clause);
    for (const symbol of clause.looksAt.flatMap((each) => [each, ...(bands.get(each) ?? [])])) {
      const other = bySymbol.get(symbol);
      if (other) visit(other);
    }
    path.pop();
    done.add(clause);
    order.push(clause);
  };
  clauses.forEach(visit);
  return order;
}

const rank = (level: Level) => Math.min(levels.indexOf(level), levels.indexOf('term'));

/** Where something made of these symbols is known. */
export interface Standing {
  level: Level;
  at?: readonly PlaceKind[];
  /** Two symbols that can't be known together: one of a single action, one of a place. */
  apart?: readonly [string, string];
}

/** The narrowest level of some symbols, and the kinds of place where all of them exist. */
export function standingOf(symbols: readonly string[], table: ReadonlyMap<string, SymbolInfo>): Standing {
  let level: Level = 'edition';
  let at: readonly PlaceKind[] | undefined;
  let ofTerm: string | undefined;
  let ofPlace: string | undefined;
  for (const symbol of symbols) {
    const info = table.get(symbol);
    if (!info) continue;
    if (info.level === 'term') ofTerm ??= symbol;
    if (info.level === 'place') ofPlace ??= symbol;
    if (rank(info.level) > rank(level)) level = info.level;
    const here = info.at;
    if (here) at = at ? at.filter((kind) => here.includes(kind)) : here;
  }
  return {
    level,
    ...(at ? { at } : {}),
    ...(ofTerm !== undefined && ofPlace !== undefined ? { apart: [ofTerm, ofPlace] as const } : {}),
  };
}

/** Gives each clause its level, in order, and writes it into the symbol table. */
export function settleLevels(
  clauses: readonly ReadClause[],
  symbols: Map<string, SymbolInfo>,
  findings: Findings,
): ReadClause[] {
  return clauses.map((clause) => {
    const { level, at, apart } = standingOf(clause.looksAt, symbols);
    const { symbol, id, title } = clause.clause;
    const pointer = `/clauses/${clause.index}`;
    if (apart) {
      const message = `“${title}” looks at ${apart[0]}, known for one action, and at ${apart[1]}, known at a place of the member. The two never meet.`;
      findings.error('term-and-place', pointer, message, { clause: id });
    }
    if (at?.length === 0) {
      const message = `“${title}” looks at facts that never exist at the same kind of place.`;
      findings.error('no-common-place', pointer, message, { clause: id });
    }
    const info = symbols.get(symbol);
    if (info?.origin === 'clause') symbols.set(symbol, { ...info, level, ...(at ? { at } : {}) });
    return { ...clause, level };
  });
}
