import { useId, useState } from 'react';
import { parseFormula } from '#shared/basis/formula/parse.ts';
import { builtInFacts } from '#shared/basis/facts.ts';
import type { Case, Edition, Outcome } from '#shared/basis/schema/index.ts';
import { NumberBox } from './NumberBox.tsx';

interface OutcomeEditorProps {
  each: Case;
  edition: Edition;
  readOnly: boolean;
  onChange: (gives: Outcome) => void;
}

const kinds = [
  ['constant', 'number'],
  ['formula', 'formula'],
  ['word', 'word'],
  ['table', 'table'],
  ['spanLimit', 'part of the span'],
  ['refuse', 'refused'],
] as const;
const box = 'rounded border border-pencil bg-raised px-1.5 py-0.5 text-sm';

function fresh(kind: Outcome['kind'], edition: Edition): Outcome {
  const [table] = edition.tables;
  switch (kind) {
    case 'constant':
      return { kind, value: 1 };
    case 'formula':
      return { kind, formula: '1' };
    case 'word':
      return { kind, value: 'word' };
    case 'table':
      return { kind, table: table?.id ?? '', keys: (table?.keys ?? []).map(() => ({ fact: 'h' })) };
    case 'spanLimit':
      return { kind, divisor: 300 };
    case 'refuse':
      return { kind, reason: 'Not allowed.' };
  }
}

/** What a case gives: a number, a word, a formula with its symbols completed, a table, a part of the span, or a refusal. */
export function OutcomeEditor({ each: { gives }, edition, readOnly, onChange }: OutcomeEditorProps) {
  return (
    <fieldset disabled={readOnly} className="flex flex-wrap items-center gap-1.5">
      <legend className="sr-only">What the case gives</legend>
      <select
        aria-label="Kind of outcome"
        value={gives.kind}
        onChange={(event) => onChange(fresh(event.target.value as Outcome['kind'], edition))}
        className={box}
      >
        {kinds.map(([id, title]) => (
          <option key={id} value={id}>
            {title}
          </option>
        ))}
      </select>
      {gives.kind === 'constant' && (
        <NumberBox
          label="Number"
          value={gives.value}
          onChange={(value) => onChange({ kind: 'constant', value })}
        />
      )}
      {gives.kind === 'word' && (
        <input
          aria-label="Word"
          value={gives.value}
          maxLength={64}
          onChange={(event) => event.target.value && onChange({ kind: 'word', value: event.target.value })}
          className={box}
        />
      )}
      {gives.kind === 'formula' && (
        <FormulaBox
          formula={gives.formula}
          edition={edition}
          onChange={(formula) => onChange({ kind: 'formula', formula })}
        />
      )}
      {gives.kind === 'table' && (
        <select
          aria-label="Table"
          value={gives.table}
          onChange={(event) => onChange({ ...gives, table: event.target.value })}
          className={`${box} max-w-64`}
        >
          {edition.tables.map(({ id, title }) => (
            <option key={id} value={id}>
              {title}
            </option>
          ))}
        </select>
      )}
      {gives.kind === 'spanLimit' && (
        <>
          <span className="text-sm text-soft">{gives.divisor === undefined ? 'span ×' : 'span /'}</span>
          <NumberBox
            label="Part of the span"
            value={gives.divisor ?? gives.fraction ?? 1}
            onChange={(value) =>
              value > 0 &&
              onChange({
                ...gives,
                ...(gives.divisor === undefined ? { fraction: value } : { divisor: value }),
              })
            }
          />
          {gives.cap !== undefined && (
            <>
              <span className="text-sm text-soft">at most</span>
              <NumberBox
                label="At most"
                value={gives.cap}
                onChange={(cap) => cap > 0 && onChange({ ...gives, cap })}
              />
            </>
          )}
        </>
      )}
      {gives.kind === 'refuse' && (
        <input
          aria-label="Reason"
          value={gives.reason}
          maxLength={400}
          onChange={(event) => onChange({ kind: 'refuse', reason: event.target.value })}
          className={`${box} w-72`}
        />
      )}
    </fieldset>
  );
}

function FormulaBox({
  formula,
  edition,
  onChange,
}: {
  formula: string;
  edition: Edition;
  onChange: (formula: string) => void;
}) {
  const id = useId();
  const [typing, setTyping] = useState<string | null>(null);
  const shown = typing ?? formula;
  const read = parseFormula(shown);
  const symbols = [
    ...edition.clauses,
    ...edition.grades.columns,
    ...edition.inputs,
    ...builtInFacts.filter(({ dimension }) => dimension !== 'word'),
  ];
  const stem = /[A-Za-z][A-Za-z0-9_]*$/.exec(shown)?.[0] ?? '';
  return (
    <span className="inline-block">
      <input
        aria-label="Formula"
        aria-invalid={!read.ok}
        aria-describedby={read.ok ? undefined : `${id}e`}
        list={`${id}l`}
        value={shown}
        maxLength={500}
        spellCheck={false}
        onChange={(event) => {
          setTyping(event.target.value);
          if (parseFormula(event.target.value).ok) onChange(event.target.value);
        }}
        onBlur={() => read.ok && setTyping(null)}
        className={`w-80 max-w-full rounded border bg-raised px-1.5 py-0.5 font-mono text-sm ${read.ok ? 'border-pencil' : 'border-fail'}`}
      />
      <datalist id={`${id}l`}>
        {stem !== '' &&
          symbols
            .filter(({ symbol }) => symbol.startsWith(stem) && symbol !== stem)
            .slice(0, 20)
            .map(({ symbol, title }) => (
              <option key={symbol} value={shown.slice(0, shown.length - stem.length) + symbol}>
                {title}
              </option>
            ))}
      </datalist>
      {!read.ok && (
        <span id={`${id}e`} className="block text-xs text-fail">
          {read.message}
        </span>
      )}
    </span>
  );
}
