import { line as linePath, area as areaPath } from 'd3-shape';
import { scaleLinear } from 'd3-scale';
import { useMemo, useState, type KeyboardEvent, type PointerEvent } from 'react';
import type { Restraint } from '#shared/analysis/types.ts';
import type { Curves } from '#shared/engine/types.ts';
import { shown, type Display } from './display.ts';
import { bandHeight, LoadRow, type StripLoad } from './LoadRow.tsx';
import { bandOf, extentOf, nearestSample, readAt, type Diagram } from './stripGeometry.ts';
import { SupportMark } from './SupportMark.tsx';

export interface StripSupport {
  x: number;
  restraint: Restraint;
  /** Text under the support, such as the largest reaction with its unit. */
  reaction: string;
}

interface MemberStripProps {
  width: number;
  length: number;
  supports: readonly StripSupport[];
  loads: readonly StripLoad[];
  curves: Curves;
  /** Combination id, or null for the envelope. */
  combination: string | null;
  display: Display;
  /** Beside the peak deflection: "of 12.6 mm allowed". */
  deflectionNote?: string;
}

const margin = { left: 44, right: 44 };
const rows = { beam: 14, supports: 44, diagram: 74, gap: 20, readout: 26 };

const diagrams: readonly {
  of: Diagram;
  name: string;
  unit: 'force' | 'moment' | 'deflection';
  down: boolean;
}[] = [
  { of: 'V', name: 'shear', unit: 'force', down: false },
  { of: 'M', name: 'moment', unit: 'moment', down: true },
  { of: 'w', name: 'deflection', unit: 'deflection', down: true },
];

/**
 * Member strip: supports, spans and loads, then shear, moment and deflection over one axis. A cross-hair,
 * moved by pointer or arrow keys, reads all three at one place.
 */
