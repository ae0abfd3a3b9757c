import { useState } from 'react';
import type { Edition } from '#shared/basis/schema/index.ts';
import type { Driver, LedgerEntry, Result } from '#shared/engine/types.ts';
import { unitForReading } from '#shared/units/format.ts';
import { SymbolText } from '#src/components/Symbol.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';
import { choosingInWords, type Wording } from '../lib/evidenceWords.ts';
import { changesNothing, effectOf } from '../lib/ledgerView.ts';
import { LedgerDetail } from './LedgerDetail.tsx';

interface LedgerTableProps {
  entries: readonly LedgerEntry[];
  result: Result;
  edition: Edition;
  drivers: readonly Driver[];
  open: number | null;
  onOpen: (entry: number | null) => void;
}

/** How facts and options of an edition are called, for reasons in words. */
export function useWording(edition: Edition): Wording {
  const numbers = useNumbers();
  const options = [...edition.choices.map(({ symbol, title, options: list }) => ({ symbol, title, list }))];
  return {
    title: (fact) =>
      fact === 'duration'
        ? 'duration of the combination'
        : (options.find(({ symbol }) => symbol === fact)?.title ?? fact),
    option: (fact, id) => {
      const own = options
        .find(({ symbol }) => symbol === fact)
        ?.list.find((option) => option.id === id)?.title;
      const duration = edition.durations.find((each) => each.id === id)?.title;
      const grade = fact === 'grade' ? edition.grades.rows.find((row) => row.id === id)?.title : undefined;
      const plain = (text: string | undefined) =>
        text && /^[A-Z][a-z]/.test(text) ? text[0]?.toLowerCase() + text.slice(1) : text;
      return plain(own) ?? (fact.includes('duration') ? duration : undefined) ?? grade ?? id;
    },
    number: (value) => numbers.digits(value, 6),
  };
}

/** Why an entry has its value, in a line. */
export function becauseOf(entry: LedgerEntry, wording: Wording): string {
  if (entry.departure) return `set by hand: ${entry.departure.reason}`;
  if (entry.kind === 'grade') return 'row of the grade table';
  if (entry.lookup) return entry.lookup.found;
  if (entry.choosing && entry.choosing.tried.length > 0) return choosingInWords(entry.choosing, wording);
  if (entry.formula !== undefined) return entry.formula;
  if (entry.kind === 'input')
    return entry.pointer.endsWith('/default') ? 'usual value of the edition' : 'given for the member';
  return entry.kind === 'effect' ? 'from the analysis' : '';
}

/** The ledger as a table; each line opens to its formula, numbers, tried cases and source. */
export function LedgerTable({ entries, result, edition, drivers, open, onOpen }: LedgerTableProps) {
  const numbers = useNumbers();
  const wording = useWording(edition);
  const [folded, setFolded] = useState(true);
  const hidden = folded ? entries.filter((entry) => changesNothing(entry) && entry.n !== open).length : 0;
  return (
    <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Ledger, table">
      <table className="w-full min-w-[44rem] text-sm">
        <thead>
          <tr className="border-b border-ink text-left text-xs text-soft">
            <th scope="col" className="w-20 py-1 font-normal">
              Symbol
            </th>
            <th scope="col" className="py-1 font-normal">
              Entry
            </th>
            <th scope="col" className="w-36 py-1 pr-4 text-right font-normal">
              Value
            </th>
            <th scope="col" className="py-1 font-normal">
              Chosen because
            </th>
            <th scope="col" className="w-20 py-1 font-normal">
              Clause
            </th>
            <th scope="col" className="w-18 py-1 text-right font-normal">
              If it were 1
            </th>
          </tr>
        </thead>
        {entries
          .filter((entry) => !folded || !changesNothing(entry) || entry.n === open)
          .map((entry) => {
            const option = typeof entry.value === 'string' ? wording.option(entry.symbol, entry.value) : '';
            const effect = effectOf(drivers, entry.n);
            return (
              <tbody key={entry.n} id={`entry-${entry.n}`} className="border-b border-rule">
                <tr
                  className={`align-baseline hover:bg-wash ${entry.kind === 'check' ? 'font-semibold' : ''}`}
                >
                  <td className="py-1.5">
                    <SymbolText name={entry.symbol} />
                  </td>
                  <td className="py-1.5 pr-3">
                    <button
                      type="button"
                      aria-expanded={open === entry.n}
                      onClick={() => onOpen(open === entry.n ? null : entry.n)}
                      className="text-left hover:underline"
                    >
                      {entry.title}
                    </button>
                    {entry.departure && <span className="ml-2 text-xs text-close">◇ departure</span>}
                  </td>
                  <td className="py-1.5 pr-4 text-right font-mono font-medium whitespace-nowrap tabular-nums">
                    {entry.value === null
                      ? '–'
                      : typeof entry.value === 'number'
                        ? numbers.digits(entry.value, 4)
                        : option}{' '}
                    <span className="text-xs font-normal text-soft">{unitForReading(entry.unit)}</span>
                  </td>
                  <td className="py-1.5 pr-3 font-normal">
                    {entry.refused ?? becauseOf(entry, wording)}
                    {entry.standing && !entry.standing.verified && (
                      <span className="ml-2 text-xs whitespace-nowrap text-close">◆ unverified</span>
                    )}
                  </td>
                  <td className="py-1.5 font-normal">{entry.reference}</td>
                  <td className="py-1.5 text-right font-mono font-normal tabular-nums">
                    {effect === undefined ? '·' : numbers.decimals(effect, 2)}
                  </td>
                </tr>
                {open === entry.n && (
                  <tr>
                    <td colSpan={6} className="bg-raised px-3 py-3">
                      <LedgerDetail entry={entry} result={result} wording={wording} onOpen={onOpen} />
                    </td>
                  </tr>
                )}
              </tbody>
            );
          })}
      </table>
      {(hidden > 0 || !folded) && (
        <button
          type="button"
          onClick={() => setFolded(!folded)}
          className="mt-1 min-h-6 text-sm text-accent-ink hover:underline"
        >
          {folded ? `Show ${hidden} equal to 1` : 'Fold those equal to 1'}
        </button>
      )}
    </div>
  );
}
