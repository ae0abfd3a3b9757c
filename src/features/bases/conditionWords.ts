import { Findings } from '#shared/basis/compile/findings.ts';
import type { SymbolInfo } from '#shared/basis/compile/plan.ts';
import { collectSymbols } from '#shared/basis/compile/symbols.ts';
import type { Comparison, Condition, Edition } from '#shared/basis/schema/index.ts';
import { unitForReading } from '#shared/units/format.ts';

const operators: Readonly<Record<Comparison['operator'], string>> = {
  equal: 'is',
  notEqual: 'is not',
  in: 'is one of',
  notIn: 'is none of',
  lessThan: 'below',
  lessThanInclusive: 'at most',
  greaterThan: 'above',
  greaterThanInclusive: 'at least',
};

const known = new WeakMap<Edition, ReadonlyMap<string, SymbolInfo>>();

/** Every symbol of an edition with its title and unit; gathered once, since hundreds of cases ask. */
function symbolsOf(edition: Edition): ReadonlyMap<string, SymbolInfo> {
  const before = known.get(edition);
  if (before) return before;
  const symbols = collectSymbols(edition, new Findings());
  known.set(edition, symbols);
  return symbols;
}

/** How a fact of an edition is called. */
export function factTitle(edition: Edition, symbol: string): string {
  const title = symbolsOf(edition).get(symbol)?.title.toLowerCase();
  return title ? `${title} ${symbol.length <= 2 ? symbol : ''}`.trim() : symbol;
}

/** The unit a fact is compared in, for reading; nothing for words and pure numbers. */
export function factUnit(edition: Edition, symbol: string): string {
  return unitForReading(symbolsOf(edition).get(symbol)?.unit ?? '1');
}

function wordTitle(edition: Edition, fact: string, word: string): string {
  const option = edition.choices
    .find(({ symbol }) => symbol === fact)
    ?.options.find(({ id }) => id === word)?.title;
  const listed = [...edition.durations, ...edition.grades.rows, ...edition.actions].find(
    ({ id }) => id === word,
  )?.title;
  return (option ?? listed ?? word).toLowerCase();
}

/**
 * A condition in words: "depth h at most 72 mm, and use is floor joist".
 *
 * @param exact Writes a number as this person reads it.
 */
export function conditionInWords(
  edition: Edition,
  condition: Condition,
  exact: (value: number) => string = String,
): string {
  const inner = (child: Condition) => {
    const text = conditionInWords(edition, child, exact);
    return 'fact' in child ? text : `(${text})`;
  };
  if ('all' in condition) return condition.all.map(inner).join(', and ');
  if ('any' in condition) return condition.any.map(inner).join(', or ');
  if ('not' in condition) return `not ${inner(condition.not)}`;
  const { fact, operator, value } = condition;
  const said = (each: string | number) =>
    typeof each === 'number'
      ? `${exact(each)} ${factUnit(edition, fact)}`.trim()
      : wordTitle(edition, fact, each);
  const against =
    typeof value === 'object' && 'fact' in value
      ? factTitle(edition, value.fact)
      : (Array.isArray(value) ? (value as readonly (string | number)[]) : [value as string | number])
          .map(said)
          .join(', ');
  return `${factTitle(edition, fact)} ${operators[operator]} ${against}`;
}
