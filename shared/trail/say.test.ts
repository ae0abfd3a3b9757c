import { describe, expect, it } from 'vitest';
import { trailKinds, type TrailEvent } from './events.ts';
import { say } from './say.ts';

const uuid = '00000000-0000-4000-8000-000000000000';

describe('events in words', () => {
  it('follow a person’s name', () => {
    const pinned: TrailEvent = {
      kind: 'project.edition-pinned',
      v: 1,
      detail: { from: null, to: uuid, edition: 'Roofs, edition 2', reason: 'Agreed.', rechecked: 1 },
    };
    expect(say(pinned)).toBe('pinned Roofs, edition 2; 1 member checked against it');
    const changed: TrailEvent = { kind: 'project.changed', v: 1, detail: { fields: ['site'], rechecked: 0 } };
    expect(say(changed)).toBe('changed site of the project');
    const gone: TrailEvent = { kind: 'person.roles-changed', v: 1, detail: { name: 'Ada', roles: [] } };
    expect(say(gone)).toBe('took Ada out of the firm');
  });

  it('have kinds that are each there once, named subject first', () => {
    expect(new Set(trailKinds).size).toBe(trailKinds.length);
    for (const kind of trailKinds) expect(kind).toMatch(/^[a-z]+\.[a-z-]+$/);
  });
});
