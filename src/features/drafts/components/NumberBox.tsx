import { useState } from 'react';
import { readNumber } from '#shared/units/quantity.ts';
import { useNumbers } from '#src/lib/format/locale.ts';

/** A small number field: what can't be read is kept as typed and marked, and changes nothing. */
export function NumberBox({
  label,
  value,
  onChange,
  readOnly = false,
}: {
  label: string;
  value: number;
  onChange: (value: number) => void;
  readOnly?: boolean;
}) {
  const numbers = useNumbers();
  const [typing, setTyping] = useState<string | null>(null);
  const wrong = typing !== null && readNumber(typing, numbers.format) === undefined;
  return (
    <input
      aria-label={label}
      aria-invalid={wrong}
      title={wrong ? `“${typing}” is not a number.` : undefined}
      readOnly={readOnly}
      inputMode="decimal"
      value={typing ?? numbers.exact(value)}
      onChange={(event) => {
        setTyping(event.target.value);
        const read = readNumber(event.target.value, numbers.format);
        if (read !== undefined) onChange(read);
      }}
      onBlur={() => !wrong && setTyping(null)}
      className={`w-24 rounded border bg-raised px-1.5 py-0.5 text-right font-mono text-sm ${wrong ? 'border-fail' : 'border-pencil'}`}
    />
  );
}
