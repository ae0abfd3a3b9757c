import { useState } from 'react';
import type { Case, Clause, Edition } from '#shared/basis/schema/index.ts';
import type { Finding } from '#shared/engine/types.ts';
import { Button } from '#src/components/Button.tsx';
import { Mathematics } from '#src/components/Mathematics.tsx';
import { SymbolText } from '#src/components/Symbol.tsx';
import { ConditionEditor } from './ConditionEditor.tsx';
import { OutcomeEditor } from './OutcomeEditor.tsx';

interface ClausesEditorProps {
  edition: Edition;
  findings: readonly Finding[];
  readOnly: boolean;
  onChange: (edition: Edition) => void;
}

/** Clauses of a draft: each opens to its cases, in the order they are tried, to be changed, moved, added. */
export function ClausesEditor({ edition, findings, readOnly, onChange }: ClausesEditorProps) {
  const [search, setSearch] = useState('');
  const [open, setOpen] = useState<string | null>(null);
  const words = search.toLowerCase().split(/\s+/).filter(Boolean);
  const wanted = edition.clauses.filter(({ symbol, title, reference }) =>
    words.every((word) => `${symbol} ${title} ${reference}`.toLowerCase().includes(word)),
  );
  const replace = (id: string, clause: Clause) =>
    onChange({ ...edition, clauses: edition.clauses.map((each) => (each.id === id ? clause : each)) });
  const add = () => {
    const number = edition.clauses.length + 1;
    const source = edition.sources.find(({ kind }) => kind === 'decision') ?? edition.sources[0];
    const clause: Clause = {
      id: `clause-${number}`,
      symbol: `K_new${number}`,
      title: 'New factor',
      reference: '',
      kind: 'factor',
      unit: '1',
      cases: [
        {
          id: 'otherwise',
          gives: { kind: 'constant', value: 1 },
          provenance: { source: source?.id ?? '', standing: 'decision' },
        },
      ],
    };
    onChange({ ...edition, clauses: [...edition.clauses, clause] });
    setOpen(clause.id);
  };
  return (
    <div>
      <div className="mb-3 flex flex-wrap gap-2">
        <input
          type="search"
          aria-label="Find a clause"
          placeholder="Find a clause"
          value={search}
          onChange={(event) => setSearch(event.target.value)}
          className="min-h-8 w-64 rounded border border-pencil bg-raised px-2.5"
        />
        {!readOnly && <Button onClick={add}>Add a factor</Button>}
      </div>
      {wanted.map((clause) => {
        const own = findings.filter((finding) => finding.clause === clause.id && finding.severity !== 'note');
        return (
          <div key={clause.id} className="border-b border-rule">
            <button
              type="button"
              aria-expanded={open === clause.id}
              onClick={() => setOpen(open === clause.id ? null : clause.id)}
              className="flex w-full items-baseline gap-3 py-1.5 text-left hover:bg-wash/60"
            >
              <span className="w-20 shrink-0 text-lg">
                <SymbolText name={clause.symbol} />
              </span>
              <span className="font-medium">{clause.title}</span>
              <span className="text-sm text-soft">{clause.reference}</span>
              {own.length > 0 && (
                <span
                  className={own.some(({ severity }) => severity === 'error') ? 'text-fail' : 'text-close'}
                >
                  {own.some(({ severity }) => severity === 'error') ? '■' : '▲'} {own.length}
                </span>
              )}
              <span className="ml-auto text-sm text-soft">
                {clause.kind}, {clause.cases.length === 1 ? '1 case' : `${clause.cases.length} cases`}
              </span>
            </button>
            {open === clause.id && (
              <ClauseEditor
                clause={clause}
                edition={edition}
                findings={own}
                readOnly={readOnly}
                onChange={(next) => replace(clause.id, next)}
                onRemove={() =>
                  onChange({ ...edition, clauses: edition.clauses.filter(({ id }) => id !== clause.id) })
                }
              />
            )}
          </div>
        );
      })}
    </div>
  );
}

interface ClauseEditorProps {
  clause: Clause;
  edition: Edition;
  findings: readonly Finding[];
  readOnly: boolean;
  onChange: (clause: Clause) => void;
  onRemove: () => void;
}

