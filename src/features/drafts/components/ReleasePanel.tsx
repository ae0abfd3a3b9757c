import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import {
  releaseEdition,
  returnEdition,
  submitEdition,
  withdrawEdition,
  type Draft,
} from '#shared/contracts/drafts.ts';
import type { Finding } from '#shared/engine/types.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { TextField } from '#src/components/Field.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { call } from '#src/lib/api/call.ts';
import { may } from '#src/lib/api/session.ts';

interface ReleasePanelProps {
  draft: Draft;
  findings: readonly Finding[];
  version: () => number;
  /** Saves what is still on its way. */
  flush: () => Promise<void>;
}

type Move = 'submit' | 'return' | 'release' | 'withdraw';
const looks = { error: ['■', 'text-fail'], warning: ['▲', 'text-close'], note: ['◆', 'text-soft'] } as const;
const titles: Record<Move, string> = {
  submit: 'Submit for check',
  return: 'Return with remarks',
  release: 'Release this edition',
  withdraw: 'Withdraw this edition',
};

/** Findings, proofs and the way to release: always there, and true of what is on the screen. */
export function ReleasePanel({ draft, findings, version, flush }: ReleasePanelProps) {
  const [move, setMove] = useState<Move | null>(null);
  const count = (severity: Finding['severity']) =>
    findings.filter((finding) => finding.severity === severity).length;
  const { proofs, blockers, summary } = draft;
  const steps = [
    {
      done: count('error') === 0,
      text: count('error') === 0 ? 'No errors' : `${count('error')} errors to put right`,
    },
    {
      done: proofs.failed === 0,
      text: proofs.failed === 0 ? `All ${proofs.held} proofs hold` : `${proofs.failed} proofs don’t hold`,
    },
    { done: summary.state !== 'draft', text: 'Submitted for check' },
    { done: summary.releasedBy !== null, text: 'Released by a second person' },
  ];
  const moves = (['submit', 'return', 'release', 'withdraw'] as const).filter((each) =>
    may(draft, `editions.${each}`),
  );
  return (
    <aside
      aria-label="Findings and release"
      className="border-pencil/60 px-4 pt-6 pb-8 xl:sticky xl:top-14 xl:max-h-[calc(100dvh-3.5rem)] xl:overflow-y-auto xl:border-l xl:px-6"
      tabIndex={0}
    >
      <h2 className="border-b border-ink pb-1 text-lg italic">Findings</h2>
      <p role="status" className="py-1.5 text-sm text-soft">
        {count('error')} errors, {count('warning')} warnings, {count('note')} notes
      </p>
      <ul>
        {[...findings]
          .sort((a, b) => Object.keys(looks).indexOf(a.severity) - Object.keys(looks).indexOf(b.severity))
          .slice(0, 60)
          .map((finding, index) => (
            <li key={index} className="flex gap-2.5 border-b border-rule py-1.5 text-sm">
              <span aria-hidden className={looks[finding.severity][1]}>
                {looks[finding.severity][0]}
              </span>
              <span className="min-w-0">
                <span className="sr-only">{finding.severity}: </span>
                {finding.message}
                <span className="block font-mono text-xs break-all text-soft">{finding.pointer}</span>
              </span>
            </li>
          ))}
      </ul>
      <h2 className="mt-6 border-b border-ink pb-1 text-lg italic">To release</h2>
      <ul>
        {steps.map(({ done, text }) => (
          <li key={text} className="flex gap-2.5 border-b border-rule py-1.5 text-sm">
            <span aria-hidden className={done ? 'text-pass' : 'text-soft'}>
              {done ? '✓' : '○'}
            </span>
            <span>
              <span className="sr-only">{done ? 'done: ' : 'open: '}</span>
              {text}
            </span>
          </li>
        ))}
      </ul>
      {summary.state === 'in_check' &&
        blockers.map((blocker) => (
          <p key={blocker} className="mt-2 text-sm text-close">
            ▲ {blocker}
          </p>
        ))}
      <div className="mt-4 flex flex-wrap gap-2">
        {moves.map((each) => (
          <Button
            key={each}
            kind={each === 'submit' || each === 'release' ? 'main' : 'plain'}
            disabled={each === 'release' && blockers.length > 0}
            onClick={() => setMove(each)}
          >
            {titles[each]}
          </Button>
        ))}
      </div>
      {move && (
        <MoveDialog move={move} draft={draft} version={version} flush={flush} onClose={() => setMove(null)} />
      )}
    </aside>
  );
}

function MoveDialog({
  move,
  draft,
  version,
  flush,
  onClose,
}: {
  move: Move;
  draft: Draft;
  version: () => number;
  /** Saves what is still on its way. */
  flush: () => Promise<void>;
  onClose: () => void;
}) {
  const client = useQueryClient();
  const id = draft.summary.id;
  const run = useMutation({
    mutationFn: async ({ reason, remark, pointer }: { reason: string; remark: string; pointer: string }) => {
      const params = { id };
      if (move === 'submit') {
        await flush();
        return call(submitEdition, { params, body: { version: version(), reason } });
      }
      if (move === 'return')
        return call(returnEdition, {
          params,
          body: { reason, remarks: remark ? [{ pointer, text: remark }] : [] },
        });
      return move === 'release'
        ? call(releaseEdition, { params })
        : call(withdrawEdition, { params, body: { reason } });
    },
    onSuccess: async (next) => {
      client.setQueryData(['draft', id], next);
      await client.invalidateQueries({ queryKey: ['bases'] });
      await client.invalidateQueries({ queryKey: ['basis'] });
      await client.invalidateQueries({ queryKey: ['edition', id] });
      onClose();
    },
  });
  const labels: Record<Move, string> = {
    submit: 'What it changes, and why',
    return: 'Why it is returned',
    release: '',
    withdraw: 'Why it is withdrawn',
  };
  return (
    <Dialog title={titles[move]} open onClose={onClose}>
      <ProblemNotice error={run.error} />
      <form
        onSubmit={(event) => {
          event.preventDefault();
          const data = new FormData(event.currentTarget);
          const text = (name: string) => String(data.get(name) ?? '').trim();
          run.mutate({ reason: text('reason'), remark: text('remark'), pointer: text('pointer') });
        }}
      >
        {move === 'release' && (
          <p className="mb-3 text-soft">
            From then on it never changes again, and the edition released before it is superseded. Projects
            stay on the edition they pinned until someone moves them on purpose.
          </p>
        )}
        {labels[move] && <TextField label={labels[move]} name="reason" required maxLength={2000} autoFocus />}
        {move === 'return' && (
          <>
            <TextField label="Remark" name="remark" maxLength={2000} />
            <TextField
              label="Place of the remark"
              name="pointer"
              maxLength={400}
              hint="As the findings say it, such as /grades/rows/0; empty for the whole"
            />
          </>
        )}
        <Button type="submit" kind="main" disabled={run.isPending}>
          {titles[move]}
        </Button>
      </form>
    </Dialog>
  );
}
