export { Grid } from './Grid.tsx';
export type { CellChange, CellContent, CellMark, CellText, GridColumn, GridRow, GridStep } from './types.ts';
