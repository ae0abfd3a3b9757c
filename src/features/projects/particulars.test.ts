import { describe, expect, it } from 'vitest';
import { changesOf, clashing, type Particulars } from './particulars.ts';

const base: Particulars = {
  title: 'Signal cabin',
  site: 'North yard',
  client: '',
  state: 'live',
  stockListId: null,
  choices: { exposure: 'dry', system: 'yes' },
};

describe('the particulars of a project', () => {
  it('sends only what was changed, whatever the order of the choices', () => {
    const mine = { ...base, client: 'A client', choices: { system: 'yes', exposure: 'dry' } };
    expect(changesOf(base, mine)).toEqual({ client: 'A client' });
    expect(changesOf(base, { ...base, choices: { exposure: 'wet', system: 'yes' } })).toEqual({
      choices: { exposure: 'wet', system: 'yes' },
    });
    expect(changesOf(base, base)).toEqual({});
  });

  it('clashes only where both changed the same field, and differently', () => {
    const stored = {
      ...base,
      title: 'Signal cabin, upper floor',
      client: 'A client',
      state: 'closed' as const,
    };
    expect(clashing(base, { ...base, site: 'South yard' }, stored)).toEqual([]);
    expect(clashing(base, { ...base, client: 'A client' }, stored)).toEqual([]);
    expect(clashing(base, { ...base, title: 'The cabin', site: 'South yard' }, stored)).toEqual(['title']);
  });
});
