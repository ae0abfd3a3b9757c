import { describe, expect, it } from 'vitest';
import type { CellText, GridColumn, GridRow } from '#src/components/grid/types.ts';
import { readCsv } from './readCsv.ts';
import { guessMapping, previewRows } from './rowPreview.ts';

const columns: GridColumn[] = [
  { key: 'title', title: 'Grade', kind: 'text' },
  { key: 'f_m', title: 'Bending', symbol: 'f_m', unit: 'N/mm2', kind: 'number' },
  { key: 'E', title: 'Mean modulus', symbol: 'E_mean', kind: 'number' },
];
const rows: GridRow[] = [{ key: 'r1', cells: { title: 'Larch A', f_m: 8.2, E: 10_100 } }];
const text: CellText = {
  parse: (column, cell) => {
    if (column.kind !== 'number') return { ok: true, value: cell };
    const value = Number(cell);
    return cell !== '' && Number.isFinite(value)
      ? { ok: true, value }
      : { ok: false, message: `"${cell}" is not a number.` };
  },
  format: (_column, value) => String(value ?? ''),
};
function read(csv: string) {
  const outcome = readCsv(csv);
  if (!outcome.ok) throw new Error(outcome.message);
  return outcome.table;
}

describe('mapping and preview', () => {
  it('guesses columns by title, symbol and with a unit behind', () => {
    expect(guessMapping(['GRADE', 'f_m (N/mm2)', 'mean modulus', 'remark'], columns)).toEqual([
      'title',
      'f_m',
      'E',
      null,
    ]);
  });

  it('shows old and new, and tells changed rows from new ones', () => {
    const table = read('Grade,f_m,E\nlarch a,8.6,10100\nLarch B,7,9000\n');
    const preview = previewRows(
      table,
      guessMapping(['Grade', 'f_m', 'E_mean'], columns),
      columns,
      rows,
      'title',
      text,
    );
    expect(preview[0]).toEqual({
      line: 1,
      row: 'r1',
      changes: [{ column: 'f_m', before: 8.2, after: 8.6 }],
      problems: [],
    });
    expect(preview[1]?.row).toBeNull();
    expect(preview[1]?.changes).toHaveLength(3);
  });

  it('keeps each bad cell with its line, its text and the reason', () => {
    const table = read('Grade,f_m,E\nLarch A,eight,10100\n,7,9000\nLarch A,8,10100\n');
    const preview = previewRows(table, ['title', 'f_m', 'E'], columns, rows, 'title', text);
    expect(preview.map((row) => row.problems.map((p) => p.message))).toEqual([
      ['"eight" is not a number.'],
      ['This row has no name.'],
      ['Line 1 has the same name.'],
    ]);
  });
});
