import type { Edition, Grade } from '#shared/basis/schema/index.ts';
import { unitForReading } from '#shared/units/format.ts';
import { SymbolText } from '#src/components/Symbol.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';

const standings = {
  seen: 'seen in the source',
  memory: 'from memory, verify',
  decision: 'decided by the firm',
  invented: 'invented',
};

/** The grade table: units in the header, unverified values marked, the source of each on hover and focus. */
export function GradesView({ edition }: { edition: Edition }) {
  const numbers = useNumbers();
  const { columns, rows } = edition.grades;
  const source = (row: Grade, symbol: string) => {
    const own = row.cells?.[symbol] ?? row.provenance;
    const title = edition.sources.find(({ id }) => id === own.source)?.title ?? own.source;
    return {
      own,
      words: `${title}${own.place ? `, ${own.place}` : ''}; ${standings[own.standing]}${own.verified ? `; verified by ${own.verified.by}` : '; unverified'}`,
    };
  };
  return (
    <div className="max-h-[32rem] overflow-auto" tabIndex={0} role="group" aria-label="Grades, table">
      <table className="w-full text-sm">
        <thead className="sticky top-0 bg-paper">
          <tr className="border-b border-ink text-xs text-soft">
            <th scope="col" className="py-1.5 pr-4 text-left align-bottom font-normal">
              Grade
            </th>
            {columns.map(({ symbol, title, unit }) => (
              <th
                key={symbol}
                scope="col"
                className="max-w-28 py-1.5 pl-4 text-right align-bottom font-normal"
                title={title}
              >
                <span className="block text-ink">{title}</span>
                <SymbolText name={symbol} /> <span className="font-mono">{unitForReading(unit)}</span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id} className="border-b border-rule hover:bg-wash/60">
              <th scope="row" className="py-1 pr-4 text-left font-semibold whitespace-nowrap">
                {row.title}
              </th>
              {columns.map(({ symbol }) => {
                const value = row.values[symbol];
                const { own, words } = source(row, symbol);
                return (
                  <td
                    key={symbol}
                    className="py-1 pl-4 text-right font-mono whitespace-nowrap tabular-nums"
                    title={value === undefined ? undefined : words}
                  >
                    {value === undefined ? (
                      <span className="text-pencil">·</span>
                    ) : typeof value === 'number' ? (
                      numbers.exact(value)
                    ) : (
                      value.values.map((v) => numbers.exact(v)).join(' / ')
                    )}
                    {value !== undefined && !own.verified && (
                      <span
                        aria-hidden
                        className={own.standing === 'memory' ? 'ml-1 text-close' : 'ml-1 text-pencil'}
                      >
                        ◆
                      </span>
                    )}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
      <p className="py-2 text-xs text-soft">
        ◆ not verified by a second person; in resin, written from memory. Values by size are set with a
        stroke, smallest size first.
      </p>
    </div>
  );
}
