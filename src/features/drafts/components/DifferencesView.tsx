import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { Edition } from '#shared/basis/schema/index.ts';
import { readBasis, readEdition, type EditionSummary } from '#shared/contracts/bases.ts';
import { DataTable } from '#src/components/DataTable.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { call } from '#src/lib/api/call.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { editionDifferences } from '../lib/diff.ts';

/** What differs from another edition of the basis, in the trade's terms; searchable, and fit to print. */
export function DifferencesView({ summary, edition }: { summary: EditionSummary; edition: Edition }) {
  const numbers = useNumbers();
  const basis = useQuery({
    queryKey: ['basis', summary.basisId],
    queryFn: () => call(readBasis, { params: { id: summary.basisId } }),
  });
  const others = (basis.data?.editions ?? []).filter(({ id }) => id !== summary.id);
  const [chosen, setChosen] = useState<string | null>(null);
  const against = chosen ?? others.find(({ number }) => number < summary.number)?.id ?? others[0]?.id;
  const other = useQuery({
    queryKey: ['edition', against],
    queryFn: () => call(readEdition, { params: { id: against ?? '' } }),
    enabled: against !== undefined,
  });
  const [search, setSearch] = useState('');
  const all = useMemo(
    () => (other.data ? editionDifferences(other.data.document, edition, numbers.exact) : []),
    [edition, numbers, other.data],
  );
  const shown = all.filter(({ kind, name }) =>
    `${kind} ${name}`.toLowerCase().includes(search.toLowerCase()),
  );
  if (basis.error ?? other.error) return <ProblemNotice error={basis.error ?? other.error} />;
  if (basis.data && others.length === 0)
    return (
      <EmptyState>This is the first edition of its basis; there is nothing to compare it with.</EmptyState>
    );
  if (!other.data) return <Loading what="the other edition" />;
  return (
    <div>
      <div className="no-print mb-3 flex flex-wrap gap-3">
        <label className="flex items-center gap-2">
          Against
          <select
            value={against}
            onChange={(event) => setChosen(event.target.value)}
            className="rounded border border-pencil bg-raised px-2 py-1"
          >
            {others.map(({ id, number }) => (
              <option key={id} value={id}>
                edition {number}
              </option>
            ))}
          </select>
        </label>
        <input
          type="search"
          aria-label="Search differences"
          placeholder="Search"
          value={search}
          onChange={(event) => setSearch(event.target.value)}
          className="rounded border border-pencil bg-raised px-2.5"
        />
      </div>
      {all.length === 0 ? (
        <EmptyState>The two editions are the same.</EmptyState>
      ) : (
        <DataTable
          label="Differences"
          rows={shown}
          rowKey={({ kind, name }) => `${kind} ${name}`}
          columns={[
            { key: 'kind', title: 'Kind', by: ({ kind }) => kind, cell: ({ kind }) => kind },
            { key: 'name', title: 'What', heads: true, by: ({ name }) => name, cell: ({ name }) => name },
            { key: 'before', title: 'Before', cell: ({ before }) => before },
            { key: 'after', title: 'After', cell: ({ after }) => after },
            {
              key: 'change',
              title: 'Change',
              align: 'right',
              by: ({ change }) => change ?? 0,
              cell: ({ change }) =>
                change === undefined ? '' : `${change > 0 ? '+' : ''}${numbers.decimals(change * 100, 1)} %`,
            },
          ]}
        />
      )}
    </div>
  );
}
