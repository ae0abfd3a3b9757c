import { describe, expect, it } from 'vitest';
import { abilities, can, couldEver, isAction, readActionOf } from './can.ts';
import { roles } from './roles.ts';
import { actions, rules, type Rule } from './rules.ts';

const live = { projectState: 'live', memberState: 'live' } as const;
const closed = { projectState: 'closed', memberState: 'live' } as const;

describe('can', () => {
  it('lets an engineer save a live member of a live project, and nobody else', () => {
    const able = roles.filter((role) => can({ roles: [role] }, 'members.save', live));
    expect(able).toEqual(['engineer']);
  });

  it('refuses on a closed project, on a removed member, and where no record is given', () => {
    const engineer = { roles: ['engineer'] } as const;
    expect(can(engineer, 'members.save', closed)).toBe(false);
    expect(can(engineer, 'members.save', { projectState: 'live', memberState: 'removed' })).toBe(false);
    expect(can(engineer, 'members.save')).toBe(false);
    expect(couldEver(engineer, 'members.save')).toBe(true);
  });

  it('gives a signed-out visitor only what anyone may do', () => {
    const open = actions.filter((action) => can(null, action, live));
    expect(open).toEqual(actions.filter((action) => (rules[action] as Rule).who === 'anyone'));
  });

  it('gives a person without a role in the firm nothing of the firm', () => {
    expect(can({ roles: [] }, 'projects.read')).toBe(false);
  });

  it('lets a reader change nothing', () => {
    const harmless = /\.(read|verify)$|^session\./;
    const changes = actions.filter((action) => !harmless.test(action));
    expect(changes.length).toBeGreaterThan(5);
    expect(abilities({ roles: ['reader'] }, changes, live)).toEqual([]);
  });

  it('adds up the roles of one person', () => {
    const both = { roles: ['keeper', 'engineer'] } as const;
    expect(abilities(both, ['bases.create', 'members.create', 'trail.read'], live)).toEqual([
      'bases.create',
      'members.create',
      'trail.read',
    ]);
  });
});

describe('names of actions', () => {
  it('finds the action behind seeing a thing', () => {
    expect(readActionOf('projects.pin')).toBe('projects.read');
    expect(readActionOf('members.save')).toBe('members.read');
  });

  it('knows its own actions and no prototype names', () => {
    expect(actions.every(isAction)).toBe(true);
    expect(isAction('toString')).toBe(false);
    expect(isAction(undefined)).toBe(false);
  });
});
