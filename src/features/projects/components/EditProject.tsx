import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { updateProject, type Project } from '#shared/contracts/projects.ts';
import { listStock } from '#shared/contracts/stock.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { SelectField, TextField } from '#src/components/Field.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { call } from '#src/lib/api/call.ts';

/** Particulars of a project. A colleague's newer version is said, and what was typed stays. */
export function EditProject({ project, onClose }: { project: Project; onClose: () => void }) {
  const client = useQueryClient();
  const stock = useQuery({ queryKey: ['stock'], queryFn: () => call(listStock) });
  const change = useMutation({
    mutationFn: (body: {
      title: string;
      site: string;
      client: string;
      state: 'live' | 'closed';
      stockListId: string | null;
    }) => call(updateProject, { params: { id: project.id }, body: { version: project.version, ...body } }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: ['project', project.id] });
      await client.invalidateQueries({ queryKey: ['projects'] });
      onClose();
    },
  });
  return (
    <Dialog title="Particulars" open onClose={onClose}>
      <ProblemNotice error={change.error} />
      <form
        onSubmit={(event) => {
          event.preventDefault();
          const data = new FormData(event.currentTarget);
          const text = (name: string) => String(data.get(name) ?? '').trim();
          change.mutate({
            title: text('title'),
            site: text('site'),
            client: text('client'),
            state: text('state') === 'closed' ? 'closed' : 'live',
            stockListId: text('stock') || null,
          });
        }}
      >
        <TextField label="Title" name="title" defaultValue={project.title} required maxLength={200} />
        <TextField label="Site" name="site" defaultValue={project.site} maxLength={200} />
        <TextField label="Client" name="client" defaultValue={project.client} maxLength={200} />
        <SelectField
          label="Stock list"
          name="stock"
          defaultValue={project.stockListId ?? ''}
          key={stock.data ? 'here' : 'coming'}
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
          name="state"
          defaultValue={project.state}
          hint="A closed project can be read and not changed."
        >
          <option value="live">Live</option>
          <option value="closed">Closed</option>
        </SelectField>
        <Button type="submit" kind="main" disabled={change.isPending}>
          Save
        </Button>
      </form>
    </Dialog>
  );
}
