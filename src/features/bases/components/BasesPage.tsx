import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { createBasis, listBases, listStarters } from '#shared/contracts/bases.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { TextField } from '#src/components/Field.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { EditionMark } from '#src/components/StateMark.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { Rings } from '#src/drawings/Rings.tsx';
import { call } from '#src/lib/api/call.ts';
import { may } from '#src/lib/api/session.ts';
import { ringsOf } from '../ringsOf.ts';

/** The firm's design bases, each with its rings. */
export function BasesPage() {
  useCrumbs([{ label: 'Bases' }]);
  const { data, error } = useQuery({ queryKey: ['bases'], queryFn: () => call(listBases) });
  const [creating, setCreating] = useState(false);
  return (
    <Page
      title="Design bases"
      lead="Named sets of rules: grade stresses, factors, limits. A basis grows by editions; a released one never changes again."
      actions={
        may(data, 'bases.create') && (
          <Button kind="main" onClick={() => setCreating(true)}>
            Set up a basis
          </Button>
        )
      }
    >
      <ProblemNotice error={error} />
      {!data && !error && <Loading what="the bases" />}
      {data?.items.length === 0 && (
        <EmptyState>
          Bases stand here. Set one up from a starter edition, then verify its values and release it with a
          second person.
        </EmptyState>
      )}
      <ul>
        {data?.items.map((basis) => (
          <li
            key={basis.id}
            className="flex flex-wrap items-center gap-5 border-b border-rule py-4 first:border-t"
          >
            <Rings rings={ringsOf(basis)} labels={false} />
            <div className="min-w-0 flex-1">
              <h2 className="text-xl">
                <Link to={`/bases/${basis.id}`} className="hover:underline">
                  {basis.title}
                </Link>
              </h2>
              <p className="max-w-2xl text-soft">{basis.purpose}</p>
              <p className="mt-1.5 flex flex-wrap gap-x-5 gap-y-1">
                {basis.editions.map(({ id, number, state, projects }) => (
                  <span key={id} className="inline-flex items-center gap-2">
                    <Link to={`/editions/${id}`} className="hover:underline">
                      Edition {number}
                    </Link>{' '}
                    <EditionMark state={state} />
                    {projects > 0 && (
                      <span className="text-accent-ink">
                        {projects === 1 ? 'pinned by 1 project' : `pinned by ${projects} projects`}
                      </span>
                    )}
                  </span>
                ))}
              </p>
            </div>
          </li>
        ))}
      </ul>
      {creating && <SetUpBasis onClose={() => setCreating(false)} />}
    </Page>
  );
}

function SetUpBasis({ onClose }: { onClose: () => void }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const starters = useQuery({ queryKey: ['starters'], queryFn: () => call(listStarters) });
  const create = useMutation({
    mutationFn: (body: { title: string; starter: string }) => call(createBasis, { body }),
    onSuccess: async (basis) => {
      await client.invalidateQueries({ queryKey: ['bases'] });
      void navigate(`/bases/${basis.id}`);
    },
  });
  return (
    <Dialog title="Set up a basis" open onClose={onClose} wide>
      <p className="mb-3 text-soft">
        Its first edition is a draft made from a starter. Nothing in it counts as verified until a second
        person has compared it with its source.
      </p>
      <ProblemNotice error={starters.error ?? create.error} />
      <form
        onSubmit={(event) => {
          event.preventDefault();
          const data = new FormData(event.currentTarget);
          create.mutate({ title: String(data.get('title')).trim(), starter: String(data.get('starter')) });
        }}
      >
        <TextField
          label="Title"
          name="title"
          required
          maxLength={200}
          autoFocus
          placeholder="House basis: floors"
        />
        <fieldset className="mb-4">
          <legend className="mb-1 text-sm font-medium">From the starter edition</legend>
          {starters.data?.items.map((starter) => (
            <label
              key={starter.slug}
              className="flex cursor-pointer gap-3 border-b border-rule py-2 has-checked:bg-wash"
            >
              <input type="radio" name="starter" value={starter.slug} required className="mt-1" />
              <span>
                <span className="font-semibold">{starter.title}</span>{' '}
                <span className="text-soft">
                  {starter.method}; {starter.unitSystem}
                </span>
                <span className="block text-sm text-soft">{starter.purpose}</span>
              </span>
            </label>
          ))}
        </fieldset>
        <Button type="submit" kind="main" disabled={create.isPending}>
          Set it up
        </Button>
      </form>
    </Dialog>
  );
}
