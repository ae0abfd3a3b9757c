import { useVirtualizer } from '@tanstack/react-virtual';
import { useCallback, useId, useRef, useState, type ClipboardEvent, type KeyboardEvent } from 'react';
import { cleared, filledDown, pasted, readClipboard, writeClipboard } from './block.ts';
import { CellEditor } from './CellEditor.tsx';
import { GridRowView } from './GridRowView.tsx';
import { GridHead } from './GridHead.tsx';
import { blockOf, moved } from './selection.ts';
import type { CellMark, CellText, GridColumn, GridRow, GridStep, Selection } from './types.ts';

interface GridProps {
  label: string;
  columns: readonly GridColumn[];
  rows: readonly GridRow[];
  text: CellText;
  mark?: (row: string, column: string) => CellMark | undefined;
  /** Rows may be added by pasting a longer block. */
  grow?: boolean;
  readOnly?: boolean;
  /** One step of editing; the owner applies it and keeps the history. */
  onStep?: (step: GridStep) => void;
  onUndo?: () => void;
  onRedo?: () => void;
  /** Told when the active cell changes, to show its details beside the grid. */
  onActive?: (row: string, column: string) => void;
  /** Most rows shown before the grid scrolls on its own. */
  visibleRows?: number;
}

const rowHeight = 34;
const page = 10;

/**
 * A grid that behaves like a spreadsheet: arrows, type to edit, Enter and Tab, copy and paste of blocks,
 * Ctrl/Cmd-D to fill down, Delete to empty, Ctrl/Cmd-Z and -Shift-Z. Follows the ARIA grid pattern; rows
 * outside the view are not rendered.
 */
export function Grid(props: GridProps) {
  const { label, columns, rows, text, mark, grow = false, readOnly = false, visibleRows = 24 } = props;
  const { onStep, onUndo, onRedo, onActive } = props;
  const id = useId();
  const scroller = useRef<HTMLDivElement>(null);
  const [selection, setSelection] = useState<Selection>({
    anchor: { row: 0, column: 0 },
    head: { row: 0, column: 0 },
  });
  const [editing, setEditing] = useState<{ start: string } | null>(null);
  const virtual = useVirtualizer({
    count: rows.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => rowHeight,
    overscan: 8,
  });

  const select = useCallback(
    (next: Selection) => {
      setSelection(next);
      virtual.scrollToIndex(next.head.row);
      const row = rows[next.head.row];
      const column = columns[next.head.column];
      if (row && column) onActive?.(row.key, column.key);
    },
    [columns, onActive, rows, virtual],
  );
  const pick = useCallback(
    (row: number, column: number, stretch: boolean) => {
      const head = { row, column };
      select({ anchor: stretch ? selection.anchor : head, head });
      scroller.current?.focus();
    },
    [select, selection.anchor],
  );
  const edit = useCallback(
    (start: string) => {
      if (!readOnly && !columns[selection.head.column]?.readOnly) setEditing({ start });
    },
    [columns, readOnly, selection.head.column],
  );
  const send = (step: GridStep) => {
    if (!readOnly && (step.changes.length || step.newRows.length || step.rejected.length)) onStep?.(step);
  };

  const onKeyDown = (event: KeyboardEvent) => {
    if (editing) return;
    const command = event.ctrlKey || event.metaKey;
    const { key } = event;
    if (command && key.toLowerCase() === 'z') {
      event.preventDefault();
      (event.shiftKey ? onRedo : onUndo)?.();
    } else if (command && key.toLowerCase() === 'y') {
      event.preventDefault();
      onRedo?.();
    } else if (command && key.toLowerCase() === 'd') {
      event.preventDefault();
      send(filledDown(selection, columns, rows));
    } else if (command && key.toLowerCase() === 'a') {
      event.preventDefault();
      select({ anchor: { row: 0, column: 0 }, head: { row: rows.length - 1, column: columns.length - 1 } });
    } else if (key === 'Delete' || key === 'Backspace') {
      event.preventDefault();
      send(cleared(selection, columns, rows));
    } else if (key === 'F2' || (key === 'Enter' && !event.shiftKey && !readOnly)) {
      event.preventDefault();
      const row = rows[selection.head.row];
      const column = columns[selection.head.column];
      if (row && column) edit(text.format(column, row.cells[column.key] ?? null));
    } else if (key.length === 1 && !command && !event.altKey) {
      event.preventDefault();
      edit(key);
    } else {
      const next = moved(
        selection,
        { key, shift: event.shiftKey, jump: command },
        { row: rows.length, column: columns.length },
        page,
      );
      if (next) {
        event.preventDefault();
        select(next);
      }
    }
  };
  const onPaste = (event: ClipboardEvent) => {
    if (editing || readOnly) return;
    event.preventDefault();
    send(
      pasted(selection, readClipboard(event.clipboardData.getData('text/plain')), columns, rows, text, grow),
    );
  };
  const onCopy = (event: ClipboardEvent) => {
    if (editing) return;
    event.preventDefault();
    event.clipboardData.setData('text/plain', writeClipboard(selection, columns, rows, text));
  };
  const finish = (value: string | null, key: 'Enter' | 'Tab' | 'none', shift: boolean) => {
    setEditing(null);
    scroller.current?.focus();
    if (value !== null) {
      const single = { anchor: selection.head, head: selection.head };
      send(pasted(single, [[value]], columns, rows, text, false));
    }
    if (key === 'none') return;
    const size = { row: rows.length, column: columns.length };
    const next = moved(
      { anchor: selection.head, head: selection.head },
      { key, shift, jump: false },
      size,
      page,
    );
    if (next) select(next);
  };

  const { head } = selection;
  const activeColumn = columns[head.column];
  return (
    <div
      ref={scroller}
      role="grid"
      aria-label={label}
      aria-rowcount={rows.length + 1}
      aria-colcount={columns.length}
      aria-readonly={readOnly}
      aria-multiselectable
      aria-activedescendant={rows.length ? `${id}-${head.row}-${head.column}` : undefined}
      tabIndex={0}
      className="relative overflow-auto border-b border-rule focus-visible:outline-2 focus-visible:outline-accent"
      style={{ maxHeight: `${(visibleRows + 1.6) * rowHeight}px` }}
      onKeyDown={onKeyDown}
      onPaste={onPaste}
      onCopy={onCopy}
    >
      <GridHead columns={columns} />
      <div role="rowgroup" className="relative" style={{ height: `${virtual.getTotalSize()}px` }}>
        {virtual.getVirtualItems().map((item) => {
          const row = rows[item.index];
          return row ? (
            <GridRowView
              key={row.key}
              id={id}
              index={item.index}
              top={item.start}
              height={rowHeight}
              row={row}
              columns={columns}
              text={text}
              mark={mark}
              block={blockOf(selection)}
              active={head.row === item.index ? head.column : -1}
              onPick={pick}
              onEdit={edit}
            />
          ) : null;
        })}
        {editing && activeColumn && (
          <CellEditor
            column={activeColumn}
            columns={columns}
            index={head.column}
            top={head.row * rowHeight}
            height={rowHeight}
            start={editing.start}
            onFinish={finish}
          />
        )}
      </div>
    </div>
  );
}
