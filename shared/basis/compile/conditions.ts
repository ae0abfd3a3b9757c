import type { Comparison, ComparisonValue, Condition } from '../schema/index.ts';
import type { Findings } from './findings.ts';
import type { SymbolInfo } from './plan.ts';

/** Deepest nesting of groups, and most comparisons in one condition. */
export const conditionBounds = { depth: 8, comparisons: 200 };

/** Facts that a condition names, each once. */
export function factsOf(condition: Condition): string[] {
  const found = new Set<string>();
  eachComparison(condition, '', ({ fact, value }) => {
    found.add(fact);
    if (typeof value === 'object' && 'fact' in value) found.add(value.fact);
  });
  return [...found];
}

/** Visits each comparison with its JSON pointer. */
export function eachComparison(
  condition: Condition,
  pointer: string,
  visit: (comparison: Comparison, pointer: string) => void,
): void {
  if ('all' in condition) condition.all.forEach((c, i) => eachComparison(c, `${pointer}/all/${i}`, visit));
  else if ('any' in condition)
    condition.any.forEach((c, i) => eachComparison(c, `${pointer}/any/${i}`, visit));
  else if ('not' in condition) eachComparison(condition.not, `${pointer}/not`, visit);
  else visit(condition, pointer);
}

function depthOf(condition: Condition): number {
  if ('all' in condition) return 1 + Math.max(0, ...condition.all.map(depthOf));
  if ('any' in condition) return 1 + Math.max(0, ...condition.any.map(depthOf));
  return 'not' in condition ? 1 + depthOf(condition.not) : 0;
}

function emptyGroup(condition: Condition, pointer: string): string | null {
  const group = 'all' in condition ? condition.all : 'any' in condition ? condition.any : null;
  if (group) {
    if (group.length === 0) return pointer;
    const name = 'all' in condition ? 'all' : 'any';
    for (const [i, child] of group.entries()) {
      const empty = emptyGroup(child, `${pointer}/${name}/${i}`);
      if (empty !== null) return empty;
    }
    return null;
  }
  return 'not' in condition ? emptyGroup(condition.not, `${pointer}/not`) : null;
}

const ordering = new Set(['lessThan', 'lessThanInclusive', 'greaterThan', 'greaterThanInclusive']);
const listing = new Set(['in', 'notIn']);

/**
 * Checks a condition: facts that exist, values of the fact's type, words that can occur. What
 * json-rules-engine would quietly call false can't pass.
 */
export function checkCondition(
  condition: Condition,
  pointer: string,
  symbols: ReadonlyMap<string, SymbolInfo>,
  findings: Findings,
  where: { clause?: string; case?: string } = {},
): void {
  if (depthOf(condition) > conditionBounds.depth) {
    findings.error(
      'condition-too-deep',
      pointer,
      `The condition is nested more than ${conditionBounds.depth} deep.`,
      where,
    );
    return;
  }
  const empty = emptyGroup(condition, pointer);
  if (empty !== null) {
    findings.error(
      'empty-group',
      empty,
      'A group of conditions is empty. Add a condition or take the group away.',
      where,
    );
  }
  let count = 0;
  eachComparison(condition, pointer, (comparison, at) => {
    count += 1;
    const problem = comparisonProblem(comparison, symbols);
    if (problem) findings.error(problem.code, at, problem.message, where);
  });
  if (count > conditionBounds.comparisons) {
    findings.error(
      'condition-too-long',
      pointer,
      `The condition has more than ${conditionBounds.comparisons} comparisons.`,
      where,
    );
  }
}

interface Problem {
  code: string;
  message: string;
}

function comparisonProblem(
  { fact, operator, value }: Comparison,
  symbols: ReadonlyMap<string, SymbolInfo>,
): Problem | null {
  const info = symbols.get(fact);
  if (!info) return { code: 'unknown-fact', message: `There is no fact “${fact}” in this edition.` };
  const isWord = info.dimension === undefined;
  if (isWord && ordering.has(operator)) {
    return { code: 'word-against-number', message: `${fact} is a word and can’t be compared by size.` };
  }
  if (listing.has(operator) !== Array.isArray(value)) {
    const message = listing.has(operator)
      ? `“${operator}” needs a list of values for ${fact}.`
      : `“${operator}” needs one value for ${fact}, not a list.`;
    return { code: 'wrong-value-type', message };
  }
  const values = Array.isArray(value)
    ? (value as readonly (string | number)[])
    : [value as Exclude<ComparisonValue, readonly unknown[]>];
  for (const each of values) {
    const problem = valueProblem(info, each, isWord, symbols);
    if (problem) return problem;
  }
  return null;
}

function valueProblem(
  info: SymbolInfo,
  value: string | number | { fact: string },
  isWord: boolean,
  symbols: ReadonlyMap<string, SymbolInfo>,
): Problem | null {
  if (typeof value === 'object') {
    const other = symbols.get(value.fact);
    if (!other) return { code: 'unknown-fact', message: `There is no fact “${value.fact}” in this edition.` };
    const same = (other.dimension === undefined) === isWord;
    return same
      ? null
      : { code: 'wrong-value-type', message: `${info.symbol} and ${other.symbol} can’t be compared.` };
  }
  if (isWord !== (typeof value === 'string')) {
    const message = isWord
      ? `${info.symbol} is a word and is compared with the number ${String(value)}.`
      : `${info.symbol} is a number and is compared with the word “${String(value)}”.`;
    return { code: 'wrong-value-type', message };
  }
  if (typeof value === 'string' && info.words && !info.words.includes(value)) {
    const there = info.words.slice(0, 8).join(', ');
    return {
      code: 'unknown-option',
      message: `${info.symbol} is never “${value}”. It can be ${there || 'nothing yet'}.`,
    };
  }
  if (typeof value === 'number' && !Number.isFinite(value)) {
    return {
      code: 'wrong-value-type',
      message: `${info.symbol} is compared with something that is not a number.`,
    };
  }
  return null;
}
