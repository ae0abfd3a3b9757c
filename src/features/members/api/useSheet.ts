import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useReducer, useState } from 'react';
import { saveMember, type MemberRecord, type StoredMember } from '#shared/contracts/members.ts';
import { ApiProblem, call } from '#src/lib/api/call.ts';
import { canKeep, dropDraft, keepDraft, keptDraft } from '../lib/draftStore.ts';
import { isChanged, openSheet, sheetAfter, type Sheet, type SheetEvent } from '../lib/sheet.ts';
import { memberKey } from './useMember.ts';

/** What became of the last save. */
export type SaveState =
  | { kind: 'idle' }
  | { kind: 'saving' }
  | { kind: 'problem'; error: unknown }
  | { kind: 'conflict'; stored: StoredMember };

/** Opens with what was kept on this machine, when it was typed on top of what the server has or is unsaved. */
function opened(record: MemberRecord, person: string): Sheet {
  const sheet = openSheet(record.document, record.version);
  const kept = keptDraft(localStorage, person, record.id);
  if (!kept) return sheet;
  return {
    ...sheet,
    document: kept.document,
    unread: kept.unread,
    // Typed on an older version: saving will find the conflict and show both.
    saved: { document: record.document, version: kept.version },
    past: [record.document],
  };
}

/** A member's sheet: what is typed, kept on this machine as it is typed, and saved on request. */
export function useSheet(record: MemberRecord, person: string, readOnly: boolean) {
  const client = useQueryClient();
  const [sheet, send] = useReducer(sheetAfter, record, (given) =>
    readOnly ? openSheet(given.document, given.version) : opened(given, person),
  );
  const [saving, setSaving] = useState<SaveState>({ kind: 'idle' });
  const [restored] = useState(() => sheet.document !== record.document);
  const changed = isChanged(sheet);

  // Whether the browser's storage takes anything is found out once, before anything is typed.
  const [kept] = useState(() => readOnly || canKeep(localStorage));
  useEffect(() => {
    if (readOnly) return;
    if (!changed) {
      dropDraft(localStorage, person, record.id);
      return;
    }
    const { document, unread, saved } = sheet;
    keepDraft(localStorage, person, record.id, {
      document,
      unread,
      version: saved.version,
      at: new Date().toISOString(),
    });
  }, [changed, person, readOnly, record.id, sheet]);

  const save = useCallback(async (): Promise<void> => {
    const { document, saved } = sheet;
    setSaving({ kind: 'saving' });
    try {
      const stored = await call(saveMember, {
        params: { id: record.id },
        body: { version: saved.version, document },
      });
      send({ kind: 'saved', document, version: stored.version });
      client.setQueryData(memberKey(record.id), stored);
      void client.invalidateQueries({ queryKey: ['project', record.project.id] });
      setSaving({ kind: 'idle' });
    } catch (error) {
      const stale =
        error instanceof ApiProblem && error.code === 'stale-version' ? error.problem.stored : undefined;
      setSaving(stale ? { kind: 'conflict', stored: stale as StoredMember } : { kind: 'problem', error });
    }
  }, [client, record.id, record.project.id, sheet]);

  /** Takes a merged document onto the colleague's version; it is then to be saved. */
  const settle = useCallback((document: Sheet['document'], stored: StoredMember) => {
    send({ kind: 'rebase', document, saved: { document: stored.document, version: stored.version } });
    setSaving({ kind: 'idle' });
  }, []);

  return {
    sheet,
    send: send as (event: SheetEvent) => void,
    changed,
    saving,
    save,
    settle,
    dismiss: () => setSaving({ kind: 'idle' }),
    /** Whether the browser keeps what is typed; false where its storage is full or forbidden. */
    kept,
    restored,
  };
}
