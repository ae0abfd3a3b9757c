import type { GridColumn } from './types.ts';

/** Width of a column in rem: as asked, else by kind. */
export function columnWidth(column: GridColumn): number {
  return column.width ?? (column.kind === 'number' ? 6.5 : 11);
}

/** Left edge of a column in rem. */
export function columnLeft(columns: readonly GridColumn[], index: number): number {
  return columns.slice(0, index).reduce((sum, column) => sum + columnWidth(column), 0);
}
