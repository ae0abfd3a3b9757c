import type { ReactNode } from 'react';

interface SectionProps {
  title: string;
  note?: ReactNode;
  actions?: ReactNode;
  children: ReactNode;
  id?: string;
}

/** A part of a page: italic heading, what it says in short, and what can be done with it. */
export function Section({ title, note, actions, children, id }: SectionProps) {
  return (
    <section className="mt-7 scroll-mt-28 first:mt-0" aria-label={title} id={id}>
      <div className="mb-2 flex flex-wrap items-baseline gap-x-3 gap-y-1">
        <h2 className="text-lg italic">{title}</h2>
        {note && <div className="text-sm text-soft">{note}</div>}
        {actions && <div className="no-print ml-auto flex gap-2 text-sm">{actions}</div>}
      </div>
      {children}
    </section>
  );
}
