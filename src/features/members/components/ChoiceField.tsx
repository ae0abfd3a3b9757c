import { valueAt } from '../lib/pointer.ts';
import { FieldRow } from './FieldRow.tsx';
import { useTools } from './SheetContext.ts';

interface ChoiceFieldProps {
  label: string;
  pointer: string;
  options: readonly { id: string; title: string }[];
  /** What is taken when nothing is chosen; without it a choice has to be made. */
  otherwise?: string | undefined;
  note?: string | undefined;
  /** Called instead of setting the value, for choices that change more than one place. */
  onChoose?: (id: string) => void;
}

/** A list to pick from, in a sheet. */
export function ChoiceField({ label, pointer, options, otherwise, note, onChoose }: ChoiceFieldProps) {
  const { member, readOnly, findings, send } = useTools();
  const stored = valueAt(member, pointer);
  const value = typeof stored === 'string' || typeof stored === 'number' ? String(stored) : '';
  const title = options.find(({ id }) => id === value)?.title;
  const known = value === '' || title !== undefined;
  const error = findings.find((finding) => finding.pointer === pointer)?.message;
  return (
    <FieldRow label={label} note={note} error={error}>
      {({ id, describedBy }) =>
        readOnly ? (
          <output id={id} className="col-span-2 text-right text-sm font-medium">
            {title ?? (value || otherwise || '–')}
          </output>
        ) : (
          <select
            id={id}
            value={value}
            aria-describedby={describedBy}
            aria-invalid={error !== undefined}
            onChange={(event) =>
              onChoose
                ? onChoose(event.target.value)
                : send({
                    kind: 'set',
                    pointer,
                    value: event.target.value === '' ? undefined : event.target.value,
                  })
            }
            className="col-span-2 max-w-48 rounded border border-transparent bg-transparent py-0.5 text-right text-sm font-medium hover:border-pencil focus:border-accent"
          >
            {(otherwise !== undefined || value === '') && (
              <option value="">{otherwise === undefined ? 'Choose' : otherwise}</option>
            )}
            {!known && <option value={value}>{value} (not in this edition)</option>}
            {options.map((option) => (
              <option key={option.id} value={option.id}>
                {option.title}
              </option>
            ))}
          </select>
        )
      }
    </FieldRow>
  );
}
