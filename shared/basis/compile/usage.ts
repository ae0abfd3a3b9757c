import type { Edition } from '../schema/index.ts';
import { eachProvenance } from './checkReferences.ts';
import { factsOf } from './conditions.ts';
import type { Findings } from './findings.ts';
import type { ReadCheck, ReadClause, ReadFormula, SymbolInfo } from './plan.ts';

/** Symbols in the formulas of a check. */
export function formulasOfCheck({ demand, limit, utilisation }: ReadCheck): string[] {
  return [demand, limit, utilisation].flatMap((formula) => formula?.symbols ?? []);
}

/** Symbols that a check looks at itself. */
export function symbolsOfCheck(edition: Edition, read: ReadCheck): string[] {
  const applies = edition.checks[read.index]?.applies;
  return [...formulasOfCheck(read), ...(applies ? factsOf(applies) : [])];
}

/** Everything reachable from some symbols, through clauses. */
export function reachable(from: readonly string[], clauses: readonly ReadClause[]): Set<string> {
  const bySymbol = new Map(clauses.map((clause) => [clause.clause.symbol, clause]));
  const found = new Set<string>();
  const open = [...from];
  for (let symbol = open.pop(); symbol !== undefined; symbol = open.pop()) {
    if (found.has(symbol)) continue;
    found.add(symbol);
    open.push(...(bySymbol.get(symbol)?.looksAt ?? []));
  }
  return found;
}

/** Symbols the analysis takes from clauses. */
export function symbolsOfAnalysis({ analysis }: Edition): string[] {
  const { bendingStiffness, shearStiffness, selfWeight, span, shear } = analysis;
  return [
    bendingStiffness,
    ...(shearStiffness === undefined ? [] : [shearStiffness]),
    ...(selfWeight ? [selfWeight.line] : []),
    ...(span.rule === 'clearPlus' ? [span.allowance] : []),
    ...(shear.at === 'distance' ? [shear.distance] : []),
  ];
}

/** What stands in the edition and is used by nothing. */
export function findUnused(
  edition: Edition,
  symbols: ReadonlyMap<string, SymbolInfo>,
  clauses: readonly ReadClause[],
  checks: readonly ReadCheck[],
  factors: readonly (readonly (ReadFormula | undefined)[])[],
  findings: Findings,
): void {
  const roots = [
    ...checks.flatMap((check) => symbolsOfCheck(edition, check)),
    ...factors.flat().flatMap((formula) => formula?.symbols ?? []),
    ...symbolsOfAnalysis(edition),
    ...edition.grades.rows.flatMap(({ values }) =>
      Object.values(values).flatMap((v) => (typeof v === 'object' ? [v.by] : [])),
    ),
  ];
  const used = reachable(roots, clauses);
  for (const { symbol, origin, title, pointer, index } of symbols.values()) {
    if (origin === 'builtIn' || used.has(symbol)) continue;
    const clause = origin === 'clause' ? edition.clauses[index]?.id : undefined;
    const message = `“${title}” (${symbol}) is used by no check.`;
    findings.warning('unused', pointer, message, clause === undefined ? {} : { clause });
  }
  const tables = new Set(
    clauses.flatMap(({ cases }) =>
      cases.flatMap(({ gives }) => (gives.kind === 'table' ? [gives.table.table.id] : [])),
    ),
  );
  edition.tables.forEach(({ id, title }, i) => {
    if (!tables.has(id))
      findings.warning('unused', `/tables/${i}`, `The table “${title}” is used by no clause.`);
  });
  const named = new Set<string>();
  let unverified = 0;
  eachProvenance(edition, ({ source, verified }) => {
    named.add(source);
    if (!verified) unverified += 1;
  });
  edition.sources.forEach(({ id, title }, i) => {
    if (!named.has(id)) findings.note('unused', `/sources/${i}`, `Nothing names the source “${title}”.`);
  });
  if (unverified) {
    const message = `${unverified} value${unverified === 1 ? '' : 's'} or groups of values were not verified by a second person.`;
    findings.note('unverified', '', message);
  }
}
