import type { Driver } from '#shared/engine/types.ts';
import { SymbolText } from '#src/components/Symbol.tsx';

interface DriversProps {
  drivers: readonly Driver[];
  utilisation: number;
  number: (value: number, digits: number) => string;
  onOpen: (entry: number) => void;
}

/**
 * Drivers: factors ranked by how far the governing utilisation would move without them, inputs by its
 * relative change per relative change of theirs. A bar and its number on each line.
 */
export function Drivers({ drivers, utilisation, number, onOpen }: DriversProps) {
  const factors = drivers.filter(
    ({ kind, effect }) => kind === 'factor' && Math.abs(effect - utilisation) > 1e-9,
  );
  const inputs = drivers.filter(({ kind, effect }) => kind === 'input' && Math.abs(effect) > 5e-3);
  const widest = Math.max(...factors.map(({ effect }) => Math.abs(effect - utilisation)), 1e-9);
  const steepest = Math.max(...inputs.map(({ effect }) => Math.abs(effect)), 1e-9);
  return (
    <div className="grid gap-6 md:grid-cols-2">
      <DriverList
        title="Without the factor, the utilisation would be"
        items={factors}
        share={(d) => (d.effect - utilisation) / widest}
        shown={(d) => number(d.effect, 3)}
        onOpen={onOpen}
      />
      <DriverList
        title="1 % more of the input moves it by"
        items={inputs}
        share={(d) => d.effect / steepest}
        shown={(d) => `${d.effect > 0 ? '+' : ''}${number(d.effect, 2)} %`}
        onOpen={onOpen}
      />
    </div>
  );
}

function DriverList(props: {
  title: string;
  items: readonly Driver[];
  share: (driver: Driver) => number;
  shown: (driver: Driver) => string;
  onOpen: (entry: number) => void;
}) {
  const { title, items, share, shown, onOpen } = props;
  return (
    <div>
      <p className="mb-1 text-xs text-soft">{title}</p>
      {items.length === 0 && <p className="text-sm text-soft">Nothing moves it.</p>}
      <ul>
        {items.slice(0, 8).map((driver) => {
          const part = share(driver);
          return (
            <li key={driver.entry} className="border-b border-rule">
              <button
                type="button"
                onClick={() => onOpen(driver.entry)}
                className="grid w-full cursor-pointer grid-cols-[3.5rem_1fr_5rem_4.5rem] items-center gap-2 py-1 text-left text-sm hover:bg-wash"
              >
                <SymbolText name={driver.symbol} />
                <span className="truncate text-ink">{driver.title}</span>
                <svg viewBox="-50 0 100 8" className="h-2" aria-hidden>
                  <line x1={0} x2={0} y1={0} y2={8} className="stroke-pencil" />
                  <rect
                    x={Math.min(0, part * 50)}
                    y={1.5}
                    width={Math.abs(part) * 50}
                    height={5}
                    className={part > 0 ? 'fill-drop' : 'fill-rise'}
                  />
                </svg>
                <span className="text-right font-mono tabular-nums">{shown(driver)}</span>
              </button>
            </li>
          );
        })}
      </ul>
    </div>
  );
}
