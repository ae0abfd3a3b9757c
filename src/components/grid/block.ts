import Papa from 'papaparse';
import { blockOf } from './selection.ts';
import type { CellContent, CellText, GridColumn, GridRow, GridStep, Selection } from './types.ts';

/** Largest block taken from the clipboard, in characters; more belongs in a file. */
export const largestPaste = 2_000_000;

/** A block of text cells from what spreadsheet programs put on the clipboard (tab-separated, quoted). */
export function readClipboard(text: string): string[][] {
  const trimmed = text.replace(/\r?\n$/, '');
  return Papa.parse<string[]>(trimmed, { delimiter: '\t' }).data;
}

/**
 * Text that a spreadsheet program would run as a formula is given a leading apostrophe, so that it stays
 * text there. Plain numbers, negative ones included, are left as they are.
 */
export function neutralised(text: string): string {
  if (/^[=+\-@\t\r]/.test(text) && !/^-?\d[\d.,\s]*$/.test(text)) return `'${text}`;
  return text;
}

/** The selected block as tab-separated text. */
export function writeClipboard(
  selection: Selection,
  columns: readonly GridColumn[],
  rows: readonly GridRow[],
  text: CellText,
): string {
  const { top, bottom, left, right } = blockOf(selection);
  const block = rows
    .slice(top, bottom + 1)
    .map((row) =>
      columns
        .slice(left, right + 1)
        .map((column) => neutralised(text.format(column, row.cells[column.key] ?? null))),
    );
  return Papa.unparse(block, { delimiter: '\t', newline: '\n' });
}

/**
 * Lays a block of texts over the grid from the selection's top left. One cell fills the whole selection;
 * a block that divides the selection evenly is repeated over it. Columns beyond the last are rejected,
 * rows beyond the last become new rows where `grow` allows it.
 */
export function pasted(
  selection: Selection,
  texts: readonly (readonly string[])[],
  columns: readonly GridColumn[],
  rows: readonly GridRow[],
  text: CellText,
  grow: boolean,
): GridStep {
  const block = blockOf(selection);
  const height = texts.length;
  const width = Math.max(...texts.map((row) => row.length), 0);
  const selectedHeight = block.bottom - block.top + 1;
  const selectedWidth = block.right - block.left + 1;
  const repeats = selectedHeight % height === 0 && selectedWidth % width === 0;
  const step = new StepBuilder(columns, rows, text);
  for (let r = 0; r < (repeats ? selectedHeight : height); r += 1) {
    for (let c = 0; c < (repeats ? selectedWidth : width); c += 1) {
      const cell = texts[r % height]?.[c % width];
      if (cell !== undefined) step.put(block.top + r, block.left + c, cell, grow);
    }
  }
  return step.done();
}

/** Copies the top row of the selection down over the rest of it. */
export function filledDown(
  selection: Selection,
  columns: readonly GridColumn[],
  rows: readonly GridRow[],
): GridStep {
  const { top, bottom, left, right } = blockOf(selection);
  const source = rows[top];
  return valuesOver(columns, rows, (column) => source?.cells[column.key] ?? null, {
    top: top + 1,
    bottom,
    left,
    right,
  });
}

/** Empties the selection. */
export function cleared(
  selection: Selection,
  columns: readonly GridColumn[],
  rows: readonly GridRow[],
): GridStep {
  return valuesOver(columns, rows, () => null, blockOf(selection));
}

function valuesOver(
  columns: readonly GridColumn[],
  rows: readonly GridRow[],
  value: (column: GridColumn) => CellContent,
  area: { top: number; bottom: number; left: number; right: number },
): GridStep {
  const changes = rows.slice(area.top, area.bottom + 1).flatMap((row) =>
    columns.slice(area.left, area.right + 1).flatMap((column) => {
      const before = row.cells[column.key] ?? null;
      const after = value(column);
      return column.readOnly || before === after ? [] : [{ row: row.key, column: column.key, before, after }];
    }),
  );
  return { changes, newRows: [], rejected: [] };
}

class StepBuilder {
  readonly #changes: GridStep['changes'][number][] = [];
  readonly #newRows: Record<string, CellContent>[] = [];
  readonly #rejected: GridStep['rejected'][number][] = [];
  readonly #columns: readonly GridColumn[];
  readonly #rows: readonly GridRow[];
  readonly #text: CellText;

  constructor(columns: readonly GridColumn[], rows: readonly GridRow[], text: CellText) {
    this.#columns = columns;
    this.#rows = rows;
    this.#text = text;
  }

  put(rowIndex: number, columnIndex: number, cell: string, grow: boolean): void {
    const column = this.#columns[columnIndex];
    if (!column) return this.#reject(rowIndex, `column ${columnIndex + 1}`, cell, 'There is no column here.');
    if (column.readOnly)
      return this.#reject(rowIndex, column.key, cell, `${column.title} can't be changed here.`);
    const read = this.#text.parse(column, cell.trim());
    if (!read.ok) return this.#reject(rowIndex, column.key, cell, read.message);
    const row = this.#rows[rowIndex];
    if (row) {
      const before = row.cells[column.key] ?? null;
      if (before !== read.value)
        this.#changes.push({ row: row.key, column: column.key, before, after: read.value });
      return undefined;
    }
    if (!grow) return this.#reject(rowIndex, column.key, cell, 'There is no row here.');
    const index = rowIndex - this.#rows.length;
    while (this.#newRows.length <= index) this.#newRows.push({});
    const target = this.#newRows[index];
    if (target) target[column.key] = read.value;
    return undefined;
  }

  #reject(row: number, column: string, text: string, message: string): void {
    this.#rejected.push({ row, column, text, message });
  }

  done(): GridStep {
    return { changes: this.#changes, newRows: this.#newRows, rejected: this.#rejected };
  }
}