function ClauseEditor({ clause, edition, findings, readOnly, onChange, onRemove }: ClauseEditorProps) {
  const setCase = (index: number, next: Case) =>
    onChange({ ...clause, cases: clause.cases.map((each, i) => (i === index ? next : each)) });
  const move = (index: number, by: number) => {
    const cases = [...clause.cases];
    const [moved] = cases.splice(index, 1);
    if (moved) cases.splice(index + by, 0, moved);
    onChange({ ...clause, cases });
  };
  const addCase = () => {
    const [first] = clause.cases;
    const fact = edition.choices.find(({ scope }) => scope !== 'grade');
    if (!first) return;
    const added: Case = {
      id: `case-${clause.cases.length + 1}`,
      when: fact
        ? { fact: fact.symbol, operator: 'equal', value: fact.options[0]?.id ?? '' }
        : { fact: 'h', operator: 'lessThanInclusive', value: 100 },
      gives:
        clause.kind === 'class'
          ? { kind: 'word', value: clause.words?.[0] ?? 'word' }
          : { kind: 'constant', value: 1 },
      provenance: { source: first.provenance.source, standing: 'decision' },
    };
    onChange({ ...clause, cases: [...clause.cases.slice(0, -1), added, ...clause.cases.slice(-1)] });
  };
  const field = (name: 'symbol' | 'title' | 'reference', label: string, className: string) => (
    <label className="text-xs text-soft">
      {label}
      <input
        value={clause[name]}
        readOnly={readOnly}
        maxLength={200}
        onChange={(event) => onChange({ ...clause, [name]: event.target.value })}
        className={`mt-0.5 block rounded border border-pencil bg-raised px-2 py-1 text-sm text-ink ${className}`}
      />
    </label>
  );
  return (
    <div className="mb-4 ml-4 md:ml-20">
      <div className="mb-2 flex flex-wrap gap-3">
        {field('symbol', 'Symbol', 'w-28 font-mono')}
        {field('title', 'Title', 'w-72')}
        {field('reference', 'Clause', 'w-32')}
      </div>
      {findings.map((finding) => (
        <p
          key={finding.code + finding.pointer}
          className={`text-sm ${finding.severity === 'error' ? 'text-fail' : 'text-close'}`}
        >
          {finding.severity === 'error' ? '■' : '▲'} {finding.message}
        </p>
      ))}
      <ol>
        {clause.cases.map((each, index) => (
          <li key={index} className="border-t border-rule py-2">
            <div className="flex flex-wrap items-start gap-x-4 gap-y-2">
              <span className="w-4 font-mono text-sm text-soft">{index + 1}</span>
              <div className="min-w-60 flex-1">
                {each.when ? (
                  <ConditionEditor
                    condition={each.when}
                    edition={edition}
                    readOnly={readOnly}
                    onChange={(when) => setCase(index, { ...each, when })}
                  />
                ) : (
                  <span className="text-soft">otherwise</span>
                )}
              </div>
              <OutcomeEditor
                each={each}
                edition={edition}
                readOnly={readOnly}
                onChange={(gives) =>
                  setCase(index, {
                    ...each,
                    gives,
                    provenance: {
                      source: each.provenance.source,
                      standing: 'decision',
                      note: 'Changed by hand in this edition.',
                    },
                  })
                }
              />
            </div>
            {each.gives.kind === 'formula' && (
              <p className="mt-1 ml-8">
                <Mathematics formula={each.gives.formula} />
              </p>
            )}
            {!readOnly && (
              <p className="ml-8 flex gap-2 text-xs">
                {index > 0 && each.when && (
                  <Button kind="quiet" onClick={() => move(index, -1)}>
                    Move up
                  </Button>
                )}
                {each.when && clause.cases[index + 1]?.when && (
                  <Button kind="quiet" onClick={() => move(index, 1)}>
                    Move down
                  </Button>
                )}
                {clause.cases.length > 1 && each.when && (
                  <Button
                    kind="quiet"
                    onClick={() => onChange({ ...clause, cases: clause.cases.filter((_, i) => i !== index) })}
                  >
                    Remove the case
                  </Button>
                )}
              </p>
            )}
          </li>
        ))}
      </ol>
      {!readOnly && (
        <p className="flex gap-3 border-t border-rule pt-2">
          <Button kind="quiet" onClick={addCase}>
            Add a case
          </Button>
          <Button kind="quiet" onClick={onRemove}>
            Remove the clause
          </Button>
        </p>
      )}
    </div>
  );
}
