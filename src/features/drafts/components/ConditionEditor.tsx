import { builtInFacts } from '#shared/basis/facts.ts';
import { operators, type Comparison, type Condition, type Edition } from '#shared/basis/schema/index.ts';
import { Button } from '#src/components/Button.tsx';
import { NumberBox } from './NumberBox.tsx';

const named: Record<Comparison['operator'], string> = {
  equal: 'is',
  notEqual: 'is not',
  in: 'is one of',
  notIn: 'is none of',
  lessThan: 'below',
  lessThanInclusive: 'at most',
  greaterThan: 'above',
  greaterThanInclusive: 'at least',
};
const byWord: readonly Comparison['operator'][] = ['equal', 'notEqual', 'in', 'notIn'];
const box = 'rounded border border-pencil bg-raised px-1.5 py-0.5 text-sm';

interface Fact {
  symbol: string;
  title: string;
  words?: readonly { id: string; title: string }[];
}

/** Facts of an edition that a condition can look at; those that hold words come with their options. */
function factsOf(edition: Edition): Fact[] {
  return [
    ...edition.choices.map(({ symbol, title, options }) => ({ symbol, title, words: options })),
    ...builtInFacts.map(({ symbol, title, dimension, words }): Fact => {
      if (dimension !== 'word') return { symbol, title };
      const listed = symbol.includes('duration')
        ? edition.durations
        : symbol === 'grade'
          ? edition.grades.rows
          : symbol === 'action'
            ? edition.actions
            : (words ?? []).map((word) => ({ id: word, title: word }));
      return { symbol, title, words: listed };
    }),
    ...edition.inputs,
    ...edition.grades.columns,
    ...edition.clauses.map(({ symbol, title, kind, words }): Fact =>
      kind === 'class'
        ? { symbol, title, words: (words ?? []).map((word) => ({ id: word, title: word })) }
        : { symbol, title },
    ),
  ].map((fact) => ({
    symbol: fact.symbol,
    title: fact.title,
    ...('words' in fact && fact.words ? { words: fact.words } : {}),
  }));
}

interface ConditionEditorProps {
  condition: Condition;
  edition: Edition;
  readOnly: boolean;
  onChange: (condition: Condition) => void;
}

/** A condition built by picking: a fact, a comparison, a value; nested in all, any or none. */
export function ConditionEditor({ condition, edition, readOnly, onChange }: ConditionEditorProps) {
  if ('fact' in condition)
    return (
      <ComparisonEditor comparison={condition} edition={edition} readOnly={readOnly} onChange={onChange} />
    );
  const kind = 'all' in condition ? 'all' : 'any' in condition ? 'any' : 'not';
  const children: readonly Condition[] =
    'all' in condition ? condition.all : 'any' in condition ? condition.any : [condition.not];
  const rebuilt = (next: readonly Condition[], as: string = kind): Condition => {
    const [first] = next;
    if (as === 'not' && first) return { not: next.length === 1 ? first : { any: next } };
    return as === 'any' ? { any: next } : { all: next };
  };
  const fresh: Comparison = { fact: 'h', operator: 'lessThanInclusive', value: 100 };
  return (
    <fieldset disabled={readOnly} className="border-l border-pencil pl-3">
      <legend className="sr-only">Group of conditions</legend>
      <select
        aria-label="How the group holds"
        value={kind}
        onChange={(event) => onChange(rebuilt(children, event.target.value))}
        className={box}
      >
        <option value="all">when all of these</option>
        <option value="any">when any of these</option>
        <option value="not">when none of these</option>
      </select>
      {children.map((child, index) => (
        <div key={index} className="my-1 flex items-start gap-2">
          <ConditionEditor
            condition={child}
            edition={edition}
            readOnly={readOnly}
            onChange={(next) => onChange(rebuilt(children.map((each, i) => (i === index ? next : each))))}
          />
          {!readOnly && children.length > 1 && (
            <Button
              kind="quiet"
              aria-label="Remove this condition"
              onClick={() => onChange(rebuilt(children.filter((_, i) => i !== index)))}
            >
              ✕
            </Button>
          )}
        </div>
      ))}
      {!readOnly && kind !== 'not' && (
        <Button kind="quiet" onClick={() => onChange(rebuilt([...children, fresh]))}>
          and another
        </Button>
      )}
    </fieldset>
  );
}

function ComparisonEditor({
  comparison,
  edition,
  readOnly,
  onChange,
}: {
  comparison: Comparison;
  edition: Edition;
  readOnly: boolean;
  onChange: (condition: Condition) => void;
}) {
  const { fact, operator, value } = comparison;
  const facts = factsOf(edition);
  const info = facts.find(({ symbol }) => symbol === fact);
  const list = operator === 'in' || operator === 'notIn';
  const standard = (words: Fact['words'], many: boolean): Comparison['value'] => {
    const first = words ? (words[0]?.id ?? '') : 0;
    return many ? [first] : first;
  };
  return (
    <fieldset disabled={readOnly} className="flex flex-wrap items-center gap-1.5">
      <legend className="sr-only">Condition</legend>
      <select
        aria-label="Fact"
        value={fact}
        onChange={(event) => {
          const next = facts.find(({ symbol }) => symbol === event.target.value);
          const kept = next?.words
            ? byWord.includes(operator)
              ? operator
              : 'equal'
            : list
              ? 'equal'
              : operator;
          onChange({
            fact: event.target.value,
            operator: kept,
            value: standard(next?.words, kept === 'in' || kept === 'notIn'),
          });
        }}
        className={`${box} max-w-56`}
      >
        {!info && <option value={fact}>{fact}</option>}
        {facts.map(({ symbol, title }) => (
          <option key={symbol} value={symbol}>
            {title} ({symbol})
          </option>
        ))}
      </select>
      <select
        aria-label="Comparison"
        value={operator}
        onChange={(event) => {
          const next = event.target.value as Comparison['operator'];
          const many = next === 'in' || next === 'notIn';
          onChange({ fact, operator: next, value: many === list ? value : standard(info?.words, many) });
        }}
        className={box}
      >
        {operators
          .filter((each) => !info?.words || byWord.includes(each))
          .map((each) => (
            <option key={each} value={each}>
              {named[each]}
            </option>
          ))}
      </select>
      {typeof value === 'object' && 'fact' in value ? (
        <span className="font-mono text-sm">{value.fact}</span>
      ) : info?.words ? (
        <select
          aria-label="Value"
          multiple={list}
          value={list ? (value as string[]) : String(value)}
          onChange={(event) =>
            onChange({
              fact,
              operator,
              value: list
                ? [...event.target.selectedOptions].map((option) => option.value)
                : event.target.value,
            })
          }
          className={`${box} max-w-56`}
        >
          {info.words.map(({ id, title }) => (
            <option key={id} value={id}>
              {title}
            </option>
          ))}
        </select>
      ) : (
        <NumberBox
          label="Value"
          value={Array.isArray(value) ? Number(value[0] ?? 0) : Number(value)}
          onChange={(next) => onChange({ fact, operator, value: list ? [next] : next })}
        />
      )}
    </fieldset>
  );
}
