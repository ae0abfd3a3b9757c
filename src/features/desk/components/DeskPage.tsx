import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { readDesk, type DeskMember } from '#shared/contracts/desk.ts';
import { DataTable, type DataColumn } from '#src/components/DataTable.tsx';
import { EditionName } from '#src/components/EditionName.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { Section } from '#src/components/Section.tsx';
import { EditionMark, UnverifiedMark, VerdictMark } from '#src/components/StateMark.tsx';
import { UtilisationBar } from '#src/components/UtilisationBar.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { call } from '#src/lib/api/call.ts';
import { useSignedIn } from '#src/lib/api/session.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { moment } from '#src/lib/format/time.ts';

/** What waits for the person signed in. */
export function DeskPage() {
  useCrumbs([{ label: 'Desk' }]);
  const { person, firm } = useSignedIn();
  const { data, error } = useQuery({ queryKey: ['desk'], queryFn: () => call(readDesk) });
  const numbers = useNumbers();
  if (error)
    return (
      <Page title="Desk">
        <ProblemNotice error={error} />
      </Page>
    );
  if (!data) return <Loading what="your desk" />;
  const columns: DataColumn<DeskMember>[] = [
    {
      key: 'mark',
      title: 'Member',
      heads: true,
      by: ({ mark }) => mark,
      cell: ({ id, mark, title, project }) => (
        <Link to={`/projects/${project.id}/members/${id}`} className="hover:underline">
          {mark} <span className="font-normal text-soft">{title}</span>
        </Link>
      ),
    },
    {
      key: 'project',
      title: 'Project',
      by: ({ project }) => project.title,
      cell: ({ project }) => (
        <Link to={`/projects/${project.id}`} className="hover:underline">
          {project.title}
        </Link>
      ),
    },
    { key: 'word', title: 'Verdict', cell: ({ result }) => <VerdictMark word={result?.word ?? 'none'} /> },
    {
      key: 'check',
      title: 'Governing check',
      cell: ({ result }) => result?.checkTitle ?? result?.because ?? '–',
    },
    {
      key: 'bar',
      title: 'Utilisation',
      cell: ({ result }) => (
        <UtilisationBar value={result?.utilisation ?? null} word={result?.word ?? 'none'} />
      ),
    },
    {
      key: 'utilisation',
      title: 'value',
      align: 'right',
      by: ({ result }) => result?.utilisation ?? 9,
      cell: ({ result }) =>
        typeof result?.utilisation === 'number' ? numbers.decimals(result.utilisation, 2) : '–',
    },
    {
      key: 'edition',
      title: 'Edition',
      cell: ({ result }) =>
        result ? (
          <span className="text-soft">
            <EditionName edition={result.edition} />{' '}
            <UnverifiedMark count={result.unverified} what="values" />
          </span>
        ) : (
          '–'
        ),
    },
  ];
  const waiting = [...data.failing, ...data.close];
  const { failingTotal, closeTotal } = data;
  const totals = [
    `${failingTotal} ${failingTotal === 1 ? 'fails' : 'fail'}, ${closeTotal} ${closeTotal === 1 ? 'is' : 'are'} close, in live projects`,
    ...(waiting.length < failingTotal + closeTotal ? [`the ${waiting.length} worst are shown`] : []),
  ].join('; ');
  return (
    <Page
      title={`Desk of ${person.name}`}
      lead={
        <>
          {firm.name}
          {firm.invented && ', an invented firm for demonstration'}
          {firm.solePractitioner && '. Sole practitioner: no second person checks or releases.'}
        </>
      }
    >
      <Section title="Members that fail or are close" note={totals}>
        {waiting.length ? (
          <DataTable
            label="Members that fail or are close"
            columns={columns}
            rows={waiting}
            rowKey={({ id }) => id}
            minWidth="56rem"
          />
        ) : (
          <EmptyState>
            Nothing fails and nothing is close. Members that do are listed here, the worst first.
          </EmptyState>
        )}
      </Section>
      <Section title="Editions in check" note="for a second person to read and release">
        {data.inCheck.length ? (
          <ul>
            {data.inCheck.map((edition) => (
              <li
                key={edition.id}
                className="flex flex-wrap items-baseline gap-3 border-b border-rule py-1.5"
              >
                <Link to={`/editions/${edition.id}`} className="font-semibold hover:underline">
                  {edition.basisTitle}, edition {edition.number}
                </Link>
                <EditionMark state={edition.state} />
                <span className="text-soft">{edition.reason}</span>
                <span className="ml-auto text-soft">by {edition.draftedBy.name}</span>
              </li>
            ))}
          </ul>
        ) : (
          <EmptyState>No edition waits for a check.</EmptyState>
        )}
      </Section>
      <Section title="Last saved">
        {data.recent.length ? (
          <ul className="columns-1 gap-10 md:columns-2">
            {data.recent.map(({ id, mark, title, project, savedBy, savedAt }) => (
              <li
                key={id}
                className="flex break-inside-avoid items-baseline gap-3 border-b border-rule py-1.5"
              >
                <Link
                  to={`/projects/${project.id}/members/${id}`}
                  className="font-semibold whitespace-nowrap hover:underline"
                >
                  {mark}
                </Link>
                <span className="truncate text-soft">
                  {title}, {project.title}
                </span>
                <span className="ml-auto whitespace-nowrap text-soft">
                  {moment(savedAt)}, {savedBy.name}
                </span>
              </li>
            ))}
          </ul>
        ) : (
          <EmptyState>Nothing was saved yet. Start with a project.</EmptyState>
        )}
      </Section>
    </Page>
  );
}
