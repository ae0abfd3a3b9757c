import type { Edition, Table } from '#shared/basis/schema/index.ts';
import { unitForReading } from '#shared/units/format.ts';
import { DataTable } from '#src/components/DataTable.tsx';
import { Mathematics } from '#src/components/Mathematics.tsx';
import { SymbolText } from '#src/components/Symbol.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';
import { conditionInWords } from '../conditionWords.ts';

type Props = { edition: Edition };
const matches = {
  exact: 'exactly',
  band: 'by bands',
  stepDown: 'the next below',
  stepUp: 'the next above',
  linear: 'interpolated',
  log: 'interpolated in the logarithm',
};

function axis({ match, points, edge }: Table['keys'][number], exact: (value: number) => string): string[] {
  const said = (point: number | string | null) =>
    typeof point === 'number' ? exact(point) : (point ?? 'any');
  if (match !== 'band') return points.map(said);
  return points.slice(1).map((high, i) => {
    const low = points[i];
    const [left, right] = edge === 'above' ? ['≥', '<'] : ['>', '≤'];
    if (low === null || low === undefined) return high === null ? 'any' : `${right} ${said(high)}`;
    return high === null ? `${left} ${said(low)}` : `${said(low)} to ${said(high)}`;
  });
}

export function TablesView({ edition }: Props) {
  const numbers = useNumbers();
  if (edition.tables.length === 0) return <p className="text-soft">None.</p>;
  return edition.tables.map((table) => {
    const axes = table.keys.map((key) => axis(key, numbers.exact));
    const across = axes[axes.length - 1] ?? [];
    const down = axes
      .slice(0, -1)
      .reduce<string[]>(
        (rows, next) => rows.flatMap((row) => next.map((label) => (row ? `${row}, ${label}` : label))),
        [''],
      );
    return (
      <details
        key={table.id}
        className="border-b border-rule [contain-intrinsic-size:auto_2.4rem] [content-visibility:auto]"
      >
        <summary className="py-1.5">
          <span className="font-medium">{table.title}</span>{' '}
          <span className="text-sm text-soft">
            by{' '}
            {table.keys
              .map(({ title, match, unit }) => {
                const how = [unitForReading(unit), matches[match]].filter(Boolean).join(', ');
                return `${title.toLowerCase()} (${how})`;
              })
              .join(', ')}
            ; {unitForReading(table.unit) || 'pure numbers'}
          </span>
        </summary>
        <div className="mb-3 overflow-x-auto" tabIndex={0} role="group" aria-label={`${table.title}, table`}>
          <table className="text-sm">
            <thead>
              <tr className="border-b border-ink text-xs text-soft">
                <th scope="col" className="py-1 pr-4 text-left font-normal">
                  {(table.keys.length > 1 ? table.keys.slice(0, -1) : table.keys)
                    .map(({ title }) => title)
                    .join(', ')}
                </th>
                {across.map((label) => (
                  <th key={label} scope="col" className="py-1 pl-4 text-right font-normal">
                    {label}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {down.map((label, row) => (
                <tr key={label} className="border-b border-rule">
                  <th scope="row" className="py-1 pr-4 text-left font-normal">
                    {label || 'Value'}
                  </th>
                  {across.map((name, column) => {
                    const value = table.values[row * across.length + column];
                    return (
                      <td key={name} className="py-1 pl-4 text-right font-mono tabular-nums">
                        {typeof value === 'number' ? numbers.exact(value) : (value ?? '–')}
                      </td>
                    );
                  })}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      </details>
    );
  });
}

export function ActionsView({ edition }: Props) {
  const numbers = useNumbers();
  const duration = (id: string | undefined) => edition.durations.find((each) => each.id === id)?.title ?? '';
  const actionTitle = (id: string) => edition.actions.find((each) => each.id === id)?.title ?? id;
  return (
    <div className="space-y-5">
      <DataTable
        label="Actions"
        rows={edition.actions}
        rowKey={({ id }) => id}
        columns={[
          { key: 'symbol', title: 'Symbol', cell: ({ symbol }) => <SymbolText name={symbol} /> },
          { key: 'title', title: 'Action', heads: true, cell: ({ title }) => title },
          { key: 'nature', title: 'Nature', cell: ({ nature }) => nature },
          { key: 'duration', title: 'Duration', cell: (action) => duration(action.duration) },
          { key: 'patterned', title: 'Span by span', cell: ({ patterned }) => (patterned ? 'yes' : 'no') },
          ...edition.actionValues.map(({ symbol, title }) => ({
            key: symbol,
            title,
            align: 'right' as const,
            cell: (action: Edition['actions'][number]) =>
              action.values[symbol] === undefined ? '–' : numbers.exact(action.values[symbol]),
          })),
        ]}
      />
      <DataTable
        label="Combinations"
        rows={edition.combinations}
        rowKey={({ id }) => id}
        columns={[
          { key: 'title', title: 'Combination', heads: true, cell: ({ title }) => title },
          { key: 'state', title: 'For', cell: ({ state }) => state },
          {
            key: 'terms',
            title: 'Factor on each',
            cell: ({ terms }) =>
              terms
                .map(
                  ({ of, factor }) =>
                    `${(typeof of === 'string' ? [of] : of).map(actionTitle).join(', ')}: ${factor}`,
                )
                .join('; '),
          },
          {
            key: 'duration',
            title: 'Duration',
            cell: (pattern) => (pattern.duration ? duration(pattern.duration) : 'of the shortest action'),
          },
          { key: 'reference', title: 'Clause', cell: ({ reference }) => reference },
        ]}
      />
    </div>
  );
}

export function ChoicesView({ edition }: Props) {
  return (
    <div className="space-y-5">
      <DataTable
        label="Choices"
        rows={edition.choices}
        rowKey={({ symbol }) => symbol}
        columns={[
          { key: 'title', title: 'Choice', heads: true, cell: ({ title }) => title },
          { key: 'scope', title: 'Made for', cell: ({ scope }) => `each ${scope}` },
          {
            key: 'options',
            title: 'Options',
            cell: ({ options, default: usual }) =>
              options.map(({ id, title }) => (id === usual ? `${title} (usual)` : title)).join('; '),
          },
        ]}
      />
      {edition.inputs.length > 0 && (
        <DataTable
          label="Inputs"
          rows={edition.inputs}
          rowKey={({ symbol }) => symbol}
          columns={[
            { key: 'symbol', title: 'Symbol', cell: ({ symbol }) => <SymbolText name={symbol} /> },
            { key: 'title', title: 'Input', heads: true, cell: ({ title }) => title },
            { key: 'scope', title: 'Given for', cell: ({ scope }) => `each ${scope}` },
            { key: 'unit', title: 'Unit', cell: ({ unit }) => unitForReading(unit) },
            {
              key: 'default',
              title: 'Otherwise',
              align: 'right',
              cell: (input) => (input.default === undefined ? 'missing' : String(input.default)),
            },
          ]}
        />
      )}
    </div>
  );
}

const checkedAt: Readonly<Record<Edition['checks'][number]['at'], string>> = {
  member: 'once',
  moment: 'at each place of bending',
  shear: 'at each place of shear',
  support: 'at each support',
  deflection: 'in each span',
};

export function ChecksView({ edition }: Props) {
  const numbers = useNumbers();
  return edition.checks.map((check) => (
    <div key={check.id} className="grid gap-x-4 border-b border-rule py-2 md:grid-cols-[12rem_1fr]">
      <p>
        <span className="font-semibold">{check.title}</span>{' '}
        <span className="block text-sm text-soft">
          {check.reference}; {checkedAt[check.at]}
          {check.state && `, for ${check.state}`}
        </span>
      </p>
      <p className="flex flex-wrap items-baseline gap-x-3">
        {check.demand && check.limit ? (
          <>
            <span className="text-soft">{check.demand.title}</span>{' '}
            <Mathematics formula={check.demand.formula} /> <span aria-hidden>≤</span>{' '}
            <span className="text-soft">{check.limit.title}</span>{' '}
            <Mathematics formula={check.limit.formula} />
          </>
        ) : (
          <>
            <span className="text-soft">utilisation</span>{' '}
            <Mathematics formula={check.utilisation?.formula ?? '0'} />
          </>
        )}
        {check.applies && (
          <span className="w-full text-sm text-soft">
            only where {conditionInWords(edition, check.applies, numbers.exact)}
          </span>
        )}
      </p>
    </div>
  ));
}

export function ProofsView({ edition }: Props) {
  const numbers = useNumbers();
  if (edition.proofs.length === 0) return <p className="text-soft">None yet.</p>;
  return edition.proofs.map((proof) => (
    <div key={proof.id} className="border-b border-rule py-2">
      <p className="font-medium">
        {proof.title}{' '}
        <span className="font-normal text-soft">
          {edition.sources.find(({ id }) => id === proof.provenance.source)?.title}
        </span>
      </p>
      <ul className="mt-1 flex flex-wrap gap-x-6 text-sm text-soft">
        {proof.expect.map((expected, index) => (
          <li key={index}>
            {edition.checks.find(({ id }) => id === expected.check)?.title},{' '}
            {typeof expected.of === 'string' ? expected.of : expected.of.symbol}:{' '}
            <span className="font-mono text-ink">
              {numbers.exact(expected.value)} {unitForReading(expected.unit)}
            </span>{' '}
            ± {numbers.exact(expected.tolerance)}
          </li>
        ))}
      </ul>
    </div>
  ));
}

export function SourcesView({ edition }: Props) {
  return (
    <ul>
      {edition.sources.map((source) => (
        <li key={source.id} className="border-b border-rule py-1.5">
          <span className="font-medium">{source.title}</span>{' '}
          <span className="text-sm text-soft">
            {[source.kind, source.author, source.year].filter(Boolean).join(', ')}
          </span>
          {source.address && (
            <span className="block font-mono text-xs break-all text-soft">{source.address}</span>
          )}
          {source.note && <span className="block text-sm text-soft">{source.note}</span>}
        </li>
      ))}
    </ul>
  );
}
