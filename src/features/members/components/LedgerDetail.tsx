import type { Evidence, LedgerEntry, Result } from '#shared/engine/types.ts';
import { unitForReading } from '#shared/units/format.ts';
import { SymbolText } from '#src/components/Symbol.tsx';
import { day } from '#src/lib/format/time.ts';
import type { Wording } from '../lib/evidenceWords.ts';

interface LedgerDetailProps {
  entry: LedgerEntry;
  result: Result;
  wording: Wording;
  onOpen: (entry: number) => void;
}

const operators: Record<string, string> = {
  equal: 'is',
  notEqual: 'is not',
  in: 'is one of',
  notIn: 'is none of',
  lessThan: 'below',
  lessThanInclusive: 'at most',
  greaterThan: 'above',
  greaterThanInclusive: 'at least',
};
const standings = {
  seen: 'seen in the source',
  memory: 'written from memory, to be verified',
  decision: 'decided by the firm',
  invented: 'invented for demonstration',
};

/** Everything an entry knows: exact value, formula, look-up, tried cases, what it used, source. */
export function LedgerDetail({ entry, result, wording, onOpen }: LedgerDetailProps) {
  const uses = Object.entries(entry.uses);
  const { standing, choosing, lookup, departure } = entry;
  return (
    <dl className="grid gap-x-4 gap-y-1.5 text-sm md:grid-cols-[8rem_1fr]">
      {typeof entry.value === 'number' && (
        <Line term="Exact value">
          <span className="font-mono break-all">
            {String(entry.value)} {unitForReading(entry.unit)}
          </span>
        </Line>
      )}
      {entry.formula !== undefined && (
        <Line term="Formula">
          <span className="font-mono break-words">
            {entry.symbol} = {entry.formula}
          </span>
        </Line>
      )}
      {entry.substituted !== undefined && (
        <Line term="With numbers">
          <span className="font-mono break-words">= {entry.substituted}</span>
        </Line>
      )}
      {lookup && (
        <Line term="Table">
          {lookup.table}, {lookup.keys.map(String).join(', ')}: {lookup.found}
        </Line>
      )}
      {departure && (
        <Line term="Departure">
          {departure.reason} The edition gives <span className="font-mono">{String(departure.stored)}</span>.{' '}
          {departure.approvedBy ? `Approved by ${departure.approvedBy}.` : 'Not approved yet.'}
        </Line>
      )}
      {choosing && choosing.tried.length > 0 && (
        <Line term="Cases tried">
          <ol className="space-y-1">
            {choosing.tried.map((tried) => (
              <li key={tried.case}>
                <span className={tried.holds ? 'font-semibold text-pass' : 'text-soft'}>
                  {tried.holds ? '✓' : '✕'} {tried.case}
                </span>
                <EvidenceTree evidence={tried.evidence} wording={wording} />
              </li>
            ))}
            {!choosing.tried.some(({ holds }) => holds) && (
              <li className="font-semibold text-pass">
                ✓ {choosing.title ?? choosing.case}, since none before applies
              </li>
            )}
          </ol>
        </Line>
      )}
      {uses.length > 0 && (
        <Line term="Used">
          <ul className="flex flex-wrap gap-x-4 gap-y-1">
            {uses.map(([symbol, n]) => (
              <li key={symbol}>
                <button
                  type="button"
                  onClick={() => onOpen(n)}
                  className="min-h-6 text-accent-ink hover:underline"
                >
                  <SymbolText name={symbol} /> {result.ledger[n]?.title}
                </button>
              </li>
            ))}
          </ul>
        </Line>
      )}
      {standing && (
        <Line term="Source">
          {standing.sourceTitle}
          {standing.place ? `, ${standing.place}` : ''}; {standings[standing.standing]}.{' '}
          {standing.verified
            ? `Verified by ${standing.verified.by} on ${day(standing.verified.on)}.`
            : 'Not verified by a second person.'}
          {standing.note ? ` ${standing.note}` : ''}
        </Line>
      )}
    </dl>
  );
}

function Line({ term, children }: { term: string; children: React.ReactNode }) {
  return (
    <>
      <dt className="text-soft">{term}</dt>
      <dd className="min-w-0">{children}</dd>
    </>
  );
}

function EvidenceTree({ evidence, wording }: { evidence: Evidence; wording: Wording }) {
  if ('fact' in evidence) {
    const show = (value: unknown): string =>
      typeof value === 'number'
        ? wording.number(value)
        : typeof value === 'string'
          ? wording.option(evidence.fact, value)
          : Array.isArray(value)
            ? value.map(show).join(', ')
            : value === null || value === undefined
              ? 'not given'
              : wording.title((value as { fact: string }).fact);
    return (
      <span className="ml-2 text-soft">
        {wording.title(evidence.fact)} {operators[evidence.operator]} {show(evidence.value)}; it is{' '}
        <strong className="text-ink">{show(evidence.actual)}</strong>
      </span>
    );
  }
  const name = { all: 'all of', any: 'any of', not: 'not' }[evidence.group];
  return (
    <div className="ml-5 border-l border-rule pl-3">
      <span className="text-xs text-soft">{name}</span>
      {evidence.of.map((child, index) => (
        <div key={index}>
          <span aria-hidden className={child.holds ? 'text-pass' : 'text-soft'}>
            {child.holds ? '✓' : '✕'}
          </span>
          <EvidenceTree evidence={child} wording={wording} />
        </div>
      ))}
    </div>
  );
}
