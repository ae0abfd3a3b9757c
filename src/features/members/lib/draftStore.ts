import type { Member } from '#shared/basis/schema/index.ts';
import type { Unread } from './sheet.ts';

/** What is kept on this machine of an unsaved member, and the version it was typed on. */
export interface LocalDraft {
  document: Member;
  unread: Unread;
  version: number;
  at: string;
}

/** The part of the browser's storage that is needed; may throw when storage is full or forbidden. */
export type Store = Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;

const keyOf = (person: string, member: string) => `ledgerbeam.member.${person}.${member}`;

/** Keeps a draft; says false when the browser refuses, so that the sheet can warn. */
export function keepDraft(store: Store, person: string, member: string, draft: LocalDraft): boolean {
  try {
    store.setItem(keyOf(person, member), JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

/** The kept draft of a member, or null; something unreadable counts as none. */
export function keptDraft(store: Store, person: string, member: string): LocalDraft | null {
  try {
    const text = store.getItem(keyOf(person, member));
    if (text === null) return null;
    const draft = JSON.parse(text) as Partial<LocalDraft>;
    const whole =
      draft.document?.schema === 'member/1' && typeof draft.version === 'number' && draft.at && draft.unread;
    return whole ? (draft as LocalDraft) : null;
  } catch {
    return null;
  }
}

export function dropDraft(store: Store, person: string, member: string): void {
  try {
    store.removeItem(keyOf(person, member));
  } catch {
    // Nothing was kept where storage is forbidden.
  }
}

/** Whether this browser keeps anything at all. */
export function canKeep(store: Store): boolean {
  try {
    store.setItem('ledgerbeam.try', '1');
    store.removeItem('ledgerbeam.try');
    return true;
  } catch {
    return false;
  }
}
