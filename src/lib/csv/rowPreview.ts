import type { CellContent, CellText, GridColumn, GridRow } from '#src/components/grid/types.ts';
import type { CsvTable } from './readCsv.ts';

/** Which grid column each CSV column goes to; null: left out. */
export type Mapping = readonly (string | null)[];

/** What one CSV row would do. */
export interface RowPreview {
  /** Line in the file's data, from 1. */
  line: number;
  /** Key of the row it changes; null: it would be a new row. */
  row: string | null;
  changes: readonly { column: string; before: CellContent; after: CellContent }[];
  problems: readonly { column: string; text: string; message: string }[];
}

const plain = (text: string) => text.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');

/** Guesses the mapping from names: title, symbol or key, with or without the unit behind it. */
export function guessMapping(header: readonly string[], columns: readonly GridColumn[]): Mapping {
  const taken = new Set<string>();
  return header.map((name) => {
    const bare = plain(name.replace(/[([].*$/, ''));
    const match = columns.find(
      (column) =>
        !taken.has(column.key) &&
        [column.key, column.symbol ?? '', column.title].some((text) => text !== '' && plain(text) === bare),
    );
    if (match) taken.add(match.key);
    return match?.key ?? null;
  });
}

/**
 * What each row of a file would change, before anything is changed. Rows are matched with existing ones by
 * the key column; two lines with one key, an empty key and unreadable cells are problems of their line.
 */
export function previewRows(
  table: CsvTable,
  mapping: Mapping,
  columns: readonly GridColumn[],
  rows: readonly GridRow[],
  keyColumn: string,
  text: CellText,
): RowPreview[] {
  const byKey = new Map(rows.map((row) => [plain(String(row.cells[keyColumn] ?? '')), row]));
  const keyIndex = mapping.indexOf(keyColumn);
  const seen = new Map<string, number>();
  return table.rows.map((cells, index) => {
    const line = index + 1;
    const problems: RowPreview['problems'][number][] = [];
    const changes: RowPreview['changes'][number][] = [];
    const keyText = (cells[keyIndex] ?? '').trim();
    const key = plain(keyText);
    const existing = byKey.get(key);
    if (key === '') problems.push({ column: keyColumn, text: keyText, message: 'This row has no name.' });
    const first = seen.get(key);
    if (key !== '' && first !== undefined) {
      problems.push({ column: keyColumn, text: keyText, message: `Line ${first} has the same name.` });
    }
    seen.set(key, first ?? line);
    mapping.forEach((target, at) => {
      const column = columns.find((candidate) => candidate.key === target);
      if (!column) return;
      const cell = (cells[at] ?? '').trim();
      const read = text.parse(column, cell);
      if (!read.ok) {
        problems.push({ column: column.key, text: cell, message: read.message });
        return;
      }
      const before = existing?.cells[column.key] ?? null;
      if (column.key === keyColumn && existing) return;
      if (before !== read.value) changes.push({ column: column.key, before, after: read.value });
    });
    return { line, row: existing?.key ?? null, changes, problems };
  });
}
