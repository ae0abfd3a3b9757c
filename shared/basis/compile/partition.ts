import { compare, type FactValue } from '../condition/compare.ts';
import type { Comparison, Condition, Operator } from '../schema/index.ts';
import { eachComparison } from './conditions.ts';
import type { SymbolInfo } from './plan.ts';

/*
 * A finite number of situations that stand for all there are. Each fact's range is cut at the constants that
 * the conditions compare it with, into points and open intervals within which no comparison changes its
 * answer. Two facts compared with each other are one more axis: less, equal or greater.
 */

/** Positions on the axes, one each. */
export type Situation = readonly number[];
export type Test = (situation: Situation) => boolean;

export interface Partition {
  /** Number of situations: the product of the axes' sizes. */
  count: number;
  /** Comparisons in all conditions: the work of one situation. */
  comparisons: number;
  /**
   * Facts that may hang together (two compared with each other, or one worked out from others): then some of
   * the situations can't occur, and only what holds for none of them, or all, is certain.
   */
  related: boolean;
  situations: () => Generator<Situation>;
  testOf: (condition: Condition) => Test;
  /** A situation in words, such as "h = 72, exposure = wet". */
  say: (situation: Situation) => string;
}

interface Axis {
  /** One fact, or two that are compared with each other. */
  facts: readonly string[];
  labels: readonly string[];
  /** Answers of a comparison along the axis. */
  answers: (comparison: Comparison) => readonly boolean[];
}

/** Lays the axes out for some conditions over known facts. */
export function partition(
  conditions: readonly Condition[],
  symbols: ReadonlyMap<string, SymbolInfo>,
): Partition {
  const constants = new Map<string, FactValue[]>();
  const pairs = new Map<string, readonly [string, string]>();
  let comparisons = 0;
  for (const condition of conditions) {
    eachComparison(condition, '', ({ fact, value }) => {
      comparisons += 1;
      if (typeof value === 'object' && 'fact' in value) {
        const pair = [fact, value.fact].sort() as [string, string];
        pairs.set(pair.join(' '), pair);
      } else {
        const list = (Array.isArray(value) ? value : [value]) as FactValue[];
        constants.set(fact, [...(constants.get(fact) ?? []), ...list]);
      }
    });
  }
  const axes = [
    ...[...constants].map(([fact, values]) => axisOf(fact, values, symbols.get(fact))),
    ...[...pairs.values()].map(([a, b]) => pairAxis(a, b, symbols.get(a)?.dimension !== undefined)),
  ];
  const facts = axes.flatMap((axis) => axis.facts);
  const derived = facts.some((fact) => symbols.get(fact)?.origin === 'clause');
  return {
    count: axes.reduce((product, { labels }) => product * labels.length, 1),
    comparisons,
    related: pairs.size > 0 || (derived && facts.length > 1),
    situations: () => walk(axes.map(({ labels }) => labels.length)),
    testOf: (condition) => testOf(condition, axes),
    say: (situation) => axes.map(({ labels }, i) => labels[situation[i] as number] ?? '').join(', '),
  };
}

function axisOf(fact: string, constants: readonly FactValue[], info: SymbolInfo | undefined): Axis {
  const numeric = info?.dimension !== undefined;
  const other = '(any other)';
  const values: readonly FactValue[] = numeric
    ? cut(
        constants.filter((value) => typeof value === 'number'),
        info.range ?? {},
      )
    : info?.words?.length
      ? info.words
      : [...new Set([...constants, other])];
  return {
    facts: [fact],
    labels: values.map((value) => `${fact} = ${String(value)}`),
    answers: ({ operator, value }) => values.map((actual) => compare(operator, actual, value as FactValue)),
  };
}

/** Points at the constants, between them and beyond the outermost, as far as the fact's range goes. */
function cut(constants: readonly number[], { above, from, to, whole }: NonNullable<SymbolInfo['range']>) {
  const low = from ?? above;
  const bounds = [from, to].filter((bound) => bound !== undefined);
  const inside = constants.filter(
    (value) =>
      (low === undefined || value > low || value === from) &&
      (to === undefined || value <= to) &&
      (!whole || Number.isInteger(value)),
  );
  const points = [...new Set([...inside, ...bounds])].sort((a, b) => a - b);
  const first = points[0] ?? low ?? to ?? 0;
  const last = points[points.length - 1] ?? first;
  const step = (value: number) => (whole ? 1 : Math.max(1, Math.abs(value)));
  const before =
    from !== undefined ? [] : above !== undefined ? gap(above, first, whole) : [first - step(first)];
  const values = [
    ...before,
    ...points.flatMap((point, i) =>
      i === 0 ? [point] : [...gap(points[i - 1] as number, point, whole), point],
    ),
    ...(to === undefined ? [last + step(last)] : []),
  ];
  return values.filter((value) => Number.isFinite(value));
}

/** A number strictly between two, if there is one. */
function gap(low: number, high: number, whole = false): number[] {
  const middle = whole ? Math.floor(low) + 1 : low / 2 + high / 2;
  return middle > low && middle < high ? [middle] : [];
}

const turned: Partial<Record<Operator, Operator>> = {
  lessThan: 'greaterThan',
  lessThanInclusive: 'greaterThanInclusive',
  greaterThan: 'lessThan',
  greaterThanInclusive: 'lessThanInclusive',
};

/** How two facts stand to each other, the first against the second. */
function pairAxis(a: string, b: string, ordered: boolean): Axis {
  const orders = a === b ? [0] : ordered ? [-1, 0, 1] : [-1, 0];
  const sign = { '-1': ordered ? '<' : '≠', '0': '=', '1': '>' };
  return {
    facts: [a, b],
    labels: orders.map((order) => `${a} ${sign[String(order) as keyof typeof sign]} ${b}`),
    answers: ({ fact, operator }) => {
      const seen = fact === a ? operator : (turned[operator] ?? operator);
      return orders.map((order) => compare(seen, order, 0));
    },
  };
}

function axisFor({ fact, value }: Comparison, axes: readonly Axis[]): number {
  const pair = typeof value === 'object' && 'fact' in value ? value.fact : undefined;
  return axes.findIndex(({ facts }) =>
    pair === undefined
      ? facts.length === 1 && facts[0] === fact
      : facts.length === 2 &&
        facts.includes(fact) &&
        facts.includes(pair) &&
        (fact !== pair || facts[0] === facts[1]),
  );
}

function testOf(condition: Condition, axes: readonly Axis[]): Test {
  if ('all' in condition) {
    const tests = condition.all.map((each) => testOf(each, axes));
    return (at) => tests.every((test) => test(at));
  }
  if ('any' in condition) {
    const tests = condition.any.map((each) => testOf(each, axes));
    return (at) => tests.some((test) => test(at));
  }
  if ('not' in condition) {
    const test = testOf(condition.not, axes);
    return (at) => !test(at);
  }
  const index = axisFor(condition, axes);
  const answers = axes[index]?.answers(condition) ?? [];
  return (at) => answers[at[index] as number] ?? false;
}

function* walk(sizes: readonly number[]): Generator<Situation> {
  const at = sizes.map(() => 0);
  for (;;) {
    yield at;
    let i = sizes.length - 1;
    for (; i >= 0; i -= 1) {
      at[i] = (at[i] as number) + 1;
      if ((at[i] as number) < (sizes[i] as number)) break;
      at[i] = 0;
    }
    if (i < 0) return;
  }
}
