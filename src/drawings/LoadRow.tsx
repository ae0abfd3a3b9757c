import type { ScaleLinear } from 'd3-scale';

/** A load as drawn: places in the analysis' length unit, label with value, unit and action. */
export type StripLoad =
  | { kind: 'line'; from: number; to: number; start: number; end: number; label: string }
  | { kind: 'point'; x: number; force: number; label: string }
  | { kind: 'couple'; x: number; moment: number; label: string };

interface LoadRowProps {
  loads: readonly StripLoad[];
  x: ScaleLinear<number, number>;
  /** Where arrows end: just above the member. */
  bottom: number;
  width: number;
}

const arrowGap = 42;
/** Height of one line load with its label; several stand on top of each other. */
export const bandHeight = 34;

/** Loads above the member: line loads stacked as bands of arrows, point loads and couples over them. */
export function LoadRow({ loads, x, bottom, width }: LoadRowProps) {
  const lines = loads.filter((load) => load.kind === 'line');
  const others = loads.filter((load) => load.kind !== 'line');
  const largest = Math.max(
    ...lines.map((l) => Math.max(Math.abs(l.start), Math.abs(l.end))),
    Number.MIN_VALUE,
  );
  return (
    <g>
      {lines.map((load, index) => (
        <LineBand
          key={`line${index}`}
          load={load}
          x={x}
          bottom={bottom - index * bandHeight}
          largest={largest}
        />
      ))}
      {others.map((load, index) => {
        const px = x(load.x);
        const top = bottom - Math.max(62, lines.length * bandHeight + 12);
        const end = px > width * 0.75;
        const up = load.kind === 'point' && load.force < 0;
        return (
          <g key={`other${index}`}>
            {load.kind === 'point' ? (
              <path
                d={
                  up
                    ? `M${px},${bottom} V${top} m-4,7 l4,-7 l4,7`
                    : `M${px},${top} V${bottom} m-4,-7 l4,7 l4,-7`
                }
                className="fill-none stroke-accent"
                strokeWidth={1.75}
              />
            ) : (
              <path
                d={
                  load.moment >= 0
                    ? `M${px - 12},${bottom - 4} a13,13 0 1 1 24,0 m-1,-7 l1,7 l-7,0`
                    : `M${px + 12},${bottom - 4} a13,13 0 1 0 -24,0 m1,-7 l-1,7 l7,0`
                }
                className="fill-none stroke-accent"
                strokeWidth={1.75}
              />
            )}
            <text
              x={end ? px - 8 : px + 8}
              y={top + 8 + (index % 3) * 14}
              textAnchor={end ? 'end' : 'start'}
              className="fill-accent-ink stroke-paper text-xs"
              strokeWidth={3}
              paintOrder="stroke"
            >
              {load.label}
            </text>
          </g>
        );
      })}
    </g>
  );
}

function LineBand({
  load,
  x,
  bottom,
  largest,
}: {
  load: Extract<StripLoad, { kind: 'line' }>;
  x: ScaleLinear<number, number>;
  bottom: number;
  largest: number;
}) {
  const height = (intensity: number) => 6 + (13 * Math.abs(intensity)) / largest;
  const x0 = x(load.from);
  const x1 = x(load.to);
  const count = Math.max(2, Math.round((x1 - x0) / arrowGap) + 1);
  const arrows = Array.from({ length: count }, (_, i) => {
    const t = i / (count - 1);
    const intensity = load.start + (load.end - load.start) * t;
    return { px: x0 + (x1 - x0) * t, h: height(intensity), up: intensity < 0, none: intensity === 0 };
  });
  return (
    <g className="stroke-pencil">
      <line x1={x0} y1={bottom - height(load.start)} x2={x1} y2={bottom - height(load.end)} strokeWidth={1} />
      {arrows.map(({ px, h, up, none }, i) =>
        none ? null : (
          <path
            key={i}
            d={
              up ? `M${px},${bottom} v${-h} m-3,5 l3,-5 l3,5` : `M${px},${bottom - h} v${h} m-3,-5 l3,5 l3,-5`
            }
            strokeWidth={1}
            className="fill-none"
          />
        ),
      )}
      <text
        x={x1}
        y={bottom - height(load.end) - 6}
        textAnchor="end"
        className="fill-soft stroke-none text-xs"
      >
        {load.label}
      </text>
    </g>
  );
}
