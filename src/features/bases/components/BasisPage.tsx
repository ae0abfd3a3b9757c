import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link, useParams } from 'react-router-dom';
import { readBasis, type Basis, type EditionSummary } from '#shared/contracts/bases.ts';
import { DataTable, type DataColumn } from '#src/components/DataTable.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { Section } from '#src/components/Section.tsx';
import { EditionMark } from '#src/components/StateMark.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { Rings } from '#src/drawings/Rings.tsx';
import { call } from '#src/lib/api/call.ts';
import { day } from '#src/lib/format/time.ts';
import { ringsOf } from '../ringsOf.ts';

/** A basis: its rings, and what each edition changed. `actions`: what can be done with it, put in by the route. */
export function BasisPage({ actions }: { actions: (basis: Basis) => ReactNode }) {
  const { basisId = '' } = useParams();
  const { data, error } = useQuery({
    queryKey: ['basis', basisId],
    queryFn: () => call(readBasis, { params: { id: basisId } }),
  });
  useCrumbs([{ label: 'Bases', to: '/bases' }, { label: data?.title ?? 'Basis' }]);
  if (error)
    return (
      <Page title="Basis">
        <ProblemNotice error={error} />
      </Page>
    );
  if (!data) return <Loading what="the basis" />;
  const columns: DataColumn<EditionSummary>[] = [
    {
      key: 'number',
      title: 'Edition',
      heads: true,
      by: ({ number }) => number,
      cell: ({ id, number }) => (
        <Link to={`/editions/${id}`} className="whitespace-nowrap hover:underline">
          Edition {number}
        </Link>
      ),
    },
    { key: 'state', title: 'State', cell: ({ state }) => <EditionMark state={state} /> },
    { key: 'reason', title: 'What it changed, and why', cell: ({ reason }) => reason },
    { key: 'drafted', title: 'Written by', cell: ({ draftedBy }) => draftedBy.name },
    {
      key: 'released',
      title: 'Released',
      by: ({ releasedAt }) => releasedAt ?? '',
      cell: ({ releasedBy, releasedAt }) =>
        releasedBy && releasedAt ? `${day(releasedAt)} by ${releasedBy.name}` : '–',
    },
    {
      key: 'unverified',
      title: 'Unverified',
      align: 'right',
      by: ({ unverified }) => unverified,
      cell: ({ unverified }) => String(unverified),
    },
    {
      key: 'projects',
      title: 'Projects',
      align: 'right',
      by: ({ projects }) => projects,
      cell: ({ projects }) => String(projects),
    },
  ];
  return (
    <Page title={data.title} lead={data.purpose} actions={actions(data)}>
      <Rings rings={ringsOf(data)} />
      <Section title="Editions" note="newest first">
        <DataTable
          label="Editions"
          columns={columns}
          rows={data.editions}
          rowKey={({ id }) => id}
          minWidth="56rem"
        />
      </Section>
    </Page>
  );
}