export function MemberStrip(props: MemberStripProps) {
  const { width, length, supports, loads, curves, combination, display, deflectionNote } = props;
  const [sample, setSample] = useState<number | null>(null);
  const x = scaleLinear()
    .domain([0, length])
    .range([margin.left, width - margin.right]);
  const lines = loads.filter(({ kind }) => kind === 'line').length;
  const others = loads.length > lines ? 30 : 0;
  const beamTop = Math.max(70, lines * bandHeight + others + 24);
  const firstDiagram = beamTop + rows.beam + rows.supports;
  const height = firstDiagram + diagrams.length * (rows.diagram + rows.gap) + rows.readout;
  const bands = useMemo(
    () => diagrams.map((diagram) => ({ ...diagram, band: bandOf(curves, diagram.of, combination) })),
    [curves, combination],
  );
  const last = curves.x.length - 1;

  const follow = (event: PointerEvent<SVGSVGElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    const place = x.invert(((event.clientX - box.left) / box.width) * width);
    setSample(nearestSample(curves.x, Math.min(Math.max(place, 0), length)));
  };
  const step = (event: KeyboardEvent<SVGSVGElement>) => {
    const from = sample ?? Math.round(last / 2);
    const moves: Record<string, number> = {
      ArrowLeft: from - 1,
      ArrowRight: from + 1,
      PageDown: from - 10,
      PageUp: from + 10,
      Home: 0,
      End: last,
    };
    const next = moves[event.key];
    if (next === undefined) return;
    event.preventDefault();
    setSample(Math.min(Math.max(next, 0), last));
  };
  const reading =
    sample === null
      ? null
      : [
          `x ${shown(display, 'place', curves.x[sample] ?? 0)}`,
          ...bands.map(({ of, unit, band }) => `${of} ${shown(display, unit, readAt(band, sample))}`),
        ].join('   ');

  return (
    <svg
      className="member-strip block w-full touch-pan-y"
      viewBox={`0 0 ${width} ${height}`}
      role="slider"
      tabIndex={0}
      aria-label="Member strip: place along the member"
      aria-valuemin={0}
      aria-valuemax={last}
      aria-valuenow={sample ?? 0}
      aria-valuetext={reading ?? `No place chosen. ${peaksInWords(curves, display)}`}
      onPointerMove={follow}
      onPointerLeave={() => setSample(null)}
      onKeyDown={step}
    >
      <LoadRow loads={loads} x={x} bottom={beamTop - 4} width={width} />
      <rect
        x={x(0) - 6}
        y={beamTop}
        width={x(length) - x(0) + 12}
        height={rows.beam}
        className="fill-wood stroke-ink"
        strokeWidth={1.25}
      />
      {supports.map((support, index) => (
        <SupportMark
          key={index}
          x={x(support.x)}
          top={beamTop + rows.beam}
          beam={rows.beam}
          restraint={support.restraint}
          side={index === 0 ? 'left' : 'right'}
          label={support.reaction}
        />
      ))}
      {bands.map(({ of, name, unit, down, band }, index) => {
        const top = firstDiagram + index * (rows.diagram + rows.gap);
        const [low, high] = extentOf(band);
        const y = scaleLinear()
          .domain(down ? [low, high] : [high, low])
          .range([top, top + rows.diagram]);
        const points = curves.x.map((place, i) => [x(place), band.most[i] ?? 0, band.least[i] ?? 0] as const);
        const fill = areaPath<(typeof points)[number]>()
          .x((p) => p[0])
          .y0((p) => y(p[2]))
          .y1((p) => y(p[1]));
        const edge = (pick: 1 | 2) =>
          linePath<(typeof points)[number]>()
            .x((p) => p[0])
            .y((p) => y(p[pick]));
        const peaks = curves.peaks.filter(
          (p) => p.of === of && (combination === null || p.combination === combination),
        );
        return (
          <g key={of}>
            <text x={8} y={y(0) + 4} className="fill-soft font-serif italic text-sm" aria-hidden>
              {of}
              <title>{name}</title>
            </text>
            <path d={fill(points) ?? ''} className="fill-wash" />
            <line x1={x(0)} x2={x(length)} y1={y(0)} y2={y(0)} className="stroke-ink" strokeWidth={1} />
            <path d={edge(1)(points) ?? ''} className="fill-none stroke-ink" strokeWidth={1.4} />
            <path d={edge(2)(points) ?? ''} className="fill-none stroke-ink" strokeWidth={1.4} />
            {peaks.map((peak, i) => {
              const px = x(peak.x);
              const anchor = px > width * 0.7 ? 'end' : px < width * 0.3 ? 'start' : 'middle';
              const above = y(peak.value) > y(0);
              return (
                <g key={i}>
                  <circle cx={px} cy={y(peak.value)} r={3.2} className="fill-accent" />
                  <text
                    x={anchor === 'end' ? px - 8 : anchor === 'start' ? px + 8 : px}
                    y={above ? y(peak.value) - 7 : y(peak.value) + 14}
                    textAnchor={anchor}
                    className="fill-ink stroke-paper font-mono text-xs"
                    strokeWidth={3}
                    paintOrder="stroke"
                  >
                    {shown(display, unit, peak.value)}
                    {of === 'w' && deflectionNote ? ` ${deflectionNote}` : ''}
                  </text>
                </g>
              );
            })}
          </g>
        );
      })}
      {sample !== null && reading && (
        <g>
          <line
            x1={x(curves.x[sample] ?? 0)}
            x2={x(curves.x[sample] ?? 0)}
            y1={16}
            y2={height - rows.readout}
            className="stroke-accent"
            strokeDasharray="2 3"
          />
          <text
            x={Math.min(Math.max(x(curves.x[sample] ?? 0), 150), width - 150)}
            y={height - 8}
            textAnchor="middle"
            className="fill-accent-ink font-mono text-xs whitespace-pre"
          >
            {reading}
          </text>
        </g>
      )}
    </svg>
  );
}

/** The labelled peaks as a sentence, for those who can't see the drawing. */
export function peaksInWords(curves: Curves, display: Display): string {
  return curves.peaks
    .map((peak) => {
      const diagram = diagrams.find((d) => d.of === peak.of);
      if (!diagram) return '';
      return `Largest ${diagram.name} ${shown(display, diagram.unit, peak.value)} at ${shown(display, 'place', peak.x)}.`;
    })
    .join(' ');
}
