import type { RequiredDepth, StockSection } from '#shared/engine/types.ts';
import { unitForReading } from '#shared/units/format.ts';
import { Button } from '#src/components/Button.tsx';
import { Section } from '#src/components/Section.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';

interface DepthPanelProps {
  depth: RequiredDepth;
  breadth: number;
  stock: readonly StockSection[];
  next: StockSection | null;
  readOnly: boolean;
  onTake: (section: StockSection) => void;
  onFind: () => void;
}

/** The least depth by each check on its own, exact and rounded up, and the next section in stock. */
export function DepthPanel({ depth, breadth, stock, next, readOnly, onTake, onFind }: DepthPanelProps) {
  const numbers = useNumbers();
  const unit = unitForReading(depth.unit);
  // The least depth the engine looks at: a check that passes there doesn't depend on the depth.
  const smallest = depth.unit === 'mm' ? 1 : 1 / 16;
  const inStock = (least: number | null) =>
    least === null
      ? undefined
      : stock
          .filter(({ actual }) => Math.abs(actual.b - breadth) < 1e-6 && actual.h >= least)
          .sort((a, b) => a.actual.h - b.actual.h)[0];
  const rows = [
    ...depth.byCheck.map((row) => ({ ...row, key: row.check })),
    { ...depth.all, key: 'all', title: 'All together' },
  ];
  return (
    <Section
      title="Required depth"
      note={`for a breadth of ${numbers.exact(breadth)} ${unit}, each check on its own`}
      actions={
        <>
          <Button kind="quiet" onClick={onFind}>
            Find a section
          </Button>
          {next && !readOnly && (
            <Button kind="quiet" onClick={() => onTake(next)}>
              Take {numbers.exact(next.actual.b)} × {numbers.exact(next.actual.h)}
            </Button>
          )}
        </>
      }
    >
      <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Required depth, table">
        <table className="w-full min-w-md text-sm">
          <thead>
            <tr className="border-b border-ink text-left text-xs text-soft">
              <th scope="col" className="py-1 font-normal">
                By
              </th>
              <th scope="col" className="py-1 text-right font-normal">
                Exact, {unit}
              </th>
              <th scope="col" className="py-1 text-right font-normal">
                Rounded up, {unit}
              </th>
              <th scope="col" className="py-1 text-right font-normal">
                In stock, finished
              </th>
              <th scope="col" className="py-1 text-right font-normal">
                Ordered
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => {
              const section = row.key === 'all' ? (next ?? undefined) : inStock(row.rounded);
              return (
                <tr
                  key={row.key}
                  className={`border-b border-rule ${row.key === 'all' ? 'font-semibold' : ''}`}
                >
                  <th scope="row" className="py-1 text-left font-[inherit]">
                    {row.title}
                  </th>
                  {row.exact === null ? (
                    <td colSpan={2} className="py-1 text-right text-soft">
                      {row.why ?? 'no depth is enough'}
                    </td>
                  ) : (
                    <>
                      <td className="py-1 text-right font-mono tabular-nums">
                        {row.exact <= smallest ? 'any' : numbers.decimals(row.exact, 2)}
                      </td>
                      <td className="py-1 text-right font-mono tabular-nums">
                        {row.rounded === null || row.exact <= smallest ? '–' : numbers.exact(row.rounded)}
                      </td>
                    </>
                  )}
                  <td className="py-1 text-right font-mono tabular-nums">
                    {section
                      ? `${numbers.exact(section.actual.b)} × ${numbers.exact(section.actual.h)}`
                      : '–'}
                  </td>
                  <td className="py-1 text-right font-mono tabular-nums text-soft">
                    {section
                      ? `${numbers.exact(section.nominal.b)} × ${numbers.exact(section.nominal.h)}`
                      : '–'}
                  </td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
      <p className="mt-1 text-xs text-soft">
        The last line is what passes every check. A deeper section can meet another limit, such as depth to
        breadth.
      </p>
    </Section>
  );
}
