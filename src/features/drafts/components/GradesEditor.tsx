import { useMemo, useState } from 'react';
import type { Edition } from '#shared/basis/schema/index.ts';
import type { Finding } from '#shared/engine/types.ts';
import { Button } from '#src/components/Button.tsx';
import { Notice } from '#src/components/Notice.tsx';
import { Grid, type CellMark, type GridStep } from '#src/components/grid/index.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { cellText } from '../lib/cellText.ts';
import { afterStep, gradeColumns, gradeRows } from '../lib/gradeGrid.ts';
import { AddColumn } from './AddColumn.tsx';
import { ImportGrades } from './ImportGrades.tsx';
import { ValueDetail } from './ValueDetail.tsx';

interface GradesEditorProps {
  edition: Edition;
  findings: readonly Finding[];
  readOnly: boolean;
  onChange: (edition: Edition) => void;
  onUndo: () => void;
  onRedo: () => void;
}

/** The grade table as a spreadsheet: type, paste, fill, undo; what is doubtful or unverified is marked. */
export function GradesEditor({ edition, findings, readOnly, onChange, onUndo, onRedo }: GradesEditorProps) {
  const numbers = useNumbers();
  const text = useMemo(() => cellText(numbers), [numbers]);
  const columns = useMemo(() => gradeColumns(edition), [edition]);
  const rows = useMemo(() => gradeRows(edition), [edition]);
  const [active, setActive] = useState<{ row: string; column: string } | null>(null);
  const [rejected, setRejected] = useState<GridStep['rejected']>([]);
  const [dialog, setDialog] = useState<'import' | 'column' | null>(null);
  const marks = useMemo(() => marksOf(edition, findings), [edition, findings]);
  const apply = (step: GridStep) => {
    setRejected(step.rejected);
    const sized = step.changes.filter(
      ({ before, column }) => typeof before === 'string' && before.includes(' / ') && column !== 'title',
    );
    const changes = step.changes.filter((change) => !sized.includes(change));
    if (changes.length || step.newRows.length)
      onChange(afterStep(edition, { changes, newRows: step.newRows }));
  };
  const removeRow = () => {
    if (!active) return;
    onChange({
      ...edition,
      grades: { ...edition.grades, rows: edition.grades.rows.filter(({ id }) => id !== active.row) },
    });
    setActive(null);
  };
  return (
    <div>
      {!readOnly && (
        <div className="mb-3 flex flex-wrap gap-2">
          <Button onClick={() => onChange(afterStep(edition, { changes: [], newRows: [{}] }))}>
            Add a grade
          </Button>
          <Button onClick={() => setDialog('column')}>Add a property</Button>
          <Button disabled={!active} onClick={removeRow}>
            Remove this grade
          </Button>
          <Button onClick={() => setDialog('import')}>Upload CSV</Button>
        </div>
      )}
      <Grid
        label="Grades"
        columns={columns}
        rows={rows}
        text={text}
        mark={marks}
        grow
        readOnly={readOnly}
        onStep={apply}
        onUndo={onUndo}
        onRedo={onRedo}
        onActive={(row, column) => setActive({ row, column })}
      />
      {rejected.length > 0 && (
        <Notice tone="warning">
          <p className="font-medium">
            {rejected.length === 1 ? 'One cell was not taken' : `${rejected.length} cells were not taken`}
          </p>
          <ul>
            {rejected.slice(0, 12).map(({ row, column, message }, index) => (
              <li key={index}>
                Row {row + 1}, {columns.find(({ key }) => key === column)?.title ?? column}: {message}
              </li>
            ))}
          </ul>
        </Notice>
      )}
      {active && (
        <ValueDetail
          edition={edition}
          row={active.row}
          column={active.column}
          readOnly={readOnly}
          onChange={onChange}
        />
      )}
      {dialog === 'import' && (
        <ImportGrades edition={edition} onApply={onChange} onClose={() => setDialog(null)} />
      )}
      {dialog === 'column' && (
        <AddColumn edition={edition} onApply={onChange} onClose={() => setDialog(null)} />
      )}
    </div>
  );
}

/** Marks on cells: what the compiler found there, and what nobody verified. */
function marksOf(edition: Edition, findings: readonly Finding[]) {
  const found = new Map<string, CellMark>();
  edition.grades.rows.forEach((row, index) => {
    for (const symbol of Object.keys(row.values)) {
      const own = row.cells?.[symbol] ?? row.provenance;
      if (!own.verified)
        found.set(`${row.id} ${symbol}`, { tone: 'unverified', message: 'Not verified by a second person.' });
      const pointer = `/grades/rows/${index}/values/${symbol}`;
      const finding = findings.find((each) => each.pointer === pointer);
      if (finding)
        found.set(`${row.id} ${symbol}`, {
          tone: finding.severity === 'error' ? 'error' : 'warning',
          message: finding.message,
        });
    }
  });
  return (row: string, column: string) => found.get(`${row} ${column}`);
}
