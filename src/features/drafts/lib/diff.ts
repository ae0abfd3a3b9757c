import { patchBetween } from '#shared/basis/draft/patch.ts';
import type { Clause, Edition } from '#shared/basis/schema/index.ts';

/** One difference between two editions, in the trade's terms. */
export interface EditionDifference {
  kind:
    | 'grade'
    | 'clause'
    | 'table'
    | 'combination'
    | 'action'
    | 'check'
    | 'choice'
    | 'proof'
    | 'source'
    | 'other';
  /** What it is about: a grade and its property, a clause. */
  name: string;
  before: string;
  after: string;
  /** Relative change of a number. */
  change?: number;
}

type Say = (value: number) => string;
type Listed = { id: string; title: string };

function gradeDifferences(a: Edition, b: Edition, say: Say): EditionDifference[] {
  const found: EditionDifference[] = [];
  const columns = [...new Set([...a.grades.columns, ...b.grades.columns].map(({ symbol }) => symbol))];
  const titleOf = (symbol: string) =>
    [...b.grades.columns, ...a.grades.columns].find((column) => column.symbol === symbol)?.title ?? symbol;
  const text = (value: Edition['grades']['rows'][number]['values'][string] | undefined) =>
    value === undefined ? 'none' : typeof value === 'number' ? say(value) : value.values.map(say).join(' / ');
  for (const row of b.grades.rows) {
    const old = a.grades.rows.find(({ id }) => id === row.id);
    if (!old) found.push({ kind: 'grade', name: row.title, before: 'not there', after: 'added' });
    else
      for (const symbol of columns) {
        const [x, y] = [old.values[symbol], row.values[symbol]];
        if (JSON.stringify(x) === JSON.stringify(y)) continue;
        const change = typeof x === 'number' && typeof y === 'number' && x !== 0 ? { change: y / x - 1 } : {};
        found.push({
          kind: 'grade',
          name: `${row.title}, ${titleOf(symbol).toLowerCase()}`,
          before: text(x),
          after: text(y),
          ...change,
        });
      }
  }
  for (const row of a.grades.rows) {
    if (!b.grades.rows.some(({ id }) => id === row.id))
      found.push({ kind: 'grade', name: row.title, before: 'there', after: 'removed' });
  }
  return found;
}

function outcomeText(clause: Clause, say: Say): string {
  return clause.cases
    .map(({ gives }) => {
      if (gives.kind === 'constant') return say(gives.value);
      if (gives.kind === 'formula') return gives.formula;
      if (gives.kind === 'word') return gives.value;
      if (gives.kind === 'table') return `table ${gives.table}`;
      if (gives.kind === 'refuse') return 'refused';
      return gives.divisor === undefined
        ? `${say(gives.fraction ?? 0)} × span`
        : `span / ${say(gives.divisor)}`;
    })
    .join('; ');
}

function listDifferences<T extends Listed>(
  kind: EditionDifference['kind'],
  a: readonly T[],
  b: readonly T[],
  text: (item: T) => string,
): EditionDifference[] {
  const changed = b.flatMap((item): EditionDifference[] => {
    const old = a.find(({ id }) => id === item.id);
    if (!old) return [{ kind, name: item.title, before: 'not there', after: text(item) }];
    if (patchBetween(old, item).length === 0) return [];
    const [before, after] = [text(old), text(item)];
    return [
      {
        kind,
        name: item.title,
        before,
        after: before === after ? `${after} (conditions, source or notes changed)` : after,
      },
    ];
  });
  const removed = a
    .filter(({ id }) => !b.some((item) => item.id === id))
    .map((item): EditionDifference => ({ kind, name: item.title, before: text(item), after: 'removed' }));
  return [...changed, ...removed];
}

const named = <T extends { symbol: string; title: string }>(items: readonly T[]) =>
  items.map((item) => ({ ...item, id: item.symbol }));

/** Everything that differs between two editions, grades first. */
export function editionDifferences(a: Edition, b: Edition, say: Say): EditionDifference[] {
  const own = (['title', 'purpose', 'method', 'caution', 'unitSystem'] as const).flatMap(
    (key): EditionDifference[] =>
      a[key] === b[key] ? [] : [{ kind: 'other', name: key, before: a[key], after: b[key] }],
  );
  return [
    ...gradeDifferences(a, b, say),
    ...listDifferences('clause', a.clauses, b.clauses, (clause) => outcomeText(clause, say)),
    ...listDifferences('table', a.tables, b.tables, ({ values }) =>
      values.map((v) => (typeof v === 'number' ? say(v) : String(v))).join(', '),
    ),
    ...listDifferences('action', a.actions, b.actions, ({ duration, values }) =>
      [duration, ...Object.entries(values).map(([k, v]) => `${k} ${say(v)}`)].join(', '),
    ),
    ...listDifferences('combination', a.combinations, b.combinations, ({ terms }) =>
      terms.map(({ factor }) => factor).join('; '),
    ),
    ...listDifferences('check', a.checks, b.checks, (check) =>
      [check.demand?.formula, check.limit?.formula, check.utilisation?.formula].filter(Boolean).join(' ≤ '),
    ),
    ...listDifferences('choice', named(a.choices), named(b.choices), ({ options }) =>
      options.map(({ title }) => title).join(', '),
    ),
    ...listDifferences('proof', a.proofs, b.proofs, ({ expect }) =>
      expect.map(({ value }) => say(value)).join(', '),
    ),
    ...listDifferences('source', a.sources, b.sources, ({ title }) => title),
    ...own,
  ];
}
