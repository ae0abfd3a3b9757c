import { useState, type ReactNode } from 'react';

export interface DataColumn<T> {
  key: string;
  title: string;
  unit?: string;
  align?: 'left' | 'right';
  cell: (row: T) => ReactNode;
  /** What the column is sorted by; left out: it can't be. */
  by?: (row: T) => string | number;
  /** The cell that names the row. */
  heads?: boolean;
}

interface DataTableProps<T> {
  label: string;
  columns: readonly DataColumn<T>[];
  rows: readonly T[];
  rowKey: (row: T) => string;
  minWidth?: string;
}

/** A table with fine rules, a header that stays, and columns that sort. Scrolls by itself on a narrow screen. */
export function DataTable<T>({ label, columns, rows, rowKey, minWidth = '40rem' }: DataTableProps<T>) {
  const [order, setOrder] = useState<{ key: string; down: boolean } | null>(null);
  const by = columns.find(({ key }) => key === order?.key)?.by;
  const sorted = by
    ? [...rows].sort((a, b) => {
        const [x, y] = [by(a), by(b)];
        const sign =
          typeof x === 'number' && typeof y === 'number'
            ? x - y
            : String(x).localeCompare(String(y), undefined, { numeric: true });
        return order?.down ? -sign : sign;
      })
    : rows;
  return (
    <div className="overflow-x-auto" tabIndex={0} role="group" aria-label={`${label}, table`}>
      <table className="w-full text-sm" style={{ minWidth }}>
        <caption className="sr-only">{label}</caption>
        <thead>
          <tr className="border-b border-ink text-xs text-soft">
            {columns.map(({ key, title, unit, align, by: sortable }) => (
              <th
                key={key}
                scope="col"
                aria-sort={order?.key === key ? (order.down ? 'descending' : 'ascending') : undefined}
                className={`py-1.5 pr-4 align-bottom font-normal last:pr-0 ${align === 'right' ? 'text-right' : 'text-left'}`}
              >
                {sortable ? (
                  <button
                    type="button"
                    className="relative min-h-6 text-inherit hover:text-ink"
                    onClick={() => setOrder({ key, down: order?.key === key && !order.down })}
                  >
                    {title}
                    {/* Out of the flow: a column neither moves nor wraps when the arrow comes. */}
                    <span aria-hidden className="absolute bottom-0.5 left-full ml-0.5">
                      {order?.key === key ? (order.down ? '↓' : '↑') : ''}
                    </span>
                  </button>
                ) : (
                  <span className="inline-flex min-h-6 items-center">{title}</span>
                )}
                {unit && <span className="ml-1 font-mono">{unit}</span>}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {sorted.map((row) => (
            <tr key={rowKey(row)} className="border-b border-rule hover:bg-wash/60">
              {columns.map(({ key, align, cell, heads }) => {
                const className = `py-1.5 pr-4 align-baseline last:pr-0 ${align === 'right' ? 'text-right font-mono tabular-nums' : 'text-left'}`;
                return heads ? (
                  <th key={key} scope="row" className={`${className} font-semibold`}>
                    {cell(row)}
                  </th>
                ) : (
                  <td key={key} className={className}>
                    {cell(row)}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
