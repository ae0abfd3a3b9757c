import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Basis } from '#shared/contracts/bases.ts';
import { startDraft } from '#shared/contracts/drafts.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { SelectField, TextField } from '#src/components/Field.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { call } from '#src/lib/api/call.ts';

/** Drafts the next edition of a basis from one of its editions. */
export function StartDraft({ basis }: { basis: Basis }) {
  const [open, setOpen] = useState(false);
  const navigate = useNavigate();
  const client = useQueryClient();
  const start = useMutation({
    mutationFn: (body: { from: string; reason: string }) =>
      call(startDraft, { params: { id: basis.id }, body }),
    onSuccess: async (draft) => {
      await client.invalidateQueries({ queryKey: ['bases'] });
      void navigate(`/editions/${draft.summary.id}/draft`);
    },
  });
  if (basis.editions.some(({ state }) => state === 'draft' || state === 'in_check')) return null;
  return (
    <>
      <Button kind="main" onClick={() => setOpen(true)}>
        Draft the next edition
      </Button>
      <Dialog title="Draft the next edition" open={open} onClose={() => setOpen(false)}>
        <ProblemNotice error={start.error} />
        <form
          onSubmit={(event) => {
            event.preventDefault();
            const data = new FormData(event.currentTarget);
            start.mutate({ from: String(data.get('from')), reason: String(data.get('reason')).trim() });
          }}
        >
          <SelectField label="From" name="from">
            {basis.editions.map(({ id, number, state }) => (
              <option key={id} value={id}>
                edition {number} ({state})
              </option>
            ))}
          </SelectField>
          <TextField
            label="Cause"
            name="reason"
            required
            maxLength={2000}
            placeholder="A circular, a new code, a finding"
          />
          <Button type="submit" kind="main" disabled={start.isPending}>
            Draft it
          </Button>
        </form>
      </Dialog>
    </>
  );
}
