import { memo } from 'react';
import { holds, type Block } from './selection.ts';
import type { CellMark, CellText, GridColumn, GridRow } from './types.ts';
import { columnWidth } from './widths.ts';

interface GridRowViewProps {
  id: string;
  index: number;
  top: number;
  height: number;
  row: GridRow;
  columns: readonly GridColumn[];
  text: CellText;
  mark: ((row: string, column: string) => CellMark | undefined) | undefined;
  block: Block;
  /** Index of the active cell's column, -1 when it is in another row. */
  active: number;
  onPick: (row: number, column: number, stretch: boolean) => void;
  onEdit: (start: string) => void;
}

const tones: Record<CellMark['tone'], { sign: string; className: string }> = {
  error: { sign: '■', className: 'text-fail' },
  warning: { sign: '▲', className: 'text-close' },
  unverified: { sign: '◆', className: 'text-close' },
  memory: { sign: '◈', className: 'text-close' },
  changed: { sign: '●', className: 'text-accent-ink' },
};

function GridRowPlain(props: GridRowViewProps) {
  const { id, index, top, height, row, columns, text, mark, block, active, onPick, onEdit } = props;
  return (
    <div
      role="row"
      aria-rowindex={index + 2}
      className="absolute left-0 flex w-max min-w-full border-b border-rule"
      style={{ top: `${top}px`, height: `${height}px` }}
    >
      {columns.map((column, at) => {
        const content = row.cells[column.key] ?? null;
        const cellMark = mark?.(row.key, column.key);
        const tone = cellMark ? tones[cellMark.tone] : undefined;
        const selected = holds(block, index, at);
        const shown =
          column.kind === 'choice'
            ? (column.options?.find((option) => option.id === content)?.title ?? content)
            : text.format(column, content);
        return (
          <div
            key={column.key}
            id={`${id}-${index}-${at}`}
            role={at === 0 ? 'rowheader' : 'gridcell'}
            aria-colindex={at + 1}
            aria-selected={selected}
            aria-readonly={column.readOnly}
            title={cellMark?.message}
            onMouseDown={(event) => onPick(index, at, event.shiftKey)}
            onMouseEnter={(event) => event.buttons === 1 && onPick(index, at, true)}
            onDoubleClick={() => onEdit(text.format(column, content))}
            className={`flex cursor-cell items-center gap-1 overflow-hidden border-r border-rule px-2 text-sm whitespace-nowrap select-none ${
              column.kind === 'number' ? 'justify-end font-mono tabular-nums' : ''
            } ${at === 0 ? 'sm:sticky sm:left-0 sm:z-1' : ''} ${selected ? 'bg-wash' : at === 0 ? 'bg-paper' : ''} ${at === active ? 'outline-2 -outline-offset-2 outline-accent' : ''} ${
              tone?.className ?? ''
            }`}
            style={{ flex: `0 0 ${columnWidth(column)}rem` }}
          >
            {tone && (
              <span aria-hidden className="text-[0.625rem]">
                {tone.sign}
              </span>
            )}
            <span className="truncate">{shown}</span>
            {cellMark && <span className="sr-only">{cellMark.message}</span>}
          </div>
        );
      })}
    </div>
  );
}

/** Two renderings of a row are equal when nothing that it shows differs; most keystrokes touch one row. */
export const GridRowView = memo(GridRowPlain, (before, after) => {
  const touched = (props: GridRowViewProps) =>
    props.index >= props.block.top && props.index <= props.block.bottom;
  return (
    before.row === after.row &&
    before.columns === after.columns &&
    before.mark === after.mark &&
    before.text === after.text &&
    before.top === after.top &&
    before.index === after.index &&
    before.active === after.active &&
    before.onPick === after.onPick &&
    before.onEdit === after.onEdit &&
    ((!touched(before) && !touched(after)) ||
      (before.block.left === after.block.left &&
        before.block.right === after.block.right &&
        touched(before) === touched(after)))
  );
});
