import type { Clause, Comparison, Condition, Outcome } from '../schema/index.ts';
import { eachComparison } from './conditions.ts';
import type { Findings } from './findings.ts';
import type { SymbolInfo } from './plan.ts';

/*
 * The checks that the literature on decision tables asks for: identical, equivalent and subsumed cases,
 * contradictory outcomes, overlaps, cases that could be joined, and missing cases. Each fact's range is cut
 * at the constants that the clause compares it with, into points and open intervals within which no
 * comparison changes its answer; so a finite number of situations stands for all of them, exactly.
 */

/** Situations looked at for one clause; beyond that the clause is too wide to be searched. */
const mostSituations = 20_000;

type Value = number | string;
interface Axis {
  fact: string;
  values: readonly Value[];
}

function holds(condition: Condition, situation: ReadonlyMap<string, Value>): boolean {
  if ('all' in condition) return condition.all.every((c) => holds(c, situation));
  if ('any' in condition) return condition.any.some((c) => holds(c, situation));
  if ('not' in condition) return !holds(condition.not, situation);
  return compares(condition, situation);
}

function compares({ fact, operator, value }: Comparison, situation: ReadonlyMap<string, Value>): boolean {
  const actual = situation.get(fact);
  if (actual === undefined || (typeof value === 'object' && 'fact' in value)) return false;
  const single = value as Value;
  switch (operator) {
    case 'equal':
      return actual === single;
    case 'notEqual':
      return actual !== single;
    case 'in':
      return (value as readonly Value[]).includes(actual);
    case 'notIn':
      return !(value as readonly Value[]).includes(actual);
    case 'lessThan':
      return actual < single;
    case 'lessThanInclusive':
      return actual <= single;
    case 'greaterThan':
      return actual > single;
    case 'greaterThanInclusive':
      return actual >= single;
  }
}

/** Points at the constants and between them, and beyond the outermost. Lengths and counts are never negative,
 *  but a clause may say so itself; a value below the least constant stands for all below it. */
function numberAxis(fact: string, constants: readonly number[]): Axis {
  const sorted = [...new Set(constants)].sort((a, b) => a - b);
  const values: number[] = [];
  sorted.forEach((constant, i) => {
    const before = sorted[i - 1];
    values.push(
      before === undefined ? constant - Math.max(1, Math.abs(constant)) : (before + constant) / 2,
      constant,
    );
  });
  const last = sorted[sorted.length - 1] ?? 0;
  values.push(last + Math.max(1, Math.abs(last)));
  return { fact, values };
}

/** The axes of a clause, or why they can't be laid out. */
function axesOf(clause: Clause, symbols: ReadonlyMap<string, SymbolInfo>): Axis[] | string {
  const constants = new Map<string, Value[]>();
  let reason: string | null = null;
  for (const { when } of clause.cases) {
    if (!when) continue;
    eachComparison(when, '', ({ fact, value }) => {
      if (typeof value === 'object' && 'fact' in value) reason = 'two facts are compared with each other';
      else {
        const list = (Array.isArray(value) ? value : [value]) as Value[];
        constants.set(fact, [...(constants.get(fact) ?? []), ...list]);
      }
    });
  }
  if (reason !== null) return reason;
  const axes = [...constants].map(([fact, values]): Axis => {
    const info = symbols.get(fact);
    if (info?.dimension)
      return numberAxis(
        fact,
        values.filter((v) => typeof v === 'number'),
      );
    return { fact, values: info?.words ?? [...new Set(values), ' other'] };
  });
  const count = axes.reduce((product, { values }) => product * Math.max(values.length, 1), 1);
  return count > mostSituations ? 'it looks at too many facts at once' : axes;
}

function* situations(axes: readonly Axis[]): Generator<ReadonlyMap<string, Value>> {
  const at = axes.map(() => 0);
  for (;;) {
    yield new Map(axes.map(({ fact, values }, i) => [fact, values[at[i] as number] as Value]));
    let i = axes.length - 1;
    for (; i >= 0; i -= 1) {
      at[i] = (at[i] as number) + 1;
      if ((at[i] as number) < (axes[i] as Axis).values.length) break;
      at[i] = 0;
    }
    if (i < 0) return;
  }
}

const inWords = (situation: ReadonlyMap<string, Value>) =>
  [...situation].map(([fact, value]) => `${fact} = ${String(value).trim()}`).join(', ');
