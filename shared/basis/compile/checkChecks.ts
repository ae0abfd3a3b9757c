import { coherentUnit, pure, unitOf } from '#shared/units/units.ts';
import type { Edition } from '../schema/index.ts';
import { unknownSymbols } from './checkClauses.ts';
import { checkCondition } from './conditions.ts';
import { dimensionProblem } from './dimensions.ts';
import type { Findings } from './findings.ts';
import type { ReadCheck, ReadClause, ReadFormula, SymbolInfo } from './plan.ts';
import { reachable, symbolsOfCheck } from './usage.ts';

/** What is known of an edition when its checks are looked at. */
export interface Known {
  edition: Edition;
  symbols: ReadonlyMap<string, SymbolInfo>;
  clauses: readonly ReadClause[];
}

type Check = Edition['checks'][number];

/** A check: symbols of its formulas, dimensions and units, and whether what it needs exists where it is made. */
export function checkCheck(known: Known, read: ReadCheck, findings: Findings): void {
  const { edition, symbols, clauses } = known;
  const check = edition.checks[read.index];
  if (!check) return;
  const pointer = `/checks/${read.index}`;
  if (check.applies) checkCondition(check.applies, `${pointer}/applies`, symbols, findings);
  checkPart(known, check, read.demand, 'demand', pointer, findings);
  checkPart(known, check, read.limit, 'limit', pointer, findings);
  checkPart(known, check, read.utilisation, 'utilisation', pointer, findings);
  const [demand, limit] = [check.demand?.unit, check.limit?.unit];
  if (demand !== undefined && limit !== undefined && demand !== limit) {
    const message = `“${check.title}” compares a demand in ${demand} with a limit in ${limit}. Give both in one unit.`;
    findings.error('wrong-dimension', `${pointer}/limit/unit`, message);
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

function checkPart(
  { edition, symbols }: Known,
  check: Check,
  formula: ReadFormula | undefined,
  name: 'demand' | 'limit' | 'utilisation',
  pointer: string,
  findings: Findings,
): void {
  if (!formula) return;
  unknownSymbols(formula.symbols, `${pointer}/${name}/formula`, symbols, findings);
  const unit = name === 'utilisation' ? '1' : (check[name]?.unit ?? '1');
  const declared = unitOf(unit);
  if (!declared) {
    findings.error('unknown-unit', `${pointer}/${name}/unit`, `“${unit}” is not a known unit.`);
    return;
  }
  if (check.empirical) return;
  const coherent = coherentUnit(declared.dimension, edition.unitSystem);
  if (declared.factor !== 1 || (declared.system !== 'both' && declared.system !== edition.unitSystem)) {
    const message = `The ${name} of “${check.title}” comes out in ${coherent ?? 'the edition’s own units'}, the unit that formulas here work in, not in ${unit}.`;
    findings.error('unit-not-coherent', `${pointer}/${name}/unit`, message);
  }
  if (!formula.symbols.every((symbol) => symbols.get(symbol)?.dimension)) return;
  const problem = dimensionProblem(formula.ast, declared.dimension, symbols);
  if (problem)
    findings.error('wrong-dimension', `${pointer}/${name}/formula`, `“${check.title}”: ${problem}`);
}

/** Factors on actions: pure numbers made of what is known for one action before there is a combination. */
export function checkFactors(
  { edition, symbols, clauses }: Known,
  factors: readonly (readonly (ReadFormula | undefined)[])[],
  findings: Findings,
): void {
  factors.forEach((row, i) => {
    const pattern = edition.combinations[i];
    row.forEach((formula, j) => {
      if (!formula || !pattern) return;
      const pointer = `/combinations/${i}/terms/${j}/factor`;
      unknownSymbols(formula.symbols, pointer, symbols, findings);
      for (const symbol of reachable(formula.symbols, clauses)) {
        const info = symbols.get(symbol);
        if (!info || info.origin === 'clause') continue;
        if (info.level === 'place') {
          const message = `A factor of “${pattern.title}” comes to need ${symbol} (${info.title.toLowerCase()}), known at a place of the member, where there is none.`;
          findings.error('fact-not-here', pointer, message);
        } else if (symbol === 'duration' && pattern.duration === undefined) {
          const message = `A factor of “${pattern.title}” comes to need the duration, which is known only once its factors are. Give the combination a fixed duration, or use action_duration.`;
          findings.error('fact-not-here', pointer, message);
        }
      }
      const problem = dimensionProblem(formula.ast, pure, symbols);
      if (problem) findings.error('wrong-dimension', pointer, problem);
    });
  });
}
