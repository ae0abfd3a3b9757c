import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { canBePinned } from '#shared/basis/lifecycle.ts';
import { listBases } from '#shared/contracts/bases.ts';
import { pinEdition, type Project } from '#shared/contracts/projects.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { EditionName } from '#src/components/EditionName.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { TextField } from '#src/components/Field.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { UnverifiedMark } from '#src/components/StateMark.tsx';
import { ApiProblem, call } from '#src/lib/api/call.ts';
import { day } from '#src/lib/format/time.ts';

/** Pins an edition on purpose: what each is for, what in it nobody verified, who released it. */
export function PinEdition({ project, onClose }: { project: Project; onClose: () => void }) {
  const client = useQueryClient();
  const bases = useQuery({ queryKey: ['bases'], queryFn: () => call(listBases) });
  const [chosen, setChosen] = useState<string | null>(null);
  const pin = useMutation({
    mutationFn: (reason: string) =>
      call(pinEdition, {
        params: { id: project.id },
        body: { editionId: chosen ?? '', version: project.version, reason },
      }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: ['project', project.id] });
      await Promise.all(
        ['projects', 'member', 'desk', 'bases', 'basis'].map((key) =>
          client.invalidateQueries({ queryKey: [key] }),
        ),
      );
      onClose();
    },
    // A colleague changed the project: fetched anew, so that the choice is made knowing what is stored.
    onError: async (error) => {
      if (error instanceof ApiProblem && error.code === 'stale-version')
        await client.invalidateQueries({ queryKey: ['project', project.id] });
    },
  });
  const editions = (bases.data?.items ?? [])
    .flatMap((basis) => basis.editions)
    .filter(({ state, id }) => canBePinned(state) && id !== project.edition?.id);
  return (
    <Dialog title="Pin an edition" open onClose={onClose} wide>
      {project.edition && (
        <p className="mb-1">
          Pinned now: <EditionName edition={project.edition} />
        </p>
      )}
      <p className="mb-3 text-soft">
        Every member is checked anew against the edition you pin. The results on the old one stay on record.
      </p>
      <ProblemNotice error={bases.error ?? pin.error} />
      {bases.isPending && <Loading what="the editions" />}
      {bases.data && editions.length === 0 && (
        <EmptyState>
          There is no other released edition. A basis keeper drafts one and a second person releases it.
        </EmptyState>
      )}
      {editions.length > 0 && (
        <form
          onSubmit={(event) => {
            event.preventDefault();
            pin.mutate(String(new FormData(event.currentTarget).get('reason') ?? '').trim());
          }}
        >
          <fieldset className="mb-4">
            <legend className="sr-only">Edition</legend>
            {editions.map((edition) => (
              <label
                key={edition.id}
                className="flex cursor-pointer gap-3 border-b border-rule py-2.5 has-checked:bg-wash"
              >
                <input
                  type="radio"
                  name="edition"
                  required
                  checked={chosen === edition.id}
                  onChange={() => setChosen(edition.id)}
                  className="mt-1"
                />
                <span className="min-w-0">
                  <span className="font-semibold">
                    {edition.basisTitle}, edition {edition.number}
                  </span>{' '}
                  <span className="text-soft">
                    {edition.method}; {edition.unitSystem}
                  </span>
                  <span className="block text-soft">{edition.purpose}</span>
                  <span className="block text-sm text-soft">
                    {edition.releasedBy && edition.releasedAt
                      ? `Released ${day(edition.releasedAt)} by ${edition.releasedBy.name}. `
                      : ''}
                    <UnverifiedMark count={edition.unverified} what="values are" />
                  </span>
                </span>
              </label>
            ))}
          </fieldset>
          <TextField
            label="Reason, for the record"
            name="reason"
            required
            maxLength={2000}
            placeholder="Agreed with the client on …"
          />
          <Button type="submit" kind="main" disabled={chosen === null || pin.isPending}>
            {pin.isPending ? 'Checking every member …' : 'Pin it and check every member'}
          </Button>
        </form>
      )}
    </Dialog>
  );
}
