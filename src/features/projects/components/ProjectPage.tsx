import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { useParams } from 'react-router-dom';
import { listProjectMembers, readProject } from '#shared/contracts/projects.ts';
import { Button } from '#src/components/Button.tsx';
import { EditionName } from '#src/components/EditionName.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { Notice, ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { Section } from '#src/components/Section.tsx';
import { UnverifiedMark } from '#src/components/StateMark.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { call } from '#src/lib/api/call.ts';
import { may } from '#src/lib/api/session.ts';
import { AddMember } from './AddMember.tsx';
import { EditProject } from './EditProject.tsx';
import { MembersTable } from './MembersTable.tsx';
import { PinEdition } from './PinEdition.tsx';

/** A project: its particulars, the edition it pins, and its members with their verdicts. */
export function ProjectPage() {
  const { projectId = '' } = useParams();
  const project = useQuery({
    queryKey: ['project', projectId],
    queryFn: () => call(readProject, { params: { id: projectId } }),
  });
  const members = useQuery({
    queryKey: ['project', projectId, 'members'],
    queryFn: () => call(listProjectMembers, { params: { id: projectId } }),
  });
  const [dialog, setDialog] = useState<'pin' | 'edit' | 'add' | null>(null);
  const [filter, setFilter] = useState('');
  useCrumbs([{ label: 'Projects', to: '/projects' }, { label: project.data?.title ?? 'Project' }]);
  const rows = useMemo(() => {
    const words = filter.toLowerCase().split(/\s+/).filter(Boolean);
    return (members.data?.items ?? []).filter((row) =>
      words.every((word) =>
        `${row.mark} ${row.title} ${row.use ?? ''} ${row.grade} ${row.section.b}×${row.section.h} ${row.result?.checkTitle ?? ''} ${row.result?.word ?? ''}`
          .toLowerCase()
          .includes(word),
      ),
    );
  }, [filter, members.data]);
  const error = project.error ?? members.error;
  if (error)
    return (
      <Page title="Project">
        <ProblemNotice error={error} />
      </Page>
    );
  if (!project.data || !members.data) return <Loading what="the project" />;
  const { title, site, client, state, edition } = project.data;
  const all = members.data.items;
  const canPin = may(project.data, 'projects.pin');
  const canAdd = may(project.data, 'members.create') && edition !== null;
  return (
    <Page
      wide
      title={title}
      mark={
        state === 'closed' && (
          <span className="rounded-full border border-pencil px-2 font-sans text-xs font-semibold text-soft">
            ○ Closed
          </span>
        )
      }
      lead={[site, client && `for ${client}`].filter(Boolean).join(', ')}
      actions={
        <>
          {may(project.data, 'projects.update') && (
            <Button onClick={() => setDialog('edit')}>Edit particulars</Button>
          )}
          {canAdd && (
            <Button kind="main" onClick={() => setDialog('add')}>
              Add a member
            </Button>
          )}
        </>
      }
    >
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1 border-y border-pencil/60 py-2.5">
        <span className="text-soft">Checked against</span>
        <strong>
          <EditionName edition={edition} />
        </strong>
        {edition && <UnverifiedMark count={edition.unverified} what="values in it are" />}
        {canPin && (
          <Button kind="quiet" className="ml-auto" onClick={() => setDialog('pin')}>
            {edition ? 'Pin another edition' : 'Pin an edition'}
          </Button>
        )}
      </div>
      {edition?.state === 'withdrawn' && (
        <Notice tone="error">
          This edition was withdrawn. Its verdicts are not to be relied on: pin another edition, on purpose.
        </Notice>
      )}
      {edition?.state === 'superseded' && (
        <Notice tone="warning">
          A newer edition of this basis was released. The project stays on this one until someone pins the new
          one.
        </Notice>
      )}
      <Section
        title="Members"
        note={filter.trim() ? `${rows.length} of ${all.length}` : `${all.length} in all`}
        actions={
          all.length > 0 && (
            <input
              type="search"
              aria-label="Filter members"
              placeholder="Filter"
              value={filter}
              onChange={(event) => setFilter(event.target.value)}
              className="min-h-8 w-52 rounded border border-pencil bg-raised px-2.5"
            />
          )
        }
      >
        {all.length === 0 ? (
          <EmptyState
            action={
              canAdd ? (
                <Button kind="main" onClick={() => setDialog('add')}>
                  Add a member
                </Button>
              ) : canPin && !edition ? (
                <Button kind="main" onClick={() => setDialog('pin')}>
                  Pin an edition
                </Button>
              ) : undefined
            }
          >
            {edition
              ? 'Joists, beams, rafters and lintels stand here, each with its verdict.'
              : 'Pin the edition agreed for this project first; then members can be added and are checked against it.'}
          </EmptyState>
        ) : rows.length === 0 ? (
          <EmptyState action={<Button onClick={() => setFilter('')}>Show all members</Button>}>
            No member matches “{filter.trim()}”. Marks, titles, uses, grades, sections, checks and verdicts
            are searched.
          </EmptyState>
        ) : (
          <MembersTable project={projectId} rows={rows} />
        )}
      </Section>
      {dialog === 'pin' && <PinEdition project={project.data} onClose={() => setDialog(null)} />}
      {dialog === 'edit' && <EditProject project={project.data} onClose={() => setDialog(null)} />}
      {dialog === 'add' && edition && (
        <AddMember
          project={project.data}
          edition={edition.id}
          taken={all.map(({ mark }) => mark)}
          onClose={() => setDialog(null)}
        />
      )}
    </Page>
  );
}
