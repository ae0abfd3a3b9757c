import { useId, type ReactNode } from 'react';

interface FieldRowProps {
  label: string;
  note?: string | undefined;
  error?: string | undefined;
  unit?: string;
  children: (ids: { id: string; describedBy: string | undefined }) => ReactNode;
}

/** One line of a sheet: label, value, unit; what is wrong stands below it. */
export function FieldRow({ label, note, error, unit, children }: FieldRowProps) {
  const id = useId();
  return (
    <div className={`border-b ${error ? 'border-fail' : 'border-rule'}`}>
      <div className="grid min-h-9 grid-cols-[minmax(0,1fr)_auto_2.9rem] items-center gap-2 py-0.5">
        <label htmlFor={id} className="text-sm leading-tight text-soft">
          {label}
          {note && <span className="ml-2 text-xs text-accent-ink">{note}</span>}
        </label>
        {children({ id, describedBy: error ? `${id}e` : undefined })}
        <span className="font-mono text-xs text-soft">{unit}</span>
      </div>
      {error && (
        <p id={`${id}e`} className="pb-1.5 text-xs text-fail">
          {error}
        </p>
      )}
    </div>
  );
}
