import type { VerdictWord } from '#shared/engine/types.ts';
import { verdictLook } from './StateMark.tsx';

/** A utilisation as a bar up to 1.2, with the mark at 1. The number stands beside it in the table. */
export function UtilisationBar({
  value,
  word,
  strong = false,
}: {
  value: number | null;
  word: VerdictWord;
  strong?: boolean;
}) {
  const width = value === null ? 0 : Math.min(value, 1.2) / 1.2;
  return (
    <svg viewBox="0 0 120 10" preserveAspectRatio="none" className="h-2.5 w-full min-w-16" aria-hidden>
      <rect x={0} y={2.5} width={120} height={5} className="fill-wash" />
      <rect
        x={0}
        y={2.5}
        width={120 * width}
        height={5}
        className={strong && word === 'passes' ? 'fill-ink' : verdictLook[word].fill}
      />
      <line
        x1={100}
        x2={100}
        y1={0}
        y2={10}
        className="stroke-ink"
        strokeWidth={1.2}
        vectorEffect="non-scaling-stroke"
      />
    </svg>
  );
}
