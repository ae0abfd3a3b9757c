import type { ButtonHTMLAttributes } from 'react';

type Kind = 'main' | 'plain' | 'quiet';

const kinds: Record<Kind, string> = {
  main: 'bg-ink text-on-ink border-ink hover:bg-ink/90',
  plain: 'bg-raised text-ink border-ink/70 hover:bg-wash',
  quiet: 'border-transparent text-accent-ink hover:underline px-1',
};

/** A button: `main` for the one thing to do next, `plain` beside it, `quiet` within text and headings. */
export function Button({
  kind = 'plain',
  className = '',
  type = 'button',
  ...rest
}: ButtonHTMLAttributes<HTMLButtonElement> & { kind?: Kind }) {
  return (
    <button
      type={type}
      className={`inline-flex min-h-8 items-center justify-center gap-1.5 rounded border px-3 py-1 text-sm font-medium disabled:cursor-not-allowed disabled:opacity-50 ${kinds[kind]} ${className}`}
      {...rest}
    />
  );
}
