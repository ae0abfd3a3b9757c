import { useMemo, useState } from 'react';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import type { Plan, StockSection } from '#shared/engine/types.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { verdictLook } from '#src/components/StateMark.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';
import { cellKey, sectionTable } from '../lib/sectionTable.ts';
import { useSliced } from '../lib/useSliced.ts';

interface FindSectionProps {
  plan: Plan;
  edition: Edition;
  member: Member;
  stock: readonly StockSection[];
  readOnly: boolean;
  onTake: (section: StockSection, grade: string) => void;
  onClose: () => void;
}

const ranks = [
  { id: 'depth', title: 'least depth' },
  { id: 'volume', title: 'least volume' },
  { id: 'cost', title: 'least cost' },
] as const;
type Rank = (typeof ranks)[number]['id'];

/** Find a section: every stock size in the chosen grades with its utilisation, and the best that pass. */
export default function FindSection({
  plan,
  edition,
  member,
  stock,
  readOnly,
  onTake,
  onClose,
}: FindSectionProps) {
  const numbers = useNumbers();
  const [rank, setRank] = useState<Rank>('depth');
  const [grades, setGrades] = useState<readonly string[]>([member.grade]);
  const [passing, setPassing] = useState(false);
  const start = useMemo(
    () => () => sectionTable(plan, member, stock, grades, rank),
    [plan, member, stock, grades, rank],
  );
  const { share, result } = useSliced(stock.length && grades.length ? start : null);
  const gradeTitle = (id: string) => edition.grades.rows.find((row) => row.id === id)?.title ?? id;
  const size = ({ b, h }: { b: number; h: number }) => `${numbers.exact(b)} × ${numbers.exact(h)}`;
  const priced = stock.some(({ pricePerMetre }) => pricePerMetre !== undefined);
  const passes = (id: string, grade: string) => {
    const word = result?.cells.get(cellKey(id, grade))?.word;
    return word === 'passes' || word === 'close';
  };
  const rows = passing ? stock.filter(({ id }) => grades.some((grade) => passes(id, grade))) : stock;
  return (
    <Dialog title="Find a section" open onClose={onClose} wide>
      {stock.length === 0 ? (
        <EmptyState>
          The project has no stock list. Pick one on the project’s page, and its sections are searched here.
        </EmptyState>
      ) : (
        <>
          <div className="mb-4 flex flex-wrap items-end gap-x-6 gap-y-3 text-sm">
            <label className="flex items-center gap-2">
              Best is
              <select
                value={rank}
                onChange={(event) => setRank(event.target.value as Rank)}
                className="rounded border border-pencil bg-raised px-2 py-1"
              >
                {ranks.map(({ id, title }) => (
                  <option key={id} value={id} disabled={id === 'cost' && !priced}>
                    {title}
                  </option>
                ))}
              </select>
            </label>
            <label className="flex items-center gap-2">
              Grades
              <select
                multiple
                size={3}
                value={[...grades]}
                onChange={(event) => setGrades([...event.target.selectedOptions].map(({ value }) => value))}
                className="min-w-44 rounded border border-pencil bg-raised px-2 py-1"
              >
                {edition.grades.rows.map(({ id, title }) => (
                  <option key={id} value={id}>
                    {title}
                  </option>
                ))}
              </select>
            </label>
            <label className="flex min-h-6 items-center gap-2">
              <input
                type="checkbox"
                checked={passing}
                onChange={(event) => setPassing(event.target.checked)}
              />
              only what passes
            </label>
            <p role="status" className="text-soft">
              {result
                ? `${result.ranked.length} of ${result.cells.size} pass`
                : `Searching, ${numbers.decimals(share * 100, 0)} %`}
            </p>
          </div>
          {result && (
            <div className="grid gap-6 md:grid-cols-[16rem_1fr]">
              <ol className="text-sm" aria-label="Best that pass">
                {result.ranked.length === 0 && (
                  <li className="text-soft">
                    Nothing in stock passes in these grades. Try another grade, or more pieces.
                  </li>
                )}
                {result.ranked.slice(0, 10).map(({ section, grade, utilisation, word, cost }) => (
                  <li
                    key={cellKey(section.id, grade)}
                    className="flex items-baseline gap-2 border-b border-rule py-1"
                  >
                    <span className="font-mono font-medium">{size(section.actual)}</span>
                    <span className="text-soft">{gradeTitle(grade)}</span>
                    <span className={`ml-auto font-mono ${verdictLook[word].text}`}>
                      {utilisation === null ? '–' : numbers.decimals(utilisation, 2)}
                    </span>
                    {cost !== undefined && (
                      <span className="font-mono text-xs text-soft">{numbers.decimals(cost, 2)}/m</span>
                    )}
                    {!readOnly && (
                      <Button
                        kind="quiet"
                        onClick={() => onTake(section, grade)}
                        aria-label={`Take ${size(section.actual)} in ${gradeTitle(grade)}`}
                      >
                        Take
                      </Button>
                    )}
                  </li>
                ))}
              </ol>
              <div
                className="max-h-[55dvh] overflow-auto"
                tabIndex={0}
                role="group"
                aria-label="Sizes by grade, table"
              >
                <table className="w-full text-sm">
                  <thead className="sticky top-0 bg-paper">
                    <tr className="border-b border-ink text-xs text-soft">
                      <th scope="col" className="py-1 text-left font-normal">
                        Finished
                      </th>
                      <th scope="col" className="py-1 text-left font-normal">
                        Ordered
                      </th>
                      {grades.map((grade) => (
                        <th key={grade} scope="col" className="py-1 text-right font-normal">
                          {gradeTitle(grade)}
                        </th>
                      ))}
                    </tr>
                  </thead>
                  <tbody>
                    {rows.map((section) => (
                      <tr key={section.id} className="border-b border-rule">
                        <th scope="row" className="py-0.5 text-left font-mono font-normal">
                          {size(section.actual)}
                        </th>
                        <td className="py-0.5 font-mono text-soft">{size(section.nominal)}</td>
                        {grades.map((grade) => {
                          const cell = result.cells.get(cellKey(section.id, grade));
                          if (!cell)
                            return (
                              <td key={grade} className="py-0.5 text-right text-soft">
                                not sold
                              </td>
                            );
                          const look = verdictLook[cell.word];
                          return (
                            <td
                              key={grade}
                              className={`py-0.5 text-right font-mono tabular-nums ${look.text}`}
                            >
                              {cell.utilisation === null ? '–' : numbers.decimals(cell.utilisation, 2)}{' '}
                              <span aria-hidden>{look.sign}</span>
                              <span className="sr-only">{look.word}</span>
                            </td>
                          );
                        })}
                      </tr>
                    ))}
                  </tbody>
                </table>
              </div>
            </div>
          )}
        </>
      )}
    </Dialog>
  );
}
