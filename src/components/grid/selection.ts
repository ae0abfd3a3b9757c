import type { Place, Selection } from './types.ts';

export interface Block {
  top: number;
  left: number;
  bottom: number;
  right: number;
}

/** The rectangle a selection covers. */
export function blockOf({ anchor, head }: Selection): Block {
  return {
    top: Math.min(anchor.row, head.row),
    bottom: Math.max(anchor.row, head.row),
    left: Math.min(anchor.column, head.column),
    right: Math.max(anchor.column, head.column),
  };
}

export function holds(block: Block, row: number, column: number): boolean {
  return row >= block.top && row <= block.bottom && column >= block.left && column <= block.right;
}

export interface MoveKey {
  key: string;
  shift: boolean;
  /** Ctrl, or Cmd on a Mac. */
  jump: boolean;
}

/**
 * Where a key takes the selection in a grid of `size` cells; undefined for keys that don't move. Arrows
 * step, with Ctrl/Cmd go to the edge; with shift they stretch the selection. Tab and Enter walk.
 */
export function moved(selection: Selection, key: MoveKey, size: Place, page: number): Selection | undefined {
  const { head } = selection;
  const lastRow = size.row - 1;
  const lastColumn = size.column - 1;
  const to = target(head, key, lastRow, lastColumn, page);
  if (!to) return undefined;
  const place = {
    row: Math.min(Math.max(to.row, 0), lastRow),
    column: Math.min(Math.max(to.column, 0), lastColumn),
  };
  const stretches = key.shift && key.key !== 'Tab' && key.key !== 'Enter';
  return { anchor: stretches ? selection.anchor : place, head: place };
}

function target(
  head: Place,
  { key, shift, jump }: MoveKey,
  lastRow: number,
  lastColumn: number,
  page: number,
) {
  const { row, column } = head;
  switch (key) {
    case 'ArrowUp':
      return { row: jump ? 0 : row - 1, column };
    case 'ArrowDown':
      return { row: jump ? lastRow : row + 1, column };
    case 'ArrowLeft':
      return { row, column: jump ? 0 : column - 1 };
    case 'ArrowRight':
      return { row, column: jump ? lastColumn : column + 1 };
    case 'Home':
      return { row: jump ? 0 : row, column: 0 };
    case 'End':
      return { row: jump ? lastRow : row, column: lastColumn };
    case 'PageUp':
      return { row: row - page, column };
    case 'PageDown':
      return { row: row + page, column };
    case 'Enter':
      return { row: shift ? row - 1 : row + 1, column };
    case 'Tab':
      return tabbed(head, shift, lastRow, lastColumn);
    default:
      return undefined;
  }
}

/** Tab walks along the row and on to the next; past the ends it leaves the grid (undefined). */
function tabbed(
  { row, column }: Place,
  back: boolean,
  lastRow: number,
  lastColumn: number,
): Place | undefined {
  if (back) {
    if (column > 0) return { row, column: column - 1 };
    return row > 0 ? { row: row - 1, column: lastColumn } : undefined;
  }
  if (column < lastColumn) return { row, column: column + 1 };
  return row < lastRow ? { row: row + 1, column: 0 } : undefined;
}
