import { scaleBand, scaleLinear } from 'd3-scale';
import { Symbol } from '#src/components/Symbol.tsx';
import type { CascadeData } from './cascadeSteps.ts';

interface CascadeProps {
  data: CascadeData;
  width: number;
  number: (value: number, digits: number) => string;
  unit: string;
  utilisation: string;
  /** Opens the ledger entry of a step. */
  onOpen: (entry: number) => void;
}

const margin = { top: 30, bottom: 40, left: 44, right: 8 };

/**
 * Cascade: a grade stress at the left, one step for each factor, the permissible or design value at the
 * right, and the demand as a line across. Each bar opens its ledger entry.
 */
export function Cascade({ data, width, number, unit, utilisation, onOpen }: CascadeProps) {
  const height = 216;
  const bars = [
    {
      key: 'base',
      symbol: data.base.symbol,
      title: data.base.title,
      from: 0,
      to: data.base.value,
      label: number(data.base.value, 4),
      entry: data.base.entry,
      kind: 'base',
    },
    ...data.steps.map((step, index) => ({
      key: `${index}`,
      symbol: step.symbol,
      title: step.title,
      from: index === 0 ? data.base.value : (data.steps[index - 1]?.after ?? 0),
      to: step.after,
      label: `${step.over ? '÷' : '×'} ${number(step.over ? 1 / step.by : step.by, 4)}`,
      entry: step.entry,
      kind: step.by === 1 ? 'same' : step.by > 1 ? 'up' : 'down',
    })),
    {
      key: 'limit',
      symbol: '',
      title: data.limit.title,
      from: 0,
      to: data.limit.value,
      label: number(data.limit.value, 4),
      entry: data.limit.entry,
      kind: 'limit',
    },
  ];
  const top = Math.max(data.demand.value, ...bars.map((bar) => Math.max(bar.from, bar.to)));
  const y = scaleLinear()
    .domain([0, top || 1])
    .nice(3)
    .range([height - margin.bottom, margin.top]);
  const x = scaleBand()
    .domain(bars.map(({ key }) => key))
    .range([margin.left, width - margin.right])
    .paddingInner(0.28)
    .paddingOuter(0.1);
  const fills: Record<string, string> = {
    base: 'fill-wood',
    up: 'fill-rise',
    down: 'fill-drop',
    same: 'fill-wash',
    limit: 'fill-ink',
  };
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      className="block w-full"
      role="group"
      aria-label={inWords(data, number, unit)}
    >
      {y.ticks(3).map((tick) => (
        <g key={tick} aria-hidden>
          <line
            x1={margin.left}
            x2={width}
            y1={y(tick)}
            y2={y(tick)}
            className="stroke-rule"
            strokeDasharray="1 3"
          />
          <text x={margin.left - 8} y={y(tick) + 4} textAnchor="end" className="fill-soft font-mono text-xs">
            {number(tick, 3)}
          </text>
        </g>
      ))}
      {bars.map((bar, index) => {
        const left = x(bar.key) ?? 0;
        const upper = y(Math.max(bar.from, bar.to));
        const size = Math.max(Math.abs(y(bar.from) - y(bar.to)), 1.5);
        const next = bars[index + 1];
        return (
          <g
            key={bar.key}
            role="button"
            tabIndex={bar.entry < 0 ? -1 : 0}
            aria-description={`${bar.title}. Opens its ledger entry.`}
            className="cursor-pointer outline-none [&:focus-visible>rect]:stroke-accent [&:focus-visible>rect]:stroke-2"
            onClick={() => bar.entry >= 0 && onOpen(bar.entry)}
            onKeyDown={(event) => {
              if ((event.key === 'Enter' || event.key === ' ') && bar.entry >= 0) {
                event.preventDefault();
                onOpen(bar.entry);
              }
            }}
          >
            <rect
              x={left}
              y={upper}
              width={x.bandwidth()}
              height={size}
              className={`${fills[bar.kind] ?? ''} stroke-ink/60`}
              strokeWidth={0.8}
            />
            {next && next.kind !== 'limit' && (
              <line
                x1={left + x.bandwidth()}
                x2={x(next.key) ?? 0}
                y1={y(bar.to)}
                y2={y(bar.to)}
                className="stroke-soft"
                strokeDasharray="2 2"
              />
            )}
            <g>
              <text
                x={left + x.bandwidth() / 2}
                y={upper - 7}
                textAnchor="middle"
                className="fill-ink font-mono text-xs"
              >
                {bar.label}
              </text>
              <text
                x={left + x.bandwidth() / 2}
                y={height - margin.bottom + 16}
                textAnchor="middle"
                className="fill-ink text-xs"
              >
                <Symbol name={bar.symbol === '' ? 'limit' : bar.symbol} plain={bar.symbol === ''} />
              </text>
              <text
                x={left + x.bandwidth() / 2}
                y={height - margin.bottom + 30}
                textAnchor="middle"
                className="fill-soft text-[0.625rem]"
              >
                {short(bar.title, x.bandwidth())}
              </text>
            </g>
          </g>
        );
      })}
      <g aria-hidden>
        <line
          x1={margin.left}
          x2={width}
          y1={y(data.demand.value)}
          y2={y(data.demand.value)}
          className="stroke-accent"
          strokeWidth={1.75}
        />
        <text
          x={(x('limit') ?? width) - 8}
          y={y(data.demand.value) + (y(data.demand.value) > height / 2 ? -7 : 15)}
          textAnchor="end"
          className="fill-accent-ink stroke-paper font-mono text-xs"
          strokeWidth={3}
          paintOrder="stroke"
        >
          demand {number(data.demand.value, 4)} {unit}, {utilisation}
        </text>
      </g>
      <line x1={margin.left} x2={width} y1={y(0)} y2={y(0)} className="stroke-ink" />
    </svg>
  );
}

function short(title: string, width: number): string {
  const room = Math.max(6, Math.floor(width / 5.2));
  return title.length <= room ? title : `${title.slice(0, room - 1)}…`;
}

function inWords(data: CascadeData, number: CascadeProps['number'], unit: string): string {
  const steps = data.steps.map(
    ({ title, by, over }) => `${over ? 'divided by' : 'times'} ${number(over ? 1 / by : by, 4)} (${title})`,
  );
  return `${data.title}: ${data.base.title} ${number(data.base.value, 4)} ${unit}, ${steps.join(', ')}, gives ${number(data.limit.value, 4)} ${unit}; demand ${number(data.demand.value, 4)} ${unit}.`;
}
