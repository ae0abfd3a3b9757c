import { parseFormula } from '../formula/parse.ts';
import { symbolsOf } from '../formula/ast.ts';
import type { Clause, Edition, KeyArgument, Outcome } from '../schema/index.ts';
import type { PreparedTable } from '../table/lookUp.ts';
import { factsOf } from './conditions.ts';
import type { Findings } from './findings.ts';
import type { ReadCase, ReadCheck, ReadClause, ReadFormula, ReadKey, ReadOutcome } from './plan.ts';

type Where = { clause?: string; case?: string };

/** Reads a formula; what can't be read is a finding at its place, and undefined. */
export function readFormula(
  text: string,
  pointer: string,
  findings: Findings,
  where: Where = {},
): ReadFormula | undefined {
  const outcome = parseFormula(text);
  if (!outcome.ok) {
    findings.error('bad-formula', pointer, outcome.message, where);
    return undefined;
  }
  return { text, ast: outcome.ast, symbols: symbolsOf(outcome.ast) };
}

function readKey(key: KeyArgument, pointer: string, findings: Findings, where: Where): ReadKey | undefined {
  if ('word' in key) return { kind: 'word', value: key.word };
  if ('fact' in key) return { kind: 'fact', symbol: key.fact };
  const formula = readFormula(key.formula, `${pointer}/formula`, findings, where);
  return formula && { kind: 'formula', formula };
}

function readOutcome(
  gives: Outcome,
  pointer: string,
  tables: ReadonlyMap<string, PreparedTable>,
  findings: Findings,
  where: Where,
): ReadOutcome | undefined {
  switch (gives.kind) {
    case 'constant':
    case 'word':
    case 'refuse':
      return gives;
    case 'formula': {
      const formula = readFormula(gives.formula, `${pointer}/formula`, findings, where);
      return formula && { kind: 'formula', formula };
    }
    case 'table': {
      const table = tables.get(gives.table);
      if (!table) {
        findings.error('unknown-table', `${pointer}/table`, `There is no table “${gives.table}”.`, where);
        return undefined;
      }
      const keys = gives.keys.map((key, i) => readKey(key, `${pointer}/keys/${i}`, findings, where));
      const whole = keys.filter((key) => key !== undefined);
      return whole.length === keys.length ? { kind: 'table', table, keys: whole } : undefined;
    }
    case 'spanLimit': {
      if ((gives.fraction === undefined) === (gives.divisor === undefined)) {
        const message = 'A span limit needs either a fraction of the span or a divisor, and not both.';
        findings.error('bad-span-limit', pointer, message, where);
      }
      return gives;
    }
  }
}

/** Symbols that an outcome looks at. A span limit looks at the span. */
export function symbolsOfOutcome(gives: ReadOutcome): readonly string[] {
  if (gives.kind === 'formula') return gives.formula.symbols;
  if (gives.kind === 'spanLimit') return ['L'];
  if (gives.kind !== 'table') return [];
  return gives.keys.flatMap((key) =>
    key.kind === 'formula' ? key.formula.symbols : key.kind === 'fact' ? [key.symbol] : [],
  );
}

/** Reads the cases of a clause; a case that can't be read is left out, its finding stands. */
export function readClause(
  clause: Clause,
  index: number,
  tables: ReadonlyMap<string, PreparedTable>,
  findings: Findings,
): ReadClause {
  const looksAt = new Set<string>();
  const cases = clause.cases.flatMap((each, i): ReadCase[] => {
    const where = { clause: clause.id, case: each.id };
    const gives = readOutcome(each.gives, `/clauses/${index}/cases/${i}/gives`, tables, findings, where);
    if (!gives) return [];
    const facts = each.when ? factsOf(each.when) : [];
    for (const symbol of [...facts, ...symbolsOfOutcome(gives)]) looksAt.add(symbol);
    return [{ ...(each.when ? { when: each.when } : {}), facts, gives }];
  });
  return { clause, index, level: 'edition', cases, looksAt: [...looksAt] };
}

/** Reads the formulas of the checks. */
export function readChecks(edition: Edition, findings: Findings): ReadCheck[] {
  return edition.checks.map((check, index): ReadCheck => {
    const pointer = `/checks/${index}`;
    const formulas = check.demand && check.limit;
    if (!formulas === !check.utilisation) {
      const message = `“${check.title}” needs either a demand and a limit, or a formula for the utilisation.`;
      findings.error('incomplete-check', pointer, message);
    }
    const read = (part: { formula: string } | undefined, name: string) =>
      part && readFormula(part.formula, `${pointer}/${name}/formula`, findings);
    const demand = read(check.demand, 'demand');
    const limit = read(check.limit, 'limit');
    const utilisation = read(check.utilisation, 'utilisation');
    return {
      index,
      ...(demand ? { demand } : {}),
      ...(limit ? { limit } : {}),
      ...(utilisation ? { utilisation } : {}),
    };
  });
}

/** Reads the factors of the combination patterns, by pattern and term. */
export function readFactors(edition: Edition, findings: Findings): (ReadFormula | undefined)[][] {
  return edition.combinations.map((pattern, i) =>
    pattern.terms.map((term, j) =>
      readFormula(term.factor, `/combinations/${i}/terms/${j}/factor`, findings),
    ),
  );
}
