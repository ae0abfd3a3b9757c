import { useVirtualizer } from '@tanstack/react-virtual';
import { useRef, useState, useSyncExternalStore } from 'react';
import { Link } from 'react-router-dom';
import type { MemberRow } from '#shared/contracts/projects.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { memberColumns, type MemberColumn } from './memberColumns.tsx';

const rowHeight = 36;
const markOf = ({ mark }: MemberRow) => mark;
const phone = window.matchMedia('(max-width: 40rem)');

function useNarrow(): boolean {
  return useSyncExternalStore(
    (changed) => {
      phone.addEventListener('change', changed);
      return () => phone.removeEventListener('change', changed);
    },
    () => phone.matches,
  );
}

function inOrder(
  rows: readonly MemberRow[],
  by: NonNullable<MemberColumn['by']>,
  down: boolean,
): MemberRow[] {
  return [...rows].sort((a, b) => {
    const [x, y] = [by(a), by(b)];
    const sign =
      typeof x === 'number' && typeof y === 'number'
        ? x - y
        : String(x).localeCompare(String(y), undefined, { numeric: true });
    return down ? -sign : sign;
  });
}

/** The members of a project; only the rows in view are rendered, so that a thousand open at once. */
export function MembersTable({ project, rows }: { project: string; rows: readonly MemberRow[] }) {
  const numbers = useNumbers();
  const narrow = useNarrow();
  const [order, setOrder] = useState<{ key: string; by: NonNullable<MemberColumn['by']>; down: boolean }>({
    key: 'mark',
    by: markOf,
    down: false,
  });
  const scroller = useRef<HTMLDivElement>(null);
  const sorted = inOrder(rows, order.by, order.down);
  const columns = narrow ? memberColumns.filter((column) => column.narrow) : memberColumns;
  const grid = {
    gridTemplateColumns: [
      narrow ? 'minmax(9rem,1fr)' : 'minmax(12rem,3fr)',
      ...columns.map(({ width }) => width),
    ].join(' '),
  };
  const virtual = useVirtualizer({
    count: sorted.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => rowHeight,
    overscan: 12,
  });
  const head = (key: string, title: string, by: MemberColumn['by'], right = false) => (
    <div
      key={key}
      role="columnheader"
      aria-sort={order.key === key ? (order.down ? 'descending' : 'ascending') : undefined}
      className={`py-1 ${right ? 'text-right' : ''}`}
    >
      {by ? (
        <button
          type="button"
          className="min-h-6 hover:text-ink"
          onClick={() => setOrder({ key, by, down: order.key === key && !order.down })}
        >
          {title} {order.key === key ? (order.down ? '↓' : '↑') : ''}
        </button>
      ) : (
        <span className="inline-flex min-h-6 items-center">{title}</span>
      )}
    </div>
  );
  return (
    <div
      ref={scroller}
      className="max-h-[70dvh] overflow-auto"
      tabIndex={0}
      role="group"
      aria-label="Members, table"
    >
      <div
        role="table"
        aria-label="Members"
        aria-rowcount={sorted.length + 1}
        className="text-sm sm:min-w-[80rem]"
      >
        <div role="rowgroup" className="sticky top-0 z-10 bg-paper">
          <div role="row" className="grid gap-x-2.5 border-b border-ink text-xs text-soft" style={grid}>
            {head('mark', 'Mark', markOf)}
            {columns.map(({ key, title, by, right }) => head(key, title, by, right))}
          </div>
        </div>
        <div role="rowgroup" className="relative" style={{ height: `${virtual.getTotalSize()}px` }}>
          {virtual.getVirtualItems().map((item) => {
            const row = sorted[item.index];
            return row ? (
              <div
                key={row.id}
                role="row"
                aria-rowindex={item.index + 2}
                className="absolute inset-x-0 grid items-center gap-x-2.5 border-b border-rule hover:bg-wash/60"
                style={{ ...grid, top: `${item.start}px`, height: `${rowHeight}px` }}
              >
                <div role="rowheader" className="truncate font-semibold sm:sticky sm:left-0 sm:bg-paper">
                  <Link to={`/projects/${project}/members/${row.id}`} className="hover:underline">
                    {row.mark} <span className="font-normal text-soft">{row.title}</span>
                  </Link>
                </div>
                {columns.map(({ key, right, cell }) => (
                  <div
                    key={key}
                    role="cell"
                    className={`truncate ${right ? 'text-right font-mono tabular-nums' : ''}`}
                  >
                    {cell(row, numbers)}
                  </div>
                ))}
              </div>
            ) : null;
          })}
        </div>
      </div>
    </div>
  );
}
