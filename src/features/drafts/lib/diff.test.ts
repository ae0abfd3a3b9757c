import { describe, expect, it } from 'vitest';
import type { Edition } from '#shared/basis/schema/index.ts';
import { editionDifferences } from './diff.ts';

const provenance = { source: 's', standing: 'invented' } as const;
const base = {
  title: 'A',
  purpose: '',
  method: '',
  caution: '',
  unitSystem: 'metric',
  grades: {
    columns: [{ symbol: 'f_m', title: 'Bending', unit: 'N/mm2' }],
    rows: [
      { id: 'l1', title: 'Larch 1', choices: {}, values: { f_m: 10 }, provenance },
      { id: 'l2', title: 'Larch 2', choices: {}, values: { f_m: 8 }, provenance },
    ],
  },
  clauses: [
    {
      id: 'k',
      symbol: 'K',
      title: 'Duration',
      reference: '1',
      kind: 'factor',
      unit: '1',
      cases: [{ id: 'c', gives: { kind: 'constant', value: 1.25 }, provenance }],
    },
  ],
  tables: [],
  actions: [],
  combinations: [],
  checks: [],
  choices: [],
  proofs: [],
  sources: [],
} as Partial<Edition> as Edition;

describe('differences between editions', () => {
  it('finds none between an edition and itself', () => {
    expect(editionDifferences(base, structuredClone(base), String)).toEqual([]);
  });

  it('says a grade value with its relative change, added and removed grades, a clause’s outcomes', () => {
    const next = structuredClone(base);
    next.grades.rows[0] = { ...base.grades.rows[0], values: { f_m: 9 } } as Edition['grades']['rows'][number];
    next.grades.rows[1] = {
      ...base.grades.rows[1],
      id: 'l3',
      title: 'Larch 3',
    } as Edition['grades']['rows'][number];
    next.clauses[0] = {
      ...base.clauses[0],
      cases: [{ id: 'c', gives: { kind: 'formula', formula: '2 / 3' }, provenance }],
    } as Edition['clauses'][number];
    const found = editionDifferences(base, next, String);
    expect(found.map(({ name, before, after }) => [name, before, after])).toEqual([
      ['Larch 1, bending', '10', '9'],
      ['Larch 3', 'not there', 'added'],
      ['Larch 2', 'there', 'removed'],
      ['Duration', '1.25', '2 / 3'],
    ]);
    expect(found[0]?.change).toBeCloseTo(-0.1);
  });
});
