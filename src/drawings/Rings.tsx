import type { EditionState } from '#shared/basis/lifecycle.ts';
import { ringPath } from './ringShape.ts';

export interface Ring {
  number: number;
  state: EditionState;
  /** Beside its label: "released 2026". */
  note: string;
  /** Live projects pin it. */
  pinned: boolean;
}

const size = 150;
const centre = 75;

/** Rings: a basis's editions as growth rings, the newest outside; a draft is dashed, a pinned ring in resin. */
export function Rings({ rings, labels = true }: { rings: readonly Ring[]; labels?: boolean }) {
  const inward = [...rings].sort((a, b) => b.number - a.number);
  const step = Math.min(24, 60 / Math.max(inward.length, 1));
  const words = inward.map(
    ({ number, state, note, pinned }) =>
      `edition ${number} ${state.replace('_', ' ')}${note ? `, ${note}` : ''}${pinned ? ', pinned by projects' : ''}`,
  );
  const gap = Math.max(22, size / Math.max(inward.length, 1) / 1.6);
  return (
    <svg
      viewBox={`0 0 ${labels ? 340 : size} ${size}`}
      className={labels ? 'w-full max-w-lg' : 'size-16'}
      role="img"
      aria-label={`Editions, newest first: ${words.join('; ')}.`}
    >
      {inward.map(({ number, state, pinned, note }, index) => {
        const radius = 66 - index * step;
        const labelY = 22 + index * gap;
        const angle = -0.9 + (index / Math.max(inward.length - 1, 1)) * 1.5;
        return (
          <g key={number}>
            <path
              d={ringPath(centre, radius, number)}
              className={`fill-none ${pinned ? 'stroke-accent' : state === 'withdrawn' ? 'stroke-fail' : 'stroke-ink'}`}
              strokeWidth={pinned ? 2.6 : 1.3}
              strokeDasharray={
                state === 'draft' || state === 'in_check' ? '3 3' : state === 'withdrawn' ? '1 3' : undefined
              }
            />
            {labels && (
              <>
                <path
                  d={`M${centre + radius * Math.cos(angle)},${centre + radius * Math.sin(angle)} L170,${labelY - 4}`}
                  className="fill-none stroke-pencil"
                  strokeWidth={0.7}
                />
                <text
                  x={176}
                  y={labelY}
                  className={`text-[0.6875rem] ${pinned ? 'fill-accent-ink' : 'fill-ink'}`}
                >
                  <tspan className="font-mono font-semibold">{number}</tspan> {state.replace('_', ' ')} {note}
                  {pinned && ', pinned'}
                </text>
              </>
            )}
          </g>
        );
      })}
      <circle cx={centre} cy={centre} r={3.4} className="fill-accent" />
    </svg>
  );
}
