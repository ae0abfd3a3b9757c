import { useVirtualizer } from '@tanstack/react-virtual';
import { useRef, useState } from 'react';
import { Link } from 'react-router-dom';
import type { MemberRow } from '#shared/contracts/projects.ts';
import { UnverifiedMark, VerdictMark } from '#src/components/StateMark.tsx';
import { UtilisationBar } from '#src/components/UtilisationBar.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';
import { moment } from '#src/lib/format/time.ts';

const rowHeight = 36;
const sorts = {
  mark: (row: MemberRow) => row.mark,
  use: (row: MemberRow) => row.use ?? '',
  span: (row: MemberRow) => Math.max(...row.spans),
  section: (row: MemberRow) => row.section.h * 10_000 + row.section.b,
  grade: (row: MemberRow) => row.grade,
  utilisation: (row: MemberRow) => row.result?.utilisation ?? (row.result?.word === 'fails' ? 99 : -1),
  saved: (row: MemberRow) => row.savedAt,
} as const;
type Sort = keyof typeof sorts;
const columns: readonly {
  key: Sort | 'check' | 'word' | 'bar';
  title: string;
  width: string;
  right?: boolean;
  sort?: Sort;
}[] = [
  { key: 'mark', title: 'Mark', width: 'minmax(10rem,2fr)', sort: 'mark' },
  { key: 'use', title: 'Use', width: 'minmax(6rem,1fr)', sort: 'use' },
  { key: 'span', title: 'Span', width: '6.5rem', right: true, sort: 'span' },
  { key: 'section', title: 'Section', width: '7rem', right: true, sort: 'section' },
  { key: 'grade', title: 'Grade', width: '5.5rem', sort: 'grade' },
  { key: 'check', title: 'Governing check', width: 'minmax(7rem,1fr)' },
  { key: 'bar', title: 'Utilisation', width: '8rem' },
  { key: 'utilisation', title: '', width: '3.5rem', right: true, sort: 'utilisation' },
  { key: 'word', title: 'Verdict', width: '6.5rem' },
  { key: 'saved', title: 'Saved', width: '8rem', sort: 'saved' },
];
const grid = { gridTemplateColumns: columns.map(({ width }) => width).join(' ') };

/** The members of a project; only the rows in view are rendered, so that a thousand open at once. */
export function MembersTable({ project, rows }: { project: string; rows: readonly MemberRow[] }) {
  const numbers = useNumbers();
  const [order, setOrder] = useState<{ by: Sort; down: boolean }>({ by: 'mark', down: false });
  const scroller = useRef<HTMLDivElement>(null);
  const value = sorts[order.by];
  const sorted = [...rows].sort((a, b) => {
    const [x, y] = [value(a), value(b)];
    const sign =
      typeof x === 'number' && typeof y === 'number'
        ? x - y
        : String(x).localeCompare(String(y), undefined, { numeric: true });
    return order.down ? -sign : sign;
  });
  const virtual = useVirtualizer({
    count: sorted.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => rowHeight,
    overscan: 12,
  });
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
        className="min-w-[68rem] text-sm"
      >
        <div role="rowgroup" className="sticky top-0 z-10 bg-paper">
          <div role="row" className="grid gap-x-3 border-b border-ink text-xs text-soft" style={grid}>
            {columns.map(({ key, title, right, sort }) => (
              <div
                key={key}
                role="columnheader"
                aria-sort={sort && order.by === sort ? (order.down ? 'descending' : 'ascending') : undefined}
                className={`py-1 ${right ? 'text-right' : ''}`}
              >
                {sort ? (
                  <button
                    type="button"
                    className="min-h-6 hover:text-ink"
                    onClick={() => setOrder({ by: sort, down: order.by === sort && !order.down })}
                  >
                    {title || 'number'} {order.by === sort ? (order.down ? '↓' : '↑') : ''}
                  </button>
                ) : (
                  title
                )}
              </div>
            ))}
          </div>
        </div>
        <div role="rowgroup" className="relative" style={{ height: `${virtual.getTotalSize()}px` }}>
          {virtual.getVirtualItems().map((item) => {
            const row = sorted[item.index];
            if (!row) return null;
            const { section, result, units } = row;
            const unit = units === 'metric' ? 'mm' : 'in';
            return (
              <div
                key={row.id}
                role="row"
                aria-rowindex={item.index + 2}
                className="absolute inset-x-0 grid items-center gap-x-3 border-b border-rule hover:bg-wash/60"
                style={{ ...grid, top: `${item.start}px`, height: `${rowHeight}px` }}
              >
                <div role="rowheader" className="truncate font-semibold">
                  <Link to={`/projects/${project}/members/${row.id}`} className="hover:underline">
                    {row.mark} <span className="font-normal text-soft">{row.title}</span>
                  </Link>
                </div>
                <div role="cell" className="truncate text-soft">
                  {row.use ?? ''}
                </div>
                <div role="cell" className="text-right font-mono whitespace-nowrap tabular-nums">
                  {row.spans.length > 1 ? `${row.spans.length} spans, ` : ''}
                  {numbers.decimals(Math.max(...row.spans), units === 'metric' ? 0 : 1)}{' '}
                  <span className="text-xs text-soft">{unit}</span>
                </div>
                <div role="cell" className="text-right font-mono whitespace-nowrap tabular-nums">
                  {section.pieces > 1 ? `${section.pieces} / ` : ''}
                  {numbers.exact(section.b)} × {numbers.exact(section.h)}
                </div>
                <div role="cell" className="truncate">
                  {row.grade}
                </div>
                <div role="cell" className="truncate">
                  {result?.checkTitle ?? result?.because ?? 'not checked'}
                </div>
                <div role="cell">
                  <UtilisationBar value={result?.utilisation ?? null} word={result?.word ?? 'none'} />
                </div>
                <div role="cell" className="text-right font-mono font-medium tabular-nums">
                  {typeof result?.utilisation === 'number' ? numbers.decimals(result.utilisation, 2) : '–'}
                </div>
                <div role="cell">
                  <VerdictMark word={result?.word ?? 'none'} />
                  {result && result.unverified > 0 && (
                    <span className="sr-only">
                      <UnverifiedMark count={result.unverified} />
                    </span>
                  )}
                  {result && result.departures > 0 && (
                    <span className="ml-1 text-close" title={`${result.departures} departures`}>
                      ◇
                    </span>
                  )}
                </div>
                <div role="cell" className="truncate text-xs text-soft">
                  {moment(row.savedAt)}
                </div>
              </div>
            );
          })}
        </div>
      </div>
    </div>
  );
}
