import { useRef, useState, type KeyboardEvent } from 'react';
import type { GridColumn } from './types.ts';
import { columnLeft, columnWidth } from './widths.ts';

interface CellEditorProps {
  column: GridColumn;
  columns: readonly GridColumn[];
  index: number;
  top: number;
  height: number;
  start: string;
  /** The new text, or null when given up; and the key that ended the editing. */
  onFinish: (value: string | null, key: 'Enter' | 'Tab' | 'none', shift: boolean) => void;
}

/** The field laid over the active cell while it is typed in. Only this renders on a keystroke. */
export function CellEditor({ column, columns, index, top, height, start, onFinish }: CellEditorProps) {
  const [value, setValue] = useState(start);
  // Leaving the field by a key also blurs it; the edit must end once.
  const ended = useRef(false);
  const finish: CellEditorProps['onFinish'] = (text, key, shift) => {
    if (ended.current) return;
    ended.current = true;
    onFinish(text, key, shift);
  };
  const place = {
    top: `${top}px`,
    height: `${height}px`,
    left: `${columnLeft(columns, index)}rem`,
    width: `${columnWidth(column)}rem`,
  };
  const onKeyDown = (event: KeyboardEvent) => {
    event.stopPropagation();
    if (event.key === 'Enter' || event.key === 'Tab') {
      event.preventDefault();
      finish(value, event.key, event.shiftKey);
    } else if (event.key === 'Escape') {
      event.preventDefault();
      finish(null, 'none', false);
    }
  };
  const className = `absolute z-20 border-2 border-accent bg-paper px-2 text-sm text-ink focus:outline-none ${
    column.kind === 'number' ? 'text-right font-mono tabular-nums' : ''
  }`;
  if (column.kind === 'choice') {
    return (
      <select
        autoFocus
        aria-label={column.title}
        className={className}
        style={place}
        value={value}
        onChange={(event) => setValue(event.target.value)}
        onKeyDown={onKeyDown}
        onBlur={() => finish(value, 'none', false)}
      >
        <option value="" />
        {column.options?.map((option) => (
          <option key={option.id} value={option.id}>
            {option.title}
          </option>
        ))}
      </select>
    );
  }
  return (
    <input
      autoFocus
      aria-label={column.title}
      className={className}
      style={place}
      value={value}
      inputMode={column.kind === 'number' ? 'decimal' : 'text'}
      onChange={(event) => setValue(event.target.value)}
      onKeyDown={onKeyDown}
      onBlur={() => finish(value, 'none', false)}
    />
  );
}
