import type { Edition } from '#shared/basis/schema/index.ts';

/** Where in an edition something stands: in words, and the part of the page that shows it. */
export interface Place {
  words: string;
  anchor: string;
}

type Listed = readonly { title: string }[];
const lists: Readonly<Record<string, { one: string; anchor: string; of: (edition: Edition) => Listed }>> = {
  clauses: { one: 'Clause', anchor: 'clauses', of: ({ clauses }) => clauses },
  tables: { one: 'Table', anchor: 'tables', of: ({ tables }) => tables },
  checks: { one: 'Check', anchor: 'checks', of: ({ checks }) => checks },
  proofs: { one: 'Proof', anchor: 'proofs', of: ({ proofs }) => proofs },
  sources: { one: 'Source', anchor: 'sources', of: ({ sources }) => sources },
  choices: { one: 'Choice', anchor: 'choices-and-inputs', of: ({ choices }) => choices },
  inputs: { one: 'Input', anchor: 'choices-and-inputs', of: ({ inputs }) => inputs },
  actions: { one: 'Action', anchor: 'actions-and-combinations', of: ({ actions }) => actions },
  actionValues: { one: 'Action value', anchor: 'actions-and-combinations', of: (e) => e.actionValues },
  combinations: { one: 'Combination', anchor: 'actions-and-combinations', of: (e) => e.combinations },
  durations: { one: 'Duration', anchor: 'actions-and-combinations', of: ({ durations }) => durations },
};

/** The place a pointer of a finding means; null: the edition as a whole. */
export function placeInWords(edition: Edition, pointer: string): Place | null {
  // Symbols and numbers hold neither “/” nor “~”, so there is nothing to unescape.
  const [part = '', ...rest] = pointer.split('/').slice(1);
  if (part === 'grades') {
    const [list, index, , symbol] = rest;
    const inList = (list === 'columns' ? edition.grades.columns : edition.grades.rows)[Number(index)];
    const column = edition.grades.columns.find((each) => each.symbol === symbol)?.title;
    return { words: ['Grades', inList?.title, column].filter(Boolean).join(', '), anchor: 'grades' };
  }
  const list = lists[part];
  if (!list) return null;
  const [index, inner, at] = rest;
  const title = list.of(edition)[Number(index)]?.title;
  const numbered = inner === 'cases' && at !== undefined ? `, case ${Number(at) + 1}` : '';
  return { words: `${list.one}${title ? ` “${title}”` : ''}${numbered}`, anchor: list.anchor };
}
