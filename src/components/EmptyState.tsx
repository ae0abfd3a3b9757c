import type { ReactNode } from 'react';

/** An empty list: what belongs there, and the first step. */
export function EmptyState({ children, action }: { children: ReactNode; action?: ReactNode }) {
  return (
    <div className="border-y border-rule py-8 text-center text-soft">
      <p className="mx-auto max-w-md text-balance">{children}</p>
      {action && <div className="mt-3">{action}</div>}
    </div>
  );
}
