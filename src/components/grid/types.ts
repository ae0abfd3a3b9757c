/** What a cell holds: a number, a word, or nothing. */
export type CellContent = number | string | null;

export interface GridColumn {
  key: string;
  title: string;
  /** Symbol or other small second line of the header. */
  symbol?: string;
  unit?: string;
  kind: 'number' | 'text' | 'choice';
  /** For choices: id and title of what can be picked. */
  options?: readonly { id: string; title: string }[];
  readOnly?: boolean;
  /** Width in rem. */
  width?: number;
}

export interface GridRow {
  key: string;
  cells: Readonly<Record<string, CellContent>>;
}

/** A mark on a cell, said in words as well as shown. */
export interface CellMark {
  tone: 'error' | 'warning' | 'unverified' | 'memory' | 'changed';
  message: string;
}

/** One changed cell. Several together are one step of undo. */
export interface CellChange {
  row: string;
  column: string;
  before: CellContent;
  after: CellContent;
}

/** What a paste or an edit wants to do: change cells, and append rows where the block is longer. */
export interface GridStep {
  changes: readonly CellChange[];
  /** Cells of rows that don't exist yet, in order, by column key. */
  newRows: readonly Readonly<Record<string, CellContent>>[];
  /** Texts that could not be read, with their place and why; nothing is lost silently. */
  rejected: readonly { row: number; column: string; text: string; message: string }[];
}

/** Reads and writes a cell's content as a person types and reads it. */
export interface CellText {
  parse: (
    column: GridColumn,
    text: string,
  ) => { ok: true; value: CellContent } | { ok: false; message: string };
  format: (column: GridColumn, value: CellContent) => string;
}

export interface Place {
  row: number;
  column: number;
}

/** Selected block: from the anchor to the head, both included. The head is the active cell. */
export interface Selection {
  anchor: Place;
  head: Place;
}
