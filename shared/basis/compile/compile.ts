import type { Finding } from '#shared/engine/types.ts';
import { editionHash } from '../hash.ts';
import type { Edition } from '../schema/index.ts';
import { prepareTable } from '../table/lookUp.ts';
import { checkClause, unknownSymbols } from './checkClauses.ts';
import { checkGrades } from './checkGrades.ts';
import { checkReferences } from './checkReferences.ts';
import { checkTables } from './checkTables.ts';
import { checkCondition } from './conditions.ts';
import { checkCases } from './decisionTable.ts';
import { dimensionProblem } from './dimensions.ts';
import { Findings } from './findings.ts';
import { ordered, settleLevels, standingOf } from './graph.ts';
import type { CompiledEdition, ReadCheck, ReadClause, ReadFormula, SymbolInfo } from './plan.ts';
import { readChecks, readClause, readFactors } from './read.ts';
import { collectSymbols } from './symbols.ts';
import { findUnused, neededColumns, reachable, symbolsOfCheck } from './usage.ts';
import { pure, unitOf } from '#shared/units/units.ts';

export type CompileEditionOutcome =
  | { ok: true; compiled: CompiledEdition; findings: readonly Finding[] }
  | { ok: false; findings: readonly Finding[] };

/**
 * Reads an edition and finds everything in it that is wrong or doubtful. The document has the right shape
 * (its JSON Schema was checked); everything beyond the shape is checked here. Never throws.
 */
export function compileEdition(edition: Edition): CompileEditionOutcome {
  const findings = new Findings();
  try {
    const compiled = read(edition, findings);
    return findings.failed
      ? { ok: false, findings: findings.list }
      : { ok: true, compiled, findings: findings.list };
  } catch (error) {
    const reason = error instanceof Error ? error.message : 'unknown';
    findings.error(
      'unreadable',
      '',
      `The edition can’t be read: ${reason}. Check it against the schema first.`,
    );
    return { ok: false, findings: findings.list };
  }
}

function read(edition: Edition, findings: Findings): CompiledEdition {
  checkReferences(edition, findings);
  const symbols = collectSymbols(edition, findings);
  const tables = new Map(checkTables(edition, findings).map((table) => [table.id, prepareTable(table)]));
  edition.tables.forEach(({ unit, title }, i) => {
    if (unit !== 'word' && !unitOf(unit))
      findings.error('unknown-unit', `/tables/${i}/unit`, `“${unit}” of “${title}” is not a known unit.`);
  });
  const clauses = edition.clauses.map((clause, index) => readClause(clause, index, tables, findings));
  const inOrder = settleLevels(ordered(clauses, findings), symbols, findings);
  for (const clause of inOrder) {
    checkClause(clause, symbols, findings);
    checkCases(clause.clause, clause.index, symbols, findings);
  }
  const checks = readChecks(edition, findings);
  for (const check of checks) checkCheck(edition, check, symbols, inOrder, findings);
  const factors = readFactors(edition, findings);
  checkFactors(edition, factors, symbols, findings);
  checkGrades(edition, symbols, neededColumns(edition, checks, inOrder), findings);
  findUnused(edition, symbols, inOrder, checks, factors, findings);
  return {
    edition,
    hash: editionHash(edition),
    symbols,
    clauses: inOrder,
    checks,
    factors: factors.map((row) => row.filter((formula) => formula !== undefined)),
    tables,
  };
}

/** Formulas of a check: symbols, the place they exist at, dimensions. */
function checkCheck(
  edition: Edition,
  read: ReadCheck,
  symbols: ReadonlyMap<string, SymbolInfo>,
  clauses: readonly ReadClause[],
  findings: Findings,
): void {
  const check = edition.checks[read.index];
  if (!check) return;
  const pointer = `/checks/${read.index}`;
  if (check.applies) checkCondition(check.applies, `${pointer}/applies`, symbols, findings);
  const parts = [
    ['demand', read.demand, check.demand?.unit],
    ['limit', read.limit, check.limit?.unit],
    ['utilisation', read.utilisation, '1'],
  ] as const;
  for (const [name, formula, unit] of parts) {
    if (!formula) continue;
    unknownSymbols(formula.symbols, `${pointer}/${name}/formula`, symbols, findings);
    const declared = unitOf(unit ?? '1');
    if (!declared)
      findings.error('unknown-unit', `${pointer}/${name}/unit`, `“${unit ?? ''}” is not a known unit.`);
    else if (!check.empirical && formula.symbols.every((s) => symbols.get(s)?.dimension)) {
      const problem = dimensionProblem(formula.ast, declared.dimension, symbols);
      if (problem)
        findings.error('wrong-dimension', `${pointer}/${name}/formula`, `“${check.title}”: ${problem}`);
    }
  }
  for (const symbol of reachable(symbolsOfCheck(edition, read), clauses)) {
    const info = symbols.get(symbol);
    if (!info || info.origin === 'clause') continue;
    const wrong =
      info.level === 'term' ||
      (check.at === 'member' && (info.level === 'place' || info.level === 'combination')) ||
      (info.at && check.at !== 'member' && !info.at.includes(check.at));
    if (wrong) {
      const message = `“${check.title}” comes to need ${symbol} (${info.title.toLowerCase()}), which is not known where it is evaluated.`;
      findings.error('fact-not-here', pointer, message);
    }
  }
}

/** Factors on actions: pure numbers made of what is known for one action in a combination. */
function checkFactors(
  edition: Edition,
  factors: readonly (readonly (ReadFormula | undefined)[])[],
  symbols: ReadonlyMap<string, SymbolInfo>,
  findings: Findings,
): void {
  factors.forEach((row, i) =>
    row.forEach((formula, j) => {
      if (!formula) return;
      const pointer = `/combinations/${i}/terms/${j}/factor`;
      unknownSymbols(formula.symbols, pointer, symbols, findings);
      if (standingOf(formula.symbols, symbols).level === 'place') {
        const title = edition.combinations[i]?.title ?? '';
        findings.error(
          'fact-not-here',
          pointer,
          `A factor of “${title}” looks at a place of the member, where there is none.`,
        );
      }
      const problem = dimensionProblem(formula.ast, pure, symbols);
      if (problem) findings.error('wrong-dimension', pointer, problem);
    }),
  );
}
