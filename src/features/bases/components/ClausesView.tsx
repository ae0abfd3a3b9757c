import { useState } from 'react';
import type { Case, Clause, Edition } from '#shared/basis/schema/index.ts';
import { unitForReading } from '#shared/units/format.ts';
import { Mathematics } from '#src/components/Mathematics.tsx';
import { SymbolText } from '#src/components/Symbol.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';
import { conditionInWords, factTitle } from '../conditionWords.ts';

const kinds = [
  ['factor', 'Factors'],
  ['limit', 'Limits'],
  ['quantity', 'Quantities'],
  ['class', 'Classes'],
] as const;

/** Clauses by kind; each opens to its cases in words. */
export function ClausesView({ edition }: { edition: Edition }) {
  const [search, setSearch] = useState('');
  const words = search.toLowerCase().split(/\s+/).filter(Boolean);
  const wanted = edition.clauses.filter(({ symbol, title, reference }) =>
    words.every((word) => `${symbol} ${title} ${reference}`.toLowerCase().includes(word)),
  );
  return (
    <>
      <input
        type="search"
        aria-label="Find a clause"
        placeholder="Find a clause"
        value={search}
        onChange={(event) => setSearch(event.target.value)}
        className="no-print mb-2 min-h-8 w-64 rounded border border-pencil bg-raised px-2.5"
      />
      {wanted.length === 0 && (
        <p className="py-2 text-soft" role="status">
          {search ? `No clause matches “${search.trim()}”.` : 'No clause yet.'}
        </p>
      )}
      {kinds.map(([kind, title]) => {
        const clauses = wanted.filter((clause) => clause.kind === kind);
        return clauses.length === 0 ? null : (
          <div key={kind} className="mb-4">
            <h3 className="mt-3 font-sans text-xs font-semibold tracking-wide text-soft uppercase">
              {title}
            </h3>
            {clauses.map((clause) => (
              <ClauseView key={clause.id} clause={clause} edition={edition} />
            ))}
          </div>
        );
      })}
    </>
  );
}

function ClauseView({ clause, edition }: { clause: Clause; edition: Edition }) {
  const [open, setOpen] = useState(false);
  return (
    <details
      className="border-b border-rule [contain-intrinsic-size:auto_2.6rem] [content-visibility:auto]"
      onToggle={(event) => setOpen(event.currentTarget.open)}
    >
      <summary className="flex items-baseline gap-3 py-1.5">
        <span className="w-16 shrink-0 text-lg">
          <SymbolText name={clause.symbol} />
        </span>
        <span className="font-medium">{clause.title}</span>
        <span className="text-sm text-soft">{clause.reference}</span>
        <span className="ml-auto text-sm text-soft">
          {clause.cases.length === 1 ? '1 case' : `${clause.cases.length} cases`}{' '}
          <span className="font-mono">{unitForReading(clause.unit)}</span>
        </span>
      </summary>
      {open && (
        <ol className="mb-3 ml-16">
          {clause.cases.map((each, index) => (
            <CaseView key={each.id} each={each} index={index} edition={edition} />
          ))}
        </ol>
      )}
    </details>
  );
}

function CaseView({ each, index, edition }: { each: Case; index: number; edition: Edition }) {
  const numbers = useNumbers();
  const source =
    edition.sources.find(({ id }) => id === each.provenance.source)?.title ?? each.provenance.source;
  return (
    <li className="grid grid-cols-[1.5rem_1fr_auto] items-baseline gap-x-3 border-t border-rule py-1.5">
      <span className="font-mono text-sm text-soft">{index + 1}</span>
      <span>
        {each.when ? (
          <>
            <span className="text-soft">when</span> {conditionInWords(edition, each.when, numbers.exact)}
          </>
        ) : (
          <span className="text-soft">otherwise</span>
        )}
        <span className="block text-xs text-soft">
          {source}
          {each.provenance.place ? `, ${each.provenance.place}` : ''};{' '}
          {each.provenance.standing === 'memory' ? 'from memory, verify' : each.provenance.standing}
          {each.provenance.verified ? `; verified by ${each.provenance.verified.by}` : ''}
        </span>
      </span>
      <span className="text-right">
        <OutcomeView each={each} edition={edition} />
      </span>
    </li>
  );
}

function OutcomeView({ each: { gives }, edition }: { each: Case; edition: Edition }) {
  const numbers = useNumbers();
  switch (gives.kind) {
    case 'constant':
      return <span className="font-mono font-medium">{numbers.exact(gives.value)}</span>;
    case 'word':
      return <em>{gives.value}</em>;
    case 'formula':
      return <Mathematics formula={gives.formula} />;
    case 'table': {
      const table = edition.tables.find(({ id }) => id === gives.table);
      const keys = gives.keys.map((key) =>
        'word' in key ? key.word : 'fact' in key ? factTitle(edition, key.fact) : key.formula,
      );
      return (
        <>
          table “{table?.title ?? gives.table}” by {keys.join(', ')}
        </>
      );
    }
    case 'spanLimit': {
      const part =
        gives.divisor === undefined
          ? `${numbers.exact(gives.fraction ?? 0)} × span`
          : `span / ${numbers.exact(gives.divisor)}`;
      return (
        <>
          {part}
          {gives.cap === undefined ? '' : `, at most ${numbers.exact(gives.cap)}`}
        </>
      );
    }
    case 'refuse':
      return <span className="text-fail">refused: {gives.reason}</span>;
  }
}
