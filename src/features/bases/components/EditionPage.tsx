import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { readEdition } from '#shared/contracts/bases.ts';
import { Loading } from '#src/components/Loading.tsx';
import { Notice, ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { Section } from '#src/components/Section.tsx';
import { EditionMark, UnverifiedMark } from '#src/components/StateMark.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { call } from '#src/lib/api/call.ts';
import { day } from '#src/lib/format/time.ts';
import { ClausesView } from './ClausesView.tsx';
import { FindingsView } from './FindingsView.tsx';
import { GradesView } from './GradesView.tsx';
import { ActionsView, ChecksView, ChoicesView, ProofsView, SourcesView, TablesView } from './PartsView.tsx';

const parts = [
  'Grades',
  'Clauses',
  'Tables',
  'Actions and combinations',
  'Choices and inputs',
  'Checks',
  'Proofs',
  'Sources',
];
const anchor = (title: string) => title.toLowerCase().replaceAll(' ', '-');

/** An edition to read: everything in it, in words, with its findings. */
export function EditionPage() {
  const { editionId = '' } = useParams();
  const { data, error } = useQuery({
    queryKey: ['edition', editionId],
    queryFn: () => call(readEdition, { params: { id: editionId } }),
  });
  useCrumbs([
    { label: 'Bases', to: '/bases' },
    ...(data ? [{ label: data.basisTitle, to: `/bases/${data.basisId}` }] : []),
    { label: data ? `Edition ${data.number}` : 'Edition' },
  ]);
  // The page stands before the engine has arrived and read the edition through. Keyed by its hash: the same
  // document has the same findings.
  const findings = useQuery({
    queryKey: ['findings', data?.id, data?.hash],
    queryFn: async () => {
      const { compile } = await import('#shared/engine/index.ts');
      return data ? compile(data.document).findings : [];
    },
    enabled: data !== undefined,
    staleTime: Infinity,
  });
  if (error)
    return (
      <Page title="Edition">
        <ProblemNotice error={error} />
      </Page>
    );
  if (!data) return <Loading what="the edition" />;
  const { document: edition } = data;
  return (
    <div className="xl:grid xl:grid-cols-[minmax(0,1fr)_20rem]">
      <Page
        title={`${data.basisTitle}, edition ${data.number}`}
        actions={
          (data.state === 'draft' || data.state === 'in_check') && (
            <Link
              to={`/editions/${data.id}/draft`}
              className="inline-flex min-h-8 items-center rounded border border-ink bg-ink px-3 text-sm font-medium text-on-ink hover:bg-ink/90"
            >
              {data.state === 'draft' ? 'Work on the draft' : 'Check and release'}
            </Link>
          )
        }
        mark={<EditionMark state={data.state} />}
        lead={
          <>
            <p>{edition.purpose}</p>
            <p className="mt-1 text-sm">
              {edition.method}, {edition.unitSystem}. Written by {data.draftedBy.name}
              {data.releasedBy && data.releasedAt
                ? `, released ${day(data.releasedAt)} by ${data.releasedBy.name}`
                : ''}
              . <UnverifiedMark count={data.unverified} what="values are" />
            </p>
            {data.reason && <p className="mt-1 text-sm">{data.reason}</p>}
          </>
        }
      >
        {data.state === 'withdrawn' && (
          <Notice tone="error">This edition was withdrawn and is not to be designed to.</Notice>
        )}
        <nav
          aria-label="Parts of the edition"
          className="no-print sticky top-14 z-20 -mx-1 mb-5 flex gap-x-5 overflow-x-auto border-b border-ink bg-paper"
        >
          {parts.map((title) => (
            <a
              key={title}
              href={`#${anchor(title)}`}
              className="px-1 py-2 whitespace-nowrap text-soft hover:text-ink hover:underline"
            >
              {title}
            </a>
          ))}
        </nav>
        <Section id="grades" title="Grades" note={`${edition.grades.rows.length} rows`}>
          <GradesView edition={edition} />
        </Section>
        <Section
          id="clauses"
          title="Clauses"
          note={`${edition.clauses.length}, each with its cases in the order they are tried`}
        >
          <ClausesView edition={edition} />
        </Section>
        <Section id="tables" title="Tables" note={`${edition.tables.length}`}>
          <TablesView edition={edition} />
        </Section>
        <Section id="actions-and-combinations" title="Actions and combinations">
          <ActionsView edition={edition} />
        </Section>
        <Section id="choices-and-inputs" title="Choices and inputs">
          <ChoicesView edition={edition} />
        </Section>
        <Section id="checks" title="Checks" note="demand against limit">
          <ChecksView edition={edition} />
        </Section>
        <Section id="proofs" title="Proofs" note="known answers the edition has to reproduce">
          <ProofsView edition={edition} />
        </Section>
        <Section id="sources" title="Sources">
          <SourcesView edition={edition} />
        </Section>
        <p className="mt-8 border-t border-pencil/60 pt-3 text-xs text-soft">{edition.caution}</p>
      </Page>
      <FindingsView edition={edition} findings={findings.data ?? null} />
    </div>
  );
}
