import { useMemo, useState } from 'react';
import type { Edition } from '#shared/basis/schema/index.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { Notice } from '#src/components/Notice.tsx';
import { readCsv, type CsvTable } from '#src/lib/csv/readCsv.ts';
import { guessMapping, previewRows, type Mapping, type RowPreview } from '#src/lib/csv/rowPreview.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { cellText } from '../lib/cellText.ts';
import { afterStep, gradeColumns, gradeRows } from '../lib/gradeGrid.ts';

const keyColumn = 'title';

/** CSV upload: choose a file, map its columns, see every change as old and new, take or leave rows, apply as one step. */
export function ImportGrades({
  edition,
  onApply,
  onClose,
}: {
  edition: Edition;
  onApply: (edition: Edition) => void;
  onClose: () => void;
}) {
  const numbers = useNumbers();
  const [table, setTable] = useState<CsvTable | null>(null);
  const [mapping, setMapping] = useState<Mapping>([]);
  const [problem, setProblem] = useState<string | null>(null);
  const [left, setLeft] = useState<ReadonlySet<number>>(new Set());
  const columns = useMemo(() => gradeColumns(edition), [edition]);
  const rows = useMemo(() => gradeRows(edition), [edition]);
  const text = useMemo(
    () => cellText(table ? { ...numbers, format: { decimal: table.decimal } } : numbers),
    [numbers, table],
  );
  const preview = useMemo(
    () =>
      table && mapping.includes(keyColumn) ? previewRows(table, mapping, columns, rows, keyColumn, text) : [],
    [columns, mapping, rows, table, text],
  );
  const choose = async (file: File | undefined) => {
    if (!file) return;
    const outcome = readCsv(await file.text());
    if (!outcome.ok) {
      setProblem(outcome.message);
      setTable(null);
      return;
    }
    setProblem(null);
    setTable(outcome.table);
    setMapping(guessMapping(outcome.table.header, columns));
    setLeft(new Set());
  };
  const takes = (row: RowPreview) =>
    row.problems.length === 0 && row.changes.length > 0 && !left.has(row.line);
  const taken = preview.filter(takes);
  const bad = preview.filter(({ problems }) => problems.length > 0);
  const apply = () => {
    onApply(
      afterStep(edition, {
        changes: taken.flatMap(({ row, changes }) =>
          row === null ? [] : changes.map((change) => ({ row, ...change })),
        ),
        newRows: taken
          .filter(({ row }) => row === null)
          .map(({ changes }) => Object.fromEntries(changes.map(({ column, after }) => [column, after]))),
      }),
    );
    onClose();
  };
  const titleOf = (key: string) => columns.find((column) => column.key === key)?.title ?? key;
  return (
    <Dialog title="Upload grades" open onClose={onClose} wide>
      <label className="mb-3 block text-sm font-medium">
        CSV file
        <input
          type="file"
          accept=".csv,.txt,.tsv,text/csv"
          onChange={(event) => void choose(event.target.files?.[0])}
          className="mt-1 block w-full rounded border border-pencil bg-raised px-2 py-1.5 font-normal"
        />
      </label>
      {problem && <Notice tone="error">{problem}</Notice>}
      {table && (
        <>
          {table.notes.map((note) => (
            <p key={note} className="text-sm text-soft">
              {note}
            </p>
          ))}
          <fieldset className="my-3 grid gap-x-5 gap-y-1 sm:grid-cols-2">
            <legend className="mb-1 text-sm font-medium">Which column goes where</legend>
            {table.header.map((name, index) => (
              <label
                key={name}
                className="flex items-center justify-between gap-3 border-b border-rule py-1 text-sm"
              >
                <span className="truncate">{name}</span>
                <select
                  value={mapping[index] ?? ''}
                  onChange={(event) =>
                    setMapping(mapping.map((old, at) => (at === index ? event.target.value || null : old)))
                  }
                  className="rounded border border-pencil bg-raised px-1.5 py-0.5"
                >
                  <option value="">left out</option>
                  {columns.map(({ key, title }) => (
                    <option key={key} value={key}>
                      {title}
                    </option>
                  ))}
                </select>
              </label>
            ))}
          </fieldset>
          {!mapping.includes(keyColumn) && (
            <Notice tone="warning">Say which column holds the name of the grade.</Notice>
          )}
          <p role="status" className="mb-2 font-medium">
            {taken.length} of {preview.length} rows will be taken
            {bad.length > 0 ? `; ${bad.length} can’t be read` : ''}.
          </p>
          <div className="max-h-[40dvh] overflow-auto" tabIndex={0} role="group" aria-label="Preview, table">
            <table className="w-full text-sm">
              <thead className="sticky top-0 bg-paper">
                <tr className="border-b border-ink text-left text-xs text-soft">
                  <th scope="col" className="py-1 font-normal">
                    Take
                  </th>
                  <th scope="col" className="py-1 font-normal">
                    Line
                  </th>
                  <th scope="col" className="py-1 font-normal">
                    Grade
                  </th>
                  <th scope="col" className="py-1 font-normal">
                    Old and new
                  </th>
                </tr>
              </thead>
              <tbody>
                {preview.slice(0, 500).map((row) => {
                  const name = table.rows[row.line - 1]?.[mapping.indexOf(keyColumn)] ?? '';
                  return (
                    <tr key={row.line} className="border-b border-rule align-top">
                      <td className="py-1">
                        <input
                          type="checkbox"
                          aria-label={`Take line ${row.line}`}
                          disabled={row.problems.length > 0 || row.changes.length === 0}
                          checked={takes(row)}
                          onChange={() => {
                            const next = new Set(left);
                            if (next.has(row.line)) next.delete(row.line);
                            else next.add(row.line);
                            setLeft(next);
                          }}
                        />
                      </td>
                      <td className="py-1 font-mono text-soft">{row.line}</td>
                      <td className="py-1">
                        {name}{' '}
                        {row.row === null && row.problems.length === 0 && (
                          <span className="text-xs text-accent-ink">new</span>
                        )}
                      </td>
                      <td className="py-1">
                        {row.problems.map(({ column, message }, index) => (
                          <span key={index} className="block text-fail">
                            ■ {titleOf(column)}: {message}
                          </span>
                        ))}
                        {row.problems.length === 0 && row.changes.length === 0 && (
                          <span className="text-soft">nothing changes</span>
                        )}
                        {row.problems.length === 0 &&
                          row.changes.map(({ column, before, after }) => (
                            <span key={column} className="mr-4 inline-block">
                              {titleOf(column)}{' '}
                              <span className="font-mono text-soft">
                                {before === null ? 'none' : String(before)}
                              </span>{' '}
                              →{' '}
                              <span className="font-mono font-medium">
                                {after === null ? 'none' : String(after)}
                              </span>
                            </span>
                          ))}
                      </td>
                    </tr>
                  );
                })}
              </tbody>
            </table>
          </div>
          <Button kind="main" className="mt-4" disabled={taken.length === 0} onClick={apply}>
            Take {taken.length === 1 ? '1 row' : `${taken.length} rows`}
          </Button>
        </>
      )}
    </Dialog>
  );
}
