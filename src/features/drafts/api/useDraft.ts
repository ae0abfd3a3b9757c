import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useRef, useState } from 'react';
import { patchBetween, patched } from '#shared/basis/draft/patch.ts';
import type { Edition } from '#shared/basis/schema/index.ts';
import { patchDraft, type Draft, type StoredDraft } from '#shared/contracts/drafts.ts';
import { ApiProblem, call } from '#src/lib/api/call.ts';
import { begin, redone, stepTo, undone, type History } from '../lib/history.ts';

export type DraftSaving =
  | { kind: 'saved' }
  | { kind: 'waiting' }
  | { kind: 'saving' }
  | { kind: 'problem'; error: unknown }
  | { kind: 'clash'; stored: StoredDraft };

const rest = 800;
const keyOf = (id: string) => `ledgerbeam.draft.${id}`;

function keep(id: string, patch: unknown[]): void {
  try {
    if (patch.length === 0) localStorage.removeItem(keyOf(id));
    else localStorage.setItem(keyOf(id), JSON.stringify(patch));
  } catch {
    // Where the browser keeps nothing the server has it within a second.
  }
}

/** What was typed here and never reached the server, on top of what the server has. */
function withKept(draft: Draft): Edition {
  try {
    const text = localStorage.getItem(keyOf(draft.summary.id));
    if (text === null) return draft.document;
    const outcome = patched(draft.document, JSON.parse(text) as Parameters<typeof patched>[1]);
    return outcome.ok ? outcome.document : draft.document;
  } catch {
    return draft.document;
  }
}

/**
 * A draft being worked on: every change is one step of undo, kept on this machine at once and sent as a
 * patch when the keyboard rests.
 */
export function useDraft(draft: Draft, readOnly: boolean) {
  const client = useQueryClient();
  const id = draft.summary.id;
  const [history, setHistory] = useState<History<Edition>>(() =>
    begin(readOnly ? draft.document : withKept(draft)),
  );
  const [saving, setSaving] = useState<DraftSaving>(() => ({
    kind: history.now === draft.document ? 'saved' : 'waiting',
  }));
  const saved = useRef({ version: draft.version, document: draft.document });
  const sending = useRef(false);
  const latest = useRef(history.now);
  const { now } = history;

  const save = useCallback(async (): Promise<void> => {
    const base = saved.current;
    const patch = patchBetween(base.document, now);
    if (sending.current) return;
    if (patch.length === 0) {
      setSaving({ kind: 'saved' });
      return;
    }
    sending.current = true;
    setSaving({ kind: 'saving' });
    try {
      const answer = await call(patchDraft, {
        params: { id },
        body: { version: base.version, patch: patch as never },
      });
      const document = answer.document ?? now;
      saved.current = { version: answer.version, document };
      if (answer.document) {
        // A colleague changed other places: what I typed since goes on top of what came out.
        setHistory((current) => {
          const since = patched(answer.document as Edition, patchBetween(now, current.now));
          return { ...current, now: since.ok ? since.document : (answer.document as Edition) };
        });
      }
      // What is kept here is only what the server hasn't got.
      keep(id, patchBetween(document, latest.current === now ? document : latest.current));
      setSaving({ kind: 'saved' });
      void client.invalidateQueries({ queryKey: ['edition', id] });
    } catch (error) {
      const stored =
        error instanceof ApiProblem && error.code === 'stale-version' ? error.problem.stored : undefined;
      setSaving(stored ? { kind: 'clash', stored: stored as StoredDraft } : { kind: 'problem', error });
    } finally {
      sending.current = false;
    }
  }, [client, id, now]);

  const blocked = saving.kind === 'clash';
  useEffect(() => {
    latest.current = now;
    if (readOnly) return undefined;
    const patch = patchBetween(saved.current.document, now);
    keep(id, patch);
    if (blocked) return undefined;
    const timer = setTimeout(() => void save(), rest);
    return () => clearTimeout(timer);
  }, [blocked, id, now, readOnly, save]);

  /** After a clash: the chosen document goes on top of what the server has. */
  const settle = (document: Edition, stored: StoredDraft) => {
    saved.current = { version: stored.version, document: stored.document };
    setHistory((current) => stepTo(current, document));
    setSaving({ kind: 'waiting' });
  };

  const typed = (step: (current: History<Edition>) => History<Edition>) => {
    setHistory(step);
    setSaving((current) => (current.kind === 'clash' ? current : { kind: 'waiting' }));
  };
  const unsaved = () => patchBetween(saved.current.document, now).length > 0;
  return {
    edition: now,
    saving,
    change: (next: Edition) => typed((current) => stepTo(current, next)),
    undo: () => typed(undone),
    redo: () => typed(redone),
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
    /** Saves at once; for those who can't wait for the keyboard to rest. */
    flush: save,
    settle,
    /** Version the server has; moves are made on it. */
    version: () => saved.current.version,
    unsaved,
  };
}
