import { keepPreviousData, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useDeferredValue, useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { createProject, listProjects, type Project } from '#shared/contracts/projects.ts';
import { Button } from '#src/components/Button.tsx';
import { DataTable, type DataColumn } from '#src/components/DataTable.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { EditionName } from '#src/components/EditionName.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { TextField } from '#src/components/Field.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { UnverifiedMark, verdictLook } from '#src/components/StateMark.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { call } from '#src/lib/api/call.ts';
import { may, useSignedIn } from '#src/lib/api/session.ts';
import { moment } from '#src/lib/format/time.ts';

/** Members of a project by verdict, in words and signs. */
function Counts({ counts }: { counts: Project['counts'] }) {
  const words = ['fails', 'close', 'passes', 'none'] as const;
  return (
    <span className="flex flex-wrap gap-x-3">
      {words
        .filter((word) => counts[word] > 0)
        .map((word) => (
          <span key={word} className={`whitespace-nowrap ${verdictLook[word].text}`}>
            <span aria-hidden>{verdictLook[word].sign}</span> {counts[word]}{' '}
            {verdictLook[word].word.toLowerCase()}
          </span>
        ))}
      {words.every((word) => counts[word] === 0) && <span className="text-soft">no members</span>}
    </span>
  );
}

/** All projects, searchable; a new one for those who may. */
export function ProjectsPage() {
  useCrumbs([{ label: 'Projects' }]);
  const signedIn = useSignedIn();
  const [search, setSearch] = useState('');
  const [state, setState] = useState<'live' | 'closed' | 'any'>('live');
  const [creating, setCreating] = useState(false);
  const wanted = useDeferredValue(search.trim());
  const { data, error } = useQuery({
    queryKey: ['projects', wanted, state],
    queryFn: () => call(listProjects, { query: { size: 200, state, ...(wanted ? { search: wanted } : {}) } }),
    placeholderData: keepPreviousData,
  });
  const columns: DataColumn<Project>[] = [
    {
      key: 'title',
      title: 'Project',
      heads: true,
      by: ({ title }) => title,
      cell: ({ id, title }) => (
        <Link to={`/projects/${id}`} className="hover:underline">
          {title}
        </Link>
      ),
    },
    { key: 'site', title: 'Site', by: ({ site }) => site, cell: ({ site }) => site },
    { key: 'client', title: 'Client', by: ({ client }) => client, cell: ({ client }) => client },
    {
      key: 'edition',
      title: 'Edition',
      by: ({ edition }) => (edition ? `${edition.basisTitle} ${edition.number}` : ''),
      cell: ({ edition }) => (
        <>
          <EditionName edition={edition} />{' '}
          {edition && <UnverifiedMark count={edition.unverified} what="values" />}
        </>
      ),
    },
    {
      key: 'counts',
      title: 'Members',
      by: ({ counts }) => counts.fails * 1000 + counts.close,
      cell: ({ counts }) => <Counts counts={counts} />,
    },
    {
      key: 'changed',
      title: 'Changed',
      by: ({ changedAt }) => changedAt,
      cell: ({ changedAt }) => moment(changedAt),
    },
  ];
  return (
    <Page
      title="Projects"
      lead="Each project pins one released edition; nothing changes under it."
      actions={
        may(signedIn, 'projects.create') && (
          <Button kind="main" onClick={() => setCreating(true)}>
            New project
          </Button>
        )
      }
    >
      <div className="mb-4 flex flex-wrap gap-3">
        <input
          type="search"
          aria-label="Search projects"
          placeholder="Search title, site, client"
          value={search}
          onChange={(event) => setSearch(event.target.value)}
          className="min-h-9 w-72 rounded border border-pencil bg-raised px-3"
        />
        <select
          aria-label="State"
          value={state}
          onChange={(event) => setState(event.target.value as typeof state)}
          className="rounded border border-pencil bg-raised px-2"
        >
          <option value="live">Live</option>
          <option value="closed">Closed</option>
          <option value="any">All</option>
        </select>
      </div>
      <ProblemNotice error={error} />
      {!data && !error && <Loading what="projects" />}
      {data &&
        (data.items.length ? (
          <DataTable
            label="Projects"
            columns={columns}
            rows={data.items}
            rowKey={({ id }) => id}
            minWidth="52rem"
          />
        ) : (
          <EmptyState>
            {wanted
              ? `No project matches “${wanted}”.`
              : state === 'closed'
                ? 'No project is closed. Closed projects stand here to be read; close one in its particulars.'
                : 'Projects stand here: a site, the edition agreed for it, and its members. Start with a new project.'}
          </EmptyState>
        ))}
      {data && data.total > data.items.length && (
        <p className="mt-3 text-soft" role="status">
          The {data.items.length} last changed of {data.total} are shown. Search to reach the others.
        </p>
      )}
      <NewProject open={creating} onClose={() => setCreating(false)} />
    </Page>
  );
}

function NewProject({ open, onClose }: { open: boolean; onClose: () => void }) {
  const navigate = useNavigate();
  const client = useQueryClient();
  const create = useMutation({
    mutationFn: (body: { title: string; site: string; client: string }) => call(createProject, { body }),
    onSuccess: async (project) => {
      await client.invalidateQueries({ queryKey: ['projects'] });
      void navigate(`/projects/${project.id}`);
    },
  });
  return (
    <Dialog title="New project" open={open} onClose={onClose}>
      <ProblemNotice error={create.error} />
      <form
        onSubmit={(event) => {
          event.preventDefault();
          const data = new FormData(event.currentTarget);
          const text = (name: string) => String(data.get(name) ?? '').trim();
          create.mutate({ title: text('title'), site: text('site'), client: text('client') });
        }}
      >
        <TextField label="Title" name="title" required maxLength={200} autoFocus />
        <TextField label="Site" name="site" maxLength={200} />
        <TextField label="Client" name="client" maxLength={200} />
        <Button type="submit" kind="main" disabled={create.isPending}>
          Open the project
        </Button>
      </form>
    </Dialog>
  );
}
