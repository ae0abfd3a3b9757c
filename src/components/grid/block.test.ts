import { describe, expect, it } from 'vitest';
import { cleared, filledDown, neutralised, pasted, readClipboard, writeClipboard } from './block.ts';
import type { CellText, GridColumn, GridRow, Selection } from './types.ts';

const columns: GridColumn[] = [
  { key: 'name', title: 'Grade', kind: 'text' },
  { key: 'f_m', title: 'Bending', kind: 'number', unit: 'N/mm2' },
  { key: 'f_v', title: 'Shear', kind: 'number', unit: 'N/mm2' },
];
const rows: GridRow[] = [
  { key: 'a', cells: { name: 'A', f_m: 8, f_v: 0.9 } },
  { key: 'b', cells: { name: 'B', f_m: 7, f_v: null } },
];
const text: CellText = {
  parse: (column, cell) => {
    if (column.kind !== 'number') return { ok: true, value: cell };
    if (cell === '') return { ok: true, value: null };
    const value = Number(cell);
    return Number.isFinite(value)
      ? { ok: true, value }
      : { ok: false, message: `"${cell}" is not a number.` };
  },
  format: (_column, value) => (value === null ? '' : String(value)),
};
const at = (row: number, column: number, toRow = row, toColumn = column): Selection => ({
  anchor: { row, column },
  head: { row: toRow, column: toColumn },
});

describe('clipboard', () => {
  it('reads quoted cells with tabs and line breaks in them', () => {
    expect(readClipboard('a\t"b\tc"\r\n"line\nbreak"\t2\r\n')).toEqual([
      ['a', 'b\tc'],
      ['line\nbreak', '2'],
    ]);
  });

  it('keeps a formula from running in a spreadsheet, and leaves numbers alone', () => {
    expect(neutralised('=SUM(A1)')).toBe("'=SUM(A1)");
    expect(neutralised('@x')).toBe("'@x");
    expect(neutralised('-3.5')).toBe('-3.5');
    expect(neutralised('-cmd')).toBe("'-cmd");
  });

  it('writes the selected block', () => {
    expect(writeClipboard(at(0, 1, 1, 2), columns, rows, text)).toBe('8\t0.9\n7\t');
  });
});

describe('paste', () => {
  it('changes cells, adds rows below and says what it could not read', () => {
    const step = pasted(at(1, 1), readClipboard('6.5\tx\n5\t0.7'), columns, rows, text, true);
    expect(step.changes).toEqual([{ row: 'b', column: 'f_m', before: 7, after: 6.5 }]);
    expect(step.newRows).toEqual([{ f_m: 5, f_v: 0.7 }]);
    expect(step.rejected).toEqual([{ row: 1, column: 'f_v', text: 'x', message: '"x" is not a number.' }]);
  });

  it('fills the selection from one cell', () => {
    const step = pasted(at(0, 1, 1, 2), [['5']], columns, rows, text, false);
    expect(step.changes.map((c) => c.after)).toEqual([5, 5, 5, 5]);
  });

  it('rejects what falls beyond the last column or, where rows are fixed, the last row', () => {
    const step = pasted(at(1, 2), readClipboard('1\t2\n3\t4'), columns, rows, text, false);
    expect(step.rejected.map((r) => r.message)).toEqual([
      'There is no column here.',
      'There is no row here.',
      'There is no column here.',
    ]);
  });
});

describe('fill and clear', () => {
  it('fills down from the first row of the selection', () => {
    expect(filledDown(at(0, 1, 1, 2), columns, rows).changes).toEqual([
      { row: 'b', column: 'f_m', before: 7, after: 8 },
      { row: 'b', column: 'f_v', before: null, after: 0.9 },
    ]);
  });

  it('clears only what holds something and may change', () => {
    const fixed = columns.map((c) => (c.key === 'name' ? { ...c, readOnly: true } : c));
    expect(cleared(at(1, 0, 1, 2), fixed, rows).changes).toEqual([
      { row: 'b', column: 'f_m', before: 7, after: null },
    ]);
  });
});
