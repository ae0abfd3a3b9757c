import { describe, expect, it } from 'vitest';
import type { Member } from '#shared/basis/schema/index.ts';
import { canKeep, dropDraft, keepDraft, keptDraft, type Store } from './draftStore.ts';

function memory(): Store {
  const values = new Map<string, string>();
  return {
    getItem: (key) => values.get(key) ?? null,
    setItem: (key, value) => void values.set(key, value),
    removeItem: (key) => void values.delete(key),
  };
}
const document = { schema: 'member/1', mark: 'J1' } as Member;
const draft = { document, unread: {}, version: 3, at: '2026-01-02T03:04:05Z' };

describe('unsaved members kept on this machine', () => {
  it('comes back for the same person and member only', () => {
    const store = memory();
    keepDraft(store, 'p1', 'm1', draft);
    expect(keptDraft(store, 'p1', 'm1')).toEqual(draft);
    expect(keptDraft(store, 'p2', 'm1')).toBeNull();
    dropDraft(store, 'p1', 'm1');
    expect(keptDraft(store, 'p1', 'm1')).toBeNull();
  });

  it('says so when the browser has no room, and takes broken text for nothing', () => {
    const store = memory();
    const full: Store = {
      ...store,
      setItem: () => {
        throw new Error('full');
      },
    };
    expect(keepDraft(full, 'p', 'm', draft)).toBe(false);
    expect(canKeep(full)).toBe(false);
    expect(canKeep(store)).toBe(true);
    store.setItem('ledgerbeam.member.p.m', '{broken');
    expect(keptDraft(store, 'p', 'm')).toBeNull();
  });
});
