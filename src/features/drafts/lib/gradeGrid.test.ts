import { describe, expect, it } from 'vitest';
import type { Edition } from '#shared/basis/schema/index.ts';
import { afterStep, gradeColumns, gradeId, gradeRows } from './gradeGrid.ts';

const provenance = { source: 's', standing: 'seen', verified: { by: 'A', on: '2026-01-01' } } as const;
const edition = {
  choices: [
    { symbol: 'timber', title: 'Timber', scope: 'grade', options: [{ id: 'soft', title: 'Softwood' }] },
  ],
  sources: [{ id: 's', title: 'A source', kind: 'publication' }],
  grades: {
    columns: [
      { symbol: 'f_m', title: 'Bending', unit: 'N/mm2' },
      { symbol: 'E', title: 'Modulus', unit: 'N/mm2' },
    ],
    rows: [
      { id: 'a', title: 'Larch A', choices: { timber: 'soft' }, values: { f_m: 8, E: 9000 }, provenance },
    ],
  },
} as Partial<Edition> as Edition;

describe('grades as a grid', () => {
  it('has a column for the name, each choice and each property', () => {
    expect(gradeColumns(edition).map(({ key }) => key)).toEqual(['title', 'choice.timber', 'f_m', 'E']);
    expect(gradeRows(edition)[0]?.cells).toEqual({
      title: 'Larch A',
      'choice.timber': 'soft',
      f_m: 8,
      E: 9000,
    });
  });

  it('takes a changed value for the firm’s own, unverified, and leaves its neighbours verified', () => {
    const after = afterStep(edition, {
      changes: [{ row: 'a', column: 'f_m', before: 8, after: 8.6 }],
      newRows: [],
    });
    const [row] = after.grades.rows;
    expect(row?.values['f_m']).toBe(8.6);
    expect(row?.cells?.['f_m']).toMatchObject({ standing: 'decision', source: 's' });
    expect(row?.cells?.['f_m']?.verified).toBeUndefined();
    expect(row?.cells?.['E']).toBeUndefined();
    expect(edition.grades.rows[0]?.values['f_m']).toBe(8);
  });

  it('removes an emptied property instead of making it zero', () => {
    const after = afterStep(edition, {
      changes: [{ row: 'a', column: 'E', before: 9000, after: null }],
      newRows: [],
    });
    expect(after.grades.rows[0]?.values).toEqual({ f_m: 8 });
  });

  it('adds rows with ids of their own', () => {
    const after = afterStep(edition, {
      changes: [],
      newRows: [{ title: 'Larch B', f_m: 7 }, { title: 'Larch B' }],
    });
    expect(after.grades.rows.map(({ id }) => id)).toEqual(['a', 'Larch-B', 'Larch-B-2']);
    expect(after.grades.rows[1]?.choices).toEqual({ timber: 'soft' });
    expect(gradeId('30 mm', [])).toBe('mm');
    expect(gradeId('…', [])).toBe('grade');
  });
});
