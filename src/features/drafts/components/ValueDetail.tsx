import type { Edition, Grade } from '#shared/basis/schema/index.ts';
import { SelectField, TextField } from '#src/components/Field.tsx';

interface ValueDetailProps {
  edition: Edition;
  row: string;
  column: string;
  readOnly: boolean;
  onChange: (edition: Edition) => void;
}

const standings = [
  ['seen', 'Seen in the source'],
  ['memory', 'From memory, to be verified'],
  ['decision', 'Decided by the firm'],
  ['invented', 'Invented for demonstration'],
] as const;

/** Where the value under the cursor comes from. A change of its source takes its verification away. */
export function ValueDetail({ edition, row, column, readOnly, onChange }: ValueDetailProps) {
  const grade = edition.grades.rows.find(({ id }) => id === row);
  const property = edition.grades.columns.find(({ symbol }) => symbol === column);
  if (!grade || !property || grade.values[column] === undefined) return null;
  const own = grade.cells?.[column] ?? grade.provenance;
  const set = (change: Partial<Grade['provenance']>) => {
    const { source, standing, place, note } = { ...own, ...change };
    const next = { source, standing, ...(place ? { place } : {}), ...(note ? { note } : {}) };
    const rows = edition.grades.rows.map((each) =>
      each.id === row ? { ...each, cells: { ...each.cells, [column]: next } } : each,
    );
    onChange({ ...edition, grades: { ...edition.grades, rows } });
  };
  return (
    <section aria-label="This value" className="mt-4 border-t border-rule pt-3">
      <h2 className="mb-2 text-lg italic">
        {grade.title}, {property.title.toLowerCase()}
      </h2>
      <div className="grid gap-x-6 md:grid-cols-2">
        <SelectField
          label="Source"
          value={own.source}
          disabled={readOnly}
          onChange={(event) => set({ source: event.target.value })}
        >
          {edition.sources.map(({ id, title }) => (
            <option key={id} value={id}>
              {title}
            </option>
          ))}
        </SelectField>
        <SelectField
          label="Standing"
          value={own.standing}
          disabled={readOnly}
          onChange={(event) => set({ standing: event.target.value as Grade['provenance']['standing'] })}
        >
          {standings.map(([id, title]) => (
            <option key={id} value={id}>
              {title}
            </option>
          ))}
        </SelectField>
        <TextField
          label="Place in the source"
          value={own.place ?? ''}
          readOnly={readOnly}
          maxLength={200}
          onChange={(event) => set({ place: event.target.value })}
        />
        <TextField
          label="Note"
          value={own.note ?? ''}
          readOnly={readOnly}
          maxLength={4000}
          onChange={(event) => set({ note: event.target.value })}
        />
      </div>
      <p className="text-sm text-soft">
        {own.verified
          ? `Verified by ${own.verified.by} on ${own.verified.on}.`
          : '◆ Not verified by a second person.'}
      </p>
    </section>
  );
}
