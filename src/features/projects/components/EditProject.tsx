import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { readEdition } from '#shared/contracts/bases.ts';
import { updateProject, type Project } from '#shared/contracts/projects.ts';
import { listStock } from '#shared/contracts/stock.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { SelectField, TextField } from '#src/components/Field.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { ApiProblem, call } from '#src/lib/api/call.ts';
import { changesOf, particularsOf, type Particulars } from '../particulars.ts';
import { StaleParticulars } from './StaleParticulars.tsx';

/** Particulars of a project. A colleague's newer version is shown beside what was typed, which stays. */
export function EditProject({ project, onClose }: { project: Project; onClose: () => void }) {
  const client = useQueryClient();
  // What the form began from: a newer version that arrives meanwhile must not pass for it.
  const [base] = useState(project);
  const [mine, setMine] = useState<Particulars>(() => particularsOf(project));
  const [stored, setStored] = useState<Project | null>(null);
  const stock = useQuery({ queryKey: ['stock'], queryFn: () => call(listStock) });
  const edition = useQuery({
    queryKey: ['edition', project.edition?.id],
    queryFn: () => call(readEdition, { params: { id: project.edition?.id ?? '' } }),
    enabled: project.edition !== null,
    staleTime: Infinity,
  });
  const set = (changed: Partial<Particulars>) => setMine((now) => ({ ...now, ...changed }));
  const change = useMutation({
    mutationFn: (body: Partial<Particulars>) =>
      call(updateProject, {
        params: { id: base.id },
        body: { version: (stored ?? base).version, ...body },
      }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: ['project', base.id] });
      await Promise.all(
        ['projects', 'member', 'desk'].map((key) => client.invalidateQueries({ queryKey: [key] })),
      );
      onClose();
    },
    onError: (error) => {
      if (error instanceof ApiProblem && error.code === 'stale-version')
        setStored(error.problem.stored as Project);
    },
  });
  const stale = change.error instanceof ApiProblem && change.error.code === 'stale-version';
  const save = () => {
    const trimmed = { ...mine, title: mine.title.trim(), site: mine.site.trim(), client: mine.client.trim() };
    const body = changesOf(particularsOf(base), trimmed);
    if (Object.keys(body).length === 0) onClose();
    else change.mutate(body);
  };
  const choices = edition.data?.document.choices.filter(({ scope }) => scope === 'project') ?? [];
  return (
    <Dialog title="Particulars" open onClose={onClose}>
      {stale && stored ? (
        <StaleParticulars
          base={particularsOf(base)}
          mine={mine}
          stored={particularsOf(stored)}
          stockTitle={(id) => stock.data?.items.find((list) => list.id === id)?.title ?? 'none'}
        />
      ) : (
        <ProblemNotice error={change.error} />
      )}
      <form
        onSubmit={(event) => {
          event.preventDefault();
          save();
        }}
      >
        <TextField
          label="Title"
          value={mine.title}
          onChange={(event) => set({ title: event.target.value })}
          required
          maxLength={200}
        />
        <TextField
          label="Site"
          value={mine.site}
          onChange={(event) => set({ site: event.target.value })}
          maxLength={200}
        />
        <TextField
          label="Client"
          value={mine.client}
          onChange={(event) => set({ client: event.target.value })}
          maxLength={200}
        />
        {choices.map(({ symbol, title, options, default: usual }) => (
          <SelectField
            key={symbol}
            label={title}
            hint="For every member of the project; a change checks them anew."
            value={mine.choices[symbol] ?? ''}
            onChange={(event) => {
              const others = Object.entries(mine.choices).filter(([key]) => key !== symbol);
              const option = event.target.value;
              set({ choices: Object.fromEntries(option ? [...others, [symbol, option]] : others) });
            }}
          >
            <option value="">
              {usual === undefined
                ? 'not chosen yet'
                : `as usual: ${options.find(({ id }) => id === usual)?.title ?? usual}`}
            </option>
            {options.map((option) => (
              <option key={option.id} value={option.id}>
                {option.title}
              </option>
            ))}
          </SelectField>
        ))}
        <SelectField
          label="Stock list"
          value={mine.stockListId ?? ''}
          onChange={(event) => set({ stockListId: event.target.value || null })}
        >
          <option value="">none</option>
          {stock.data?.items.map(({ id, title }) => (
            <option key={id} value={id}>
              {title}
            </option>
          ))}
        </SelectField>
        <SelectField
          label="State"
          value={mine.state}
          onChange={(event) => set({ state: event.target.value === 'closed' ? 'closed' : 'live' })}
          hint="A closed project can be read and not changed."
        >
          <option value="live">Live</option>
          <option value="closed">Closed</option>
        </SelectField>
        <Button type="submit" kind="main" disabled={change.isPending}>
          {stale ? 'Save yours now' : 'Save'}
        </Button>
      </form>
    </Dialog>
  );
}
