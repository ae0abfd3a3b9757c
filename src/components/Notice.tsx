import type { ReactNode } from 'react';
import { ApiProblem } from '#src/lib/api/call.ts';

const looks = {
  note: { sign: 'i', className: 'border-pencil' },
  warning: { sign: '▲', className: 'border-close' },
  error: { sign: '■', className: 'border-fail' },
} as const;

/** Something to know, at the place it concerns. Errors are announced. */
export function Notice({ tone = 'note', children }: { tone?: keyof typeof looks; children: ReactNode }) {
  const { sign, className } = looks[tone];
  return (
    <div
      role={tone === 'error' ? 'alert' : 'status'}
      className={`my-3 flex gap-2.5 border-l-2 bg-raised px-3 py-2 text-sm ${className}`}
    >
      <span aria-hidden className="font-mono">
        {sign}
      </span>
      <div className="min-w-0">{children}</div>
    </div>
  );
}

/** What the server turned down, in its own plain sentences. */
export function ProblemNotice({ error }: { error: unknown }) {
  if (!error) return null;
  if (!(error instanceof ApiProblem)) {
    return <Notice tone="error">Something went wrong here. Reload the page; what you typed is kept.</Notice>;
  }
  const { title, detail, errors, reference } = error.problem;
  return (
    <Notice tone="error">
      <p className="font-medium">{title}</p>
      {detail !== title && <p>{detail}</p>}
      {errors && (
        <ul className="mt-1 list-disc pl-5">
          {errors.map(({ pointer, message }) => (
            <li key={pointer + message}>{message}</li>
          ))}
        </ul>
      )}
      {reference && <p className="mt-1 text-xs text-soft">Reference {reference}</p>}
    </Notice>
  );
}
