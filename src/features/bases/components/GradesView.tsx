import { useCallback, useMemo, useState } from 'react';
import type { Edition } from '#shared/basis/schema/index.ts';
import { Grid, type CellText } from '#src/components/grid/index.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { cellInWords, cellMark, gradeSheet } from '../gradeSheet.ts';

const text: CellText = {
  parse: () => ({ ok: false, message: 'This edition is read, not written.' }),
  format: (_, value) => (value === null ? '' : String(value)),
};

/** The grade table: units in the header, unverified values marked, the origin of the chosen value below. */
export function GradesView({ edition }: { edition: Edition }) {
  const { decimals } = useNumbers();
  const [active, setActive] = useState<{ row: string; column: string } | null>(null);
  const { columns, rows } = useMemo(() => gradeSheet(edition, decimals), [edition, decimals]);
  const mark = useCallback((row: string, column: string) => cellMark(edition, row, column), [edition]);
  const onActive = useCallback((row: string, column: string) => setActive({ row, column }), []);
  if (rows.length === 0) return <p className="text-soft">No grade yet.</p>;
  return (
    <>
      <Grid
        label="Grades"
        columns={columns}
        rows={rows}
        text={text}
        mark={mark}
        onActive={onActive}
        readOnly
        visibleRows={14}
      />
      <p className="min-h-11 border-b border-rule py-2 text-sm" role="status">
        {active
          ? cellInWords(edition, active.row, active.column, decimals)
          : 'Choose a value, with the arrow keys or a click, to read where it comes from.'}
      </p>
      <p className="pt-2 text-xs text-soft">
        <span className="text-close">◆</span> not verified by a second person.{' '}
        <span className="text-close">◈</span> not verified, and written from memory. Values by size are set
        with a stroke, smallest size first.
      </p>
    </>
  );
}
