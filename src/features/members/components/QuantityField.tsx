import { useState } from 'react';
import { unitForReading } from '#shared/units/format.ts';
import { readQuantity } from '#shared/units/quantity.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { valueAt } from '../lib/pointer.ts';
import { FieldRow } from './FieldRow.tsx';
import { useTools } from './SheetContext.ts';

interface QuantityFieldProps {
  label: string;
  pointer: string;
  unit: string;
  /** Bounds, said when broken. `above` leaves the bound itself out. */
  above?: number;
  least?: number;
  most?: number;
  /** Whether the field may be left empty, and what is then taken. */
  empty?: string;
  note?: string | undefined;
  /** What the field is called where its label alone would not tell it from another. */
  about?: string | undefined;
  whole?: boolean;
}

/**
 * A number with its unit. Takes what people type ("3.6 m", "12 ft 6 in"); what can't be read or breaks a
 * bound is kept as typed, with the reason below it.
 */
export function QuantityField(props: QuantityFieldProps) {
  const { label, pointer, unit, above, least, most, empty, note, about, whole = false } = props;
  const { member, readOnly, unread, findings, send } = useTools();
  const numbers = useNumbers();
  const [typing, setTyping] = useState<string | null>(null);
  const stored = valueAt(member, pointer);
  const value = typeof stored === 'number' ? stored : undefined;
  const kept = unread[pointer];
  const shown = typing ?? kept?.text ?? (value === undefined ? '' : numbers.exact(value));
  const error = kept?.message ?? findings.find((finding) => finding.pointer === pointer)?.message;
  const bound = (number: number) => `${numbers.exact(number)} ${unitForReading(unit)}`.trim();

  const problemWith = (number: number): string | null => {
    if (above !== undefined && number <= above) return `${label} has to be above ${bound(above)}.`;
    if (least !== undefined && number < least) return `${label} has to be ${bound(least)} or more.`;
    if (most !== undefined && number > most) return `${label} has to be ${bound(most)} or less.`;
    return whole && !Number.isInteger(number) ? `${label} has to be a whole number.` : null;
  };
  const read = (text: string) => {
    setTyping(text);
    if (text.trim() === '' && empty !== undefined) {
      send({ kind: 'set', pointer, value: undefined });
      return;
    }
    const outcome = readQuantity(text, unit, numbers.format);
    const message = outcome.ok ? problemWith(outcome.value) : outcome.message;
    if (message !== null) send({ kind: 'unreadable', pointer, text, message });
    else if (outcome.ok) send({ kind: 'set', pointer, value: outcome.value });
  };

  return (
    <FieldRow label={label} note={note} error={error} unit={unitForReading(unit)}>
      {({ id, describedBy }) =>
        readOnly ? (
          <output id={id} className="text-right font-mono font-medium tabular-nums">
            {shown === '' ? (empty ?? '–') : shown}
          </output>
        ) : (
          <input
            id={id}
            value={shown}
            placeholder={empty}
            inputMode="decimal"
            autoComplete="off"
            aria-label={about}
            aria-invalid={error !== undefined}
            aria-describedby={describedBy}
            onChange={(event) => read(event.target.value)}
            onBlur={() => setTyping(null)}
            className={`w-28 rounded border bg-transparent px-1.5 py-0.5 text-right font-mono font-medium tabular-nums hover:border-pencil focus:border-accent focus:bg-raised ${error ? 'border-fail' : 'border-transparent'}`}
          />
        )
      }
    </FieldRow>
  );
}
