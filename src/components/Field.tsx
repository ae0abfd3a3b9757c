import { useId, type InputHTMLAttributes, type SelectHTMLAttributes } from 'react';

interface FieldProps {
  label: string;
  hint?: string | undefined;
  error?: string | undefined;
}
const box = 'w-full rounded border bg-raised px-2.5 py-1.5 text-base text-ink';

/** A labelled text field; what is wrong stands below it and is announced with it. */
export function TextField({
  label,
  hint,
  error,
  ...rest
}: FieldProps & InputHTMLAttributes<HTMLInputElement>) {
  const id = useId();
  const said = [hint && `${id}h`, error && `${id}e`].filter(Boolean).join(' ');
  return (
    <div className="mb-3">
      <label htmlFor={id} className="mb-1 block text-sm font-medium">
        {label}
      </label>
      <input
        id={id}
        aria-invalid={error !== undefined}
        aria-describedby={said || undefined}
        className={`${box} ${error ? 'border-fail' : 'border-pencil'}`}
        {...rest}
      />
      {hint && (
        <p id={`${id}h`} className="mt-1 text-xs text-soft">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}e`} className="mt-1 text-sm text-fail">
          {error}
        </p>
      )}
    </div>
  );
}

/** A labelled list to pick from. */
export function SelectField({
  label,
  hint,
  error,
  children,
  ...rest
}: FieldProps & SelectHTMLAttributes<HTMLSelectElement>) {
  const id = useId();
  return (
    <div className="mb-3">
      <label htmlFor={id} className="mb-1 block text-sm font-medium">
        {label}
      </label>
      <select
        id={id}
        aria-invalid={error !== undefined}
        className={`${box} ${error ? 'border-fail' : 'border-pencil'}`}
        {...rest}
      >
        {children}
      </select>
      {hint && <p className="mt-1 text-xs text-soft">{hint}</p>}
      {error && <p className="mt-1 text-sm text-fail">{error}</p>}
    </div>
  );
}
