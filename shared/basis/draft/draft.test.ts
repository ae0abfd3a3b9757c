import { describe, expect, it } from 'vitest';
import { clashesOf } from './clash.ts';
import { patchBetween, patched } from './patch.ts';

const base = {
  title: 'Floors',
  grades: {
    rows: [
      { id: 'a', values: { f_m: 8, f_v: 1 } },
      { id: 'b', values: { f_m: 7 } },
    ],
  },
};
type Draft = typeof base;
const changed = (change: (draft: Draft) => void): Draft => {
  const copy = structuredClone(base);
  change(copy);
  return copy;
};

describe('patches on a draft', () => {
  it('applies as a whole and leaves the original alone', () => {
    const outcome = patched(base, [{ op: 'replace', path: '/grades/rows/0/values/f_m', value: 9 }]);
    expect(outcome.ok && outcome.document.grades.rows[0]?.values.f_m).toBe(9);
    expect(base.grades.rows[0]?.values.f_m).toBe(8);
  });

  it('refuses what does not fit, with the place, and applies nothing', () => {
    const outcome = patched(base, [
      { op: 'replace', path: '/title', value: 'x' },
      { op: 'remove', path: '/nothing/there' },
    ]);
    expect(outcome).toEqual({ ok: false, message: expect.stringContaining('/nothing/there') });
    expect(base.title).toBe('Floors');
  });

  it('never reaches a prototype', () => {
    const outcome = patched(base, [{ op: 'add', path: '/__proto__/polluted', value: 1 }]);
    expect(outcome.ok).toBe(false);
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });

  it('finds the patch between two drafts', () => {
    const after = changed((draft) => void (draft.title = 'Roofs'));
    const outcome = patched(base, patchBetween(base, after));
    expect(outcome.ok && outcome.document).toEqual(after);
  });
});

describe('two keepers in one draft', () => {
  const clashes = (mine: Draft, current: Draft) => clashesOf(base, current, patchBetween(base, mine), mine);

  it('lets changes at different places pass each other', () => {
    const mine = changed((d) => void (d.title = 'Roofs'));
    const theirs = changed((d) => void (d.grades.rows[1] = { id: 'b', values: { f_m: 6, f_v: 1 } }));
    expect(clashes(mine, theirs)).toEqual([]);
  });

  it('shows both values of a place that both changed', () => {
    const mine = changed((d) => void (d.title = 'Roofs'));
    const theirs = changed((d) => void (d.title = 'Walls'));
    expect(clashes(mine, theirs)).toEqual([{ pointer: '/title', mine: 'Roofs', theirs: 'Walls' }]);
  });

  it('does not call it a clash when both came to the same value', () => {
    const both = changed((d) => void (d.title = 'Roofs'));
    expect(clashes(both, both)).toEqual([]);
  });

  it('treats a removed row and an edit further down as a clash, since places shift', () => {
    const mine = changed((d) => void d.grades.rows.shift());
    const theirs = changed((d) => void (d.grades.rows[1] = { id: 'b', values: { f_m: 5, f_v: 2 } }));
    expect(clashes(mine, theirs)[0]?.pointer).toMatch(/^\/grades\/rows/);
  });
});
