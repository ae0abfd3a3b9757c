import { SymbolText } from '#src/components/Symbol.tsx';
import { columnWidth } from './widths.ts';
import type { GridColumn } from './types.ts';

/** Sticky header: title, then symbol and unit in the number face. */
export function GridHead({ columns }: { columns: readonly GridColumn[] }) {
  return (
    <div role="rowgroup" className="sticky top-0 z-10 w-max min-w-full bg-paper">
      <div role="row" aria-rowindex={1} className="flex border-b border-ink">
        {columns.map((column, index) => (
          <div
            key={column.key}
            role="columnheader"
            aria-colindex={index + 1}
            className={`flex flex-col justify-end border-r border-rule px-2 py-1 text-xs ${
              column.kind === 'number' ? 'items-end text-right' : 'items-start'
            } ${index === 0 ? 'sm:sticky sm:left-0 sm:z-1 bg-paper' : ''}`}
            style={{ flex: `0 0 ${columnWidth(column)}rem` }}
          >
            <span className="text-ink">{column.title}</span>
            {(column.symbol ?? column.unit) && (
              <span className="font-mono text-[0.6875rem] text-soft">
                {column.symbol && <SymbolText name={column.symbol} />} {column.unit}
              </span>
            )}
          </div>
        ))}
      </div>
    </div>
  );
}
