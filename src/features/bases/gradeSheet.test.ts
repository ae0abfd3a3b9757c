import { describe, expect, it } from 'vitest';
import type { Edition, Provenance } from '#shared/basis/schema/index.ts';
import { cellInWords, cellMark, gradeSheet } from './gradeSheet.ts';

const from = (standing: Provenance['standing']): Provenance => ({ source: 's', standing });
const verified: Provenance = {
  ...from('seen'),
  place: 'table 2',
  verified: { by: 'A. Checker', on: '2026-11-18' },
};
/** Made-up values. */
const edition = {
  unitSystem: 'metric',
  sources: [{ id: 's', title: 'Yard sheet', kind: 'other' }],
  choices: [],
  inputs: [],
  clauses: [],
  durations: [],
  actions: [],
  actionValues: [],
  combinations: [],
  grades: {
    columns: [
      { symbol: 'f_m', title: 'Bending', unit: 'N/mm2' },
      { symbol: 'f_v', title: 'Shear', unit: 'N/mm2' },
    ],
    rows: [
      {
        id: 'one',
        title: 'First sort',
        choices: {},
        values: { f_m: { by: 'h', edge: 'above', edges: [null, 150, 300], values: [9, 8.25] } },
        provenance: from('memory'),
      },
      {
        id: 'two',
        title: 'Second sort',
        choices: {},
        values: { f_m: 7.5, f_v: 1 },
        provenance: from('invented'),
        cells: { f_v: verified },
      },
    ],
  },
} as Partial<Edition> as Edition;
const write = (value: number, decimals: number) => value.toFixed(decimals);

describe('the grade table', () => {
  it('writes a column with the decimals of its finest value, and leaves what is missing empty', () => {
    const { columns, rows } = gradeSheet(edition, write);
    expect(columns.map(({ title, unit }) => [title, unit])).toEqual([
      ['Grade', undefined],
      ['Bending', 'N/mm²'],
      ['Shear', 'N/mm²'],
    ]);
    expect(rows.map(({ cells }) => cells)).toEqual([
      { grade: 'First sort', f_m: '9.00 / 8.25', f_v: null },
      { grade: 'Second sort', f_m: '7.50', f_v: '1' },
    ]);
  });

  it('says of each value what it is and where it comes from', () => {
    expect(cellInWords(edition, 'two', 'f_v', write)).toBe(
      'Second sort, shear: 1 N/mm². Yard sheet, table 2; seen in the source; verified by A. Checker.',
    );
    expect(cellInWords(edition, 'one', 'f_m', write)).toBe(
      'First sort, bending: by depth h: 9.00 N/mm² below 150 mm; 8.25 N/mm² from 150 mm below 300 mm. Yard sheet; from memory; not verified by a second person.',
    );
    expect(cellInWords(edition, 'one', 'f_v', write)).toMatch(/no value/);
  });

  it('marks what nobody verified, and apart from it what was written from memory', () => {
    expect(cellMark(edition, 'one', 'f_m')?.tone).toBe('memory');
    expect(cellMark(edition, 'two', 'f_m')?.tone).toBe('unverified');
    expect(cellMark(edition, 'two', 'f_v')).toBeUndefined();
    expect(cellMark(edition, 'one', 'f_v')).toBeUndefined();
  });
});
