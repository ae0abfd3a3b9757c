import type { Comparison, Condition, Edition } from '#shared/basis/schema/index.ts';
import { builtInFacts } from '#shared/basis/facts.ts';

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

/** How a fact of an edition is called. */
export function factTitle(edition: Edition, symbol: string): string {
  const named = [
    ...edition.choices,
    ...edition.inputs,
    ...edition.grades.columns,
    ...edition.clauses,
    ...builtInFacts,
  ];
  const title = named.find((each) => each.symbol === symbol)?.title.toLowerCase();
  return title ? `${title} ${symbol.length <= 2 ? symbol : ''}`.trim() : symbol;
}

function valueTitle(edition: Edition, fact: string, value: string | number): string {
  if (typeof value === 'number') return String(value);
  const option = edition.choices
    .find(({ symbol }) => symbol === fact)
    ?.options.find(({ id }) => id === value)?.title;
  const listed = [...edition.durations, ...edition.grades.rows, ...edition.actions].find(
    ({ id }) => id === value,
  )?.title;
  return (option ?? listed ?? value).toLowerCase();
}

/** A condition in words: "depth h at most 72, and use is floor joist". */
export function conditionInWords(edition: Edition, condition: Condition): string {
  const inner = (child: Condition) => {
    const text = conditionInWords(edition, child);
    return 'fact' in child ? text : `(${text})`;
  };
  if ('all' in condition) return condition.all.map(inner).join(', and ');
  if ('any' in condition) return condition.any.map(inner).join(', or ');
  if ('not' in condition) return `not ${inner(condition.not)}`;
  const { fact, operator, value } = condition;
  const said =
    typeof value === 'object' && 'fact' in value
      ? factTitle(edition, value.fact)
      : (Array.isArray(value) ? (value as readonly (string | number)[]) : [value as string | number])
          .map((each) => valueTitle(edition, fact, each))
          .join(', ');
  return `${factTitle(edition, fact)} ${operators[operator]} ${said}`;
}
