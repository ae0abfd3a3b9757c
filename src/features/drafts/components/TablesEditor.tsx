import { useMemo, useState } from 'react';
import type { Edition, Table } from '#shared/basis/schema/index.ts';
import { Notice } from '#src/components/Notice.tsx';
import { Grid, type GridColumn, type GridRow, type GridStep } from '#src/components/grid/index.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { cellText } from '../lib/cellText.ts';

interface TablesEditorProps {
  edition: Edition;
  readOnly: boolean;
  onChange: (edition: Edition) => void;
  onUndo: () => void;
  onRedo: () => void;
}

function labels({ match, points }: Table['keys'][number]): string[] {
  if (match !== 'band') return points.map(String);
  return points
    .slice(1)
    .map(
      (high, i) => `${points[i] === null ? '…' : String(points[i])} to ${high === null ? '…' : String(high)}`,
    );
}

/** Tables as grids: the last key across, the others down. */
export function TablesEditor({ edition, readOnly, onChange, onUndo, onRedo }: TablesEditorProps) {
  const [chosen, setChosen] = useState(edition.tables[0]?.id ?? '');
  const table = edition.tables.find(({ id }) => id === chosen) ?? edition.tables[0];
  if (!table) return <p className="text-soft">This edition has no tables.</p>;
  return (
    <div>
      <label className="mb-3 flex items-center gap-2">
        Table
        <select
          value={table.id}
          onChange={(event) => setChosen(event.target.value)}
          className="rounded border border-pencil bg-raised px-2 py-1"
        >
          {edition.tables.map(({ id, title }) => (
            <option key={id} value={id}>
              {title}
            </option>
          ))}
        </select>
      </label>
      <TableGrid
        key={table.id}
        table={table}
        readOnly={readOnly}
        onUndo={onUndo}
        onRedo={onRedo}
        onChange={(next) =>
          onChange({ ...edition, tables: edition.tables.map((each) => (each.id === next.id ? next : each)) })
        }
      />
    </div>
  );
}

function TableGrid({
  table,
  readOnly,
  onChange,
  onUndo,
  onRedo,
}: {
  table: Table;
  readOnly: boolean;
  onChange: (table: Table) => void;
  onUndo: () => void;
  onRedo: () => void;
}) {
  const numbers = useNumbers();
  const text = useMemo(() => cellText(numbers), [numbers]);
  const [rejected, setRejected] = useState<GridStep['rejected']>([]);
  const words = table.values.some((value) => typeof value === 'string');
  const axes = table.keys.map(labels);
  const across = axes[axes.length - 1] ?? [];
  const columns: GridColumn[] = [
    {
      key: 'label',
      title:
        table.keys
          .slice(0, -1)
          .map(({ title }) => title)
          .join(', ') || table.title,
      kind: 'text',
      readOnly: true,
      width: 16,
    },
    ...across.map((title, index): GridColumn => ({
      key: String(index),
      title,
      kind: words ? 'text' : 'number',
    })),
  ];
  const down = axes
    .slice(0, -1)
    .reduce<string[]>(
      (rows, next) => rows.flatMap((row) => next.map((label) => (row ? `${row}, ${label}` : label))),
      [''],
    );
  const rows = down.map((label, row): GridRow => ({
    key: String(row),
    cells: {
      label: label || 'value',
      ...Object.fromEntries(
        across.map((_, column) => [String(column), table.values[row * across.length + column] ?? null]),
      ),
    },
  }));
  const apply = (step: GridStep) => {
    setRejected(step.rejected);
    if (step.changes.length === 0) return;
    const values = [...table.values];
    const cells = { ...table.cells };
    for (const { row, column, after } of step.changes) {
      const index = Number(row) * across.length + Number(column);
      values[index] = after;
      cells[String(index)] = {
        source: table.provenance.source,
        standing: 'decision',
        note: 'Changed by hand in this edition.',
      };
    }
    onChange({ ...table, values, cells });
  };
  return (
    <>
      <p className="mb-2 text-sm text-soft">
        by {table.keys.map(({ title }) => title.toLowerCase()).join(', ')};{' '}
        {table.unit === '1' ? 'pure numbers' : table.unit}
      </p>
      <Grid
        label={table.title}
        columns={columns}
        rows={rows}
        text={text}
        readOnly={readOnly}
        onStep={apply}
        onUndo={onUndo}
        onRedo={onRedo}
      />
      {rejected.length > 0 && (
        <Notice tone="warning">{rejected.map(({ message }) => message).join(' ')}</Notice>
      )}
    </>
  );
}
