import type { Restraint } from '#shared/analysis/types.ts';

interface SupportMarkProps {
  x: number;
  /** Underside of the member, and its drawn depth. */
  top: number;
  beam: number;
  restraint: Restraint;
  side: 'left' | 'right';
  label: string;
}

/** A support as drawn in an office: a triangle for a pin, a hatched wall for a fixed end. */
export function SupportMark({ x, top, beam, restraint, side, label }: SupportMarkProps) {
  if (restraint === 'free') return null;
  return (
    <g>
      {restraint === 'pin' ? (
        <path d={`M${x},${top + 1} l8,13 h-16 z`} className="fill-paper stroke-ink" strokeWidth={1.25} />
      ) : (
        <Wall x={side === 'left' ? x - 6 : x + 6} top={top - beam - 8} height={beam + 16} side={side} />
      )}
      <text x={x} y={top + 30} textAnchor="middle" className="fill-ink font-mono text-xs">
        {label}
      </text>
    </g>
  );
}

function Wall({ x, top, height, side }: { x: number; top: number; height: number; side: 'left' | 'right' }) {
  const out = side === 'left' ? -6 : 6;
  const hatches = [0, 0.25, 0.5, 0.75, 1].map((t) => `M${x},${top + t * height} l${out},6`).join(' ');
  return (
    <g className="stroke-ink">
      <line x1={x} x2={x} y1={top} y2={top + height} strokeWidth={1.75} />
      <path d={hatches} strokeWidth={1} className="fill-none" />
    </g>
  );
}
