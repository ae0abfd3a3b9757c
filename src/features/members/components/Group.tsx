import type { ReactNode } from 'react';

/** A group of a sheet's inputs, as an engineer thinks of them. */
export function Group({
  title,
  actions,
  children,
}: {
  title: string;
  actions?: ReactNode;
  children: ReactNode;
}) {
  return (
    <section className="mt-5 first:mt-0" aria-label={title}>
      <div className="flex items-baseline justify-between border-b border-ink pb-1">
        <h2 className="text-lg italic">{title}</h2>
        {actions}
      </div>
      {children}
    </section>
  );
}

/** A small action within a group. */
export function GroupAction({
  label,
  onClick,
  about,
}: {
  label: string;
  onClick: () => void;
  about?: string;
}) {
  return (
    <button
      type="button"
      onClick={onClick}
      aria-label={about ?? label}
      className="min-h-6 px-1 text-xs font-medium text-accent-ink hover:underline"
    >
      {label}
    </button>
  );
}