const sameOutcome = (a: Outcome, b: Outcome) => JSON.stringify(a) === JSON.stringify(b);

/** Runs the checks on one clause and writes what it finds. */
export function checkCases(
  clause: Clause,
  index: number,
  symbols: ReadonlyMap<string, SymbolInfo>,
  findings: Findings,
): void {
  const pointer = `/clauses/${index}`;
  const { cases, title, id } = clause;
  const hasOtherwise = cases[cases.length - 1]?.when === undefined;
  const axes = axesOf(clause, symbols);
  if (typeof axes === 'string') {
    if (!hasOtherwise) {
      const message = `“${title}” has no last case without a condition, and whether its cases cover everything can’t be told because ${axes}.`;
      findings.error('missing-otherwise', `${pointer}/cases`, message, { clause: id });
    } else if (cases.length > 2) {
      findings.note('cases-not-searched', pointer, `Overlaps of “${title}” were not searched: ${axes}.`, {
        clause: id,
      });
    }
    return;
  }
  const sets = cases.map((): Set<number> => new Set());
  const first = cases.map(() => 0);
  let uncovered: string | null = null;
  let number = 0;
  for (const situation of situations(axes)) {
    let taken = false;
    cases.forEach(({ when }, i) => {
      if (when && !holds(when, situation)) return;
      if (when) sets[i]?.add(number);
      if (!taken) first[i] = (first[i] as number) + 1;
      taken = true;
    });
    if (!taken) uncovered ??= inWords(situation);
    number += 1;
  }
  if (uncovered !== null) {
    const message = `“${title}” has no case for ${uncovered || 'anything'}. Add one, or a last case without a condition.`;
    findings.error('missing-otherwise', `${pointer}/cases`, message, { clause: id });
  }
  compareCases(clause, pointer, sets, first, number, findings);
}

function compareCases(
  clause: Clause,
  pointer: string,
  sets: readonly ReadonlySet<number>[],
  first: readonly number[],
  total: number,
  findings: Findings,
): void {
  const { cases, title, id, exclusive } = clause;
  cases.forEach((late, j) => {
    const where = { clause: id, case: late.id };
    const at = `${pointer}/cases/${j}`;
    const own = sets[j] ?? new Set<number>();
    if (late.when && own.size === 0) {
      findings.warning('never-holds', at, `Case “${late.id}” of “${title}” can never hold.`, where);
      return;
    }
    if (first[j] === 0) {
      const before = cases.slice(0, j).find((_, i) => late.when && [...own].every((s) => sets[i]?.has(s)));
      const by = before
        ? ` Case “${before.id}” always holds before it.`
        : ' The cases before it take everything.';
      findings.warning(
        'unreachable-case',
        at,
        `Case “${late.id}” of “${title}” is never reached.${by}`,
        where,
      );
    }
    if (!late.when) return;
    cases.slice(0, j).forEach((early, i) => {
      if (!early.when) return;
      const other = sets[i] ?? new Set<number>();
      const common = [...own].filter((s) => other.has(s)).length;
      const same = common === own.size && common === other.size;
      const alike = sameOutcome(early.gives, late.gives);
      const names = `“${early.id}” and “${late.id}” of “${title}”`;
      if (same && JSON.stringify(early.when) === JSON.stringify(late.when)) {
        const code = alike ? 'identical-cases' : 'contradictory-cases';
        const message = alike
          ? `Cases ${names} are identical.`
          : `Cases ${names} have one condition and different outcomes.`;
        findings[alike ? 'warning' : 'error'](code, at, message, where);
      } else if (same) {
        const code = alike ? 'equivalent-cases' : 'contradictory-cases';
        const message = alike
          ? `Cases ${names} hold in the same situations and give the same.`
          : `Cases ${names} hold in the same situations and give different outcomes.`;
        findings[alike ? 'warning' : 'error'](code, at, message, where);
      } else if (common > 0 && exclusive) {
        findings.error(
          'overlap',
          at,
          `Cases ${names} can hold at once, and the clause says that they exclude each other.`,
          where,
        );
      } else if (common === own.size && alike) {
        findings.note(
          'subsumed-case',
          at,
          `Case “${late.id}” of “${title}” is contained in “${early.id}” and gives the same.`,
          where,
        );
      } else if (common === 0 && alike && j === i + 1 && own.size + other.size < total) {
        findings.note(
          'joinable-cases',
          at,
          `Cases ${names} give the same and could be joined into one.`,
          where,
        );
      }
    });
  });
}
