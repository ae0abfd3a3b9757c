import type { Finding } from '#shared/engine/types.ts';
import { editionHash } from '../hash.ts';
import type { Edition } from '../schema/index.ts';
import { prepareTable } from '../table/lookUp.ts';
import { checkAnalysis } from './checkAnalysis.ts';
import { checkCheck, checkFactors } from './checkChecks.ts';
import { checkClause } from './checkClauses.ts';
import { checkGrades } from './checkGrades.ts';
import { checkReferences } from './checkReferences.ts';
import { checkTables } from './checkTables.ts';
import { checkCases, SearchBudget } from './decisionTable.ts';
import { Findings } from './findings.ts';
import { GradeNeeds } from './gradeNeeds.ts';
import { bandSizes, ordered, settleLevels } from './graph.ts';
import type { CompiledEdition } from './plan.ts';
import { readChecks, readClause, readFactors } from './read.ts';
import { collectSymbols } from './symbols.ts';
import { findUnused } from './usage.ts';

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
  const clauses = edition.clauses.map((clause, index) => readClause(clause, index, tables, findings));
  const bands = bandSizes(edition);
  const inOrder = settleLevels(ordered(clauses, bands, findings), symbols, findings);
  const budget = new SearchBudget();
  for (const clause of inOrder) {
    if (checkClause(clause, symbols, findings)) {
      checkCases(clause.clause, clause.index, symbols, findings, budget);
    }
  }
  checkAnalysis(edition, symbols, findings);
  const checks = readChecks(edition, findings);
  const known = { edition, symbols, clauses: inOrder };
  for (const check of checks) checkCheck(known, check, findings);
  const factors = readFactors(edition, findings);
  checkFactors(known, factors, findings);
  checkGrades(edition, symbols, new GradeNeeds(edition, checks, inOrder, bands), findings);
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
