import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { readEdition } from '#shared/contracts/bases.ts';
import { createMember } from '#shared/contracts/members.ts';
import type { Project } from '#shared/contracts/projects.ts';
import { readStock } from '#shared/contracts/stock.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { TextField } from '#src/components/Field.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { call } from '#src/lib/api/call.ts';
import { firstMember, nextMark } from '../firstMember.ts';

/** Adds a member by mark and title and goes to its sheet. */
export function AddMember({
  project,
  edition,
  taken,
  onClose,
}: {
  project: Project;
  edition: string;
  taken: readonly string[];
  onClose: () => void;
}) {
  const navigate = useNavigate();
  const client = useQueryClient();
  const document = useQuery({
    queryKey: ['edition', edition],
    queryFn: () => call(readEdition, { params: { id: edition } }),
    staleTime: Infinity,
  });
  const stock = useQuery({
    queryKey: ['stock', project.stockListId],
    queryFn: () => call(readStock, { params: { id: project.stockListId ?? '' } }),
    enabled: project.stockListId !== null,
  });
  const add = useMutation({
    mutationFn: ({ mark, title }: { mark: string; title: string }) => {
      if (!document.data) throw new Error('The edition has not arrived yet.');
      return call(createMember, {
        params: { id: project.id },
        body: { document: firstMember(document.data.document, stock.data?.sections ?? [], mark, title) },
      });
    },
    onSuccess: async (member) => {
      await client.invalidateQueries({ queryKey: ['project', project.id] });
      void navigate(`/projects/${project.id}/members/${member.id}`);
    },
  });
  return (
    <Dialog title="Add a member" open onClose={onClose}>
      <ProblemNotice error={document.error ?? stock.error ?? add.error} />
      <form
        onSubmit={(event) => {
          event.preventDefault();
          const data = new FormData(event.currentTarget);
          add.mutate({ mark: String(data.get('mark')).trim(), title: String(data.get('title')).trim() });
        }}
      >
        <TextField
          label="Mark"
          name="mark"
          defaultValue={nextMark(taken)}
          required
          maxLength={24}
          autoFocus
        />
        <TextField
          label="What it is"
          name="title"
          maxLength={200}
          placeholder="Floor joist, trimmer, lintel …"
        />
        <p className="mb-3 text-sm text-soft">It begins with one span and two loads that you then set.</p>
        <Button type="submit" kind="main" disabled={!document.data || stock.isLoading || add.isPending}>
          Add it and open its sheet
        </Button>
      </form>
    </Dialog>
  );
}
