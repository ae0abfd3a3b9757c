import { useState } from 'react';
import type { Edition } from '#shared/basis/schema/index.ts';
import { unitSymbols } from '#shared/units/units.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { SelectField, TextField } from '#src/components/Field.tsx';

/** A new property of grades: symbol, title, unit. */
export function AddColumn({
  edition,
  onApply,
  onClose,
}: {
  edition: Edition;
  onApply: (edition: Edition) => void;
  onClose: () => void;
}) {
  const [error, setError] = useState<string | undefined>(undefined);
  return (
    <Dialog title="Add a property" open onClose={onClose}>
      <form
        onSubmit={(event) => {
          event.preventDefault();
          const data = new FormData(event.currentTarget);
          const [symbol, title, unit] = ['symbol', 'title', 'unit'].map((name) =>
            String(data.get(name) ?? '').trim(),
          );
          const taken = [
            ...edition.grades.columns,
            ...edition.clauses,
            ...edition.choices,
            ...edition.inputs,
          ].find((each) => each.symbol === symbol);
          if (!symbol || !/^[A-Za-z][A-Za-z0-9_]{0,39}$/.test(symbol))
            setError('A symbol is a letter, then letters, digits or underscore.');
          else if (taken) setError(`${symbol} already stands for “${taken.title}”.`);
          else {
            onApply({
              ...edition,
              grades: {
                ...edition.grades,
                columns: [...edition.grades.columns, { symbol, title: title || symbol, unit: unit || '1' }],
              },
            });
            onClose();
          }
        }}
      >
        <TextField
          label="Symbol"
          name="symbol"
          required
          error={error}
          hint="As formulas name it, such as f_m"
          autoFocus
        />
        <TextField label="Title" name="title" required maxLength={200} />
        <SelectField
          label="Unit"
          name="unit"
          defaultValue={edition.unitSystem === 'metric' ? 'N/mm2' : 'psi'}
        >
          {unitSymbols.map((unit) => (
            <option key={unit}>{unit}</option>
          ))}
        </SelectField>
        <Button type="submit" kind="main">
          Add it
        </Button>
      </form>
    </Dialog>
  );
}
