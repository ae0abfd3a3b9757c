import type { ReactNode } from 'react';

interface PageProps {
  title: string;
  mark?: ReactNode;
  lead?: ReactNode;
  actions?: ReactNode;
  children: ReactNode;
  /** For pages whose table wants all the width there is. */
  wide?: boolean;
}

/** A page with its title, what it is, and what can be done. */
export function Page({ title, mark, lead, actions, children, wide = false }: PageProps) {
  return (
    <div className={`mx-auto px-4 pt-6 md:px-8 ${wide ? 'max-w-[92rem]' : 'max-w-6xl'}`}>
      <header className="mb-6 flex flex-wrap items-start gap-x-6 gap-y-3">
        <div className="min-w-0 flex-1 basis-full sm:basis-0">
          <h1 className="flex flex-wrap items-center gap-3 text-3xl">
            {title} {mark}
          </h1>
          {lead && <div className="mt-1 max-w-3xl text-base text-soft">{lead}</div>}
        </div>
        {actions && <div className="no-print flex flex-wrap gap-2">{actions}</div>}
      </header>
      {children}
    </div>
  );
}
