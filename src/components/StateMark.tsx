import type { EditionState } from '#shared/basis/lifecycle.ts';
import type { VerdictWord } from '#shared/engine/types.ts';

/** Word, shape and colour of each verdict; never colour alone. */
export const verdictLook: Readonly<
  Record<VerdictWord, { word: string; sign: string; text: string; fill: string }>
> = {
  passes: { word: 'Passes', sign: '✓', text: 'text-pass', fill: 'fill-pass' },
  close: { word: 'Close', sign: '≈', text: 'text-close', fill: 'fill-close' },
  fails: { word: 'Fails', sign: '✕', text: 'text-fail', fill: 'fill-fail' },
  none: { word: 'No verdict', sign: '–', text: 'text-soft', fill: 'fill-soft' },
};

export function VerdictMark({ word }: { word: VerdictWord }) {
  const look = verdictLook[word];
  return (
    <span className={`inline-flex items-center gap-1 font-medium whitespace-nowrap ${look.text}`}>
      <span aria-hidden className="w-3 text-center">
        {look.sign}
      </span>
      {look.word}
    </span>
  );
}

const states: Readonly<Record<EditionState, { word: string; sign: string; className: string }>> = {
  draft: { word: 'Draft', sign: '◐', className: 'border-dashed border-ink text-ink' },
  in_check: { word: 'In check', sign: '◎', className: 'border-accent text-accent-ink' },
  released: { word: 'Released', sign: '●', className: 'border-pass text-pass' },
  superseded: { word: 'Superseded', sign: '○', className: 'border-pencil text-soft' },
  withdrawn: { word: 'Withdrawn', sign: '⊘', className: 'border-fail text-fail' },
};

export function EditionMark({ state }: { state: EditionState }) {
  const { word, sign, className } = states[state];
  return (
    <span
      className={`inline-flex items-center gap-1 rounded-full border px-2 text-xs font-semibold whitespace-nowrap ${className}`}
    >
      <span aria-hidden>{sign}</span>
      {word}
    </span>
  );
}

/** The mark of what nobody verified, with its count in words. */
export function UnverifiedMark({ count, what = 'values behind this' }: { count: number; what?: string }) {
  if (count === 0) return null;
  return (
    <span className="text-close whitespace-nowrap">
      <span aria-hidden>◆</span> {count} {count === 1 ? what.replace('values', 'value') : what} unverified
    </span>
  );
}
