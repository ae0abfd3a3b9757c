import { memo, useState } from 'react';
import type { Edition } from '#shared/basis/schema/index.ts';
import type { Driver, Result } from '#shared/engine/types.ts';
import { unitForReading } from '#shared/units/format.ts';
import { Section } from '#src/components/Section.tsx';
import { Cascade } from '#src/drawings/Cascade.tsx';
import { cascadeOf } from '#src/drawings/cascadeSteps.ts';
import { Drivers } from '#src/drawings/Drivers.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';
import { checkOf, entriesOf, isMain } from '../lib/ledgerView.ts';
import { LedgerTable } from './LedgerTable.tsx';
import { ReactionsTable } from './ReactionsTable.tsx';
import { useWidth } from './useWidth.ts';

interface EvidenceProps {
  result: Result;
  edition: Edition;
  drivers: readonly Driver[];
  /** Check whose evidence is open; null: the governing one. */
  chosen: string | null;
  onChoose: (check: string | null) => void;
}

/**
 * Cascade, ledger, drivers and reactions of a result. Drawn after the verdict, which answers each keystroke;
 * nothing here renders again until its result is another.
 */
export const Evidence = memo(function Evidence({
  result,
  edition,
  drivers,
  chosen,
  onChoose,
}: EvidenceProps) {
  const numbers = useNumbers();
  const [entry, setEntry] = useState<number | null>(null);
  const [everything, setEverything] = useState(false);
  const [holder, width] = useWidth<HTMLDivElement>(760);
  const check = result.checks.find(({ id }) => id === chosen) ?? result.checks[0];
  const cascade = check ? cascadeOf(result, check) : null;
  const behind = check ? entriesOf(result.ledger, check.entry) : [];
  const open = (n: number | null) => {
    setEntry(n);
    if (n === null) return;
    if (!behind.some((each) => each.n === n)) onChoose(checkOf(result, n));
    requestAnimationFrame(() => document.getElementById(`entry-${n}`)?.scrollIntoView({ block: 'nearest' }));
  };
  return (
    <>
      {cascade && check && (
        <Section
          title={`Cascade, ${check.title.toLowerCase()}`}
          note={`from ${cascade.base.title.toLowerCase()} to ${cascade.limit.title.toLowerCase()}, the demand across`}
        >
          <div ref={holder} className="overflow-x-auto">
            <Cascade
              data={cascade}
              width={Math.max(width, 90 * (cascade.steps.length + 2))}
              number={numbers.digits}
              unit={unitForReading(cascade.unit)}
              utilisation={check.utilisation === null ? '–' : numbers.decimals(check.utilisation, 2)}
              onOpen={open}
            />
          </div>
        </Section>
      )}
      {check && (
        <Section
          title={`Ledger, ${check.title.toLowerCase()}`}
          note={`${behind.length} entries, from the check down to raw inputs`}
          actions={
            <button
              type="button"
              onClick={() => setEverything(!everything)}
              aria-pressed={everything}
              className="min-h-6 text-accent-ink hover:underline"
            >
              {everything ? 'Only what decides' : 'Open the whole ledger'}
            </button>
          }
        >
          <LedgerTable
            entries={everything ? behind : behind.filter((each) => isMain(each) || each.n === entry)}
            result={result}
            edition={edition}
            drivers={check.id === result.verdict.check ? drivers : []}
            open={entry}
            onOpen={open}
          />
        </Section>
      )}
      {typeof result.verdict.utilisation === 'number' && drivers.length > 0 && (
        <Section title="Drivers" note="what moves the governing utilisation most">
          <Drivers
            drivers={drivers}
            utilisation={result.verdict.utilisation}
            number={numbers.digits}
            onOpen={open}
          />
        </Section>
      )}
      {result.reactions.length > 0 && <ReactionsTable result={result} edition={edition} />}
    </>
  );
});
